import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import { abs, complex, multiply, subtract, type Complex } from "@/lib/line/complex";
import { elementTwoPort, prepareElements } from "@/lib/line/element-two-port";
import type { Element, JointElement } from "@/lib/line/element";
import { jointReference } from "@/lib/line/joint";
import { sweep } from "@/lib/line/run";
import { chainMatrix } from "@/lib/line/two-port";

const s = { re: 0, im: 2 * Math.PI * 3e7 };
const rope = modelFromNominal({
  z0: 75,
  velocityFactor: 0.83,
  lossTangent: 1.5e-4,
  conductors: [{ form: "sqrt", r0OhmPerM: 0.03, skinCornerRadPerS: 2.5e5 }],
});
const line = { model: rope };
const near = (got: Complex, wanted: Complex, digits = 1e-12) =>
  expect(abs(subtract(got, wanted))).toBeLessThanOrEqual(digits * abs(wanted));

describe("a joint", () => {
  const joint: JointElement = { kind: "joint", lossDb: 0.02, lossDbAtOneGhz: 0.08 };

  test("loses a + b√f in its own impedance at every frequency and reflects nothing", () => {
    const frequencies = [1e6, 1e8, 1e9, 4e9];
    const got = sweep(
      {
        source: { kind: "constant", reOhm: 60, imOhm: 0 },
        elements: [{ ...joint, referenceOhm: 60 }],
        load: { kind: "constant", reOhm: 60, imOhm: 0 },
      },
      frequencies,
    );
    frequencies.forEach((frequency, k) => {
      const loss = 0.02 + 0.08 * Math.sqrt(frequency / 1e9);
      expect(got.matchedLossDb[k]).toBeCloseTo(loss, 12);
      expect(got.transducerLossDb[k]).toBeCloseTo(loss, 12);
      expect(got.returnLossDb[k]!).toBeGreaterThan(250);
    });
  });

  test("then has its capacitance across the line, on the load side", () => {
    const lossy = chainMatrix(elementTwoPort({ ...joint, lossDb: 6, referenceOhm: 50 }, s));
    const loaded = chainMatrix(elementTwoPort({ ...joint, lossDb: 6, referenceOhm: 50, shuntF: 1e-12 }, s));
    near(loaded.b, lossy.b);
    near(subtract(loaded.a, lossy.a), multiply(lossy.b, complex(0, s.im * 1e-12)));
    near(subtract(loaded.c, lossy.c), multiply(lossy.d, complex(0, s.im * 1e-12)));
  });

  test("takes the nominal impedance of the cable before it, else of the one after it, of one cable where several lie in parallel", () => {
    const other = { model: modelFromNominal({ z0: 50, velocityFactor: 0.66 }) };
    const before: Element = { kind: "cable", line, lengthM: 1, paralleled: 2 };
    const after: Element = { kind: "parallel", branches: [{ line: other, lengthM: 1 }] };
    const pad: Element = { kind: "pad", lossDb: 3, inputOhm: 75, outputOhm: 75 };
    expect(jointReference([before, pad, joint, after], 2)).toBeCloseTo(75, 12);
    expect(jointReference([pad, joint, pad, after, before], 1)).toBeCloseTo(50, 12);
    expect(jointReference([before, { ...joint, referenceOhm: 93 }], 1)).toBe(93);
    expect(jointReference([pad, joint], 1)).toBeUndefined();
  });

  test("without any cable beside it takes the run's reference, else the source's resistance, and without that is refused", () => {
    const alone = { elements: [{ ...joint, lossDb: 8.685889638, lossDbAtOneGhz: 0 }] as Element[] };
    const impedanceOf = (run: Parameters<typeof prepareElements>[0]) => {
      const { b, c } = prepareElements(run)[0]!(s);
      return Math.sqrt(b.re / c.re);
    };
    expect(impedanceOf({ ...alone, referenceOhm: 50, source: { kind: "constant", reOhm: 75, imOhm: 0 } })).toBeCloseTo(
      50,
      10,
    );
    expect(impedanceOf({ ...alone, source: { kind: "constant", reOhm: 75, imOhm: 0 } })).toBeCloseTo(75, 10);
    expect(() => prepareElements(alone)).toThrow("a joint in a run without cable needs a referenceOhm");
    expect(() => prepareElements({ elements: [{ ...joint, lossDb: -1, referenceOhm: 50 }] })).toThrow(
      "jointTwoPort: lossDb must be at least 0, got -1",
    );
  });
});
