import fc from "@/tests/support/property";
import * as math from "mathjs";
import { expect, test } from "vitest";
import * as own from "@/lib/line/complex";
import type { Complex } from "@/lib/line/complex";

/** Both parts from 1e-3 to 1e3 of either sign, zero included. */
const part = fc.oneof(
  fc.constant(0),
  fc
    .tuple(fc.double({ min: -3, max: 3, noNaN: true }), fc.boolean())
    .map(([power, negative]) => (negative ? -1 : 1) * 10 ** power),
);
const any = fc.record({ re: part, im: part });
const nonzero = any.filter(({ re, im }) => re !== 0 || im !== 0);

const witness = ({ re, im }: Complex) => math.complex(re, im);

function close(
  got: Complex,
  wanted: { re: number; im: number },
  scale = Math.hypot(wanted.re, wanted.im),
  digits = 1e-14,
) {
  expect(Math.hypot(got.re - wanted.re, got.im - wanted.im)).toBeLessThanOrEqual(digits * Math.max(scale, 1e-300));
}

test.each([
  ["add", own.add, math.add],
  ["subtract", own.subtract, math.subtract],
  ["multiply", own.multiply, math.multiply],
] as const)("%s agrees with mathjs", (_name, ours, theirs) => {
  fc.assert(
    fc.property(any, any, (a, b) => {
      const wanted = (theirs as (x: math.Complex, y: math.Complex) => math.Complex)(witness(a), witness(b));
      // sums may cancel: what they are held against is the size of what went in
      close(ours(a, b), wanted, Math.max(own.abs(a) + own.abs(b), own.abs(a) * own.abs(b)));
    }),
  );
});

test("divide and reciprocal agree with mathjs", () => {
  fc.assert(
    fc.property(any, nonzero, (a, b) => {
      close(own.divide(a, b), math.divide(witness(a), witness(b)) as math.Complex, own.abs(a) / own.abs(b));
      close(own.reciprocal(b), math.divide(1, witness(b)) as unknown as math.Complex, 1 / own.abs(b));
    }),
  );
});

test("sqrt agrees with mathjs and is the root with a real part of at least 0", () => {
  fc.assert(
    fc.property(any, (a) => {
      const root = own.sqrt(a);
      close(root, math.sqrt(witness(a)) as math.Complex);
      close(own.multiply(root, root), a);
      expect(root.re).toBeGreaterThanOrEqual(0);
    }),
  );
});

test("exp, log, abs and arg agree with mathjs", () => {
  fc.assert(
    fc.property(nonzero, (a) => {
      const small = own.scale(a, 0.01);
      close(own.exp(small), math.exp(witness(small)));
      const log = math.log(witness(a)) as math.Complex;
      close(own.log(a), log, Math.max(1, Math.hypot(log.re, log.im)));
      expect(own.abs(a) / (math.abs(witness(a)) as unknown as number)).toBeCloseTo(1, 14);
      expect(own.arg(a)).toBeCloseTo(math.arg(witness(a)), 14);
    }),
  );
});

test("tanh agrees with mathjs where that is finite, and tends to ±1 where it is not", () => {
  fc.assert(
    fc.property(
      fc.double({ min: -5, max: 5, noNaN: true }),
      fc.double({ min: -50, max: 50, noNaN: true }),
      (re, im) => {
        const wanted = math.tanh(math.complex(re, im));
        // near a pole or a zero the angle's own rounding tells
        const size = Math.hypot(wanted.re, wanted.im);
        close(own.tanh({ re, im }), wanted, Math.max(1, size, size * size) * Math.max(1, Math.abs(im)), 1e-13);
      },
    ),
  );
  expect(own.tanh({ re: 1e4, im: 3 }).re).toBe(1);
  expect(own.tanh({ re: 1e4, im: 3 }).im).toBeCloseTo(0, 300);
  expect(own.tanh({ re: -1e4, im: 3 }).re).toBe(-1);
});

test("polar, conjugate, negate and scale do what they say", () => {
  const { re, im } = own.polar(2, Math.PI / 6);
  expect(re).toBeCloseTo(Math.sqrt(3), 14);
  expect(im).toBeCloseTo(1, 14);
  expect(own.conjugate({ re: 1, im: 2 })).toEqual({ re: 1, im: -2 });
  expect(own.negate({ re: 1, im: 2 })).toEqual({ re: -1, im: -2 });
  expect(own.scale({ re: 1, im: 2 }, 3)).toEqual({ re: 3, im: 6 });
  expect(own.abs2({ re: 3, im: 4 })).toBe(25);
  expect(own.isFinite({ re: 1, im: Infinity })).toBe(false);
});

test("neither a division nor a magnitude overflows half way", () => {
  expect(own.divide({ re: 1e300, im: 1e300 }, { re: 1e300, im: 1e300 })).toEqual({ re: 1, im: 0 });
  expect(own.abs({ re: 3e300, im: 4e300 })).toBeCloseTo(5e300, -286);
});
