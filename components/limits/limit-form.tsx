"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useForm, useWatch, type Control, type UseFormRegister } from "react-hook-form";
import { CurveFields } from "@/components/limits/curve-fields";
import { ofWords, quantityWords } from "@/components/limits/limit-words";
import { newLimit, refusalSentences, typedLine, type TypedLimit } from "@/components/limits/typed-limit";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import { call, ProblemError } from "@/lib/http/call";
import type { LimitLineItem } from "@/lib/limit-lines/schema";

/** Adds a limit line of the team's own. What was typed stays until the server has it. */
export function LimitForm({ close }: { close: () => void }) {
  const queries = useQueryClient();
  const { register, control, handleSubmit } = useForm<TypedLimit>({ defaultValues: newLimit });
  const add = useMutation({
    mutationFn: (typed: TypedLimit) => call<LimitLineItem>("/limit-lines", { method: "POST", body: typedLine(typed) }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ["limit-lines"] });
      close();
    },
  });
  return (
    <form
      aria-label="Add a limit line"
      onSubmit={handleSubmit((typed) => add.mutate(typed))}
      className="mt-4 flex flex-col gap-3 border-t-[1.5px] border-ink pt-3"
    >
      <Head register={register} control={control} />
      <CurveFields register={register} control={control} />
      <Source register={register} />
      {add.error && <Refusal error={add.error} />}
      <div className="flex gap-2.5">
        <Button type="submit" kind="main" refused={add.isPending && "It is on its way."}>
          Add the line
        </Button>
        <Button onClick={close}>Leave it</Button>
      </div>
    </form>
  );
}

interface PartProps {
  register: UseFormRegister<TypedLimit>;
  control: Control<TypedLimit>;
}

function Head({ register, control }: PartProps) {
  const quantity = useWatch({ control, name: "quantity" });
  return (
    <div className="flex flex-wrap items-end gap-x-4 gap-y-3">
      <Field label="Name" maxLength={80} className="w-72 phone:w-full" {...register("name")} />
      <Select label="Quantity" className="w-40" {...register("quantity")}>
        {Object.entries(quantityWords).map(([value, { word }]) => (
          <option key={value} value={value}>
            {word}
          </option>
        ))}
      </Select>
      <Select label="Of what" className="w-32" {...register("of")}>
        {Object.entries(ofWords).map(([value, word]) => (
          <option key={value} value={value}>
            {word}
          </option>
        ))}
      </Select>
      {quantity !== "returnLoss" && <Checkbox {...register("isPer100m")}>per 100 m, growing with length</Checkbox>}
    </div>
  );
}

function Source({ register }: Pick<PartProps, "register">) {
  return (
    <div className="flex flex-wrap gap-x-4 gap-y-3">
      <Field label="Taken from" maxLength={120} className="w-72 phone:w-full" {...register("title")} />
      <Field label="Edition" maxLength={60} className="w-36" {...register("edition")} />
      <Field label="Clause, if seen" maxLength={60} className="w-36" {...register("clause")} />
      <Field label="Note" maxLength={500} className="w-72 phone:w-full" {...register("note")} />
    </div>
  );
}

function Refusal({ error }: { error: Error }) {
  const sentences = error instanceof ProblemError ? refusalSentences(error.problem) : [error.message];
  return (
    <div role="alert">
      {sentences.map((sentence) => (
        <StateNote key={sentence} state="fail">
          {sentence}
        </StateNote>
      ))}
    </div>
  );
}
