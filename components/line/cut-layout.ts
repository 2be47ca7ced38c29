/**
 * Where the parts of a match stand in its small drawing. Lengths keep one proportion within a drawing; what would be
 * too long is cut short with a break mark.
 */
import type { Element } from "@/lib/line/element";

export interface CutItem<L> {
  element: Element<L>;
  /** px along the line */
  fromX: number;
  toX: number;
}

export interface StubHang {
  isFolded: boolean;
  /** where its words stand, of one that hangs */
  words: "left" | "right" | "below" | "under";
  /** words below it stand below this much of another stub too */
  clearPx: number;
  /** px drawn */
  lengthPx: number;
  isBroken: boolean;
}

export interface CutLayout<L> {
  items: CutItem<L>[];
  /** px per metre of this drawing */
  pxPerM: number;
  /** where the match begins; the run's own cable comes up to here */
  startX: number;
}

export const cutFrame = { width: 334, height: 128, axisY: 52, loadX: 294, leadX: 10 };

const mostPxPerM = 390;
const roomPx = 205;
const leastCablePx = 26;
/** next to another cable, so that the figures of both dimensions find room */
const leastBesideCablePx = 58;
const mostHangPx = 52;
const gapPx = 10;
/** between two stubs at one tee, so that both can be seen */
const besideStubPx = 26;
/** words to the right of what hangs nearer to the load than this do not fit, nor to the left of what is this far left */
const wordsPx = 70;
const leftWordsPx = 105;

function lengthOf<L>(element: Element<L>): number {
  if (element.kind === "cable" || element.kind === "stub") return element.lengthM;
  return element.kind === "parallel" ? (element.branches[0]?.lengthM ?? 0) : 0;
}

const symbolPx: Partial<Record<Element["kind"], number>> = {
  stub: 12,
  part: 46,
  pad: 62,
  joint: 7,
  transformer: 44,
  shunt: 24,
};

function widthOf<L>(element: Element<L>, pxPerM: number, isBesideCable = false): number {
  if (element.kind === "cable" || element.kind === "parallel")
    return Math.max(isBesideCable ? leastBesideCablePx : leastCablePx, lengthOf(element) * pxPerM);
  if (element.kind === "part" && element.connection === "shunt") return 24;
  return symbolPx[element.kind] ?? 0;
}

/** The scale at which cables, parts and the longest stub all fit. */
function scaleOf<L>(elements: readonly Element<L>[]): number {
  const along = elements
    .filter((e) => e.kind === "cable" || e.kind === "parallel")
    .reduce((sum, e) => sum + lengthOf(e), 0);
  const symbols = elements.reduce(
    (sum, e) => sum + (e.kind === "cable" || e.kind === "parallel" ? 0 : widthOf(e, 0) + gapPx),
    0,
  );
  const stub = Math.max(0, ...elements.map((e) => (e.kind === "stub" ? lengthOf(e) : 0)));
  const room = Math.max(40, roomPx - symbols);
  return Math.min(mostPxPerM, along > 0 ? room / along : Infinity, stub > 0 ? 150 / stub : Infinity);
}

/** Drawings are laid out on tenths of a px: finer differences between two machines' arithmetic must not show. */
function rounded(px: number): number {
  return Math.round(px * 10) / 10;
}

function isBesideCable<L>(elements: readonly Element<L>[], index: number): boolean {
  return elements[index - 1]?.kind === "cable" || elements[index + 1]?.kind === "cable";
}

/** Room that the run's own cable needs at the left, px. */
const leastLeadPx = 20;

/** Many parts together may ask for more room than there is: then all of them give way alike. */
function squeezed<L>(layout: CutLayout<L>): CutLayout<L> {
  const { leadX, loadX } = cutFrame;
  const share = (loadX - leadX - leastLeadPx) / (loadX - layout.startX);
  if (share >= 1) return layout;
  const at = (x: number) => rounded(loadX - (loadX - x) * share);
  const items = layout.items.map(({ element, fromX, toX }) => ({ element, fromX: at(fromX), toX: at(toX) }));
  return { items, pxPerM: layout.pxPerM * share, startX: at(layout.startX) };
}

/** @param elements - from source to load, as the engine has them */
export function cutLayout<L>(elements: readonly Element<L>[]): CutLayout<L> {
  const pxPerM = scaleOf(elements);
  let x = cutFrame.loadX;
  const items: CutItem<L>[] = [];
  for (const [index, element] of [...elements.entries()].toReversed()) {
    const width = widthOf(element, pxPerM, isBesideCable(elements, index));
    // A part beside the load or beside another part needs a little wire.
    const needsWire = element.kind === "part" || element.kind === "pad" || element.kind === "transformer";
    const isAtOneTee = element.kind === "stub" && elements[index + 1]?.kind === "stub";
    if (isAtOneTee) x = rounded(x - besideStubPx);
    const gap = needsWire ? gapPx : 0;
    items.unshift({ element, fromX: rounded(x - gap / 2 - width), toX: rounded(x - gap / 2) });
    x = rounded(x - width - gap);
  }
  return squeezed({ items, pxPerM, startX: x });
}

/** From one piece to the next across what is left between two stubs at one tee, px along the line. */
export function teeLinks<L>({ items }: CutLayout<L>): [number, number][] {
  return items.flatMap(({ element, toX }, i): [number, number][] => {
    const next = items[i + 1];
    return next && element.kind === "stub" && next.element.kind === "stub" ? [[toX, next.fromX]] : [];
  });
}

/** How a stub is drawn: folded back under the line when it is alone, long and has the room, else hanging. */
export function hangOf<L>(layout: CutLayout<L>, index: number): StubHang {
  const item = layout.items[index];
  if (item?.element.kind !== "stub")
    return { isFolded: false, words: "right", clearPx: 0, lengthPx: 0, isBroken: false };
  const wanted = item.element.lengthM * layout.pxPerM;
  const stubs = layout.items.flatMap(({ element }, i) => (element.kind === "stub" ? [i] : []));
  const middle = (item.fromX + item.toX) / 2;
  if (wanted > mostHangPx && stubs.length === 1 && wanted < middle - 28)
    return { isFolded: true, words: "below", clearPx: 0, lengthPx: rounded(wanted), isBroken: false };
  const isLeftmost = stubs.length > 1 && stubs[0] === index;
  const isByTheEdge = middle > cutFrame.loadX - wordsPx;
  const outer = middle < leftWordsPx ? "under" : "left";
  return {
    isFolded: false,
    words: isLeftmost ? outer : isByTheEdge ? "below" : "right",
    clearPx: stubs.length > 1 ? mostHangPx : 0,
    lengthPx: rounded(Math.max(14, Math.min(mostHangPx, wanted))),
    isBroken: wanted > mostHangPx,
  };
}

/** Whether the words of a part across the line stand at its left: another one follows, whose words need the right. */
export function isLeftOfAnother<L>({ items }: CutLayout<L>, index: number): boolean {
  const isAcross = ({ element }: CutItem<L>) => element.kind === "part" && element.connection === "shunt";
  return items.slice(index + 1).some(isAcross);
}
