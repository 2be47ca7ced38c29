import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit } from "@/lib/line/element";
import { standingWave } from "@/lib/line/standing-wave";

const rope = modelFromNominal({
  z0: 50,
  velocityFactor: 0.66,
  lossTangent: 3e-4,
  conductors: [{ form: "round", r0OhmPerM: 0.05, skinCornerRadPerS: 2.4e5 }],
});

function run(elements: Circuit["elements"], reOhm = 22, imOhm = -35): Circuit {
  return { source: { kind: "constant", reOhm: 50, imOhm: 0 }, elements, load: { kind: "constant", reOhm, imOhm } };
}

const cable = (lengthM: number) => ({ kind: "cable" as const, line: { model: rope }, lengthM });

describe("points", () => {
  test("count both ends of each element, say which element they lie in, and join without a step", () => {
    const got = standingWave(
      run([
        cable(3),
        { kind: "stub", connection: "shunt", end: "open", line: { model: rope }, lengthM: 0.5 },
        cable(5),
      ]),
      3e7,
      1,
      { pointsPerElement: 4 },
    );
    expect([...got.positionM]).toEqual([0, 1, 2, 3, 3, 3, 3, 3 + 5 / 3, 3 + 10 / 3, 8]);
    expect([...got.elementIndex]).toEqual([0, 0, 0, 0, 1, 1, 2, 2, 2, 2]);
    // across a shunt stub the voltage goes through and the current does not
    expect(got.voltageV[3]).toBe(got.voltageV[6]);
    expect(got.currentA[3]).not.toBeCloseTo(got.currentA[6]!, 3);
  });

  test("of a run without elements are the one place there is", () => {
    const got = standingWave(run([], 50, 0), 1e6, 2);
    expect([...got.positionM]).toEqual([0]);
    expect(got.voltageV[0]).toBeCloseTo(10, 12);
    expect(got.maxCurrentA).toBeCloseTo(0.2, 12);
    expect(got.loadPowerW).toBeCloseTo(2, 12);
  });

  test("of paralleled cables are the same whether the cables are counted or listed", () => {
    const counted = standingWave(run([{ ...cable(7), paralleled: 2 }]), 5e7, 1, { pointsPerElement: 30 });
    const listed = standingWave(
      run([
        {
          kind: "parallel",
          branches: [
            { line: { model: rope }, lengthM: 7 },
            { line: { model: rope }, lengthM: 7 },
          ],
        },
      ]),
      5e7,
      1,
      { pointsPerElement: 30 },
    );
    counted.voltageV.forEach((voltage, k) => expect(listed.voltageV[k]! / voltage).toBeCloseTo(1, 9));
    counted.currentA.forEach((current, k) => expect(listed.currentA[k]! / current).toBeCloseTo(1, 9));
    expect(listed.maxVoltageV / counted.maxVoltageV).toBeCloseTo(1, 9);
    expect(listed.maxCurrentA / counted.maxCurrentA).toBeCloseTo(1, 9);
  });

  test("behind a short carry nothing, and in front of it all is finite", () => {
    const got = standingWave(run([cable(2), { kind: "shunt", termination: { kind: "short" } }, cable(2)]), 1e7, 1, {
      pointsPerElement: 5,
    });
    expect(got.loadPowerW).toBe(0);
    expect([...got.voltageV.slice(7)].every((voltage) => voltage === 0)).toBe(true);
    expect([...got.voltageV, ...got.currentA, got.maxVoltageV, got.maxCurrentA].every(Number.isFinite)).toBe(true);
  });
});

test("a run of 500 dB and more has finite figures at every point", () => {
  const got = standingWave(run([cable(20_000), cable(20_000)]), 1e9, 100, { pointsPerElement: 11 });
  expect([...got.voltageV, ...got.currentA, got.maxVoltageV, got.maxCurrentA].every(Number.isFinite)).toBe(true);
  expect(got.inputPowerW).toBeCloseTo(100, 2);
});

test("twice the power is √2 the voltage", () => {
  const one = standingWave(run([cable(36)]), 27.2e6, 100, { pointsPerElement: 9 });
  const two = standingWave(run([cable(36)]), 27.2e6, 200, { pointsPerElement: 9 });
  one.voltageV.forEach((voltage, k) => expect(two.voltageV[k]! / voltage).toBeCloseTo(Math.SQRT2, 12));
});

describe("refusals name function, argument and value", () => {
  const circuit = run([cable(1)]);
  test.each([
    [() => standingWave(circuit, 0, 1), "standingWave: frequency must be positive, got 0"],
    [() => standingWave(circuit, NaN, 1), "standingWave: frequency must be positive, got NaN"],
    [() => standingWave(circuit, 1e6, -1), "standingWave: availablePower must be at least 0, got -1"],
    [
      () => standingWave(circuit, 1e6, 1, { pointsPerElement: 1 }),
      "standingWave: pointsPerElement must be a whole number of at least 2, got 1",
    ],
    [
      () => standingWave({ ...circuit, source: { kind: "short" } }, 1e6, 1),
      "standingWave: the source's resistance must be positive, got 0",
    ],
  ])("%#", (call, message) => {
    expect(call).toThrow(new RangeError(message));
  });
});
