/** Complex values over a grid. */
export interface Spectrum {
  re: Float64Array;
  im: Float64Array;
}

export function spectrum(count: number): Spectrum {
  return { re: new Float64Array(count), im: new Float64Array(count) };
}
