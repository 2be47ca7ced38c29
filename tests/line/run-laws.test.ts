import fc from "@/tests/support/property";
import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Element, Plane } from "@/lib/line/element";
import { sweep } from "@/lib/line/run";
import { anyElement, anyFrequency, anyRun } from "@/tests/support/arbitrary-run";
import { cable, numbers, ohm, run } from "@/tests/support/lossy-run";

test("a passive run never reflects more than all, and its losses add up", () => {
  fc.assert(
    fc.property(anyRun, anyFrequency, (circuit, frequency) => {
      const got = sweep(circuit, [frequency]);
      expect(Math.hypot(got.reflection.re[0]!, got.reflection.im[0]!)).toBeLessThanOrEqual(1 + 1e-12);
      const elements = got.elementLossDb.reduce((sum, [loss]) => sum + loss!, 0);
      const run = got.transducerLossDb[0]! - got.mismatchLossDb[0]!;
      expect(Math.abs(elements - run)).toBeLessThanOrEqual(1e-9 * (1 + got.transducerLossDb[0]!));
      for (const [loss] of got.elementLossDb) expect(loss!).toBeGreaterThanOrEqual(0);
      expect(got.extraLossDb[0]!).toBeCloseTo(run - got.matchedLossDb[0]!, 8);
      // mismatch loss and reflection are two ways to one power
      const magnitude = got.reflection.re[0]! ** 2 + got.reflection.im[0]! ** 2;
      if (magnitude < 0.999) expect(got.mismatchLossDb[0]!).toBeCloseTo(-10 * Math.log10(1 - magnitude), 6);
    }),
    { numRuns: 400 },
  );
});

test("a run and its mirror between swapped ends lose the same", () => {
  fc.assert(
    fc.property(
      fc.array(anyElement, { minLength: 1, maxLength: 5 }),
      fc.double({ min: 10, max: 300, noNaN: true }),
      fc.double({ min: -100, max: 100, noNaN: true }),
      anyFrequency,
      (elements, r, x, frequency) => {
        const plain = elements.map((element): Element =>
          element.kind === "joint" ? { ...element, shuntF: 0 } : element,
        );
        const mirrored = [...plain].reverse().map((element): Element => {
          if (element.kind === "pad") return { ...element, inputOhm: element.outputOhm, outputOhm: element.inputOhm };
          if (element.kind === "transformer") return { ...element, turnsRatio: 1 / element.turnsRatio };
          return element;
        });
        const there = sweep(run(plain, ohm(r, x)), [frequency]).transducerLossDb[0]!;
        const back = sweep({ ...run(mirrored, ohm(50)), source: { kind: "constant", reOhm: r, imOhm: x } }, [frequency])
          .transducerLossDb[0]!;
        // a branch near resonance shorts the run but for rounding: a few digits of such a loss are noise
        expect(Math.abs(there - back)).toBeLessThanOrEqual(1e-6 + 1e-9 * there);
      },
    ),
    { numRuns: 300 },
  );
});

test("a cable cut anywhere gives the same run", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 200, noNaN: true }),
      fc.double({ min: 0, max: 1, noNaN: true }),
      anyFrequency,
      (lengthM, part, frequency) => {
        const whole = sweep(run([cable(lengthM)]), [frequency]);
        const cut = sweep(run([cable(lengthM * part), cable(lengthM * (1 - part))]), [frequency]);
        numbers({ ...whole, elementLossDb: [] }).forEach((value, k) => {
          const other = numbers({ ...cut, elementLossDb: [] })[k]!;
          expect(Math.abs(value - other)).toBeLessThanOrEqual(1e-9 * (Math.abs(value) + 1));
        });
        expect(cut.elementLossDb[0]![0]! + cut.elementLossDb[1]![0]!).toBeCloseTo(whole.elementLossDb[0]![0]!, 8);
      },
    ),
  );
});

