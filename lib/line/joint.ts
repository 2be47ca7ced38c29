import { product, root, steady, sum, times, type Analytic } from "@/lib/line/analytic";
import { DB_PER_NEPER } from "@/lib/line/constants";
import { nominalFigures } from "@/lib/line/cable";
import type { Element, JointElement } from "@/lib/line/element";
import { evenHyperbolic } from "@/lib/line/hyperbolic";
import { cascade, NONE, ONE, type TwoPort, type TwoPortAt } from "@/lib/line/two-port";

const ONE_GHZ = 2e9 * Math.PI;

/**
 * A connector or splice: a matched loss of a + b·√(f/1 GHz) dB in its own impedance, then a small shunt capacitance.
 * The loss is that of θ = (a + b·√(2s/(2π·1 GHz)))/8.6859 Np, which is causal, so the √f part also turns phase.
 * @param joint - losses in dB and shuntF in farad, each at least 0
 * @param referenceOhm - its impedance, ohm, above 0
 * @throws RangeError when a figure is out of range
 */
export function jointTwoPort(joint: JointElement, referenceOhm: number): TwoPortAt {
  const { lossDb = 0, lossDbAtOneGhz = 0, shuntF = 0 } = joint;
  for (const [name, value] of Object.entries({ lossDb, lossDbAtOneGhz, shuntF }))
    if (!(value >= 0 && value < Infinity))
      throw new RangeError(`jointTwoPort: ${name} must be at least 0, got ${value}`);
  if (!(referenceOhm > 0)) throw new RangeError(`jointTwoPort: referenceOhm must be positive, got ${referenceOhm}`);
  const flat = steady(lossDb / DB_PER_NEPER);
  return (s) => {
    const relative: Analytic = { re: (2 * s.re) / ONE_GHZ, im: (2 * s.im) / ONE_GHZ, slopeRe: 2 / ONE_GHZ, slopeIm: 0 };
    const theta = lossDbAtOneGhz === 0 ? flat : sum(flat, times(root(relative), lossDbAtOneGhz / DB_PER_NEPER));
    const lossy = lossySection(theta, referenceOhm);
    if (shuntF === 0) return lossy;
    const capacitance: Analytic = { re: s.re * shuntF, im: s.im * shuntF, slopeRe: shuntF, slopeIm: 0 };
    return cascade(lossy, { a: ONE, b: NONE, c: capacitance, d: ONE, logScale: 0, matchedLoss: 0 });
  };
}

function lossySection(theta: Analytic, referenceOhm: number): TwoPort {
  const { cosh, sinhc, logScale } = evenHyperbolic(product(theta, theta), theta.re, theta.im);
  const sinh = product(theta, sinhc);
  const b = times(sinh, referenceOhm);
  const c = times(sinh, 1 / referenceOhm);
  return { a: cosh, b, c, d: cosh, logScale, matchedLoss: logScale };
}

/**
 * The impedance a joint's loss is stated in: its own, else the nominal √(L∞/C) of one cable of the nearest element
 * before it, else after it.
 * @returns ohm, or undefined where the run has no cable at all
 */
export function jointReference(elements: readonly Element[], index: number): number | undefined {
  const joint = elements[index];
  if (joint?.kind === "joint" && joint.referenceOhm !== undefined) return joint.referenceOhm;
  const before = elements.slice(0, index).reverse();
  const model = [...before, ...elements.slice(index + 1)].map(cableModel).find((found) => found !== undefined);
  return model === undefined ? undefined : nominalFigures(model).z0;
}

function cableModel(element: Element) {
  if (element.kind === "cable") return element.line.model;
  if (element.kind === "parallel") return element.branches[0]?.line.model;
  return undefined;
}
