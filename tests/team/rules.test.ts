import { expect, test } from "vitest";
import { reviewDueAt, usualRules } from "@/lib/team/rules";

test("An entry is due for another look after the months of the house rule", () => {
  expect(reviewDueAt("2026-01-19T14:00:00.000Z", usualRules)).toBe("2029-01-19T14:00:00.000Z");
  expect(reviewDueAt("2026-01-31T00:00:00.000Z", { ...usualRules, reviewMonths: 1 })).toBe("2026-02-28T00:00:00.000Z");
});
