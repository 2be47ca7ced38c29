import { abs2, reciprocal, type Complex } from "@/lib/line/complex";

export type LTopology = "shuntAtLoad" | "seriesAtLoad";

export interface LSolution {
  topology: LTopology;
  /** 0 where the solution needs no shunt part */
  shuntSusceptanceS: number;
  /** 0 where the solution needs no series part */
  seriesReactanceOhm: number;
}

/** A coil or a capacitor, henries or farads. */
export type PartValue = { part: "coil"; lH: number } | { part: "capacitor"; cF: number };

/** Susceptance times target, or reactance over target, that counts as no part at all. */
const nothing = 1e-12;

/**
 * Two-element lossless matching network, every solution of both topologies.
 * @param load - ohm
 * @param targetOhm - ohm, above 0
 * @returns none where the load takes no power, else two or four; fewer where solutions coincide or need one part only
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, section 5.1, analytic solutions; convention e^{+jωt}.
 */
export function lSections(load: Complex, targetOhm: number): LSolution[] {
  if (!(load.re > 0)) return [];
  return distinct([...shuntAtLoad(load, targetOhm), ...seriesAtLoad(load, targetOhm)], targetOhm);
}

function shuntAtLoad(load: Complex, targetOhm: number): LSolution[] {
  const admittance = reciprocal(load);
  const reach = reachable(admittance.re * (1 / targetOhm - admittance.re), admittance.re / targetOhm);
  if (reach < 0) return [];
  return [1, -1].map((sign) => {
    const total = sign * Math.sqrt(reach);
    return {
      topology: "shuntAtLoad",
      shuntSusceptanceS: total - admittance.im,
      seriesReactanceOhm: (total * targetOhm) / admittance.re,
    };
  });
}

function seriesAtLoad(load: Complex, targetOhm: number): LSolution[] {
  const reach = reachable(load.re * (targetOhm - load.re), load.re * targetOhm);
  if (reach < 0) return [];
  return [1, -1].map((sign) => {
    const total = sign * Math.sqrt(reach);
    return {
      topology: "seriesAtLoad",
      shuntSusceptanceS: total / (load.re * targetOhm),
      seriesReactanceOhm: total - load.im,
    };
  });
}

/** Rounding must neither lose nor split the one solution at the edge of a topology's reach. */
const reachable = (value: number, unit: number) => (Math.abs(value) < 1e-14 * unit ? 0 : value);

/** One of each network: solutions with a missing part may come from both topologies, or twice from one. */
function distinct(solutions: LSolution[], targetOhm: number): LSolution[] {
  const kept: LSolution[] = [];
  for (const solution of solutions) {
    const clean = {
      ...solution,
      shuntSusceptanceS: settle(solution.shuntSusceptanceS, 1 / targetOhm),
      seriesReactanceOhm: settle(solution.seriesReactanceOhm, targetOhm),
    };
    const hasBoth = clean.shuntSusceptanceS !== 0 && clean.seriesReactanceOhm !== 0;
    if (!kept.some((other) => isSame(other, clean, targetOhm) && (!hasBoth || other.topology === clean.topology)))
      kept.push(clean);
  }
  return kept.filter((solution) => solution.shuntSusceptanceS !== 0 || solution.seriesReactanceOhm !== 0);
}

const settle = (value: number, unit: number) => (Math.abs(value) < nothing * unit ? 0 : value);

function isSame(a: LSolution, b: LSolution, targetOhm: number): boolean {
  const shunt = (a.shuntSusceptanceS - b.shuntSusceptanceS) * targetOhm;
  const series = (a.seriesReactanceOhm - b.seriesReactanceOhm) / targetOhm;
  return abs2({ re: shunt, im: series }) < 1e-18;
}

/**
 * The part that has a susceptance, shunt, at one frequency: a capacitor where it is positive, else a coil.
 * @param susceptanceS - siemens, not 0
 * @param frequency - hertz, above 0
 */
export function shuntPart(susceptanceS: number, frequency: number): PartValue {
  const omega = 2 * Math.PI * frequency;
  return susceptanceS > 0
    ? { part: "capacitor", cF: susceptanceS / omega }
    : { part: "coil", lH: -1 / (omega * susceptanceS) };
}

/**
 * The part that has a reactance, in series, at one frequency: a coil where it is positive, else a capacitor.
 * @param reactanceOhm - ohm, not 0
 * @param frequency - hertz, above 0
 */
export function seriesPart(reactanceOhm: number, frequency: number): PartValue {
  const omega = 2 * Math.PI * frequency;
  return reactanceOhm > 0
    ? { part: "coil", lH: reactanceOhm / omega }
    : { part: "capacitor", cF: -1 / (omega * reactanceOhm) };
}
