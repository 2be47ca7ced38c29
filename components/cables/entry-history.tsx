"use client";

import { useState } from "react";
import { eventWords } from "@/components/cables/step-words";
import { RevisionList } from "@/components/cables/revision-list";
import type { CableEvent } from "@/lib/cables/events/schema";
import type { RevisionLine } from "@/lib/cables/revisions/schema";
import type { Waiver } from "@/lib/cables/waivers/schema";

interface Props {
  revisions: readonly RevisionLine[];
  current: number;
  events: readonly CableEvent[];
  waivers: readonly Waiver[];
}

function Event({ event }: { event: CableEvent }) {
  const { revision, at, personName, step, condition, note, answers } = event;
  const said = [condition, note, ...Object.values(answers ?? {})].filter(Boolean);
  return (
    <li className="grid grid-cols-[22px_1fr_auto] gap-2 border-b border-line py-1.25">
      <span className="figures text-ink-2">{revision}</span>
      <span className="min-w-0 break-words">
        {eventWords[step]} <span className="text-ink-2">by {personName}</span>
        {said.length > 0 && <span className="block text-ink-2">{said.join(" ")}</span>}
      </span>
      <time dateTime={at} className="text-ink-2">
        {at.slice(0, 10)}
      </time>
    </li>
  );
}

function Waivers({ waivers }: Pick<Props, "waivers">) {
  if (waivers.length === 0) return null;
  return (
    <ul className="mt-2 text-label" aria-label="Waivers">
      {waivers.map(({ id, runNumber, runName, reason, until, holds, givenByName }) => (
        <li key={id} className="border-b border-line py-1.25">
          <b>Waiver</b> for {runNumber} {runName}, {holds ? "until" : "ended, was until"} {until}
          <span className="block text-ink-2">
            {reason} By {givenByName}.
          </span>
        </li>
      ))}
    </ul>
  );
}

/** The revisions of an entry, its waivers, and on request every step of its life. */
export function EntryHistory({ revisions, current, events, waivers }: Props) {
  const [isWhole, setWhole] = useState(false);
  return (
    <div>
      <RevisionList revisions={revisions} current={current} />
      <Waivers waivers={waivers} />
      {events.length > 0 && (
        <button
          type="button"
          className="link mt-1.5 min-h-6 text-label phone:min-h-11"
          onClick={() => setWhole(!isWhole)}
        >
          {isWhole ? "Hide the steps" : `Show all ${events.length} steps`}
        </button>
      )}
      {isWhole && (
        <ol className="text-label" aria-label="Steps, the last first">
          {[...events].reverse().map((event, i) => (
            <Event key={i} event={event} />
          ))}
        </ol>
      )}
    </div>
  );
}
