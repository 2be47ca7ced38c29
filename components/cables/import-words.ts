/** Words for what becomes of a row that is brought in. */
import type { MarkedState } from "@/components/ui/state-mark";
import type { ImportCounts, ImportOutcome } from "@/lib/cables/imports/schema";

export const outcomeWords: Record<ImportOutcome, { word: string; mark: MarkedState; meaning: string }> = {
  draft: { word: "Draft", mark: "pass", meaning: "becomes a draft of yours" },
  quarantined: { word: "Quarantined", mark: "fail", meaning: "comes in, but contradicts itself: in quarantine" },
  unchanged: { word: "Already there", mark: "none", meaning: "the catalogue has it as it is" },
  duplicate: { word: "Left alone", mark: "warn", meaning: "its designation is taken by other values" },
  noEntry: { word: "No entry", mark: "fail", meaning: "cannot be an entry; kept with the reason" },
};

export const outcomes = Object.keys(outcomeWords) as ImportOutcome[];

/** "3 drafts and 1 in quarantine" */
export function broughtIn({ draft, quarantined }: ImportCounts): string {
  const drafts = `${draft} ${draft === 1 ? "draft" : "drafts"}`;
  return quarantined > 0 ? `${drafts} and ${quarantined} in quarantine` : drafts;
}
