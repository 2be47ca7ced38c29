import { expect, test } from "vitest";
import { decayOf } from "@/lib/line/time/decay";
import fc from "@/tests/support/property";

const one = (re: number, im: number, factor: number) => {
  const { re: outRe, im: outIm } = decayOf({ re: Float64Array.of(re), im: Float64Array.of(im) }, factor);
  return [outRe[0]!, outIm[0]!] as const;
};

test("e^{−x} is what exp, sine and cosine make of it, to the last digits, near and far", () => {
  const angle = fc.double({ min: -2, max: 9, noNaN: true }).map((power) => 10 ** power);
  fc.assert(
    fc.property(fc.double({ min: 0, max: 5, noNaN: true }), angle, fc.constantFrom(1, 2, 0.37), (re, im, factor) => {
      const [gotRe, gotIm] = one(re, im, factor);
      const size = Math.exp(-factor * re);
      expect(Math.abs(gotRe - size * Math.cos(factor * im))).toBeLessThanOrEqual(4e-16 * size);
      expect(Math.abs(gotIm + size * Math.sin(factor * im))).toBeLessThanOrEqual(4e-16 * size);
    }),
    { numRuns: 2000 },
  );
});

test("quarter turns land on their axes, and turning back works the same", () => {
  for (let n = -9; n <= 9; n++) {
    const [re, im] = one(0, (n * Math.PI) / 2, 1);
    expect(re).toBeCloseTo(Math.cos((n * Math.PI) / 2), 15);
    expect(im).toBeCloseTo(-Math.sin((n * Math.PI) / 2), 15);
  }
});

test("no way is no decay, and a very long one leaves nothing", () => {
  expect(one(3, 4, 0)).toEqual([1, expect.closeTo(0, 15)]);
  expect(one(1000, 4, 1)).toEqual([expect.closeTo(0, 15), expect.closeTo(0, 15)]);
  expect(one(1e308, 1, 10)[0]).toBeCloseTo(0, 15);
});
