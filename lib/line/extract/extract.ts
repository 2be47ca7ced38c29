/** From a sweep of a sample of known length to its line: what was measured, the model, and what to beware of. */
import { requirePositive } from "@/lib/line/conductor-shape";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { ConductorForm, LineModel } from "@/lib/line/element";
import { fitToMeasured } from "@/lib/line/extract/fit-model";
import { measuredLine, type MeasuredLine } from "@/lib/line/extract/per-metre";
import {
  onePortPoints,
  type OnePortSweeps,
  type SampleSweep,
  twoPortPoints,
  type TwoPortSweep,
} from "@/lib/line/extract/sample-sweep";
import { type ComplexArray, lineFigures } from "@/lib/line/line-figures";

export interface ExtractRequest {
  /** of the sample, metre, above 0 */
  length: number;
  sweep: { kind: "twoPort"; data: TwoPortSweep } | { kind: "onePorts"; data: OnePortSweeps };
  /** of the one conductor term; default `sqrt` */
  form?: ConductorForm;
  /** dc loop resistance, ohm per metre, where it is known apart */
  r0?: number;
}

export type ExtractWarning =
  | { warning: "impedanceFromNeighbours"; count: number; passes: 1 | 2 }
  | { warning: "turnsFromSlope"; turns: number }
  | { warning: "wideSteps"; largestStep: number }
  | { warning: "fasterThanLight"; velocityFactor: number }
  | { warning: "notReciprocal"; worst: number }
  | { warning: "notSymmetric"; worst: number }
  | { warning: "notPassive"; count: number }
  | { warning: "nothingThrough"; count: number }
  | { warning: "aboveCorner" }
  | { warning: "poorFit"; rmsPercent: number };

/** Model less measured over measured, per cent, one value a frequency; NaN where the measured one is not its own. */
export interface ExtractResiduals {
  attenuationPercent: Float64Array;
  phasePercent: Float64Array;
  zcPercent: Float64Array;
  /** of the attenuation, where the impedance is the point's own */
  rmsPercent: number;
}

export interface Extracted {
  measured: MeasuredLine;
  model: LineModel;
  residuals: ExtractResiduals;
  warnings: ExtractWarning[];
}

/**
 * @throws RangeError when length, a frequency or the reference is not positive, frequencies do not ascend, data are
 * missing, or no frequency holds the sample's impedance
 */
export function extractLine({ length, sweep, form = "sqrt", r0 }: ExtractRequest): Extracted {
  check(length, sweep.data);
  const sample: SampleSweep = sweep.kind === "twoPort" ? twoPortPoints(sweep.data) : onePortPoints(sweep.data);
  const measured = measuredLine(sample, length);
  const { model, reachesCorner } = fitToMeasured(measured, length, form, r0);
  const residuals = residualsOf(measured, model);
  const data = dataWarnings(sweep);
  return {
    measured,
    model,
    residuals,
    warnings: [...data, ...lineWarnings(measured, sample, residuals, reachesCorner)],
  };
}

function check(length: number, { referenceOhm, frequencies, ...data }: TwoPortSweep | OnePortSweeps): void {
  requirePositive("extractLine", { length, referenceOhm });
  for (let k = 0; k < frequencies.length; k++) {
    const [before, frequency] = [k === 0 ? 0 : (frequencies[k - 1] ?? NaN), frequencies[k] ?? NaN];
    if (!(frequency > before && frequency < Infinity))
      throw new RangeError(`extractLine: frequencies must ascend from above 0, got ${frequency} after ${before}`);
  }
  for (const [name, { re, im }] of Object.entries<ComplexArray>(data))
    if (re.length !== frequencies.length || im.length !== frequencies.length)
      throw new RangeError(`extractLine: ${name} needs as many values as there are frequencies`);
}

