"use client";

import { useMutation, useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { CableCombobox } from "@/components/cables/cable-combobox";
import { stepRequest } from "@/components/cables/step-request";
import { type AskedField, stepWords } from "@/components/cables/step-words";
import { Confirm } from "@/components/ui/confirm";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import { call, ProblemError } from "@/lib/http/call";
import type { EntryStanding, PossibleStep } from "@/lib/cables/possible-steps";
import type { Cable } from "@/lib/cables/schema";
import type { RunItem } from "@/lib/runs/schema";

interface Props {
  cableId: string;
  designation: string;
  step: PossibleStep;
  standing: EntryStanding;
  close: () => void;
  done: (step: PossibleStep) => void;
}

const area =
  "mt-0.5 block w-full rounded-t border border-b-[1.5px] border-rule border-b-ink bg-field px-2 py-1 text-body text-ink phone:text-section";

interface AskedProps {
  field: AskedField;
  value: string;
  error: string | undefined;
  change: (value: string) => void;
}

function RunChoice({ field, value, error, change }: AskedProps) {
  const { data } = useQuery({
    queryKey: ["runs", "to waive"],
    queryFn: ({ signal }) => call<{ items: RunItem[] }>("/runs?limit=200", { signal }),
  });
  return (
    <Select label={field.label} value={value} error={error} onChange={(event) => change(event.target.value)}>
      <option value="">Choose a run</option>
      {data?.items.map(({ id, number, name }) => (
        <option key={id} value={id}>
          {number} {name}
        </option>
      ))}
    </Select>
  );
}

function Equivalence({ field, value, error, change }: AskedProps) {
  return (
    <Select label={field.label} value={value} error={error} onChange={(event) => change(event.target.value)}>
      <option value="">Choose</option>
      <option value="dropIn">Drop-in</option>
      <option value="electricallyEqual">Electrically equal</option>
      <option value="needsRedesign">Needs a redesign</option>
    </Select>
  );
}

function Asked(props: AskedProps) {
  const { field, value, error, change } = props;
  if (field.kind === "run") return <RunChoice {...props} />;
  if (field.kind === "equivalence") return <Equivalence {...props} />;
  if (field.kind === "cable") return <Successor {...props} />;
  if (field.kind === "date")
    return (
      <Field type="date" label={field.label} value={value} error={error} onChange={(e) => change(e.target.value)} />
    );
  return (
    <label className="block text-note text-ink-2">
      {field.isNeeded ? field.label : `${field.label} (optional)`}
      <textarea value={value} maxLength={500} rows={3} onChange={(e) => change(e.target.value)} className={area} />
      {error && <span className="text-fail">{error}</span>}
    </label>
  );
}

function Successor({ field, value, error, change }: AskedProps) {
  const [name, setName] = useState<string | null>(null);
  const choose = async (cableId: string) => {
    const { designation } = await call<Cable>(`/cables/${encodeURIComponent(cableId)}`);
    setName(designation);
    change(cableId);
  };
  return (
    <div>
      <CableCombobox label={field.label} chosen={name} cableId={value} choose={choose} />
      {error && <p className="text-note text-fail">{error}</p>}
    </div>
  );
}

const errorsOf = (error: unknown) => {
  const errors = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
  return (name: string) => errors.find(({ path }) => path === name)?.message;
};

/** Asks what a step needs, takes it, and says why it was refused. */
export function StepDialog({ cableId, designation, step, standing, close, done }: Props) {
  const words = stepWords[step];
  const [values, setValues] = useState<Record<string, string>>({});
  const take = useMutation({
    mutationFn: () => {
      const { path, ...request } = stepRequest(cableId, step, standing, values);
      return call<unknown>(path, request);
    },
    onSuccess: () => done(step),
  });
  const missing = words.fields.find(({ name, isNeeded }) => isNeeded && !values[name]?.trim());
  const errorOf = errorsOf(take.error);
  return (
    <Confirm
      isOpen
      title={words.title(designation)}
      confirmLabel={words.confirm}
      cancelLabel="Leave it"
      refused={take.isPending ? "It is on its way." : missing ? `${missing.label} is needed.` : false}
      onCancel={close}
      onConfirm={() => take.mutate()}
    >
      <p>{words.after}</p>
      <div className="mt-3 flex flex-col gap-3">
        {words.fields.map((field) => (
          <Asked
            key={field.name}
            field={field}
            value={values[field.name] ?? ""}
            error={errorOf(field.name)}
            change={(value) => setValues((before) => ({ ...before, [field.name]: value }))}
          />
        ))}
      </div>
      {take.error && (
        <StateNote state="fail" className="mt-3">
          {take.error.message}
        </StateNote>
      )}
    </Confirm>
  );
}
