import { steady } from "@/lib/line/analytic";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { PadElement } from "@/lib/line/element";
import type { TwoPort } from "@/lib/line/two-port";

/**
 * Least loss of a resistive pad between two resistances, dB.
 * @param inputOhm - ohm, above 0
 * @param outputOhm - ohm, above 0
 * Source: cosh²θ = Zmax/Zmin where the series arm at the higher side vanishes.
 */
export function minimumPadLossDb(inputOhm: number, outputOhm: number): number {
  const ratio = Math.max(inputOhm, outputOhm) / Math.min(inputOhm, outputOhm);
  return 20 * Math.log10(Math.sqrt(ratio) + Math.sqrt(ratio - 1));
}

/** Rounding of a loss typed at exactly the minimum. */
const lossSlackDb = 1e-9;

function requirePad(where: string, { lossDb, inputOhm, outputOhm }: PadElement): void {
  if (!(inputOhm > 0)) throw new RangeError(`${where}: inputOhm must be positive, got ${inputOhm}`);
  if (!(outputOhm > 0)) throw new RangeError(`${where}: outputOhm must be positive, got ${outputOhm}`);
  const least = minimumPadLossDb(inputOhm, outputOhm);
  if (!(lossDb >= least - lossSlackDb && lossDb < Infinity))
    throw new RangeError(
      `${where}: lossDb must be at least ${least} between ${inputOhm} and ${outputOhm} ohm, got ${lossDb}`,
    );
}

/**
 * A resistive pad, image-matched at both sides. T and pi of the same loss and impedances are the same two-port.
 * @throws RangeError when an impedance is not positive or the loss is below the least possible
 * Source: image parameters, a = √(Z1/Z2)·cosh θ, b = √(Z1·Z2)·sinh θ; F. E. Terman, Radio Engineers' Handbook, section 3.
 */
export function padTwoPort(pad: PadElement): TwoPort {
  requirePad("padTwoPort", pad);
  const theta = pad.lossDb / DB_PER_NEPER;
  const sinh = -Math.expm1(-2 * theta) / 2;
  const cosh = 1 - sinh;
  const ratio = Math.sqrt(pad.inputOhm / pad.outputOhm);
  const mean = Math.sqrt(pad.inputOhm * pad.outputOhm);
  return {
    a: steady(ratio * cosh),
    b: steady(mean * sinh),
    c: steady(sinh / mean),
    d: steady(cosh / ratio),
    logScale: theta,
    matchedLoss: theta,
  };
}

/** Resistors of a pad from the source side, ohm. T: series, shunt, series. Pi: shunt, series, shunt. */
export type PadResistors = [number, number, number];

/**
 * What to solder. A pad of 0 dB needs no resistor: the shunt arms are then Infinity, the series arms 0.
 * @throws RangeError as `padTwoPort`
 * Source: T: series Z1·coth θ − Zm/sinh θ, shunt Zm/sinh θ, Zm = √(Z1·Z2); pi by duality.
 */
export function padResistors(pad: PadElement): PadResistors {
  requirePad("padResistors", pad);
  const theta = pad.lossDb / DB_PER_NEPER;
  const mean = Math.sqrt(pad.inputOhm * pad.outputOhm);
  const coth = 1 / Math.tanh(theta);
  if (pad.topology === "pi") {
    const series = 1 / (mean * Math.sinh(theta));
    const arm = (ohm: number) => 1 / leftOf(coth / ohm, series);
    return theta === 0 ? [Infinity, 0, Infinity] : [arm(pad.inputOhm), mean * Math.sinh(theta), arm(pad.outputOhm)];
  }
  const shunt = mean / Math.sinh(theta);
  const arm = (ohm: number) => leftOf(ohm * coth, shunt);
  return theta === 0 ? [0, Infinity, 0] : [arm(pad.inputOhm), shunt, arm(pad.outputOhm)];
}

/** What is left of one value beside another; at the least loss that is 0 but for rounding, and then it is 0. */
function leftOf(value: number, taken: number): number {
  return value - taken > 1e-12 * value ? value - taken : 0;
}
