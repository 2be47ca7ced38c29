/** What a run does when its parts are not exactly what they are drawn as. */
import { contributorOf, ranked, type Contributor } from "@/lib/line/contributors";
import type { Circuit } from "@/lib/line/element";
import { movedResponse, type MovedResponse } from "@/lib/line/moved-response";
import { percentileCurves, type Percentiles } from "@/lib/line/order-statistics";
import { asDrawn, drawsOf, mostCornerPaths, putCorner, requireSpread, type Spread } from "@/lib/line/spread";
import { frequenciesWithBands, type Target } from "@/lib/line/target";
import type { TargetConditions } from "@/lib/line/targets";
import { yieldCounter } from "@/lib/line/yield";

export interface ToleranceRequest extends TargetConditions {
  circuit: Circuit;
  /** hertz, each above 0 */
  frequencies: readonly number[];
  spread: readonly Spread[];
  /** how many, a whole number of at least 1 */
  draws: number;
  /** whole number from 0 to 2^32 − 1: the same seed gives the same draws */
  seed: number;
  /** whether every combination of limits is looked at too; at most 12 paths */
  corners?: boolean | undefined;
  targets?: readonly Target[] | undefined;
}

/** Least and greatest over all combinations of limits, one value per frequency. */
export interface Extremes {
  min: Float64Array;
  max: Float64Array;
}

export interface ToleranceResult {
  frequencies: Float64Array;
  /** at the source plane */
  returnLossDb: Percentiles;
  transducerLossDb: Percentiles;
  corners?: { returnLossDb: Extremes; transducerLossDb: Extremes };
  /** share of the draws that keep every target; NaN without a target */
  yieldPercent: number;
  /** the same of each target alone */
  targetPercents: number[];
  /** largest effect first */
  contributors: Contributor[];
}

/** Work that can be done a little at a time, with the same result however it is cut up. */
export interface ToleranceRun {
  /** responses to work out in all: draws, corners, and the levels of every contributor */
  total: number;
  done: () => number;
  /** Works out so many more; false once there are none left. */
  advance: (count: number) => boolean;
  /** @throws Error before the last one is done */
  result: () => ToleranceResult;
}

function requireRequest({ spread, draws, corners }: ToleranceRequest): void {
  for (const each of spread) requireSpread(each);
  if (!(Number.isInteger(draws) && draws >= 1))
    throw new RangeError(`startTolerance: draws must be a whole number of at least 1, got ${draws}`);
  if (corners && spread.length > mostCornerPaths)
    throw new RangeError(
      `startTolerance: corners of at most ${mostCornerPaths} paths can be looked at, got ${spread.length}`,
    );
}

/** Part of the work: so many responses, and one of them by its number. */
interface Phase {
  count: number;
  work: (n: number) => void;
}

/**
 * Draws every quantity within its limits, again and again, and looks at what the run then does at the source.
 * @throws RangeError, in words, when the run, a path, a limit or a target is impossible
 * Source: propagation of distributions, JCGM 101:2008, clauses 5 and 7.
 */
export function startTolerance(request: ToleranceRequest): ToleranceRun {
  requireRequest(request);
  const { circuit, spread, corners, temperatureC, targets = [] } = request;
  const frequencies = frequenciesWithBands(request.frequencies, targets);
  const paths = spread.map(({ path }) => path);
  const response = movedResponse(circuit, paths, frequencies, temperatureC);
  const draws = drawPhase(request, response, frequencies);
  const corner = corners ? cornerPhase(response, spread, frequencies.length) : undefined;
  const contributors = contributorPhase(response, request, frequencies.length);
  const count = request.frequencies.length;
  return inPhases([draws, ...(corner ? [corner] : []), contributors], () => ({
    frequencies: frequencies.slice(0, count),
    ...draws.result(count),
    ...(corner && { corners: corner.result(count) }),
    contributors: ranked(contributors.found),
  }));
}

