/**
 * Two equal sections between two resistances, made of lines of those same two resistances in exchanged order. With
 * R = R2/R1 each is arctan(1/√(R + 1 + 1/R)) long: 1/12 wavelength where the resistances are near each other.
 * @param ratio - one resistance over the other, above 0
 * @returns wavelengths of each section's own line, at most 1/12; a half wave less it is the other solution
 * Source: derived here from the input impedance of two sections; the same length follows from P. Bramham, A convenient
 * transformer for matching co-axial lines, Electronic Engineering 33 (1961) 42.
 */
export function alternatingLength(ratio: number): number {
  if (!(ratio > 0 && ratio < Infinity))
    throw new RangeError(`alternatingLength: the ratio must be positive, got ${ratio}`);
  return Math.atan(1 / Math.sqrt(ratio + 1 + 1 / ratio)) / (2 * Math.PI);
}
