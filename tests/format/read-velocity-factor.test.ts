import { expect, test } from "vitest";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";

test.each([
  ["0.85", 0.85, "0.85"],
  [".66", 0.66, "0.66"],
  ["0,659", 0.659, "0.659"],
  ["85 %", 0.85, "0.85"],
  ["85%", 0.85, "0.85"],
  ["85", 0.85, "0.85, read as per cent"],
  ["1", 1, "1"],
  ["1/1.25", 0.8, "0.8"],
  ["1.25", 0.8, "0.8, read as 1/VF"],
  ["0.85 c", 0.85, "0.85"],
])("readVelocityFactor(%j) is the fraction meant, and says how it was read", (text, value, words) => {
  expect(readVelocityFactor(text)).toEqual({ ok: true, value, understood: words });
});

test.each([
  ["", /Type a velocity factor/],
  ["0", /More than 0, at most 1/],
  ["120 %", /More than 0, at most 1/],
  ["1/0.5", /More than 0, at most 1/],
  ["1/0", /More than 0, at most 1/],
  ["-0.8", /not a velocity factor/],
  ["0.85 m", /not a velocity factor/],
  ["fast", /not a velocity factor/],
])("readVelocityFactor(%j) is refused with a sentence", (text, message) => {
  expect(readVelocityFactor(text)).toEqual({ ok: false, message: expect.stringMatching(message) });
});
