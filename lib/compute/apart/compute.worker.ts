/** A thread of its own that computes what it is sent, one task after the other. */
import { parentPort } from "node:worker_threads";
import { jobs, mostUntaken, type Outcome, type Task } from "@/lib/compute/apart/jobs";
import { Refusal } from "@/lib/compute/apart/refusal";

const asJson = (value: unknown) => new TextEncoder().encode(JSON.stringify(value));

/** Waits until fewer than `mostUntaken` of the parts sent wait to be taken. */
function waitForTaker(sent: number, taken: Task["taken"]): void {
  if (!taken) return;
  for (let count = Atomics.load(taken, 0); sent - count >= mostUntaken; count = Atomics.load(taken, 0))
    Atomics.wait(taken, 0, count);
}

/** Sends every part of an answer that comes in parts; what is left is nothing. */
function sendParts({ id, taken }: Task, parts: Generator): null {
  let sent = 0;
  for (const each of parts) {
    const part = asJson(each);
    waitForTaker(sent++, taken);
    parentPort?.postMessage({ id, part } satisfies Outcome, [part.buffer]);
  }
  return null;
}

const isInParts = (answer: unknown): answer is Generator =>
  typeof answer === "object" && answer !== null && Symbol.iterator in answer && "next" in answer;

function outcome(task: Task): Outcome {
  const { id, name, given } = task;
  try {
    const job = jobs[name] as (...given: unknown[]) => unknown;
    const answer = job(...given);
    return { id, json: asJson(isInParts(answer) ? sendParts(task, answer) : answer) };
  } catch (error) {
    if (error instanceof Refusal) return { id, refused: error.message, members: error.members };
    if (error instanceof RangeError) return { id, refused: error.message };
    return { id, fault: error instanceof Error ? (error.stack ?? error.message) : String(error) };
  }
}

parentPort?.on("message", (task: Task) => {
  const result = outcome(task);
  parentPort?.postMessage(result, "json" in result ? [result.json.buffer] : []);
});
