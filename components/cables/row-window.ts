/** Which rows of a long list are drawn: those in sight, some before and after, and the one that has the focus. Pure. */

/** A drawn row, or the room of rows that are not drawn. */
export type Segment = { kind: "row"; index: number } | { kind: "gap"; from: number; rows: number };

export interface InSight {
  /** index of the first row drawn, and of the first one after them that is not */
  from: number;
  to: number;
}

const overscan = 10;
/** The window moves by so many rows at once, so that most steps of scrolling draw nothing anew. */
const grain = 5;

/**
 * @param topPx - of the window below the top of the list; negative while the list begins below it
 * @param heightPx - of the window
 * @param rowPx - height of a row, above 0
 */
export function rowsInSight(topPx: number, heightPx: number, rowPx: number): InSight {
  const from = Math.floor(topPx / rowPx / grain) * grain - overscan;
  const to = Math.ceil((topPx + heightPx) / rowPx / grain) * grain + overscan;
  return { from: Math.max(0, from), to: Math.max(0, to) };
}

/**
 * @param count - how many rows there are
 * @param kept - index of a row that is drawn wherever it is; it would lose the focus otherwise
 */
export function segments(count: number, { from, to }: InSight, kept: number | null): Segment[] {
  const end = Math.min(to, count);
  const start = Math.min(from, end);
  const drawn = Array.from({ length: end - start }, (_, i) => start + i);
  if (kept !== null && kept >= 0 && kept < count && (kept < start || kept >= end))
    drawn.splice(kept < start ? 0 : drawn.length, 0, kept);
  const result: Segment[] = [];
  let next = 0;
  for (const index of drawn) {
    if (index > next) result.push({ kind: "gap", from: next, rows: index - next });
    result.push({ kind: "row", index });
    next = index + 1;
  }
  if (next < count) result.push({ kind: "gap", from: next, rows: count - next });
  return result;
}
