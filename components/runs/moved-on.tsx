"use client";

import { useQuery } from "@tanstack/react-query";
import type { Route } from "next";
import Link from "next/link";
import { effectDigits, effectName, effectUnit } from "@/components/review/effect-words";
import { StateMark, StateNote } from "@/components/ui/state-mark";
import { call } from "@/lib/http/call";
import type { AffectedRun } from "@/lib/runs/affected/schema";
import type { Effect } from "@/lib/runs/effects/schema";

function Change({ effect }: { effect: Effect }) {
  const { now, then } = effect;
  return (
    <li className="flex flex-wrap items-baseline gap-x-3 border-b border-line py-1 text-label">
      <span className="min-w-36 text-ink-2">{effectName(effect)}</span>
      <span className="figures">{effectDigits(effect, now.value)}</span>
      <span className="sr-only">would be</span>
      <b className="figures font-[650]">{effectDigits(effect, then.value)}</b>
      <span className="unit">{effectUnit(effect)}</span>
      {now.isMet !== then.isMet && (
        <StateMark state={then.isMet ? "pass" : "fail"}>{then.isMet ? "would be met" : "would be missed"}</StateMark>
      )}
    </li>
  );
}

/** A cable of the run has a later approved revision: what that would change. The run stays on the one it uses. */
export function MovedOn({ runId }: { runId: string }) {
  const { data } = useQuery({
    queryKey: ["runs", runId, "affected"],
    queryFn: ({ signal }) => call<AffectedRun>(`/runs/${runId}/affected`, { signal }),
  });
  if (!data || data.cables.length === 0) return null;
  const known = data.effect?.effects.filter(({ why }) => why === null) ?? [];
  return (
    <section aria-label="A cable has moved on" className="mt-3 max-w-200">
      {data.cables.map(({ cableId, designation, uses, current, reason }) => (
        <StateNote key={`${cableId} ${uses}`} state="warn">
          {data.isAffected && <b>Affected. </b>}
          <Link href={`/cables/${encodeURIComponent(cableId)}` as Route} prefetch={false} className="link">
            {designation}
          </Link>{" "}
          is at revision {current}; this run uses {uses}. {reason}
        </StateNote>
      ))}
      {known.length > 0 && (
        <ul className="mt-1">
          {known.map((effect, i) => (
            <Change key={i} effect={effect} />
          ))}
        </ul>
      )}
      {data.effect?.why && <p className="text-label text-ink-2">{data.effect.why}</p>}
    </section>
  );
}
