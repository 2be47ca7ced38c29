/** The figures of a sweep at one frequency, from the voltages and currents of a walk. */
import type { Analytic } from "@/lib/line/analytic";
import { abs2, divide, type Complex } from "@/lib/line/complex";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { ComplexArray } from "@/lib/line/line-figures";
import { PLANE, VALUE } from "@/lib/line/packed";
import { portReflection, returnLossDb, vswr } from "@/lib/line/reflection";
import type { PlaneFigures, Sweep } from "@/lib/line/run";
import { portImpedance } from "@/lib/line/termination";
import { portAt, powerThrough, type Walk } from "@/lib/line/walk";

/** Plane n is before element n; the source is plane 0, the load plane N. The load's plane of an empty run is not the source's. */
export interface PlaneIndex {
  index: number;
  isSource: boolean;
}

function put(array: ComplexArray, k: number, value: Complex): void {
  array.re[k] = value.re;
  array.im[k] = value.im;
}

/** Impedance, reflection, return loss and VSWR where the source meets the run. */
export function fillSourcePlane(result: Sweep, k: number, at: Walk): void {
  const { v, i } = at.input;
  put(result.inputImpedance, k, portImpedance({ v, i }));
  const gamma = portReflection(v, i, at.sourceImpedance);
  put(result.reflection, k, gamma);
  const magnitude = Math.sqrt(abs2(gamma));
  result.returnLossDb[k] = returnLossDb(magnitude);
  result.vswr[k] = vswr(magnitude);
}

/** The same at any plane; the source's own plane reflects power waves, every other in the real reference. */
export function fillPlane(
  figures: PlaneFigures,
  k: number,
  at: Walk,
  { index, isSource }: PlaneIndex,
  reference: number,
): void {
  const { v, i } = portAt(at, index);
  put(figures.impedance, k, portImpedance({ v, i }));
  const gamma = portReflection(v, i, isSource ? at.sourceImpedance : { re: reference, im: 0 });
  put(figures.reflection, k, gamma);
  const magnitude = Math.sqrt(abs2(gamma));
  figures.returnLossDb[k] = returnLossDb(magnitude);
  figures.vswr[k] = vswr(magnitude);
}

/** Reflection of the load, its voltage per volt of e.m.f., and the delay of that. */
export function fillLoad(result: Sweep, k: number, at: Walk, reference: number): void {
  const { load } = at;
  put(result.loadReflection, k, portReflection(load.v, load.i, { re: reference, im: 0 }));
  let scale = 0;
  for (const each of at.scales) scale += each;
  put(result.loadVoltage, k, loadVoltage(at, load.v, scale));
  result.groupDelayS[k] =
    scale === Infinity ? NaN : groupDelay(at, load.v.re === 0 && load.v.im === 0 ? load.i : load.v);
}

function loadVoltage(at: Walk, v: Analytic, scale: number): Complex {
  const factor = Math.exp(-scale);
  if (factor === 0) return { re: 0, im: 0 };
  const { i } = at.source;
  const ratio = divide({ re: v.re * i.re - v.im * i.im, im: v.re * i.im + v.im * i.re }, at.drive);
  return { re: ratio.re * factor, im: ratio.im * factor };
}

/** −Re d ln(quantity·source.i / drive)/ds; on the imaginary axis that is −dφ/dω. */
function groupDelay(at: Walk, quantity: Analytic): number {
  return logSlope(at.drive) - logSlope(quantity) - logSlope(at.source.i);
}

/** Re(a'/a). */
function logSlope(a: Analytic): number {
  return (a.slopeRe * a.re + a.slopeIm * a.im) / (a.re * a.re + a.im * a.im);
}

/**
 * Losses, from powers at every plane: what one element passes on is what the next one takes, so the losses of the
 * elements add up to that of the run.
 */
export function fillLosses(result: Sweep, k: number, at: Walk, reference: number): void {
  const { planes, scales, load } = at;
  const inLoad = Math.max(0, load.v.re * load.i.re + load.v.im * load.i.im);
  let power = inLoad;
  let runLossDb = 0;
  for (let n = scales.length - 1; n >= 0; n--) {
    const scale = scales[n]!;
    const entering = powerAt(planes, n, power * Math.exp(-2 * scale), reference);
    const lossDb =
      power > 0 && scale < Infinity ? Math.max(0, 10 * Math.log10(entering / power) + scale * DB_PER_NEPER) : Infinity;
    result.elementLossDb[n]![k] = lossDb;
    runLossDb += lossDb;
    power = entering;
  }
  if (!(inLoad > 0)) runLossDb = Infinity;
  const matchedLossDb = at.matchedLoss * DB_PER_NEPER;
  const mismatchDb = mismatchDbOf(at, power);
  result.matchedLossDb[k] = matchedLossDb;
  result.mismatchLossDb[k] = mismatchDb;
  result.transducerLossDb[k] = mismatchDb + runLossDb;
  result.extraLossDb[k] = runLossDb - matchedLossDb;
}

function powerAt(planes: Float64Array, plane: number, behind: number, reference: number): number {
  const v = plane * PLANE;
  const i = v + VALUE;
  return powerThrough(planes[v]!, planes[v + 1]!, planes[i]!, planes[i + 1]!, behind, reference);
}

/** Available source power over power into the run, dB: |drive|² / (4·Re(Zs)·|source.i|²·P). */
function mismatchDbOf(at: Walk, power: number): number {
  const { v, i } = at.source;
  const resistive = 4 * (v.re * i.re + v.im * i.im);
  if (!(resistive > 0)) return NaN;
  if (!(power > 0)) return Infinity;
  const { re, im } = at.drive;
  return Math.max(0, 10 * Math.log10((re * re + im * im) / (resistive * power)));
}