function residualsOf(
  { frequencies, zc, attenuation, phase, hasImpedance, isSeen }: MeasuredLine,
  model: LineModel,
): ExtractResiduals {
  const figures = lineFigures(model, frequencies);
  const count = frequencies.length;
  const [attenuationPercent, phasePercent, zcPercent] = [0, 1, 2].map(() => new Float64Array(count).fill(NaN));
  let [squares, sound] = [0, 0];
  for (let k = 0; k < count; k++) {
    const loss = (figures.attenuationDbPerM[k] ?? NaN) * (Math.LN10 / 20);
    const error = 100 * (loss / (attenuation[k] ?? NaN) - 1);
    attenuationPercent![k] = error;
    phasePercent![k] = 100 * ((figures.phaseRadPerM[k] ?? NaN) / (phase[k] ?? NaN) - 1);
    if (!hasImpedance[k]) continue;
    const [re, im] = [zc.re[k] ?? NaN, zc.im[k] ?? NaN];
    zcPercent![k] =
      (100 * Math.hypot((figures.zcOhm.re[k] ?? NaN) - re, (figures.zcOhm.im[k] ?? NaN) - im)) / Math.hypot(re, im);
    if (isSeen[k] && Number.isFinite(error)) [squares, sound] = [squares + error * error, sound + 1];
  }
  return {
    attenuationPercent: attenuationPercent!,
    phasePercent: phasePercent!,
    zcPercent: zcPercent!,
    rmsPercent: Math.sqrt(squares / sound),
  };
}

/** More than this and a two-port is no cable, or was not measured well; absolute, of scattering parameters. */
const oddness = 0.02;

function dataWarnings({ kind, data }: ExtractRequest["sweep"]): ExtractWarning[] {
  const count = data.frequencies.length;
  const size = (a: ComplexArray, k: number) => Math.hypot(a.re[k] ?? NaN, a.im[k] ?? NaN);
  const apart = (a: ComplexArray, b: ComplexArray, k: number) =>
    Math.hypot((a.re[k] ?? NaN) - (b.re[k] ?? NaN), (a.im[k] ?? NaN) - (b.im[k] ?? NaN));
  const over = (of: (k: number) => number) => Array.from({ length: count }, (_, k) => of(k));
  const most = (values: number[]) => values.reduce((a, b) => Math.max(a, b), 0);
  const all = kind === "twoPort" ? [data.s11, data.s21, data.s12, data.s22] : [data.open, data.short];
  const active = over((k) => most(all.map((each) => size(each, k)))).filter((each) => each > 1 + 1e-6).length;
  const warnings: ExtractWarning[] = active > 0 ? [{ warning: "notPassive", count: active }] : [];
  if (kind !== "twoPort") return warnings;
  const [reciprocity, symmetry] = [
    most(over((k) => apart(data.s21, data.s12, k))),
    most(over((k) => apart(data.s11, data.s22, k))),
  ];
  if (reciprocity > oddness) warnings.push({ warning: "notReciprocal", worst: reciprocity });
  if (symmetry > oddness) warnings.push({ warning: "notSymmetric", worst: symmetry });
  return warnings;
}

function lineWarnings(
  measured: MeasuredLine,
  { passes }: SampleSweep,
  { rmsPercent }: ExtractResiduals,
  reachesCorner: boolean,
): ExtractWarning[] {
  const { hasImpedance, isSeen, turns, largestStep, frequencies, phase } = measured;
  const without = (flags: Uint8Array) => flags.reduce((sum, each) => sum + 1 - each, 0);
  const last = isSeen.lastIndexOf(1);
  const velocityFactor = (2 * Math.PI * (frequencies[last] ?? NaN)) / (phase[last] ?? NaN) / SPEED_OF_LIGHT;
  const warnings: (ExtractWarning | false)[] = [
    without(hasImpedance) > 0 && { warning: "impedanceFromNeighbours", count: without(hasImpedance), passes },
    without(isSeen) > 0 && { warning: "nothingThrough", count: without(isSeen) },
    turns !== 0 && { warning: "turnsFromSlope", turns },
    largestStep > Math.PI && { warning: "wideSteps", largestStep },
    !(velocityFactor <= 1.001 && velocityFactor > 0) && { warning: "fasterThanLight", velocityFactor },
    !reachesCorner && { warning: "aboveCorner" },
    !(rmsPercent <= 5) && { warning: "poorFit", rmsPercent },
  ];
  return warnings.filter((each) => each !== false);
}
