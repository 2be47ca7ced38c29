/** Phase of a sample over frequency, whole turns put back. */

const turn = 2 * Math.PI;
/** A phase that rises may be said to fall by this much, radians, before it is a turn: noise. */
const fallAllowed = Math.PI / 4;
const fewestForSlope = 8;

export interface Unwrapped {
  /** radians, rising */
  phase: Float64Array;
  /** whole turns the first frequency was found to have, from the slope */
  turns: number;
  /** the largest step between neighbours, radians: near a turn it may be one more */
  largestStep: number;
}

/**
 * Puts whole turns back into a phase that rises with frequency and, but for the conductors' part, in proportion to it.
 * That part equals the attenuation in neper: inside a conductor reactance and resistance rise together. So phase less
 * attenuation is a straight line through the origin, which tells the turns of the first frequency.
 * @param angle - radians, any turn of each
 * @param attenuation - neper, counted as the phase is
 * @param frequencies - hertz, ascending
 */
export function unwrapped(angle: Float64Array, attenuation: Float64Array, frequencies: ArrayLike<number>): Unwrapped {
  const phase = Float64Array.from(angle);
  let largestStep = 0;
  for (let k = 1; k < phase.length; k++) {
    const before = phase[k - 1] ?? NaN;
    const step = (phase[k] ?? NaN) - before + fallAllowed;
    const rising = step - turn * Math.floor(step / turn) - fallAllowed;
    largestStep = Math.max(largestStep, rising);
    phase[k] = before + rising;
  }
  const straight = phase.map((value, k) => value - (attenuation[k] ?? NaN));
  const turns = Math.round(-interceptOf(straight, frequencies) / turn);
  return { phase: phase.map((value) => value + turns * turn), turns, largestStep };
}

/** Where the line through the lower part of a curve meets frequency 0; one point is its own angle. */
function interceptOf(values: Float64Array, frequencies: ArrayLike<number>): number {
  const first = frequencies[0] ?? NaN;
  let count = 0;
  let [x, y, xx, xy] = [0, 0, 0, 0];
  for (let k = 0; k < values.length && (k < fewestForSlope || (frequencies[k] ?? NaN) <= 4 * first); k++, count++) {
    const f = (frequencies[k] ?? NaN) / first;
    const value = values[k] ?? NaN;
    x += f;
    y += value;
    xx += f * f;
    xy += f * value;
  }
  const spread = count * xx - x * x;
  return spread > 1e-9 * count * xx ? (y * xx - x * xy) / spread : 0;
}
