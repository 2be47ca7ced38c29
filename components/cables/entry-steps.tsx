"use client";

import dynamic from "next/dynamic";
import type { Route } from "next";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { stepWords } from "@/components/cables/step-words";
import { Button } from "@/components/ui/button";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import { type EntryStanding, offeredSteps, type PossibleStep } from "@/lib/cables/possible-steps";

// Asked for by few, so it comes when it is.
const StepDialog = dynamic(() => import("@/components/cables/step-dialog").then((file) => file.StepDialog), {
  ssr: false,
});

interface Props {
  cableId: string;
  designation: string;
  standing: EntryStanding;
}

/** What is being worked on beside what people see. */
function Open({ cableId, standing: { open, current, mayReview } }: Props) {
  if (!open || open.revision === current.revision) return null;
  const isInReview = open.state === "inReview";
  return (
    <StateNote state={isInReview ? "warn" : "none"} className="mt-1">
      Revision {open.revision} is {isInReview ? "in review" : open.isOwn ? "your draft" : "a draft"}.{" "}
      {isInReview && mayReview && (
        <Link href={`/review?cable=${encodeURIComponent(cableId)}` as Route} className="link">
          Review it
        </Link>
      )}
    </StateNote>
  );
}

/** What the reader may do with an entry; what cannot be done now says why. */
export function EntrySteps(props: Props) {
  const { cableId, designation, standing } = props;
  const router = useRouter();
  const [asked, setAsked] = useState<PossibleStep | null>(null);
  const steps = offeredSteps(standing);
  if (steps.length === 0) return null;
  const refused = steps.filter(({ refusal }) => refusal !== null);
  const done = (step: PossibleStep) => {
    setAsked(null);
    const isGone = step === "takeBack" && standing.open?.revision === standing.current.revision;
    if (isGone) router.push("/cables");
    router.refresh();
  };
  return (
    <Section title="What can be done with it">
      <Open {...props} />
      <div className="mt-2 flex flex-wrap gap-2">
        {steps.map(({ step, refusal }) => (
          <Button
            key={step}
            size="small"
            kind={step === "submit" ? "main" : "plain"}
            refused={refusal}
            onClick={() => setAsked(step)}
          >
            {stepWords[step].label}
          </Button>
        ))}
      </div>
      {refused.length > 0 && (
        <ul className="mt-2 text-note text-ink-3">
          {refused.map(({ step, refusal }) => (
            <li key={step}>
              {stepWords[step].label}: {refusal}
            </li>
          ))}
        </ul>
      )}
      {asked && (
        <StepDialog
          key={asked}
          {...{ cableId, designation, standing, done }}
          step={asked}
          close={() => setAsked(null)}
        />
      )}
    </Section>
  );
}
