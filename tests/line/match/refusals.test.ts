import { expect, test } from "vitest";
import type { Termination } from "@/lib/line/element";
import { findMatches } from "@/lib/line/match/find-matches";
import { matchMethods, type MatchRequest } from "@/lib/line/match/match-request";
import { c50F10, c75F7, lossless } from "@/tests/support/match-lines";

const request: MatchRequest = {
  load: { kind: "constant", reOhm: 22, imOhm: -35 },
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [26.96e6, 27.41e6],
  returnLossDb: 20,
  feeder: c50F10,
  lines: [c50F10, c75F7],
};

const plain = (text: string) => text.replaceAll("\u00a0", " ");

test.each<[string, Termination, RegExp]>([
  ["an equal load", { kind: "constant", reOhm: 50, imOhm: 0 }, /already is 50\.0 Ω at 27\.2 MHz/],
  ["a pure reactance", { kind: "constant", reOhm: 0, imOhm: 40 }, /pure reactance/],
  ["a nearly pure reactance", { kind: "constant", reOhm: 1e-6, imOhm: 40 }, /pure reactance/],
  ["an open end", { kind: "open" }, /open at 27\.2 MHz/],
  ["a short", { kind: "short" }, /pure reactance/],
  ["a network that resonates to an open", { kind: "network", topology: "parallel", cF: 0 }, /open at/],
  [
    "a load measured elsewhere",
    { kind: "sampled", referenceOhm: 50, frequenciesHz: [27e6, 27.3e6], reflection: { re: [0.3, 0.3], im: [0, 0] } },
    /measured from 27 MHz to 27\.3 MHz, which does not cover/,
  ],
])("%s is refused by every method in one sentence, without a throw", (_name, load, sentence) => {
  const { candidates, refused } = findMatches({ ...request, load });
  expect(candidates).toEqual([]);
  expect(refused.map((each) => each.method)).toEqual([...matchMethods]);
  for (const { why } of refused) expect(plain(why)).toMatch(sentence);
});

test("without any line only parts and resistors are left, and the rest say what is missing", () => {
  const { candidates, refused } = findMatches({ ...request, feeder: undefined, lines: [], notchHz: 40e6 });
  const without = ["lSection", "piNetwork", "tNetwork", "pad"];
  expect(new Set(candidates.map((each) => each.method))).toEqual(new Set(without));
  expect(refused.map((each) => each.method)).toEqual(matchMethods.filter((method) => !without.includes(method)));
  for (const { why } of refused)
    expect(why).toMatch(
      /^No line was named to cut a (stub|section) from\.$|no line was named that brings the load to one\.$|^No line given brings/,
    );
});

test("a quarter-wave section that no line can make names the impedances needed and what the nearest line reaches", () => {
  const { refused } = findMatches({ ...request, methods: ["quarterWave"] });
  expect(refused).toHaveLength(1);
  // By hand on 50 Ω: Γ 0.560 at −102.7°, so the minimum 0.107 λ (1.00 m) off; 50/√3.544 = 26.6, 50·√3.544 = 94.1.
  expect(plain(refused[0]!.why)).toBe(
    "A quarter-wave section needs 26.6 Ω 999 mm from the load or 94.3 Ω 3.333 m from the load; of the lines given, C75-F7 of 75.4 Ω comes nearest and reaches 14.1 dB, not 20.0 dB.",
  );
});

test("a section that changes nothing is no match, however fair the load is already", () => {
  const load: Termination = { kind: "constant", reOhm: 60, imOhm: 0 };
  const { candidates, refused } = findMatches({
    ...request,
    load,
    returnLossDb: 14,
    methods: ["quarterWave"],
    lines: [c50F10],
  });
  expect(candidates).toEqual([]);
  expect(plain(refused[0]!.why)).toMatch(/reaches 21\.3 dB, not a decibel better than the load alone with 20\.8 dB\.$/);
});

