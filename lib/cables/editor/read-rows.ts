/** The rows of the loss table as typed -> SI, or a sentence for a cell. Loads the reader of units. */
import type { RowTexts } from "@/lib/cables/editor/texts";
import { lossUnits, type LossUnit } from "@/lib/cables/pasting/units";
import type { LossTableInput } from "@/lib/cables/ways/loss-way";
import { readQuantity, type Read } from "@/lib/format/read-quantity";

type LossRowInput = LossTableInput["rows"][number];

export interface ReadRows {
  rows: LossRowInput[];
  /** for each row typed, which of `rows` it became; -1 where it was not read */
  places: number[];
  /** by the cell's path, "rows.2.loss" */
  faults: Record<string, string>;
}

const plainNumber = /^(\d+[.,]?\d*|[.,]\d+)(e[+-]?\d+)?$/i;
const thousand = /^[1-9]\d{0,2},\d{3}$/;

function readFrequency(text: string): Read<number> {
  const typed = text.trim();
  if (plainNumber.test(typed) && !thousand.test(typed))
    return { ok: true, value: Number((Number(typed.replace(",", ".")) * 1e6).toPrecision(12)), understood: "" };
  return readQuantity("frequency", /[a-z]/i.test(typed) ? typed : `${typed} MHz`);
}

function readLoss(text: string, unit: LossUnit): Read<number> {
  const typed = text.trim();
  if (plainNumber.test(typed) && !thousand.test(typed))
    return {
      ok: true,
      value: Number((Number(typed.replace(",", ".")) * lossUnits[unit]).toPrecision(12)),
      understood: "",
    };
  return readQuantity("lossPerLength", /[a-z]/i.test(typed) ? typed : `${typed} ${unit}`);
}

const aboveNothing = (read: Read<number>): Read<number> =>
  read.ok && !(read.value > 0) ? { ok: false, message: "More than 0." } : read;

/** Reads the rows; one with both cells empty is none, and a frequency may stand in the table once. */
export function readRows(texts: readonly RowTexts[], unit: LossUnit): ReadRows {
  const answer: ReadRows = { rows: [], places: [], faults: {} };
  const seen = new Set<number>();
  texts.forEach(({ frequency, loss, isLeftOut, note }, i) => {
    answer.places.push(-1);
    if (frequency.trim() === "" && loss.trim() === "") return;
    const [at, value] = [aboveNothing(readFrequency(frequency)), aboveNothing(readLoss(loss, unit))];
    if (!at.ok) answer.faults[`rows.${i}.frequency`] = at.message;
    if (!value.ok) answer.faults[`rows.${i}.loss`] = value.message;
    if (!at.ok || !value.ok) return;
    if (seen.has(at.value)) {
      answer.faults[`rows.${i}.frequency`] = "This frequency stands in the table already.";
      return;
    }
    seen.add(at.value);
    answer.places[i] = answer.rows.length;
    const typed = `${loss.trim()} ${/[a-z]/i.test(loss) ? "" : unit}`.trim();
    answer.rows.push({
      frequencyHz: at.value,
      lossDbPerM: value.value,
      typed: `${typed} at ${frequency.trim()}${/[a-z]/i.test(frequency) ? "" : " MHz"}`.slice(0, 120),
      ...(isLeftOut && { isLeftOut }),
      ...(note.trim() && { note: note.trim().slice(0, 300) }),
    });
  });
  return answer;
}
