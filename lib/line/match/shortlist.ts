import { nominalFigures } from "@/lib/line/cable";
import { isFinite } from "@/lib/line/complex";
import { designPoint } from "@/lib/line/match/design-point";
import { mostCables } from "@/lib/line/match/fit-line";
import { unknownLoad } from "@/lib/line/match/hopeless";
import type { MatchLine, MatchRequest } from "@/lib/line/match/match-request";
import { realPoints, sectionImpedance } from "@/lib/line/match/quarter-wave";
import { binomialTransformer } from "@/lib/line/match/step-transformer";

/** Of several cables side by side each more than one counts as this much farther from what is wanted. */
const joining = 0.01;
/** Sections of the transformer whose impedances are looked for where the request names no number. */
const usualSections = 3;

/**
 * Of very many lines those that come nearest to the impedances a match of this load is made with, in closed form: the
 * feeder's own for stubs, quarter-wave sections and the resistances at both real points of the feeder, and the sections
 * of a transformer to either. Alone or two to four side by side. Each impedance gets its nearest lines in turn.
 * @param lines - any number
 * @param most - how many are kept
 * @returns in their order; all of them where they are not more
 */
export function shortlist(
  lines: readonly MatchLine[],
  request: Omit<MatchRequest, "lines">,
  most: number,
): MatchLine[] {
  if (lines.length <= most) return [...lines];
  const logs = Float64Array.from(lines, ({ model }) => Math.log(nominalFigures(model).z0));
  const queues = wantedOhms(request).map((wanted) => nearest(logs, Math.log(wanted), most));
  const kept = new Set<number>();
  for (let turn = 0; kept.size < most; turn++)
    for (const queue of queues) {
      const next = queue[turn];
      if (next !== undefined && kept.size < most) kept.add(next);
    }
  return lines.filter((_, index) => kept.has(index));
}

const logCounts = Array.from({ length: mostCables }, (_, k) => Math.log(k + 1));

/** The places of the impedances nearest to a wanted one, nearest first, all as logarithms; no more than `most`. */
function nearest(logs: Float64Array, wanted: number, most: number): number[] {
  const away = logs.map((log) => {
    let least = Infinity;
    for (let k = 0; k < mostCables; k++) least = Math.min(least, Math.abs(log - logCounts[k]! - wanted) + joining * k);
    return least;
  });
  // The order of all need not be known, only where the nearest end.
  const edge = away.toSorted()[most - 1]!;
  const near = [...away.keys()].filter((k) => away[k]! <= edge);
  return near.sort((a, b) => away[a]! - away[b]! || a - b).slice(0, most);
}

/** The impedances that matches of a load are made with, ohm; the target's alone where nothing else is known. */
function wantedOhms(request: Omit<MatchRequest, "lines">): number[] {
  const { targetOhm, sections = usualSections } = request;
  const asked: MatchRequest = { ...request, lines: [] };
  if (unknownLoad(asked)) return [targetOhm];
  const { load, feeder } = designPoint(asked);
  const lineOhm = feeder?.zc.re ?? targetOhm;
  if (!(isFinite(load) && load.re > 0)) return [lineOhm];
  const resistances = realPoints(load, lineOhm).map(({ resistanceOhm }) => resistanceOhm);
  const usable = resistances.filter((each) => each > 0 && each < Infinity);
  return [
    lineOhm,
    ...usable.map((each) => sectionImpedance(targetOhm, each)),
    targetOhm,
    ...usable,
    ...usable.flatMap((each) =>
      binomialTransformer(sections, each / targetOhm, 0.1).sectionsOverFirst.map((ratio) => ratio * targetOhm),
    ),
  ].filter((each) => each > 0 && each < Infinity);
}
