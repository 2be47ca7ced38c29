import { describe, expect, test } from "vitest";
import { cannotTake, lifeSteps, stateAfter, type LifeStep } from "@/lib/cables/lifecycle";
import type { CableState } from "@/lib/cables/schema";

const states: CableState[] = ["draft", "inReview", "approved", "restricted", "quarantined", "superseded", "withdrawn"];
const possible: Record<LifeStep, CableState[]> = {
  submit: ["draft"],
  approve: ["inReview"],
  return: ["inReview"],
  restrict: ["approved", "restricted"],
  quarantine: ["approved", "restricted"],
  release: ["restricted", "quarantined"],
  supersede: ["approved", "restricted", "quarantined"],
  withdraw: ["approved", "restricted", "quarantined", "superseded"],
};

describe("The life of a revision", () => {
  test.each(lifeSteps)("takes the step %s from its own states only, and says from which", (step) => {
    for (const state of states) {
      const why = cannotTake(step, state);
      if (possible[step].includes(state)) expect(why).toBeNull();
      else expect(why).toMatch(/^Only what is .+ can be .+; this is .+\.$/);
    }
  });

  test("nothing comes back from being withdrawn", () => {
    for (const step of lifeSteps) expect(cannotTake(step, "withdrawn")).not.toBeNull();
  });

  test("an approval with a condition is a restricted one", () => {
    expect(stateAfter("approve", { wasApproved: false, condition: "indoor only" })).toBe("restricted");
    expect(stateAfter("approve", { wasApproved: false, condition: null })).toBe("approved");
  });

  test("what was released goes back to approved only where it had been", () => {
    expect(stateAfter("release", { wasApproved: true })).toBe("approved");
    expect(stateAfter("release", { wasApproved: false })).toBe("draft");
  });
});
