import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import { complex } from "@/lib/line/complex";
import { findMatches } from "@/lib/line/match/find-matches";
import { leastQ, threeParts, type ThreePartTopology } from "@/lib/line/match/three-parts";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { sweep } from "@/lib/line/run";
import { circuitOf, everyday } from "@/tests/support/match-lines";

const lossless = { coil: Infinity, capacitor: Infinity };
const plain = (text: string) => text.replaceAll("\u00a0", " ");

test("a pi of Q 15 between 100 and 1000 Ω has the reactances worked out by hand from two L-sections back to back", () => {
  // Middle 1000/(1 + 15²) = 4.425 Ω; at 1000 Ω: X across 66.7, in series 15·4.425 = 66.4;
  // at 100 Ω: Q = √(100/4.425 − 1) = 4.647, across 21.5, in series 20.6.
  const all = threeParts(complex(1000), 100, "pi", 15, lossless);
  expect(all).toHaveLength(4);
  const lowPass = all.find(({ atLoad, atTarget }) => atLoad > 0 && atTarget > 0)!;
  expect(1 / lowPass.atLoad).toBeCloseTo(66.67, 2);
  expect(1 / lowPass.atTarget).toBeCloseTo(21.52, 2);
  expect(lowPass.middle).toBeCloseTo(66.37 + 20.56, 1);
});

test("a T of Q 10 between 10 and 50 Ω has the reactances worked out by hand from two L-sections back to back", () => {
  // Middle 10·(1 + 10²) = 1010 Ω: in series 100 at 10 Ω; at 50 Ω Q = √(1010/50 − 1) = 4.382, in series 219.1;
  // across 1010/10 ∥ 1010/4.382 = 101 ∥ 230.5 = 70.2.
  const all = threeParts(complex(10), 50, "T", 10, lossless);
  const lowPass = all.find(({ atLoad, atTarget }) => atLoad > 0 && atTarget > 0)!;
  expect(lowPass.atLoad).toBeCloseTo(100, 9);
  expect(lowPass.atTarget).toBeCloseTo(219.1, 1);
  expect(1 / lowPass.middle).toBeCloseTo(70.2, 1);
});

const tenths = (min: number, max: number) => fc.integer({ min: 10 * min, max: 10 * max }).map((each) => each / 10);

test("every pi and T, of any Q above the least and any loss of its parts, shows the target when its run is computed", () => {
  fc.assert(
    fc.property(tenths(2, 800), tenths(-300, 300), tenths(0.2, 10), fc.boolean(), (reOhm, imOhm, more, isLossy) => {
      const load = { kind: "constant", reOhm, imOhm } as const;
      for (const [method, topology] of [
        ["piNetwork", "pi"],
        ["tNetwork", "T"],
      ] as const) {
        const networkQ = leastQ(complex(reOhm, imOhm), 50, topology) + more;
        const request: MatchRequest = {
          ...everyday,
          load,
          methods: [method],
          networkQ,
          partQ: isLossy ? { coilQ: 150, capacitorQ: 2000 } : {},
        };
        const { candidates } = findMatches(request);
        const exact = candidates.filter(({ title }) => !title.includes("E24"));
        if (!isLossy && Math.abs(imOhm) > 1) expect(exact).toHaveLength(4);
        for (const candidate of exact) {
          expect(candidate.elements).toHaveLength(3);
          const { inputImpedance } = sweep(circuitOf(request, candidate), [27.2e6]);
          expect(Math.hypot(inputImpedance.re[0]! - 50, inputImpedance.im[0]!), candidate.title).toBeLessThan(1e-5);
        }
      }
    }),
    { numRuns: 60 },
  );
});

test.each<ThreePartTopology>(["pi", "T"])(
  "as the Q comes down to that of the L-section, one part of a %s between two resistances comes to nothing",
  (topology) => {
    const load = complex(200);
    const all = threeParts(load, 50, topology, leastQ(load, 50, topology) + 1e-10, lossless);
    const unit = topology === "pi" ? 50 : 1 / 200;
    for (const each of all) expect(Math.min(Math.abs(each.atLoad), Math.abs(each.atTarget)) * unit).toBeLessThan(1e-4);
    expect(leastQ(load, 50, topology)).toBeCloseTo(Math.sqrt(3), 12);
  },
);

test("a Q not above the L-section's is refused with the least one", () => {
  const request: MatchRequest = { ...everyday, load: { kind: "constant", reOhm: 200, imOhm: 0 }, networkQ: 1.5 };
  const { candidates, refused } = findMatches({ ...request, methods: ["piNetwork", "tNetwork"] });
  expect(candidates).toEqual([]);
  expect(refused.map(({ why }) => plain(why))).toEqual([
    "A pi between this load and 50.0 Ω needs a Q above 1.73, that of the L-section; asked was 1.50.",
    "A T between this load and 50.0 Ω needs a Q above 1.73, that of the L-section; asked was 1.50.",
  ]);
});

test("E24 values are candidates of their own, marked, each three standard parts", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["piNetwork"] });
  const standard = candidates.filter(({ title }) => title.includes("E24"));
  expect(standard).toHaveLength(4);
  for (const { needs, notes } of standard) {
    expect(needs).toHaveLength(3);
    expect(notes.join(" ")).toContain("Standard E24 values; the exact ones are");
  }
});
