import { act, cleanup, fireEvent, render, screen } from "@testing-library/react";
import fc from "fast-check";
import { useState } from "react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { Histogram } from "@/components/plot/histogram";
import { handlePlaces, movedTo, stepCount, stepNearest, valueAtStep } from "@/components/plot/histogram-range";
import type { HistogramRange } from "@/components/plot/histogram-range";

beforeEach(() => vi.useFakeTimers());
afterEach(() => {
  cleanup();
  vi.useRealTimers();
});

const bins = [42.5, 52.5, 62.5, 72.5].map((from, i) => ({ from, to: from + 10, count: [6, 0, 3, 1][i]! }));

function Shown({ first = {}, onRange }: { first?: HistogramRange; onRange: (range: HistogramRange) => void }) {
  const [range, setRange] = useState(first);
  return (
    <Histogram
      name="Impedance"
      bins={bins}
      range={range}
      onChange={(next) => {
        setRange(next);
        onRange(next);
      }}
      format={String}
      spoken="ohms"
    />
  );
}

const handle = (end: "at least" | "at most") =>
  screen.getByRole<HTMLInputElement>("slider", { name: `Impedance, ${end}` });
const rest = () => act(() => vi.advanceTimersByTime(500));

describe("A histogram with two handles", () => {
  test("tells each handle's place in words, at the ends while nothing binds", () => {
    render(<Shown onRange={() => undefined} />);
    expect(handle("at least").getAttribute("aria-valuetext")).toBe("42.5 ohms");
    expect(handle("at most").getAttribute("aria-valuetext")).toBe("82.5 ohms");
  });

  test("moves a handle by a quarter of a bar, and hands the range on when the hand rests", () => {
    const onRange = vi.fn();
    render(<Shown onRange={onRange} />);
    fireEvent.change(handle("at least"), { target: { value: "1" } });
    fireEvent.change(handle("at least"), { target: { value: "2" } });
    expect(handle("at least").getAttribute("aria-valuetext")).toBe("47.5 ohms");
    expect(onRange).not.toHaveBeenCalled();
    rest();
    expect(onRange.mock.calls).toEqual([[{ from: 47.5 }]]);
  });

  test("hands on at once what a hand lets go of", () => {
    const onRange = vi.fn();
    render(<Shown onRange={onRange} />);
    fireEvent.change(handle("at most"), { target: { value: "12" } });
    fireEvent.pointerUp(handle("at most"));
    expect(onRange.mock.calls).toEqual([[{ to: 72.5 }]]);
    rest();
    expect(onRange).toHaveBeenCalledTimes(1);
  });

  test("does not let one handle pass the other", () => {
    const onRange = vi.fn();
    render(<Shown first={{ from: 52.5, to: 62.5 }} onRange={onRange} />);
    fireEvent.change(handle("at least"), { target: { value: "14" } });
    rest();
    expect(onRange).toHaveBeenLastCalledWith({ from: 62.5, to: 62.5 });
  });

  test("draws only what lies in the range as kept", () => {
    const { container } = render(<Shown first={{ from: 72.5 }} onRange={() => undefined} />);
    expect(container.querySelectorAll('rect[fill="var(--copper-fill)"]')).toHaveLength(1);
    expect(container.querySelectorAll('rect[fill="var(--line)"]')).toHaveLength(4);
  });

  test("with nothing to count has no handles", () => {
    render(<Histogram name="Loss" bins={[]} range={{}} onChange={() => undefined} format={String} spoken="" />);
    expect(screen.queryAllByRole("slider")).toEqual([]);
  });
});

describe("The range of two handles", () => {
  test("put at the ends binds nothing", () => {
    expect(movedTo(bins, { from: 52.5 }, "from", 42.5)).toEqual({});
    expect(movedTo(bins, { to: 60 }, "to", 82.5)).toEqual({});
  });

  test("outside the axis stands at its ends, and stays what it is", () => {
    expect(handlePlaces(bins, { from: 10, to: 60 })).toEqual([42.5, 60]);
    expect(movedTo(bins, { from: 10, to: 60 }, "to", 70)).toEqual({ from: 10, to: 70 });
  });

  test("steps reach both ends of any axis, also where the first bar is cut short at 0", () => {
    const axis = fc.record({ width: fc.constantFrom(0.01, 0.2, 1, 5, 50), count: fc.integer({ min: 1, max: 14 }) });
    fc.assert(
      fc.property(axis, fc.boolean(), ({ width, count }, isCut) => {
        const edge = (k: number) => (k + 0.25) * width;
        const all = Array.from({ length: count }, (_, k) => ({ from: edge(k), to: edge(k + 1), count: 1 }));
        const cut = isCut ? [{ from: 0, to: edge(0), count: 1 }, ...all] : all;
        expect(valueAtStep(cut, 0)).toBeCloseTo(cut[0]!.from, 9);
        expect(valueAtStep(cut, stepCount(cut))).toBeCloseTo(cut.at(-1)!.to, 9);
        for (let step = 4; step <= stepCount(cut); step++) expect(stepNearest(cut, valueAtStep(cut, step))).toBe(step);
      }),
    );
  });
});
