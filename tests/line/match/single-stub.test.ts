import { expect, test } from "vitest";
import fc from "fast-check";
import { abs, add, complex, reciprocal, type Complex } from "@/lib/line/complex";
import { impedanceAlong, reflectionAgainst } from "@/lib/line/match/line-angle";
import { singleStub, stubLength, type StubEnd, type StubPlan } from "@/lib/line/match/single-stub";
import fixture from "@/tests/fixtures/line/matching-single-stub.json";
import published from "@/tests/fixtures/line/published-matching.json";
import { closeTo } from "@/tests/support/tolerance";

const plan = (
  load: Complex,
  lineOhm: number,
  stubOhm: number,
  end: StubEnd,
  more: Partial<StubPlan> = {},
): StubPlan => ({
  load,
  lineOhm,
  stubOhm,
  targetOhm: lineOhm,
  connection: "shunt",
  end,
  ...more,
});

test.each(
  fixture.cases.map((each) => ({ ...each.inputs, name: each.name, inputs: each.inputs, expected: each.expected })),
)(
  "$name: $load_re_ohm, $load_im_ohm Ω on $line_z0_ohm Ω, stub of $stub_z0_ohm Ω, has both solutions of the closed form",
  ({ inputs, expected }) => {
    const found = singleStub({
      load: complex(inputs.load_re_ohm, inputs.load_im_ohm),
      lineOhm: inputs.line_z0_ohm,
      stubOhm: inputs.stub_z0_ohm,
      targetOhm: inputs.line_z0_ohm,
      connection: inputs.connection as "shunt" | "series",
      end: inputs.end as StubEnd,
    });
    const distances = found.map((each) => each.distance);
    const lengths = found.map((each) => each.length);
    closeTo(distances, expected.distance_from_load_wavelengths, "distance");
    closeTo(lengths, expected.stub_length_wavelengths, "length");
  },
);

interface PublishedStub {
  Z0_ohm: number;
  ZL: Complex;
  stub_Z0_ohm: number;
}
const stubs = published.checks.filter((each) => each.topic.startsWith("single stub"));
const inputsOf = (check: (typeof published.checks)[number]) => check.inputs as unknown as PublishedStub;

test.each(stubs.filter((each) => "d_l_wavelengths" in each.expected).map((each) => [each.id, each] as const))(
  "published single stub %s is among the solutions",
  (_id, check) => {
    const { Z0_ohm, ZL, stub_Z0_ohm } = inputsOf(check);
    const isSeries = check.topic.includes("series");
    const found = singleStub(
      plan(ZL, Z0_ohm, stub_Z0_ohm, check.topic.includes("open") ? "open" : "short", {
        connection: isSeries ? "series" : "shunt",
      }),
    );
    const wanted = (check.expected as { d_l_wavelengths: number[][] }).d_l_wavelengths;
    expect(found).toHaveLength(2);
    for (const [distance = NaN, length = NaN] of wanted) {
      const nearest = found.find((each) => Math.abs(each.distance - distance) < 0.02);
      const tolerance = { rel_tolerance: 0, abs_tolerance: check.tolerance.abs ?? 0 };
      closeTo(
        [nearest?.distance ?? NaN, nearest?.length ?? NaN],
        { value: [distance, length], ...tolerance },
        check.id,
      );
    }
  },
);

test("published D69: the stub match of 100 + j80 Ω on 75 Ω, whose print is wrong, has the recomputed lengths", () => {
  const check = stubs.find((each) => each.id.startsWith("D69"))!;
  const { Z0_ohm, ZL, stub_Z0_ohm } = inputsOf(check);
  const expected = check.expected as unknown as Record<string, number[]>;
  const tolerance = { rel_tolerance: 0, abs_tolerance: check.tolerance.abs! };
  for (const end of ["short", "open"] as const) {
    const found = singleStub(plan(ZL, Z0_ohm, stub_Z0_ohm, end));
    closeTo(
      found.map((each) => each.distance),
      { value: expected.d_wavelengths!, ...tolerance },
    );
    closeTo(
      found.map((each) => each.length),
      { value: expected[`l_${end}_wavelengths`]!, ...tolerance },
    );
  }
});

