/** The largest or smallest value of one figure with which a run keeps all its targets. */
import { goldenSection } from "@/lib/line/golden-section";
import type { Circuit } from "@/lib/line/element";
import { requireValue } from "@/lib/line/circuit-path";
import { withValues } from "@/lib/line/moved-circuit";
import type { Judgement, Target } from "@/lib/line/target";
import { judgeTargets, type TargetConditions } from "@/lib/line/targets";
import { requireTargets } from "@/lib/line/yield";

export interface SolveRequest extends TargetConditions {
  circuit: Circuit;
  /** at least one */
  targets: readonly Target[];
  /** see `circuitPlace`, or one of `conditionPaths`; lower and upper end, SI */
  vary: { path: string; between: readonly [number, number] };
  /** default largest */
  want?: "largest" | "smallest" | undefined;
}

export interface Solution {
  /** null where no value was found with which all targets hold */
  value: number | null;
  /** index of the target that fails just beyond; null where the range ends first, and where there is no value */
  binds: number | null;
  /** index of a target that holds nowhere in the range, where there is one */
  neverMet: number | null;
  /** how many values the range was looked at with, and the widest gap between two of them */
  looked: number;
  gap: number;
  /** of each target at the value; empty where there is none */
  margins: number[];
}

/** Figures beside the circuit that may be varied too. */
export const conditionPaths = ["temperatureC", "supplyV", "loadCurrentA", "availablePowerW", "drive.riseS"] as const;

const scanned = 97;
/** A range that spans more than this is looked at by ratio. */
const wideRange = 100;
const halvings = 60;

/**
 * Looks at the range at many values and halves the stretch in which the targets begin to fail, seen from the wanted end.
 * Nothing is assumed to rise or fall steadily; a stretch that lies wholly between two of the values looked at is not
 * seen, unless no value holds: then the best of them is climbed from.
 * @throws RangeError, in words, when the path, the range or the run is impossible, or a target cannot be worked out
 */
export function solve(request: SolveRequest): Solution {
  const { targets, want = "largest" } = request;
  const values = valuesOf(request);
  const at = judgedAt(request);
  requireTargets(request.circuit, targets, withCondition(request, values[0]!));
  const judged = values.map(at);
  const gap = values.reduce((widest, value, n) => Math.max(widest, Math.abs(value - (values[n - 1] ?? value))), 0);
  const seen = { looked: values.length, gap, neverMet: null };
  const found = (value: number, binds: number | null) => ({ ...seen, value, binds, margins: marginsOf(at(value)) });
  const first = judged.findIndex(holds);
  if (first === 0) return found(values[0]!, null);
  const crest = first < 0 ? climb(at, values, targets) : values[first]!;
  if (crest !== undefined) {
    const beyond = values.filter((value) => (want === "largest" ? value > crest : value < crest)).at(-1);
    if (beyond === undefined) return found(crest, null);
    const { value, binds } = edge(at, crest, beyond);
    return found(value, binds);
  }
  const never = targets.findIndex((_, index) => judged.every((each) => !each[index]!.isMet));
  return { ...seen, value: null, binds: null, neverMet: never < 0 ? null : never, margins: [] };
}

type JudgedAt = (value: number) => Judgement[];

function holds(judged: readonly Judgement[]): boolean {
  return judged.every(({ isMet }) => isMet);
}

function marginsOf(judged: readonly Judgement[]): number[] {
  return judged.map(({ margin }) => margin);
}

/** The values looked at, from the wanted end. */
function valuesOf({ vary: { path, between }, want }: SolveRequest): number[] {
  const [low, high] = between;
  requireValue(path, low);
  requireValue(path, high);
  if (!(low <= high)) throw new RangeError(`solve: the ends of the range are not in order, ${low} and ${high}`);
  const isWide = low > 0 && high / low > wideRange;
  const ascending = Array.from({ length: low < high ? scanned : 1 }, (_, n) => {
    const part = n / (scanned - 1);
    if (n === scanned - 1) return high;
    return isWide ? low * (high / low) ** part : low + (high - low) * part;
  });
  return want === "smallest" ? ascending : ascending.reverse();
}

function isCondition(path: string): path is (typeof conditionPaths)[number] {
  return (conditionPaths as readonly string[]).includes(path);
}

function withCondition(request: SolveRequest, value: number): TargetConditions {
  const { path } = request.vary;
  if (path === "drive.riseS") return { ...request, drive: request.drive && { ...request.drive, riseS: value } };
  return isCondition(path) ? { ...request, [path]: value } : request;
}

function judgedAt(request: SolveRequest): JudgedAt {
  const { circuit, targets, vary } = request;
  return (value) => {
    const drawn = isCondition(vary.path) ? circuit : withValues(circuit, { [vary.path]: value });
    return judgeTargets(drawn, targets, withCondition(request, value));
  };
}

/** Halves between a value with which all targets hold and one with which they do not. */
function edge(at: JudgedAt, good: number, bad: number): { value: number; binds: number } {
  let [inside, outside] = [good, bad];
  let beyond = at(outside);
  for (let n = 0; n < halvings; n++) {
    const middle = (inside + outside) / 2;
    if (middle === inside || middle === outside) break;
    const judged = at(middle);
    if (holds(judged)) inside = middle;
    else [outside, beyond] = [middle, judged];
  }
  return { value: inside, binds: beyond.findIndex(({ isMet }) => !isMet) };
}

/** From the value that comes nearest to keeping all targets, up to one that does. */
function climb(at: JudgedAt, values: readonly number[], targets: readonly Target[]): number | undefined {
  const score = (value: number) =>
    at(value).reduce((least, { margin }, index) => Math.min(least, margin / sizeOf(targets[index]!)), Infinity);
  const scores = values.map(score);
  const best = scores.reduce((most, each, n) => (each > scores[most]! ? n : most), 0);
  const [from, to] = [values[Math.max(0, best - 1)]!, values[Math.min(values.length - 1, best + 1)]!];
  const crest = goldenSection(score, Math.min(from, to), Math.max(from, to), 60);
  return holds(at(crest.at)) ? crest.at : undefined;
}

/** Margins of different quantities are compared as shares of their limits. */
function sizeOf({ atLeast, atMost }: Target): number {
  return Math.abs(atMost ?? 0) || Math.abs(atLeast ?? 0) || 1;
}
