import { expect, test } from "vitest";
import { doubleStub } from "@/lib/line/match/double-stub";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { sweep } from "@/lib/line/run";
import { c50F10, c75F7, circuitOf, everyday, lengthsOf, lossless } from "@/tests/support/match-lines";

const plain = (text: string) => text.replaceAll("\u00a0", " ");
const request: MatchRequest = { ...everyday, methods: ["doubleStub"] };

test("on lossless lines the lengths are those of the closed form, both solutions of both ends, at the places asked", () => {
  const line = lossless(50);
  const asked = { ...request, feeder: line, lines: [line], spacingWavelengths: 0.15, firstDistanceWavelengths: 0.04 };
  const { candidates } = findMatches(asked);
  const wavelength = (0.66 * 299792458) / 27.2e6;
  expect(candidates).toHaveLength(4);
  for (const end of ["open", "short"] as const) {
    const plan = { load: { re: 22, im: -35 }, lineOhm: 50, targetOhm: 50, stubOhm: 50, end };
    for (const { first, second } of doubleStub({ ...plan, spacing: 0.15, firstDistance: 0.04 })) {
      const wanted = [second, 0.15, first, 0.04].map((each) => each * wavelength);
      const found = candidates.find((each) =>
        lengthsOf(each).every((length, k) => Math.abs(length - wanted[k]!) < 1e-8),
      );
      expect(found?.elements.map(({ name }) => name)).toEqual([
        "Second stub",
        "Stub to stub",
        "First stub",
        "Stub to load",
      ]);
    }
  }
});

test("with the loss of its cables each still shows the target, an eighth of a wavelength apart unless asked otherwise", () => {
  const { candidates } = findMatches({ ...request, lines: [c50F10, c75F7] });
  expect(candidates).toHaveLength(8);
  for (const candidate of candidates) {
    const { inputImpedance } = sweep(circuitOf(request, candidate), [27.2e6]);
    expect(Math.hypot(inputImpedance.re[0]! - 50, inputImpedance.im[0]!)).toBeLessThan(1e-6);
    expect(candidate.elements).toHaveLength(3);
    expect(lengthsOf(candidate)[1]).toBeCloseTo(9.336 / 8, 3);
  }
});

test("in the forbidden region it says so, with the nearest spacing and first distance, and each of them then works", () => {
  const load = { kind: "constant", reOhm: 10, imOhm: 0 } as const;
  const line = lossless(50);
  const forbidden = { ...request, load, feeder: line, lines: [line] };
  const { candidates, refused } = findMatches(forbidden);
  expect(candidates).toEqual([]);
  // By hand: G = 5 against 1/sin²(45°) = 2; asin(√(1/5))/2π = 0.0738 λ.
  expect(plain(refused[0]!.why)).toBe(
    "Forbidden region: this load shows 5.000 of the conductance of 50 ohm at the first stub, over the 2.000 that stubs 0.125 λ apart can match. The nearest that works: 0.074 λ between the stubs or the first stub 0.040 λ from the load.",
  );
  expect(findMatches({ ...forbidden, spacingWavelengths: 0.0737 }).candidates).toHaveLength(4);
  expect(findMatches({ ...forbidden, firstDistanceWavelengths: 0.041 }).candidates).toHaveLength(4);
  expect(findMatches({ ...forbidden, spacingWavelengths: 0.075 }).candidates).toEqual([]);
});
