import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import type { Element } from "@/lib/line/element";
import { worstAtLimits } from "@/lib/line/match/at-limits";
import { uniformDraws } from "@/lib/line/match/draw";
import { bandOf } from "@/lib/line/match/extreme";
import { findMatches } from "@/lib/line/match/find-matches";
import { isLoose, madeNetwork } from "@/lib/line/match/made-network";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { responder, type Ends } from "@/lib/line/match/response";
import { seenLoad } from "@/lib/line/match/seen-load";
import { yieldPercent } from "@/lib/line/match/yield";
import { c50F10, c75F7, everyday, lossless } from "@/tests/support/match-lines";

const request: MatchRequest = { ...everyday, lines: [c50F10, c75F7], notchHz: 40e6, returnLossDb: 20 };
const tolerance = { lengthM: 0.02, valuePercent: 5 };
const ends: Ends = { seen: seenLoad(request, 50, c50F10), targetOhm: 50, temperatureC: 35 };
const band = bandOf(request);
const { candidates } = findMatches({ ...request, tolerance });
const oddments: Element[] = [
  { kind: "pad", lossDb: 3, inputOhm: 50, outputOhm: 50 },
  { kind: "part", connection: "shunt", rOhm: 300 },
  { kind: "part", connection: "series", cF: 5e-10, q: 300 },
  { kind: "transformer", turnsRatio: 1.5 },
  { kind: "stub", connection: "series", end: "open", line: c75F7, lengthM: 0.4, paralleled: 2 },
  { kind: "cable", line: c50F10, lengthM: 0.3, temperatureC: 60 },
  {
    kind: "parallel",
    branches: [
      { line: c50F10, lengthM: 1.1 },
      { line: c75F7, lengthM: 1.3 },
    ],
  },
];
const networks = [...candidates.map(({ elements }) => elements), oddments];

/** The element with its length or value off by a share, −1 to 1, of the tolerance. */
function off(element: Element, share: number): Element {
  if (element.kind === "cable" || element.kind === "stub")
    return { ...element, lengthM: Math.max(0, element.lengthM + share * tolerance.lengthM) };
  if (element.kind === "parallel") {
    const branches = element.branches.map((each) => ({ ...each, lengthM: each.lengthM + share * tolerance.lengthM }));
    return { ...element, branches };
  }
  if (element.kind !== "part") return element;
  const factor = 1 + (share * tolerance.valuePercent) / 100;
  const { rOhm, lH, cF } = element;
  if (rOhm !== undefined) return { ...element, rOhm: rOhm * factor };
  return lH === undefined ? { ...element, cF: cF! * factor } : { ...element, lH: lH * factor };
}

test("madeNetwork(elements, tolerance, …) reflects as the run's own two-ports do with each figure off by its share", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 0, max: networks.length - 1 }),
      fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 12, maxLength: 12 }),
      fc.integer({ min: 20, max: 40 }),
      (index, shares, mhz) => {
        const elements = networks[index]!;
        const made = madeNetwork(elements, tolerance, ends, [1e6 * mhz]);
        let figure = 0;
        const moved = elements.map((each) => (isLoose(each, tolerance) ? off(each, shares[figure++]!) : each));
        expect(made.figures).toBe(figure);
        expect(made.magnitude(0, shares)).toBeCloseTo(responder(moved, ends)(1e6 * mhz).magnitude, 10);
      },
    ),
  );
});

test("the yield is that of the same draws made one by one with the run's own two-ports over the whole band", () => {
  const frequencies = Array.from({ length: 41 }, (_, k) => 26.96e6 + (0.45e6 * k) / 40);
  const limit = 10 ** (-request.returnLossDb / 20) * (1 + 1e-9);
  const some = candidates.filter(({ elements }, k) => k % 9 === 0 && elements.every(({ kind }) => kind !== "pad"));
  expect(some.length).toBeGreaterThan(5);
  for (const { elements } of some) {
    const draw = uniformDraws(1);
    let kept = 0;
    for (let n = 0; n < 500; n++) {
      const respond = responder(
        elements.map((each) => (isLoose(each, tolerance) ? off(each, draw()) : each)),
        ends,
      );
      if (frequencies.every((f) => respond(f).magnitude <= limit)) kept += 1;
    }
    // A draw at the very edge of what is kept may be seen by one grid of frequencies only.
    expect(Math.abs(yieldPercent(elements, tolerance, ends, band) - kept / 5)).toBeLessThanOrEqual(0.4);
  }
});

