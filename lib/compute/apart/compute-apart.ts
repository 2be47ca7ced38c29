/**
 * Computing in threads of its own, so that a heavy request never holds up the one that serves everybody. Threads are made
 * when first needed and kept; a task that passes the deadline ends with its thread.
 */
import { availableParallelism } from "node:os";
import { Worker } from "node:worker_threads";
import type { JobName, Jobs, Outcome, Task } from "@/lib/compute/apart/jobs";
import { Refusal } from "@/lib/compute/apart/refusal";
import { AppError } from "@/lib/http/errors";

const deadlineMs = 30_000;
const mostWaiting = 100;

interface Waiting {
  task: Task;
  take: (json: Uint8Array<ArrayBuffer>) => void;
  fail: (error: Error) => void;
  takePart?: (json: Uint8Array<ArrayBuffer>) => void;
}

interface Thread {
  worker: Worker;
  current: (Waiting & { timer: NodeJS.Timeout }) | undefined;
}

interface Pool {
  threads: Thread[];
  waiting: Waiting[];
  count: number;
}

// One pool for the process, kept where a reloaded module finds it again.
const kept = globalThis as { ropewalkPool?: Pool };
const pool = (): Pool => (kept.ropewalkPool ??= { threads: [], waiting: [], count: 0 });

/** One thread is left to serve. */
const mostThreads = Math.max(1, Math.min(4, availableParallelism() - 1));

function startThread(): Thread {
  const worker = new Worker(new URL("./compute.worker.ts", import.meta.url));
  const thread: Thread = { worker, current: undefined };
  worker.on("message", (outcome: Outcome) => settle(thread, outcome));
  worker.on("error", (error) => drop(thread, error));
  worker.unref();
  pool().threads.push(thread);
  return thread;
}

function settle(thread: Thread, outcome: Outcome): void {
  const { current } = thread;
  if (current?.task.id !== outcome.id) return;
  if ("part" in outcome) {
    takePart(thread, current, outcome.part);
    return;
  }
  clearTimeout(current.timer);
  thread.current = undefined;
  thread.worker.unref();
  if ("json" in outcome) current.take(outcome.json);
  else if ("refused" in outcome) current.fail(refusalOf(outcome));
  else current.fail(new Error(outcome.fault));
  next();
}

function refusalOf({ refused, members }: { refused: string; members?: Record<string, unknown> }): RangeError {
  return members ? new Refusal(refused, members) : new RangeError(refused);
}

/** Whoever takes a part may refuse it; then the rest is not worked out. */
function takePart(thread: Thread, { task, takePart }: Waiting, part: Uint8Array<ArrayBuffer>): void {
  try {
    takePart?.(part);
    // In a turn of its own, so that whoever else waits comes first.
    setImmediate(() => {
      if (!task.taken) return;
      Atomics.add(task.taken, 0, 1);
      Atomics.notify(task.taken, 0);
    });
  } catch (error) {
    drop(thread, error as Error);
  }
}

/** Ends a thread, and what it was at with the error. */
function drop(thread: Thread, error: Error): void {
  const all = pool();
  all.threads = all.threads.filter((each) => each !== thread);
  void thread.worker.terminate();
  if (thread.current) clearTimeout(thread.current.timer);
  thread.current?.fail(error);
  thread.current = undefined;
  next();
}

/** Gives what has waited longest to a thread that is free. */
function next(): void {
  const { threads, waiting } = pool();
  const [first] = waiting;
  if (!first) return;
  const thread = threads.find(({ current }) => !current) ?? (threads.length < mostThreads ? startThread() : undefined);
  if (!thread) return;
  waiting.shift();
  const tooLong = new AppError("invalid_input", `This takes more than ${deadlineMs / 1000} seconds; ask for less.`);
  thread.current = { ...first, timer: setTimeout(() => drop(thread, tooLong), deadlineMs) };
  thread.worker.ref();
  thread.worker.postMessage(first.task);
}

type Json = Uint8Array<ArrayBuffer>;

function inTurn(name: JobName, given: unknown[], takePart?: (json: Json) => void): Promise<Json> {
  const all = pool();
  if (all.waiting.length >= mostWaiting)
    throw new AppError("busy", "Too much is being computed just now; try again in a moment.");
  return new Promise((take, fail) => {
    const taken = takePart && new Int32Array(new SharedArrayBuffer(4));
    all.waiting.push({ task: { id: ++all.count, name, given, taken }, take, fail, takePart });
    next();
  });
}

/**
 * Computes one job in a thread of its own.
 * @param name - see `jobs`
 * @param given - the job's arguments, plain data
 * @returns the answer as JSON, UTF-8
 * @throws RangeError what the engine refuses, `Refusal` where there is more to say; AppError `invalid_input` past the deadline, `busy` where too many wait
 */
export function computeApart<Name extends JobName>(name: Name, ...given: Parameters<Jobs[Name]>): Promise<Json> {
  return inTurn(name, given);
}

/**
 * The same for a job that answers in parts.
 * @param takePart - given each part as JSON, in order; where it throws, the job ends with that error
 */
export async function computePartsApart<Name extends JobName>(
  name: Name,
  takePart: (json: Json) => void,
  ...given: Parameters<Jobs[Name]>
): Promise<void> {
  await inTurn(name, given, takePart);
}
