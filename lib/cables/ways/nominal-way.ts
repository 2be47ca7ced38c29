/** What nominal figures say of their cable. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Family } from "@/lib/cables/schema";
import { type Estimate, propagated, within } from "@/lib/cables/ways/estimate";
import { usualImpedanceSpread, usualSpreads } from "@/lib/cables/ways/usual-spreads";
import type { WayResult } from "@/lib/cables/ways/way";
import { figuresFromTwo, type PerLengthQuantity, perLengthQuantities } from "@/lib/line/per-length";

export type Nominal = NonNullable<EntryInputs["nominal"]>;

const orUsual = (value: number, tolerance: number | undefined, usual: number): Estimate =>
  tolerance === undefined ? within(value, usual) : { value, spread: tolerance };

/** The figures as stated, in the order in which they are believed. */
export function statedFigures(nominal: Nominal, family: Family): Partial<Record<PerLengthQuantity, Estimate>> {
  const { z0Ohm, velocityFactor, cFPerM, lInfHPerM } = nominal;
  return {
    ...(z0Ohm && { z0: orUsual(z0Ohm, nominal.z0ToleranceOhm, usualImpedanceSpread(family, z0Ohm)) }),
    ...(velocityFactor && {
      velocityFactor: orUsual(velocityFactor, nominal.velocityFactorTolerance, usualSpreads.velocityFactor),
    }),
    ...(cFPerM && { capacitance: orUsual(cFPerM, nominal.cToleranceFPerM, usualSpreads.capacitance) }),
    ...(lInfHPerM && { inductance: within(lInfHPerM, usualSpreads.inductance) }),
  };
}

/** A figure from two others, with what their spreads make of it. */
export function fromTwo(
  wanted: PerLengthQuantity,
  [first, a]: readonly [PerLengthQuantity, Estimate],
  [second, b]: readonly [PerLengthQuantity, Estimate],
): Estimate {
  return propagated(
    (...values) => {
      const [p = NaN, q = NaN] = values;
      if (!(p > 0 && q > 0)) return NaN;
      const figures = figuresFromTwo({ quantity: first, value: p }, { quantity: second, value: q });
      return figures?.[wanted] ?? NaN;
    },
    [a, b],
  );
}

/** What is stated, and from the first two of it what is not. */
export function nominalWay(nominal: Nominal, family: Family): WayResult {
  const stated = statedFigures(nominal, family);
  const given = perLengthQuantities.flatMap((quantity) => {
    const estimate = stated[quantity];
    return estimate ? [[quantity, estimate] as const] : [];
  });
  const [first, second] = given;
  const figure = (quantity: PerLengthQuantity) =>
    stated[quantity] ?? (first && second ? fromTwo(quantity, first, second) : undefined);
  const { loopResistanceOhmPerM: loop, conductorResistanceOhmPerM: core, lossTangent } = nominal;
  return {
    z0: figure("z0"),
    velocityFactor: figure("velocityFactor"),
    capacitance: figure("capacitance"),
    inductance: figure("inductance"),
    // Of a pair the loop is twice one wire; of a coaxial cable the outer conductor is not told by the inner one.
    ...(loop !== undefined
      ? { loopResistance: within(loop, usualSpreads.resistance) }
      : core !== undefined && family !== "coaxial" && { loopResistance: within(2 * core, usualSpreads.resistance) }),
    ...(core !== undefined && { conductorResistance: within(core, usualSpreads.resistance) }),
    ...(lossTangent !== undefined && { lossTangent }),
    notes:
      loop === undefined && core !== undefined && family !== "coaxial" ? ["The loop is taken as twice one wire."] : [],
  };
}