describe("planes", () => {
  test("at any plane the impedance is that of the rest of the run alone", () => {
    fc.assert(
      fc.property(
        fc.array(anyElement, { minLength: 1, maxLength: 5 }),
        fc.nat(4),
        anyFrequency,
        (elements, at, frequency) => {
          const beforeElement = at % elements.length;
          const [plane] = sweep(run(elements), [frequency], { planes: [{ beforeElement }] }).atPlanes;
          const rest = sweep(run(elements.slice(beforeElement)), [frequency]);
          expect(plane!.impedance.re[0]).toBe(rest.inputImpedance.re[0]);
          expect(plane!.impedance.im[0]).toBe(rest.inputImpedance.im[0]);
          expect(plane!.returnLossDb[0]).toBeCloseTo(rest.returnLossDb[0]!, 9);
        },
      ),
    );
  });

  test("are in the order asked, and the source plane and the load plane are the run's own", () => {
    const planes: Plane[] = [{ at: "load" }, { beforeElement: 1 }, { at: "source" }, { beforeElement: 0 }];
    const got = sweep(run([cable(3), cable(4)], ohm(75), ohm(50, 20)), [1e6, 2e7], { planes });
    expect(got.atPlanes.map(({ plane }) => plane)).toEqual(planes);
    const [load, , source, first] = got.atPlanes;
    expect(load!.reflection).toEqual(got.loadReflection);
    expect(load!.impedance.re[0]).toBe(75);
    // at the source plane the reflection is that of power waves, whichever way the plane is named
    for (const each of [source!, first!]) {
      expect(each.reflection).toEqual(got.reflection);
      expect(each.vswr).toEqual(got.vswr);
    }
  });

  test("elsewhere reflect in the circuit's reference, the source's resistance if none is given", () => {
    const [plane] = sweep(run([cable(0)], ohm(75), ohm(50, 20)), [1e6], { planes: [{ at: "load" }] }).atPlanes;
    expect(plane!.reflection.re[0]).toBeCloseTo(0.2, 12);
    const named = sweep({ ...run([cable(0)], ohm(75), ohm(50, 20)), referenceOhm: 75 }, [1e6], {
      planes: [{ at: "load" }],
    });
    expect(named.atPlanes[0]!.returnLossDb[0]).toBe(Infinity);
    expect(named.loadReflection.re[0]).toBe(0);
  });
});

describe("group delay", () => {
  test("is the derivative of the load voltage's phase, for any run", () => {
    fc.assert(
      fc.property(anyRun, fc.double({ min: 5, max: 8, noNaN: true }), (circuit, decade) => {
        const frequency = 10 ** decade;
        const steps = [-2e-6, -1e-6, 0, 1e-6, 2e-6];
        const { groupDelayS, loadVoltage } = sweep(
          circuit,
          steps.map((step) => frequency * (1 + step)),
        );
        const phase = (k: number) => Math.atan2(loadVoltage.im[k]!, loadVoltage.re[k]!);
        const delayOver = (from: number, to: number) => {
          const turn = phase(to) - phase(from);
          return -(turn - 2 * Math.PI * Math.round(turn / (2 * Math.PI))) / (2 * Math.PI * (steps[to]! - steps[from]!));
        };
        fc.pre(Math.hypot(loadVoltage.re[2]!, loadVoltage.im[2]!) > 1e-12);
        const [wide, narrow] = [delayOver(0, 4), delayOver(1, 3)];
        // what a difference misses is told by halving its step; the rest is the phase's rounding over so small a step
        const allowed = Math.abs(wide - narrow) + 1e-14 * (1e6 + groupDelayS[2]! ** 2 * frequency ** 2);
        expect(Math.abs(groupDelayS[2]! * frequency - narrow)).toBeLessThanOrEqual(allowed + 1e-8);
      }),
      { numRuns: 300 },
    );
  });

  test("of a matched lossless line is its length over its velocity", () => {
    const model = modelFromNominal({ z0: 50, velocityFactor: 0.66 });
    const got = sweep(run([{ kind: "cable", line: { model }, lengthM: 100 }], ohm(50)), [1e4, 1e6, 1e9]);
    for (const delay of got.groupDelayS) expect(delay / (100 / (0.66 * 299_792_458))).toBeCloseTo(1, 12);
  });

  test("into a short is that of the current", () => {
    const model = modelFromNominal({ z0: 50, velocityFactor: 0.66 });
    const got = sweep(run([{ kind: "cable", line: { model }, lengthM: 10 }], { kind: "short" }), [3.3e6]);
    expect(got.groupDelayS[0]! / (10 / (0.66 * 299_792_458))).toBeCloseTo(1, 12);
    expect(got.loadVoltage.re[0]).toBe(0);
  });
});
