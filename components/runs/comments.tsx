"use client";

import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
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
  const queries = useQueryClient();
  const queryKey = ["runs", runId, "comments"];
  const said = useQuery({
    queryKey,
    queryFn: ({ signal }) => call<{ items: Comment[] }>(`/runs/${runId}/comments`, { signal }),
  });
  const { register, handleSubmit, reset } = useForm({ defaultValues: { text: "" } });
  const say = useMutation({
    mutationFn: (text: string) => call<Comment>(`/runs/${runId}/comments`, { method: "POST", body: { text } }),
    // The text stays in its field until the server has it.
    onSuccess: () => (reset(), queries.invalidateQueries({ queryKey })),
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
                {saidAt.slice(0, 10)} {saidAt.slice(11, 16)} UTC
              </time>
            </p>
            <p className="text-body break-words whitespace-pre-wrap">{text}</p>
          </li>
        ))}
      </ul>
      {canComment && (
        <form
          onSubmit={handleSubmit(({ text }) => text.trim() !== "" && say.mutate(text))}
          className="mt-2 flex flex-col items-start gap-2"
        >
          <label className="w-full text-note text-ink-2">
            Say something
            <textarea
              {...register("text")}
              maxLength={2000}
              rows={2}
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
