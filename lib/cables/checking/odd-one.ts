/**
 * Which one of impedance, velocity factor, capacitance and inductance does not fit the rest. Two of them make the others,
 * so three alone cannot tell; the construction, the insulation and what impedances are usual bear witness. Pure.
 */
import type { Facts } from "@/lib/cables/checking/facts";
import { outside, usualInsulation } from "@/lib/cables/checking/insulation";
import type { NominalFigures } from "@/lib/line/cable";
import { agreementLimits, figuresFromTwo, type PerLengthQuantity, perLengthQuantities } from "@/lib/line/per-length";

/** Impedances that cables are made for, ohm. */
const usualImpedances = [50, 75, 78, 93, 95, 100, 110, 120, 125, 150, 600];

type Cost = (figures: NominalFigures) => number;

/** How far a line is from what else is known of the entry; each a share. */
function witnesses({ drawn, build, stated }: Facts): Cost[] {
  const costs: Cost[] = [];
  const [z0, velocityFactor, capacitance] = [drawn?.z0, drawn?.velocityFactor, drawn?.capacitance];
  if (z0 && velocityFactor && capacitance)
    costs.push((line) =>
      Math.max(
        Math.abs(line.z0 / z0.value - 1),
        Math.abs(line.velocityFactor / velocityFactor.value - 1),
        Math.abs(line.capacitance / capacitance.value - 1),
      ),
    );
  const insulation = usualInsulation(build);
  if (insulation && !drawn) costs.push((line) => Math.abs(outside(line.velocityFactor, insulation.velocityFactor)));
  const { z0: said } = stated;
  // Only where the stated impedance is a usual one can it be believed for that.
  if (!drawn && said && nearUsual(said) < agreementLimits.fine) costs.push((line) => nearUsual(line.z0));
  return costs;
}

const nearUsual = (z0: number) => Math.min(...usualImpedances.map((usual) => Math.abs(z0 / usual - 1)));

/** The line that all stated figures but one make, and how far these are from each other; undefined where they make none. */
function without(suspect: PerLengthQuantity, facts: Facts): { line: NominalFigures; apart: number } | undefined {
  const others = perLengthQuantities.flatMap((quantity) => {
    const value = facts.stated[quantity];
    return quantity === suspect || value === undefined ? [] : [{ quantity, value }];
  });
  const [first, ...rest] = others;
  for (const second of first ? rest : []) {
    const line = first && figuresFromTwo(first, second);
    if (!line) continue;
    const apart = Math.max(...others.map(({ quantity, value }) => Math.abs(value / line[quantity] - 1)));
    return { line, apart };
  }
  return undefined;
}

/** The odd one, where exactly one is, with what the rest say it should be. */
export function oddOne(facts: Facts): { quantity: PerLengthQuantity; implied: number } | undefined {
  const costs = witnesses(facts);
  const suspects = perLengthQuantities.flatMap((quantity) => {
    if (facts.stated[quantity] === undefined) return [];
    const rest = without(quantity, facts);
    const cost = rest && Math.max(rest.apart, ...costs.map((of) => of(rest.line)));
    return rest && cost !== undefined && cost <= agreementLimits.fine
      ? [{ quantity, implied: rest.line[quantity] }]
      : [];
  });
  return suspects.length === 1 ? suspects[0] : undefined;
}
