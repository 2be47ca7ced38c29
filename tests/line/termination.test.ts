import fc from "@/tests/support/property";
import { describe, expect, test } from "vitest";
import { abs, complex, reciprocal, subtract, type Complex } from "@/lib/line/complex";
import type { Termination } from "@/lib/line/element";
import { impedanceOfReflection } from "@/lib/line/reflection";
import { terminationAdmittance, terminationImpedance, terminationPort } from "@/lib/line/termination";

const s = { re: 0, im: 2 * Math.PI * 1e6 };
const near = (got: Complex, wanted: Complex) =>
  expect(abs(subtract(got, wanted))).toBeLessThanOrEqual(1e-13 * abs(wanted));

test("a constant termination is its impedance at every s", () => {
  near(terminationImpedance({ kind: "constant", reOhm: 22, imOhm: -35 }, s), complex(22, -35));
  near(
    terminationAdmittance({ kind: "constant", reOhm: 22, imOhm: -35 }, { re: 1e6, im: 5 }),
    reciprocal(complex(22, -35)),
  );
});

const [r, l, c] = [75, 2e-6, 330e-12];
const w = s.im;

test.each<[string, Omit<Extract<Termination, { kind: "network" }>, "kind" | "topology">, Complex]>([
  ["R", { rOhm: r }, complex(r)],
  ["L", { lH: l }, complex(0, w * l)],
  ["C", { cF: c }, complex(0, -1 / (w * c))],
  ["R and L", { rOhm: r, lH: l }, complex(r, w * l)],
  ["R and C", { rOhm: r, cF: c }, complex(r, -1 / (w * c))],
  ["L and C", { lH: l, cF: c }, complex(0, w * l - 1 / (w * c))],
  ["R, L and C", { rOhm: r, lH: l, cF: c }, complex(r, w * l - 1 / (w * c))],
])("a series network of %s is the sum of its impedances", (_name, parts, wanted) => {
  near(terminationImpedance({ kind: "network", topology: "series", ...parts }, s), wanted);
});

test.each<[string, Omit<Extract<Termination, { kind: "network" }>, "kind" | "topology">, Complex]>([
  ["R", { rOhm: r }, complex(1 / r)],
  ["L", { lH: l }, complex(0, -1 / (w * l))],
  ["C", { cF: c }, complex(0, w * c)],
  ["R and L", { rOhm: r, lH: l }, complex(1 / r, -1 / (w * l))],
  ["R and C", { rOhm: r, cF: c }, complex(1 / r, w * c)],
  ["L and C", { lH: l, cF: c }, complex(0, w * c - 1 / (w * l))],
  ["R, L and C", { rOhm: r, lH: l, cF: c }, complex(1 / r, w * c - 1 / (w * l))],
])("a parallel network of %s is the sum of its admittances", (_name, parts, wanted) => {
  near(terminationAdmittance({ kind: "network", topology: "parallel", ...parts }, s), wanted);
});

describe("at dc and at the edges nothing becomes NaN", () => {
  const dc = { re: 0, im: 0 };
  test.each<[string, Termination, number]>([
    ["a capacitor in series is open", { kind: "network", topology: "series", rOhm: 50, cF: 1e-9 }, Infinity],
    ["a coil in series is its resistance", { kind: "network", topology: "series", rOhm: 50, lH: 1e-6 }, 50],
    ["a coil in parallel is a short", { kind: "network", topology: "parallel", rOhm: 50, lH: 1e-6 }, 0],
    ["a capacitor in parallel is the resistance", { kind: "network", topology: "parallel", rOhm: 50, cF: 1e-9 }, 50],
    ["an open", { kind: "open" }, Infinity],
    ["a short", { kind: "short" }, 0],
    ["0 Ω in parallel with 0 H is a short", { kind: "network", topology: "parallel", rOhm: 0, lH: 0 }, 0],
    ["a series capacitor of 0 F is open", { kind: "network", topology: "series", rOhm: 50, cF: 0 }, Infinity],
  ])("%s", (_name, termination, ohm) => {
    expect(terminationImpedance(termination, dc).re).toBe(ohm);
  });

  test("the admittance of a short is infinite and of an open 0", () => {
    expect(terminationAdmittance({ kind: "short" }, s).re).toBe(Infinity);
    expect(terminationAdmittance({ kind: "open" }, s)).toEqual({ re: 0, im: 0 });
  });
});

