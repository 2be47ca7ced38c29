import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import {
  analytic,
  difference,
  product,
  quotient,
  root,
  slopeOf,
  steady,
  sum,
  times,
  type Analytic,
} from "@/lib/line/analytic";
import { abs, divide, multiply, sqrt, subtract, type Complex } from "@/lib/line/complex";
import { evenHyperbolic } from "@/lib/line/hyperbolic";

const part = fc.double({ min: -10, max: 10, noNaN: true });
const point = fc.record({ re: part, im: part }).filter((s) => abs(s) > 0.1);

/** s itself. */
const variable = (s: Complex): Analytic => ({ re: s.re, im: s.im, slopeRe: 1, slopeIm: 0 });

/** Derivative by a central difference along the real direction. */
function slopeByDifference(f: (s: Complex) => Complex, s: Complex): Complex {
  const h = 1e-5;
  const step = subtract(f({ re: s.re + h, im: s.im }), f({ re: s.re - h, im: s.im }));
  return { re: step.re / (2 * h), im: step.im / (2 * h) };
}

const functions: [string, (s: Analytic) => Analytic][] = [
  ["a sum of products", (s) => sum(product(s, s), times(s, 3))],
  ["a difference", (s) => difference(product(s, product(s, s)), steady(2, 1))],
  ["a quotient", (s) => quotient(sum(s, steady(1, 2)), sum(product(s, s), steady(200)))],
  ["a square root", (s) => root(sum(product(s, s), steady(300)))],
];

test.each(functions)("%s carries the derivative a difference shows", (_name, f) => {
  fc.assert(
    fc.property(point, (s) => {
      const got = slopeOf(f(variable(s)));
      const wanted = slopeByDifference((at) => f(variable(at)), s);
      expect(abs(subtract(got, wanted))).toBeLessThanOrEqual(1e-6 * (1 + abs(wanted)));
    }),
  );
});

test("values are those of plain complex arithmetic", () => {
  fc.assert(
    fc.property(point, point, (a, b) => {
      const [one, other] = [variable(a), variable(b)];
      for (const [got, wanted] of [
        [product(one, other), multiply(a, b)],
        [quotient(one, other), divide(a, b)],
        [root(one), sqrt(a)],
      ] as const)
        expect(abs(subtract(got, wanted))).toBeLessThanOrEqual(1e-14 * abs(wanted));
    }),
  );
});

test("the root of 0 is 0, without NaN in its derivative", () => {
  expect(root(analytic({ re: 0, im: 0 }, { re: 1, im: 0 }))).toEqual(steady(0));
});

const sinh = ({ re, im }: Complex): Complex => ({ re: Math.sinh(re) * Math.cos(im), im: Math.cosh(re) * Math.sin(im) });
const cosh = ({ re, im }: Complex): Complex => ({ re: Math.cosh(re) * Math.cos(im), im: Math.sinh(re) * Math.sin(im) });

test("the even hyperbolic functions are cosh √P and sinh √P / √P, with their derivatives", () => {
  fc.assert(
    fc.property(point, fc.double({ min: -6, max: 2, noNaN: true }), (direction, power) => {
      const p = { re: direction.re * 10 ** power, im: direction.im * 10 ** power };
      const x = sqrt(p);
      const got = evenHyperbolic(variable(p), x.re, x.im);
      const unscaled = (a: Complex) => ({ re: a.re * Math.exp(got.logScale), im: a.im * Math.exp(got.logScale) });
      const size = Math.cosh(x.re);
      const sinhc = divide(sinh(x), x);
      expect(abs(subtract(unscaled(got.cosh), cosh(x)))).toBeLessThanOrEqual(1e-14 * size * (1 + abs(x)));
      expect(abs(subtract(unscaled(got.sinhc), sinhc))).toBeLessThanOrEqual(1e-14 * size * (1 + abs(x)));
      const dCosh = { re: sinhc.re / 2, im: sinhc.im / 2 };
      expect(abs(subtract(unscaled(slopeOf(got.cosh)), dCosh))).toBeLessThanOrEqual(1e-14 * size * (1 + abs(x)));
      // the closed form of this derivative cancels for a small P, where the series stands for it
      const dSinhc =
        abs(p) < 1e-3
          ? { re: 1 / 6 + p.re / 60, im: p.im / 60 }
          : divide(subtract(cosh(x), sinhc), { re: 2 * p.re, im: 2 * p.im });
      const allowed = abs(p) < 1e-3 ? abs(p) ** 2 / 1000 : 1e-12 * size * (1 + abs(x));
      expect(abs(subtract(unscaled(slopeOf(got.sinhc)), dSinhc))).toBeLessThanOrEqual(allowed + 1e-15);
    }),
    { numRuns: 500 },
  );
});

test("at P = 0 they are 1, with derivatives 1/2 and 1/6", () => {
  expect(evenHyperbolic(variable({ re: 0, im: 0 }), 0, 0)).toEqual({
    cosh: analytic({ re: 1, im: 0 }, { re: 1 / 2, im: 0 }),
    sinhc: analytic({ re: 1, im: 0 }, { re: 1 / 6, im: 0 }),
    logScale: 0,
  });
});

test("they stay finite for a line of any loss", () => {
  const { cosh: c, sinhc, logScale } = evenHyperbolic(variable({ re: 1e12, im: 1e9 }), 1e6, 500);
  expect([c.re, c.im, c.slopeRe, sinhc.re, sinhc.im, sinhc.slopeRe].every(Number.isFinite)).toBe(true);
  expect(logScale).toBeCloseTo(1e6, -1);
});
