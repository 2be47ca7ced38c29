import { expect, test } from "vitest";
import { rankedSections, sectionRequests } from "@/lib/calculators/section-cables";
import type { CableItem } from "@/lib/cables/schema";

const item = (id: string, z0Ohm: number): CableItem => ({
  ...{ id, designation: id.toUpperCase(), aliases: [], name: "invented", family: "coaxial", state: "approved" },
  ...{ condition: null, preferred: false, revision: 1, z0Ohm, velocityFactor: 0.66, capacitanceFPerM: 1e-10 },
  ...{ delaySPerM: 5e-9, lossDbPer100m: null, lossRangeDbPer100m: [1, 10], outerDiameterMm: null },
  ...{ construction: null, build: null, usedInRuns: 0 },
});

test("the catalogue is asked for the neighbours on both sides, of one cable and of two in parallel", () => {
  expect(sectionRequests(61.237243569)).toEqual([
    { count: 1, path: "/cables?z0Ohm=..61.2372&sort=-z0&limit=3" },
    { count: 1, path: "/cables?z0Ohm=61.2372..&sort=z0&limit=3" },
    { count: 2, path: "/cables?z0Ohm=..122.474&sort=-z0&limit=3" },
    { count: 2, path: "/cables?z0Ohm=122.474..&sort=z0&limit=3" },
  ]);
});

test("candidates come best first, an exact one with no reflection at all, each once", () => {
  const found = [
    { count: 1 as const, items: [item("a", 50), item("b", 60)] },
    { count: 1 as const, items: [item("b", 60)] },
    { count: 2 as const, items: [item("c", 120), item("d", 122.474487139)] },
  ];
  const ranked = rankedSections(found, 50, 75);
  expect(ranked.map(({ item: { id }, count }) => `${count} ${id}`)).toEqual(["2 d", "1 b", "2 c", "1 a"]);
  expect(ranked[0]!.returnLossDb).toBeGreaterThan(100);
  // (60² − 3750)/(60² + 3750) by hand
  expect(ranked[1]!.returnLossDb).toBeCloseTo(-20 * Math.log10(150 / 7350), 9);
  expect(ranked[3]!.returnLossDb).toBeCloseTo(13.98, 2);
});

test("of sections that no cable could tell apart, one cable comes before two", () => {
  const found = [
    { count: 1 as const, items: [item("a", 61.1)] },
    { count: 2 as const, items: [item("b", 122.474487139)] },
  ];
  expect(rankedSections(found, 50, 75).map(({ item: { id } }) => id)).toEqual(["a", "b"]);
});

test("an empty catalogue gives no candidates", () => {
  expect(rankedSections([], 50, 75)).toEqual([]);
});
