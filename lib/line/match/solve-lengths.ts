import { type Complex } from "@/lib/line/complex";
import type { DesignPoint } from "@/lib/line/match/design-point";
import type { Pair } from "@/lib/line/match/pair";
import { solvePair } from "@/lib/line/match/solve-pair";
import { portReflection } from "@/lib/line/reflection";

/** Metre: load to network, then stub or section. */
export type Lengths = [number, number];

/** What the target sees, of two lengths in metre, on lines with a share 0 to 1 of their loss. */
export type Network = (lossShare: number) => (first: number, second: number) => Pair;

type Solve = (lossShare: number, from: Lengths) => Lengths | undefined;

/** In one step a length may move by this part of its half wave before the loss is brought in by degrees instead. */
const nearStart = 0.05;
/** A length this part of a half wave from either end may have a twin a half wave on. */
const nearEnd = 0.1;
/** Within this part of a half wave two solutions are one. */
const same = 1e-6;
/** Below this part of a half wave a length is 0: rounding of the solution. */
const rounding = 1e-11;

/**
 * Two lengths of real, lossy line that bring the reflection against the target to zero, from their lossless values.
 * Where the loss moves a solution far, it is brought in by degrees, so that each is followed and none is taken for
 * another. A lossless line repeats itself each half wave and a lossy one almost does: where a length lies by the load or
 * by a half wave, its twin a half wave on is solved too, and whatever ends between 0 and a half wave is kept.
 * @param starts - the lossless solutions, metre
 * @param halfWaves - metre, of the two lines
 * @param hints - places near which there may be more, with all of the loss, metre
 * @returns metre, each 0 to under its half wave; without the solutions that the loss does away with
 */
export function solveLengths(
  point: DesignPoint,
  network: Network,
  starts: Lengths[],
  halfWaves: Lengths,
  hints: Lengths[] = [],
): Lengths[] {
  const target = { re: point.request.targetOhm, im: 0 };
  const solve: Solve = (lossShare, from) => {
    const seen = network(lossShare);
    const residual = (first: number, second: number): Complex => {
      const { v, i } = seen(first, second);
      return portReflection(v, i, target);
    };
    const { value, converged } = solvePair(residual, from, [halfWaves[0] / 10, halfWaves[1] / 10]);
    return converged ? value : undefined;
  };
  const found: Lengths[] = [];
  const keep = (exact: Lengths | undefined) => {
    const inside = exact && withinHalfWaves(exact, halfWaves);
    if (inside && !found.some((each) => near(each, inside, halfWaves, same))) found.push(inside);
  };
  for (const start of starts) {
    const solution = near(solve(1, start), start, halfWaves) ?? followed(solve, start, halfWaves);
    for (const twin of solution ? twins(solution, halfWaves) : [])
      keep(twin === solution ? solution : near(solve(1, twin), twin, halfWaves));
  }
  for (const hint of hints) keep(near(solve(1, hint), hint, halfWaves));
  return found;
}

function near(found: Lengths | undefined, to: Lengths, halfWaves: Lengths, share = nearStart): Lengths | undefined {
  const isNear = found?.every((each, k) => Math.abs(each - to[k]!) < share * halfWaves[k]!);
  return isNear ? found : undefined;
}

/** The solution followed from no loss to all of it, in steps that shrink where it moves too far and grow again after. */
function followed(solve: Solve, start: Lengths, halfWaves: Lengths): Lengths | undefined {
  let at = start;
  let share = 0;
  let step = 0.25;
  while (share < 1) {
    const next = Math.min(1, share + step);
    const found = near(solve(next, at), at, halfWaves);
    if (found) {
      [at, share] = [found, next];
      step *= 2;
    } else {
      step /= 4;
      if (step < 1e-3) return undefined;
    }
  }
  return at;
}

/** The solution itself first, then those a half wave on of the lengths that lie near or beyond an end. */
function twins(solution: Lengths, halfWaves: Lengths): Lengths[] {
  const [firsts, seconds] = solution.map((length, k) => {
    const halfWave = halfWaves[k]!;
    if (length < nearEnd * halfWave) return [length, length + halfWave];
    return length > (1 - nearEnd) * halfWave ? [length, length - halfWave] : [length];
  });
  const all = firsts!.flatMap((first) => seconds!.map((second): Lengths => [first, second]));
  return [solution, ...all.slice(1)];
}

function withinHalfWaves(lengths: Lengths, halfWaves: Lengths): Lengths | undefined {
  const share = lengths.map((length, k) => length / halfWaves[k]!);
  if (share.some((each) => each < -rounding || each > 1 - rounding)) return undefined;
  return [share[0]! < rounding ? 0 : lengths[0], share[1]! < rounding ? 0 : lengths[1]];
}
