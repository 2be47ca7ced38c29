/** A thread of its own that computes what it is sent, one task after the other. */
import { parentPort } from "node:worker_threads";
import { jobs, type Outcome, type Task } from "@/lib/compute/apart/jobs";
import { Refusal } from "@/lib/compute/apart/refusal";

const asJson = (value: unknown) => new TextEncoder().encode(JSON.stringify(value));

/** Sends every part of an answer that comes in parts; what is left is nothing. */
function sendParts(id: number, parts: Generator): null {
  for (const each of parts) {
    const part = asJson(each);
    parentPort?.postMessage({ id, part } satisfies Outcome, [part.buffer]);
  }
  return null;
}

const isInParts = (answer: unknown): answer is Generator =>
  typeof answer === "object" && answer !== null && Symbol.iterator in answer && "next" in answer;

function outcome({ id, name, given }: Task): Outcome {
  try {
    const job = jobs[name] as (...given: unknown[]) => unknown;
    const answer = job(...given);
    return { id, json: asJson(isInParts(answer) ? sendParts(id, answer) : answer) };
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
