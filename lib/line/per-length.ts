/**
 * The five figures of a line's metre that its makers print, and what any two of them say about the rest. All five are
 * powers of two unknowns, impedance and velocity, so each is a straight line in their logarithms.
 */
import type { NominalFigures } from "@/lib/line/cable";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";

export type PerLengthQuantity = keyof NominalFigures;

/** One figure as stated: ohm, fraction of the speed of light, s/m, F/m or H/m, above 0. */
export interface Stated {
  quantity: PerLengthQuantity;
  value: number;
}

/** In the order in which they are believed: what is printed largest first. */
export const perLengthQuantities = ["z0", "velocityFactor", "delay", "capacitance", "inductance"] as const;

/** Powers of impedance (ohm) and of velocity (m/s); the velocity factor is the velocity over the speed of light. */
const powers: Record<PerLengthQuantity, readonly [number, number]> = {
  z0: [1, 0],
  velocityFactor: [0, 1],
  delay: [0, -1],
  capacitance: [-1, -1],
  inductance: [1, -1],
};

/** Disagreement of a stated figure that rounding explains, and beyond which somebody should look; as fractions. */
export const agreementLimits = { fine: 0.03, look: 0.06 };

/** Every figure of a line of this impedance (ohm) and velocity (m/s). */
function figuresOf(z0: number, velocity: number): NominalFigures {
  return {
    z0,
    velocityFactor: velocity / SPEED_OF_LIGHT,
    delay: 1 / velocity,
    capacitance: 1 / (z0 * velocity),
    inductance: z0 / velocity,
  };
}

function logarithm({ quantity, value }: Stated): number {
  if (!(value > 0 && value < Infinity))
    throw new RangeError(`figuresFromTwo: ${quantity} must be positive, got ${value}`);
  return Math.log(quantity === "velocityFactor" ? value * SPEED_OF_LIGHT : value);
}

/**
 * All five figures from two of them.
 * @returns undefined where both say the same thing: one quantity twice, or velocity factor and delay
 * @throws RangeError when a value is not positive and finite
 * Source: Z0 = √(L/C), v = 1/√(LC); D. M. Pozar, Microwave Engineering, 4th ed., section 2.1, lossless line.
 */
export function figuresFromTwo(first: Stated, second: Stated): NominalFigures | undefined {
  const [a, b] = powers[first.quantity];
  const [c, d] = powers[second.quantity];
  const determinant = a * d - b * c;
  const [p, q] = [logarithm(first), logarithm(second)];
  if (determinant === 0) return undefined;
  return figuresOf(Math.exp((p * d - b * q) / determinant), Math.exp((a * q - p * c) / determinant));
}

/** A stated figure beside what the two that are believed say it should be. */
export interface Compared extends Stated {
  implied: number;
  /** stated over implied, less 1 */
  deviation: number;
}

export interface Agreement {
  /** the first two, in the order of belief, that determine the rest */
  from: readonly [PerLengthQuantity, PerLengthQuantity];
  figures: NominalFigures;
  /** every other stated figure */
  compared: Compared[];
  /** the largest deviation without its sign; 0 where nothing was compared */
  worst: number;
  /** the one figure without which the others agree, where there is exactly one and enough are stated to tell */
  oddOneOut: PerLengthQuantity | undefined;
}

/**
 * What two or more stated figures make together.
 * @returns undefined where they do not determine a line
 * @throws RangeError when a value is not positive and finite
 */
export function agreementOf(stated: readonly Stated[]): Agreement | undefined {
  const ordered = inOrder(stated);
  const agreement = determined(ordered);
  if (!agreement) return undefined;
  return { ...agreement, oddOneOut: agreement.worst > agreementLimits.fine ? oddOneOut(ordered) : undefined };
}

function inOrder(stated: readonly Stated[]): Stated[] {
  return perLengthQuantities.flatMap((quantity) => stated.find((each) => each.quantity === quantity) ?? []);
}

function determined(ordered: readonly Stated[]): Omit<Agreement, "oddOneOut"> | undefined {
  const [first, ...rest] = ordered;
  if (!first) return undefined;
  for (const second of rest) {
    const figures = figuresFromTwo(first, second);
    if (!figures) continue;
    const compared = ordered
      .filter((each) => each !== first && each !== second)
      .map((each) => ({
        ...each,
        implied: figures[each.quantity],
        deviation: each.value / figures[each.quantity] - 1,
      }));
    const worst = compared.reduce((most, { deviation }) => Math.max(most, Math.abs(deviation)), 0);
    return { from: [first.quantity, second.quantity], figures, compared, worst };
  }
  return undefined;
}

function oddOneOut(ordered: readonly Stated[]): PerLengthQuantity | undefined {
  const suspects = ordered.filter((suspect) => {
    const others = determined(ordered.filter((each) => each !== suspect));
    return others !== undefined && others.compared.length > 0 && others.worst <= agreementLimits.fine;
  });
  return suspects.length === 1 ? suspects[0]?.quantity : undefined;
}

/**
 * Relative permittivity that gives a velocity factor, 1/VF²: of the insulation of a coaxial cable, the effective one
 * of a pair. For a line without magnetic material.
 * @param velocityFactor - above 0
 */
export function permittivityOf(velocityFactor: number): number {
  return 1 / (velocityFactor * velocityFactor);
}
