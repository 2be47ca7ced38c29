import { expect, test } from "vitest";
import { findMatches, mostOfMethod } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { rank } from "@/lib/line/match/rank";
import { shortlist } from "@/lib/line/match/shortlist";
import { sweep } from "@/lib/line/run";
import { c50F10, c75F7, circuitOf, everyday, lossless } from "@/tests/support/match-lines";

const request: MatchRequest = { ...everyday, lines: [c50F10, c75F7] };
const many = Array.from({ length: 400 }, (_, k) => lossless(20 + k / 2));
const { lines: _none, ...without } = request;

test("shortlist(lines, …) keeps short lists whole, and of long ones the lines nearest to what a match needs", () => {
  expect(shortlist(many.slice(0, 60), without, 60)).toEqual(many.slice(0, 60));
  const kept = shortlist(many, without, 60);
  expect(kept).toHaveLength(60);
  const labels = kept.map(({ label }) => label);
  // The feeder's own 50 Ω, the two quarter-wave sections (26.5 and 94.5 Ω) and two of 53 Ω side by side.
  for (const label of ["50 ohm", "26.5 ohm", "94.5 ohm"]) expect(labels).toContain(label);
  expect(kept).toEqual(many.filter((line) => kept.includes(line)));
});

test("the best quarter-wave section of a shortlist is the best of the whole list", () => {
  const best = (lines: MatchRequest["lines"]) =>
    findMatches({ ...request, lines, methods: ["quarterWave"] }).candidates[0]!.title;
  expect(best(shortlist(many, without, 60))).toBe(best(many));
});

test("a load that is not known, open or a short still leaves a list to choose from", () => {
  for (const load of [{ kind: "open" }, { kind: "short" }] as const)
    expect(shortlist(many, { ...without, load }, 60)).toHaveLength(60);
});

test("of very many solutions of one method the best by rank are answered, and the rest counted", () => {
  const lines = many.slice(40, 80);
  const { candidates, omitted } = findMatches({ ...request, lines, methods: ["shuntStub"] });
  expect(candidates).toHaveLength(mostOfMethod);
  expect(omitted).toEqual([{ method: "shuntStub", count: 40 }]);
  const [first, second] = [lines.slice(0, 20), lines.slice(20)].map((half) =>
    findMatches({ ...request, lines: half, methods: ["shuntStub"] }),
  );
  expect([...first!.omitted, ...second!.omitted]).toEqual([]);
  const all = rank([...first!.candidates, ...second!.candidates], request.returnLossDb).map(({ title }) => title);
  expect(candidates.map(({ title }) => title)).toEqual(all.slice(0, mostOfMethod));
});

test("where pairs are asked for, two cables one after the other match too, solved with their loss", () => {
  const asked: MatchRequest = {
    ...request,
    lines: [c75F7, lossless(30), lossless(120)],
    methods: ["seriesSection"],
  };
  const alone = findMatches(asked).candidates;
  const { candidates } = findMatches({ ...asked, pairs: true });
  const pairs = candidates.filter(({ title }) => title.startsWith("Two cables in series"));
  expect(pairs.length).toBeGreaterThan(0);
  expect(candidates.length).toBe(alone.length + pairs.length);
  for (const candidate of pairs) {
    expect(candidate.elements.map(({ name }) => name)).toEqual(["Section 1", "Section 2"]);
    const { inputImpedance } = sweep(circuitOf(asked, candidate), [27.2e6]);
    expect(Math.hypot(inputImpedance.re[0]! - 50, inputImpedance.im[0]!)).toBeLessThan(1e-6);
  }
});

test("where pairs are asked for, two different cables side by side match too, each in the cut list, off together", () => {
  const asked: MatchRequest = {
    ...request,
    lines: [c50F10, c75F7, lossless(40)],
    methods: ["parallelCables"],
    tolerance: { lengthM: 0.01 },
  };
  const { candidates } = findMatches({ ...asked, pairs: true });
  const pairs = candidates.filter(({ title }) => title.startsWith("Two different cables in parallel"));
  expect(pairs.length).toBeGreaterThan(0);
  for (const candidate of pairs) {
    const [section] = candidate.elements;
    if (section?.kind !== "parallel") throw new Error("not a section of cables side by side");
    const { inputImpedance } = sweep(circuitOf(asked, candidate), [27.2e6]);
    expect(Math.hypot(inputImpedance.re[0]! - 50, inputImpedance.im[0]!)).toBeLessThan(1e-6);
    expect(candidate.cuts.slice(0, 2).map(({ lengthM }) => lengthM)).toEqual(
      section.branches.map(({ lengthM }) => lengthM),
    );
    expect(candidate.cuts.reduce((sum, { lengthM }) => sum + lengthM, 0)).toBeCloseTo(candidate.totalLengthM, 12);
    expect(candidate.worstReturnLossAtLimitsDb!).toBeLessThan(candidate.worstReturnLossDb!);
  }
});

