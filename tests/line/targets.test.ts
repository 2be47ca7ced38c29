import { describe, expect, test } from "vitest";
import { tapDips } from "@/lib/line/bus";
import { directCurrent } from "@/lib/line/dc";
import type { Element } from "@/lib/line/element";
import { solve } from "@/lib/line/solve";
import { sweep } from "@/lib/line/run";
import { standingWave } from "@/lib/line/standing-wave";
import { judge, targetQuantities, type Target } from "@/lib/line/target";
import { judgeTargets } from "@/lib/line/targets";
import { readings } from "@/lib/line/time/readings";
import { settledLevels } from "@/lib/line/time/settled";
import { timeResponse } from "@/lib/line/time/time-response";
import { usualWindow } from "@/lib/line/time/usual-window";
import { targetSchema } from "@/lib/runs/schema";
import { cable, ohm, rope, run } from "@/tests/support/lossy-run";

const tap: Element = { kind: "shunt", termination: ohm(1000) };
const circuit = run([cable(12), tap, cable(7)]);
const frequencies = [1e7, 3e7, 9e7];
const conditions = { frequencies, supplyV: 5, availablePowerW: 25 };
const swept = sweep(circuit, frequencies, { planes: [{ at: "load" }, { beforeElement: 2 }] });
const one = (target: Target, more: object = {}) => judgeTargets(circuit, [target], { ...conditions, ...more })[0]!;
const most = (values: Float64Array) => Math.max(...values);
const least = (values: Float64Array) => Math.min(...values);

test("the quantities of the engine are those of the wire", () => {
  expect(targetSchema.shape.quantity.options).toEqual([...targetQuantities]);
});

describe("what decides", () => {
  test("the worst over the frequencies, at the plane asked for", () => {
    expect(one({ quantity: "loss", atMost: 9 }).value).toBe(most(swept.transducerLossDb));
    expect(one({ quantity: "returnLoss", atLeast: 9 }).value).toBe(least(swept.returnLossDb));
    expect(one({ quantity: "vswr", plane: { at: "load" }, atMost: 2 }).value).toBe(most(swept.atPlanes[0]!.vswr));
    expect(one({ quantity: "returnLoss", plane: { beforeElement: 2 }, atLeast: 9 }).value).toBe(
      least(swept.atPlanes[1]!.returnLossDb),
    );
    expect(one({ quantity: "delay", atMost: 1 }).value).toBe(most(swept.groupDelayS));
    expect(one({ quantity: "delay", atLeast: 0 }).value).toBe(least(swept.groupDelayS));
  });

  test("a band takes the frequencies asked inside it and its own ends, and no other target sees those", () => {
    const band: Target = { quantity: "loss", bandHz: [2e7, 4e8], atMost: 99 };
    const wide: Target = { quantity: "loss", atMost: 99 };
    const [inBand, all] = judgeTargets(circuit, [band, wide], conditions);
    expect(inBand!.value).toBe(most(sweep(circuit, [2e7, 3e7, 9e7, 4e8]).transducerLossDb));
    expect(all!.value).toBe(most(swept.transducerLossDb));
  });

  test("levels at rest: drop, far level, the least level of any node", () => {
    const { points } = directCurrent(circuit, { supplyV: 5 });
    expect(one({ quantity: "dcDrop", atMost: 1 }).value).toBe(points[0]!.voltageV - points[2]!.voltageV);
    expect(one({ quantity: "level", atLeast: 1 }).value).toBe(points[2]!.voltageV);
    expect(one({ quantity: "level", plane: { at: "source" }, atLeast: 1 }).value).toBe(points[0]!.voltageV);
    expect(one({ quantity: "idleBias", atLeast: 0.2 }).value).toBe(Math.min(...points.map(({ voltageV }) => voltageV)));
  });

  test("the highest peak voltage and the least power in the load for what is available", () => {
    const peak = Math.max(...frequencies.map((f) => standingWave(circuit, f, 25).maxVoltageV)) * Math.SQRT2;
    expect(one({ quantity: "voltage", atMost: 100 }).value).toBeCloseTo(peak, 9);
    const power = Math.min(...frequencies.map((f) => standingWave(circuit, f, 25).loadPowerW));
    expect(one({ quantity: "power", atLeast: 1 }).value).toBeCloseTo(power, 9);
  });
});

