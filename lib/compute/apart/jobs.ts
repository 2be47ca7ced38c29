/**
 * What can be computed apart from the thread that serves: pure functions of plain data, by name. A function that gives its
 * answer in parts is a generator.
 */
import { dcAnswer } from "@/lib/compute/dc/answer";
import { solveAnswer } from "@/lib/compute/solve/answer";
import { swapAnswer } from "@/lib/compute/swap/answer";
import { toleranceAnswer } from "@/lib/compute/tolerance/answer";
import { readRows } from "@/lib/cables/exchange/read-rows";
import { extractAnswer } from "@/lib/compute/extract/answer";
import { fitAnswer } from "@/lib/compute/fit/answer";
import { geometryAnswer } from "@/lib/compute/geometry/answer";
import { readingsAnswer } from "@/lib/compute/readings/answer";
import { touchstoneAnswer } from "@/lib/compute/touchstone/answer";
import { lineAnswer, profileAnswer, sweepAnswer } from "@/lib/compute/answers";
import { matchesAnswer } from "@/lib/compute/matches/answer";
import { stepAnswer } from "@/lib/compute/step/answer";
import { effectsAnswer } from "@/lib/runs/effects/answer";

export const jobs = {
  line: lineAnswer,
  sweep: sweepAnswer,
  profile: profileAnswer,
  matches: matchesAnswer,
  geometry: geometryAnswer,
  fit: fitAnswer,
  readings: readingsAnswer,
  extract: extractAnswer,
  touchstone: touchstoneAnswer,
  step: stepAnswer,
  tolerance: toleranceAnswer,
  dc: dcAnswer,
  swap: swapAnswer,
  solve: solveAnswer,
  importRows: readRows,
  effects: effectsAnswer,
};

export type Jobs = typeof jobs;
export type JobName = keyof Jobs;

/** What a worker is sent. */
export interface Task {
  id: number;
  name: JobName;
  given: unknown[];
  /** of a job that answers in parts: how many have been taken, counted where both threads see it */
  taken?: Int32Array<SharedArrayBuffer>;
}

/** How many parts may wait to be taken: more would be handed over in one go, and hold up whoever else is served. */
export const mostUntaken = 2;

/** What it sends back: parts of the answer, the answer as JSON (of one in parts, null), the engine's refusal, or a fault of ours. */
export type Outcome = { id: number } & (
  | { part: Uint8Array<ArrayBuffer> }
  | { json: Uint8Array<ArrayBuffer> }
  | { refused: string; members?: Record<string, unknown> }
  | { fault: string }
);
