/** What is stated against what the construction gives, and the end of the band it can carry. Pure. */
import { aboveWords, verdictOf, withinWords } from "@/lib/cables/checking/check";
import type { Check } from "@/lib/cables/checks";
import type { Facts } from "@/lib/cables/checking/facts";
import { quantityShown, quantityWords } from "@/lib/cables/checking/triangle";
import { frequency, inWords, significantDigits } from "@/lib/format/quantity";
import { coaxCutoff } from "@/lib/line/coax-cutoff";
import { agreementLimits } from "@/lib/line/per-length";

const compared = ["z0", "velocityFactor", "capacitance"] as const;
type Compared = (typeof compared)[number];

/** What is wrong, by which of the three are off: a diameter moves Z0 and C, the permittivity velocity, C and Z0. */
function culpritOf(isOff: Record<Compared, boolean>): string {
  const { z0, velocityFactor, capacitance } = isOff;
  if (z0 && velocityFactor) return "the construction";
  if (z0 && capacitance) return "a diameter of the construction";
  if (velocityFactor && capacitance) return "the permittivity";
  return quantityWords[compared.find((quantity) => isOff[quantity]) ?? "z0"];
}

/** Z0, velocity and C as the construction has them. */
export function constructionChecks({ drawn, stated }: Facts): Check[] {
  if (!drawn) return [];
  const apart = compared.flatMap((quantity) => {
    const [value, estimate] = [stated[quantity], drawn[quantity]];
    return value === undefined || !estimate
      ? []
      : [{ quantity, value, drawn: estimate.value, by: value / estimate.value - 1 }];
  });
  const [first, ...rest] = apart;
  if (!first) return [];
  const worst = rest.reduce((most, each) => (Math.abs(each.by) > Math.abs(most.by) ? each : most), first);
  const verdict = verdictOf(worst.by);
  const base = { check: "construction", verdict, percent: 100 * worst.by };
  if (verdict === "fine")
    return [{ ...base, sentence: `The construction gives the figures stated within ${withinWords(worst.by)}.` }];
  const isOff = (quantity: Compared) =>
    apart.some((each) => each.quantity === quantity && Math.abs(each.by) > agreementLimits.fine);
  const { quantity, value } = worst;
  return [
    {
      ...base,
      culprit: culpritOf({
        z0: isOff("z0"),
        velocityFactor: isOff("velocityFactor"),
        capacitance: isOff("capacitance"),
      }),
      sentence: `The construction gives ${quantityShown(quantity, worst.drawn)} for ${quantityWords[quantity]}; stated is ${quantityShown(quantity, value)}, ${aboveWords(worst.by)}.`,
    },
  ];
}

/** A construction whose parts do not go together. */
export function impossibleChecks({ construction, drawn }: Facts): Check[] {
  if (!construction || drawn) return [];
  const sentence = "The construction cannot be: its parts do not fit into each other, or a permittivity is below 1.";
  return [{ check: "construction", verdict: "contradiction", culprit: "the construction", sentence }];
}

/** A coaxial cable must not be rated up to where its second mode begins. */
export function cutoffChecks({ construction, limits, drawn }: Facts): Check[] {
  if (!drawn || construction?.kind !== "coax" || limits.maxFrequencyHz === undefined) return [];
  const { innerMm, dielectricMm, relativePermittivity } = construction;
  const begins = coaxCutoff(innerMm / 1000, dielectricMm / 1000, relativePermittivity);
  const above = begins / limits.maxFrequencyHz - 1;
  const base = { check: "cutoff", percent: 100 * above };
  const at = inWords(frequency(Number(begins.toPrecision(3))));
  const rated = inWords(frequency(limits.maxFrequencyHz));
  if (above > 0)
    return [
      { ...base, verdict: "fine", sentence: `Its second mode begins at ${at}, above the ${rated} it is rated for.` },
    ];
  const sentence = `It is rated to ${rated}, but from ${at} it carries a second mode as well.`;
  return [{ ...base, verdict: "contradiction", culprit: "the highest rated frequency", sentence }];
}

