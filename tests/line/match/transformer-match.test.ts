import { describe, expect, test } from "vitest";
import type { Element } from "@/lib/line/element";
import { nominalFigures } from "@/lib/line/cable";
import { alternatingLength } from "@/lib/line/match/alternating";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { binomialTransformer, equalRippleTransformer } from "@/lib/line/match/step-transformer";
import { sweep } from "@/lib/line/run";
import { c50F10, c75F7, circuitOf, everyday, lengthsOf, lossless } from "@/tests/support/match-lines";

const plain = (text: string) => text.replaceAll("\u00a0", " ");
const real: MatchRequest = {
  ...everyday,
  load: { kind: "constant", reOhm: 100, imOhm: 0 },
  feeder: undefined,
  lines: [],
  sections: 3,
};
const ohmsOf = (elements: readonly Element[]) =>
  elements.map((each) =>
    "line" in each ? nominalFigures(each.line.model).z0 / (each.kind === "cable" ? (each.paralleled ?? 1) : 1) : NaN,
  );

describe("binomial and equal-ripple transformers", () => {
  test("between real impedances and without a line that fits are the exact designs of ideal lines, from the target side", () => {
    const { candidates } = findMatches({ ...real, methods: ["binomial", "equalRipple"], rippleReturnLossDb: 26.0206 });
    expect(candidates).toHaveLength(2);
    const design = {
      binomial: binomialTransformer(3, 2, 0.1),
      equalRipple: equalRippleTransformer(3, 2, 10 ** (-26.0206 / 20)),
    };
    for (const { method, elements, needs } of candidates) {
      const wanted = design[method as keyof typeof design].sectionsOverFirst;
      ohmsOf(elements).forEach((ohm, n) => expect(ohm).toBeCloseTo(50 * wanted[n]!, 6));
      for (const length of lengthsOf({ elements } as never)) expect(length).toBeCloseTo(299792458 / 27.2e6 / 4, 9);
      expect(needs.filter((each) => each.includes("ideal line"))).toHaveLength(3);
    }
  });

  test("keep their return loss over exactly the band of their design", () => {
    const asked: MatchRequest = { ...real, methods: ["equalRipple"], returnLossDb: 20, rippleReturnLossDb: 20 };
    const [candidate] = findMatches(asked).candidates;
    const { fractionalBandwidth } = equalRippleTransformer(3, 2, 0.1);
    expect(candidate!.bandwidthHz / asked.designHz / fractionalBandwidth).toBeCloseTo(1, 6);
  });

  test("of an even number of equal-ripple sections state their ripple at the design frequency", () => {
    const asked: MatchRequest = { ...real, sections: 2, methods: ["equalRipple"], rippleReturnLossDb: 20 };
    expect(findMatches(asked).candidates[0]!.designReturnLossDb).toBeCloseTo(20, 6);
  });

  test("take a cable, alone or side by side, where its impedance fits, and name it", () => {
    // 50 to 112.5 Ω in two binomial sections are 61.2 and 91.9 Ω.
    const wanted = binomialTransformer(2, 2.25, 0.1).sectionsOverFirst.map((each) => 50 * each);
    const asked: MatchRequest = {
      ...real,
      load: { kind: "constant", reOhm: 112.5, imOhm: 0 },
      sections: 2,
      methods: ["binomial"],
      lines: [lossless(Math.round(wanted[1]!)), lossless(2 * Math.round(wanted[0]!))],
    };
    const [candidate] = findMatches(asked).candidates.filter(({ elements }) => elements.length === 2);
    expect(candidate!.elements).toMatchObject([{ paralleled: 2 }, { kind: "cable" }]);
    expect(candidate!.needs.map(plain).join()).not.toContain("ideal");
    expect(candidate!.designReturnLossDb ?? Infinity).toBeGreaterThan(40);
  });

  test("for a complex load start where the feeder with its loss shows a resistance, at both such places", () => {
    const asked: MatchRequest = { ...everyday, methods: ["binomial"], sections: 2 };
    const { candidates } = findMatches(asked);
    expect(candidates).toHaveLength(2);
    for (const candidate of candidates) {
      expect(candidate.elements.at(-1)).toMatchObject({ name: "Section to load", line: { cableId: "C50-F10" } });
      const { inputImpedance } = sweep(circuitOf(asked, candidate), [27.2e6]);
      expect(Math.hypot(inputImpedance.re[0]! - 50, inputImpedance.im[0]!)).toBeLessThan(1e-4);
    }
  });

  test("without a number of sections have as few as keep the band", () => {
    const wide: MatchRequest = { ...real, sections: undefined, methods: ["binomial"], returnLossDb: 26 };
    const sectionsFor = (half: number) =>
      findMatches({ ...wide, bandHz: [27.2e6 * (1 - half), 27.2e6 * (1 + half)] }).candidates[0]!.elements.length;
    const enough = (n: number) => binomialTransformer(n, 2, 10 ** (-26 / 20)).fractionalBandwidth / 2;
    expect([0.01, enough(2) + 0.001, enough(3) + 0.001, 0.95].map(sectionsFor)).toEqual([2, 3, 4, 5]);
  });

  test.each<[string, Partial<MatchRequest>, RegExp]>([
    [
      "no line brings a complex load to a resistance",
      { load: everyday.load },
      /no line was named that brings the load to one/,
    ],
    [
      "the step is below the ripple",
      { load: { kind: "constant", reOhm: 55, imOhm: 0 }, methods: ["equalRipple"], rippleReturnLossDb: 20 },
      /The step from 50\.0 Ω to 55\.0 Ω reflects no more than the ripple of 20\.0 dB/,
    ],
  ])("refuse where %s", (_what, change, sentence) => {
    const { refused } = findMatches({ ...real, methods: ["binomial"], ...change });
    expect(plain(refused[0]!.why)).toMatch(sentence);
  });
});