function inPhases(phases: readonly Phase[], result: () => ToleranceResult): ToleranceRun {
  const total = phases.reduce((sum, { count }) => sum + count, 0);
  let [done, phase, n] = [0, 0, 0];
  const one = () => {
    while (n >= phases[phase]!.count) [phase, n] = [phase + 1, 0];
    phases[phase]!.work(n++);
    done++;
  };
  return {
    total,
    done: () => done,
    advance: (count) => {
      for (const end = Math.min(total, done + count); done < end;) one();
      return done < total;
    },
    result: () => {
      if (done < total) throw new Error("startTolerance: the result was asked for before all was done");
      return result();
    },
  };
}

function drawPhase(request: ToleranceRequest, { respond, moved }: MovedResponse, frequencies: Float64Array) {
  const { circuit, spread, draws, seed, targets = [] } = request;
  const width = frequencies.length;
  const counter = yieldCounter(circuit, targets, request, frequencies);
  const drawn = drawsOf(spread, seed);
  const values = new Float64Array(spread.length);
  const returnLoss = new Float64Array(draws * width);
  const transducerLoss = new Float64Array(draws * width);
  const work = (n: number) => {
    drawn(values);
    respond(values, returnLoss, transducerLoss, n * width);
    counter.count(moved.circuit, returnLoss, transducerLoss, n * width);
  };
  const result = (count: number) => ({
    returnLossDb: firstOf(percentileCurves(returnLoss, width), count),
    transducerLossDb: firstOf(percentileCurves(transducerLoss, width), count),
    yieldPercent: counter.yieldPercent(),
    targetPercents: counter.targetPercents(),
  });
  return { count: draws, work, result };
}

/** Only the frequencies that were asked for; the ends of bands come after them. */
function firstOf({ min, p05, median, p95, max }: Percentiles, count: number): Percentiles {
  const first = (curve: Float64Array) => curve.slice(0, count);
  return { min: first(min), p05: first(p05), median: first(median), p95: first(p95), max: first(max) };
}

function cornerPhase({ respond }: MovedResponse, spread: readonly Spread[], width: number) {
  const values = new Float64Array(spread.length);
  const extremes = () => ({
    min: new Float64Array(width).fill(Infinity),
    max: new Float64Array(width).fill(-Infinity),
  });
  const [returnLossDb, transducerLossDb] = [extremes(), extremes()];
  const [returnLoss, transducerLoss] = [new Float64Array(width), new Float64Array(width)];
  const work = (corner: number) => {
    putCorner(spread, corner, values);
    respond(values, returnLoss, transducerLoss, 0);
    widen(returnLossDb, returnLoss);
    widen(transducerLossDb, transducerLoss);
  };
  const first = ({ min, max }: Extremes, count: number) => ({ min: min.slice(0, count), max: max.slice(0, count) });
  const result = (count: number) => ({
    returnLossDb: first(returnLossDb, count),
    transducerLossDb: first(transducerLossDb, count),
  });
  return { count: 2 ** spread.length, work, result };
}

function widen({ min, max }: Extremes, values: Float64Array): void {
  for (let k = 0; k < values.length; k++) {
    min[k] = Math.min(min[k]!, values[k]!);
    max[k] = Math.max(max[k]!, values[k]!);
  }
}

function contributorPhase(response: MovedResponse, { circuit, spread, temperatureC }: ToleranceRequest, width: number) {
  const drawn = spread.map((each) => asDrawn(circuit, each, temperatureC));
  const found: Contributor[] = [];
  const work = (n: number) => void found.push(contributorOf(response, spread, n, Float64Array.from(drawn), width));
  return { count: spread.length, work, found };
}

/** All at once. Throws as `startTolerance`. */
export function tolerance(request: ToleranceRequest): ToleranceResult {
  const run = startTolerance(request);
  run.advance(run.total);
  return run.result();
}
