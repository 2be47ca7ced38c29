import { cleanup, render } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { Dumbbells, type Dumbbell } from "@/components/plot/dumbbells";

afterEach(cleanup);

const format = (value: number) => (Number.isFinite(value) ? value.toFixed(2) : "–");
const row = (from: number, to: number): Dumbbell => ({ id: `${from}`, label: "A", look: 1, from, to });

function draw(rows: Dumbbell[], limit = 1.4) {
  const { container } = render(<Dumbbells rows={rows} domain={[1.2, 1.5]} limit={limit} format={format} />);
  const numbers = [...container.querySelectorAll("[cx],[x],[d]")].flatMap((each) =>
    ["cx", "x", "y", "width", "d"].flatMap((name) => each.getAttribute(name) ?? []),
  );
  return { container, numbers: numbers.join(" "), words: container.textContent };
}

test("both ends of a row are written beside their marks, the better one filled and the other a ring", () => {
  const { container, words } = draw([row(1.29, 1.35)]);
  expect(words).toContain("1.29");
  expect(words).toContain("1.35");
  const [drawn, made] = [...container.querySelectorAll("circle")];
  expect(Number(drawn!.getAttribute("cx"))).toBeLessThan(Number(made!.getAttribute("cx")));
  expect(made!.getAttribute("fill")).toBe("var(--paper)");
});

test("what the axis does not reach stands at its end as an arrow with its figure, and nothing is drawn outside", () => {
  const { container, words, numbers } = draw([row(1.29, 9.5), row(Infinity, Infinity)]);
  expect(container.querySelectorAll("circle")).toHaveLength(1);
  expect(words).toContain("9.50");
  expect(words).toContain("–");
  expect(numbers).not.toMatch(/NaN|Infinity/);
  const places = [...container.querySelectorAll("circle")].map((each) => Number(each.getAttribute("cx")));
  for (const x of places) expect(x).toBeLessThanOrEqual(286);
});

test("the part of the axis beyond the limit is hatched, and a limit off the axis draws no line", () => {
  const inside = draw([row(1.29, 1.35)]);
  const hatched = inside.container.querySelector("rect")!;
  expect(Number(hatched.getAttribute("width"))).toBeGreaterThan(20);
  cleanup();
  const beyond = draw([row(1.29, 1.35)], 3);
  expect(Number(beyond.container.querySelector("rect")!.getAttribute("width"))).toBe(0);
});
