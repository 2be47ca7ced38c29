/** Matched loss of 10,000 cables at three frequencies, beside the same with numpy. */
import { attenuations } from "@/lib/line/attenuation";
import { modelFromNominal } from "@/lib/line/cable";
import { withNumpy } from "@/tests/bench/numpy";
import { medianMs, ms, row, times } from "@/tests/bench/timing";

const frequencies = [1e7, 1e8, 1e9];
const models = Array.from({ length: 10_000 }, (_, n) =>
  modelFromNominal({
    z0: 50 + (n % 50),
    velocityFactor: 0.66 + (n % 7) * 0.03,
    lossTangent: 1e-4 * (1 + (n % 9)),
    conductors: [{ form: "sqrt", r0OhmPerM: 0.01 + (n % 100) * 1e-3, skinCornerRadPerS: 1e5 + n }],
  }),
);

export function benchMatchedLoss(): void {
  const theirs = withNumpy<{ ms: number; sum: number }>("matched-loss.py");
  const sum = attenuations(models, frequencies).reduce((all, each) => all + each, 0);
  if (theirs && !(Math.abs(sum / theirs.sum - 1) < 1e-9)) throw new Error("the attenuations differ");
  const ours = medianMs(() => attenuations(models, frequencies), 25);
  const beside = theirs ? [ms(theirs.ms), times(theirs.ms / ours)] : ["no numpy"];
  row("Matched loss of 10,000 cables at 3 frequencies; numpy", ms(ours), ...beside);
}