describe("two alternating sections", () => {
  const asked: MatchRequest = {
    ...real,
    load: { kind: "constant", reOhm: 75, imOhm: 0 },
    lines: [lossless(50), lossless(75)],
    feeder: lossless(50),
    methods: ["alternatingSections"],
  };

  test("of 50 and 75 Ω between 75 and 50 Ω are 0.0815 wavelengths each, and match", () => {
    expect(alternatingLength(1.5)).toBeCloseTo(0.0815, 4);
    const { candidates } = findMatches(asked);
    const short = candidates.find((each) => lengthsOf(each)[0]! < 1)!;
    expect(ohmsOf(short.elements).map(Math.round)).toEqual([75, 50]);
    const wavelength = (0.66 * 299792458) / 27.2e6;
    for (const length of lengthsOf(short)) expect(length / wavelength).toBeCloseTo(alternatingLength(1.5), 9);
    expect(short.designReturnLossDb).toBeNull();
    // The other solution: a half wave less the same length, in each.
    const long = candidates.find((each) => lengthsOf(each)[0]! > 1)!;
    for (const length of lengthsOf(long)) expect(length / wavelength).toBeCloseTo(0.5 - alternatingLength(1.5), 9);
  });

  test("tend to a twelfth of a wavelength as the resistances come near each other", () => {
    expect(alternatingLength(1.0001)).toBeCloseTo(1 / 12, 8);
    expect(alternatingLength(4)).toBeCloseTo(alternatingLength(1 / 4), 15);
    expect(() => alternatingLength(0)).toThrow("the ratio must be positive, got 0");
  });

  test("of real cables are solved again with their own impedance and loss", () => {
    const { candidates } = findMatches({ ...asked, feeder: c50F10, lines: [c50F10, c75F7] });
    expect(candidates.length).toBeGreaterThan(0);
    for (const each of candidates) expect(each.designReturnLossDb).toBeNull();
  });

  test("without such a pair of lines are refused with the impedances that would do", () => {
    const { refused } = findMatches({ ...asked, feeder: lossless(50), lines: [lossless(50)] });
    expect(plain(refused[0]!.why)).toMatch(
      /^Two alternating sections need a line of about 50\.0 Ω and one of about 75\.0 Ω or 33\.3 Ω, to 10 %/,
    );
  });
});
