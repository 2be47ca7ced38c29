"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import type { Route } from "next";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useEffect, useState } from "react";
import { useForm, useWatch, type Resolver } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import { typedCable } from "@/lib/cables/line";
import { cutLength, decibels, inWords } from "@/lib/format/quantity";
import { call, ProblemError } from "@/lib/http/call";
import type { Run } from "@/lib/runs/schema";
import type { RunFormRead, RunFormTexts, RunStart } from "@/lib/runs/start";

interface Props {
  cables: { id: string; designation: string; name: string; condition: string | null }[];
  /** what the address brings along */
  start: RunStart;
}

// Reading what people type needs mathjs: it is fetched when the page has woken up, not with the page.
const reader = () => import("@/lib/runs/start");

const resolver: Resolver<RunFormTexts, unknown, RunFormRead> = async (values, context, options) =>
  zodResolver((await reader()).runFormSchema)(values, context, options);

/** The reader's own account of a text, once it is there. */
function useUnderstood(): (name: keyof RunFormTexts, text: string) => string | undefined {
  const [read, setRead] = useState<Awaited<ReturnType<typeof reader>> | null>(null);
  useEffect(() => void reader().then(setRead), []);
  return (name, text) => read?.understood(name, text);
}

/** What goes along with the first cable, in words. */
function pieceWords(piece: NonNullable<RunStart["piece"]>): string {
  if (piece.kind === "pad")
    return `With a pad of ${inWords(decibels(piece.lossDb))} from the source's to the load's resistance, before the cable`;
  return `With a stub of the same cable, ${inWords(cutLength(piece.lengthM))}, ${piece.end === "short" ? "shorted" : "open"}, at the load`;
}

/** The first facts of a run. Everything can be changed later on the strip. */
export function NewRunForm({ cables, start }: Props) {
  const router = useRouter();
  const { texts: brought, line, piece } = start;
  const isTyped = start.cableId === typedCable;
  const { register, handleSubmit, control, setError, formState } = useForm<RunFormTexts, unknown, RunFormRead>({
    resolver,
    defaultValues: {
      name: "",
      site: "",
      cableId: isTyped ? typedCable : (cables.find(({ id }) => id === start.cableId)?.id ?? ""),
      length: brought.length ?? "",
      frequency: brought.frequency ?? "",
      temperature: brought.temperature ?? "20",
      power: brought.power ?? "",
      source: brought.source ?? "50",
      load: brought.load ?? "50",
      hasPiece: piece !== null,
    },
    mode: "onTouched",
  });
  const texts = useWatch({ control });
  const understood = useUnderstood();
  const { errors, isSubmitting } = formState;
  const condition = cables.find((cable) => cable.id === texts.cableId)?.condition;

  const send = handleSubmit(async (read) => {
    try {
      const run = await call<Run>("/runs", { method: "POST", body: (await reader()).startedRun(read, start) });
      router.push(`/runs/${run.id}` as Route);
    } catch (error) {
      const detail =
        error instanceof ProblemError
          ? (error.problem.errors?.[0]?.message ?? error.problem.detail)
          : (error as Error).message;
      setError("root", { message: detail });
    }
  });
  const typed = (
    name: Exclude<keyof RunFormTexts, "cableId" | "hasPiece">,
    label: string,
    unit?: string,
    placeholder?: string,
  ) => (
    <Field
      label={label}
      unit={unit}
      placeholder={placeholder}
      isFigure={name !== "name" && name !== "site"}
      controlSize="large"
      autoComplete="off"
      error={errors[name]?.message}
      hint={understood(name, texts[name] ?? "")}
      {...register(name)}
    />
  );
  return (
    <form onSubmit={send} noValidate className="max-w-160">
      <p className="text-label text-ink-3 phone:hidden">
        <Link href="/runs" className="link">
          Runs
        </Link>{" "}
        /
      </p>
      <h1 className="phone:sr-only">Start a run</h1>
      <div className="mt-5 grid grid-cols-2 gap-4 phone:grid-cols-1">
        {typed("name", "Name")}
        {typed("site", "Site")}
        <Select
          label="First cable"
          error={errors.cableId?.message}
          hint={condition ?? undefined}
          className="col-span-2 phone:col-span-1"
          {...register("cableId")}
        >
          <option value="">Choose a cable</option>
          {line && <option value={typedCable}>Typed: {line.words}</option>}
          {cables.map(({ id, designation, name }) => (
            <option key={id} value={id}>
              {designation}, {name}
            </option>
          ))}
        </Select>
        {typed("length", "Length", undefined, "36 m or 118 ft")}
        {typed("frequency", "Frequency", undefined, "27.2 MHz")}
        {typed("source", "Source impedance", undefined, "50")}
        {typed("load", "Load impedance", undefined, "22-35j")}
        {typed("power", "Available power, if it matters", undefined, "200 W")}
        {typed("temperature", "Temperature", /[a-z°]/i.test(texts.temperature ?? "") ? undefined : "°C")}
      </div>
      {piece && (
        <Checkbox className="mt-4" {...register("hasPiece")}>
          {pieceWords(piece)}
        </Checkbox>
      )}
      {errors.root && (
        <div role="alert" className="mt-4">
          <StateNote state="fail">{errors.root.message}</StateNote>
        </div>
      )}
      <div className="mt-6 flex items-center gap-4">
        <Button type="submit" kind="main" size="touch" refused={isSubmitting && "The run is being made."}>
          Start the run
        </Button>
        <Link href="/runs" className="link">
          Not now
        </Link>
      </div>
    </form>
  );
}
