/** Complex values over a grid. */
export interface Spectrum {
  re: Float64Array;
  im: Float64Array;
}

/** Values to a chunk that spectra are cut from; making a buffer costs more than filling it. */
const chunkLength = 1 << 16;
let chunk = new Float64Array(0);
let used = 0;

/** All 0. Nobody else has these values; a chunk goes when the last spectrum cut from it does. */
export function spectrum(count: number): Spectrum {
  if (8 * count > chunkLength) return { re: new Float64Array(count), im: new Float64Array(count) };
  if (used + 2 * count > chunk.length) {
    chunk = new Float64Array(chunkLength);
    used = 0;
  }
  const re = chunk.subarray(used, used + count);
  const im = chunk.subarray(used + count, used + 2 * count);
  used += 2 * count;
  return { re, im };
}

export function copyOf({ re, im }: Spectrum): Spectrum {
  const copy = spectrum(re.length);
  copy.re.set(re);
  copy.im.set(im);
  return copy;
}
