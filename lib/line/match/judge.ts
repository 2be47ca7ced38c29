import { bandSamples, greatest, stepsToRipple, type Band } from "@/lib/line/match/extreme";
import { magnitudeOfReturnLoss, returnLossDb } from "@/lib/line/reflection";
import type { Respond, Response } from "@/lib/line/match/response";

export interface Verdict {
  designReturnLossDb: number;
  bandwidthHz: number;
  /** true where the bandwidth ends only because the search does, or the load's samples do */
  isAtLeast: boolean;
  worstReturnLossDb: number;
  worstTransducerLossDb: number;
  worstMatchLossDb: number;
}

/**
 * A network judged at its design frequency, over the band, and by how far its match reaches.
 * Worst figures: the greatest of `bandSamples`, followed to the true extreme between its neighbours.
 * Bandwidth: outward from the design frequency in steps that grow from 10⁻⁴ to 0.02 of it, or to an eighth of a ripple,
 * until the asked return loss fails, then the edge itself by root finding; looked for from a thousandth to ten times the
 * design frequency and for at most 2000 steps.
 */
export function judge(respond: Respond, band: Band): Verdict {
  const frequencies = bandSamples(band);
  const responses = frequencies.map(respond);
  const worst = (figure: keyof Response) =>
    greatest(
      (f) => respond(f)[figure],
      frequencies,
      responses.map((each) => each[figure]),
    );
  const worstTransducerLossDb = worst("lossDb");
  const isAtLoad = responses.every((each) => each.matchLossDb === each.lossDb);
  return {
    designReturnLossDb: returnLossDb(respond(band.designHz).magnitude),
    ...bandwidth(respond, band),
    worstReturnLossDb: returnLossDb(worst("magnitude")),
    worstTransducerLossDb,
    worstMatchLossDb: isAtLoad ? worstTransducerLossDb : worst("matchLossDb"),
  };
}

function bandwidth(respond: Respond, band: Band): { bandwidthHz: number; isAtLeast: boolean } {
  const limit = magnitudeOfReturnLoss(band.returnLossDb);
  const excess = (f: number) => respond(f).magnitude - limit;
  if (!(excess(band.designHz) <= 0)) return { bandwidthHz: 0, isAtLeast: false };
  const lowest = Math.max(band.knownHz[0], band.designHz / 1000);
  const highest = Math.min(band.knownHz[1], band.designHz * 10);
  const mostStep = Math.min(0.02 * band.designHz, band.rippleHz / stepsToRipple);
  const lower = edge(excess, band.designHz, lowest, mostStep);
  const upper = edge(excess, band.designHz, highest, mostStep);
  return { bandwidthHz: upper.value - lower.value, isAtLeast: !lower.isFound || !upper.isFound };
}

interface Edge {
  value: number;
  isFound: boolean;
}

/** The first frequency from the start toward an end where the excess rises above 0, else how far was looked. */
function edge(excess: (f: number) => number, start: number, end: number, mostStep: number): Edge {
  const direction = Math.sign(end - start);
  let step = Math.min(mostStep, 1e-4 * start);
  let inside = start;
  for (let taken = 0; inside !== end && taken < mostSteps; taken++) {
    const next = Math.abs(end - inside) <= step ? end : inside + direction * step;
    if (!(excess(next) <= 0)) return { value: crossing(excess, inside, next), isFound: true };
    inside = next;
    step = Math.min(2 * step, mostStep);
  }
  return { value: inside, isFound: false };
}

const mostSteps = 2000;

/**
 * Where a function that is at most 0 inside and above 0 outside crosses 0.
 * Source: false position with the Illinois rule, M. Dowell and P. Jarratt, BIT 11 (1971) 168.
 */
function crossing(excess: (f: number) => number, inside: number, outside: number): number {
  let [a, b] = [inside, outside];
  let [atA, atB] = [excess(a), excess(b)];
  let kept: "inside" | "outside" | undefined;
  for (let iteration = 0; iteration < 60 && Math.abs(b - a) > 1e-12 * Math.abs(b); iteration++) {
    const middle = a - (atA * (b - a)) / (atB - atA);
    const value = excess(middle);
    if (Math.abs(value) < 1e-13) return middle;
    if (value > 0) {
      [b, atB] = [middle, value];
      if (kept === "inside") atA /= 2;
      kept = "inside";
    } else {
      [a, atA] = [middle, value];
      if (kept === "outside") atB /= 2;
      kept = "outside";
    }
  }
  return a;
}
