import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import { abs, complex, divide, multiply, reciprocal, subtract, type Complex } from "@/lib/line/complex";
import { elementTwoPort } from "@/lib/line/element-two-port";
import type { Element } from "@/lib/line/element";
import { sweep } from "@/lib/line/run";
import { chainMatrix } from "@/lib/line/two-port";
import { perMetre, propagation } from "@/lib/line/cable";

const s = { re: 0, im: 2 * Math.PI * 3e7 };
const rope = modelFromNominal({
  z0: 75,
  velocityFactor: 0.83,
  lossTangent: 1.5e-4,
  conductors: [{ form: "sqrt", r0OhmPerM: 0.03, skinCornerRadPerS: 2.5e5 }],
});
const line = { model: rope };
const near = (got: Complex, wanted: Complex, digits = 1e-12) =>
  expect(abs(subtract(got, wanted))).toBeLessThanOrEqual(digits * abs(wanted));

function branchOf(element: Element): Complex {
  const { b, c } = chainMatrix(elementTwoPort(element, s));
  return "connection" in element && element.connection === "series" ? b : reciprocal(c);
}

describe("a stub", () => {
  const { gamma, zc } = propagation(rope, s);
  const e = Math.exp(-2 * gamma.re * 1.37);
  const turned: Complex = { re: e * Math.cos(-2 * gamma.im * 1.37), im: e * Math.sin(-2 * gamma.im * 1.37) };
  /** Zc·(1 + Γ)/(1 − Γ) with the end's reflection brought to the near end. */
  const seen = (end: Complex) => {
    const here = multiply(end, turned);
    return multiply(zc, divide(complex(1 + here.re, here.im), complex(1 - here.re, -here.im)));
  };

  test.each(["shunt", "series"] as const)("in %s is the impedance of its open or shorted line", (connection) => {
    near(branchOf({ kind: "stub", connection, end: "open", line, lengthM: 1.37 }), seen(complex(1)));
    near(branchOf({ kind: "stub", connection, end: "short", line, lengthM: 1.37 }), seen(complex(-1)));
  });

  test("ends in any termination, such as the node of a tap", () => {
    const node = reciprocal(complex(1 / 96e3, s.im * 15e-12));
    const wanted = seen(divide(subtract(node, zc), { re: node.re + zc.re, im: node.im + zc.im }));
    near(
      branchOf({
        kind: "stub",
        connection: "shunt",
        end: { kind: "network", topology: "parallel", rOhm: 96e3, cF: 15e-12 },
        line,
        lengthM: 1.37,
      }),
      wanted,
    );
    near(branchOf({ kind: "stub", connection: "shunt", end: { kind: "open" }, line, lengthM: 1.37 }), seen(complex(1)));
  });

  test("of no length is its end, and n in parallel are an nth of the impedance", () => {
    near(
      branchOf({ kind: "stub", connection: "shunt", end: { kind: "constant", reOhm: 30, imOhm: 5 }, line, lengthM: 0 }),
      complex(30, 5),
    );
    const one = branchOf({ kind: "stub", connection: "shunt", end: "open", line, lengthM: 1.37 });
    near(branchOf({ kind: "stub", connection: "shunt", end: "open", line, lengthM: 1.37, paralleled: 3 }), {
      re: one.re / 3,
      im: one.im / 3,
    });
  });
});

describe("a part", () => {
  const w = s.im;
  test.each<[string, Omit<Extract<Element, { kind: "part" }>, "kind" | "connection">, Complex]>([
    ["a resistor", { rOhm: 4.7 }, complex(4.7)],
    ["a coil", { lH: 350e-9 }, complex(0, w * 350e-9)],
    ["a capacitor", { cF: 132e-12 }, complex(0, -1 / (w * 132e-12))],
    ["a coil with Q at every frequency", { lH: 350e-9, q: 120 }, complex((w * 350e-9) / 120, w * 350e-9)],
    [
      "a capacitor with Q at every frequency",
      { cF: 132e-12, q: 1000 },
      complex(1 / (w * 132e-12 * 1000), -1 / (w * 132e-12)),
    ],
    [
      "a coil with Q at one frequency",
      { lH: 350e-9, q: 120, qAtHz: 7e6 },
      complex((2 * Math.PI * 7e6 * 350e-9) / 120, w * 350e-9),
    ],
    [
      "a capacitor with Q at one frequency",
      { cF: 132e-12, q: 1000, qAtHz: 7e6 },
      complex(1 / (2 * Math.PI * 7e6 * 132e-12 * 1000), -1 / (w * 132e-12)),
    ],
  ])("is its impedance in series and its admittance in shunt: %s", (_name, part, wanted) => {
    near(branchOf({ kind: "part", connection: "series", ...part }), wanted);
    near(branchOf({ kind: "part", connection: "shunt", ...part }), wanted);
  });

  test("with Q at every frequency is refused off the imaginary axis, with Q at one frequency it is not", () => {
    const coil = { kind: "part", connection: "series", lH: 1e-6, q: 100 } as const;
    expect(() => elementTwoPort(coil, { re: 1, im: 1e6 })).toThrow(
      "partBranch: a Q that holds at every frequency needs Re s = 0, got 1",
    );
    expect(elementTwoPort({ ...coil, qAtHz: 1e6 }, { re: 5, im: 0 }).b.re).toBeCloseTo(
      5e-6 + (2 * Math.PI * 1e6 * 1e-6) / 100,
      12,
    );
  });

  test.each<[object, string]>([
    [{}, "partBranch: exactly one of rOhm, lH and cF is needed, got 0"],
    [{ rOhm: 1, lH: 1 }, "partBranch: exactly one of rOhm, lH and cF is needed, got 2"],
    [{ rOhm: -1 }, "partBranch: the part's value must be at least 0, got -1"],
    [{ lH: 1, q: 0 }, "partBranch: q must be positive, got 0"],
    [{ lH: 1, q: 9, qAtHz: -2 }, "partBranch: qAtHz must be positive, got -2"],
  ])("that is impossible is refused by name: %j", (part, message) => {
    expect(() => elementTwoPort({ kind: "part", connection: "series", ...part }, s)).toThrow(new RangeError(message));
  });
});

