/**
 * The same sweep of a run of cables, written straight from the equations with mathjs complex objects: what we measure
 * against. It works out every figure that `sweep` does for such a run; only the group delay is a difference of two
 * phases where `sweep` has the exact derivative.
 */
import {
  abs,
  add,
  arg,
  complex,
  conj,
  divide,
  exp,
  multiply,
  pow,
  sqrt,
  subtract,
  type Complex,
  type MathType,
} from "mathjs";
import type { Circuit, LineModel } from "@/lib/line/element";

const c = (value: MathType) => value as Complex;
const size = (value: Complex) => abs(value) as unknown as number;

function perMetre(model: LineModel, s: Complex): { z: Complex; y: Complex } {
  let z = c(multiply(s, model.lInfHPerM));
  for (const term of model.conductors) {
    const p = c(divide(s, term.skinCornerRadPerS ?? Infinity));
    z = c(add(z, multiply(term.r0OhmPerM, sqrt(c(add(1, p))))));
  }
  const delta = Math.atan(model.lossTangent ?? 0);
  const power = c(pow(c(divide(s, 2 * Math.PI * 1e6)), (-2 * delta) / Math.PI) as MathType);
  return { z, y: c(multiply(multiply(s, model.cFPerM / Math.cos(delta)), power)) };
}

interface Port {
  v: Complex;
  i: Complex;
}

const powerOf = ({ v, i }: Port) => c(multiply(v, conj(i))).re;

/** Voltage and current before every element, and at the load; the sum of α·length in nepers. */
function walk(circuit: Circuit, s: Complex, load: Complex): { ports: Port[]; matched: number } {
  const ports: Port[] = [{ v: load, i: complex(1, 0) }];
  let matched = 0;
  for (const element of [...circuit.elements].reverse()) {
    if (element.kind !== "cable") throw new Error("cables only");
    const { v, i } = ports[0]!;
    const { z, y } = perMetre(element.line.model, s);
    const [rootZ, rootY] = [c(sqrt(z)), c(sqrt(y))];
    const zc = c(divide(rootZ, rootY));
    const theta = c(multiply(multiply(rootZ, rootY), element.lengthM));
    matched += theta.re;
    const [grow, decay] = [c(exp(theta)), c(exp(c(multiply(theta, -1))))];
    const cosh = c(multiply(add(grow, decay), 0.5));
    const sinh = c(multiply(subtract(grow, decay), 0.5));
    ports.unshift({
      v: c(add(multiply(cosh, v), multiply(multiply(zc, sinh), i))),
      i: c(add(multiply(divide(sinh, zc), v), multiply(cosh, i))),
    });
  }
  return { ports, matched };
}

const decibels = (ratio: number) => 10 * Math.log10(ratio);
const nudge = 1e-7;

export function sweepWithMathjs(circuit: Circuit, frequencies: ArrayLike<number>) {
  const { source, load } = circuit;
  if (source.kind !== "constant" || load.kind !== "constant") throw new Error("constant ends only");
  const zs = complex(source.reOhm, source.imOhm);
  const zl = complex(load.reOhm, load.imOhm);
  const reflection = (z: Complex, reference: Complex) => c(divide(subtract(z, conj(reference)), add(z, reference)));
  const emf = ({ v, i }: Port) => c(add(v, multiply(zs, i)));
  return Array.from(frequencies, (frequency) => {
    const omega = 2 * Math.PI * frequency;
    const { ports, matched } = walk(circuit, complex(0, omega), zl);
    const near = walk(circuit, complex(0, omega * (1 + nudge)), zl);
    const first = ports[0]!;
    const inputImpedance = c(divide(first.v, first.i));
    const gamma = reflection(inputImpedance, zs);
    const magnitude = size(gamma);
    const drive = emf(first);
    const loadVoltage = c(divide(zl, drive));
    const turn = arg(c(divide(c(divide(zl, emf(near.ports[0]!))), loadVoltage))) as unknown as number;
    const powers = ports.map(powerOf);
    const available = size(drive) ** 2 / (4 * zs.re);
    const matchedLossDb = (20 / Math.LN10) * matched;
    const runLossDb = decibels(powers[0]! / powers.at(-1)!);
    return {
      inputImpedance,
      reflection: gamma,
      returnLossDb: -20 * Math.log10(magnitude),
      vswr: (1 + magnitude) / (1 - magnitude),
      loadReflection: reflection(zl, zs),
      loadVoltage,
      transducerLossDb: decibels(available / powers.at(-1)!),
      matchedLossDb,
      mismatchLossDb: decibels(available / powers[0]!),
      extraLossDb: runLossDb - matchedLossDb,
      groupDelayS: -turn / (omega * nudge),
      elementLossDb: circuit.elements.map((_, i) => decibels(powers[i]! / powers[i + 1]!)),
    };
  });
}
