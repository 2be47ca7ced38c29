/** The conductor terms of `conductor.ts` at real frequencies, values only, a column at a time. */
import type { ConductorForm } from "@/lib/line/element";

/**
 * Adds the series impedance of one conductor term at every frequency.
 * @param resistance - dc, ohm per metre, at least 0
 * @param corner - skin corner, rad/s, above 0, not for `constant`
 * @param omega - rad/s, each above 0, length N
 * @param re - ohm per metre, length N, added to
 * @throws RangeError when a form that needs a skin corner has none above 0
 * Source: as `conductorImpedance`.
 */
export function addConductor(
  form: ConductorForm,
  resistance: number,
  corner: number,
  omega: Float64Array,
  re: Float64Array,
  im: Float64Array,
): void {
  if (resistance === 0) return;
  if (form !== "constant" && !(corner > 0))
    throw new RangeError(`addConductor: skinCornerRadPerS must be positive for ${form}, got ${corner}`);
  if (form === "constant") for (let k = 0; k < re.length; k++) re[k]! += resistance;
  else adders[form](resistance, 1 / corner, omega, re, im);
}

type Adder = (r0: number, perCorner: number, omega: Float64Array, re: Float64Array, im: Float64Array) => void;

const adders: Record<Exclude<ConductorForm, "constant">, Adder> = { round: addRound, sheet: addSheet, sqrt: addRoot };

/** r0·√(1 + jx). */
function addRoot(r0: number, perCorner: number, omega: Float64Array, re: Float64Array, im: Float64Array): void {
  for (let k = 0; k < omega.length; k++) {
    const x = omega[k]! * perCorner;
    const root = Math.sqrt((Math.sqrt(1 + x * x) + 1) / 2);
    re[k]! += r0 * root;
    im[k]! += (r0 * x) / (2 * root);
  }
}

/** r0·(1 + (p/2)·(5 + u)/(5 + u + 2p)), u = √(49 + 16p), p = jx. */
function addRound(r0: number, perCorner: number, omega: Float64Array, re: Float64Array, im: Float64Array): void {
  for (let k = 0; k < omega.length; k++) {
    const x = omega[k]! * perCorner;
    const root = Math.sqrt((Math.sqrt(2401 + 256 * x * x) + 49) / 2);
    const a = 5 + root;
    const b = (8 * x) / root;
    const d = b + 2 * x;
    const factor = (r0 * x) / (2 * (a * a + d * d));
    re[k]! += r0 + factor * (a * d - b * a);
    im[k]! += factor * (a * a + b * d);
  }
}

/** Below this y the closed form of a sheet cancels and its series is summed. */
const seriesLimit = 0.1;
/** Above this y both hyperbolic functions are e^y/2 to the last digit. */
const exponentialLimit = 40;

/** r0·q·coth q, q = √(jx): (y/2)·((sinh y + sin y) + j(sinh y − sin y))/(cosh y − cos y), y = √(2x). */
function addSheet(r0: number, perCorner: number, omega: Float64Array, re: Float64Array, im: Float64Array): void {
  for (let k = 0; k < omega.length; k++) {
    const x = omega[k]! * perCorner;
    const y = Math.sqrt(2 * x);
    if (y > exponentialLimit) {
      re[k]! += (r0 * y) / 2;
      im[k]! += (r0 * y) / 2;
    } else if (y < seriesLimit) {
      // 1 + p/3 − p²/45 + 2p³/945 − p⁴/4725 with p = jx
      re[k]! += r0 * (1 + x * x * (1 / 45 - (x * x) / 4725));
      im[k]! += r0 * x * (1 / 3 - (2 * x * x) / 945);
    } else {
      const factor = (r0 * y) / (2 * (Math.cosh(y) - Math.cos(y)));
      re[k]! += factor * (Math.sinh(y) + Math.sin(y));
      im[k]! += factor * (Math.sinh(y) - Math.sin(y));
    }
  }
}
