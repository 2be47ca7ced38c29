/** What can be computed apart from the thread that serves: pure functions of plain data, by name. */
import { lineAnswer, matchesAnswer, profileAnswer, sweepAnswer } from "@/lib/compute/answers";
import { extractAnswer } from "@/lib/compute/extract/answer";
import { fitAnswer } from "@/lib/compute/fit/answer";
import { geometryAnswer } from "@/lib/compute/geometry/answer";
import { readingsAnswer } from "@/lib/compute/readings/answer";
import { touchstoneAnswer } from "@/lib/compute/touchstone/answer";
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
  effects: effectsAnswer,
};

export type Jobs = typeof jobs;
export type JobName = keyof Jobs;

/** What a worker is sent. */
export interface Task {
  id: number;
  name: JobName;
  given: unknown[];
}

/** What it sends back: the answer as JSON, the engine's refusal, or a fault of ours. */
export type Outcome = { id: number } & (
  { json: Uint8Array<ArrayBuffer> } | { refused: string; members?: Record<string, unknown> } | { fault: string }
);
