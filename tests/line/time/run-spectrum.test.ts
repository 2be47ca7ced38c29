import { describe, expect, test } from "vitest";
import { propagation } from "@/lib/line/cable";
import { abs, divide, multiply, scale, subtract, type Complex } from "@/lib/line/complex";
import type { Circuit, Element, Termination } from "@/lib/line/element";
import { laplaceGrid, type LaplaceGrid } from "@/lib/line/time/laplace-grid";
import { lineSpectrum } from "@/lib/line/time/line-spectrum";
import type { Spectrum } from "@/lib/line/time/spectrum";
import { runSpectrum } from "@/lib/line/time/run-spectrum";
import { portAt, prepareRun, walk } from "@/lib/line/walk";
import { anyElement, anyModel, anyRun } from "@/tests/support/arbitrary-run";
import { cable, ohm, rope, run as runInto } from "@/tests/support/lossy-run";
import fc from "@/tests/support/property";

const run = (elements: Element[], load: Termination = ohm(50), source: Termination = ohm(50)) =>
  runInto(elements, load, source);

/** A few places of a real grid, from its lowest to its highest. */
function places(windowS: number): LaplaceGrid {
  const grid = laplaceGrid({ windowS, points: 2 }, windowS / 100, "sineSquared");
  const omega = Float64Array.of(0, 1, 7, 100, 900, 2048).map((k) => grid.omega[k]!);
  return { ...grid, omega, count: omega.length };
}

const anyWindow = fc.double({ min: -8, max: -4, noNaN: true }).map((power) => 10 ** power);
const at = ({ re, im }: Spectrum, k: number): Complex => ({ re: re[k]!, im: im[k]! });
const near = (got: Complex, expected: Complex, part: number) =>
  expect(abs(subtract(got, expected))).toBeLessThanOrEqual(part * abs(expected) + 1e-300);

test("a metre of cable over a grid is what it is at each s", () => {
  fc.assert(
    fc.property(anyModel, anyWindow, (model, windowS) => {
      const grid = places(windowS);
      const { gamma, zc, yc } = lineSpectrum(model, grid);
      grid.omega.forEach((im, k) => {
        const expected = propagation(model, { re: grid.damping, im });
        near(at(gamma, k), expected.gamma, 1e-12);
        near(at(zc, k), expected.zc, 1e-12);
        near(multiply(at(zc, k), at(yc, k)), { re: 1, im: 0 }, 1e-12);
      });
    }),
  );
});

/** What has a signal: no reactance and no Q that is the same at every frequency. */
function withSignal(circuit: Circuit): Circuit {
  const real = (end: Termination): Termination => (end.kind === "constant" ? { ...end, imOhm: 0 } : end);
  const elements = circuit.elements.map((element): Element => {
    if (element.kind === "part" && element.q !== undefined) return { ...element, qAtHz: 1e7 };
    if (element.kind !== "stub" || typeof element.end === "string") return element;
    return { ...element, end: real(element.end) };
  });
  return { ...circuit, elements, source: real(circuit.source), load: real(circuit.load) };
}

test("voltages at every plane are those of the walk at each s", () => {
  fc.assert(
    fc.property(anyRun, fc.array(anyElement, { maxLength: 12 }), anyWindow, (run, more, windowS) => {
      const circuit = withSignal({ ...run, elements: [...run.elements, ...more] });
      const grid = places(windowS);
      const planes = Array.from({ length: circuit.elements.length + 1 }, (_, n) => n);
      const got = runSpectrum(circuit, planes, grid);
      const prepared = prepareRun(circuit);
      grid.omega.forEach((im, k) => {
        const walked = walk(prepared, { re: grid.damping, im });
        let away = 0;
        for (const plane of planes) {
          const v = divide(multiply(portAt(walked, plane).v, walked.source.i), walked.drive);
          near(at(got[plane]!, k), scale(v, Math.exp(-away)), 1e-8);
          away += walked.scales[plane] ?? 0;
        }
      });
    }),
    { numRuns: 200 },
  );
});

