/** Engine speed: a sweep against the same written with mathjs, the Line view, the matches. */
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Line } from "@/lib/line/element";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { shortlist } from "@/lib/line/match/shortlist";
import { movedResponse } from "@/lib/line/moved-response";
import { sweep } from "@/lib/line/run";
import { analyseRun } from "@/lib/runs/analysis";
import { withNumpy } from "@/tests/bench/numpy";
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

interface Theirs {
  ms: number;
  returnLossDb: number;
  lossDb: number;
}

/** Return loss and loss alone, by the columns that draws are swept with; the whole sweep answers eight figures more. */
function sweepTwo(): [Float64Array, Float64Array] {
  const found: [Float64Array, Float64Array] = [new Float64Array(1001), new Float64Array(1001)];
  movedResponse(circuit, [], frequencies).respond([], ...found, 0);
  return found;
}

function benchWithNumpy(): void {
  const theirs = withNumpy<Theirs>("sweep.py");
  const [returnLoss, loss] = sweepTwo();
  if (
    theirs &&
    !(Math.abs(returnLoss[500]! - theirs.returnLossDb) < 1e-6 && Math.abs(loss[500]! - theirs.lossDb) < 1e-6)
  )
    throw new Error("the sweeps differ");
  const two = medianMs(sweepTwo, 41, 10);
  const whole = medianMs(() => sweep(circuit, frequencies), 41, 10);
  const beside = (ours: number) => (theirs ? [ms(theirs.ms), times(theirs.ms / ours)] : ["no numpy"]);
  row("Sweep, 1,001 points × 5 cables, return loss and loss; numpy", ms(two), ...beside(two));
  row("  every figure, exact group delay too; numpy's two figures", ms(whole), ...beside(whole));
  for (const points of [1001, 2001, 4001, 8001]) {
    const some = Float64Array.from({ length: points }, (_, i) => 440e6 + (i * 24e6) / (points - 1));
    const time = medianMs(() => sweep(circuit, some), 9);
    row(`  ${points} points`, ms(time), `${((1e3 * time) / points).toFixed(2)} µs a point`);
  }
}

export function benchEngine(): void {
  checkAgreement();
  benchWithNumpy();
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
  const lines = (count: number) => Array.from({ length: count }, (_, i) => line(20 + (130 * i) / count, 0.8));
  const job = { ...asked, load, feeder: two[0]!, notchHz: 40e6 };
  const tolerance = { lengthM: 0.005, valuePercent: 5 };
  const matches = (what: string, request: MatchRequest, rounds: number) =>
    row(`All 14 ways to match, ${what}`, ms(medianMs(() => findMatches(request), rounds, 1)));
  matches("2 cables", { ...job, lines: two }, 15);
  matches("24 cables", { ...job, lines: lines(24) }, 5);
  matches("24 cables, limits and yields of 500 draws", { ...job, lines: lines(24), tolerance }, 3);
  matches("200 cables", { ...job, lines: lines(200) }, 3);
  const many = lines(20_000);
  row("Of 20,000 cables the 60 nearest to what a match needs", ms(medianMs(() => shortlist(many, job, 60), 5, 1)));
}
