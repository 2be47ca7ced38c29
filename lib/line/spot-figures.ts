import { propagation } from "@/lib/line/cable";
import type { Complex } from "@/lib/line/complex";
import { DB_PER_NEPER, SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";
import { atTemperature, type ModelAtTemperature } from "@/lib/line/temperature";

/** A cable at one frequency and temperature. */
export interface SpotFigures {
  frequency: number;
  /** propagation constant, 1/m */
  gamma: Complex;
  /** characteristic impedance, ohm */
  zc: Complex;
  attenuationDbPerM: number;
  attenuationNpPerM: number;
  phaseRadPerM: number;
  wavelengthM: number;
  velocityFactor: number;
  /** phase over angular frequency, s/m */
  phaseDelaySPerM: number;
  /** dβ/dω, s/m */
  groupDelaySPerM: number;
  /** series resistance at this frequency, out and back, ohm/m */
  resistanceOhmPerM: number;
  /** dc resistance, out and back, ohm/m */
  dcResistanceOhmPerM: number;
  /** what temperature did */
  temperature: ModelAtTemperature;
}

/**
 * What one cable does at one frequency and temperature.
 * @param model - at 20 °C
 * @param frequency - hertz, above 0
 * @param temperatureC - °C
 * @throws RangeError when the frequency is not positive, or the temperature has no positive resistivity
 */
export function spotFigures(model: LineModel, frequency: number, temperatureC = 20): SpotFigures {
  if (!(frequency > 0 && frequency < Infinity))
    throw new RangeError(`spotFigures: frequency must be positive, got ${frequency}`);
  const temperature = atTemperature(model, temperatureC);
  const omega = 2 * Math.PI * frequency;
  const { gamma, zc, z } = propagation(temperature.model, { re: 0, im: omega });
  return {
    frequency,
    gamma: { re: gamma.re, im: gamma.im },
    zc,
    attenuationDbPerM: gamma.re * DB_PER_NEPER,
    attenuationNpPerM: gamma.re,
    phaseRadPerM: gamma.im,
    wavelengthM: (2 * Math.PI) / gamma.im,
    velocityFactor: omega / gamma.im / SPEED_OF_LIGHT,
    phaseDelaySPerM: gamma.im / omega,
    // β = Im γ(jω), so dβ/dω = Re dγ/ds
    groupDelaySPerM: gamma.slopeRe,
    resistanceOhmPerM: z.re,
    dcResistanceOhmPerM: temperature.model.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0),
    temperature,
  };
}

/**
 * How far the frequency of one electrical length moves when the line is made longer, hertz per metre; below 0, since a
 * longer line is that long, electrically, at a lower frequency.
 * @param at - the cable at that frequency
 * @param length - metre, above 0
 * Source: β·l held constant: df/dl = −β/(l·dβ/df).
 */
export function frequencyPerLength(at: SpotFigures, length: number): number {
  return -at.phaseRadPerM / (length * 2 * Math.PI * at.groupDelaySPerM);
}

/** A length of a cable at one frequency and temperature. */
export interface LengthFigures {
  /** attenuation between matched ends */
  lossDb: number;
  phaseRad: number;
  wavelengths: number;
  phaseDelayS: number;
  groupDelayS: number;
  /** both conductors */
  dcResistanceOhm: number;
}

/** @param length - metre, at least 0 */
export function lengthFigures(at: SpotFigures, length: number): LengthFigures {
  return {
    lossDb: at.attenuationDbPerM * length,
    phaseRad: at.phaseRadPerM * length,
    wavelengths: length / at.wavelengthM,
    phaseDelayS: at.phaseDelaySPerM * length,
    groupDelayS: at.groupDelaySPerM * length,
    dcResistanceOhm: at.dcResistanceOhmPerM * length,
  };
}
