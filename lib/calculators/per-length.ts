/** Per-length figures: any two that determine a line give the rest; every further one is held against them. Pure. */
import { optional, quantity, typed, type Outcome, type Values } from "@/lib/calculators/input";
import { fault, found } from "@/lib/calculators/input";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";
import type { NominalFigures } from "@/lib/line/cable";
import {
  agreementLimits,
  agreementOf,
  figuresFromTwo,
  perLengthQuantities,
  permittivityOf,
  type Agreement,
  type PerLengthQuantity,
  type Stated,
} from "@/lib/line/per-length";

const positive = { isPositive: true } as const;

export const perLengthInputs = {
  z0: optional(quantity("resistance", "Impedance", "50", { ...positive, most: 1e6 })),
  vf: optional(typed("Velocity factor", "0.66", readVelocityFactor)),
  delay: optional(quantity("timePerLength", "Delay", "", { ...positive, most: 1e-3 })),
  c: optional(quantity("capacitancePerLength", "Capacitance", "", { ...positive, most: 1 })),
  l: optional(quantity("inductancePerLength", "Inductance", "", { ...positive, most: 1 })),
};

export type PerLengthInput = keyof typeof perLengthInputs;

/** Which input holds which figure. */
export const inputOf: Record<PerLengthQuantity, PerLengthInput> = {
  z0: "z0",
  velocityFactor: "vf",
  delay: "delay",
  capacitance: "c",
  inductance: "l",
};

/** What a figure would be if it were the wrong one of three. */
export interface Alternative {
  quantity: PerLengthQuantity;
  given: number;
  /** by the other two */
  others: NominalFigures;
}

export interface PerLength {
  stated: Stated[];
  agreement: Agreement;
  grade: "alone" | "fine" | "look" | "contradiction";
  /** which of three could be wrong, where they contradict one another and nothing tells which it is */
  alternatives: Alternative[];
  permittivity: number;
}

export function perLength(values: Values<typeof perLengthInputs>): Outcome<PerLength> {
  const stated = perLengthQuantities.flatMap((quantity): Stated[] => {
    const value = values[inputOf[quantity]];
    return value === undefined ? [] : [{ quantity, value }];
  });
  const agreement = agreementOf(stated);
  if (!agreement) return tooLittle(stated);
  return found({
    stated,
    agreement,
    grade: gradeOf(agreement),
    alternatives: alternativesOf(stated, agreement),
    permittivity: permittivityOf(agreement.figures.velocityFactor),
  });
}

function tooLittle(stated: readonly Stated[]): Outcome<never> {
  if (stated.length === 0) return fault("z0", "Give two of the five figures.");
  if (stated.length > 1) return fault("z0", "Velocity factor and delay say the same thing: give one more figure.");
  const isImpedance = stated[0]?.quantity === "z0";
  return fault(isImpedance ? "vf" : "z0", "Give one more figure.");
}

function gradeOf({ compared, worst }: Agreement): PerLength["grade"] {
  if (compared.length === 0) return "alone";
  if (worst <= agreementLimits.fine) return "fine";
  return worst <= agreementLimits.look ? "look" : "contradiction";
}

function alternativesOf(stated: readonly Stated[], { worst, oddOneOut }: Agreement): Alternative[] {
  if (stated.length !== 3 || worst <= agreementLimits.fine || oddOneOut) return [];
  return stated.flatMap(({ quantity, value }) => {
    const [first, second] = stated.filter((other) => other.quantity !== quantity);
    const others = first && second && figuresFromTwo(first, second);
    return others ? [{ quantity, given: value, others }] : [];
  });
}
