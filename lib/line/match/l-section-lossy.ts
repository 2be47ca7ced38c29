import { add, complex, reciprocal, subtract, type Complex } from "@/lib/line/complex";
import type { LSolution, LTopology } from "@/lib/line/match/l-section";

/** Q of a coil and of a capacitor; Infinity for one without loss. */
export interface PartsQ {
  coil: number;
  capacitor: number;
}

const decades = 7;
const stepsPerDecade = 24;

/**
 * Two-element matching network of lossy parts, every solution of both topologies. Each part's loss is a resistance in
 * series with it, its reactance over its Q.
 * The reactance of the series part is walked through from 10⁻⁷ to 10⁷ of the target on both sides of 0; the part across
 * must then have one admittance, and where the conductance of that is the one its own Q gives it there is a solution.
 * @param load - ohm
 * @param targetOhm - ohm, above 0
 * @returns both parts of each solution not 0; the susceptance is that of the part with its loss
 */
export function lossySections(load: Complex, targetOhm: number, q: PartsQ): LSolution[] {
  if (!(load.re > 0)) return [];
  return (["shuntAtLoad", "seriesAtLoad"] as const).flatMap((topology) => {
    const across = (reactance: number) => admittanceAcross(load, targetOhm, topology, reactance, q);
    const excess = (reactance: number) => {
      const { re, im } = across(reactance);
      return re - Math.abs(im) / (im < 0 ? q.coil : q.capacitor);
    };
    return [-1, 1]
      .flatMap((sign) => roots((size) => excess(sign * size * targetOhm)).map((size) => sign * size * targetOhm))
      .map((reactance): LSolution => ({
        topology,
        seriesReactanceOhm: reactance,
        shuntSusceptanceS: across(reactance).im,
      }))
      .filter(({ shuntSusceptanceS }) => Math.abs(shuntSusceptanceS) * targetOhm > 1e-12);
  });
}

/** Admittance, siemens, that the part across must have for a series part of a reactance to complete the match. */
function admittanceAcross(
  load: Complex,
  targetOhm: number,
  topology: LTopology,
  reactance: number,
  { coil, capacitor }: PartsQ,
): Complex {
  const part = complex(Math.abs(reactance) / (reactance > 0 ? coil : capacitor), reactance);
  if (topology === "shuntAtLoad") return subtract(reciprocal(subtract(complex(targetOhm), part)), reciprocal(load));
  return subtract(complex(1 / targetOhm), reciprocal(add(load, part)));
}

/** Where a smooth function of a positive size is 0, double roots that just cross included. */
function roots(value: (size: number) => number): number[] {
  const sizes = Array.from(
    { length: 2 * decades * stepsPerDecade + 1 },
    (_, k) => 10 ** (k / stepsPerDecade - decades),
  );
  const values = sizes.map(value);
  const found: number[] = [];
  for (let k = 1; k < sizes.length; k++) {
    const [before, here, after] = [values[k - 1]!, values[k]!, values[k + 1] ?? NaN];
    if (Math.sign(before) !== Math.sign(here)) found.push(bisected(value, sizes[k - 1]!, sizes[k]!));
    else if (
      Math.abs(here) < Math.abs(before) &&
      Math.abs(here) <= Math.abs(after) &&
      Math.sign(after) === Math.sign(here)
    ) {
      const turn = nearestToZero(value, sizes[k - 1]!, sizes[k + 1]!);
      if (Math.sign(value(turn)) !== Math.sign(here))
        found.push(bisected(value, sizes[k - 1]!, turn), bisected(value, turn, sizes[k + 1]!));
    }
  }
  return found;
}

/** The root between two sizes of different sign, by halving to the last digit. */
function bisected(value: (size: number) => number, from: number, to: number): number {
  const sign = Math.sign(value(from));
  let [low, high] = [from, to];
  for (let k = 0; k < 60; k++) {
    const middle = (low + high) / 2;
    if (Math.sign(value(middle)) === sign) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Where between two sizes a value of one sign comes nearest to 0 or beyond it, by thirds. */
function nearestToZero(value: (size: number) => number, from: number, to: number): number {
  const sign = Math.sign(value(from));
  let [low, high] = [from, to];
  for (let k = 0; k < 40; k++) {
    const third = (high - low) / 3;
    if (sign * value(low + third) < sign * value(high - third)) high -= third;
    else low += third;
  }
  return (low + high) / 2;
}
