/** Figures of axes and limits: as many digits as they have, and no more. */
import { digits, unitFor } from "@/lib/format/quantity";

/** A figure that somebody set, all its digits and no more: 14, 2.205. */
export function asGiven(value: number): string {
  const short = Number(value.toPrecision(12));
  return digits(short, Math.min(9, short.toString().split(".")[1]?.length ?? 0));
}

/** The unit for an axis of frequencies, and the digits of each on it; to a millionth of the highest. */
export function frequencyAxis(highest: number): { unit: string; format: (value: number) => string } {
  const { symbol, factor } = unitFor("frequency", highest * 0.2);
  const format = (value: number) => {
    const short = Number((value / factor).toPrecision(6));
    return digits(short, Math.min(6, short.toString().split(".")[1]?.length ?? 0));
  };
  return { unit: symbol, format };
}
