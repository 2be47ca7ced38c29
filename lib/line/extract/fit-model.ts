/** The model of a cable whose impedance and propagation constant are known over frequency. */
import { propagation } from "@/lib/line/cable";
import type { Conductor, ConductorForm, LineModel } from "@/lib/line/element";
import type { MeasuredLine } from "@/lib/line/extract/per-metre";
import { leastSquares, type LeastSquares, type Unknown } from "@/lib/line/least-squares";
import { MOST_LOSS_TANGENT } from "@/lib/line/refit";

/** Points a fit needs at most: more say the same again. */
const mostPoints = 100;
/**
 * Neper of the sample at which its attenuation counts for seven tenths: an error of a thousandth in the data is then as
 * much as a model of one term is off anyway.
 */
const fairLoss = 0.05;
/** Relative error, rms of a point, of a fit that needs no other start. */
const goodEnough = 1e-5;
const tangentUnit = 1e-3;

/** One frequency: what the fit is held against, and how much its attenuation counts. */
interface Point {
  omega: number;
  /** neper per metre, above 0 */
  alpha: number;
  /** radians per metre, above 0 */
  beta: number;
  /** ohm */
  size: number;
  /** of the impedance, radians */
  angle: number;
  weight: number;
}

export interface SweepModel {
  model: LineModel;
  /** whether the sweep reaches down to the skin corner, so that dc resistance is in it */
  reachesCorner: boolean;
}

/**
 * Fits R0, skin corner, L∞, C and tan δ to attenuation, phase and impedance where all are known, each by its relative
 * error. Attenuation is held as it is, not as R and G: those are small differences of what was measured, and what the
 * conductors and the dielectric each lose is told by how loss rises with frequency.
 * @param length - of the sample, metre
 * @param form - of the one conductor term
 * @param r0 - dc resistance, ohm per metre, where it is known apart
 * @throws RangeError when there are fewer than three such points
 */
export function fitToMeasured(measured: MeasuredLine, length: number, form: ConductorForm, r0?: number): SweepModel {
  const points = pointsOf(measured, length);
  if (points.length < 3) throw new RangeError("fitToMeasured: at least three sound frequencies are needed");
  const { unknowns, modelAt } = trialOf(points, form, r0);
  const residuals = (at: readonly number[], into: Float64Array) => fillResiduals(points, modelAt(at), into);
  // the valley of resistance and corner is long: where the first end is poor, others are begun from other corners
  let best: LeastSquares | undefined;
  for (const start of [0, -3, 3]) {
    const end = leastSquares(residuals, 4 * points.length, unknowns.with(-1, startingAt(unknowns.at(-1), start)));
    if (!best || end.sum < best.sum) best = end;
    if (best.sum < goodEnough ** 2 * points.length) break;
  }
  const model = modelAt(best?.at ?? []);
  const corner = model.conductors[0]?.skinCornerRadPerS;
  const lowest = points[0]?.omega ?? NaN;
  return { model, reachesCorner: r0 !== undefined || corner === undefined || lowest < 4 * corner };
}

/** At most so many of the points, half of them even by number, half even by the logarithm of frequency. */
function pointsOf(measured: MeasuredLine, length: number): Point[] {
  const { frequencies, zc, attenuation, phase, hasImpedance, isSeen } = measured;
  const all: Point[] = [];
  for (let k = 0; k < frequencies.length; k++) {
    const [alpha, beta] = [attenuation[k] ?? NaN, phase[k] ?? NaN];
    if (!hasImpedance[k] || !isSeen[k] || !(beta > 0)) continue;
    const [re, im] = [zc.re[k] ?? NaN, zc.im[k] ?? NaN];
    const neper = Math.max(alpha, 0) * length;
    all.push({
      omega: 2 * Math.PI * (frequencies[k] ?? NaN),
      alpha: Math.max(alpha, 1e-9 * beta),
      beta,
      size: Math.hypot(re, im),
      angle: Math.atan2(im, re),
      weight: neper / Math.hypot(neper, fairLoss),
    });
  }
  return all.length <= mostPoints ? all : thinned(all);
}

function thinned(all: readonly Point[]): Point[] {
  const chosen = new Set<Point>();
  const [low, high] = [all[0]?.omega ?? NaN, all.at(-1)?.omega ?? NaN];
  for (let n = 0, k = 0; n < mostPoints / 2; n++) {
    const part = n / (mostPoints / 2 - 1);
    const wanted = low * (high / low) ** part * (1 - 1e-12);
    while (k < all.length - 1 && (all[k]?.omega ?? NaN) < wanted) k++;
    for (const index of [Math.round(part * (all.length - 1)), k]) chosen.add(all[index] as Point);
  }
  return [...chosen].sort((a, b) => a.omega - b.omega);
}

function fillResiduals(points: readonly Point[], model: LineModel, into: Float64Array): void {
  points.forEach(({ omega, alpha, beta, size, angle, weight }, k) => {
    const { gamma, zc } = propagation(model, { re: 0, im: omega });
    into[4 * k] = weight * (gamma.re / alpha - 1);
    into[4 * k + 1] = gamma.im / beta - 1;
    into[4 * k + 2] = Math.hypot(zc.re, zc.im) / size - 1;
    into[4 * k + 3] = Math.atan2(zc.im, zc.re) - angle;
  });
}

const startingAt = (unknown: Unknown | undefined, start: number): Unknown => ({ low: 0, high: 0, ...unknown, start });

/** The unknowns, each of the order of 1, and the model they make; the last is the logarithm of the skin corner. */
function trialOf(points: readonly Point[], form: ConductorForm, known: number | undefined) {
  const [first, last] = [points[0] as Point, points.at(-1) as Point];
  const inductance = (last.beta * last.size) / last.omega;
  const capacitance = last.beta / (last.size * last.omega);
  // a line of low loss loses R/2Z; taken to be so throughout, it is a start
  const [low, high] = [first, last].map(({ alpha, size }) => 2 * alpha * size) as [number, number];
  const scale = known ?? Math.min(low, high);
  const corner = Math.min(Math.max(last.omega * (scale / high) ** 2, 1e-3 * first.omega), 10 * last.omega);
  const hasCorner = form !== "constant" && scale > 0;
  const reach = hasCorner ? Math.log(1e6) : 0;
  // far above the corner only R0/√ωs can be known: that is one unknown, the corner the other
  const modelAt = ([l = 0, c = 0, d = 0, r = 1, s = 0]: readonly number[]): LineModel => {
    const r0OhmPerM = known ?? scale * r * Math.exp(hasCorner ? s / 2 : 0);
    const conductor: Conductor = hasCorner
      ? { form, r0OhmPerM, skinCornerRadPerS: corner * Math.exp(s) }
      : { form: "constant", r0OhmPerM };
    return {
      conductors: [conductor],
      lInfHPerM: inductance * Math.exp(l),
      cFPerM: capacitance * Math.exp(c),
      lossTangent: d * tangentUnit,
    };
  };
  // as if the dielectric lost half of what is lost at the highest frequency
  const start = Math.min(last.alpha / last.beta, MOST_LOSS_TANGENT) / tangentUnit;
  const tangents: Unknown = { start, low: 0, high: MOST_LOSS_TANGENT / tangentUnit };
  const nearly = { start: 0, low: -2, high: 2 };
  const resistance = known === undefined ? { start: 1, low: 0, high: 1e3 } : { start: 1, low: 1, high: 1 };
  const unknowns: Unknown[] = [nearly, nearly, tangents, resistance, { start: 0, low: -reach, high: reach }];
  return { unknowns, modelAt };
}
