/** Whether somebody may decide on a revision, and what stands in the way of approving it. Pure: the screen says the same. */
import type { Role } from "@/lib/team/schema";
import type { HouseRules } from "@/lib/team/rules";

interface Reviewer {
  personId: string;
  role: Role;
}

/**
 * Why a reviewer may not approve or return a revision, a sentence; null where they may.
 * @param writers - its author and whoever else has changed it
 */
export function cannotDecide(
  { personId, role }: Reviewer,
  step: "approve" | "return",
  writers: readonly string[],
  rules: HouseRules,
): string | null {
  if (rules.isTwoPerson && writers.includes(personId))
    return `You cannot review your own changes: somebody else ${step === "approve" ? "approves" : "returns"} this revision.`;
  if (step === "approve" && role === "admin" && !rules.mayAdminsApprove)
    return "By a house rule of your team admins do not approve.";
  return null;
}

interface Asked {
  check: string;
  verdict: "fine" | "look" | "contradiction";
  sentence: string;
}

/** The checks that refuse approval, whatever a reviewer says. */
export function contradictions<Each extends Asked>(checks: readonly Each[]): Each[] {
  return checks.filter(({ verdict }) => verdict === "contradiction");
}

/** The checks that a reviewer has to say something about and has not. */
export function unanswered<Each extends Asked>(
  checks: readonly Each[],
  answers: Readonly<Record<string, string | undefined>>,
): Each[] {
  return checks.filter(
    ({ check, verdict }) => verdict === "look" && !(Object.hasOwn(answers, check) && answers[check]?.trim()),
  );
}
