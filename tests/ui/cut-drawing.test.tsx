import { cleanup, render, screen } from "@testing-library/react";
import fc from "fast-check";
import { afterEach, expect, test } from "vitest";
import { CutDrawing } from "@/components/line/cut-drawing";
import { cutFrame, cutLayout, hangOf, isLeftOfAnother, teeLinks } from "@/components/line/cut-layout";
import type { Element } from "@/lib/line/element";

afterEach(cleanup);

const line = "C50-S5";
type Piece = Element<string>;

test("a shorted stub and its distance from the load are drawn with their lengths to cut", () => {
  const elements: Piece[] = [
    { kind: "stub", connection: "shunt", end: "short", line, lengthM: 0.4051 },
    { kind: "cable", line, lengthM: 0.1923 },
  ];
  render(<CutDrawing elements={elements} load="antenna" name="Shorted stub" />);
  const words = screen.getByRole("img", { name: "Shorted stub" }).textContent;
  expect(words).toContain("405mm, shorted");
  expect(words).toContain("192mm");
});

test("a coil and a capacitor are drawn with their values", () => {
  const elements: Piece[] = [
    { kind: "part", connection: "shunt", cF: 14.9e-12 },
    { kind: "part", connection: "series", lH: 33.7e-9 },
  ];
  render(<CutDrawing elements={elements} load="resistor" name="L" />);
  const words = screen.getByRole("img").textContent;
  expect(words).toContain("14.9pF");
  expect(words).toContain("33.7nH");
});

test("cables in parallel say for how many of them the length holds", () => {
  const elements: Piece[] = [{ kind: "cable", paralleled: 2, line, lengthM: 0.21 }];
  render(<CutDrawing elements={elements} load="antenna" name="Two" />);
  expect(screen.getByRole("img").textContent).toContain("210mm, both");
});

test("different cables in parallel have a length each", () => {
  const branches = [
    { line, lengthM: 0.21 },
    { line: "C75-F7", lengthM: 0.2304 },
  ];
  render(<CutDrawing elements={[{ kind: "parallel", branches }]} load="antenna" name="Beside" />);
  expect(screen.getByRole("img").textContent?.replaceAll("\u00a0", " ")).toContain("210mm, below 230 mm");
});

test("two stubs are both drawn with their lengths, at their own tees or at one, and neither's words stand on the other", () => {
  const stub = (lengthM: number): Piece => ({ kind: "stub", connection: "shunt", end: "open", line, lengthM });
  const apart: Piece[] = [stub(3.756), { kind: "cable", line, lengthM: 1.167 }, stub(0.111)];
  const together: Piece[] = [stub(0.654), stub(0.187)];
  for (const elements of [apart, together]) {
    const layout = cutLayout(elements);
    const hangs = elements.map((_, index) => hangOf(layout, index)).filter((_, i) => elements[i]!.kind === "stub");
    expect(hangs.map(({ words }) => words)).toEqual(["left", "below"]);
    expect(hangs.every(({ isFolded }) => !isFolded)).toBe(true);
    expect(teeLinks(layout)).toHaveLength(elements === together ? 1 : 0);
  }
  render(<CutDrawing elements={together} load="antenna" name="Notch" />);
  const words = screen.getByRole("img", { name: "Notch" }).textContent;
  expect(words).toContain("654mm, open");
  expect(words).toContain("187mm, open");
});

test("of two parts across the line the first has its value at the left, so that the values do not meet in the middle", () => {
  const elements: Piece[] = [
    { kind: "part", connection: "shunt", lH: 193e-9 },
    { kind: "part", connection: "series", lH: 40e-9 },
    { kind: "part", connection: "shunt", cF: 156e-12 },
  ];
  expect(elements.map((_, index) => isLeftOfAnother(cutLayout(elements), index))).toEqual([true, true, false]);
  render(<CutDrawing elements={elements} load="resistor" name="Pi" />);
  const words = screen.getByRole("img", { name: "Pi" }).textContent;
  for (const value of ["193nH", "40.0nH", "156pF"]) expect(words).toContain(value);
});

const anyElement: fc.Arbitrary<Piece> = fc.oneof(
  fc.double({ min: 1e-3, max: 200, noNaN: true }).map((lengthM): Piece => ({ kind: "cable", line, lengthM })),
  fc
    .double({ min: 1e-3, max: 200, noNaN: true })
    .map((lengthM): Piece => ({ kind: "stub", connection: "shunt", end: "open", line, lengthM })),
  fc.constant<Piece>({ kind: "part", connection: "series", lH: 1e-7 }),
);

test("whatever a match is made of, its parts follow one another from source to load inside the drawing", () => {
  fc.assert(
    fc.property(fc.array(anyElement, { minLength: 1, maxLength: 11 }), (elements) => {
      const { items, startX } = cutLayout(elements);
      expect(startX).toBeGreaterThan(cutFrame.leadX);
      items.forEach((item, i) => {
        expect(item.toX).toBeGreaterThan(item.fromX);
        expect(item.toX).toBeLessThanOrEqual((items[i + 1]?.fromX ?? cutFrame.loadX) + 0.2);
      });
    }),
  );
});

test("before some of the run the drawing goes on with its cable instead of ending in the load", () => {
  const elements: Piece[] = [{ kind: "stub", connection: "shunt", end: "open", line, lengthM: 0.1 }];
  const onward = { construction: null, build: null, outerDiameterMm: 5 };
  const { container, rerender } = render(<CutDrawing elements={elements} load="resistor" name="Stub" />);
  const atLoad = container.querySelectorAll("g[transform]").length;
  rerender(<CutDrawing elements={elements} load="resistor" onward={onward} name="Stub" />);
  expect(container.querySelectorAll("g[transform]").length).toBe(atLoad - 1);
  expect(container.innerHTML).not.toMatch(/NaN/);
});
