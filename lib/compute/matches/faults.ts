/** What the schema of a matching request cannot see, each fault at its path. Pure. */
import { linesIn } from "@/lib/compute/faults";
import type { MatchesRequest } from "@/lib/compute/matches/schema";
import { mostOfMethod } from "@/lib/line/match/find-matches";
import { matchMethods, type MatchMethod } from "@/lib/line/match/match-request";
import type { CircuitFault } from "@/lib/runs/circuit";

/** The most one request may ask, so that a single one never holds everybody up: about ten seconds of work, as measured. */
const mostMatchWork = 8_000_000;

/** Solutions that a method has for each line; of the others there are at most some dozens in all. */
const solutionsPerLine: Partial<Record<MatchMethod, number>> = {
  shuntStub: 4,
  seriesStub: 4,
  doubleStub: 4,
  quarterWave: 2,
  seriesSection: 2,
  parallelCables: 6,
  notchStub: 16,
};
const otherSolutions = 50;
/** Elements of a usual network, frequencies at which a bandwidth is looked for, and corners of a tolerance. */
const usualElements = 3;
const bandwidthSteps = 80;
const corners = 16;

/**
 * @param request - as asked
 * @param lines - how many lines there are to cut from
 * @param samples - at how many frequencies the band is looked at
 */
export function matchesFaults(request: MatchesRequest, lines: number, samples: number): CircuitFault[] {
  const { place, tolerance, notchHz, methods = matchMethods } = request;
  const behind = linesIn(place?.behind ?? []);
  const asked = methods.filter((method) => method !== "notchStub" || notchHz !== undefined);
  const perLine = asked.reduce((sum, method) => sum + (solutionsPerLine[method] ?? 0), 0);
  const solutions = perLine * lines + otherSolutions;
  const judging = usualElements * samples + bandwidthSteps * (usualElements + behind);
  const made = tolerance ? Math.min(solutions, mostOfMethod * asked.length) * corners * usualElements * samples : 0;
  if (solutions * judging + made <= mostMatchWork) return [];
  const path = behind > 0 ? "place.behind" : request.catalogue ? "catalogue" : "lines";
  return [
    {
      path,
      message: `${lines} lines to cut from with ${behind} lines behind the network, looked at at ${samples} frequencies, is too much for one request; name fewer lines or methods, or a narrower band.`,
    },
  ];
}
