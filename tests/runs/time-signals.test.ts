import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit } from "@/lib/line/element";
import { groundOf, pathDelayS, timeSignals, usualTimes } from "@/lib/runs/time/signals";

const model = modelFromNominal({ z0: 120, velocityFactor: 0.72 });
const bus: Circuit = {
  source: { kind: "constant", reOhm: 40, imOhm: 0 },
  elements: [
    { kind: "cable", line: { model }, lengthM: 20 },
    { kind: "stub", connection: "shunt", end: "open", line: { model }, lengthM: 2 },
    { kind: "cable", line: { model }, lengthM: 30 },
  ],
  load: { kind: "constant", reOhm: 120, imOhm: 0 },
};
const step = { kind: "step", amplitudeV: 3, riseS: 10e-9 } as const;
const windowS = 2e-6;

describe("A run over time", () => {
  test("settles at the divider of source and load at both ends and at the tap", () => {
    const { source, load, taps, readings } = timeSignals(bus, step, windowS, 20);
    const level = (3 * 120) / 160;
    for (const settledV of [source.settledV, load.settledV, readings.settledV, taps[0]?.settledV])
      expect(settledV).toBeCloseTo(level, 9);
    expect(load.volts.at(-1)).toBeCloseTo(level, 2);
  });

  test("shows fronts along the path only, and none of a stub's own", () => {
    const { rays } = timeSignals(bus, step, windowS, 20);
    expect(new Set(rays.map(({ element }) => element))).toEqual(new Set([0, 2]));
  });

  test("is first looked at for two round trips, with an edge short beside the line", () => {
    const { riseS, windowS: usual } = usualTimes(bus);
    const delay = pathDelayS(bus);
    expect(usual).toBeGreaterThanOrEqual(4 * delay * 0.98);
    expect(riseS).toBeLessThan(delay / 10);
    expect(usual / riseS).toBeLessThanOrEqual(2048);
  });

  test("has a ground that is blank until the first front, then below its settled level, and ends near it", () => {
    const ground = groundOf(bus, step, windowS, 20)!;
    const columns = ground.positionsM.length;
    expect(ground.positionsM[0]).toBe(0);
    expect(ground.positionsM.at(-1)).toBeCloseTo(50, 9);
    const level = (3 * 120) / 160;
    const at = (row: number, n: number) => ground.aboveSettledV[row * columns + n]!;
    for (let n = 0; n < columns; n++) {
      const before = Math.floor((pathDelayS(bus) * ground.positionsM[n]! * (ground.rows - 1)) / 50 / windowS);
      for (let row = 0; row < before; row++) expect(at(row, n)).toBe(0);
      const first = Array.from({ length: ground.rows }, (_, row) => at(row, n)).find((volt) => volt !== 0);
      expect(first).toBeLessThan(1e-3 * level);
      expect(first).toBeGreaterThanOrEqual(-level);
      expect(Math.abs(ground.aboveSettledV[(ground.rows - 1) * columns + n]!)).toBeLessThan(0.02 * level);
    }
  });

  test("has no ground where none could be worked out in the time one waits", () => {
    expect(groundOf(bus, { ...step, riseS: 1e-9 }, windowS, 20)).toBeNull();
    expect(groundOf({ ...bus, elements: [] }, step, windowS, 20)).toBeNull();
  });
});
