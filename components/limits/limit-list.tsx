"use client";

import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import dynamic from "next/dynamic";
import { useState } from "react";
import { LimitSketch } from "@/components/limits/limit-sketch";
import { limitSentence, quantityWords, sourceWords } from "@/components/limits/limit-words";
import { Button } from "@/components/ui/button";
import { Confirm } from "@/components/ui/confirm";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import { call } from "@/lib/http/call";
import type { LimitLineItem } from "@/lib/limit-lines/schema";
import type { LimitQuantity } from "@/lib/limit-lines/limit";

const LimitForm = dynamic(() => import("@/components/limits/limit-form").then((file) => file.LimitForm));

interface Props {
  first: LimitLineItem[];
  canWrite: boolean;
}

const queryKey = ["limit-lines"];

/** Every limit line there is, by quantity: the team's own first, for those are what somebody looks for. */
export function LimitList({ first, canWrite }: Props) {
  const [isAdding, setIsAdding] = useState(false);
  const { data, error } = useQuery({
    queryKey,
    queryFn: ({ signal }) => call<{ items: LimitLineItem[] }>("/limit-lines", { signal }),
    initialData: { items: first },
  });
  const lines = data.items.toSorted((a, b) => Number(a.isStandard) - Number(b.isStandard));
  const own = lines.filter(({ isStandard }) => !isStandard).length;
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
        <h1 className="phone:sr-only">Limit lines</h1>
        <p role="status" className="text-label text-ink-2">
          {lines.length - own} of the standards, {own === 0 ? "none" : own} of your team
        </p>
        {canWrite && !isAdding && (
          <Button kind="main" className="ml-auto" onClick={() => setIsAdding(true)}>
            Add a line
          </Button>
        )}
      </div>
      {error && <StateNote state="warn">The list may be old: {error.message}</StateNote>}
      {isAdding && <LimitForm close={() => setIsAdding(false)} />}
      {Object.entries(quantityWords).map(([quantity, { word }]) => {
        const among = lines.filter((line) => line.quantity === (quantity as LimitQuantity));
        return (
          among.length > 0 && (
            <Section key={quantity} title={word} className="mt-6">
              <ul>
                {among.map((line) => (
                  <LineRow key={line.id} line={line} canRemove={canWrite && !line.isStandard} />
                ))}
              </ul>
            </Section>
          )
        );
      })}
    </>
  );
}

function LineRow({ line, canRemove }: { line: LimitLineItem; canRemove: boolean }) {
  const { name, note, mark, addedByName, addedAt } = line;
  return (
    <li className="grid grid-cols-[150px_1fr_auto] items-start gap-x-5 border-b border-line py-2.5 phone:grid-cols-1 phone:gap-y-1">
      <LimitSketch line={line} />
      <div className="min-w-0">
        <p className="flared text-row break-words">{name}</p>
        <p className="figures text-label">{limitSentence(line)}</p>
        <p className="text-note break-words text-ink-2">
          {sourceWords(line)}
          {addedByName && ` · added by ${addedByName}, ${addedAt?.slice(0, 10)}`}
        </p>
        {note !== "" && (mark === "memory" ? <StateNote state="warn">{note}</StateNote> : <Note>{note}</Note>)}
      </div>
      {canRemove && <Remove line={line} />}
    </li>
  );
}

function Note({ children }: { children: string }) {
  return <p className="text-note break-words text-ink-3">{children}</p>;
}

function Remove({ line: { id, name } }: { line: LimitLineItem }) {
  const [isAsking, setIsAsking] = useState(false);
  const queries = useQueryClient();
  const remove = useMutation({
    mutationFn: () => call<void>(`/limit-lines/${id}`, { method: "DELETE" }),
    onSuccess: () => queries.invalidateQueries({ queryKey }),
    onSettled: () => setIsAsking(false),
  });
  return (
    <div>
      <Button size="small" aria-label={`Remove ${name}`} onClick={() => setIsAsking(true)}>
        Remove
      </Button>
      {remove.error && <StateNote state="fail">{remove.error.message}</StateNote>}
      <Confirm
        isOpen={isAsking}
        title={`Remove ${name}?`}
        confirmLabel="Remove the line"
        refused={remove.isPending && "It is on its way."}
        onConfirm={() => remove.mutate()}
        onCancel={() => setIsAsking(false)}
      >
        Nobody on the team can hold a figure against it any more.
      </Confirm>
    </div>
  );
}
