"use client";

import { useQuery } from "@tanstack/react-query";
import type { Route } from "next";
import Link from "next/link";
import { useState } from "react";
import { EffectDots } from "@/components/review/effect-dots";
import { effectDigits, effectName, effectUnit, mainEffect, stateSentence } from "@/components/review/effect-words";
import { Section } from "@/components/ui/section";
import { StateMark, StateNote } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { Working } from "@/components/ui/working";
import { call } from "@/lib/http/call";
import type { CableUses, Effect, RunEffect } from "@/lib/runs/effects/schema";

interface Props {
  cableId: string;
  revision: number;
}

const few = 5;

export function useEffects(cableId: string, revision: number) {
  return useQuery({
    queryKey: ["cables", cableId, "uses", revision],
    queryFn: ({ signal }) =>
      call<CableUses>(`/cables/${encodeURIComponent(cableId)}/uses?revision=${revision}`, { signal }),
  });
}

function Figures({ effect }: { effect: Effect }) {
  return (
    <>
      <Cell isRight className="figures">
        {effectDigits(effect, effect.now.value)}
      </Cell>
      <Cell isRight className="figures font-[650]">
        {effectDigits(effect, effect.then.value)}
      </Cell>
      <Cell className="unit pl-1 whitespace-nowrap">{effectUnit(effect)}</Cell>
      <Cell className="w-32">
        {effect.now.isMet !== effect.then.isMet && (
          <StateMark state={effect.then.isMet ? "pass" : "fail"}>
            {effect.then.isMet ? "would be met" : "would be missed"}
          </StateMark>
        )}
        <EffectDots effect={effect} />
      </Cell>
    </>
  );
}

/** One run by the figure that tells most; the others of it below, where there is something to see in them. */
function Run({ run, cableRevision, isWhole }: { run: RunEffect; cableRevision: number; isWhole: boolean }) {
  const { runId, number, name, revisions, isAffected, why } = run;
  const main = mainEffect(run);
  const others = run.effects.filter((effect) => effect !== main && (isWhole || effect.now.isMet !== effect.then.isMet));
  const older = revisions.filter((each) => each < cableRevision);
  return (
    <>
      <tr>
        <RowHead>
          <Link href={`/runs/${runId}` as Route} prefetch={false} className="link">
            {number} {name}
          </Link>
          <span className="block text-note text-ink-3">
            {main && effectName(main)}
            {older.length > 0 && `; uses revision ${older.join(" and ")}`}
            {isAffected && "; affected"}
          </span>
        </RowHead>
        {main && main.why === null ? (
          <Figures effect={main} />
        ) : (
          <Cell colSpan={4} className="text-ink-2">
            {why ?? main?.why}
          </Cell>
        )}
      </tr>
      {others.map((effect, i) => (
        <tr key={i}>
          <RowHead className="pl-3 text-ink-2">{effectName(effect)}</RowHead>
          {effect.why === null ? (
            <Figures effect={effect} />
          ) : (
            <Cell colSpan={4} className="text-ink-2">
              {effect.why}
            </Cell>
          )}
        </tr>
      ))}
    </>
  );
}

function Told({ uses }: { uses: CableUses }) {
  const [isWhole, setWhole] = useState(false);
  const { items, total, revision } = uses;
  if (total === 0) return <p className="mt-1 text-label text-ink-2">No run uses this cable yet.</p>;
  const { state, text } = stateSentence(items);
  return (
    <>
      <p className="mt-0.5 text-label text-ink-2">
        {total === 1 ? "One run uses" : `${total} runs use`} this cable. At the worst over each run’s band; the bar is
        the run’s limit.
      </p>
      <div className="overflow-x-auto">
        <Table className="mt-1.5">
          <thead>
            <tr>
              <HeadCell aria-label="Run" />
              <HeadCell isRight>now</HeadCell>
              <HeadCell isRight>then</HeadCell>
              <HeadCell aria-label="Unit" />
              <HeadCell aria-label="Against the limit" />
            </tr>
          </thead>
          <tbody>
            {(isWhole ? items : items.slice(0, few)).map((run) => (
              <Run key={run.runId} run={run} cableRevision={revision} isWhole={isWhole} />
            ))}
          </tbody>
        </Table>
      </div>
      <StateNote state={state} className="mt-2">
        {text}{" "}
        <button type="button" className="link min-h-6" onClick={() => setWhole(!isWhole)}>
          {isWhole ? "Show few" : items.length > few ? `Show ${items.length - few} more` : "Show every target"}
        </button>
      </StateNote>
      {total > items.length && (
        <p className="mt-1 text-note text-ink-3">The {items.length} runs that changed last are worked out.</p>
      )}
    </>
  );
}

/** What the revision in review does to every run that uses the cable, before anybody decides. */
export function EffectOnRuns({ cableId, revision }: Props) {
  const { data, error, isPending } = useEffects(cableId, revision);
  return (
    <Section title="What it does to runs">
      {isPending && <Working label="Working out every run twice" />}
      {error && <StateNote state="warn">{error.message} The runs were not worked out.</StateNote>}
      {data && <Told uses={data} />}
    </Section>
  );
}
