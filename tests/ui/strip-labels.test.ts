import fc from "fast-check";
import { expect, test } from "vitest";
import { spread } from "@/components/line/strip-labels";

const anyWish = fc.record({
  x: fc.double({ min: -50, max: 1500, noNaN: true }),
  width: fc.integer({ min: 5, max: 200 }),
  rank: fc.integer({ min: 0, max: 100 }),
});

test("labels never overlap and never leave the room they have", () => {
  fc.assert(
    fc.property(fc.array(anyWish, { maxLength: 40 }), (wishes) => {
      const placed = spread(
        wishes.map((wish, index) => ({ ...wish, index })),
        0,
        1200,
      );
      placed.forEach((label, i) => {
        const before = placed[i - 1];
        expect(label.x).toBeGreaterThanOrEqual(before ? before.x + before.width : 0);
        expect(label.x + label.width).toBeLessThanOrEqual(1200 + 1e-6);
      });
    }),
  );
});

test("labels that have room stand exactly where their piece begins", () => {
  const wishes = [
    { index: 0, x: 10, width: 80, rank: 0 },
    { index: 1, x: 300, width: 80, rank: 0 },
  ];
  expect(spread(wishes, 0, 1200).map(({ x }) => x)).toEqual([10, 300]);
});

test("where not all find room the last in rank gives way, and the selected one stays", () => {
  const wishes = [
    { index: 0, x: 0, width: 90, rank: -Infinity },
    { index: 1, x: 50, width: 90, rank: 5 },
    { index: 2, x: 100, width: 90, rank: 3 },
  ];
  expect(spread(wishes, 0, 200).map(({ index }) => index)).toEqual([0, 2]);
});
