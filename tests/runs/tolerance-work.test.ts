import { expect, test } from "vitest";
import { tolerance, type ToleranceRequest } from "@/lib/line/tolerance";
import { workThrough, type ToleranceNews } from "@/lib/runs/tolerance-work";
import { cable, run } from "@/tests/support/lossy-run";

const request: ToleranceRequest = {
  circuit: run([cable(20)]),
  frequencies: [1e7, 1.45e8],
  spread: [{ path: "elements.0.lengthM", limits: [19, 21] }],
  draws: 500,
  seed: 3,
  corners: true,
};

/** News of a worker whose clock runs as far at each look as told. */
function newsOf(asked: ToleranceRequest, stepMs: number): ToleranceNews[] {
  const news: ToleranceNews[] = [];
  let clock = 0;
  workThrough(
    asked,
    (each) => news.push(each),
    () => (clock += stepMs),
  );
  return news;
}

test.each([0.01, 5, 1000])(
  "whatever the pace, progress climbs to 1 and the result is that of the server (%s ms)",
  (stepMs) => {
    const news = newsOf(request, stepMs);
    const progress = news.flatMap((each) => ("progress" in each ? [each.progress] : []));
    expect(progress.length).toBeGreaterThan(2);
    expect(progress).toEqual([...progress].sort((a, b) => a - b));
    expect(progress.at(-1)).toBe(1);
    expect(news.at(-1)).toEqual({ result: tolerance(request) });
  },
);

test("a slow machine tells more often than a fast one", () => {
  expect(newsOf(request, 1000).length).toBeGreaterThan(newsOf(request, 1).length);
});

test("what cannot be worked out is told in words, without the function's name", () => {
  expect(newsOf({ ...request, draws: 0 }, 1)).toEqual([
    { refused: "draws must be a whole number of at least 1, got 0" },
  ]);
});
