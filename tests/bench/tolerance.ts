/** Tolerance: 2,000 draws of five cables at 101 frequencies, beside the same with numpy; and how it grows. */
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit } from "@/lib/line/element";
import type { Spread } from "@/lib/line/spread";
import { tolerance } from "@/lib/line/tolerance";
import { withNumpy } from "@/tests/bench/numpy";
import { medianMs, ms, row, times } from "@/tests/bench/timing";

const lengths = [1.5, 20, 48, 3, 1.5];
const frequencies = Array.from({ length: 101 }, (_, k) => 440e6 + k * 240e3);

function circuitOf(elements: number): Circuit {
  const conductors = [{ form: "sqrt" as const, r0OhmPerM: 0.0086, skinCornerRadPerS: 1.11e5 }];
  const model = (n: number) => modelFromNominal({ z0: 50 + n, velocityFactor: 0.85, conductors, lossTangent: 1.5e-4 });
  return {
    source: { kind: "constant", reOhm: 50, imOhm: 0 },
    elements: Array.from({ length: elements }, (_, n) => ({
      kind: "cable",
      line: { model: model(n % 5) },
      lengthM: lengths[n % 5]!,
    })),
    load: { kind: "constant", reOhm: 75, imOhm: -10 },
  };
}

const percents = { z0Percent: 2, velocityFactorPercent: 1, lossPercent: 5 };
type Moving = keyof typeof percents;

function spreadOf(elements: number, moving: readonly Moving[]): Spread[] {
  return Array.from({ length: elements }, (_, n) => n).flatMap((n): Spread[] => {
    const length = lengths[n % 5]!;
    return [
      { path: `elements.${n}.lengthM`, limits: [length - 0.01, length + 0.01] },
      ...moving.map((each): Spread => ({ path: `elements.${n}.${each}`, limits: [-percents[each], percents[each]] })),
    ];
  });
}

const job = (draws: number, elements: number, moving: readonly Moving[]) =>
  tolerance({ circuit: circuitOf(elements), frequencies, spread: spreadOf(elements, moving), draws, seed: 1 });

const jobs: [string, Moving[]][] = [
  ["lengths move", []],
  ["lengths, Z0 and VF move", ["z0Percent", "velocityFactorPercent"]],
  ["lengths, Z0, VF and loss move", ["z0Percent", "velocityFactorPercent", "lossPercent"]],
];

interface Theirs {
  ms: number;
  returnLossDb: number;
  lossDb: number;
}

/** Both do the same work, or the ratio means nothing; the draws are others, so medians differ by chance. */
function checkAgreement(moving: Moving[], { returnLossDb, lossDb }: Theirs): void {
  const ours = job(2000, 5, moving);
  if (!(Math.abs(ours.returnLossDb.median[50]! - returnLossDb) < 0.5)) throw new Error("the return losses differ");
  if (!(Math.abs(ours.transducerLossDb.median[50]! - lossDb) < 0.01)) throw new Error("the losses differ");
}

export function benchTolerance(): void {
  const theirs = withNumpy<Theirs[]>("tolerance.py");
  jobs.forEach(([what, moving], index) => {
    const other = theirs?.[index];
    if (other) checkAgreement(moving, other);
    const ours = medianMs(() => job(2000, 5, moving), 9);
    const beside = other ? [ms(other.ms), times(other.ms / ours)] : ["no numpy"];
    row(`Tolerance, 2,000 draws × 101 points × 5 cables; ${what}; numpy`, ms(ours), ...beside);
  });
  const moving = jobs[1]![1];
  for (const draws of [1000, 2000, 4000, 8000]) {
    const time = medianMs(() => job(draws, 5, moving), 5, 1);
    row(`  ${draws} draws of 5 cables`, ms(time), `${((1e3 * time) / draws).toFixed(1)} µs a draw`);
  }
  for (const elements of [5, 10, 20, 40]) {
    const time = medianMs(() => job(1000, elements, moving), 5, 1);
    row(`  1000 draws of ${elements} cables`, ms(time), `${((1e3 * time) / 1000 / elements).toFixed(1)} µs a cable`);
  }
}
