/** What passes between a page and the worker that draws for it. Pure; the same numbers as the server for the same seed. */
import { startTolerance, type ToleranceRequest, type ToleranceResult } from "@/lib/line/tolerance";

/** What the worker says: how far it is, 0 to 1; at last what came out, or why nothing can. */
export type ToleranceNews = { progress: number } | { result: ToleranceResult } | { refused: string };

/** A progress bar moves smoothly at this many milliseconds between two pieces of news. */
const between = 40;

/**
 * Works a request through, a little at a time.
 * @param tell - called with progress again and again, and once with the end
 * @param now - milliseconds
 */
export function workThrough(
  request: ToleranceRequest,
  tell: (news: ToleranceNews) => void,
  now: () => number = () => performance.now(),
): void {
  try {
    const run = startTolerance(request);
    let [count, isMore] = [1, true];
    while (isMore) {
      const start = now();
      isMore = run.advance(count);
      tell({ progress: run.done() / run.total });
      // as many next time as fit between two pieces of news
      const took = Math.max(now() - start, 0.1);
      count = Math.max(1, Math.min(4 * count, Math.round((count * between) / took)));
    }
    tell({ result: run.result() });
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    tell({ refused: error.message.replace(/^\w+: /, "") });
  }
}