test("a series section too near the feeder's impedance is refused with the impedances that would do", () => {
  const { refused } = findMatches({ ...request, methods: ["seriesSection"] });
  expect(plain(refused[0]!.why)).toMatch(
    /^With C50-F10 of 50\.2 Ω this load needs a section of at most 26\.\d Ω or at least 94\.\d Ω; the lines given are 50\.2 Ω to 75\.4 Ω\.$/,
  );
});

test("the impedances a refused series section asks for are those at which it begins to work", () => {
  const feeder = lossless(50);
  const matches = (z0: number) =>
    findMatches({ ...request, feeder, lines: [lossless(z0)], methods: ["seriesSection"] }).candidates.length;
  // |Γ| of 22 − j35 Ω on 50 Ω is 0.560, VSWR 3.544: 50/√3.544 = 26.56 and 50·√3.544 = 94.13.
  expect([26.4, 26.7, 93.9, 94.3].map(matches)).toEqual([2, 0, 0, 2]);
});

test("a feeder that nowhere shows the target's conductance is refused by name", () => {
  const load: Termination = { kind: "constant", reOhm: 80, imOhm: 0 };
  const { refused } = findMatches({ ...request, load, feeder: lossless(75), methods: ["shuntStub", "seriesStub"] });
  expect(refused.map((each) => plain(each.why))).toEqual([
    "With this load, 75 ohm of 75.0 Ω nowhere shows the conductance of 50.0 Ω, so a stub cannot complete it.",
    "With this load, 75 ohm of 75.0 Ω nowhere shows the resistance of 50.0 Ω, so a stub cannot complete it.",
  ]);
});

test.each([
  ["targetOhm", { targetOhm: 0 }],
  ["targetOhm", { targetOhm: NaN }],
  ["designHz", { designHz: -1 }],
  ["bandHz from", { bandHz: [0, 1e6] as const }],
  ["bandHz must ascend", { bandHz: [2e6, 1e6] as const }],
  ["returnLossDb", { returnLossDb: Infinity }],
  ["coilQ", { partQ: { coilQ: 0 } }],
  ["capacitorQ", { partQ: { capacitorQ: -2 } }],
  ["rippleReturnLossDb", { rippleReturnLossDb: 0 }],
  ["networkQ", { networkQ: NaN }],
  ["notchHz", { notchHz: -1 }],
  ["sections", { sections: 11 }],
  ["sections", { sections: 2.5 }],
  ["spacingWavelengths", { spacingWavelengths: 0 }],
  ["spacingWavelengths", { spacingWavelengths: 0.5 }],
  ["firstDistanceWavelengths", { firstDistanceWavelengths: -0.1 }],
  ["endAllowanceM", { endAllowanceM: -0.001 }],
])("a request whose %s is out of range throws a RangeError that names it", (name, change: Partial<MatchRequest>) => {
  expect(() => findMatches({ ...request, ...change })).toThrow(RangeError);
  expect(() => findMatches({ ...request, ...change })).toThrow(name);
});

test("no candidate of an awkward load carries a NaN, an Infinity or an empty word", () => {
  const loads: Termination[] = [
    { kind: "constant", reOhm: 0.05, imOhm: 900 },
    { kind: "constant", reOhm: 5000, imOhm: -3000 },
    { kind: "constant", reOhm: 50, imOhm: -30 },
    { kind: "constant", reOhm: 51, imOhm: 0 },
    { kind: "network", topology: "series", rOhm: 10, lH: 1e-6, cF: 20e-12 },
  ];
  for (const load of loads) {
    const { candidates, refused } = findMatches({ ...request, load, bandHz: [1e6, 200e6] });
    const text = JSON.stringify({ candidates, refused });
    expect(text).not.toMatch(/NaN|Infinity|undefined/);
    for (const each of candidates) expect(Number.isFinite(each.bandwidthHz) && each.bandwidthHz >= 0).toBe(true);
    for (const { elements } of candidates)
      for (const each of elements) if ("lengthM" in each) expect(each.lengthM).toBeGreaterThanOrEqual(0);
  }
});
