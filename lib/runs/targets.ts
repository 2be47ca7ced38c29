/** Whether a run keeps its targets, and what to say about it. Pure. */
import type { Analysis } from "@/lib/runs/analysis";
import type { Target } from "@/lib/runs/schema";

/** What a target is judged by: less than all the Line view shows. */
export type Judgeable = Pick<Analysis, "band" | "worst" | "worstOver" | "wave">;

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

/** The band a target is judged over: its own, else the run's. */
export function bandOf(target: Target, analysis: Pick<Judgeable, "band">): readonly [number, number] {
  return target.bandHz ?? analysis.band;
}

/** The value that decides, at its worst over the target's band. Targets on inner planes are not judged here. */
function deciding(target: Target, analysis: Judgeable): { value: number; frequencyHz: number | null } | null {
  if (target.plane && !("at" in target.plane)) return null;
  const load = atLoad(target);
  const { band } = analysis;
  const [from, to] = bandOf(target, analysis);
  const worst = () => (from === band[0] && to === band[1] ? analysis.worst : analysis.worstOver([from, to]));
  switch (target.quantity) {
    case "loss":
      return worst().loss;
    case "returnLoss":
      return load ? worst().loadReturnLoss : worst().sourceReturnLoss;
    case "vswr":
      return load ? worst().loadVswr : worst().sourceVswr;
    case "voltage":
      return analysis.wave && { value: analysis.wave.maxVoltageV * Math.SQRT2, frequencyHz: null };
    default:
      return null;
  }
}

export function verdict(target: Target, analysis: Judgeable): Verdict {
  const found = deciding(target, analysis);
  if (!found || Number.isNaN(found.value)) return { target, value: null, frequencyHz: null, isMet: null };
  const { atLeast = -Infinity, atMost = Infinity } = target;
  return { target, ...found, isMet: found.value >= atLeast && found.value <= atMost };
}

export function verdicts(targets: readonly Target[], analysis: Judgeable): Verdict[] {
  return targets.map((target) => verdict(target, analysis));
}

/** Whether a return-loss limit at the source would notice that the load is missing or shorted. */
export interface Masking {
  limitDb: number;
  /** the least the sweep reads with nothing there, and with a short */
  openDb: number;
  shortDb: number;
  isOpenUnseen: boolean;
  isShortUnseen: boolean;
}

export function masking(targets: readonly Target[], analysis: Analysis): Masking | null {
  const limit = targets.find((t) => t.quantity === "returnLoss" && !atLoad(t) && t.atLeast !== undefined)?.atLeast;
  if (limit === undefined) return null;
  const { openDb, shortDb } = analysis.masking;
  return { limitDb: limit, openDb, shortDb, isOpenUnseen: openDb >= limit, isShortUnseen: shortDb >= limit };
}