describe("a sampled termination", () => {
  const sampled: Termination = {
    kind: "sampled",
    referenceOhm: 75,
    frequenciesHz: [1e6, 2e6, 4e6],
    reflection: { re: [0.1, 0.3, -0.1], im: [0, 0.2, 0.4] },
  };
  const at = (frequency: number) => terminationImpedance(sampled, { re: 0, im: 2 * Math.PI * frequency });

  test("is its samples at the samples, both ends included", () => {
    [1e6, 2e6, 4e6].forEach((frequency, k) => {
      near(at(frequency), impedanceOfReflection(complex(sampled.reflection.re[k]!, sampled.reflection.im[k]!), 75));
    });
  });

  test("is linear in reflection between them", () => {
    near(at(1.5e6), impedanceOfReflection(complex(0.2, 0.1), 75));
    near(at(3e6), impedanceOfReflection(complex(0.1, 0.3), 75));
  });

  test("finds its interval among any number of samples", () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 40 }), fc.double({ min: 0, max: 1, noNaN: true }), (count, part) => {
        const frequenciesHz = Array.from({ length: count }, (_, k) => 1e6 * (k + 1) ** 1.5);
        // reflection that is linear in frequency comes back exactly whatever the interval
        const reflection = { re: frequenciesHz.map((f) => f * 1e-9), im: frequenciesHz.map((f) => -f * 2e-9) };
        const frequency = frequenciesHz[0]! + part * (frequenciesHz[count - 1]! - frequenciesHz[0]!);
        const got = terminationImpedance(
          { kind: "sampled", referenceOhm: 50, frequenciesHz, reflection },
          { re: 0, im: 2 * Math.PI * frequency },
        );
        expect(
          abs(subtract(got, impedanceOfReflection(complex(frequency * 1e-9, -frequency * 2e-9), 50))),
        ).toBeLessThan(1e-10);
      }),
    );
  });

  test("carries the derivative of the line through its samples", () => {
    const { v, i } = terminationPort(sampled, { re: 0, im: 2 * Math.PI * 3e6 });
    // Γ' = ΔΓ / (j·2π·Δf); v = 1 + Γ and i = (1 − Γ)/75
    const slope = { re: 0.2 / (2 * Math.PI * 2e6), im: 0.4 / (2 * Math.PI * 2e6) };
    expect(v.slopeRe).toBeCloseTo(slope.re, 18);
    expect(v.slopeIm).toBeCloseTo(slope.im, 18);
    expect(i.slopeRe).toBeCloseTo(-slope.re / 75, 18);
  });

  test("is never extrapolated, nor known off the imaginary axis", () => {
    expect(() => at(0.99e6)).toThrow(
      /terminationPort: frequency 990000.* Hz is outside the samples, 1000000 to 4000000 Hz/,
    );
    expect(() => at(4.01e6)).toThrow(RangeError);
    expect(() => terminationPort(sampled, { re: 1, im: w })).toThrow(/imaginary axis/);
  });

  test("of one sample is known at that frequency alone", () => {
    const one: Termination = {
      kind: "sampled",
      referenceOhm: 50,
      frequenciesHz: [1e6],
      reflection: { re: [0.5], im: [0] },
    };
    near(terminationImpedance(one, s), complex(150));
    expect(() => terminationImpedance(one, { re: 0, im: 1.01 * w })).toThrow(RangeError);
  });
});
