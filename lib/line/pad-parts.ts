/** A T or pi of three given resistors: what it does, and where the power goes. For exact values see `pad.ts`. */
import type { PadElement } from "@/lib/line/element";
import { padResistors, type PadResistors } from "@/lib/line/pad";
import { e24Around } from "@/lib/line/match/e-series";

export type PadTopology = NonNullable<PadElement["topology"]>;

/** A real chain matrix. */
interface Chain {
  a: number;
  b: number;
  c: number;
  d: number;
}

function chained(first: Chain, second: Chain): Chain {
  return {
    a: first.a * second.a + first.b * second.c,
    b: first.a * second.b + first.b * second.d,
    c: first.c * second.a + first.d * second.c,
    d: first.c * second.b + first.d * second.d,
  };
}

const series = (ohm: number): Chain => ({ a: 1, b: ohm, c: 0, d: 1 });
/** An arm of Infinity is no arm. */
const shunt = (ohm: number): Chain => ({ a: 1, b: 0, c: 1 / ohm, d: 1 });

function chainOf(topology: PadTopology, [first, second, third]: PadResistors): Chain {
  const arms =
    topology === "pi" ? [shunt(first), series(second), shunt(third)] : [series(first), shunt(second), series(third)];
  return arms.reduce(chained);
}

export interface PadFigures {
  /** available power of the source side's resistance over power in the load side's, dB */
  lossDb: number;
  /** resistance at each side with the other side's resistance connected, ohm */
  inputOhm: number;
  outputOhm: number;
  /** |Γ| of each in the resistance meant for it */
  inputReflection: number;
  outputReflection: number;
}

/**
 * What three resistors do between two resistances.
 * @param resistors - from the source side, ohm; a series arm at least 0, a shunt arm above 0 or Infinity for none
 * @param inputOhm - resistance of the source, ohm, above 0
 * @param outputOhm - resistance of the load, ohm, above 0
 * @throws RangeError when a resistance is out of range
 * Source: chain parameters, D. M. Pozar, Microwave Engineering, 4th ed., section 4.4;
 * S21 = 2/(A√(R2/R1) + B/√(R1R2) + C√(R1R2) + D√(R1/R2)).
 */
export function padFigures(
  topology: PadTopology,
  resistors: PadResistors,
  inputOhm: number,
  outputOhm: number,
): PadFigures {
  requireResistances("padFigures", topology, resistors, inputOhm, outputOhm);
  const { a, b, c, d } = chainOf(topology, resistors);
  const [ratio, mean] = [Math.sqrt(outputOhm / inputOhm), Math.sqrt(inputOhm * outputOhm)];
  const seenAtInput = (a * outputOhm + b) / (c * outputOhm + d);
  const seenAtOutput = (d * inputOhm + b) / (c * inputOhm + a);
  return {
    lossDb: 20 * Math.log10((a * ratio + b / mean + c * mean + d / ratio) / 2),
    inputOhm: seenAtInput,
    outputOhm: seenAtOutput,
    inputReflection: Math.abs(seenAtInput - inputOhm) / (seenAtInput + inputOhm),
    outputReflection: Math.abs(seenAtOutput - outputOhm) / (seenAtOutput + outputOhm),
  };
}

function requireResistances(
  where: string,
  topology: PadTopology,
  resistors: PadResistors,
  inputOhm: number,
  outputOhm: number,
): void {
  if (!(inputOhm > 0)) throw new RangeError(`${where}: inputOhm must be positive, got ${inputOhm}`);
  if (!(outputOhm > 0)) throw new RangeError(`${where}: outputOhm must be positive, got ${outputOhm}`);
  resistors.forEach((ohm, k) => {
    const isShunt = (k === 1) === (topology === "T");
    if (isShunt ? !(ohm > 0) : !(ohm >= 0 && ohm < Infinity))
      throw new RangeError(`${where}: resistor ${k + 1} is out of range, got ${ohm}`);
  });
}

/**
 * Power in each resistor, from the source side, and in the load, watt; together they are the power that goes in.
 * @param watts - into the pad, at least 0
 * @throws RangeError as `padFigures`
 */
export function padPowers(
  topology: PadTopology,
  resistors: PadResistors,
  outputOhm: number,
  watts: number,
): { resistorsW: [number, number, number]; loadW: number } {
  requireResistances("padPowers", topology, resistors, 1, outputOhm);
  if (!(watts >= 0)) throw new RangeError(`padPowers: watts must be at least 0, got ${watts}`);
  // Backwards from one volt at the load; the shares are then scaled to the power that goes in.
  const [first, second, third] = resistors;
  let [v, i] = [1, 1 / outputOhm];
  const inSeries = (ohm: number) => ((v += i * ohm), i * i * ohm);
  const across = (ohm: number) => ((i += v / ohm), (v * v) / ohm);
  const [outer, inner] = topology === "pi" ? [across, inSeries] : [inSeries, across];
  const shares = [outer(third), inner(second), outer(first)].reverse() as [number, number, number];
  const scale = watts / (v * i);
  return { resistorsW: shares.map((share) => share * scale) as [number, number, number], loadW: scale / outputOhm };
}

/**
 * The pad of E24 values that comes nearest: of the two neighbours of each exact resistor, all eight combinations are
 * tried, and the one is taken whose errors together (root of the sum of squares) are least: the reflection at each side
 * and the relative error of the voltage that gets through. A pad between equal resistances stays symmetrical.
 * @throws RangeError as `padResistors`
 */
export function standardPad(pad: PadElement): { resistors: PadResistors; figures: PadFigures } {
  const { topology = "T", inputOhm, outputOhm, lossDb } = pad;
  const choices = padResistors(pad).map((ohm) => (ohm > 0 && ohm < Infinity ? e24Around(ohm) : [ohm]));
  const combinations = choices.reduce<number[][]>(
    (begun, next) => begun.flatMap((list) => next.map((ohm) => [...list, ohm])),
    [[]],
  );
  const isAllowed = ([first, , third]: number[]) => inputOhm !== outputOhm || first === third;
  const tried = combinations.filter(isAllowed).map((list) => {
    const resistors = list as PadResistors;
    const figures = padFigures(topology, resistors, inputOhm, outputOhm);
    const through = Math.abs(10 ** ((lossDb - figures.lossDb) / 20) - 1);
    return { resistors, figures, error: Math.hypot(figures.inputReflection, figures.outputReflection, through) };
  });
  const { resistors, figures } = tried.reduce((best, next) => (next.error < best.error ? next : best));
  return { resistors, figures };
}
