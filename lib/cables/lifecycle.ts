/** The life of a revision: which step leads from which state to which. Pure; who may take a step is decided elsewhere. */
import type { CableState } from "@/lib/cables/schema";

export const lifeSteps = [
  "submit",
  "approve",
  "return",
  "restrict",
  "quarantine",
  "release",
  "supersede",
  "withdraw",
] as const;
export type LifeStep = (typeof lifeSteps)[number];

/** What a step starts from, and what it is called in sentences: "cannot be …". */
const steps: Record<LifeStep, { from: readonly CableState[]; done: string }> = {
  submit: { from: ["draft"], done: "sent for review" },
  approve: { from: ["inReview"], done: "approved" },
  return: { from: ["inReview"], done: "returned" },
  restrict: { from: ["approved", "restricted"], done: "restricted" },
  quarantine: { from: ["approved", "restricted"], done: "quarantined" },
  release: { from: ["restricted", "quarantined"], done: "released" },
  supersede: { from: ["approved", "restricted", "quarantined"], done: "superseded" },
  withdraw: { from: ["approved", "restricted", "quarantined", "superseded"], done: "withdrawn" },
};

const named: Record<CableState, string> = {
  draft: "a draft",
  inReview: "in review",
  approved: "approved",
  restricted: "restricted",
  quarantined: "quarantined",
  superseded: "superseded",
  withdrawn: "withdrawn",
};

/** Why a revision in this state cannot take a step, a sentence; null where it can. */
export function cannotTake(step: LifeStep, state: CableState): string | null {
  const { from, done } = steps[step];
  if (from.includes(state)) return null;
  const words = from.map((each) => named[each]);
  const list = words.length > 1 ? `${words.slice(0, -1).join(", ")} or ${words.at(-1)}` : words[0];
  return `Only what is ${list} can be ${done}; this is ${named[state]}.`;
}

interface Standing {
  /** whether the revision was ever approved: an import that was quarantined at once was not */
  wasApproved: boolean;
  /** the use condition given with the step, or carried over from the revision before */
  condition?: string | null;
}

/** The state a step leads to; call where `cannotTake` has nothing against it. */
export function stateAfter(step: LifeStep, { wasApproved, condition }: Standing): CableState {
  switch (step) {
    case "submit":
      return "inReview";
    case "return":
      return "draft";
    case "approve":
      return condition ? "restricted" : "approved";
    case "restrict":
      return "restricted";
    case "quarantine":
      return "quarantined";
    case "release":
      // What was never approved goes back to whoever works on it.
      return wasApproved ? "approved" : "draft";
    case "supersede":
      return "superseded";
    case "withdraw":
      return "withdrawn";
  }
}
