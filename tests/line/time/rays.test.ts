import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Element } from "@/lib/line/element";
import { latticeRays } from "@/lib/line/time/rays";

const model = modelFromNominal({ z0: 50, velocityFactor: 0.5 });
const cable = (lengthM: number): Element => ({ kind: "cable", line: { model }, lengthM });
const delay = (lengthM: number) => lengthM / (0.5 * 299_792_458);
const run = (sourceOhm: number, elements: Element[], loadOhm: number): Circuit => ({
  source: { kind: "constant", reOhm: sourceOhm, imOhm: 0 },
  elements,
  load: { kind: "constant", reOhm: loadOhm, imOhm: 0 },
});
const step = { kind: "step", amplitudeV: 1, riseS: 1e-9 } as const;

describe("Rays of the lattice", () => {
  test("a matched line has one front, half of the e.m.f. high, from source to load", () => {
    const { rays, omitted } = latticeRays(run(50, [cable(10)], 50), step, 1e-6);
    expect(rays).toHaveLength(1);
    expect(rays[0]).toMatchObject({ element: 0, isForward: true, startS: 0 });
    expect(rays[0]!.volt).toBeCloseTo(0.5, 12);
    expect(rays[0]!.endS).toBeCloseTo(delay(10), 18);
    expect(omitted).toBe(0);
  });

  // Lattice diagram, e.g. L. V. Bewley, Traveling Waves on Transmission Systems, 2nd ed., chapter 4: ρ = (R − Z0)/(R + Z0).
  test("an open end sends back the whole front, and a source of 10 Ω turns it over by −2/3", () => {
    const { rays } = latticeRays({ ...run(10, [cable(10)], 1), load: { kind: "open" } }, step, 2.5 * delay(10));
    expect(rays.map(({ isForward }) => isForward)).toEqual([true, false, true]);
    const [first, back, again] = rays.map(({ volt }) => volt);
    expect(first).toBeCloseTo(50 / 60, 12);
    expect(back).toBeCloseTo(50 / 60, 12);
    expect(again).toBeCloseTo((-2 / 3) * (50 / 60), 12);
  });

  test("what is on its way when the window ends is there, with the time it will arrive", () => {
    const { rays } = latticeRays(run(50, [cable(10)], 50), step, delay(10) / 2);
    expect(rays).toHaveLength(1);
    expect(rays[0]!.endS).toBeCloseTo(delay(10), 18);
  });

  test("fronts of a second cable are told apart from those of the first", () => {
    const { rays } = latticeRays(run(50, [cable(4), cable(6)], 50), step, 1e-6);
    expect(rays.map(({ element }) => element)).toEqual([0, 1]);
    expect(rays[1]!.startS).toBeCloseTo(rays[0]!.endS, 18);
  });

  test("fronts smaller than asked for are left out and counted", () => {
    const { rays, omitted } = latticeRays({ ...run(10, [cable(10)], 1), load: { kind: "open" } }, step, 1e-5, 0.1);
    expect(rays.every(({ volt }) => Math.abs(volt) > 0.1)).toBe(true);
    expect(omitted).toBeGreaterThan(0);
  });
});
