/** Speed of the time domain: beside numpy and a circuit simulator where this machine has them, and how cost grows. */
import { execFileSync } from "node:child_process";
import path from "node:path";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Line } from "@/lib/line/element";
import { lattice } from "@/lib/line/time/lattice";
import { timeResponse } from "@/lib/line/time/time-response";
import { medianMs, ms, row, times } from "@/tests/bench/timing";
import fixture from "@/tests/fixtures/line/circuit-simulator-transients.json";
import { raisedCosineSource, simulatorInstalled, transient } from "@/tests/support/simulator";

const r0OhmPerM = 0.168;
const skinCornerRadPerS = 8.4e5;
const lossTangent = 8e-4;
const shown = { windowS: 6e-6, points: 2049 };
const drive = { kind: "step", amplitudeV: 1, riseS: 50e-9 } as const;

function pair(z0: number): Line {
  const conductors = [{ form: "round" as const, r0OhmPerM, skinCornerRadPerS }];
  return { model: modelFromNominal({ z0, velocityFactor: 0.67, lossTangent, conductors }) };
}

/** Cables of five kinds one after the other, so that every line is worked out. */
function run(count: number): Circuit {
  const kinds = [100, 101, 102, 103, 104].map(pair);
  return {
    source: { kind: "constant", reOhm: 100, imOhm: 0 },
    elements: Array.from({ length: count }, (_, n) => ({ kind: "cable", line: kinds[n % 5]!, lengthM: (n % 7) + 20 })),
    load: { kind: "constant", reOhm: 150, imOhm: 0 },
  };
}

const oursMs = (circuit: Circuit, points: number = shown.points) =>
  medianMs(() => timeResponse(circuit, drive, { ...shown, points }), 41, 20);

/** The same by numpy, or undefined where this machine has none; both must agree, or the ratio means nothing. */
function numpyMs(circuit: Circuit): number | undefined {
  const cables = circuit.elements.map((element) => {
    if (element.kind !== "cable") throw new Error("cables only");
    const { lInfHPerM: l, cFPerM: c } = element.line.model;
    return { r0: r0OhmPerM, corner: skinCornerRadPerS, l, c, tan: lossTangent, length: element.lengthM };
  });
  const { windowS: window, points } = shown;
  const input = JSON.stringify({ cables, source: 100, load: 150, rise: drive.riseS, window, points, rounds: 41 });
  let text: string;
  try {
    const env = { ...process.env, OMP_NUM_THREADS: "1", OPENBLAS_NUM_THREADS: "1" };
    const stdio: ["pipe", "pipe", "ignore"] = ["pipe", "pipe", "ignore"];
    text = execFileSync("python3", [path.join(import.meta.dirname, "step.py")], {
      input,
      env,
      stdio,
      encoding: "utf8",
    });
  } catch {
    return undefined;
  }
  const theirs = JSON.parse(text) as { ms: number; load: number[] };
  const load = timeResponse(circuit, drive, shown).planes[1]!.values;
  theirs.load.forEach((value, n) => {
    if (!(Math.abs(value - load[n]!) < 1e-9)) throw new Error(`the step responses differ: ${value} and ${load[n]}`);
  });
  return theirs.ms;
}

/** A transient of as many steps as we show, the simulator's own start taken off. */
function benchSimulator(): void {
  const { netlist, nodes, riseS, windowS, circuit, planes } = fixture.cases[0]!;
  const edge = { kind: "step", amplitudeV: 1, riseS, edge: "raisedCosine" } as const;
  const own = medianMs(() => timeResponse(circuit as Circuit, edge, { windowS, points: 2049 }, { planes }), 41, 20);
  if (!simulatorInstalled()) return row("Step with a stub, a coil and RC, 4,096 points", ms(own));
  const source = raisedCosineSource("V1", "e", 1, riseS);
  const start = medianMs(() => transient(["V1 e 0 1", "R1 e 0 1"], ["e"], windowS, windowS), 5, 1);
  const whole = medianMs(() => transient([...source, ...netlist], nodes, windowS / 2048, windowS), 5, 1);
  const theirs = whole - start;
  row("Step with a stub, a coil and RC; a simulator's transient", ms(own), ms(theirs), times(theirs / own));
}

export function benchStep(): void {
  for (const count of [1, 5]) {
    const circuit = run(count);
    const ours = oursMs(circuit);
    const theirs = numpyMs(circuit);
    const what = `Step response, 4,096 points × ${count} ${count === 1 ? "cable" : "cables"}; numpy`;
    if (theirs === undefined) row(what, ms(ours), "no numpy");
    else row(what, ms(ours), ms(theirs), times(theirs / ours));
  }
  benchSimulator();
  const long = { ...shown, windowS: 100e-6 };
  const byPoints = [4, 8, 16].map((n) => {
    const windowS = (long.windowS * n) / 16;
    return medianMs(() => timeResponse(run(5), drive, { windowS, points: 512 * n + 1 }), 11, 3);
  });
  row("5 cables over 500, 1,000 and 2,000 edges", ...byPoints.map(ms));
  row("10, 20 and 40 cables", ...[10, 20, 40].map((count) => ms(oursMs(run(count)))));
  row("Lattice of 5 cables", ms(medianMs(() => lattice(run(5), drive, shown.windowS), 11, 3)));
}
