/** Runs of lossless and of constant resistance against a general circuit simulator; netlists and their origin stand in the fixture. */
import { expect, test } from "vitest";
import type { Circuit } from "@/lib/line/element";
import { sweep } from "@/lib/line/run";
import fixture from "@/tests/fixtures/line/circuit-simulator.json";
import { closeTo } from "@/tests/support/tolerance";

/** The simulator wrote twelve digits; the last three are left to its own solution of the node equations. */
const written = (value: number[]) => {
  const size = Math.hypot(...value);
  return { value, rel_tolerance: 0, abs_tolerance: 1e-9 * size };
};

test.each(fixture.cases)("a circuit simulator sees the same impedance and voltage: $title", ({ circuit, points }) => {
  const frequencies = points.map(({ frequency_hz }) => frequency_hz);
  const { inputImpedance, loadVoltage } = sweep(circuit as Circuit, frequencies);
  points.forEach(({ frequency_hz, input_ohm, load_v }, k) => {
    const input = [inputImpedance.re[k]!, inputImpedance.im[k]!];
    closeTo(input, written(input_ohm), `input impedance at ${frequency_hz} Hz`);
    closeTo([loadVoltage.re[k]!, loadVoltage.im[k]!], written(load_v), `voltage at ${frequency_hz} Hz`);
  });
  expect(points.length).toBeGreaterThan(6);
});
