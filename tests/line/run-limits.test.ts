import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Element } from "@/lib/line/element";
import { sweep } from "@/lib/line/run";
import { cable, numbers, ohm, rope, run } from "@/tests/support/lossy-run";

describe("limits", () => {
  test("a run of 500 dB and one of 500 000 dB have finite figures that are the sum of their parts", () => {
    for (const lengthM of [1000, 1e6]) {
      const got = sweep(run([cable(lengthM)], ohm(50)), [1e9]);
      expect(numbers(got).every(Number.isFinite)).toBe(true);
      expect(got.transducerLossDb[0]!).toBeGreaterThan(500);
      expect(got.transducerLossDb[0]! / got.matchedLossDb[0]!).toBeCloseTo(1, 3);
    }
  });

  test("200 pads of 200 dB do not overflow", () => {
    const pads = Array.from({ length: 200 }, (): Element => ({
      kind: "pad",
      lossDb: 200,
      inputOhm: 50,
      outputOhm: 50,
    }));
    const got = sweep(run(pads, ohm(50)), [1e6]);
    expect(got.transducerLossDb[0]).toBeCloseTo(40_000, 6);
    expect(got.mismatchLossDb[0]).toBeCloseTo(0, 12);
  });

  test("many transformers in a row do not overflow", () => {
    const up = Array.from({ length: 20 }, (): Element => ({ kind: "transformer", turnsRatio: 1e6 }));
    const down = up.map((): Element => ({ kind: "transformer", turnsRatio: 1e-6 }));
    const got = sweep(run([...up, ...down], ohm(50)), [1e6]);
    expect(got.transducerLossDb[0]).toBeCloseTo(0, 9);
  });

  test("a run without elements is its load", () => {
    const got = sweep(run([], ohm(100)), [1e6]);
    expect(got.inputImpedance.re[0]).toBe(100);
    expect(got.transducerLossDb[0]).toBeCloseTo(0.5115, 4);
    expect(got.matchedLossDb[0]).toBe(0);
    expect(got.loadVoltage.re[0]).toBeCloseTo(2 / 3, 14);
    expect(got.groupDelayS[0]).toBeCloseTo(0, 15);
  });

  test("a perfect match, an open and a short are their limits, never NaN where there is one", () => {
    const match = sweep(run([], ohm(50)), [1e6]);
    expect([match.returnLossDb[0], match.vswr[0], match.mismatchLossDb[0]]).toEqual([Infinity, 1, 0]);
    for (const kind of ["open", "short"] as const) {
      const got = sweep(
        run([{ kind: "cable", line: { model: modelFromNominal({ z0: 50, velocityFactor: 1 }) }, lengthM: 3 }], {
          kind,
        }),
        [7e6],
        { planes: [{ at: "load" }] },
      );
      expect(got.returnLossDb[0]).toBeCloseTo(0, 12);
      expect([
        got.vswr[0],
        got.transducerLossDb[0],
        got.mismatchLossDb[0],
        got.extraLossDb[0],
        got.elementLossDb[0]![0],
      ]).toEqual(Array(5).fill(Infinity));
      expect(got.atPlanes[0]!.impedance.re[0]).toBe(kind === "open" ? Infinity : 0);
      expect(got.loadReflection.re[0]).toBe(kind === "open" ? 1 : -1);
    }
  });

  test("a dead short on the way lets nothing through and is seen as a short", () => {
    const got = sweep(run([{ kind: "shunt", termination: { kind: "short" } }, cable(5)]), [1e6]);
    expect(got.inputImpedance.re[0]).toBeCloseTo(0, 15);
    expect(got.inputImpedance.im[0]).toBeCloseTo(0, 15);
    expect([got.reflection.re[0], got.transducerLossDb[0], got.elementLossDb[0]![0], got.loadVoltage.re[0]]).toEqual([
      -1,
      Infinity,
      Infinity,
      0,
    ]);
    expect(got.groupDelayS[0]).toBeNaN();
  });

  test("a source without resistance has no available power, but a run all the same", () => {
    const got = sweep({ ...run([cable(10)]), source: { kind: "short" }, referenceOhm: 50 }, [1e7]);
    expect([got.transducerLossDb[0], got.mismatchLossDb[0]]).toEqual([NaN, NaN]);
    expect(got.extraLossDb[0]!).toBeGreaterThan(0);
    expect(got.loadVoltage.re[0]! ** 2 + got.loadVoltage.im[0]! ** 2).toBeGreaterThan(0);
  });
});

describe("refusals name function, argument and value", () => {
  const circuit = run([cable(1)]);
  test.each([
    [() => sweep(circuit, [1e6, 0]), "sweep: frequencies must be positive, got 0"],
    [() => sweep(circuit, [Infinity]), "sweep: frequencies must be positive, got Infinity"],
    [
      () => sweep(circuit, [1e6], { planes: [{ beforeElement: 1 }] }),
      "sweep: beforeElement must be a whole number from 0 to 0, got 1",
    ],
    [
      () => sweep(circuit, [1e6], { planes: [{ beforeElement: 0.5 }] }),
      "sweep: beforeElement must be a whole number from 0 to 0, got 0.5",
    ],
    [
      () => sweep({ ...circuit, source: { kind: "short" } }, [1e6]),
      "sweep: referenceOhm is needed where the source has no resistance, got 0",
    ],
    [() => sweep({ ...circuit, source: { kind: "open" } }, [1e6]), "prepareRun: source must not be open"],
    [() => sweep({ ...circuit, referenceOhm: -1 }, [1e6]), "prepareRun: referenceOhm must be positive, got -1"],
    [() => sweep(run([cable(-1)]), [1e6]), "lineSection: length must be at least 0, got -1"],
    [
      () => sweep(run([{ kind: "cable", line: { model: rope }, lengthM: 1, paralleled: 1.5 }]), [1e6]),
      "lineSection: paralleled must be a whole number of at least 1, got 1.5",
    ],
    [() => sweep(run([{ kind: "parallel", branches: [] }]), [1e6]), "parallelSections: branches must not be empty"],
    [
      () => sweep(run([{ kind: "parallel", branches: [{ line: { model: rope }, lengthM: 0 }] }]), [1e6]),
      "parallelSections: length must be positive, got 0",
    ],
    [
      () => sweep(run([{ kind: "transformer", turnsRatio: 0 }]), [1e6]),
      "transformerTwoPort: turnsRatio must be positive, got 0",
    ],
    [
      () => sweep(circuit, [1e6], { temperatureC: -300 }),
      "atTemperature: no positive resistivity at temperatureC = -300",
    ],
  ])("%#", (call, message) => {
    expect(call).toThrow(new RangeError(message));
  });
});
