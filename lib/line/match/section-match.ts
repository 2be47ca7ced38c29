import { abs } from "@/lib/line/complex";
import type { Element } from "@/lib/line/element";
import {
  cutText,
  leadName,
  lengthNotes,
  placeText,
  type DesignLine,
  type DesignPoint,
} from "@/lib/line/match/design-point";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { besidePairs } from "@/lib/line/match/beside-pairs";
import { cablePairs } from "@/lib/line/match/cable-pairs";
import { mostCables } from "@/lib/line/match/fit-line";
import { reflectionAgainst } from "@/lib/line/match/line-angle";
import { realPoints, sectionImpedance } from "@/lib/line/match/quarter-wave";
import { sectionScan } from "@/lib/line/match/section-scan";
import { sectionCosine, seriesSection } from "@/lib/line/match/series-section";
import { along, loadPair, withLossShare } from "@/lib/line/match/pair";
import { solveLengths, type Lengths, type Network } from "@/lib/line/match/solve-lengths";
import { trimNotes } from "@/lib/line/match/trim";
import { countWord, lengthText, listText, ohmText } from "@/lib/line/match/wording";

/**
 * A length of feeder at the load, then a length of another line, both solutions for every line given, solved with
 * their loss; where the request asks for pairs, two other lines one after the other too.
 */
export function seriesSections(point: DesignPoint): Outcome {
  const own = sections(point, [1]);
  const pairs = point.request.pairs ? cablePairs(point) : [];
  return pairs.length > 0 ? { proposals: [...own.proposals, ...pairs], why: "" } : own;
}

/**
 * The same with two, three or four equal lengths of one line side by side as the section: a low impedance that no
 * single cable has; where the request asks for pairs, two different ones too.
 */
export function parallelCables(point: DesignPoint): Outcome {
  const alike = sections(
    point,
    Array.from({ length: mostCables - 1 }, (_, k) => k + 2),
  );
  const { feeder, request } = point;
  const different = request.pairs && feeder ? besidePairs(point, feeder) : [];
  return different.length > 0 ? { proposals: [...alike.proposals, ...different], why: "" } : alike;
}

function sections(point: DesignPoint, counts: number[]): Outcome {
  const { feeder, lines } = point;
  if (!feeder || lines.length === 0) return { proposals: [], why: "No line was named to cut a section from." };
  const proposals = lines.flatMap((line) =>
    counts.flatMap((count) =>
      solutions(point, feeder, line, count).map((lengths) => proposal(point, feeder, line, count, lengths)),
    ),
  );
  return { proposals, why: proposals.length === 0 ? reason(point, feeder, counts) : "" };
}

function solutions(point: DesignPoint, feeder: DesignLine, line: DesignLine, count: number): Lengths[] {
  const halfWaves: Lengths = [feeder.wavelengthM / 2, line.wavelengthM / 2];
  const starts = closedForm(point, feeder, line.zc.re / count).map(({ distance, length }): Lengths => [
    distance * feeder.wavelengthM,
    length * line.wavelengthM,
  ]);
  const network: Network = (share) => {
    const [main, section] = [withLossShare(feeder, share), withLossShare(line, share)];
    return (d, l) => along(along(loadPair(point), main, d), section, l, count);
  };
  const hints = isReachUncertain(point, feeder, line, count) ? sectionScan(point, feeder, line, count) : [];
  // A section of no length is no section: the feeder alone would match.
  return solveLengths(point, network, starts, halfWaves, hints).filter(([, length]) => length > 0);
}

/** Whether loss may decide if the section reaches the target at all: the lossless form is this near its limit. */
function isReachUncertain(point: DesignPoint, feeder: DesignLine, line: DesignLine, count: number): boolean {
  const { load, request } = point;
  const sectionOhm = line.zc.re / count;
  const cosine = sectionCosine({ load, lineOhm: feeder.zc.re, sectionOhm, targetOhm: request.targetOhm });
  const loss = feeder.gamma.re / feeder.gamma.im + line.gamma.re / line.gamma.im;
  const size = abs(reflectionAgainst(load, feeder.zc.re));
  return Math.abs(Math.abs(cosine) - 1) < (10 * loss) / size;
}

function closedForm({ load, request }: DesignPoint, feeder: DesignLine, sectionOhm: number) {
  return seriesSection({ load, lineOhm: feeder.zc.re, sectionOhm, targetOhm: request.targetOhm });
}

function proposal(
  point: DesignPoint,
  feeder: DesignLine,
  line: DesignLine,
  count: number,
  [distance, length]: Lengths,
): Proposal {
  const build = (lengthM: number): Element[] => [
    { kind: "cable", name: "Section", line: line.line, lengthM, ...(count > 1 ? { paralleled: count } : {}) },
    ...(distance > 0
      ? [{ kind: "cable" as const, name: leadName(point, "Section"), line: feeder.line, lengthM: distance }]
      : []),
  ];
  const kind = count > 1 ? `${countWord(count)} cables in parallel` : "Series section";
  const where = placeText(point, distance);
  return {
    method: count > 1 ? "parallelCables" : "seriesSection",
    title: `${kind}, ${lengthText(length)} of ${line.label} ${where}`,
    elements: build(length),
    needs: [
      count > 1 ? `2 junctions of ${count} cables` : "2 joints",
      `${count > 1 ? `${count} × ` : ""}${cutText(point, length)} of ${line.label} for the section`,
      ...(distance > 0 ? [`${cutText(point, distance)} of ${feeder.label} to ${point.words.place}`] : []),
    ],
    notes: [
      ...lengthNotes(point, distance > 0 ? [line, feeder] : [line]),
      ...trimNotes(point, count > 1 ? `${count} lengths` : "section", build, length),
      ...(count > 1 ? [`The lengths side by side make ${ohmText(line.zc.re / count)}; cut them alike.`] : []),
    ],
  };
}

/**
 * Sections that can match lie beyond the two quarter-wave impedances of the feeder's real points, or between them where
 * the target itself lies beyond those points.
 */
function reason(point: DesignPoint, feeder: DesignLine, counts: number[]): string {
  const { load, lines, request, words } = point;
  const target = ohmText(request.targetOhm);
  if (lines.some((line) => counts.some((count) => closedForm(point, feeder, line.zc.re / count).length > 0)))
    return `The loss of ${listText(lines.map((line) => line.label))} leaves no pair of lengths under a half wave that brings the ${words.matched} to ${target}.`;
  const points = realPoints(load, feeder.zc.re);
  if (points.length === 0)
    return `On ${feeder.label} the ${words.matched} shows no reflection that a section could turn.`;
  const resistances = points.map((each) => each.resistanceOhm);
  const [low, high] = span(resistances.map((each) => sectionImpedance(request.targetOhm, each))).map(ohmText);
  const [least, most] = span(resistances);
  const isBetween = request.targetOhm < least || request.targetOhm > most;
  const needed = isBetween ? `between ${low} and ${high}` : `of at most ${low} or at least ${high}`;
  const have = span(lines.flatMap((line) => counts.map((count) => line.zc.re / count))).map(ohmText);
  return `With ${feeder.label} of ${ohmText(feeder.zc.re)} this ${words.matched} needs a section ${needed}; ${counts[0] === 1 ? "the lines" : "two to four lengths of the lines"} given are ${[...new Set(have)].join(" to ")}.`;
}

function span(values: number[]): [number, number] {
  return [Math.min(...values), Math.max(...values)];
}
