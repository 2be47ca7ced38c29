import { expect, test } from "vitest";
import { exactly, propagated, share, within } from "@/lib/cables/ways/estimate";
import fc from "@/tests/support/property";

test("independent parts of a product add as squares of their shares", () => {
  const product = propagated((a, b) => a! * b!, [within(50, 0.03), within(2, 0.04)]);
  expect(product.value).toBe(100);
  expect(share(product)).toBeCloseTo(0.05, 12);
});

test("a power multiplies the share; what is exact adds nothing", () => {
  fc.assert(
    fc.property(fc.double({ min: 1, max: 1e3, noNaN: true }), (value) => {
      expect(share(propagated((x, y) => Math.sqrt(x! * y!), [within(value, 0.01), exactly(4)]))).toBeCloseTo(0.005, 5);
    }),
  );
});

test("where a moved value has no answer the other side counts alone", () => {
  const near = propagated((x) => (x! < 0.999 ? NaN : 3 * x!), [within(1, 0.01)]);
  expect(near.spread).toBeCloseTo(0.03, 12);
  expect(propagated(() => NaN, [within(1, 0.01)]).value).toBeNaN();
});
