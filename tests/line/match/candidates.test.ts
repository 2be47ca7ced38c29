import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import { findMatches } from "@/lib/line/match/find-matches";
import { matchMethods, type MatchRequest } from "@/lib/line/match/match-request";
import { sweep } from "@/lib/line/run";
import { c50F10, c50F7, c75F7, circuitOf, everyday, lengthsOf } from "@/tests/support/match-lines";

test("candidates carry the catalogue's reference of their lines and no label, names for every element, and their cable counted", () => {
  const { candidates } = findMatches({ ...everyday, lines: [c75F7] });
  for (const { elements, totalLengthM, needs } of candidates) {
    expect(elements.every((each) => Boolean(each.name))).toBe(true);
    const cables = elements.filter((each) => each.kind === "cable" || each.kind === "stub");
    const named = cables.filter(({ line }) => line.cableId !== undefined);
    for (const { line } of named) expect(Object.keys(line).sort()).toEqual(["cableId", "model"]);
    // What no cable is, is named as an ideal line.
    expect(cables.length === named.length || needs.some((each) => each.includes("ideal line"))).toBe(true);
    const sum = cables.reduce((total, each) => total + each.lengthM * (each.paralleled ?? 1), 0);
    expect(totalLengthM).toBeCloseTo(sum, 12);
  }
});

test("standard part values are candidates of their own, marked, and keep to the E24 series", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["lSection"] });
  const standard = candidates.filter((each) => each.title.includes("E24"));
  expect(standard).toHaveLength(candidates.length / 2);
  const titles = standard.map((each) => each.title.replaceAll("\u00a0", " "));
  expect(titles).toContain("Coil and capacitor, E24 values 360 nH and 130 pF");
  for (const each of standard) expect(each.designReturnLossDb).toBeLessThan(60);
});

test("without a feeder the line nearest to the target runs from the load, and the notes say so", () => {
  const { candidates } = findMatches({
    ...everyday,
    feeder: undefined,
    lines: [c75F7, c50F10],
    methods: ["shuntStub"],
  });
  for (const { elements, notes } of candidates) {
    expect(elements[1]).toMatchObject({ kind: "cable", line: { cableId: "C50-F10" } });
    expect(notes.join(" ")).toContain("No feeder was named: C50-F10");
  }
});

test("the trimming note gives the direction and amount by which the best frequency really moves", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["shuntStub"] });
  const shorted = candidates.find((each) => each.title.startsWith("Shorted stub, 951"))!;
  const note = shorted.notes.find((each) => each.includes("moves the best frequency"))!.replaceAll("\u00a0", " ");
  const [, moved] = /^10 mm off the stub moves the best frequency up by (\d+) kHz\.$/.exec(note)!;
  const [stub, cable] = shorted.elements;
  const trimmed = { ...stub!, lengthM: lengthsOf(shorted)[0]! - 0.01 } as typeof stub & object;
  const frequencies = Array.from({ length: 2001 }, (_, k) => 27e6 + k * 500);
  const { returnLossDb } = sweep(circuitOf(everyday, { ...shorted, elements: [trimmed, cable!] }), frequencies);
  const best = frequencies[returnLossDb.indexOf(Math.max(...returnLossDb))]!;
  expect(Math.abs(best - 27.2e6 - Number(moved) * 1000)).toBeLessThan(0.03 * Number(moved) * 1000);
});

test("candidates come in the order of the ranking, whatever the order of the lines", () => {
  const lines = [c50F10, c75F7, c50F7];
  const one = findMatches({ ...everyday, lines }).candidates.map((each) => each.title);
  const other = findMatches({ ...everyday, lines: [...lines].reverse() }).candidates.map((each) => each.title);
  expect(other).toEqual(one);
});

test("needs list what to fit and cut, in the units of a workshop", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["shuntStub", "lSection"] });
  const needs = (start: string) =>
    candidates.find((each) => each.title.startsWith(start))!.needs.map((each) => each.replaceAll("\u00a0", " "));
  expect(needs("Shorted stub, 951")).toEqual([
    "1 tee",
    "1 soldered short",
    "951 mm of C50-F10 for the stub",
    "269 mm of C50-F10 to the load",
  ]);
  expect(needs("Coil and capacitor, 350")).toEqual([
    "1 coil 350 nH, Q at least 120 at 27.2 MHz",
    "1 capacitor 129 pF, Q at least 1000 at 27.2 MHz",
  ]);
});

test("every candidate of every method shows at the design frequency the return loss it states, computed as a run", () => {
  const tenths = (min: number, max: number) => fc.integer({ min: 10 * min, max: 10 * max }).map((each) => each / 10);
  fc.assert(
    fc.property(tenths(2, 1000), tenths(-500, 500), (reOhm, imOhm) => {
      const request: MatchRequest = {
        ...everyday,
        load: { kind: "constant", reOhm, imOhm },
        lines: [c50F7, c75F7],
        notchHz: 40e6,
      };
      const { candidates, refused } = findMatches(request);
      for (const candidate of candidates) {
        const { returnLossDb } = sweep(circuitOf(request, candidate), [request.designHz]);
        const stated = candidate.designReturnLossDb;
        if (stated === null) expect(returnLossDb[0]!, candidate.title).toBeGreaterThan(170);
        else expect(returnLossDb[0]! / stated, candidate.title).toBeCloseTo(1, 6);
      }
      const found = new Set(candidates.map(({ method }) => method));
      for (const { method, why } of refused) {
        expect(found.has(method)).toBe(false);
        expect(why).toMatch(/\.$/);
      }
      expect(found.size + refused.length).toBe(matchMethods.length);
    }),
    { numRuns: 8 },
  );
});
