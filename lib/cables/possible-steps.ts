/** What may be done with an entry, step by step, and why not: what the entry's page offers. Pure. */
import { cannotTake, type LifeStep } from "@/lib/cables/lifecycle";
import { isUsable } from "@/lib/cables/model";
import type { CableState } from "@/lib/cables/schema";

export type PossibleStep =
  | "revise"
  | "submit"
  | "takeBack"
  | "prefer"
  | "unprefer"
  | "waive"
  | Exclude<LifeStep, "submit" | "approve" | "return">;

export interface EntryStanding {
  /** the revision people see */
  current: { revision: number; version: number; state: CableState; preferred: boolean };
  /** the revision being worked on or reviewed, where the reader may see it */
  open: { revision: number; version: number; state: CableState; isOwn: boolean; wasSubmitted: boolean } | null;
  /** whether one is open, whoever may see it */
  hasOpen: boolean;
  mayPropose: boolean;
  mayReview: boolean;
  mayReport: boolean;
}

/** A step with why it cannot be taken now, a sentence; null where it can. */
export interface OfferedStep {
  step: PossibleStep;
  refusal: string | null;
}

const lifeOffered = ["restrict", "quarantine", "release", "supersede", "withdraw"] as const;

function reviseRefusal({ current, open, hasOpen }: EntryStanding): string | null {
  if (open) return `Revision ${open.revision} is open already: one is worked on at a time.`;
  if (hasOpen) return "Somebody is working on a revision already: one is worked on at a time.";
  if (current.state === "superseded") return "It is superseded; work on its successor instead.";
  if (current.state === "withdrawn") return "It is withdrawn; enter the cable anew.";
  return null;
}

function waiveRefusal({ current: { state } }: EntryStanding): string | null {
  if (state === "approved") return "It is approved: any run may have it.";
  return state === "draft" || state === "inReview" ? "It was never approved; review it instead." : null;
}

/** The steps offered to the reader, in the order of the page; none of what their role may never do. */
export function offeredSteps(standing: EntryStanding): OfferedStep[] {
  const { current, open, mayPropose, mayReview } = standing;
  const steps: OfferedStep[] = [];
  if (open?.isOwn && mayPropose && open.state === "draft") {
    steps.push({ step: "submit", refusal: null });
    if (!open.wasSubmitted) steps.push({ step: "takeBack", refusal: null });
  }
  if (mayPropose) steps.push({ step: "revise", refusal: reviseRefusal(standing) });
  if (!mayReview) return steps;
  const unusable = isUsable(current.state) ? null : "Only what is approved or restricted can be preferred.";
  steps.push(
    current.preferred ? { step: "unprefer", refusal: null } : { step: "prefer", refusal: unusable },
    ...lifeOffered.map((step) => ({ step, refusal: cannotTake(step, current.state) })),
    { step: "waive", refusal: waiveRefusal(standing) },
  );
  return steps;
}
