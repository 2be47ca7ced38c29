import type { Element } from "@/lib/line/element";
import { alternatingLength } from "@/lib/line/match/alternating";
import {
  cutText,
  leadName,
  lengthNotes,
  placeText,
  type DesignLine,
  type DesignPoint,
} from "@/lib/line/match/design-point";
import { fitLine, sectionElement, sectionLabel, sectionOhm, type SectionLine } from "@/lib/line/match/fit-line";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { along, loadPair, withLossShare, type Pair } from "@/lib/line/match/pair";
import { realPlaces, type RealPlace } from "@/lib/line/match/real-place";
import { solveLengths, type Lengths, type Network } from "@/lib/line/match/solve-lengths";
import { trimNotes } from "@/lib/line/match/trim";
import { lengthText, listText, ohmText } from "@/lib/line/match/wording";

/** A line this near to one of the two resistances still makes a pair of sections; their lengths are solved anew. */
const fitShare = 0.1;
/** Resistances within this ratio of the target need no sections. */
const equal = 1e-4;

interface Sections {
  place: RealPlace;
  /** next to the target, of about the resistance at the far side */
  first: SectionLine;
  /** next to what is matched, of about the target */
  second: SectionLine;
}

/**
 * Two short sections between the target and a resistance, each of a line that has the other's impedance: no special line
 * is needed. At every place where the feeder shows a resistance; both solutions, solved with the lines' own impedance
 * and loss.
 */
export function alternatingMatches(point: DesignPoint): Outcome {
  const { feeder, lines, request } = point;
  const places = realPlaces(point).filter(
    ({ resistanceOhm }) => Math.abs(Math.log(resistanceOhm / request.targetOhm)) > equal,
  );
  const known = feeder && !lines.includes(feeder) ? [...lines, feeder] : lines;
  const pairs = places.flatMap((place): Sections[] => {
    const first = fitLine(known, place.resistanceOhm, fitShare);
    const second = fitLine(known, request.targetOhm, fitShare);
    return first && second && sectionLabel(first) !== sectionLabel(second) ? [{ place, first, second }] : [];
  });
  const proposals = pairs.flatMap((pair) => solutions(point, pair).map((lengths) => proposal(point, pair, lengths)));
  return { proposals, why: proposals.length === 0 ? reason(point, places, pairs.length > 0) : "" };
}

function solutions(point: DesignPoint, { place, first, second }: Sections): Lengths[] {
  const { feeder, request } = point;
  const length = alternatingLength(place.resistanceOhm / request.targetOhm);
  const halfWaves: Lengths = [second.line.wavelengthM / 2, first.line.wavelengthM / 2];
  const starts = [length, 0.5 - length].map((each): Lengths => [
    each * second.line.wavelengthM,
    each * first.line.wavelengthM,
  ]);
  // The place is one with the feeder's loss already: of the sections alone the loss is brought in by degrees.
  const there: Pair = feeder ? along(loadPair(point), feeder, place.distance) : loadPair(point);
  const network: Network = (share) => {
    const [near, far] = [withLossShare(first.line, share), withLossShare(second.line, share)];
    return (b, a) => along(along(there, far, b, second.count), near, a, first.count);
  };
  return solveLengths(point, network, starts, halfWaves).filter((each) => each.every((one) => one > 0));
}

function proposal(point: DesignPoint, { place, first, second }: Sections, [far, near]: Lengths): Proposal {
  const { feeder } = point;
  const hasLead = feeder !== undefined && place.distance > 0;
  const build = (lengthM: number): Element[] => [
    sectionElement(first, "Section 1", lengthM),
    sectionElement(second, "Section 2", far),
    ...(hasLead
      ? [{ kind: "cable" as const, name: leadName(point, "Section"), line: feeder.line, lengthM: place.distance }]
      : []),
  ];
  const of = (section: SectionLine, length: string) =>
    section.count > 1 ? `${section.count} × ${length} of ${section.line.label}` : `${length} of ${section.line.label}`;
  const used: DesignLine[] = [first.line, second.line, ...(hasLead ? [feeder] : [])];
  return {
    method: "alternatingSections",
    title: `Two alternating sections, ${of(first, lengthText(near))} then ${of(second, lengthText(far))} ${placeText(point, place.distance)}`,
    elements: build(near),
    needs: [
      "3 joints",
      `${of(first, cutText(point, near))} toward the target`,
      `${of(second, cutText(point, far))} toward ${point.words.place}`,
      ...(hasLead ? [`${cutText(point, place.distance)} of ${feeder.label} to ${point.words.place}`] : []),
    ],
    notes: [
      `Between ${ohmText(point.request.targetOhm)} and ${ohmText(place.resistanceOhm)} the sections are ${ohmText(sectionOhm(first))} and ${ohmText(sectionOhm(second))}: each has about the resistance at the other's side.`,
      ...lengthNotes(point, used),
      ...trimNotes(point, "first section", build, near),
    ],
  };
}

function reason({ request, words }: DesignPoint, places: RealPlace[], hasPairs: boolean): string {
  const target = ohmText(request.targetOhm);
  if (places.length === 0)
    return `No line given brings the ${words.matched} to a resistance other than ${target}, which two sections could turn.`;
  if (hasPairs)
    return `The lines at hand leave no pair of lengths under a half wave that brings the ${words.matched} to ${target}.`;
  const others = listText(
    places.map(({ resistanceOhm }) => ohmText(resistanceOhm)),
    "or",
  );
  return `Two alternating sections need a line of about ${target} and one of about ${others}, to 10\u00a0%; the lines given have no such pair.`;
}
