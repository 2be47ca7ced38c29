import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import { add, complex, reciprocal, type Complex } from "@/lib/line/complex";
import {
  conductanceAt,
  doubleStub,
  largestConductance,
  nearestPlaces,
  type DoubleStubPlan,
} from "@/lib/line/match/double-stub";
import { impedanceAlong, reflectionAgainst } from "@/lib/line/match/line-angle";
import type { StubEnd } from "@/lib/line/match/single-stub";
import fixture from "@/tests/fixtures/line/matching-double-stub.json";
import published from "@/tests/fixtures/line/published-cascades.json";
import { closeTo } from "@/tests/support/tolerance";

test.each(fixture.cases.map((each) => ({ ...each.inputs, ...each })))(
  "$load_re_ohm, $load_im_ohm Ω on $z0_ohm Ω, $end stubs $stub_spacing_wavelengths λ apart: both solutions, or forbidden",
  ({ inputs, expected }) => {
    const z0 = inputs.z0_ohm;
    const load = complex(inputs.load_re_ohm, inputs.load_im_ohm);
    const [distance, spacing] = [inputs.load_to_first_stub_wavelengths, inputs.stub_spacing_wavelengths];
    closeTo(largestConductance(z0, z0, spacing) * z0, expected.largest_conductance_normalised);
    closeTo(conductanceAt(load, z0, distance) * z0, expected.conductance_at_first_stub_normalised);
    const found = doubleStub({
      load,
      lineOhm: z0,
      targetOhm: z0,
      stubOhm: z0,
      end: inputs.end as StubEnd,
      firstDistance: distance,
      spacing,
    });
    expect(found.length === 0).toBe(expected.forbidden);
    if (!("first_stub_length_wavelengths" in expected)) return;
    closeTo(
      found.map(({ first }) => first),
      expected.first_stub_length_wavelengths!,
      "first",
    );
    closeTo(
      found.map(({ second }) => second),
      expected.second_stub_length_wavelengths!,
      "second",
    );
  },
);

test.each(["D78", "D79"])("published double stub %s has both pairs of lengths", (id) => {
  const check = published.checks.find((each) => each.id.startsWith(id))!;
  const { ZL, Z0_ohm, load_to_first_stub_wavelengths, spacing_wavelengths } = check.inputs as unknown as {
    ZL: Complex;
  } & Record<string, number>;
  const found = doubleStub({
    load: ZL,
    lineOhm: Z0_ohm!,
    targetOhm: Z0_ohm!,
    stubOhm: Z0_ohm!,
    end: check.topic.includes("open") ? "open" : "short",
    firstDistance: load_to_first_stub_wavelengths!,
    spacing: spacing_wavelengths!,
  });
  const wanted = (check.expected as unknown as { l1_l2_wavelengths: [number, number][] }).l1_l2_wavelengths;
  const value = [...wanted].sort((a, b) => a[0] - b[0]);
  closeTo(
    found.map(({ first, second }) => [first, second]),
    { value, rel_tolerance: 0, abs_tolerance: check.tolerance.abs! },
  );
});

const plans: fc.Arbitrary<DoubleStubPlan> = fc.record({
  load: fc.record({
    re: fc.double({ min: 2, max: 800, noNaN: true }),
    im: fc.double({ min: -500, max: 500, noNaN: true }),
  }),
  lineOhm: fc.double({ min: 20, max: 200, noNaN: true }),
  targetOhm: fc.double({ min: 20, max: 200, noNaN: true }),
  stubOhm: fc.double({ min: 20, max: 200, noNaN: true }),
  end: fc.constantFrom<StubEnd>("open", "short"),
  firstDistance: fc.double({ min: 0, max: 0.49, noNaN: true }),
  spacing: fc.oneof(fc.double({ min: 0.02, max: 0.48, noNaN: true }), fc.constant(0.25)),
});

/** Admittance of a lossless stub, siemens. */
function stub({ stubOhm, end }: DoubleStubPlan, length: number): Complex {
  const t = Math.tan(2 * Math.PI * length);
  return complex(0, (end === "open" ? t : -1 / t) / stubOhm);
}

test("every solution shows the target, walked through from the load", () => {
  fc.assert(
    fc.property(plans, (plan) => {
      for (const { first, second } of doubleStub(plan)) {
        const before = reciprocal(impedanceAlong(plan.load, plan.lineOhm, plan.firstDistance));
        const after = reciprocal(add(before, stub(plan, first)));
        const seen = add(reciprocal(impedanceAlong(after, plan.lineOhm, plan.spacing)), stub(plan, second));
        const { re, im } = reflectionAgainst(reciprocal(seen), plan.targetOhm);
        expect(Math.hypot(re, im)).toBeLessThan(1e-7);
      }
    }),
  );
});

test("solutions are missing exactly where the conductance at the first stub is over the largest", () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const share =
        conductanceAt(plan.load, plan.lineOhm, plan.firstDistance) /
        largestConductance(plan.lineOhm, plan.targetOhm, plan.spacing);
      fc.pre(Math.abs(share - 1) > 1e-9);
      expect(doubleStub(plan).length).toBe(share > 1 ? 0 : 2);
    }),
  );
});

test("in the forbidden region the nearest spacing and first distance named stand on its edge, and nothing nearer works", () => {
  fc.assert(
    fc.property(plans, fc.double({ min: 0.01, max: 0.95, noNaN: true }), (plan, share) => {
      fc.pre(doubleStub(plan).length === 0);
      const { spacing, firstDistance } = nearestPlaces(plan);
      const works = (change: Partial<DoubleStubPlan>) => doubleStub({ ...plan, ...change }).length > 0;
      const wrapped = (a: number, b: number) => ((((b - a) % 0.5) + 0.75) % 0.5) - 0.25;
      const between = (from: number, to: number, part: number) => from + part * wrapped(from, to);
      expect(spacing).toBeDefined();
      expect(works({ spacing: between(plan.spacing, spacing!, share) })).toBe(false);
      expect(works({ spacing: between(plan.spacing, spacing!, 1 + 1e-6) })).toBe(true);
      if (firstDistance === undefined) return;
      expect(works({ firstDistance: between(plan.firstDistance, firstDistance, share) })).toBe(false);
      expect(works({ firstDistance: between(plan.firstDistance, firstDistance, 1 + 1e-6) })).toBe(true);
    }),
  );
});

test("stubs a half wave apart, and a load that takes no power, have no solution", () => {
  const plan: DoubleStubPlan = {
    load: complex(30, 10),
    lineOhm: 50,
    targetOhm: 50,
    stubOhm: 50,
    end: "short",
    firstDistance: 0,
    spacing: 0.5,
  };
  expect(doubleStub(plan)).toEqual([]);
  expect(doubleStub({ ...plan, spacing: 0.125, load: complex(0, 40) })).toEqual([]);
});
