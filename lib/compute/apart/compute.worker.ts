/** A thread of its own that computes what it is sent, one task after the other. */
import { parentPort } from "node:worker_threads";
import { jobs, type Outcome, type Task } from "@/lib/compute/apart/jobs";
import { Refusal } from "@/lib/compute/apart/refusal";

function outcome({ id, name, given }: Task): Outcome {
  try {
    const job = jobs[name] as (...given: unknown[]) => unknown;
    return { id, json: new TextEncoder().encode(JSON.stringify(job(...given))) };
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
