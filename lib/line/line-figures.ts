import { propagation } from "@/lib/line/cable";
import { DB_PER_NEPER, SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";
import { atTemperature } from "@/lib/line/temperature";

/** A swept complex quantity; `re[k]` and `im[k]` belong to frequency k. */
export interface ComplexArray {
  re: Float64Array;
  im: Float64Array;
}

export function complexArray(length: number): ComplexArray {
  return { re: new Float64Array(length), im: new Float64Array(length) };
}

/** What one cable does per metre over frequency; every array has one value per frequency. */
export interface LineFigures {
  frequenciesHz: Float64Array;
  rOhmPerM: Float64Array;
  lHPerM: Float64Array;
  gSPerM: Float64Array;
  cFPerM: Float64Array;
  zcOhm: ComplexArray;
  attenuationDbPerM: Float64Array;
  phaseRadPerM: Float64Array;
  phaseVelocityMPerS: Float64Array;
  velocityFactor: Float64Array;
  /** dβ/dω, exact */
  groupDelaySPerM: Float64Array;
}

/**
 * Secondary parameters of a cable over frequency.
 * @param model - at 20 °C
 * @param frequencies - hertz, each above 0, length N
 * @param temperatureC - °C
 * @throws RangeError when a frequency is not positive, or the temperature has no positive resistivity
 */
export function lineFigures(model: LineModel, frequencies: ArrayLike<number>, temperatureC = 20): LineFigures {
  const warm = atTemperature(model, temperatureC).model;
  const count = frequencies.length;
  const array = () => new Float64Array(count);
  const figures: LineFigures = {
    frequenciesHz: Float64Array.from(frequencies),
    rOhmPerM: array(),
    lHPerM: array(),
    gSPerM: array(),
    cFPerM: array(),
    zcOhm: complexArray(count),
    attenuationDbPerM: array(),
    phaseRadPerM: array(),
    phaseVelocityMPerS: array(),
    velocityFactor: array(),
    groupDelaySPerM: array(),
  };
  for (let k = 0; k < count; k++) fillFigures(figures, k, warm);
  return figures;
}

function fillFigures(figures: LineFigures, k: number, model: LineModel): void {
  const frequency = figures.frequenciesHz[k]!;
  if (!(frequency > 0)) throw new RangeError(`lineFigures: frequencies must be positive, got ${frequency}`);
  const omega = 2 * Math.PI * frequency;
  const { z, y, gamma, zc } = propagation(model, { re: 0, im: omega });
  figures.rOhmPerM[k] = z.re;
  figures.lHPerM[k] = z.im / omega;
  figures.gSPerM[k] = y.re;
  figures.cFPerM[k] = y.im / omega;
  figures.zcOhm.re[k] = zc.re;
  figures.zcOhm.im[k] = zc.im;
  figures.attenuationDbPerM[k] = gamma.re * DB_PER_NEPER;
  figures.phaseRadPerM[k] = gamma.im;
  figures.phaseVelocityMPerS[k] = omega / gamma.im;
  figures.velocityFactor[k] = omega / gamma.im / SPEED_OF_LIGHT;
  // β = Im γ(jω), so dβ/dω = Re dγ/ds
  figures.groupDelaySPerM[k] = gamma.slopeRe;
}
