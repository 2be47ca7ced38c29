/** Tolerance of a run, in the shape of the wire. Pure. */
import type { z } from "zod";
import { frequenciesOf } from "@/lib/compute/frequencies";
import type { ToleranceAsked, toleranceAnswerSchema } from "@/lib/compute/tolerance/schema";
import { wireNumber, wireNumbers } from "@/lib/compute/wire";
import type { Circuit } from "@/lib/line/element";
import type { Percentiles } from "@/lib/line/order-statistics";
import { tolerance, type Extremes, type ToleranceResult } from "@/lib/line/tolerance";

/** @throws RangeError where the engine refuses */
export function toleranceAnswer(
  circuit: Circuit,
  asked: Omit<ToleranceAsked, "circuit">,
): z.infer<typeof toleranceAnswerSchema> {
  return wireTolerance(tolerance({ ...asked, circuit, frequencies: frequenciesOf(asked) }));
}

export function wireTolerance(result: ToleranceResult): z.infer<typeof toleranceAnswerSchema> {
  const { corners } = result;
  return {
    frequenciesHz: Array.from(result.frequencies),
    returnLossDb: wireShares(result.returnLossDb),
    transducerLossDb: wireShares(result.transducerLossDb),
    ...(corners && {
      corners: {
        returnLossDb: wireExtremes(corners.returnLossDb),
        transducerLossDb: wireExtremes(corners.transducerLossDb),
      },
    }),
    yieldPercent: wireNumber(result.yieldPercent),
    targetPercents: wireNumbers(result.targetPercents),
    contributors: result.contributors.map((each) => ({
      path: each.path,
      effectDb: wireNumber(each.effectDb),
      returnLossEffectDb: wireNumber(each.returnLossEffectDb),
      transducerLossEffectDb: wireNumber(each.transducerLossEffectDb),
    })),
  };
}

function wireShares({ min, p05, median, p95, max }: Percentiles) {
  return {
    min: wireNumbers(min),
    p05: wireNumbers(p05),
    median: wireNumbers(median),
    p95: wireNumbers(p95),
    max: wireNumbers(max),
  };
}

function wireExtremes({ min, max }: Extremes) {
  return { min: wireNumbers(min), max: wireNumbers(max) };
}
