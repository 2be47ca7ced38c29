/** Slips in how a velocity is given, and whether it goes with the insulation. Pure. */
import { percentWords } from "@/lib/cables/checking/check";
import type { Check } from "@/lib/cables/checks";
import type { Facts } from "@/lib/cables/checking/facts";
import { insulationsFor, outside, usualInsulation } from "@/lib/cables/checking/insulation";
import { digits, significantDigits } from "@/lib/format/quantity";
import { agreementLimits, figuresFromTwo } from "@/lib/line/per-length";

const culprit = "the velocity factor";
const shown = (value: number) => significantDigits(value, 3);

/** The velocity that the rest of the entry speaks for: construction, or impedance and capacitance. */
function expected({ drawn, stated: { z0, capacitance } }: Facts): number | undefined {
  if (drawn?.velocityFactor) return drawn.velocityFactor.value;
  if (!z0 || !capacitance) return undefined;
  return figuresFromTwo({ quantity: "z0", value: z0 }, { quantity: "capacitance", value: capacitance })?.velocityFactor;
}

/** Above 1: the shortening factor, 1/VF, as some instruments and old sheets have it. */
function inverse(velocityFactor: number): Check {
  const [insulation] = insulationsFor(1 / velocityFactor);
  const like = insulation ? `, that of ${insulation.name}` : "";
  const sentence = `Nothing outruns light: ${shown(velocityFactor)} is likely 1/VF, and the velocity factor ${shown(1 / velocityFactor)}${like}.`;
  return { check: "velocity", verdict: "contradiction", culprit, sentence, percent: 100 * (velocityFactor - 1) };
}

/** Half of what it should be: v/2, as instruments that look at echoes count the way there and back as one. */
function half(velocityFactor: number, other: number | undefined, facts: Facts): Check | null {
  const usual = usualInsulation(facts.build);
  const isHalf =
    other !== undefined
      ? Math.abs((2 * velocityFactor) / other - 1) <= agreementLimits.look
      : usual !== undefined &&
        outside(velocityFactor, usual.velocityFactor) !== 0 &&
        outside(2 * velocityFactor, usual.velocityFactor) === 0;
  if (!isHalf) return null;
  const sentence = `The velocity factor is half of what the rest says, ${shown(2 * velocityFactor)}: it is likely v/2, as instruments have it that count an echo’s way once.`;
  return { check: "velocity", verdict: "contradiction", culprit, sentence, percent: -50 };
}

/** Beyond the usual range by more than this somebody should look. */
const slack = 0.02;

export function velocityChecks(facts: Facts): Check[] {
  const { velocityFactor } = facts.stated;
  const value = velocityFactor ?? facts.drawn?.velocityFactor?.value;
  if (value === undefined) return [];
  if (value > 1) return [inverse(value)];
  const slip = velocityFactor === undefined ? null : half(velocityFactor, expected(facts), facts);
  if (slip) return [slip];
  const usual = usualInsulation(facts.build);
  if (!usual) return [{ check: "velocity", verdict: "fine", sentence: "The velocity is below that of light." }];
  // A pair's field is partly in the air between its cores: it may be faster than its insulation.
  const [from, to] = usual.velocityFactor;
  const range = facts.family === "coaxial" ? ([from, to] as const) : ([from * 0.87, 0.92] as const);
  const beyond = outside(value, range);
  const words = `${usual.name} (${digits(range[0], 2)} to ${digits(range[1], 2)})`;
  if (Math.abs(beyond) <= slack)
    return [{ check: "velocity", verdict: "fine", sentence: `The velocity is below that of light and fits ${words}.` }];
  const [like] = insulationsFor(value);
  const other = like ? ` It would fit ${like.name}.` : "";
  const sentence = `A velocity factor of ${shown(value)} is ${percentWords(beyond)} outside what is usual for ${words}.${other}`;
  return [{ check: "velocity", verdict: "look", culprit, sentence, percent: 100 * beyond }];
}
