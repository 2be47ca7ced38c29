/** Which of the quantities that are spread matters most. */
import type { MovedResponse } from "@/lib/line/moved-response";
import type { Spread } from "@/lib/line/spread";

export interface Contributor {
  path: string;
  /** the larger of the two below */
  effectDb: number;
  /** what the worst return loss over the frequencies changes by, while this alone goes from limit to limit */
  returnLossEffectDb: number;
  /** the same of the worst transducer loss; 0 where there is none */
  transducerLossEffectDb: number;
}

/** Places looked at between and on the limits: a phase or a length may be worst in between. */
export const contributorLevels = 9;

/** A return loss beyond this counts as this much: nobody could tell. */
const perfectDb = 60;

/**
 * The effect of one quantity, the rest as drawn.
 * @param drawn - every quantity as drawn; left as it is
 * @param index - which of them moves
 */
export function contributorOf(
  { respond }: MovedResponse,
  spread: readonly Spread[],
  index: number,
  drawn: Float64Array,
  frequencies: number,
): Contributor {
  const { path, limits } = spread[index]!;
  const [low, high] = limits;
  const values = Float64Array.from(drawn);
  const returnLoss = new Float64Array(frequencies);
  const transducerLoss = new Float64Array(frequencies);
  const range = { match: [Infinity, -Infinity], loss: [Infinity, -Infinity] } as Record<string, [number, number]>;
  for (let n = 0; n < contributorLevels; n++) {
    values[index] = low + ((high - low) * n) / (contributorLevels - 1);
    respond(values, returnLoss, transducerLoss, 0);
    widen(
      range.match!,
      returnLoss.reduce((least, value) => Math.min(least, value), perfectDb),
    );
    widen(
      range.loss!,
      transducerLoss.reduce((most, value) => Math.max(most, value), 0),
    );
  }
  const returnLossEffectDb = wide(range.match!);
  const transducerLossEffectDb = wide(range.loss!);
  const effectDb = Math.max(returnLossEffectDb, transducerLossEffectDb);
  return { path, effectDb, returnLossEffectDb, transducerLossEffectDb };
}

function widen(range: [number, number], value: number): void {
  range[0] = Math.min(range[0], value);
  range[1] = Math.max(range[1], value);
}

/** NaN, where there is nothing to measure, and a loss that is infinite throughout, are no effect. */
function wide([least, most]: [number, number]): number {
  return most - least > 0 ? most - least : 0;
}

/** Largest first; of the same effect in the order given. */
export function ranked(contributors: readonly Contributor[]): Contributor[] {
  return [...contributors].sort((a, b) => b.effectDb - a.effectDb);
}
