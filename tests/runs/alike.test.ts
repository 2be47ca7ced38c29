import { expect, test } from "vitest";
import { alike } from "@/lib/runs/alike";

test("alike(a, b) does not mind the order of keys or an absent one, and minds everything else", () => {
  expect(
    alike(
      { kind: "cable", line: { cableId: "a", revision: 1 } },
      { line: { revision: 1, cableId: "a" }, kind: "cable" },
    ),
  ).toBe(true);
  expect(alike({ a: 1, b: undefined }, { a: 1 })).toBe(true);
  expect(alike([1, 2], [2, 1])).toBe(false);
  expect(alike({ a: null }, { a: undefined })).toBe(false);
  expect(alike({ lengthM: 36 }, { lengthM: 36.001 })).toBe(false);
});
