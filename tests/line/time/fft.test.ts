import { expect, test } from "vitest";
import { inverseFft, realSignal } from "@/lib/line/time/fft";
import fc from "@/tests/support/property";

/** Σ x_k·e^{+j2πkn/N}, term by term. */
function naive(re: ArrayLike<number>, im: ArrayLike<number>): { re: number[]; im: number[] } {
  const size = re.length;
  const out = { re: new Array<number>(size).fill(0), im: new Array<number>(size).fill(0) };
  for (let n = 0; n < size; n++)
    for (let k = 0; k < size; k++) {
      const angle = (2 * Math.PI * ((k * n) % size)) / size;
      out.re[n]! += re[k]! * Math.cos(angle) - im[k]! * Math.sin(angle);
      out.im[n]! += re[k]! * Math.sin(angle) + im[k]! * Math.cos(angle);
    }
  return out;
}

const values = (size: number) =>
  fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: size, maxLength: size });
const pairs = fc.integer({ min: 1, max: 8 }).chain((power) => fc.tuple(values(2 ** power), values(2 ** power)));

test("a transform is the sum it stands for, at every power of two", () => {
  fc.assert(
    fc.property(pairs, ([re, im]) => {
      const expected = naive(re, im);
      const got = { re: Float64Array.from(re), im: Float64Array.from(im) };
      inverseFft(got.re, got.im);
      expected.re.forEach((value, n) => expect(Math.abs(got.re[n]! - value)).toBeLessThan(1e-12 * re.length));
      expected.im.forEach((value, n) => expect(Math.abs(got.im[n]! - value)).toBeLessThan(1e-12 * re.length));
    }),
    { numRuns: 60 },
  );
});

test("a real signal comes from half its spectrum", () => {
  fc.assert(
    fc.property(
      pairs.filter(([re]) => re.length >= 4),
      ([re, im]) => {
        const size = re.length;
        const half = size / 2;
        const mirrored = (k: number, sign: number, from: number[]) => (k <= half ? from[k]! : sign * from[size - k]!);
        const whole = {
          re: re.map((_, k) => mirrored(k, 1, re)),
          im: im.map((_, k) => (k % half === 0 ? 0 : mirrored(k, -1, im))),
        };
        const expected = naive(whole.re, whole.im);
        const got = realSignal(
          Float64Array.from(re.slice(0, half + 1)),
          Float64Array.from(im.slice(0, half + 1)),
          size,
        );
        expected.re.forEach((value, n) => expect(Math.abs(got[n]! - value)).toBeLessThan(1e-12 * size));
      },
    ),
    { numRuns: 60 },
  );
});

test("a spectrum that ends early is one of zeros from there on", () => {
  const full = realSignal(new Float64Array([1, 2, 0, 0, 0]), new Float64Array([0, 3, 0, 0, 0]), 8);
  expect([...realSignal(new Float64Array([1, 2]), new Float64Array([0, 3]), 8)]).toEqual([...full]);
});

test("a single line of a long spectrum is a pure wave", () => {
  const size = 65_536;
  const re = new Float64Array(size / 2 + 1);
  re[1001] = 0.5;
  const got = realSignal(re, new Float64Array(size / 2 + 1), size);
  for (const n of [0, 1, 17, 40_000, 65_535])
    expect(got[n]!).toBeCloseTo(Math.cos((2 * Math.PI * ((1001 * n) % size)) / size), 11);
});

test("refuses what is no power of two, and more than half a spectrum", () => {
  expect(() => inverseFft(new Float64Array(12), new Float64Array(12))).toThrow("inverseFft: the number of values");
  expect(() => inverseFft(new Float64Array(8), new Float64Array(4))).toThrow("im must have 8 values");
  expect(() => realSignal(new Float64Array(6), new Float64Array(6), 8)).toThrow("at most 5 values");
});
