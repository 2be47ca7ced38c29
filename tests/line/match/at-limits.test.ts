import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import type { Element } from "@/lib/line/element";
import { worstAtLimits, type CutTolerance } from "@/lib/line/match/at-limits";
import { bandOf } from "@/lib/line/match/extreme";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import type { Ends } from "@/lib/line/match/response";
import { seenLoad } from "@/lib/line/match/seen-load";
import { sweep } from "@/lib/line/run";
import { c50F10, c75F7, circuitOf, everyday, lossless } from "@/tests/support/match-lines";

const request: MatchRequest = { ...everyday, lines: [c50F10, c75F7] };
const ends: Ends = { seen: seenLoad(request, 50, c50F10), targetOhm: 50 };
const band = bandOf(request);
const tolerance = { lengthM: 0.005, valuePercent: 5 };
const { candidates } = findMatches({
  ...request,
  tolerance,
  methods: ["shuntStub", "seriesStub", "quarterWave", "seriesSection", "parallelCables", "lSection"],
});
const frequencies = Array.from({ length: 201 }, (_, k) => 26.96e6 + (0.45e6 * k) / 200);
const worstOf = (elements: Element[], asked = request) =>
  Math.min(...sweep(circuitOf(asked, { elements }), frequencies).returnLossDb);

/** Each length and value moved by its own share, −1 to 1, of the tolerance. */
function moved(elements: Element[], shares: number[]): Element[] {
  return elements.map((element, k): Element => {
    const share = shares[k]!;
    if ("lengthM" in element) return { ...element, lengthM: Math.max(0, element.lengthM + share * tolerance.lengthM) };
    if (element.kind !== "part") return element;
    const factor = 1 + (share * tolerance.valuePercent) / 100;
    return element.lH === undefined
      ? { ...element, cF: element.cF! * factor }
      : { ...element, lH: element.lH * factor };
  });
}

test("of a network of two lengths or parts the worst is that of its four corners, swept one by one", () => {
  for (const { elements, worstReturnLossAtLimitsDb, title } of candidates) {
    const signs =
      elements.length === 1
        ? [[1], [-1]]
        : [
            [1, 1],
            [1, -1],
            [-1, 1],
            [-1, -1],
          ];
    const worst = Math.min(...signs.map((shares) => worstOf(moved(elements, shares))));
    expect(worstReturnLossAtLimitsDb, title).toBeCloseTo(worst, 3);
  }
});

test("nothing made within the tolerance is worse than its limits, whichever way each figure is off", () => {
  const share = fc.double({ min: -1, max: 1, noNaN: true });
  fc.assert(
    fc.property(fc.integer({ min: 0, max: candidates.length - 1 }), share, share, (index, a, b) => {
      const { elements, worstReturnLossAtLimitsDb } = candidates[index]!;
      expect(worstOf(moved(elements, [a, b]))).toBeGreaterThan(worstReturnLossAtLimitsDb! - 1e-3);
    }),
    { numRuns: 300 },
  );
});

test("a candidate is never better at its limits than as drawn, and without a tolerance nothing is said of limits", () => {
  for (const { worstReturnLossDb, worstReturnLossAtLimitsDb } of candidates)
    expect(worstReturnLossAtLimitsDb!).toBeLessThanOrEqual(worstReturnLossDb!);
  for (const candidate of findMatches(request).candidates) expect("worstReturnLossAtLimitsDb" in candidate).toBe(false);
});

test("a tolerance of nothing is the network as drawn", () => {
  for (const { elements, worstReturnLossDb } of candidates) {
    expect(worstAtLimits(elements, {}, ends, band)).toBeCloseTo(worstReturnLossDb!, 9);
    expect(worstAtLimits(elements, { lengthM: 0, valuePercent: 0 }, ends, band)).toBeCloseTo(worstReturnLossDb!, 9);
  }
});

test("a lossless stub cut wrong by δ reflects as its susceptance off by βδ·Y0·(1 + t²), to first order", () => {
  // An open stub of one eighth wavelength has t = tan(π/4) = 1: B off by 2·βδ·Y0, |Γ| = B/(2·Y0) = βδ.
  const line = lossless(50);
  const wavelength = (0.66 * 299792458) / 27.2e6;
  const stub: Element = { kind: "stub", connection: "shunt", end: "open", line, lengthM: wavelength / 8 };
  // With a parallel coil of the same susceptance the stub is matched away at 27.2 MHz.
  const coil: Element = { kind: "part", connection: "shunt", lH: 50 / (2 * Math.PI * 27.2e6) };
  const spot = { ...band, bandHz: [27.2e6, 27.2e6] as const };
  const matched: Ends = { seen: seenLoad({ load: { kind: "constant", reOhm: 50, imOhm: 0 } }, 50), targetOhm: 50 };
  const off = 1e-4;
  const found = worstAtLimits([stub, coil], { lengthM: off }, matched, spot);
  expect(10 ** (-found / 20)).toBeCloseTo((2 * Math.PI * off) / wavelength, 7);
});

test("a length shorter than its tolerance goes to nothing, not below", () => {
  const short: Element[] = [{ kind: "cable", line: c75F7, lengthM: 0.002 }];
  const found = worstAtLimits(short, { lengthM: 0.005 }, ends, band);
  const limits = [0, 0.002, 0.007].map((lengthM) => worstOf([{ kind: "cable", line: c75F7, lengthM }]));
  expect(found).toBeCloseTo(Math.min(...limits), 4);
});

test.each<[CutTolerance, RegExp]>([
  [{ lengthM: -1e-3 }, /lengthM must be at least 0, got -0\.001/],
  [{ lengthM: NaN }, /lengthM/],
  [{ valuePercent: 100 }, /valuePercent must be 0 to under 100, got 100/],
  [{ valuePercent: -1 }, /valuePercent/],
])("the tolerance %o is refused", (wrong, message) => {
  expect(() => worstAtLimits([], wrong, ends, band)).toThrow(message);
});

test("more figures than can be combined are refused with their number", () => {
  const many = Array.from({ length: 13 }, (): Element => ({ kind: "cable", line: c50F10, lengthM: 1 }));
  expect(() => worstAtLimits(many, { lengthM: 0.001 }, ends, band)).toThrow("at most 12 figures can be off, got 13");
});
