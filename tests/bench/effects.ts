/** What a revision does to 200 runs, against the 400 sweeps it cannot do without. */
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit } from "@/lib/line/element";
import { sweepPrepared } from "@/lib/line/run";
import { prepareRun } from "@/lib/line/walk";
import { effectsAnswer, type RunBothWays } from "@/lib/runs/effects/answer";
import { bandFrequencies } from "@/lib/runs/shown";
import { ms, pairedMs, row, times } from "@/tests/bench/timing";

const conductors = [{ form: "sqrt" as const, r0OhmPerM: 0.0086, skinCornerRadPerS: 1.11e5 }];
const bandHz = [440e6, 464e6] as const;

function circuit(lengthM: number, velocityFactor: number): Circuit {
  const line = { model: modelFromNominal({ z0: 50, velocityFactor, conductors, lossTangent: 1.5e-4 }) };
  const jumper = { kind: "cable" as const, line, lengthM: 1.5 };
  const joint = { kind: "joint" as const, lossDbAtOneGhz: 0.05 };
  return {
    source: { kind: "constant", reOhm: 50, imOhm: 0 },
    elements: [joint, jumper, joint, { kind: "cable", line, lengthM }, joint, jumper, joint],
    load: { kind: "constant", reOhm: 75, imOhm: 0 },
  };
}

const runs: RunBothWays[] = Array.from({ length: 200 }, (_, i) => ({
  about: {
    ...{ runId: `${i}`, number: `R${i}`, name: "Feeder", state: "draft", ownerName: "Somebody" },
    ...{ revisions: [1], isAffected: false },
  },
  conditions: { designHz: 452e6, bandHz, availablePowerW: 25, temperatureC: 20 },
  targets: [
    { quantity: "loss", atMost: 2.2 },
    { quantity: "returnLoss", atLeast: 14 },
  ],
  now: circuit(20 + i, 0.85),
  then: circuit(20 + i, 0.86),
}));

function sweeps(): void {
  for (const { now, then } of runs)
    for (const each of [now, then])
      sweepPrepared(prepareRun(each, 20), bandFrequencies(each, bandHz), [{ at: "load" }]);
}

export function benchEffects(): void {
  const uses = { cableId: "x", designation: "X", revision: 2, total: runs.length };
  const [ours, theirs] = pairedMs(() => effectsAnswer(uses, runs), sweeps);
  row("Effect of a revision on 200 runs; the 400 sweeps alone (aim 2 ×)", ms(ours), ms(theirs), times(ours / theirs));
}
