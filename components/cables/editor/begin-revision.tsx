"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { zodResolver } from "@hookform/resolvers/zod";
import { z } from "zod";
import type { Route } from "next";
import { Button, ButtonLink } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { StateNote } from "@/components/ui/state-mark";
import { beginRevision, refusalWords } from "@/lib/cables/editor/send-entry";

interface Props {
  cableId: string;
  designation: string;
  /** that people see now */
  revision: number;
}

const reasonSchema = z.object({
  reason: z
    .string()
    .trim()
    .min(1, { error: "Say why there is to be a new revision." })
    .max(500, { error: "A reason has at most 500 characters." }),
});

/** Approved values never change: a change is a new revision, with a reason. */
export function BeginRevision({ cableId, designation, revision }: Props) {
  const router = useRouter();
  const [trouble, setTrouble] = useState<string | null>(null);
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(reasonSchema),
    defaultValues: { reason: "" },
  });
  const { errors, isSubmitting } = formState;
  const begin = handleSubmit(async ({ reason }) => {
    setTrouble(null);
    try {
      await beginRevision(cableId, reason);
      router.refresh();
    } catch (error) {
      setTrouble(refusalWords(error));
    }
  });
  return (
    <form noValidate onSubmit={begin} className="max-w-140">
      <h1>New revision of {designation}</h1>
      <p className="mt-2 text-ink-2">
        Revision {revision} stays as it is, and runs keep it until the new one is approved and taken over.
      </p>
      <Field
        label="Why there is to be a new revision"
        controlSize="large"
        className="mt-4"
        autoComplete="off"
        placeholder="Loss at 900 MHz corrected"
        error={errors.reason?.message}
        {...register("reason")}
      />
      {trouble && (
        <div role="alert" className="mt-3">
          <StateNote state="fail">{trouble}</StateNote>
        </div>
      )}
      <div className="mt-5 flex items-center gap-3">
        <Button type="submit" kind="main" size="touch" refused={isSubmitting && "It is being made."}>
          Begin the revision
        </Button>
        <ButtonLink href={`/cables/${encodeURIComponent(cableId)}` as Route} kind="quiet">
          Not now
        </ButtonLink>
      </div>
    </form>
  );
}
