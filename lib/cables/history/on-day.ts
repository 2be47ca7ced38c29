/** How an entry stood on a day, from the steps in its life. Pure. */
import type { CableEvent } from "@/lib/cables/events/schema";

type Step = Pick<CableEvent, "revision" | "at" | "step" | "state" | "condition">;

export interface Standing {
  /** the revision people saw: the last one approved, else the newest */
  revision: number;
  state: CableEvent["state"];
  condition: string | null;
  preferred: boolean;
}

/** @param end - the moment, ISO 8601; steps at it count
 *  @returns undefined before there was an entry */
export function standingAt(steps: readonly Step[], end: string): Standing | undefined {
  const past = steps.filter(({ at }) => at <= end);
  const approved = past.findLast(({ step }) => step === "approve");
  const begun = past.reduce((newest, { revision }) => Math.max(newest, revision), 0);
  const revision = approved?.revision ?? begun;
  const last = past.findLast((each) => each.revision === revision && each.step !== "edit");
  const mark = past.findLast(({ step }) => step === "prefer" || step === "unprefer");
  if (!last) return undefined;
  return { revision, state: last.state, condition: last.condition, preferred: mark?.step === "prefer" };
}

/** The last moment of a day of UTC. */
export const endOf = (day: string) => `${day}T23:59:59.999Z`;
