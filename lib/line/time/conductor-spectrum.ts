/** Conductor terms over a whole grid of s at once; the readable form is `conductor.ts`, tests hold both against each other. */
import type { Conductor } from "@/lib/line/element";
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";
import type { Spectrum } from "@/lib/line/time/spectrum";

/**
 * Adds the impedance of a conductor; each form as in `conductorImpedance`.
 * @param z - ohm per metre, added to
 * @throws RangeError when a form that needs a skin corner has none above 0
 */
export function addConductor({ form, r0OhmPerM, skinCornerRadPerS }: Conductor, grid: LaplaceGrid, z: Spectrum): void {
  if (form === "constant" || r0OhmPerM === 0) {
    for (let k = 0; k < grid.count; k++) z.re[k]! += r0OhmPerM;
    return;
  }
  if (skinCornerRadPerS === undefined || !(skinCornerRadPerS > 0))
    throw new RangeError(`addConductor: skinCornerRadPerS must be positive for ${form}, got ${skinCornerRadPerS}`);
  const add = { sqrt: addSqrt, round: addRound, sheet: addSheet }[form];
  add(r0OhmPerM, skinCornerRadPerS, grid, z);
}

type AddTerm = (r0: number, corner: number, grid: LaplaceGrid, z: Spectrum) => void;

/** √(1 + p); the real part of 1 + p is above 0, so both parts come from the same root. */
const addSqrt: AddTerm = (r0, corner, { count, damping, omega }, z) => {
  const re = 1 + damping / corner;
  for (let k = 0; k < count; k++) {
    const im = omega[k]! / corner;
    const larger = Math.sqrt((Math.sqrt(re * re + im * im) + re) / 2);
    z.re[k]! += r0 * larger;
    z.im[k]! += (r0 * im) / (2 * larger);
  }
};

/** 1 + (p/2) / (1 + 2p / (5 + √(49 + 16p))). */
const addRound: AddTerm = (r0, corner, { count, damping, omega }, z) => {
  const pRe = damping / corner;
  const under = 49 + 16 * pRe;
  const perCorner = 1 / corner;
  for (let k = 0; k < count; k++) {
    const pIm = omega[k]! * perCorner;
    const larger = Math.sqrt((Math.sqrt(under * under + 256 * pIm * pIm) + under) / 2);
    const rootRe = 5 + larger;
    const rootIm = (8 * pIm) / larger;
    const perRoot = 2 / (rootRe * rootRe + rootIm * rootIm);
    const downRe = 1 + (pRe * rootRe + pIm * rootIm) * perRoot;
    const downIm = (pIm * rootRe - pRe * rootIm) * perRoot;
    const perDown = (0.5 * r0) / (downRe * downRe + downIm * downIm);
    z.re[k]! += r0 + (pRe * downRe + pIm * downIm) * perDown;
    z.im[k]! += (pIm * downRe - pRe * downIm) * perDown;
  }
};

/** q·coth q with q = √p, as q·(1 + e)/(1 − e), e = e^{−2q}; p is never 0 on a damped grid. */
const addSheet: AddTerm = (r0, corner, { count, damping, omega }, z) => {
  const pRe = damping / corner;
  for (let k = 0; k < count; k++) {
    const pIm = omega[k]! / corner;
    const qRe = Math.sqrt((Math.sqrt(pRe * pRe + pIm * pIm) + pRe) / 2);
    const qIm = pIm / (2 * qRe);
    const decay = Math.exp(-2 * qRe);
    const sine = Math.sin(2 * qIm);
    // tanh q = (sinh 2qRe + j·sin 2qIm) / (cosh 2qRe + cos 2qIm), both over e^{2qRe}/2
    const upRe = -Math.expm1(-4 * qRe);
    const upIm = 2 * decay * sine;
    const down = 1 + decay * decay + 2 * decay * Math.cos(2 * qIm);
    const size = upRe * upRe + upIm * upIm;
    z.re[k]! += (r0 * down * (qRe * upRe + qIm * upIm)) / size;
    z.im[k]! += (r0 * down * (qIm * upRe - qRe * upIm)) / size;
  }
};
