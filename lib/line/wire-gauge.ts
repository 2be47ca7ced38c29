/**
 * Diameter of a wire of the American gauge, metre: 0.005 inch · 92^((36 − n)/39).
 * @param gauge - 24 for 24 AWG; 0 for 1/0, −1 for 2/0, −3 for 4/0; −3 to 56
 * @throws RangeError when the gauge is out of range
 * Source: ASTM B258, whose anchors are 0.0050 in for 36 AWG and 0.4600 in for 4/0.
 */
export function wireGaugeDiameter(gauge: number): number {
  if (!(gauge >= -3 && gauge <= 56))
    throw new RangeError(`wireGaugeDiameter: gauge must be from -3 to 56, got ${gauge}`);
  return 0.005 * 0.0254 * 92 ** ((36 - gauge) / 39);
}
