/** A lossy cable, the run around it and the figures of its sweep, for tests of laws and of limits. */
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Element, Termination } from "@/lib/line/element";
import type { Sweep } from "@/lib/line/run";

export const rope = modelFromNominal({
  z0: 50,
  velocityFactor: 0.66,
  lossTangent: 3e-4,
  conductors: [{ form: "round", r0OhmPerM: 0.05, skinCornerRadPerS: 2.4e5 }],
});
export const cable = (lengthM: number): Element => ({ kind: "cable", line: { model: rope }, lengthM });
export const ohm = (reOhm: number, imOhm = 0): Termination => ({ kind: "constant", reOhm, imOhm });
export const run = (elements: Element[], load: Termination = ohm(22, -35), source: Termination = ohm(50)): Circuit => ({
  source: source as Circuit["source"],
  elements,
  load,
});

export const numbers = (result: Sweep) => [
  ...result.inputImpedance.re,
  ...result.inputImpedance.im,
  ...result.returnLossDb,
  ...result.transducerLossDb,
  ...result.matchedLossDb,
  ...result.mismatchLossDb,
  ...result.extraLossDb,
  ...result.groupDelayS,
  ...result.loadVoltage.re,
  ...result.elementLossDb.flatMap((each) => [...each]),
];
