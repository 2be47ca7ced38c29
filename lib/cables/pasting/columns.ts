/** Which column of a paste is which, and what its numbers and units mean. Pure. */
import type { Cells } from "@/lib/cables/pasting/cells";
import { commaMeaning, type CommaMeaning, isNumeric, splitCell } from "@/lib/cables/pasting/numbers";
import { Refused } from "@/lib/cables/pasting/refused";
import {
  type FrequencyUnit,
  frequencyUnitsIn,
  type LossUnit,
  lossUnitsIn,
  namesLoss,
} from "@/lib/cables/pasting/units";

/** Units that somebody has said, where the table does not. */
export interface Told {
  frequencyUnit?: FrequencyUnit;
  lossUnit?: LossUnit;
}

export type Body = Cells["rows"];
export interface Columns {
  frequency: number;
  loss: number;
}

const columnText = (head: readonly string[][], column: number) => head.map((cells) => cells[column] ?? "").join(" ");

/** Which column is which: by what the head says, else frequency first and loss second where there are only two. */
export function columnsOf(head: readonly string[][], body: Body): Columns {
  const width = body.reduce((most, { cells }) => Math.max(most, cells.length), 0);
  const numeric = Array.from({ length: width }, (_, i) => i).filter((i) =>
    body.some(({ cells }) => isNumeric(cells[i] ?? "")),
  );
  const said = (i: number) => `${columnText(head, i)} ${body[0]?.cells[i] ?? ""}`;
  const frequencies = numeric.filter((i) => frequencyUnitsIn(said(i)).length > 0 || /freq/i.test(columnText(head, i)));
  const metric = numeric.filter((i) => lossUnitsIn(said(i)).includes("dB/100 m"));
  const losses = numeric.filter((i) => lossUnitsIn(said(i)).length > 0 || namesLoss(columnText(head, i)));
  const frequency = frequencies[0] ?? numeric.find((i) => !losses.includes(i));
  const others = numeric.filter((i) => i !== frequency);
  const loss =
    metric.find((i) => i !== frequency) ??
    losses.find((i) => i !== frequency) ??
    (others.length === 1 ? others[0] : undefined);
  if (frequency === undefined || loss === undefined)
    throw new Refused(
      "Which column is the loss cannot be told: paste two columns, or name their units in the first row.",
    );
  return { frequency, loss };
}

export function commasOf(body: Body, { frequency, loss }: Columns, separator: string): CommaMeaning {
  if (separator === "commas") {
    const uneven = body.find(
      ({ cells }) => cells.length > Math.max(frequency, loss) + 1 && cells.length !== body[0]?.cells.length,
    );
    const isSplit =
      body.every(({ cells }) => cells.length === 4 || cells.length === 3) &&
      body.length > 0 &&
      loss === 1 &&
      (body[0]?.cells.length ?? 0) > 2;
    if (uneven || isSplit)
      throw new Refused(
        "Commas seem to stand both between columns and in numbers: paste with tabs or semicolons between the columns.",
      );
    return "thousands";
  }
  const numbers = body.flatMap(({ cells }) =>
    [cells[frequency], cells[loss]].flatMap((cell) => splitCell(cell ?? "")?.number ?? []),
  );
  const meaning = commaMeaning(numbers);
  if (meaning === "mixed")
    throw new Refused("Some commas are decimals and some stand between thousands: write all numbers one way.");
  if (meaning !== null) return meaning;
  const doubtful = numbers.find((number) => number.includes(","));
  throw new Refused(`Is “${doubtful}” a thousand or a decimal? Write it with a point, or without the comma.`);
}

function one<T>(found: readonly T[], what: string): T | undefined {
  if (found.length > 1)
    throw new Refused(`The head names several units of ${what}, ${found.join(" and ")}: leave one.`);
  return found[0];
}

export function frequencyUnitOf(
  head: string[][],
  body: Body,
  { frequency }: Columns,
  told: Told,
): FrequencyUnit | null {
  const ofHead = one(frequencyUnitsIn(columnText(head, frequency)), "frequency") ?? told.frequencyUnit;
  if (ofHead) return ofHead;
  const bare = body.find(
    ({ cells }) => isNumeric(cells[frequency] ?? "") && frequencyUnitsIn(cells[frequency] ?? "").length === 0,
  );
  if (!bare) return null;
  const elsewhere = frequencyUnitsIn(head.flat().join(" "));
  if (elsewhere.length === 1) return elsewhere[0] ?? null;
  throw new Refused("The unit of the frequency is not given: is it MHz or GHz?", "frequencyUnit");
}

export function lossUnitOf(head: string[][], body: Body, { loss }: Columns, told: Told): LossUnit | null {
  const inHead = lossUnitsIn(columnText(head, loss));
  const elsewhere = inHead.length > 0 ? inHead : lossUnitsIn(head.flat().join(" "));
  const ofHead = one(elsewhere, "loss");
  if (elsewhere.length === 1 && ofHead === undefined)
    throw new Refused("The unit of the loss is none that is known: dB or Np, per 100 m, 100 ft, km or m.", "lossUnit");
  if (ofHead ?? told.lossUnit) return ofHead ?? told.lossUnit ?? null;
  const bare = body.find(({ cells }) => isNumeric(cells[loss] ?? "") && lossUnitsIn(cells[loss] ?? "").length === 0);
  if (!bare) return null;
  throw new Refused("The unit of the loss is not given: is it dB/100 m or dB/100 ft?", "lossUnit");
}
