/** Whether a run keeps its targets, and what to say about it. Pure. */
import type { Analysis } from "@/lib/runs/analysis";
import type { Target } from "@/lib/runs/schema";

/** The quantities that can be worked out now; a target on any other is shown as not worked out. */
export const judged = ["loss", "returnLoss", "vswr", "voltage"] as const;
export type Judged = (typeof judged)[number];

export interface Verdict {
  target: Target;
  /** null: cannot be worked out */
  value: number | null;
  frequencyHz: number | null;
  isMet: boolean | null;
}

function atLoad(target: Target): boolean {
  return target.plane !== undefined && "at" in target.plane && target.plane.at === "load";
}

/** The value that decides, at its worst over the run's band. Targets on inner planes are not judged here. */
function deciding(target: Target, { worst, wave }: Analysis): { value: number; frequencyHz: number | null } | null {
  if (target.plane && !("at" in target.plane)) return null;
  const load = atLoad(target);
  const found = {
    loss: worst.loss,
    returnLoss: load ? worst.loadReturnLoss : worst.sourceReturnLoss,
    vswr: load ? worst.loadVswr : worst.sourceVswr,
    voltage: wave && { value: wave.maxVoltageV * Math.SQRT2, frequencyHz: null },
  }[target.quantity as Judged];
  return found ?? null;
}

export function verdict(target: Target, analysis: Analysis): Verdict {
  const found = deciding(target, analysis);
  if (!found || Number.isNaN(found.value)) return { target, value: null, frequencyHz: null, isMet: null };
  const { atLeast = -Infinity, atMost = Infinity } = target;
  return { target, ...found, isMet: found.value >= atLeast && found.value <= atMost };
}

export function verdicts(targets: readonly Target[], analysis: Analysis): Verdict[] {
  return targets.map((target) => verdict(target, analysis));
}

/** Whether a return-loss limit at the source would notice that the load is missing or shorted. */
export interface Masking {
  limitDb: number;
  /** what the sweep reads with nothing there */
  openDb: number;
  shortDb: number;
  isBlind: boolean;
}

export function masking(targets: readonly Target[], analysis: Analysis): Masking | null {
  const limit = targets.find((t) => t.quantity === "returnLoss" && !atLoad(t) && t.atLeast !== undefined)?.atLeast;
  if (limit === undefined) return null;
  const { openDb, shortDb } = analysis.masking;
  return { limitDb: limit, openDb, shortDb, isBlind: Math.max(openDb, shortDb) >= limit };
}
