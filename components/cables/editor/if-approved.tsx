"use client";

import { useQuery } from "@tanstack/react-query";
import type { Route } from "next";
import Link from "next/link";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { StateNote } from "@/components/ui/state-mark";
import { significantDigits } from "@/lib/format/quantity";
import { call } from "@/lib/http/call";
import type { CableUses, Effect, RunEffect } from "@/lib/runs/effects/schema";

const quantityWords: Partial<Record<Effect["quantity"], [string, string]>> = {
  loss: ["loss", "dB"],
  returnLoss: ["return loss", "dB"],
  vswr: ["VSWR", ""],
  voltage: ["voltage", "V"],
};

/** The effect of a run that changes most. */
function largest({ effects }: RunEffect): Effect | undefined {
  return [...effects].sort((a, b) => Math.abs(b.changePercent ?? 0) - Math.abs(a.changePercent ?? 0))[0];
}

function Largest({ run }: { run: RunEffect }) {
  const effect = largest(run);
  if (!effect || !effect.changePercent) return <> None of their figures change.</>;
  const [name, unit] = quantityWords[effect.quantity] ?? [effect.quantity, ""];
  const [from, to] = [significantDigits(effect.now.value, 3), significantDigits(effect.then.value, 3)];
  return (
    <>
      {" "}
      Largest change:{" "}
      <Link href={`/runs/${run.runId}` as Route} prefetch={false} className="link">
        {run.name}
      </Link>
      , {name} {from} to {to} {unit}.
    </>
  );
}

/** What approving the draft as it is saved would do to the runs that use the cable. */
export function IfApproved() {
  const { saving } = useEntryForm();
  const { saved } = saving;
  const uses = useQuery({
    queryKey: ["cables", "uses", saved?.id, saved?.revision, saved?.version],
    queryFn: ({ signal }) =>
      call<CableUses>(`/cables/${encodeURIComponent(saved?.id ?? "")}/uses?revision=${saved?.revision}`, { signal }),
    enabled: saved !== null,
    placeholderData: (before) => before,
  });
  if (!saved) return null;
  const [first] = uses.data?.items ?? [];
  const changed = (uses.data?.items ?? []).filter(({ changesState }) => changesState).length;
  return (
    <div className="mt-4 border-t border-rule pt-2" aria-busy={uses.isFetching}>
      <h3 className="text-body">If this is approved</h3>
      {uses.error && (
        <p className="text-label text-ink-2">What it does to runs could not be worked out: {uses.error.message}</p>
      )}
      {uses.data?.total === 0 && <p className="text-label text-ink-2">No run uses this cable.</p>}
      {uses.data && first && (
        <>
          <p className="text-label text-ink-2">
            {uses.data.total} {uses.data.total === 1 ? "run uses" : "runs use"} this cable.
            <Largest run={first} />
          </p>
          <StateNote state={changed > 0 ? "warn" : "pass"}>
            {changed > 0
              ? `${changed} ${changed === 1 ? "run meets or misses a target" : "runs meet or miss a target"} that it did not before.`
              : "No target changes state."}
          </StateNote>
        </>
      )}
      {uses.isPending && <p className="text-label text-ink-3">Working it out …</p>}
    </div>
  );
}
