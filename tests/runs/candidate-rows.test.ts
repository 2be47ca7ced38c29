import { expect, test } from "vitest";
import { isBest, rowsOf, vswrOf } from "@/components/runs/candidate-rows";
import { findMatches } from "@/lib/line/match/find-matches";
import { atLimits } from "@/lib/runs/match-limits";
import type { MatchAsked } from "@/lib/runs/matching";
import { c50F10, everyday } from "@/tests/support/match-lines";

const asked: MatchAsked = {
  load: everyday.load,
  behind: [],
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [26.96e6, 27.41e6],
  returnLossDb: 14,
  coilQ: 120,
  capacitorQ: 1000,
  temperatureC: 20,
};
const { candidates } = findMatches({ ...asked, feeder: c50F10, lines: [c50F10] });
const stub = candidates.find(({ method }) => method === "shuntStub")!;
const parts = candidates.find(({ method }) => method === "lSection")!;
const tolerance = { lengthM: 0.005, valuePercent: 5 };
const labels = (rows: { label: string }[]) => rows.map(({ label }) => label.replaceAll("\u00a0", " "));

test("what is off is named by what the match is made of: lengths are cut, values are chosen", () => {
  expect(labels(rowsOf(stub, asked, atLimits(stub.elements, asked, tolerance)))).toContain("Worst VSWR, cut ±5 mm");
  expect(labels(rowsOf(parts, asked, atLimits(parts.elements, asked, tolerance)))).toContain("Worst VSWR, parts ±5 %");
  const fine = atLimits(parts.elements, asked, { valuePercent: 2.5 });
  expect(fine?.words.replaceAll("\u00a0", " ")).toBe("parts ±2.5 %");
});

test("the figure at the limits is the engine's own for that tolerance", () => {
  const { candidates: all } = findMatches({ ...asked, feeder: c50F10, lines: [c50F10], tolerance });
  for (const candidate of all)
    expect(atLimits(candidate.elements, asked, tolerance)?.returnLossDb).toBeCloseTo(
      candidate.worstReturnLossAtLimitsDb!,
      9,
    );
});

test("where nothing of one match can be off the row stays, so that rows beside it still compare", () => {
  expect(atLimits(parts.elements, asked, { lengthM: 0.005 })).toBeNull();
  const rows = rowsOf(parts, asked, null);
  expect(labels(rows)).toContain("Worst VSWR, nothing off");
  expect(rows).toHaveLength(rowsOf(stub, asked, atLimits(stub.elements, asked, tolerance)).length);
  expect(labels(rowsOf(stub, asked, undefined)).join()).not.toContain("off");
});

test("a match before some of the run says what it loses itself and what is lost up to the load", () => {
  const behind = [{ kind: "cable" as const, line: c50F10, lengthM: 36 }];
  const there = { ...asked, behind };
  const [candidate] = findMatches({ ...there, feeder: c50F10, lines: [c50F10] }).candidates;
  const rows = rowsOf(candidate!, there, undefined);
  const [own, all] = rows.filter(({ label }) => label.startsWith("Lost"));
  expect(all!.value - own!.value).toBeGreaterThan(1.2);
  expect(rowsOf(stub, asked, undefined).filter(({ label }) => label.startsWith("Lost"))).toHaveLength(1);
});

test("the best of a row is marked where the matches differ, and no figure without a number is", () => {
  const columns = [stub, parts].map((each) => rowsOf(each, asked, undefined));
  const [cable] = columns[0]!.map(({ label }, k) => (label === "Cable to cut" ? k : -1)).filter((k) => k >= 0);
  expect(isBest(columns[1]![cable!]!, cable!, columns)).toBe(true);
  expect(isBest(columns[0]![cable!]!, cable!, columns)).toBe(false);
  expect(isBest(columns[0]![0]!, 0, [columns[0]!])).toBe(false);
});

test("a perfect match has VSWR 1", () => {
  expect(vswrOf(null)).toBe(1);
  expect(vswrOf(Infinity)).toBe(1);
  expect(vswrOf(20 * Math.log10(5))).toBeCloseTo(1.5, 12);
});
