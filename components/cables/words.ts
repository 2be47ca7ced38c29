/** Words for what the catalogue shows. */
import type { MarkedState } from "@/components/ui/state-mark";
import type { Build, CableState, Family } from "@/lib/cables/schema";

export const stateWords: Record<CableState, { word: string; mark: MarkedState }> = {
  draft: { word: "Draft", mark: "none" },
  inReview: { word: "In review", mark: "warn" },
  approved: { word: "Approved", mark: "pass" },
  restricted: { word: "Restricted", mark: "warn" },
  quarantined: { word: "Quarantined", mark: "fail" },
  superseded: { word: "Superseded", mark: "warn" },
  withdrawn: { word: "Withdrawn", mark: "fail" },
};

export const familyWords: Record<Family, string> = {
  coaxial: "Coaxial",
  twistedPair: "Twisted pair",
  twinaxial: "Twinaxial",
};

/** "Solid copper 2.70 mm, foam PE, foil and braid, PE jacket" */
export function buildWords(build: Build | null): string {
  if (!build) return "Construction not given";
  const parts = [build.conductor, build.dielectricName, build.screenName, build.jacket ? `${build.jacket} jacket` : ""];
  const text = parts.filter(Boolean).join(", ");
  return text.charAt(0).toUpperCase() + text.slice(1);
}
