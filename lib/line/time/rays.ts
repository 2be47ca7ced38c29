import type { Circuit } from "@/lib/line/element";
import { transitions, type Drive } from "@/lib/line/time/drive";
import { latticeGraph } from "@/lib/line/time/lattice-graph";
import { LatticeSearch } from "@/lib/line/time/lattice-search";

/** A wave front on its way along one element of a run. */
export interface ElementRay {
  element: number;
  /** toward the load */
  isForward: boolean;
  startS: number;
  endS: number;
  /** height of the front, volt */
  volt: number;
}

/**
 * The wave fronts of a run as they travel, for drawing them over distance and time.
 * @param circuit - elements from source to load
 * @param drive - every edge of it sends out its own fronts, timed at the start of the edge
 * @param windowS - second, fronts that begin up to here
 * @param least - part of the largest edge, above 0, below which a front is left out
 * @returns `rays` in order of their arrival; `omitted`, how many were left out for being small, at least
 * @throws RangeError for what is known on the imaginary axis only
 * Source: as `lattice`.
 */
export function latticeRays(
  circuit: Circuit,
  drive: Drive,
  windowS: number,
  least = 0.01,
): { rays: ElementRay[]; omitted: number } {
  const graph = latticeGraph(circuit);
  const edges = transitions(drive).filter(({ atS }) => atS <= windowS);
  const largest = edges.reduce((most, { jumpV }) => Math.max(most, Math.abs(jumpV)), 0);
  // What is on its way when the window ends is drawn as far as it has come.
  const longest = graph.lines.reduce((most, { delayS }) => Math.max(most, delayS), 0);
  const search = new LatticeSearch(graph, windowS + longest, { floor: least * largest, sameS: 1e-9 * drive.riseS });
  search.follow(edges);
  const seen = search.rays.filter(({ startS, volt }) => startS < windowS && Math.abs(volt) > least * largest);
  const rays = seen.map(({ line, ...ray }) => ({ ...ray, element: graph.lines[line]!.element }));
  return { rays, omitted: search.left };
}