describe("a temperature", () => {
  test("of the element's own is kept, and the run's goes to the others", () => {
    const warm = (element: Element, temperatureC?: number) =>
      elementTwoPort(element, s, temperatureC === undefined ? {} : { temperatureC });
    const cable: Element = { kind: "cable", line, lengthM: 10 };
    expect(warm(cable, 60)).toEqual(warm({ ...cable, temperatureC: 60 }));
    expect(warm({ ...cable, temperatureC: 60 }, -40)).toEqual(warm(cable, 60));
    expect(warm(cable)).toEqual(warm(cable, 20));
    const stub: Element = { kind: "stub", connection: "shunt", end: "open", line, lengthM: 1 };
    expect(warm(stub, 60)).toEqual(warm({ ...stub, temperatureC: 60 }));
    const bundle: Element = { kind: "parallel", branches: [{ line, lengthM: 1 }] };
    expect(warm(bundle, 60)).toEqual(warm({ ...bundle, temperatureC: 60 }));
  });
});

test("a transformer of n : 1 shows n² times its load", () => {
  const { inputImpedance } = sweep(
    {
      source: { kind: "constant", reOhm: 50, imOhm: 0 },
      elements: [{ kind: "transformer", turnsRatio: 2 }],
      load: { kind: "constant", reOhm: 12.5, imOhm: -3 },
    },
    [1e6],
  );
  expect([inputImpedance.re[0], inputImpedance.im[0]]).toEqual([50, -12]);
});

test("different cables in parallel add their admittance matrices", () => {
  const other = modelFromNominal({ z0: 50, velocityFactor: 0.66, conductors: [{ form: "constant", r0OhmPerM: 0.2 }] });
  const branches = [
    { line, lengthM: 3 },
    { line: { model: other }, lengthM: 4.4 },
  ];
  const { a, b, c } = chainMatrix(elementTwoPort({ kind: "parallel", branches }, s));
  const each = branches.map((branch) => chainMatrix(elementTwoPort({ kind: "cable", ...branch }, s)));
  const y11 = each
    .map(({ d, b: own }) => divide(d, own))
    .reduce((sum, next) => ({ re: sum.re + next.re, im: sum.im + next.im }));
  const y21 = each
    .map(({ b: own }) => reciprocal(own))
    .reduce((sum, next) => ({ re: sum.re + next.re, im: sum.im + next.im }));
  near(b, reciprocal(y21), 1e-10);
  near(a, divide(y11, y21), 1e-10);
  near(c, divide(subtract(multiply(y11, y11), multiply(y21, y21)), y21), 1e-10);
});

test("a shunt node is its own admittance, whatever lies around it", () => {
  const { c } = chainMatrix(
    elementTwoPort(
      { kind: "shunt", termination: { kind: "network", topology: "parallel", rOhm: 96e3, cF: 15e-12 } },
      s,
    ),
  );
  near(c, complex(1 / 96e3, s.im * 15e-12));
});

test("a length of line at complex s is what its series impedance and shunt admittance say", () => {
  const at = { re: 2e6, im: 3e7 };
  const { z, y } = perMetre(rope, at);
  const { b, c } = chainMatrix(elementTwoPort({ kind: "cable", line, lengthM: 1e-4 }, at));
  near(b, { re: z.re * 1e-4, im: z.im * 1e-4 }, 1e-6);
  near(c, { re: y.re * 1e-4, im: y.im * 1e-4 }, 1e-6);
});
