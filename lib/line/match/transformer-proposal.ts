import type { Element } from "@/lib/line/element";
import { cutText, leadName, lengthNotes, placeText, type DesignPoint } from "@/lib/line/match/design-point";
import { sectionElement, sectionLabel, sectionOhm, type SectionLine } from "@/lib/line/match/fit-line";
import type { Proposal } from "@/lib/line/match/match-request";
import { sectionNames } from "@/lib/line/match/piece-name";
import type { RealPlace } from "@/lib/line/match/real-place";
import type { StepTransformer } from "@/lib/line/match/step-transformer";
import { decibelText, listText, ohmText } from "@/lib/line/match/wording";

export type TransformerKind = "binomial" | "equalRipple";

export interface Transformer {
  kind: TransformerKind;
  place: RealPlace;
  design: StepTransformer;
  /** what it keeps over its band without loss, dB */
  limitDb: number;
  /** from the target side */
  lines: SectionLine[];
  /** section impedances over the target by small reflections; empty where that theory has none */
  textbook: readonly number[];
}

const words = { binomial: "Binomial transformer", equalRipple: "Equal-ripple transformer" };

/** Small reflections that differ by less than this from the exact design are not worth a note. */
const worthSaying = 0.002;

/** A transformer as elements, with what it needs. */
export function transformerProposal(point: DesignPoint, transformer: Transformer): Proposal {
  const { kind, place, lines } = transformer;
  const { feeder } = point;
  const lead: Element[] =
    feeder && place.distance > 0
      ? [{ kind: "cable", name: leadName(point, "Section"), line: feeder.line, lengthM: place.distance }]
      : [];
  const sections = lines.map((each, n) => sectionElement(each, sectionNames[n]!, each.line.wavelengthM / 4));
  const made = listText(lines.map((each) => ohmText(sectionOhm(each))));
  const count = lines.length === 1 ? "1 section" : `${lines.length} sections`;
  return {
    method: kind,
    title: `${words[kind]} of ${count}, ${made} ${placeText(point, place.distance)}`,
    elements: [...sections, ...lead],
    ...(lines.some(({ isIdeal }) => isIdeal) && { hasIdealLine: true as const }),
    needs: [
      `${lines.length + 1} joints`,
      ...lines.map((each, n) => needOf(point, each, n)),
      ...(feeder && lead.length > 0
        ? [`${cutText(point, place.distance)} of ${feeder.label} to ${point.words.place}`]
        : []),
    ],
    notes: [...designNotes(point, transformer), ...lengthNotes(point, usedLines(point, lines, lead.length > 0))],
  };
}

function usedLines({ feeder }: DesignPoint, lines: SectionLine[], hasLead: boolean) {
  return [...lines.map(({ line }) => line), ...(feeder && hasLead ? [feeder] : [])];
}

function needOf(point: DesignPoint, section: SectionLine, n: number): string {
  const length = cutText(point, section.line.wavelengthM / 4);
  const label = sectionLabel(section);
  return `${section.count > 1 ? label.replace("×", `× ${length} of`) : `${length} of ${label}`} for section ${n + 1}`;
}

function designNotes({ request }: DesignPoint, { place, design, lines, limitDb, textbook }: Transformer): string[] {
  const { targetOhm } = request;
  const exact = design.sectionsOverFirst.map((each) => each * targetOhm);
  const half = (design.fractionalBandwidth * 50).toFixed(1);
  const isOff = textbook.some((each, n) => Math.abs(each / design.sectionsOverFirst[n]! - 1) > worthSaying);
  return [
    `Exact design between ${ohmText(targetOhm)} and ${ohmText(place.resistanceOhm)}: ${listText(exact.map(ohmText))} from the target side; without loss it keeps ${decibelText(limitDb)} over ±${half}\u00a0% of the design frequency.`,
    ...(isOff
      ? [`The theory of small reflections has ${listText(textbook.map((each) => ohmText(each * targetOhm)))}.`]
      : []),
    "Each section is a quarter wave of its own line: trim each by itself before joining.",
    ...(lines.some(({ isIdeal }) => isIdeal)
      ? ["No cable given has the impedance of an ideal line: it is taken without loss and in air, and has to be made."]
      : []),
  ];
}
