"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { StateNote } from "@/components/ui/state-mark";
import { call } from "@/lib/http/call";

interface SayFormProps {
  label: string;
  rows: number;
  /** where what is said is sent, under /api/v1 */
  path: string;
  /** of the list that shows it, asked anew afterwards */
  queryKey: readonly string[];
  /** what is sent beside the text */
  besides?: Record<string, unknown>;
}

/** A place to say something. The text stays in its field until the server has it. */
export function SayForm({ label, rows, path, queryKey, besides }: SayFormProps) {
  const queries = useQueryClient();
  const { register, handleSubmit, reset } = useForm({ defaultValues: { text: "" } });
  const say = useMutation({
    mutationFn: (text: string) => call(path, { method: "POST", body: { ...besides, text } }),
    onSuccess: () => (reset(), queries.invalidateQueries({ queryKey })),
  });
  return (
    <form
      onSubmit={handleSubmit(({ text }) => text.trim() !== "" && say.mutate(text))}
      className="mt-2 flex flex-col items-start gap-2"
    >
      <label className="w-full text-note text-ink-2">
        {label}
        <textarea
          {...register("text")}
          maxLength={2000}
          rows={rows}
          className="mt-0.5 block w-full rounded-t border border-b-[1.5px] border-rule border-b-ink bg-field px-2 py-1 text-body text-ink phone:text-section"
        />
      </label>
      {say.error && <StateNote state="fail">{say.error.message} Your words are still in the field.</StateNote>}
      <Button type="submit" size="small" refused={say.isPending && "It is on its way."}>
        Say it
      </Button>
    </form>
  );
}
