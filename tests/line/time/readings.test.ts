import { describe, expect, test } from "vitest";
import type { Drive } from "@/lib/line/time/drive";
import { readings } from "@/lib/line/time/readings";
import { crossing, valueAt } from "@/lib/line/time/signal";
import type { Signal } from "@/lib/line/time/time-response";

const signal = (of: (t: number) => number, stepS = 0.01, endS = 20): Signal => ({
  stepS,
  values: Float64Array.from({ length: Math.round(endS / stepS) + 1 }, (_, n) => of(n * stepS)),
});
const step: Drive = { kind: "step", amplitudeV: 2, riseS: 1, edge: "raisedCosine" };

/** 2 V towards which a first-order rise of time constant 1 s starts at 3 s. */
const rise = signal((t) => (t < 3 ? 0 : 2 * (1 - Math.exp(3 - t))));

describe("a first-order rise", () => {
  const got = readings(rise, step, 1);
  test("is half there after ln 2, counted from half the edge", () => {
    expect(got.reachedS).toBeCloseTo(3 + Math.LN2, 6);
    expect(got.delayS).toBeCloseTo(3 + Math.LN2 - 0.5, 6);
  });
  test("takes ln 9 from 10 to 90 %", () => expect(got.riseS).toBeCloseTo(Math.log(9), 4));
  test("settles within 5 % after ln 20, within 1 % after ln 100", () => {
    expect(got.settlingS).toBeCloseTo(3 + Math.log(20), 4);
    expect(readings(rise, step, 1, { band: 0.01 }).settlingS).toBeCloseTo(3 + Math.log(100), 4);
  });
  test("never overshoots", () => expect(Math.abs(got.overshoot)).toBeLessThan(1e-6));
  test("reaches any fraction and any voltage in its own time", () => {
    expect(readings(rise, step, 1, { fraction: 0.8 }).reachedS).toBeCloseTo(3 + Math.log(5), 5);
    expect(readings(rise, step, 1, { thresholdV: 0.5 }).reachedS).toBeCloseTo(3 - Math.log(0.75), 5);
    expect(readings(rise, step, 1, { thresholdV: 2.5 }).delayS).toBeNaN();
  });
});

test("a negative level is read the same way, upside down", () => {
  const down = signal((t) => -valueAt(rise, t));
  const [plain, mirrored] = [readings(rise, step, 1), readings(down, step, -1)];
  expect(mirrored).toEqual({ ...plain, settledV: -2 });
});

test("overshoot is the peak over the settled level", () => {
  const ringing = signal((t) => 2 * (1 - Math.exp(-t / 2) * Math.cos(Math.PI * t)), 0.01, 40);
  expect(readings(ringing, step, 1).overshoot).toBeCloseTo(Math.exp(-0.5), 1);
});

test("a pulse is read at its first edge and settles at nothing", () => {
  const pulse: Drive = { kind: "pulse", amplitudeV: 2, riseS: 1, widthS: 8 };
  const got = readings(
    signal((t) => valueAt(rise, t) - (t < 8 ? 0 : valueAt(rise, t - 8))),
    pulse,
    1,
  );
  expect(got.settledV).toBe(0);
  expect(got.reachedS).toBeCloseTo(3 + Math.LN2, 6);
  expect(got.settlingS).toBeCloseTo(11 + Math.log(20), 2);
});

describe("what does not happen", () => {
  test("within the window is NaN", () => {
    const got = readings(
      signal((t) => valueAt(rise, t), 0.01, 3.2),
      step,
      1,
    );
    expect([got.delayS, got.riseS, got.settlingS]).toEqual([NaN, NaN, NaN]);
  });
  test("at a level of nothing is NaN", () => {
    const got = readings(
      signal(() => 0),
      step,
      0,
    );
    expect([got.delayS, got.riseS, got.overshoot, got.settlingS]).toEqual([NaN, NaN, NaN, NaN]);
  });
  test("for a drive that never changes is NaN", () => {
    expect(
      readings(
        signal(() => 0),
        { kind: "bits", amplitudeV: 1, riseS: 1, bits: "00", bitS: 1 },
        1,
      ).delayS,
    ).toBeNaN();
  });
  test("before the drive is over there is no settling", () => {
    const bits: Drive = { kind: "bits", amplitudeV: 2, riseS: 1, bits: "1011", bitS: 15 };
    expect(readings(rise, bits, 1).settlingS).toBeNaN();
  });
});

test("between its values a signal is read by a cubic, exact for one", () => {
  const cubic = signal((t) => 1 + t - 2 * t * t + 0.3 * t ** 3, 0.5, 10);
  for (const t of [0.7, 3.21, 8.9]) expect(valueAt(cubic, t)).toBeCloseTo(1 + t - 2 * t * t + 0.3 * t ** 3, 9);
  expect(valueAt(cubic, -1)).toBe(1);
  expect(valueAt(cubic, 99)).toBe(valueAt(cubic, 10));
  expect(
    crossing(
      signal((t) => t * t, 0.5, 10),
      50,
      true,
    ),
  ).toBeCloseTo(Math.sqrt(50), 9);
  expect(
    crossing(
      signal((t) => -t, 0.5, 10),
      -3.3,
      false,
      1,
    ),
  ).toBeCloseTo(3.3, 9);
});

test("refuses a fraction or a band that is none", () => {
  expect(() => readings(rise, step, 1, { fraction: 1 })).toThrow("readings: fraction");
  expect(() => readings(rise, step, 1, { band: 0 })).toThrow("readings: band");
});
