import type { Circuit } from "@/lib/line/element";
import { transitions, type Drive } from "@/lib/line/time/drive";
import { latticeGraph } from "@/lib/line/time/lattice-graph";
import { LatticeSearch, type Found } from "@/lib/line/time/lattice-search";
import type { Passage } from "@/lib/line/time/wave-queue";

/** What happens to a node's voltage when a wave front arrives. Fronts that arrive in the same moment are one. */
export interface Front {
  timeS: number;
  /** `source`, `load`, or `taps.n` for the n-th shunt stub */
  node: string;
  /** jump of the node's voltage, volt */
  amplitudeV: number;
  /** places passed by the strongest wave of the front, the node's own last; of more than 64 the last ones */
  path: string[];
  /** how many places came before the node's own */
  passed: number;
}

export interface Lattice {
  /** the largest 2,000, in order of time */
  fronts: Front[];
  /** how many more there are, at least: a wave too weak to be followed counts as one */
  omitted: number;
}

export const mostFronts = 2000;
const longestPath = 64;
/** Waves below this part of the largest edge are not followed; the first floor that finds enough fronts is the last. */
const floors = [1e-2, 1e-3, 1e-4, 1e-5, 1e-6];

/**
 * The wave fronts of a run: what its edges become at every junction, with the coefficients of lossless lines at the
 * highest frequencies. A capacitor is a short to a front and a coil an opening; losses of lines and of contacts that
 * grow with frequency are left out, those of pads, resistors and a joint's flat part are not.
 * @param circuit - elements from source to load
 * @param drive - every edge of it sends out its own fronts, timed at the start of the edge
 * @param windowS - second, fronts up to here
 * @throws RangeError for what is known on the imaginary axis only
 * Source: L. V. Bewley, Traveling Waves on Transmission Systems, 2nd ed., chapter 4 (reflection lattices).
 */
export function lattice(circuit: Circuit, drive: Drive, windowS: number): Lattice {
  const graph = latticeGraph(circuit);
  const edges = transitions(drive).filter(({ atS }) => atS <= windowS);
  const largest = edges.reduce((most, { jumpV }) => Math.max(most, Math.abs(jumpV)), 0);
  let best: LatticeSearch | undefined;
  for (const floor of floors) {
    const search = new LatticeSearch(graph, windowS, { floor: floor * largest, sameS: 1e-9 * drive.riseS });
    const complete = search.follow(edges);
    if (complete || best === undefined) best = search;
    if (!complete || search.left === 0 || search.found.length >= mostFronts) break;
  }
  return best === undefined ? { fronts: [], omitted: 0 } : listed(best.found, best.left);
}

function listed(found: Found[], left: number): Lattice {
  const largest = [...found].sort((a, b) => Math.abs(b.amplitudeV) - Math.abs(a.amplitudeV)).slice(0, mostFronts);
  const fronts = largest
    .sort((a, b) => a.timeS - b.timeS)
    .map(({ timeS, node, amplitudeV, passage }) => ({
      timeS,
      node,
      amplitudeV,
      path: pathOf(passage),
      passed: passage.passed,
    }));
  return { fronts, omitted: found.length - fronts.length + left };
}

function pathOf(passage: Passage): string[] {
  const path: string[] = [];
  for (let at: Passage | undefined = passage; at !== undefined && path.length < longestPath; at = at.from)
    path.push(at.place);
  return path.reverse();
}
