import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import type { Analytic } from "@/lib/line/analytic";
import { prepareElements } from "@/lib/line/element-two-port";
import { modelFromNominal } from "@/lib/line/cable";
import { terminationPort, type Port } from "@/lib/line/termination";
import { throughTwoPort } from "@/lib/line/two-port";
import { portAt, powerThrough, prepareRun, walk } from "@/lib/line/walk";
import { anyFrequency, anyRun } from "@/tests/support/arbitrary-run";

function near(got: Analytic, wanted: Analytic, factor: number, unit: number): void {
  const size = Math.hypot(wanted.re, wanted.im) * factor + unit;
  expect(Math.hypot(got.re - wanted.re * factor, got.im - wanted.im * factor)).toBeLessThanOrEqual(1e-12 * size);
  const slope = Math.hypot(wanted.slopeRe, wanted.slopeIm) * factor;
  const error = Math.hypot(got.slopeRe - wanted.slopeRe * factor, got.slopeIm - wanted.slopeIm * factor);
  // derivatives of resonant elements cancel as they are carried along; that is what is left of them
  expect(error).toBeLessThanOrEqual(1e-9 * slope + 1e-12 * Math.abs(unit));
}

test("the packed walk shows at every plane what the two-ports multiplied one by one show", () => {
  fc.assert(
    fc.property(anyRun, anyFrequency, (circuit, frequency) => {
      const s = { re: 0, im: 2 * Math.PI * frequency };
      const at = walk(prepareRun(circuit), s);
      const twoPorts = prepareElements(circuit);
      let port: Port = terminationPort(circuit.load, s);
      let scale = 0;
      let walked = 0;
      for (let k = twoPorts.length - 1; k >= 0; k--) {
        const twoPort = twoPorts[k]!(s);
        port = throughTwoPort(twoPort, port);
        scale += twoPort.logScale;
        walked += at.scales[k]!;
        const factor = Math.exp(scale - walked);
        const got = portAt(at, k);
        const size = Math.hypot(port.v.re, port.v.im) + 50 * Math.hypot(port.i.re, port.i.im);
        near(got.v, port.v, factor, size * factor);
        near(got.i, port.i, factor, (size * factor) / 50);
      }
    }),
    { numRuns: 300 },
  );
});

test("one frequency may be written over the arrays of another", () => {
  const model = modelFromNominal({ z0: 75, velocityFactor: 0.8, lossTangent: 1e-3 });
  const run = prepareRun({
    source: { kind: "constant", reOhm: 50, imOhm: 0 },
    elements: [
      { kind: "cable", line: { model }, lengthM: 3 },
      { kind: "part", connection: "shunt", cF: 1e-11 },
      { kind: "cable", line: { model }, lengthM: 8 },
    ],
    load: { kind: "open" },
  });
  const first = walk(run, { re: 0, im: 1e8 });
  const over = walk(run, { re: 0, im: 3e8 }, first);
  expect(over.planes).toBe(first.planes);
  expect(over).toEqual(walk(run, { re: 0, im: 3e8 }));
});

test("elements of one cable and temperature share it, and so does each frequency", () => {
  const line = { model: modelFromNominal({ z0: 50, velocityFactor: 0.66, lossTangent: 1e-3 }) };
  const cable = { kind: "cable" as const, line, lengthM: 1 };
  const { elements } = prepareRun({
    source: { kind: "constant", reOhm: 50, imOhm: 0 },
    elements: [cable, { ...cable, lengthM: 2 }, { ...cable, temperatureC: 60 }],
    load: { kind: "open" },
  });
  const s = { re: 0, im: 1e8 };
  expect(elements[0]!.cable!.line).toBe(elements[1]!.cable!.line);
  expect(elements[0]!.cable!.line(s)).toBe(elements[1]!.cable!.line(s));
  expect(elements[2]!.cable!.line).not.toBe(elements[0]!.cable!.line);
  // another s is worked out anew, even when the object is shared code
  expect(elements[0]!.cable!.line({ re: 0, im: 2e8 }).gamma.im).toBeGreaterThan(elements[0]!.cable!.line(s).gamma.im);
});

test("power told from rounding: a wave reflected whole carries none, a small load carries its own", () => {
  expect(powerThrough(1, 1e-16, 1e-16, 0.02, 0, 50)).toBe(0);
  expect(powerThrough(1, 0, 1e-9, 0, 0, 50)).toBe(1e-9);
  expect(powerThrough(1, 0, 1e-9, 0, 2e-9, 50)).toBe(2e-9);
});
