/** Whether the stated figures of a metre go together. Pure. */
import { aboveWords, percentWords, verdictOf, withinWords } from "@/lib/cables/checking/check";
import type { Check } from "@/lib/cables/checks";
import type { Facts } from "@/lib/cables/checking/facts";
import { insulationsFor } from "@/lib/cables/checking/insulation";
import { oddOne } from "@/lib/cables/checking/odd-one";
import { significantDigits } from "@/lib/format/quantity";
import { figuresFromTwo, type PerLengthQuantity } from "@/lib/line/per-length";

export const quantityWords: Record<PerLengthQuantity, string> = {
  z0: "the impedance",
  velocityFactor: "the velocity factor",
  delay: "the delay",
  capacitance: "the capacitance",
  inductance: "the inductance",
};

const shown: Record<PerLengthQuantity, (value: number) => string> = {
  z0: (value) => `${significantDigits(value, 3)} Ω`,
  velocityFactor: (value) => significantDigits(value, 3),
  delay: (value) => `${significantDigits(value * 1e9, 3)} ns/m`,
  capacitance: (value) => `${significantDigits(value * 1e12, 3)} pF/m`,
  inductance: (value) => `${significantDigits(value * 1e9, 3)} nH/m`,
};
export const quantityShown = (quantity: PerLengthQuantity, value: number) => shown[quantity](value);

/** What a wrong capacitance may be the capacitance of. */
function likeness({ stated }: Facts): string {
  const { z0, capacitance } = stated;
  if (!z0 || !capacitance) return "";
  const line = figuresFromTwo({ quantity: "z0", value: z0 }, { quantity: "capacitance", value: capacitance });
  const [insulation] = line ? insulationsFor(line.velocityFactor) : [];
  if (!line || !insulation) return "";
  const velocity = significantDigits(line.velocityFactor, 3);
  return ` With it the velocity factor would be ${velocity}, that of ${insulation.name}: it may be another construction’s.`;
}

/** Z0, C and velocity: any two make the third. */
export function triangleChecks(facts: Facts): Check[] {
  const { z0, velocityFactor, capacitance } = facts.stated;
  if (!z0 || !velocityFactor || !capacitance) return [];
  const line = figuresFromTwo({ quantity: "z0", value: z0 }, { quantity: "velocityFactor", value: velocityFactor });
  if (!line) return [];
  const deviation = capacitance / line.capacitance - 1;
  const verdict = verdictOf(deviation);
  const base = { check: "triangle", verdict, percent: 100 * deviation };
  if (verdict === "fine")
    return [
      { ...base, sentence: `Impedance, velocity factor and capacitance agree within ${withinWords(deviation)}.` },
    ];
  const odd = oddOne(facts);
  const apart = `Impedance, velocity factor and capacitance are ${percentWords(deviation)} apart.`;
  if (!odd)
    return [
      {
        ...base,
        sentence: `${apart} Which of them is wrong they do not tell alone: give the construction, or look at the source.`,
      },
    ];
  const { quantity, implied } = odd;
  const value = facts.stated[quantity] ?? NaN;
  const should = `The odd one is ${quantityWords[quantity]}: ${shown[quantity](value)} is stated, the rest say ${shown[quantity](implied)}.`;
  return [
    {
      ...base,
      culprit: quantityWords[quantity],
      sentence: `${apart} ${should}${quantity === "capacitance" ? likeness(facts) : ""}`,
    },
  ];
}

/** L against Z0 and velocity, or against Z0 and C. */
export function inductanceChecks({ stated }: Facts): Check[] {
  const { z0, velocityFactor, capacitance, inductance } = stated;
  if (!z0 || !inductance) return [];
  const other =
    velocityFactor !== undefined
      ? ({ quantity: "velocityFactor", value: velocityFactor } as const)
      : capacitance !== undefined && ({ quantity: "capacitance", value: capacitance } as const);
  const line = other && figuresFromTwo({ quantity: "z0", value: z0 }, other);
  if (!line) return [];
  const deviation = inductance / line.inductance - 1;
  const verdict = verdictOf(deviation);
  const with_ = other.quantity === "velocityFactor" ? "impedance and velocity factor" : "impedance and capacitance";
  return [
    {
      ...{ check: "inductance", verdict, percent: 100 * deviation },
      ...(verdict !== "fine" && { culprit: "the inductance" }),
      sentence:
        verdict === "fine"
          ? `The inductance agrees with ${with_} within ${withinWords(deviation)}.`
          : `The inductance is ${aboveWords(deviation)} the ${shown.inductance(line.inductance)} that ${with_} give.`,
    },
  ];
}

/** How much more a core has to the other core and the screen together than to the other core. */
const coreAndScreen = [1.4, 2.3] as const;

/** Of a screened pair: whether the capacitance is that between the cores, or of one core to the other and the screen. */
export function coreCapacitanceChecks(facts: Facts): Check[] {
  const { family, build, construction, stated } = facts;
  const isScreened = (build?.screen.length ?? 0) > 0 || (construction?.kind === "pair" && construction.screen);
  const { z0, velocityFactor, capacitance } = stated;
  if (family === "coaxial" || !isScreened || !z0 || !velocityFactor || !capacitance) return [];
  const line = figuresFromTwo({ quantity: "z0", value: z0 }, { quantity: "velocityFactor", value: velocityFactor });
  const times = line ? capacitance / line.capacitance : NaN;
  const isSlip = times >= coreAndScreen[0] && times <= coreAndScreen[1];
  const [low] = coreAndScreen;
  if (!isSlip && !(times < low)) return [];
  return [
    isSlip
      ? {
          ...{
            check: "coreCapacitance",
            verdict: "contradiction",
            percent: 100 * (times - 1),
            culprit: "the capacitance",
          },
          sentence: `The capacitance is ${significantDigits(times, 2)} times what impedance and velocity give: it is likely that of a core to the other core and the screen. State the one between the cores.`,
        }
      : { check: "coreCapacitance", verdict: "fine", sentence: "The capacitance is the one between the cores." },
  ];
}
