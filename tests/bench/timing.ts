/** Median time of a task, and how ratios are printed. */

/** Median of several timings after a warm-up, milliseconds. */
export function medianMs(task: () => unknown, rounds = 15, warmUp = 3): number {
  for (let i = 0; i < warmUp; i++) task();
  const times = Array.from({ length: rounds }, () => {
    const start = performance.now();
    task();
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return times[rounds >> 1] ?? NaN;
}

/** Medians of two tasks timed in turns, so that a busy moment of the machine falls on both. */
export function pairedMs(ours: () => unknown, theirs: () => unknown, rounds = 9): [number, number] {
  ours();
  theirs();
  const times: [number[], number[]] = [[], []];
  for (let i = 0; i < rounds; i++) {
    for (const [index, task] of [ours, theirs].entries()) {
      const start = performance.now();
      task();
      times[index as 0 | 1].push(performance.now() - start);
    }
  }
  const median = (list: number[]) => list.sort((a, b) => a - b)[rounds >> 1] ?? NaN;
  return [median(times[0]), median(times[1])];
}

export function row(what: string, ...figures: string[]): void {
  console.log(`${what.padEnd(62)} ${figures.map((figure) => figure.padStart(14)).join(" ")}`);
}

export const ms = (value: number) => `${value.toFixed(value < 10 ? 2 : 1)} ms`;
export const times = (value: number) => `${value.toFixed(1)} ×`;
