import { describe, expect, test } from "vitest";
import fc from "@/tests/support/property";
import { abs, add, complex, divide, multiply, scale, subtract, type Complex } from "@/lib/line/complex";
import { binomialBySmallReflections, equalRippleBySmallReflections } from "@/lib/line/match/small-reflections";
import { binomialTransformer, equalRippleTransformer, mostSections } from "@/lib/line/match/step-transformer";
import cascades from "@/tests/fixtures/line/published-cascades.json";
import published from "@/tests/fixtures/line/published-matching.json";
import fixture from "@/tests/fixtures/line/matching-transformers.json";
import { closeTo, type Expected } from "@/tests/support/tolerance";

interface Inputs {
  sections: number;
  load_over_line: number;
  max_reflection?: number;
}

function answer(name: string, { sections, load_over_line: ratio, max_reflection: limit = NaN }: Inputs) {
  switch (name) {
    case "binomial exact":
      return binomialTransformer(sections, ratio, limit);
    case "equal-ripple exact":
      return equalRippleTransformer(sections, ratio, limit);
    case "binomial small-reflection":
      return { sectionsOverFirst: binomialBySmallReflections(sections, ratio) };
    default:
      return equalRippleBySmallReflections(sections, ratio, limit);
  }
}

const keys = {
  section_over_line: "sectionsOverFirst",
  fractional_bandwidth: "fractionalBandwidth",
  junction_reflections: "junctionReflections",
} as const;

test.each(fixture.cases.map((each) => ({ ...each.inputs, ...each })))(
  "$name of $sections sections to $load_over_line has the impedances and the band of the check",
  ({ name, inputs, expected }) => {
    const got = answer(name, inputs) as unknown as Record<string, number | number[]>;
    for (const [key, value] of Object.entries(expected))
      closeTo(got[keys[key as keyof typeof keys]]!, value as Expected, key);
  },
);

/** Γ at the first resistance of quarter-wave sections between 1 and a ratio, walked back from the load. */
function reflectionAt(sectionsOverFirst: readonly number[], ratio: number, theta: number): number {
  const seen = sectionsOverFirst.reduceRight<Complex>((load, z) => {
    const turn = complex(0, Math.tan(theta));
    const over = add(load, scale(turn, z));
    return scale(divide(over, add(complex(z), multiply(load, turn))), z);
  }, complex(ratio));
  return abs(divide(subtract(seen, complex(1)), add(seen, complex(1))));
}

const job = {
  sections: fc.integer({ min: 1, max: mostSections }),
  ratio: fc.double({ min: 0.05, max: 20, noNaN: true }).filter((r) => Math.abs(Math.log(r)) > 0.05),
  angle: fc.double({ min: 0.02, max: Math.PI / 2 - 0.01, noNaN: true }),
};

describe("the finished sections, walked through by their impedances,", () => {
  test("reflect as the binomial law says at every electrical length", () => {
    fc.assert(
      fc.property(job.sections, job.ratio, job.angle, (sections, ratio, theta) => {
        const { sectionsOverFirst } = binomialTransformer(sections, ratio, 0.1);
        const squared = ((ratio - 1) ** 2 / (4 * ratio)) * Math.cos(theta) ** (2 * sections);
        expect(reflectionAt(sectionsOverFirst, ratio, theta)).toBeCloseTo(Math.sqrt(squared / (1 + squared)), 8);
      }),
    );
  });

  test("never exceed the equal ripple within the band, and reach it at the band's edge", () => {
    fc.assert(
      fc.property(job.sections, job.ratio, job.angle, (sections, ratio, share) => {
        const step = Math.abs(ratio - 1) / (ratio + 1);
        const limit = 0.3 * step;
        const { sectionsOverFirst, fractionalBandwidth } = equalRippleTransformer(sections, ratio, limit);
        const edge = (Math.PI / 4) * (2 - fractionalBandwidth);
        expect(reflectionAt(sectionsOverFirst, ratio, edge)).toBeCloseTo(limit, 7);
        const inside = edge + (share / (Math.PI / 2)) * (Math.PI / 2 - edge);
        expect(reflectionAt(sectionsOverFirst, ratio, inside)).toBeLessThan(limit * (1 + 1e-6));
      }),
    );
  });

  test("are the same seen from the other side: Zn·Z(N+1−n) = R", () => {
    fc.assert(
      fc.property(job.sections, job.ratio, (sections, ratio) => {
        const { sectionsOverFirst: z } = equalRippleTransformer(
          sections,
          ratio,
          (0.2 * Math.abs(ratio - 1)) / (ratio + 1),
        );
        z.forEach((each, n) => expect((each * z[sections - 1 - n]!) / ratio).toBeCloseTo(1, 7));
      }),
    );
  });
});

test("with a ratio near 1 the exact synthesis tends to the textbook's small reflections", () => {
  const exact = equalRippleTransformer(3, 1.01, 0.001).sectionsOverFirst;
  const small = equalRippleBySmallReflections(3, 1.01, 0.001).sectionsOverFirst;
  exact.forEach((each, n) => expect(each).toBeCloseTo(small[n]!, 7));
});

