import { describe, expect, test } from "vitest";
import {
  driveSpectrum,
  edgeAt,
  edgePart,
  emfAt,
  finalEmf,
  requireDrive,
  transitions,
  type Drive,
} from "@/lib/line/time/drive";
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";

const shared = { amplitudeV: 3, riseS: 2 } as const;
const drives: [string, Drive][] = [
  ["a step", { kind: "step", ...shared }],
  ["a step with a raised cosine", { kind: "step", ...shared, edge: "raisedCosine" }],
  ["a pulse", { kind: "pulse", ...shared, widthS: 5 }],
  ["a pulse narrower than its edge", { kind: "pulse", ...shared, edge: "raisedCosine", widthS: 1 }],
  ["bits", { kind: "bits", ...shared, bits: "0110100", bitS: 3 }],
];

/** ∫ emf·e^{−st} from 0 by the trapezium rule up to where the drive is over, and in closed form from there. */
function transform(drive: Drive, c: number, w: number): [number, number] {
  const end = 30;
  const steps = 30_000;
  const step = end / steps;
  let [re, im] = [0, 0];
  for (let n = 0; n <= steps; n++) {
    const t = n * step;
    const weight = (n === 0 || n === steps ? 0.5 : 1) * step * emfAt(drive, t) * Math.exp(-c * t);
    re += weight * Math.cos(w * t);
    im -= weight * Math.sin(w * t);
  }
  // finalEmf·e^{−s·end}/s
  const tail = (finalEmf(drive) * Math.exp(-c * end)) / (c * c + w * w);
  const [cos, sin] = [Math.cos(w * end), -Math.sin(w * end)];
  return [re + tail * (cos * c + sin * w), im + tail * (sin * c - cos * w)];
}

test.each(drives)("the transform of %s is the integral of its e.m.f.", (_, drive) => {
  const omega = Float64Array.from({ length: 100 }, (_, k) => (k * Math.PI) / 63);
  const grid: LaplaceGrid = { count: 100, damping: 0.3, omega, size: 256, stepS: 1, every: 1 };
  const got = driveSpectrum(drive, grid);
  [0, 1, 17, 63, 64, 99].forEach((k) => {
    const [re, im] = transform(drive, grid.damping, omega[k]!);
    expect(got.re[k]!).toBeCloseTo(re, 5);
    expect(got.im[k]!).toBeCloseTo(im, 5);
  });
});

describe("edges", () => {
  test.each(["sineSquared", "raisedCosine"] as const)(
    "%s rises steadily from 0 to 1 and is even about its middle",
    (shape) => {
      expect([edgeAt(shape, -1), edgeAt(shape, 0), edgeAt(shape, 1), edgeAt(shape, 2)]).toEqual([0, 0, 1, 1]);
      expect(edgeAt(shape, 0.5)).toBeCloseTo(0.5, 12);
      for (let part = 0; part < 1; part += 0.01) {
        expect(edgeAt(shape, part + 0.01)).toBeGreaterThan(edgeAt(shape, part));
        expect(edgeAt(shape, part) + edgeAt(shape, 1 - part)).toBeCloseTo(1, 12);
      }
    },
  );

  test("10 to 90 % of a raised cosine are 0.59 of its time", () => {
    const taken = edgePart("raisedCosine", 0.9) - edgePart("raisedCosine", 0.1);
    expect(taken).toBeCloseTo((Math.acos(-0.8) - Math.acos(0.8)) / Math.PI, 10);
    expect(taken).toBeCloseTo(0.59, 2);
  });

  test("a part of an edge and the height it has there belong together", () => {
    for (const shape of ["sineSquared", "raisedCosine"] as const)
      for (const fraction of [0.001, 0.2, 0.5, 0.99])
        expect(edgeAt(shape, edgePart(shape, fraction))).toBeCloseTo(fraction, 12);
  });
});

test("bits have an edge wherever they change, the first from 0, and the last one stays", () => {
  const bits: Drive = { kind: "bits", ...shared, bits: "1101", bitS: 10 };
  expect(transitions(bits)).toEqual([
    { atS: 0, jumpV: 3 },
    { atS: 20, jumpV: -3 },
    { atS: 30, jumpV: 3 },
  ]);
  expect([5, 15, 25, 35, 1000].map((t) => emfAt(bits, t))).toEqual([3, 3, 0, 3, 3]);
  expect(finalEmf(bits)).toBe(3);
  expect(transitions({ ...bits, bits: "000" })).toEqual([]);
});

test.each<[string, Partial<Record<string, unknown>>]>([
  ["riseS", { riseS: 0 }],
  ["riseS", { riseS: NaN }],
  ["amplitudeV", { amplitudeV: Infinity }],
  ["widthS", { kind: "pulse", widthS: 0 }],
  ["bitS", { kind: "bits", bits: "01", bitS: 0 }],
  ["bits", { kind: "bits", bits: "", bitS: 1 }],
  ["bits", { kind: "bits", bits: "0a1", bitS: 1 }],
])("refuses an impossible %s", (name, fields) => {
  const drive = { kind: "step", ...shared, ...fields } as Drive;
  expect(() => requireDrive("timeResponse", drive)).toThrow(`timeResponse: ${name} must be`);
});
