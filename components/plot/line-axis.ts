/** What a plot needs to know of the strip's scale. */
export interface LineAxis {
  startX: number;
  endX: number;
  totalM: number;
  boundariesX: readonly number[];
  x: (distanceM: number) => number;
  xBefore: (distanceM: number) => number;
  m: (x: number) => number;
}