test("what keeps the asked return loss at its limits has a yield of 100 %, what misses it as drawn and at every corner few", () => {
  for (const { worstReturnLossAtLimitsDb, yieldPercent: share, title } of candidates) {
    expect(share).toBeGreaterThanOrEqual(0);
    expect(share).toBeLessThanOrEqual(100);
    if ((worstReturnLossAtLimitsDb ?? Infinity) > request.returnLossDb) expect(share, title).toBe(100);
  }
  expect(candidates.some(({ yieldPercent: share }) => share! > 0 && share! < 100)).toBe(true);
});

test("the yield of one length is the share of its tolerance that keeps the limit", () => {
  // A lossless line of 100 Ω before 50 Ω reflects all but in proportion to its length.
  const stub: Element = { kind: "cable", line: lossless(100), lengthM: 0 };
  const matched: Ends = { seen: seenLoad({ load: { kind: "constant", reOhm: 50, imOhm: 0 } }, 50), targetOhm: 50 };
  const spot = { ...band, bandHz: [27.2e6, 27.2e6] as const };
  const at = (lengthM: number) => responder([{ ...stub, lengthM } as Element], matched)(27.2e6).magnitude;
  // Drawn from 0 to 0.1 m about 0.05 m, kept below 0.075 m: three quarters.
  const asked = { ...spot, returnLossDb: -20 * Math.log10(at(0.075)) };
  const found = yieldPercent([{ ...stub, lengthM: 0.05 } as Element], { lengthM: 0.05 }, matched, asked);
  expect(Math.abs(found - 75)).toBeLessThan(5);
});

test("a network of nothing that can be off is made or missed whole", () => {
  const transformer: Element[] = [{ kind: "transformer", turnsRatio: 1 }];
  expect(yieldPercent(transformer, tolerance, ends, { ...band, returnLossDb: 1 })).toBe(100);
  expect(yieldPercent(transformer, tolerance, ends, { ...band, returnLossDb: 30 })).toBe(0);
});

test("of many figures that can be off together no drawn making is worse than the limits named", () => {
  const many = findMatches({ ...request, methods: ["binomial"], sections: 6, lines: [], tolerance }).candidates;
  expect(many.length).toBe(2);
  for (const { elements } of many) {
    const worst = worstAtLimits(elements, tolerance, ends, band);
    const draw = uniformDraws(7);
    for (let n = 0; n < 200; n++) {
      const respond = responder(
        elements.map((each) => off(each, Math.sign(draw()))),
        ends,
      );
      for (const f of [26.96e6, 27.2e6, 27.41e6])
        expect(-20 * Math.log10(respond(f).magnitude)).toBeGreaterThan(worst - 1e-6);
    }
  }
});

test("the resistors of a pad are off like any other part", () => {
  const pad: Element[] = [{ kind: "pad", lossDb: 10, inputOhm: 50, outputOhm: 50 }];
  const matched: Ends = { seen: seenLoad({ load: { kind: "constant", reOhm: 50, imOhm: 0 } }, 50), targetOhm: 50 };
  expect(worstAtLimits(pad, { lengthM: 1 }, matched, band)).toBe(Infinity);
  const found = worstAtLimits(pad, { valuePercent: 5 }, matched, band);
  // All three 5 % high scale the pad to 52.5 Ω: input 52.5·(1 + ρ·10⁻¹)/(1 − …), about 2.4 %.
  expect(found).toBeLessThan(33);
  expect(found).toBeGreaterThan(28);
});

test("uniformDraws(seed) repeats itself, differs by seed, fills −1 to 1 evenly and has no drift from one to the next", () => {
  const take = (seed: number, count: number) => {
    const draw = uniformDraws(seed);
    return Array.from({ length: count }, draw);
  };
  expect(take(5, 20)).toEqual(take(5, 20));
  expect(take(5, 20)).not.toEqual(take(6, 20));
  const all = take(1, 40_000);
  const bins = Array.from({ length: 10 }, () => 0);
  for (const each of all) bins[Math.floor(5 * (each + 1))]! += 1;
  // Five standard deviations of a bin of 4000.
  for (const bin of bins) expect(Math.abs(bin - 4000)).toBeLessThan(300);
  const product = all.slice(1).reduce((sum, each, k) => sum + each * all[k]!, 0) / all.length;
  expect(Math.abs(product)).toBeLessThan(0.01);
});
