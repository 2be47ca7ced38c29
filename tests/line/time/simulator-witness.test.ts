/**
 * Runs with stubs, parts, pads, transformers and lines of constant resistance against a general circuit simulator: its
 * recorded voltages always, the simulator itself where it is installed.
 */
import { describe, expect, test } from "vitest";
import type { Circuit } from "@/lib/line/element";
import { valueAt } from "@/lib/line/time/signal";
import { timeResponse } from "@/lib/line/time/time-response";
import fixture from "@/tests/fixtures/line/circuit-simulator-transients.json";
import { raisedCosineSource, readTransient, simulatorInstalled, transient } from "@/tests/support/simulator";
import { closeTo } from "@/tests/support/tolerance";

type Case = (typeof fixture.cases)[number];

/** Voltages at the case's nodes and times. */
function ours({ circuit, riseS, windowS, planes, timesS }: Case): number[][] {
  const drive = { kind: "step", amplitudeV: 1, riseS, edge: "raisedCosine" } as const;
  const response = timeResponse(circuit as Circuit, drive, { windowS, points: 2049 }, { planes });
  return response.planes.map((signal) => timesS.map((t) => valueAt(signal, t)));
}

describe("recorded", () => {
  test.each(fixture.cases)("$title", (witness) => {
    closeTo(ours(witness), { value: witness.volts, rel_tolerance: 0, abs_tolerance: 2e-4 }, witness.title);
    expect(witness.timesS.length).toBe(40);
  });
});

describe.skipIf(!simulatorInstalled())("live", () => {
  test.each(fixture.cases)(
    "$title",
    (witness) => {
      const { netlist, nodes, riseS, stepS, windowS, timesS } = witness;
      const ran = transient([...raisedCosineSource("V1", "e", 1, riseS), ...netlist], nodes, stepS, windowS);
      const theirs = ran.volts.map((volts) => timesS.map((t) => readTransient(ran, volts, t)));
      closeTo(ours(witness), { value: theirs, rel_tolerance: 0, abs_tolerance: 2e-4 }, witness.title);
    },
    60_000,
  );
});
