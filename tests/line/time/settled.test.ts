import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Element, Termination } from "@/lib/line/element";
import { stepFigures } from "@/lib/line/time/step-figures";
import { settledLevels } from "@/lib/line/time/settled";
import { cable, ohm, rope, run } from "@/tests/support/lossy-run";

const level = (circuit: Circuit) => settledLevels(circuit, [circuit.elements.length])[0]!;
const network = (fields: object): Termination => ({ kind: "network", topology: "parallel", ...fields });
const capacitor: Element = { kind: "part", connection: "series", cF: 1e-9 };

test("a loaded run settles at its resistive divider, cable resistance counted", () => {
  expect(level(run([cable(100)], ohm(45)))).toBeCloseTo(45 / (45 + 50 + 0.05 * 100), 9);
  expect(settledLevels(run([cable(100)], ohm(45)), [0])[0]!).toBeCloseTo(50 / 100, 9);
});

test("warm copper settles lower, by its resistance", () => {
  const [cold, hot] = [20, 60].map((t) => settledLevels(run([cable(100)], ohm(45)), [1], t)[0]!);
  expect(cold).toBeCloseTo(45 / 100, 9);
  expect(hot).toBeCloseTo(45 / (95 + 5 * (1 + 0.00393 * 40)), 9);
});

describe("ends that are nothing at dc", () => {
  const lossless = modelFromNominal({ z0: 50, velocityFactor: 2 / 3 });
  const open = { kind: "open" } as const;

  test("an open end behind no resistance, lossless or not, settles at the e.m.f.", () => {
    expect(level(run([cable(10)], open, ohm(0)))).toBeCloseTo(1, 9);
    expect(
      level(run([{ kind: "cable", line: { model: lossless }, lengthM: 10 }], open, { kind: "short" })),
    ).toBeCloseTo(1, 9);
  });

  test("a shorted end settles at nothing, a coil too, a capacitor is an open end", () => {
    expect(level(run([cable(10)], { kind: "short" }))).toBeCloseTo(0, 12);
    expect(level(run([cable(10)], network({ lH: 1e-6 })))).toBeCloseTo(0, 9);
    expect(level(run([cable(10)], network({ cF: 1e-6 })))).toBeCloseTo(1, 9);
  });

  test("a capacitor in the line leaves nothing to a resistor and its share to an open line", () => {
    expect(level(run([capacitor, cable(10)], ohm(50)))).toBeCloseTo(0, 9);
    const line = 10 * rope.cFPerM;
    // the loss angle makes capacitance grow without bound toward dc: a line without one has the share of its nominal
    const plain = { ...rope, lossTangent: 0 };
    const elements: Element[] = [capacitor, { kind: "cable", line: { model: plain }, lengthM: 10 }];
    expect(level(run(elements, open))).toBeCloseTo(1e-9 / (1e-9 + line), 6);
  });

  test("a coil across a source without resistance takes nothing from it", () => {
    const coil: Element = { kind: "part", connection: "shunt", lH: 1e-6 };
    expect(level(run([coil], ohm(50), ohm(0)))).toBeCloseTo(1, 6);
    expect(level(run([coil], ohm(50)))).toBeCloseTo(0, 9);
  });

  test("what a capacitor in the line or a coil across it leaves to a resistor is exactly nothing", () => {
    // 50 Ω, C, 50 Ω: V(s)·s = 50sC/(1 + 100sC); 50 Ω, L to ground: sL/(sL + 50): both go to 0 with s
    expect(level(run([capacitor, cable(10)], ohm(50)))).toBe(0);
    expect(level(run([{ kind: "part", connection: "shunt", lH: 1e-6 }], { kind: "open" }))).toBe(0);
  });

  test("overshoot and rise, which are shares of the settled level, do not exist where it is nothing", () => {
    const behind = stepFigures(run([capacitor, cable(10)], ohm(50)), { kind: "step", amplitudeV: 1, riseS: 1e-9 });
    expect(behind).toMatchObject({ settledV: 0, overshoot: NaN, riseS: NaN, delayS: NaN });
  });

  test("a voltage on the way is reached even where the signal comes back to nothing", () => {
    const drive = { kind: "step", amplitudeV: 1, riseS: 1e-9 } as const;
    const { reachedS, settledV } = stepFigures(run([capacitor], ohm(50)), drive, { thresholdV: 0.25 });
    // v = ½·(e − ∫e dt/T), T = 100 Ω·1 nF, e the edge: at tr/2 the integral is (1/8 − 1/2π²)·tr and e rises by 2/tr
    expect(reachedS / 1e-9).toBeCloseTo(0.5 + ((1 / 8 - 1 / (2 * Math.PI ** 2)) * 1e-9) / (2 * 1e-7), 5);
    expect(settledV).toBe(0);
    const fallen = stepFigures(run([capacitor], ohm(50)), { ...drive, amplitudeV: -1 }, { thresholdV: -0.25 });
    expect(fallen.reachedS).toBeCloseTo(reachedS, 15);
  });

  test("behind a dead short there is nothing", () => {
    expect(level(run([{ kind: "shunt", termination: { kind: "short" } }, cable(1)]))).toBe(0);
  });
});