describe("over time", () => {
  const drive = { kind: "step", amplitudeV: 2, riseS: 20e-9, edge: "raisedCosine" } as const;
  const spur: Element = {
    kind: "stub",
    connection: "shunt",
    end: { kind: "network", topology: "parallel", rOhm: 1e4, cF: 2e-11 },
    line: { model: rope },
    lengthM: 2,
  };
  const bus = run([cable(12), spur, cable(7), spur], ohm(1000));
  const inTime = (target: Target) => judgeTargets(bus, [target], { frequencies, drive })[0]!;

  test("readings at the load, and the deepest dip of a tap, are those of the response", () => {
    const windowS = usualWindow(bus, drive);
    const response = timeResponse(bus, drive, { windowS, points: 2049 }, { planes: [4] });
    const read = readings(response.planes[0]!, drive, settledLevels(bus, [4])[0]!);
    expect(read.overshoot).toBeGreaterThan(0.02);
    expect(inTime({ quantity: "overshoot", atMost: 1 }).value).toBe(read.overshoot);
    expect(inTime({ quantity: "settling", atMost: 1 }).value).toBe(read.settlingS);
    expect(inTime({ quantity: "delay", atMost: 1 }).value).toBe(read.delayS);
    expect(inTime({ quantity: "level", atLeast: 1 }).value).toBe(read.settledV);
    expect(inTime({ quantity: "tapDip", atMost: 1 }).value).toBe(
      Math.max(...tapDips(bus, drive).map(({ dip }) => dip)),
    );
  });

  test("the level of a drive is that of a supply as large", () => {
    const [byDrive] = judgeTargets(bus, [{ quantity: "level", atLeast: 1 }], { frequencies, drive });
    const [bySupply] = judgeTargets(bus, [{ quantity: "level", atLeast: 1 }], { frequencies, supplyV: 2 });
    expect(byDrive!.value).toBeCloseTo(bySupply!.value, 9);
  });

  test("a delay with a band of its own is the group delay, drive or not", () => {
    const target: Target = { quantity: "delay", bandHz: [3e7, 3e7], atMost: 1 };
    expect(inTime(target).value).toBe(sweep(bus, [3e7]).groupDelayS[0]);
  });

  test("without a tap there is no dip, without a drive nothing is known", () => {
    expect(judgeTargets(run([cable(3)]), [{ quantity: "tapDip", atMost: 1 }], { frequencies, drive })[0]!.why).toMatch(
      /no tap/,
    );
    for (const quantity of ["overshoot", "settling", "tapDip"] as const)
      expect(one({ quantity, atMost: 1 }).why).toMatch(/question of time/);
  });

  test("the fastest edge that keeps every dip small is solved for", () => {
    const request = {
      circuit: bus,
      frequencies,
      drive,
      vary: { path: "drive.riseS", between: [1e-8, 2e-6] as const },
      want: "smallest" as const,
    };
    const { value } = solve({ ...request, targets: [{ quantity: "tapDip", atMost: 0.1 }] });
    const dipAt = (riseS: number) => Math.max(...tapDips(bus, { ...drive, riseS }).map(({ dip }) => dip));
    expect(dipAt(value!)).toBeLessThanOrEqual(0.1);
    expect(dipAt(value!)).toBeGreaterThan(0.099);
  });
});

test("a margin is how far inside the nearer limit; on the limit is inside", () => {
  const reached = { least: 2, greatest: 5 };
  expect(judge({ quantity: "loss", atMost: 6 }, reached)).toEqual({ value: 5, margin: 1, isMet: true });
  expect(judge({ quantity: "loss", atMost: 5 }, reached)).toEqual({ value: 5, margin: 0, isMet: true });
  expect(judge({ quantity: "loss", atLeast: 3 }, reached)).toEqual({ value: 2, margin: -1, isMet: false });
  expect(judge({ quantity: "loss", atLeast: 1.5, atMost: 9 }, reached)).toEqual({ value: 2, margin: 0.5, isMet: true });
  expect(judge({ quantity: "returnLoss", atLeast: 20 }, { least: Infinity, greatest: Infinity })).toEqual({
    value: Infinity,
    margin: Infinity,
    isMet: true,
  });
  expect(judge({ quantity: "loss", atMost: 20 }, { least: 3, greatest: Infinity })).toMatchObject({
    margin: -Infinity,
    isMet: false,
  });
});

test.each<[Target, object]>([
  [{ quantity: "skew", atMost: 1 }, {}],
  [{ quantity: "level", atLeast: 1 }, { supplyV: undefined }],
  [{ quantity: "dcDrop", atMost: 1 }, { supplyV: undefined }],
  [{ quantity: "idleBias", atLeast: 1 }, { supplyV: undefined }],
  [{ quantity: "voltage", atMost: 1 }, { availablePowerW: undefined }],
  [{ quantity: "power", atLeast: 1 }, { availablePowerW: undefined }],
  [{ quantity: "level", plane: { beforeElement: 1 }, atLeast: 1 }, {}],
])("what cannot be worked out is not met, and says why: $quantity", (target, more) => {
  const judged = one(target, more);
  expect(judged).toMatchObject({ value: NaN, margin: NaN, isMet: false });
  expect(judged.why).toMatch(/^[A-Z].*\.$/);
});

test("a source without resistance has no loss to hold a target against", () => {
  const bare = { ...run([cable(3)], ohm(75), { kind: "short" }), referenceOhm: 50 };
  expect(judgeTargets(bare, [{ quantity: "loss", atMost: 3 }], conditions)[0]!.why).toMatch(/no resistance/);
});
