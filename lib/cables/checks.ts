/** Whether an entry agrees with itself, told in sentences: what a reviewer reads before deciding. Pure. */
import { agreementOfEntry, type Verdict } from "@/lib/cables/agreement";
import { percentWords, verdictOf, withinWords } from "@/lib/cables/checking/check";
import {
  conductorChecks,
  constructionChecks,
  cutoffChecks,
  impossibleChecks,
  loopChecks,
} from "@/lib/cables/checking/construction";
import { type Facts, factsOf } from "@/lib/cables/checking/facts";
import { dielectricChecks, floorChecks, risingChecks, smoothChecks, tableChecks } from "@/lib/cables/checking/loss";
import { readingChecks } from "@/lib/cables/checking/readings";
import { rowChecks } from "@/lib/cables/checking/rows";
import { coreCapacitanceChecks, inductanceChecks, triangleChecks } from "@/lib/cables/checking/triangle";
import { velocityChecks } from "@/lib/cables/checking/velocity";
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Cable } from "@/lib/cables/schema";

/** What a check says of an entry. */
export interface Check {
  /** its name; a reviewer's answer is kept under it */
  check: string;
  verdict: Verdict;
  sentence: string;
  /** how far apart, per cent */
  percent?: number;
  /** what does not fit the rest */
  culprit?: string;
}

export type Checked = Pick<Cable, "model" | "figures" | "construction" | "build" | "limits" | "family"> & {
  inputs?: EntryInputs | null;
};

/** The model that runs are worked out with against the figures stated. */
function modelChecks({ percent }: { percent: number }): Check {
  const verdict = verdictOf(percent / 100);
  const sentence =
    verdict === "fine"
      ? `The model has the figures stated within ${withinWords(percent / 100)}.`
      : `The model is ${percentWords(percent / 100)} from a figure stated: another way rules, or the stated figures do not agree.`;
  return { check: "model", verdict, percent, sentence };
}

const all: readonly ((facts: Facts) => Check[])[] = [
  triangleChecks,
  inductanceChecks,
  coreCapacitanceChecks,
  impossibleChecks,
  constructionChecks,
  conductorChecks,
  loopChecks,
  velocityChecks,
  risingChecks,
  rowChecks,
  floorChecks,
  smoothChecks,
  dielectricChecks,
  readingChecks,
  cutoffChecks,
];

/** Every check that the entry's figures allow. */
export function checksOf(cable: Checked): Check[] {
  const facts = factsOf(cable);
  const { checks } = agreementOfEntry(cable);
  const [model, table] = ["model", "lossTable"].map((name) => checks.find(({ check }) => check === name));
  return [
    ...all.flatMap((of) => of(facts)),
    ...(model ? [modelChecks(model)] : []),
    ...tableChecks(table && table.percent / 100),
  ];
}
