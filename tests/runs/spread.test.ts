import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit } from "@/lib/line/element";
import { tolerance } from "@/lib/line/tolerance";
import { spreadOf, usualSpread } from "@/lib/runs/spread";

const model = modelFromNominal({ z0: 50, velocityFactor: 0.85 });
const run: Circuit = {
  source: { kind: "constant", reOhm: 50, imOhm: 0 },
  elements: [
    { kind: "cable", line: { model }, lengthM: 12 },
    { kind: "cable", line: { model }, lengthM: 3, lengthToleranceM: 0.1 },
    { kind: "part", connection: "series", cF: 1e-10 },
    { kind: "joint" },
  ],
  load: { kind: "constant", reOhm: 75, imOhm: 0 },
};
const names = ["feeder", "tail", "trap", "plug"];

describe("What of a run is spread", () => {
  test("is every length, impedance, velocity factor and loss of its cables and every part's value, by name", () => {
    const rows = spreadOf(run, names, usualSpread);
    expect(rows.map(({ name }) => name)).toEqual([
      ...["length", "impedance", "velocity factor", "loss"].map((what) => `${what} of feeder`),
      ...["length", "impedance", "velocity factor", "loss"].map((what) => `${what} of tail`),
      "value of trap",
    ]);
  });

  test("keeps the cut tolerance a piece has of its own", () => {
    const length = (k: number) =>
      spreadOf(run, names, usualSpread).find(({ path }) => path === `elements.${k}.lengthM`);
    expect(length(0)?.limits).toEqual([11.995, 12.005]);
    expect(length(1)?.limits).toEqual([2.9, 3.1]);
  });

  test("leaves out what has no tolerance, and never lets a length below nothing", () => {
    const none = { ...usualSpread, lengthM: undefined, z0Percent: undefined, velocityFactorPercent: undefined };
    expect(
      spreadOf(run, names, { ...none, lossPercent: undefined, partPercent: undefined }).map(({ path }) => path),
    ).toEqual(["elements.1.lengthM"]);
    const short = { ...run, elements: [{ kind: "cable" as const, line: { model }, lengthM: 0.002 }] };
    expect(spreadOf(short, names, usualSpread)[0]?.limits[0]).toBe(0);
  });

  test("takes any phase of the load's reflection where that is asked for, and the engine draws all of it", () => {
    const spread = spreadOf(run, names, { ...usualSpread, anyPhase: true });
    expect(spread.at(-1)).toMatchObject({ path: "load.reflectionPhase", limits: [-Math.PI, Math.PI] });
    const { returnLossDb } = tolerance({ circuit: run, frequencies: [1e8], spread, draws: 200, seed: 1 });
    expect(returnLossDb.min[0]).toBeLessThan(returnLossDb.max[0]!);
  });
});
