import { act, renderHook } from "@testing-library/react";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { useTolerance } from "@/components/runs/use-tolerance";
import { tolerance, type ToleranceRequest } from "@/lib/line/tolerance";
import { workThrough, type ToleranceNews } from "@/lib/runs/tolerance-work";
import { cable, run } from "@/tests/support/lossy-run";

const request: ToleranceRequest = {
  ...{ circuit: run([cable(20)]), frequencies: [1.45e8], draws: 50, seed: 3 },
  spread: [{ path: "elements.0.lengthM", limits: [19, 21] }],
};

/** The browser's worker, which this environment lacks: it does our work when told to, a piece of news at a time. */
class StandIn {
  static all: StandIn[] = [];
  onmessage: ((event: { data: ToleranceNews }) => void) | null = null;
  onerror: (() => void) | null = null;
  isEnded = false;
  news: ToleranceNews[] = [];
  constructor() {
    StandIn.all.push(this);
  }
  postMessage(asked: ToleranceRequest) {
    workThrough(asked, (each) => this.news.push(each));
  }
  terminate() {
    this.isEnded = true;
  }
  tell(count = 1) {
    for (const data of this.news.splice(0, count)) this.onmessage?.({ data });
  }
}

beforeEach(() => {
  StandIn.all = [];
  vi.stubGlobal("Worker", StandIn);
});
afterEach(() => void vi.unstubAllGlobals());

test("it shows progress while it draws and the server's numbers at the end, and lets the worker go", () => {
  const { result } = renderHook(() => useTolerance());
  act(() => result.current.start(request));
  expect(result.current.progress).toBe(0);
  const [worker] = StandIn.all;
  act(() => worker!.tell());
  expect(result.current.progress).toBeGreaterThan(0);
  act(() => worker!.tell(Infinity));
  expect(result.current).toMatchObject({ progress: null, result: tolerance(request), trouble: null });
  expect(worker!.isEnded).toBe(true);
});

test("stopping ends the work and keeps the last result; late news is not heard", () => {
  const { result } = renderHook(() => useTolerance());
  act(() => result.current.start(request));
  act(() => StandIn.all[0]!.tell(Infinity));
  act(() => result.current.start({ ...request, seed: 4 }));
  act(() => result.current.stop());
  expect(result.current).toMatchObject({ progress: null, result: tolerance(request) });
  expect(StandIn.all[1]!.isEnded).toBe(true);
  act(() => StandIn.all[1]!.tell(Infinity));
  expect(result.current.result).toEqual(tolerance(request));
});

test("a new request gives up the one at work, and so does leaving", () => {
  const { result, unmount } = renderHook(() => useTolerance());
  act(() => result.current.start(request));
  act(() => result.current.start({ ...request, seed: 4 }));
  expect(StandIn.all.map(({ isEnded }) => isEnded)).toEqual([true, false]);
  unmount();
  expect(StandIn.all[1]!.isEnded).toBe(true);
});

test("what cannot be worked out is told, and a worker that breaks", () => {
  const { result } = renderHook(() => useTolerance());
  act(() => result.current.start({ ...request, draws: 0 }));
  act(() => StandIn.all[0]!.tell());
  expect(result.current).toMatchObject({ progress: null, trouble: expect.stringContaining("draws must be") as string });
  act(() => result.current.start(request));
  expect(result.current.trouble).toBeNull();
  act(() => StandIn.all[1]!.onerror?.());
  expect(result.current.trouble).toMatch(/could not be finished/);
});
