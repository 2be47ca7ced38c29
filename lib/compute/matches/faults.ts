/** What the schema of a matching request cannot see, each fault at its path. Pure. */
import { linesIn } from "@/lib/compute/faults";
import type { MatchesRequest } from "@/lib/compute/matches/schema";
import type { CircuitFault } from "@/lib/runs/circuit";

/** The most one request may ask, so that a single one never holds everybody up: seconds of work, as measured. */
const mostMatchWork = 2_500;
const toleranceWork = 8;

/**
 * @param request - as asked
 * @param lines - how many lines there are to cut from
 */
export function matchesFaults({ place, tolerance }: MatchesRequest, lines: number): CircuitFault[] {
  const behind = linesIn(place?.behind ?? []);
  if (lines * (1 + behind) * (tolerance ? toleranceWork : 1) <= mostMatchWork) return [];
  const path = behind > 0 ? "place.behind" : "lines";
  return [
    {
      path,
      message: `${lines} lines to cut from with ${behind} lines behind the network is too much for one request; name fewer lines to cut from.`,
    },
  ];
}