test("cuts list every piece of cable with its line, and take the ends' allowance off, which needs repeat", () => {
  const { candidates } = findMatches({ ...request, endAllowanceM: 0.012, methods: ["shuntStub", "parallelCables"] });
  const stub = candidates.find(({ title }) => title.startsWith("Shorted stub, 951"))!;
  const trimHzPerM = expect.any(Number) as number;
  expect(stub.cuts).toEqual([
    {
      name: "Stub",
      line: "C50-F10",
      count: 1,
      lengthM: expect.closeTo(0.951, 3),
      cutM: expect.closeTo(0.939, 3),
      trimHzPerM,
    },
    {
      name: "Stub to load",
      line: "C50-F10",
      count: 1,
      lengthM: expect.closeTo(0.269, 3),
      cutM: expect.closeTo(0.257, 3),
      trimHzPerM,
    },
  ]);
  expect(stub.needs.map((each) => each.replaceAll("\u00a0", " "))).toContain("939 mm of C50-F10 for the stub");
  expect(stub.notes.join(" ").replaceAll("\u00a0", " ")).toContain(
    "12 mm of each piece is taken off for ends and joints",
  );
  for (const { cuts, elements, totalLengthM } of candidates) {
    expect(cuts.map(({ lengthM }) => lengthM)).toEqual(
      elements.map((each) => ("lengthM" in each ? each.lengthM : NaN)),
    );
    expect(cuts.reduce((sum, { lengthM, count }) => sum + lengthM * count, 0)).toBeCloseTo(totalLengthM, 12);
  }
});

test("the trim of each piece is how the best frequency really moves when it alone is shortened", () => {
  const asked: MatchRequest = { ...request, lines: [c50F10], methods: ["shuntStub", "doubleStub"] };
  const { candidates } = findMatches(asked);
  const frequencies = Array.from({ length: 4001 }, (_, k) => 27.1e6 + k * 50);
  for (const { elements, cuts, title } of candidates.slice(0, 4)) {
    cuts.forEach(({ trimHzPerM }, k) => {
      const off = 0.002;
      const trimmed = elements.map((each, n) =>
        n === k && "lengthM" in each ? { ...each, lengthM: each.lengthM - off } : each,
      );
      const { returnLossDb } = sweep(circuitOf(asked, { elements: trimmed }), frequencies);
      const best = frequencies[returnLossDb.indexOf(Math.max(...returnLossDb))]!;
      const moved = trimHzPerM! * off;
      expect(Math.abs(best - 27.2e6 - moved), title).toBeLessThan(0.05 * Math.abs(moved) + 100);
    });
  }
});

test("a match that is not exact has no best frequency to be trimmed to", () => {
  const { candidates } = findMatches({
    ...request,
    lines: [],
    methods: ["equalRipple"],
    sections: 2,
    rippleReturnLossDb: 20,
  });
  expect(candidates.length).toBeGreaterThan(0);
  for (const { cuts } of candidates) expect(cuts.map(({ trimHzPerM }) => trimHzPerM)).toEqual(cuts.map(() => null));
});

test("a piece shorter than its ends has nothing left to cut", () => {
  const { candidates } = findMatches({ ...request, endAllowanceM: 1, methods: ["shuntStub"] });
  const stub = candidates.find(({ title }) => title.startsWith("Shorted stub, 951"))!;
  expect(stub.cuts.map(({ cutM }) => cutM)).toEqual([null, null]);
});

test("with a tolerance the ranking puts what keeps the band at its limits first, then the better yield", () => {
  const { candidates } = findMatches({ ...request, returnLossDb: 24, tolerance: { lengthM: 0.02, valuePercent: 5 } });
  const kept = candidates.filter(
    (each) =>
      (each.worstReturnLossDb ?? Infinity) >= 24 && (each.worstMatchLossDb ?? Infinity) < 1 && !each.hasIdealLine,
  );
  const atLimits = kept.map((each) => (each.worstReturnLossAtLimitsDb ?? Infinity) >= 24);
  expect(atLimits).toEqual([...atLimits].sort((a, b) => Number(b) - Number(a)));
  const yields = kept.filter((_, k) => !atLimits[k]).map((each) => Math.floor(each.yieldPercent! / 5));
  expect(yields).toEqual([...yields].sort((a, b) => b - a));
  expect(new Set(atLimits).size).toBe(2);
});
