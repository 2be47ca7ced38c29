import { expect, test } from "vitest";
import { nudge } from "@/lib/format/nudge";

test.each([
  ["36 m", 1, "37 m"],
  ["36 m", -10, "26 m"],
  ["36 m", 0.1, "36.1 m"],
  ["1.80", 1, "1.90"],
  ["0.269", 1, "0.279"],
  ["27.2 MHz", 1, "28.2 MHz"],
  ["0", 1, "1"],
  ["", 1, ""],
  ["22-35j", 1, "23-35j"],
])("nudge(%j, %s) steps the first figure and keeps the rest", (text, steps, expected) => {
  expect(nudge(text, steps)).toBe(expected);
});
