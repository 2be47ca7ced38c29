/** Whether an entry agrees with itself, told in sentences: what a reviewer reads before deciding. Pure. */
import { agreementOfEntry, type Check as Agreement, type Verdict } from "@/lib/cables/agreement";
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Cable } from "@/lib/cables/schema";
import { digits, frequency, inWords } from "@/lib/format/quantity";
import type { PerLengthQuantity } from "@/lib/line/per-length";

/** What a check says of an entry. */
export interface Check {
  /** its name; a reviewer's answer is kept under it */
  check: string;
  verdict: Verdict;
  sentence: string;
  /** how far apart, per cent */
  percent?: number;
  /** the figure that does not fit the others */
  culprit?: string;
}

export type Checked = Pick<Cable, "model" | "figures" | "construction" | "build" | "limits" | "family"> & {
  inputs?: EntryInputs | null;
};

const named: Record<PerLengthQuantity, string> = {
  z0: "the impedance",
  velocityFactor: "the velocity factor",
  capacitance: "the capacitance",
  inductance: "the inductance",
  delay: "the delay",
};

const apart = (percent: number) => `${digits(Math.abs(percent), 1)} %`;

function sentenceOf({ check, verdict, percent, frequencyHz }: Agreement, culprit: string | undefined): string {
  const odd = culprit ? ` The one that does not fit is ${culprit}.` : "";
  switch (check) {
    case "triangle":
      return verdict === "fine"
        ? `Impedance, velocity factor and capacitance agree within ${apart(percent)}.`
        : `Impedance, velocity factor and capacitance are ${apart(percent)} apart.${odd}`;
    case "model":
      return verdict === "fine"
        ? `The model has the figures stated within ${apart(percent)}.`
        : `The model is ${apart(percent)} from the figures stated.`;
    case "lossTable":
      return `The model is ${apart(percent)} from the loss table on average.`;
    case "cutoff":
      return verdict === "fine"
        ? `Its second mode begins at ${inWords(frequency(frequencyHz))}, above the highest frequency it is rated for.`
        : `It is rated above ${inWords(frequency(frequencyHz))}, where its second mode begins.`;
  }
}

/** Every check that the entry's figures allow. */
export function checksOf(cable: Checked): Check[] {
  const { checks, oddOneOut } = agreementOfEntry(cable);
  return checks.map((each) => {
    const culprit = each.check === "triangle" && each.verdict !== "fine" && oddOneOut ? named[oddOneOut] : undefined;
    const { check, verdict, percent } = each;
    return { check, verdict, percent, sentence: sentenceOf(each, culprit), ...(culprit && { culprit }) };
  });
}
