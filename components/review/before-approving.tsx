"use client";

import { looks, type Decision, type Look } from "@/components/review/use-decision";
import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { Section } from "@/components/ui/section";
import { StateNote, type MarkedState } from "@/components/ui/state-mark";
import type { CableRevision } from "@/lib/cables/revisions/schema";

const marks: Record<CableRevision["checks"][number]["verdict"], MarkedState> = {
  ...{ fine: "pass", look: "warn", contradiction: "fail" },
};

interface Props {
  revision: CableRevision;
  decision: Decision;
  /** the use condition of the revision before, which carries over */
  condition: string | null;
  canDecide: boolean;
}

/** What the checks say, each that is to be looked at with a place for the answer; and what a reviewer ticks off. */
export function BeforeApproving({ revision, decision, condition, canDecide }: Props) {
  return (
    <Section title="Before approving" rule="light">
      <ul className="mt-1 flex flex-col gap-1.5">
        {revision.checks.map(({ check, verdict, sentence }, i) => (
          <li key={`${check} ${i}`}>
            <StateNote state={marks[verdict]}>{sentence}</StateNote>
            {verdict === "look" && canDecide && (
              <Field
                label="What you make of it"
                value={decision.answers[check] ?? ""}
                maxLength={1000}
                onChange={(event) => decision.answer(check, event.target.value)}
                className="mt-1 ml-5"
              />
            )}
          </li>
        ))}
      </ul>
      {canDecide && (
        <div className="mt-2">
          {(Object.keys(looks) as Look[]).map((look) => (
            <Checkbox
              key={look}
              checked={decision.ticked.includes(look)}
              onChange={(event) => decision.tick(look, event.target.checked)}
            >
              {looks[look]}
            </Checkbox>
          ))}
        </div>
      )}
      {condition !== null && (
        <div className="mt-2">
          <StateNote state="warn">The restriction carries over: {condition}</StateNote>
          {canDecide && (
            <Checkbox checked={decision.isLifted} onChange={(event) => decision.setLifted(event.target.checked)}>
              Lift it with this approval
            </Checkbox>
          )}
        </div>
      )}
    </Section>
  );
}