test("between equal resistances every section is that resistance and the band has no end", () => {
  expect(binomialTransformer(3, 1, 0.1)).toEqual({ sectionsOverFirst: [1, 1, 1], fractionalBandwidth: 2 });
});

const entries = [...cascades.checks, ...published.checks].map((each) => ({
  ...each,
  inputs: each.inputs as unknown as Record<string, number>,
}));
const ofTopic = (topic: string) => entries.filter((each) => each.topic.includes(topic));

test.each(ofTopic("binomial coefficient table"))(
  "published $id: the binomial table's impedances",
  ({ inputs, expected, tolerance }) => {
    const { sectionsOverFirst } = binomialTransformer(inputs.N!, inputs.ZL_over_Z0!, 0.1);
    const value = (expected as unknown as { Zn_over_Z0: number[] }).Zn_over_Z0;
    closeTo(sectionsOverFirst, { value, rel_tolerance: 0, abs_tolerance: tolerance.abs! });
  },
);

test.each(ofTopic("Chebyshev coefficient table"))(
  "published $id: the equal-ripple table's impedances and band",
  ({ inputs, expected, tolerance }) => {
    const { sectionsOverFirst, fractionalBandwidth } = equalRippleTransformer(
      inputs.N!,
      inputs.ZL_over_Z0!,
      inputs.gamma_max!,
    );
    const { Zn_over_Z0: value, FBW } = expected as unknown as { Zn_over_Z0: number[]; FBW: number };
    closeTo(sectionsOverFirst, { value, rel_tolerance: 0, abs_tolerance: tolerance.abs! });
    closeTo(fractionalBandwidth, { value: FBW, rel_tolerance: 0, abs_tolerance: tolerance.abs! });
  },
);

const entry = (start: string) => entries.find((each) => each.id.startsWith(start))!;

test("published D85 and D86: the three-section examples, which print small-reflection values, within their 2 and 2.5 %", () => {
  for (const [id, of] of [
    ["D85", binomialTransformer],
    ["D86", equalRippleTransformer],
  ] as const) {
    const { inputs, expected, tolerance } = entry(id);
    const { Z0_ohm = NaN, ZL_ohm = NaN, N = NaN, gamma_max = NaN } = inputs;
    const { Z_ohm: value, FBW } = expected as unknown as { Z_ohm: number[]; FBW: number };
    const got = of(N, ZL_ohm / Z0_ohm, gamma_max);
    const within = { rel_tolerance: tolerance.rel!, abs_tolerance: 0 };
    closeTo(
      got.sectionsOverFirst.map((each) => each * Z0_ohm),
      { value, ...within },
    );
    closeTo(got.fractionalBandwidth, { value: FBW, ...within });
  }
});

test("published D87: the ripple of two equal-ripple sections of a given band", () => {
  const { Z_ohm: value, gamma_max } = entry("D87").expected as unknown as { Z_ohm: number[]; gamma_max: number };
  const got = equalRippleTransformer(2, 5, gamma_max);
  const within = { rel_tolerance: 0.003, abs_tolerance: 0 };
  closeTo(
    got.sectionsOverFirst.map((each) => each * 100),
    { value, ...within },
  );
  closeTo(got.fractionalBandwidth, { value: 0.6, ...within });
});

test("published D91 adds small reflections, (R − 1)/(R + 1)·cos^N θ; the exact design reflects 6 % more at that band's edge", () => {
  const { gamma_max, vswr } = entry("D91").expected as unknown as { gamma_max: number; vswr: number };
  const edge = (Math.PI / 4) * (2 - 0.375);
  const within = { rel_tolerance: 0.003, abs_tolerance: 0 };
  closeTo(Math.cos(edge) ** 2 / 3, { value: gamma_max, ...within });
  closeTo((1 + gamma_max) / (1 - gamma_max), { value: vswr, ...within });
  const exact = reflectionAt(binomialTransformer(2, 2, 0.1).sectionsOverFirst, 2, edge);
  expect(exact / gamma_max).toBeCloseTo(1.06, 2);
});

test("published D88: three lines of no length reflect 0.3846 where small reflections add to 0.4", () => {
  const { expected } = entry("D88");
  const { exact_gamma, small_reflection_gamma } = expected as unknown as Record<string, number>;
  expect(reflectionAt([1.5], 2.25, 0)).toBeCloseTo(exact_gamma!, 6);
  expect((1.5 - 1) / (1.5 + 1) + (2.25 - 1.5) / (2.25 + 1.5)).toBeCloseTo(small_reflection_gamma!, 6);
});

test.each([
  ["sections", () => binomialTransformer(0, 2, 0.1)],
  ["sections", () => equalRippleTransformer(1.5, 2, 0.1)],
  ["sections", () => binomialTransformer(mostSections + 1, 2, 0.1)],
  ["ratio", () => binomialTransformer(2, 0, 0.1)],
  ["ratio", () => equalRippleTransformer(2, NaN, 0.1)],
  ["reflection", () => binomialTransformer(2, 2, 1)],
  ["no more than the ripple", () => equalRippleTransformer(2, 1.2, 0.1)],
  ["the ripple must be", () => equalRippleBySmallReflections(2, 1.2, 0.1)],
])("an impossible %s is refused", (what, make) => {
  expect(make).toThrow(RangeError);
  expect(make).toThrow(what);
});
