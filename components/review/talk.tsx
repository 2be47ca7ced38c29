"use client";

import { useQuery } from "@tanstack/react-query";
import { minuteOf } from "@/components/ui/minute";
import { SayForm } from "@/components/ui/say-form";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import type { CableComment } from "@/lib/cables/comments/schema";
import { call } from "@/lib/http/call";

interface Props {
  cableId: string;
  revision: number;
  canSay: boolean;
}

/** What is said of a cable's revisions, and a place to say something of this one. */
export function Talk({ cableId, revision, canSay }: Props) {
  const path = `/cables/${encodeURIComponent(cableId)}/comments`;
  const queryKey = ["cables", cableId, "comments"];
  const said = useQuery({ queryKey, queryFn: ({ signal }) => call<{ items: CableComment[] }>(path, { signal }) });
  const items = said.data?.items ?? [];
  return (
    <Section title="Talk">
      {said.error && <StateNote state="warn">{said.error.message}</StateNote>}
      {said.data && items.length === 0 && <p className="pt-1 text-label text-ink-2">Nothing has been said yet.</p>}
      <ul>
        {items.map((comment) => (
          <li key={comment.id} className="border-b border-line py-2">
            <p className="flex justify-between gap-3 text-label">
              <b>{comment.personName}</b>
              <time dateTime={comment.saidAt} className="text-ink-3">
                {comment.revision !== revision && `revision ${comment.revision}, `}
                {minuteOf(comment.saidAt)}
              </time>
            </p>
            <p className="text-label break-words whitespace-pre-wrap">{comment.text}</p>
          </li>
        ))}
      </ul>
      {canSay && <SayForm label="Write a note" rows={3} path={path} queryKey={queryKey} besides={{ revision }} />}
    </Section>
  );
}
