/** The engine's numbers on the wire: what has no finite number is null. Pure. */
import type { ComplexArray } from "@/lib/line/line-figures";

export type WireNumber = number | null;

export function wireNumber(value: number | null): WireNumber {
  return value !== null && Number.isFinite(value) ? value : null;
}

export function wireNumbers(values: ArrayLike<number>): WireNumber[] {
  return Array.from(values, wireNumber);
}

/** A complex quantity without a finite part has neither part: half an impedance means nothing. */
export function wireComplex({ re, im }: ComplexArray): { re: WireNumber[]; im: WireNumber[] } {
  const isFinite = (k: number) => Number.isFinite(re[k]) && Number.isFinite(im[k]);
  return {
    re: Array.from(re, (value, k) => (isFinite(k) ? value : null)),
    im: Array.from(im, (value, k) => (isFinite(k) ? value : null)),
  };
}
