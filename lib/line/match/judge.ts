import { magnitudeOfReturnLoss, returnLossDb } from "@/lib/line/reflection";
import type { Respond } from "@/lib/line/match/response";

export interface Band {
  designHz: number;
  bandHz: readonly [number, number];
  /** asked over the band, dB */
  returnLossDb: number;
  /** where the load is known, hertz; 0 and Infinity for one that is known everywhere */
  knownHz: readonly [number, number];
  /** frequencies to look at besides, such as the samples of the load */
  besidesHz: readonly number[];
}

export interface Verdict {
  designReturnLossDb: number;
  bandwidthHz: number;
  /** true where the bandwidth ends only because the search does, or the load's samples do */
  isAtLeast: boolean;
  worstReturnLossDb: number;
  worstTransducerLossDb: number;
}

/**
 * A network judged at its design frequency, over the band, and by how far its match reaches.
 * Worst figures: the band is sampled evenly (61 points and 64 more per design frequency of width, at most 1001; its
 * edges, the design frequency where it lies inside and the load's own samples among them), then the greatest sample is
 * followed to the true extreme between its neighbours by golden section.
 * Bandwidth: outward from the design frequency in steps that grow from 10⁻⁴ to 0.02 of it until the asked return loss
 * fails, then the edge itself by root finding; looked for from a thousandth to ten times the design frequency.
 */
export function judge(respond: Respond, band: Band): Verdict {
  const frequencies = samples(band);
  const responses = frequencies.map(respond);
  const magnitudes = responses.map((each) => each.magnitude);
  const losses = responses.map((each) => each.lossDb);
  return {
    designReturnLossDb: returnLossDb(respond(band.designHz).magnitude),
    ...bandwidth(respond, band),
    worstReturnLossDb: returnLossDb(greatest((f) => respond(f).magnitude, frequencies, magnitudes)),
    worstTransducerLossDb: greatest((f) => respond(f).lossDb, frequencies, losses),
  };
}

function samples({ designHz, bandHz: [from, to], besidesHz }: Band): number[] {
  const count = Math.min(1001, Math.ceil(61 + (64 * (to - from)) / designHz));
  const even = Array.from({ length: count }, (_, k) => from + ((to - from) * k) / (count - 1));
  even[count - 1] = to;
  const more = [designHz, ...besidesHz].filter((f) => f > from && f < to);
  return [...new Set([...even, ...more])].sort((a, b) => a - b);
}

/** The greatest value between the first and last sample, at least the greatest sample. */
function greatest(value: (frequency: number) => number, frequencies: number[], values: number[]): number {
  let best = 0;
  for (let k = 1; k < values.length; k++) if (values[k]! > values[best]!) best = k;
  const atSample = values[best]!;
  if (best === 0 || best === values.length - 1) return atSample;
  return Math.max(atSample, goldenMaximum(value, frequencies[best - 1]!, frequencies[best + 1]!));
}

const golden = (Math.sqrt(5) - 1) / 2;
/** Source: J. Kiefer, Proc. Amer. Math. Soc. 4 (1953) 502. 25 steps leave 6·10⁻⁶ of the interval, 10⁻¹¹ of the peak. */
function goldenMaximum(value: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let left = high - golden * (high - low);
  let right = low + golden * (high - low);
  let [atLeft, atRight] = [value(left), value(right)];
  for (let step = 0; step < 25; step++) {
    if (atLeft > atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - golden * (high - low);
      atLeft = value(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + golden * (high - low);
      atRight = value(right);
    }
  }
  return Math.max(atLeft, atRight);
}

function bandwidth(respond: Respond, band: Band): { bandwidthHz: number; isAtLeast: boolean } {
  const limit = magnitudeOfReturnLoss(band.returnLossDb);
  const excess = (f: number) => respond(f).magnitude - limit;
  if (!(excess(band.designHz) <= 0)) return { bandwidthHz: 0, isAtLeast: false };
  const lowest = Math.max(band.knownHz[0], band.designHz / 1000);
  const highest = Math.min(band.knownHz[1], band.designHz * 10);
  const lower = edge(excess, band.designHz, lowest);
  const upper = edge(excess, band.designHz, highest);
  return { bandwidthHz: upper.value - lower.value, isAtLeast: !lower.isFound || !upper.isFound };
}

/** The first frequency from the start toward an end where the excess rises above 0, else that end. */
function edge(excess: (f: number) => number, start: number, end: number): { value: number; isFound: boolean } {
  const direction = Math.sign(end - start);
  let step = 1e-4 * start;
  let inside = start;
  while (inside !== end) {
    const next = Math.abs(end - inside) <= step ? end : inside + direction * step;
    if (!(excess(next) <= 0)) return { value: crossing(excess, inside, next), isFound: true };
    inside = next;
    step = Math.min(2 * step, 0.02 * start);
  }
  return { value: end, isFound: false };
}

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
