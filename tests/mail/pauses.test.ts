import { expect, test } from "vitest";
import { mostTries, nextTry, pausesMs } from "@/lib/mail/pauses";

test("Pauses never shrink, and a letter is tried for four to five days before it is given up (RFC 5321, 4.5.4.1)", () => {
  for (const [i, pause] of pausesMs.entries()) expect(pause).toBeGreaterThanOrEqual(pausesMs[i - 1] ?? 1);
  const days = pausesMs.reduce((sum, pause) => sum + pause, 0) / 86_400_000;
  expect(days).toBeGreaterThanOrEqual(4);
  expect(days).toBeLessThanOrEqual(5);
});

test("A letter is tried again after its pause, and after the last try not again", () => {
  const now = Date.parse("2026-03-01T12:00:00.000Z");
  expect(nextTry(1, now)).toBe("2026-03-01T12:01:00.000Z");
  expect(nextTry(4, now)).toBe("2026-03-01T14:00:00.000Z");
  expect(nextTry(mostTries - 1, now)).not.toBeNull();
  expect(nextTry(mostTries, now)).toBeNull();
});
