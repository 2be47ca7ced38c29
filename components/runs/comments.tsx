"use client";

import { useQuery } from "@tanstack/react-query";
import { minuteOf } from "@/components/ui/minute";
import { SayForm } from "@/components/ui/say-form";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import { call } from "@/lib/http/call";
import type { Comment } from "@/lib/runs/comments/schema";

interface Props {
  runId: string;
  canComment: boolean;
}

/** What people say about a run, and a place to say something. */
export function Comments({ runId, canComment }: Props) {
  const path = `/runs/${runId}/comments`;
  const queryKey = ["runs", runId, "comments"];
  const said = useQuery({
    queryKey,
    queryFn: ({ signal }) => call<{ items: Comment[] }>(path, { signal }),
  });
  const items = said.data?.items ?? [];
  return (
    <Section title="Said about this run" className="mt-6">
      {said.error && <StateNote state="warn">{said.error.message}</StateNote>}
      {said.data && items.length === 0 && <p className="pt-1 text-label text-ink-2">Nothing yet.</p>}
      <ul>
        {items.map(({ id, personName, saidAt, text }) => (
          <li key={id} className="border-b border-line py-2">
            <p className="text-label">
              <b>{personName}</b>{" "}
              <time dateTime={saidAt} className="text-ink-3">
                {minuteOf(saidAt)}
              </time>
            </p>
            <p className="text-body break-words whitespace-pre-wrap">{text}</p>
          </li>
        ))}
      </ul>
      {canComment && <SayForm label="Say something" rows={2} path={path} queryKey={queryKey} />}
    </Section>
  );
}
