"use client";

import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
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
  const queries = useQueryClient();
  const path = `/cables/${encodeURIComponent(cableId)}/comments`;
  const queryKey = ["cables", cableId, "comments"];
  const said = useQuery({ queryKey, queryFn: ({ signal }) => call<{ items: CableComment[] }>(path, { signal }) });
  const { register, handleSubmit, reset } = useForm({ defaultValues: { text: "" } });
  const say = useMutation({
    mutationFn: (text: string) => call<CableComment>(path, { method: "POST", body: { text, revision } }),
    // The text stays in its field until the server has it.
    onSuccess: () => (reset(), queries.invalidateQueries({ queryKey })),
  });
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
                {comment.saidAt.slice(0, 10)} {comment.saidAt.slice(11, 16)} UTC
              </time>
            </p>
            <p className="text-label break-words whitespace-pre-wrap">{comment.text}</p>
          </li>
        ))}
      </ul>
      {canSay && (
        <form
          onSubmit={handleSubmit(({ text }) => text.trim() !== "" && say.mutate(text))}
          className="mt-2.5 flex flex-col items-start gap-2"
        >
          <label className="w-full text-note text-ink-2">
            Write a note
            <textarea
              {...register("text")}
              maxLength={2000}
              rows={3}
              className="mt-0.5 block w-full rounded-t border border-b-[1.5px] border-rule border-b-ink bg-field px-2 py-1 text-body text-ink phone:text-section"
            />
          </label>
          {say.error && <StateNote state="fail">{say.error.message} Your words are still in the field.</StateNote>}
          <Button type="submit" size="small" refused={say.isPending && "It is on its way."}>
            Say it
          </Button>
        </form>
      )}
    </Section>
  );
}
