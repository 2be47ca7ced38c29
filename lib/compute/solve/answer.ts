/** A value that keeps the targets, in the shape of the wire, with its reasons in words. Pure. */
import type { z } from "zod";
import { frequenciesOf } from "@/lib/compute/frequencies";
import type { SolveAsked, solveAnswerSchema } from "@/lib/compute/solve/schema";
import { wireNumber, wireNumbers } from "@/lib/compute/wire";
import type { Circuit } from "@/lib/line/element";
import { solve, type Solution } from "@/lib/line/solve";

/** @throws RangeError where the engine refuses */
export function solveAnswer(circuit: Circuit, asked: Omit<SolveAsked, "circuit">): z.infer<typeof solveAnswerSchema> {
  const solution = solve({ ...asked, circuit, frequencies: frequenciesOf(asked) });
  const { value, binds, looked, gap, margins } = solution;
  return {
    value: value === null ? null : wireNumber(value),
    binds,
    why: whyOf(solution, asked),
    assumed: `The range was looked at with ${looked} values, at most ${Number(gap.toPrecision(3))} apart. Nothing was assumed to rise or fall steadily; a stretch that lies wholly between two of them may not have been seen.`,
    margins: wireNumbers(margins),
  };
}

function whyOf({ value, binds, neverMet }: Solution, { targets, want }: Pick<SolveAsked, "targets" | "want">): string {
  if (value !== null && binds === null) return "All targets hold up to the end of the range.";
  if (value !== null)
    return `Beyond this value the target on ${targets[binds!]!.quantity} fails${want === "smallest" ? ", going down" : ""}.`;
  if (neverMet === null) return "Each target holds somewhere in the range, but nowhere all of them.";
  return `The target on ${targets[neverMet]!.quantity} holds nowhere in the range.`;
}