/** Dc resistance of conductors as stated against their cross-section: strands are laid, so a little more is usual. */
const resistanceLimits = { fine: 0.06, look: 0.15 };
const notPlainCopper = /clad|steel|alumin|cca|ccs/i;

/** One conductor's dc resistance against its size. */
export function conductorChecks({ drawn, core, loop, construction, build, family }: Facts): Check[] {
  if (!drawn || !construction) return [];
  const isDeclared = construction.conductorResistivityOhmM !== undefined;
  if (!isDeclared && notPlainCopper.test(build?.conductor ?? "")) return [];
  // Of a coaxial cable the loop needs the shield's thickness, which is rarely known; of a pair it is two wires.
  const isLoopKnown = construction.kind === "pair" || construction.shieldThicknessMm !== undefined;
  const ofLoop = isLoopKnown ? drawn.loopResistance?.value : undefined;
  const [value, given, what] =
    core !== undefined
      ? [core, drawn.conductorResistance?.value, family === "coaxial" ? "inner conductor" : "wire"]
      : [loop, ofLoop, "loop"];
  if (value === undefined || given === undefined || !(given > 0)) return [];
  const by = value / given - 1;
  // Twice and half are slips of counting, which have a check of their own.
  if (what === "loop" && isCountingSlip(value / given)) return [];
  const verdict = verdictOf(by, resistanceLimits);
  const base = { check: "conductorResistance", verdict, percent: 100 * by };
  const size = `${significantDigits(given * 1000, 3)} Ω/km`;
  if (verdict === "fine")
    return [
      {
        ...base,
        sentence: `The dc resistance of the ${what} is that of its cross-section within ${withinWords(by)}.`,
      },
    ];
  const clad = by > 1.5 ? " So much more is not copper: is the conductor clad steel, or aluminium?" : "";
  const sentence = `The ${what} of this size has ${size} in copper; stated is ${aboveWords(by)}.${clad}`;
  return [{ ...base, culprit: `the resistance of the ${what}`, sentence }];
}

/** Whether a resistance over what it should be is a slip of counting conductors. */
export function isCountingSlip(times: number): boolean {
  return [0.5, 2].some((slip) => Math.abs(times / slip - 1) < 0.12);
}

/** The loop against one conductor: of a pair twice, of a coaxial cable the inner one and the shield. */
export function loopChecks({ loop, core, drawn, construction, family }: Facts): Check[] {
  const one = core ?? drawn?.conductorResistance?.value;
  if (loop === undefined || one === undefined || !(one > 0)) return [];
  const times = loop / one;
  const base = { check: "loopResistance", percent: 100 * (times / 2 - 1) };
  const by = significantDigits(times, 3);
  if (family === "coaxial") {
    if (times > 1)
      return [
        {
          check: "loopResistance",
          verdict: "fine",
          sentence: "The loop has more resistance than the inner conductor alone.",
        },
      ];
    const sentence = `The loop is ${by} times the inner conductor alone: it must be more, by the shield. Is it the inner conductor’s?`;
    return [{ check: "loopResistance", verdict: "contradiction", culprit: "the loop resistance", sentence }];
  }
  if (core === undefined && construction?.kind !== "pair") return [];
  if (isCountingSlip(times / 2)) {
    const sentence =
      times < 2
        ? `The loop is ${by} times one wire: it is the resistance of one core. A loop is there and back.`
        : `The loop is ${by} times one wire: it counts the pair twice.`;
    return [{ ...base, verdict: "contradiction", culprit: "the loop resistance", sentence }];
  }
  if (core === undefined) return [];
  const verdict = verdictOf(times / 2 - 1, resistanceLimits);
  const sentence =
    verdict === "fine" ? "The loop is twice one wire." : `The loop is ${by} times one wire; a pair has 2.`;
  return [{ ...base, verdict, sentence, ...(verdict !== "fine" && { culprit: "the loop resistance" }) }];
}
