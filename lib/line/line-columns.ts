/**
 * A line over many frequencies at once, values only, for work that asks again and again: column by column in
 * Float64Arrays, and of all columns only those made anew whose constants have moved. The readable form is
 * `prepareLine` in `cable.ts`; tests hold both against each other.
 */
import { addConductor } from "@/lib/line/conductor-columns";
import type { LineModel } from "@/lib/line/element";
import type { ModelAtTemperature } from "@/lib/line/temperature";

const CAPACITANCE_CORNER = 2e6 * Math.PI;

/** Angular frequencies, each above 0, with their logarithms over that at which capacitance is stated. */
export interface FrequencyColumns {
  omega: Float64Array;
  logarithm: Float64Array;
}

/** @throws RangeError when a frequency (hertz) is not positive */
export function frequencyColumns(frequencies: ArrayLike<number>): FrequencyColumns {
  const omega = Float64Array.from(frequencies, (frequency) => {
    if (!(frequency > 0 && frequency < Infinity))
      throw new RangeError(`frequencyColumns: frequencies must be positive, got ${frequency}`);
    return 2 * Math.PI * frequency;
  });
  return { omega, logarithm: omega.map((each) => Math.log(each / CAPACITANCE_CORNER)) };
}

/** What temperature multiplies the constants of a model by. */
export interface WarmRatios {
  resistance: number;
  corner: number;
  lossTangent: number;
}

export const coldRatios: WarmRatios = { resistance: 1, corner: 1, lossTangent: 1 };

export function warmRatios({ resistivityRatio, lossRatio, slope }: ModelAtTemperature): WarmRatios {
  return {
    resistance: resistivityRatio,
    corner: (resistivityRatio / lossRatio) ** 2,
    lossTangent: slope === "declared" ? lossRatio : 1,
  };
}

export interface LineColumns extends FrequencyColumns {
  /** the conductors' impedance, ohm per metre */
  conductorRe: Float64Array;
  conductorIm: Float64Array;
  /** capacitance over that at 1 MHz */
  growth: Float64Array;
  /** propagation constant, 1/m */
  gammaRe: Float64Array;
  gammaIm: Float64Array;
  /** characteristic impedance, ohm, and its reciprocal */
  zcRe: Float64Array;
  zcIm: Float64Array;
  ycRe: Float64Array;
  ycIm: Float64Array;
  /** constants the columns were made of: L∞, C, tan δ, G0, then dc resistance and corner of each term */
  of: Float64Array;
}

export function lineColumns({ omega, logarithm }: FrequencyColumns): LineColumns {
  const column = () => new Float64Array(omega.length);
  return {
    ...{ omega, logarithm, conductorRe: column(), conductorIm: column(), growth: column() },
    ...{ gammaRe: column(), gammaIm: column(), zcRe: column(), zcIm: column(), ycRe: column(), ycIm: column() },
    of: new Float64Array(8).fill(NaN),
  };
}

const LOSS_TANGENT = 2;
const CONDUCTORS = 4;

/** The constants of a model at its temperature; a part that differs from what is known is marked in the result. */
function moved(columns: LineColumns, model: LineModel, warm: WarmRatios): { any: boolean; r: boolean; tan: boolean } {
  const { of } = columns;
  const result = { any: false, r: false, tan: false };
  const set = (at: number, value: number) => {
    if (of[at] === value) return;
    of[at] = value;
    result.any = true;
    if (at === LOSS_TANGENT) result.tan = true;
    if (at >= CONDUCTORS) result.r = true;
  };
  set(0, model.lInfHPerM);
  set(1, model.cFPerM);
  set(LOSS_TANGENT, (model.lossTangent ?? 0) * warm.lossTangent);
  set(3, model.g0SPerM ?? 0);
  for (let n = 0; n < 2; n++) {
    const term = model.conductors[n];
    set(CONDUCTORS + 2 * n, (term?.r0OhmPerM ?? 0) * warm.resistance);
    set(CONDUCTORS + 2 * n + 1, (term?.skinCornerRadPerS ?? 0) * warm.corner);
  }
  return result;
}

/**
 * Brings the columns to a model at a temperature; what has not moved since the last time is kept.
 * @param model - at 20 °C, one or two conductor terms, always of the same forms
 * @throws RangeError when a form that needs a skin corner has none above 0
 */
export function setLine(columns: LineColumns, model: LineModel, warm: WarmRatios): void {
  const { any, r, tan } = moved(columns, model, warm);
  if (!any) return;
  if (r) setConductors(columns, model);
  if (tan) setGrowth(columns);
  setPropagation(columns);
}

function setConductors({ omega, conductorRe, conductorIm, of }: LineColumns, { conductors }: LineModel): void {
  conductorRe.fill(0);
  conductorIm.fill(0);
  for (const [n, { form }] of conductors.entries())
    addConductor(form, of[CONDUCTORS + 2 * n]!, of[CONDUCTORS + 2 * n + 1]!, omega, conductorRe, conductorIm);
}

function setGrowth({ logarithm, growth, of }: LineColumns): void {
  const exponent = (-2 * Math.atan(of[LOSS_TANGENT]!)) / Math.PI;
  if (exponent === 0) growth.fill(1);
  else for (let k = 0; k < growth.length; k++) growth[k] = Math.exp(exponent * logarithm[k]!);
}

function setPropagation(columns: LineColumns): void {
  const { omega, conductorRe, conductorIm, growth, gammaRe, gammaIm, zcRe, zcIm, ycRe, ycIm, of } = columns;
  const inductance = of[0]!;
  const capacitance = of[1]!;
  const lossTangent = of[2]!;
  const leakage = of[3]!;
  for (let k = 0; k < omega.length; k++) {
    const zRe = conductorRe[k]!;
    const zIm = conductorIm[k]! + omega[k]! * inductance;
    const yIm = omega[k]! * capacitance * growth[k]!;
    const yRe = leakage + yIm * lossTangent;
    const re = zRe * yRe - zIm * yIm;
    const im = zRe * yIm + zIm * yRe;
    const magnitude = Math.sqrt(re * re + im * im);
    const larger = Math.sqrt((magnitude + Math.abs(re)) / 2);
    const smaller = im / (2 * larger);
    const gRe = re < 0 ? smaller : larger;
    const gIm = re < 0 ? larger : smaller;
    const under = 1 / magnitude;
    gammaRe[k] = gRe;
    gammaIm[k] = gIm;
    zcRe[k] = (zRe * gRe + zIm * gIm) * under;
    zcIm[k] = (zIm * gRe - zRe * gIm) * under;
    ycRe[k] = (yRe * gRe + yIm * gIm) * under;
    ycIm[k] = (yIm * gRe - yRe * gIm) * under;
  }
}
