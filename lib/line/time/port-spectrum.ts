/** Voltage and current at one plane over a whole grid of s, and the steps that carry them toward the source. */
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";
import { roundTripOf, type LineSpectrum } from "@/lib/line/time/line-spectrum";
import { spectrum, type Spectrum } from "@/lib/line/time/spectrum";
import type { RationalPort } from "@/lib/line/time/rational-port";
import type { TwoPortAt } from "@/lib/line/two-port";

/** The true values are e^{theta} times those in v and i, over those at the end that the walk began at. */
export interface PortSpectrum {
  /** volt */
  v: Spectrum;
  /** ampere */
  i: Spectrum;
  /** neper and radian */
  theta: Spectrum;
}

function putPolynomial(out: Spectrum, [c0, c1, c2]: RationalPort["v"], { count, damping, omega }: LaplaceGrid): void {
  if (c1 === 0 && c2 === 0) {
    out.re.fill(c0);
    return;
  }
  for (let k = 0; k < count; k++) {
    const w = omega[k]!;
    out.re[k] = c0 + damping * c1 + (damping * damping - w * w) * c2;
    out.im[k] = w * c1 + 2 * damping * w * c2;
  }
}

/** Voltage and current of a branch or a source. */
export function branchSpectrum(port: RationalPort, grid: LaplaceGrid): Pick<PortSpectrum, "v" | "i"> {
  const result = { v: spectrum(grid.count), i: spectrum(grid.count) };
  putPolynomial(result.v, port.v, grid);
  putPolynomial(result.i, port.i, grid);
  return result;
}

/** The end that a walk begins at. */
export function portSpectrum(port: RationalPort, grid: LaplaceGrid): PortSpectrum {
  return { ...branchSpectrum(port, grid), theta: spectrum(grid.count) };
}

/**
 * Through a length of line: with e = e^{−2γl}, v ← ((v + Zc·i) + (v − Zc·i)·e)/2, i ← ((v + Zc·i) − (v − Zc·i)·e)/2Zc,
 * and γl into theta.
 * @param paralleled - identical cables side by side
 */
export function throughLine(at: PortSpectrum, line: LineSpectrum, length: number, paralleled: number): void {
  const { v, i, theta } = at;
  const { gamma, zc, yc } = line;
  const e = roundTripOf(line, length);
  const share = 1 / paralleled;
  for (let k = 0; k < v.re.length; k++) {
    theta.re[k]! += gamma.re[k]! * length;
    theta.im[k]! += gamma.im[k]! * length;
    const eRe = e.re[k]!;
    const eIm = e.im[k]!;
    const zRe = zc.re[k]! * share;
    const zIm = zc.im[k]! * share;
    const iRe = i.re[k]!;
    const iIm = i.im[k]!;
    const ziRe = zRe * iRe - zIm * iIm;
    const ziIm = zRe * iIm + zIm * iRe;
    const awayRe = v.re[k]! + ziRe;
    const awayIm = v.im[k]! + ziIm;
    const gapRe = v.re[k]! - ziRe;
    const gapIm = v.im[k]! - ziIm;
    const backRe = gapRe * eRe - gapIm * eIm;
    const backIm = gapRe * eIm + gapIm * eRe;
    v.re[k] = (awayRe + backRe) * 0.5;
    v.im[k] = (awayIm + backIm) * 0.5;
    const differenceRe = (awayRe - backRe) * 0.5;
    const differenceIm = (awayIm - backIm) * 0.5;
    const yRe = yc.re[k]! * paralleled;
    const yIm = yc.im[k]! * paralleled;
    i.re[k] = yRe * differenceRe - yIm * differenceIm;
    i.im[k] = yRe * differenceIm + yIm * differenceRe;
  }
}

/**
 * Across a branch: current of the branch added to what passes.
 * @returns false where the branch is a dead short: nothing passes, and the walk begins anew from it
 */
export function acrossBranch(at: PortSpectrum, branch: Pick<PortSpectrum, "v" | "i">): boolean {
  return addRatio(at.i, branch.i, branch.v, at.v) || beginAnew(at, at.v, at.i);
}

/** In series with a branch; false where it is open. */
export function alongBranch(at: PortSpectrum, branch: Pick<PortSpectrum, "v" | "i">): boolean {
  return addRatio(at.v, branch.v, branch.i, at.i) || beginAnew(at, at.i, at.v);
}

/** sum ← sum + (up/down)·by, unless down is 0. */
function addRatio(sum: Spectrum, up: Spectrum, down: Spectrum, by: Spectrum): boolean {
  if (down.re[0] === 0 && down.im[0] === 0) return false;
  for (let k = 0; k < sum.re.length; k++) {
    const downRe = down.re[k]!;
    const downIm = down.im[k]!;
    const perSize = 1 / (downRe * downRe + downIm * downIm);
    const re = (up.re[k]! * downRe + up.im[k]! * downIm) * perSize;
    const im = (up.im[k]! * downRe - up.re[k]! * downIm) * perSize;
    sum.re[k]! += re * by.re[k]! - im * by.im[k]!;
    sum.im[k]! += re * by.im[k]! + im * by.re[k]!;
  }
  return true;
}

function beginAnew({ theta }: PortSpectrum, none: Spectrum, one: Spectrum): false {
  none.re.fill(0);
  none.im.fill(0);
  one.re.fill(1);
  one.im.fill(0);
  theta.re.fill(0);
  theta.im.fill(0);
  return false;
}

/** Through any two-port, worked out one s after the other. */
export function throughAny(at: PortSpectrum, twoPort: TwoPortAt, { damping, omega }: LaplaceGrid): void {
  const { v, i, theta } = at;
  for (let k = 0; k < v.re.length; k++) {
    const { a, b, c, d, logScale } = twoPort({ re: damping, im: omega[k]! });
    const [vRe, vIm, iRe, iIm] = [v.re[k]!, v.im[k]!, i.re[k]!, i.im[k]!];
    v.re[k] = a.re * vRe - a.im * vIm + (b.re * iRe - b.im * iIm);
    v.im[k] = a.re * vIm + a.im * vRe + (b.re * iIm + b.im * iRe);
    i.re[k] = c.re * vRe - c.im * vIm + (d.re * iRe - d.im * iIm);
    i.im[k] = c.re * vIm + c.im * vRe + (d.re * iIm + d.im * iRe);
    theta.re[k]! += logScale;
  }
}

/** Brings values that have grown or shrunk far back to about 1; theta remembers by how much. */
export function normalise({ v, i, theta }: PortSpectrum): void {
  for (let k = 0; k < v.re.length; k++) {
    const size = Math.max(Math.abs(v.re[k]!), Math.abs(v.im[k]!), Math.abs(i.re[k]!), Math.abs(i.im[k]!));
    if (size <= 1e60 && size >= 1e-60) continue;
    v.re[k]! /= size;
    v.im[k]! /= size;
    i.re[k]! /= size;
    i.im[k]! /= size;
    theta.re[k]! += Math.log(size);
  }
}
