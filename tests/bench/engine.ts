/** Engine speed: a sweep against the same written with mathjs, the Line view, the matches. */
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Line } from "@/lib/line/element";
import { findMatches } from "@/lib/line/match/find-matches";
import { sweep } from "@/lib/line/run";
import { analyseRun } from "@/lib/runs/analysis";
import { sweepWithMathjs } from "@/tests/bench/with-mathjs";
import { medianMs, ms, pairedMs, row, times } from "@/tests/bench/timing";

function line(z0: number, velocityFactor: number): Line {
  const conductors = [{ form: "sqrt" as const, r0OhmPerM: 0.0086, skinCornerRadPerS: 1.11e5 }];
  return { model: modelFromNominal({ z0, velocityFactor, conductors, lossTangent: 1.5e-4 }) };
}

const lengths = [1.5, 20, 48, 3, 1.5];
const circuit: Circuit = {
  source: { kind: "constant", reOhm: 50, imOhm: 0 },
  elements: lengths.map((lengthM, i) => ({ kind: "cable", line: line(50 + i, 0.85), lengthM })),
  load: { kind: "constant", reOhm: 75, imOhm: -10 },
};
const frequencies = Float64Array.from({ length: 1001 }, (_, i) => 440e6 + i * 24e3);

/** Both do the same work, or the ratio means nothing. */
function checkAgreement(): void {
  const ours = sweep(circuit, frequencies);
  const theirs = sweepWithMathjs(circuit, frequencies);
  const keys = ["returnLossDb", "vswr", "transducerLossDb", "matchedLossDb", "mismatchLossDb", "extraLossDb"] as const;
  for (const key of keys)
    theirs.forEach((at, k) => {
      if (!(Math.abs(at[key] - ours[key][k]!) < 1e-6))
        throw new Error(`${key} differs: ${at[key]} and ${ours[key][k]}`);
    });
  theirs.forEach(({ groupDelayS }, k) => {
    if (!(Math.abs(groupDelayS / ours.groupDelayS[k]! - 1) < 1e-3)) throw new Error("the group delays differ");
  });
}

export function benchEngine(): void {
  checkAgreement();
  const [ours, theirs] = pairedMs(
    () => sweep(circuit, frequencies),
    () => sweepWithMathjs(circuit, frequencies),
  );
  row("Sweep, 1,001 points × 5 cables; the same with mathjs objects", ms(ours), ms(theirs), times(theirs / ours));
  const conditions = { designHz: 452e6, bandHz: [450e6, 454e6] as const, availablePowerW: 25, temperatureC: 20 };
  row(
    "Line view, engine share of a key press, 1,001 points",
    ms(medianMs(() => analyseRun(circuit, conditions))),
    "aim 8 ms",
  );
  const asked = { targetOhm: 50, designHz: 27.2e6, bandHz: [26.9e6, 27.5e6] as const, returnLossDb: 14 };
  const load = { kind: "constant" as const, reOhm: 22, imOhm: -35 };
  const two = [line(50, 0.85), line(93, 0.84)];
  const many = Array.from({ length: 24 }, (_, i) => line(45 + 3 * i, 0.8));
  row("All matches from 2 cables", ms(medianMs(() => findMatches({ ...asked, load, feeder: two[0]!, lines: two }))));
  row(
    "All matches from 24 cables",
    ms(medianMs(() => findMatches({ ...asked, load, feeder: two[0]!, lines: many }), 5, 1)),
  );
}