describe("limits", () => {
  const grid = places(1e-6);
  const sizes = (of: Spectrum) => Array.from(of.re, (re, k) => Math.hypot(re, of.im[k]!));

  test("a dead short or an opening in the line leaves nothing behind it, and all in front of it", () => {
    for (const stop of [
      { kind: "shunt", termination: { kind: "short" } },
      { kind: "part", connection: "shunt", rOhm: 0 },
      { kind: "stub", connection: "shunt", end: "short", line: { model: rope }, lengthM: 0 },
    ] satisfies Element[]) {
      const [source, behind, load] = runSpectrum(run([cable(5), stop, cable(5)]), [0, 1, 3], grid);
      const [alone] = runSpectrum(run([cable(5)], { kind: "short" }), [0], grid);
      expect([...sizes(behind!), ...sizes(load!)]).toEqual(new Array(12).fill(0));
      expect([...source!.re]).toEqual([...alone!.re]);
    }
    const gap: Element = { kind: "stub", connection: "series", end: "open", line: { model: rope }, lengthM: 0 };
    const [source, load] = runSpectrum(run([cable(5), gap, cable(5)]), [0, 3], grid);
    expect([...source!.re]).toEqual([...runSpectrum(run([cable(5)], { kind: "open" }), [0], grid)[0]!.re]);
    expect(sizes(load!)).toEqual(new Array(6).fill(0));
  });

  test("a run of any loss stays finite and tends to nothing", () => {
    const [load] = runSpectrum(
      run(
        Array.from({ length: 150 }, () => cable(400)),
        ohm(50),
      ),
      [150],
      grid,
    );
    for (const size of sizes(load!)) expect(size).toBeLessThan(1e-12);
  });

  test("a long chain of crass mismatches does not overflow", () => {
    const wide = { ...rope, lInfHPerM: rope.lInfHPerM * 1e4, cFPerM: rope.cFPerM * 1e-4 };
    const elements = Array.from({ length: 200 }, (_, n): Element => ({
      kind: "cable",
      line: { model: n % 2 === 0 ? rope : wide },
      lengthM: 1,
    }));
    for (const each of runSpectrum(run(elements), [0, 100, 200], grid))
      for (const size of sizes(each)) expect(size).toBeLessThan(2);
  });

  test("no elements at all: the load is at the source", () => {
    const [source, load] = runSpectrum(run([], ohm(150)), [0, 0], grid);
    sizes(source!).forEach((size) => expect(size).toBeCloseTo(0.75, 12));
    expect([...load!.re]).toEqual([...source!.re]);
  });
});

test.each<[string, () => unknown]>([
  ["imOhm", () => run([cable(1)], ohm(50, 1))],
  [
    "sampled",
    () => run([cable(1)], { kind: "sampled", referenceOhm: 50, frequenciesHz: [1], reflection: { re: [0], im: [0] } }),
  ],
  ["Q that holds at every frequency", () => run([{ kind: "part", connection: "series", lH: 1e-6, q: 9 }])],
  ["source must not be open", () => run([cable(1)], ohm(50), { kind: "open" })],
  ["lengthM must be at least 0", () => run([cable(-1)])],
  ["paralleled must be a whole number", () => run([{ ...cable(1), paralleled: 1.5 } as Element])],
  [
    "skinCornerRadPerS must be positive",
    () =>
      run([{ kind: "cable", line: { model: { ...rope, conductors: [{ form: "round", r0OhmPerM: 1 }] } }, lengthM: 1 }]),
  ],
  ["needs a referenceOhm", () => run([{ kind: "joint", lossDb: 1 }], ohm(50), { kind: "short" })],
  ["lossDb must be at least 0", () => run([{ kind: "joint", lossDb: -1, referenceOhm: 50 }])],
  ["exactly one of rOhm, lH and cF", () => run([{ kind: "part", connection: "series" }])],
])("refuses what has no signal or cannot be: %s", (message, circuit) => {
  expect(() => runSpectrum(circuit() as Circuit, [0], places(1e-6))).toThrow(message);
});
