/** What a meter reads on a sample of cable: capacitance with the far end open, inductance and resistance with it short. */
import { quotient } from "@/lib/line/analytic";
import { prepareLine } from "@/lib/line/cable";
import type { LineModel } from "@/lib/line/element";
import { lineSection } from "@/lib/line/section";

export interface SampleReading {
  /** hertz */
  frequency: number;
  /** farad, far end open; negative where the sample is so long that it looks like a coil */
  openCapacitance: number;
  /** henry, far end short; negative where the sample is so long that it looks like a capacitor */
  shortInductance: number;
  /** ohm, far end short */
  shortResistance: number;
}

/**
 * @param model - at the sample's temperature
 * @param length - metre, above 0
 * @param frequency - of the meter, hertz, above 0
 * @throws RangeError when length or frequency is not positive
 * Source: input impedance of a line, Zc·tanh γl shorted and Zc·coth γl open, D. M. Pozar, Microwave Engineering, 4th ed.,
 * section 2.1.
 */
export function sampleReading(model: LineModel, length: number, frequency: number): SampleReading {
  for (const [name, value] of Object.entries({ length, frequency }))
    if (!(value > 0 && value < Infinity)) throw new RangeError(`sampleReading: ${name} must be positive, got ${value}`);
  const omega = 2 * Math.PI * frequency;
  const { a, b, c, d } = lineSection(prepareLine(model), length)({ re: 0, im: omega });
  const short = quotient(b, d);
  return {
    frequency,
    openCapacitance: quotient(c, a).im / omega,
    shortInductance: short.im / omega,
    shortResistance: short.re,
  };
}

/**
 * The shorted reading to second order, henry: (l − r²·c·len²/3)·len. A long thin sample reads low: its resistance and
 * capacitance take away from its inductance. Holds where resistance is more than reactance and the sample is short.
 * @param perMetre - resistance, inductance and capacitance at the meter's frequency, ohm, henry and farad per metre
 * Source: series of Zc·tanh γl in γl.
 */
export function secondOrderInductance(perMetre: { r: number; l: number; c: number }, length: number): number {
  const { r, l, c } = perMetre;
  return (l - (r * r * c * length * length) / 3) * length;
}