test("published D71: the shorted stub that takes away a susceptance has the printed length", () => {
  const check = published.checks.find((each) => each.id.startsWith("D71"))!;
  const { YL_S, Y0_S, f_Hz } = check.inputs as unknown as { YL_S: Complex; Y0_S: number; f_Hz: number };
  const expected = check.expected as unknown as { l_wavelengths: number; l_cm: number };
  const length = stubLength(-YL_S.im, Y0_S, false);
  const tolerance = { rel_tolerance: check.tolerance.rel!, abs_tolerance: 0 };
  closeTo(length, { value: expected.l_wavelengths, ...tolerance });
  closeTo((length * 3e8 * 100) / f_Hz, { value: expected.l_cm, ...tolerance });
});

const tenths = (min: number, max: number) => fc.integer({ min: 10 * min, max: 10 * max }).map((each) => each / 10);
const resistance = tenths(1, 5000);
const reactance = tenths(-5000, 5000);
const ohms = tenths(10, 600);

/** The input impedance of the finished match, by the textbook's tangents rather than the solver's angles. */
function forward(p: StubPlan, distance: number, length: number): Complex {
  const tangent = Math.tan(2 * Math.PI * length);
  const seen = impedanceAlong(p.load, p.lineOhm, distance);
  const reactanceOfStub = p.end === "short" ? p.stubOhm * tangent : -p.stubOhm / tangent;
  if (p.connection === "series") return add(seen, complex(0, reactanceOfStub));
  return reciprocal(add(reciprocal(seen), complex(0, -1 / reactanceOfStub)));
}

test("every single-stub solution, for any load and any line, shows the target when computed forward", () => {
  const connections = fc.constantFrom("shunt", "series") as fc.Arbitrary<"shunt" | "series">;
  const ends = fc.constantFrom("open", "short") as fc.Arbitrary<StubEnd>;
  fc.assert(
    fc.property(
      resistance,
      reactance,
      ohms,
      ohms,
      ohms,
      connections,
      ends,
      (re, im, lineOhm, stubOhm, targetOhm, connection, end) => {
        const p: StubPlan = { load: complex(re, im), lineOhm, stubOhm, targetOhm, connection, end };
        for (const { distance, length } of singleStub(p)) {
          expect(distance).toBeGreaterThanOrEqual(0);
          expect(distance).toBeLessThan(0.5);
          expect(length).toBeGreaterThanOrEqual(0);
          expect(length).toBeLessThan(0.5);
          expect(abs(reflectionAgainst(forward(p, distance, length), targetOhm))).toBeLessThan(1e-6);
        }
      },
    ),
  );
});

test("a line of the target's own impedance always has two stub solutions for a load that takes power", () => {
  fc.assert(
    fc.property(resistance, reactance, ohms, (re, im, z0) => {
      fc.pre(abs(reflectionAgainst(complex(re, im), z0)) > 1e-3);
      expect(singleStub(plan(complex(re, im), z0, z0, "short"))).toHaveLength(2);
    }),
  );
});

test("an open and a shorted stub for the same place differ by a quarter wave", () => {
  const open = singleStub(plan(complex(22, -35), 50, 50, "open"));
  const short = singleStub(plan(complex(22, -35), 50, 50, "short"));
  open.forEach((each, index) => {
    expect(each.distance).toBeCloseTo(short[index]!.distance, 12);
    expect(Math.abs(each.length - short[index]!.length)).toBeCloseTo(0.25, 12);
  });
});

test("a pure reactance and a load equal to the line have no stub solution", () => {
  expect(singleStub(plan(complex(0, 40), 50, 50, "open"))).toEqual([]);
  expect(singleStub(plan(complex(50, 0), 50, 50, "open"))).toEqual([]);
});

test("a line that never shows the target's conductance has no shunt-stub solution", () => {
  // 75 Ω on a 75 Ω line stays 75 Ω; a slight mismatch swings it too little to show 20 mS.
  expect(singleStub(plan(complex(80, 0), 75, 75, "open", { targetOhm: 50 }))).toEqual([]);
});
