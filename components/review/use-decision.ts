"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { contradictions, unanswered } from "@/lib/cables/decision";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { call } from "@/lib/http/call";

/** What a reviewer ticks off before approving. */
export const looks = {
  source: "Source opened and read",
  units: "Units and reference temperature",
  runs: "Effect on runs looked at",
} as const;
export type Look = keyof typeof looks;

export interface Refusals {
  /** why the reviewer may not approve or return, whatever they do; null where they may */
  approve: string | null;
  return: string | null;
}

/** Why it cannot be approved just now, in words; the first reason that stands. */
function approvalRefusal({ checks }: CableRevision, answers: Record<string, string>, refusal: string | null) {
  if (refusal !== null) return refusal;
  const [against] = contradictions(checks);
  if (against) return `It contradicts itself and cannot be approved: ${against.sentence}`;
  const open = unanswered(checks, answers);
  if (open.length > 0) return `Say first what you make of it: ${open[0]?.sentence}`;
  return null;
}

/** One decision on a revision: what was looked at, what was answered, and how it ends. */
export function useDecision(revision: CableRevision, refusals: Refusals) {
  const router = useRouter();
  const queries = useQueryClient();
  const [ticked, setTicked] = useState<readonly Look[]>([]);
  const [answers, setAnswers] = useState<Record<string, string>>({});
  const [isLifted, setLifted] = useState(false);
  const decide = useMutation({
    mutationFn: ({ step, body }: { step: "approve" | "return"; body: unknown }) =>
      call<CableRevision>(`/cables/${encodeURIComponent(revision.id)}/${step}`, {
        method: "POST",
        body,
        ifMatch: `"${revision.version}"`,
      }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ["review"] });
      router.push("/review" as Route);
      router.refresh();
    },
  });
  const refusedApproval = decide.isPending ? "It is on its way." : approvalRefusal(revision, answers, refusals.approve);
  const note = ticked.length > 0 ? `Looked at: ${ticked.map((look) => looks[look].toLowerCase()).join("; ")}.` : "";
  return {
    ...{ ticked, answers, isLifted, setLifted, refusedApproval },
    refusedReturn: decide.isPending ? "It is on its way." : refusals.return,
    error: decide.error,
    tick: (look: Look, isTicked: boolean) =>
      setTicked((before) => (isTicked ? [...before, look] : before.filter((each) => each !== look))),
    answer: (check: string, text: string) => setAnswers((before) => ({ ...before, [check]: text })),
    approve: () => {
      const given = Object.fromEntries(Object.entries(answers).filter(([, text]) => text.trim() !== ""));
      const body = { note, answers: given, ...(isLifted && { condition: null }) };
      if (refusedApproval === null) decide.mutate({ step: "approve", body });
    },
    giveBack: (text: string) => decide.mutate({ step: "return", body: { note: text } }),
    reload: () => (decide.reset(), router.refresh()),
  };
}
export type Decision = ReturnType<typeof useDecision>;
