/** What of a run is not exactly as drawn: the quantities that are drawn within limits, and their names. Pure. */
import type { Circuit, Element } from "@/lib/line/element";
import type { Spread } from "@/lib/line/spread";

/** How far each kind of figure may be off, as people say it. */
export interface SpreadChoices {
  /** of lengths without a cut tolerance of their own, m */
  lengthM: number | undefined;
  z0Percent: number | undefined;
  velocityFactorPercent: number | undefined;
  lossPercent: number | undefined;
  partPercent: number | undefined;
  /** the load keeps the size of its reflection and has any phase */
  anyPhase: boolean;
}

/** Usual tolerances: ±2 Ω of 50 Ω, ±1 % of the velocity factor, ±5 % of the loss, ±5 mm and ±5 % parts. */
export const usualSpread: SpreadChoices = {
  lengthM: 0.005,
  z0Percent: 4,
  velocityFactorPercent: 1,
  lossPercent: 5,
  partPercent: 5,
  anyPhase: false,
};

/** A quantity that is spread, with what it is called. */
export interface NamedSpread extends Spread {
  /** "length of C50-F10" */
  name: string;
}

const about = (percent: number): [number, number] => [-percent, percent];

function ofCable(element: Element, at: string, name: string, choices: SpreadChoices): NamedSpread[] {
  if (element.kind !== "cable" && element.kind !== "stub") return [];
  const rows: NamedSpread[] = [];
  const tolerance = element.lengthToleranceM ?? choices.lengthM;
  if (tolerance && element.lengthM > 0)
    rows.push({
      path: `${at}.lengthM`,
      limits: [Math.max(0, element.lengthM - tolerance), element.lengthM + tolerance],
      name: `length of ${name}`,
    });
  const { z0Percent, velocityFactorPercent, lossPercent } = choices;
  if (z0Percent) rows.push({ path: `${at}.z0Percent`, limits: about(z0Percent), name: `impedance of ${name}` });
  if (velocityFactorPercent)
    rows.push({
      path: `${at}.velocityFactorPercent`,
      limits: about(velocityFactorPercent),
      name: `velocity factor of ${name}`,
    });
  if (lossPercent) rows.push({ path: `${at}.lossPercent`, limits: about(lossPercent), name: `loss of ${name}` });
  return rows;
}

/** Pieces called the same are told apart by their place in the run. */
function nameOf(names: readonly string[], k: number): string {
  const name = names[k];
  if (name === undefined) return `piece ${k + 1}`;
  return names.filter((other) => other === name).length > 1 ? `${name}, piece ${k + 1}` : name;
}

/** @param names - of the elements, in order */
export function spreadOf(circuit: Circuit, names: readonly string[], choices: SpreadChoices): NamedSpread[] {
  const rows = circuit.elements.flatMap((element, k): NamedSpread[] => {
    const at = `elements.${k}`;
    const name = nameOf(names, k);
    if (element.kind === "part" && choices.partPercent)
      return [{ path: `${at}.valuePercent`, limits: about(choices.partPercent), name: `value of ${name}` }];
    return ofCable(element, at, name, choices);
  });
  const hasReflection = circuit.load.kind === "constant";
  if (!choices.anyPhase || !hasReflection) return rows;
  return [...rows, { path: "load.reflectionPhase", limits: [-Math.PI, Math.PI], name: "phase of the load" }];
}
