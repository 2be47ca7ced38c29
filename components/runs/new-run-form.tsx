"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import type { Route } from "next";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useForm, useWatch } from "react-hook-form";
import { z } from "zod";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import { impedanceText, optionalQuantityText, quantityText } from "@/lib/format/quantity-schema";
import { readImpedance, readQuantity } from "@/lib/format/read-quantity";
import { call, ProblemError } from "@/lib/http/call";
import type { NewRun, Run } from "@/lib/runs/schema";

interface Props {
  cables: { id: string; designation: string; name: string; condition: string | null }[];
  cableId?: string;
}

const formSchema = z.object({
  name: z
    .string()
    .trim()
    .min(1, { error: "Give the run a name." })
    .max(120, { error: "A name has at most 120 characters." }),
  site: z.string().trim().max(120, { error: "A site has at most 120 characters." }),
  cableId: z.string().min(1, { error: "Choose a cable." }),
  length: quantityText("length", { isNotNegative: true, most: 1e7 }),
  frequency: quantityText("frequency", { isPositive: true }),
  power: optionalQuantityText("power", { isPositive: true, most: 1e9 }),
  source: impedanceText,
  load: impedanceText,
});
type Typed = z.input<typeof formSchema>;
type Read = z.output<typeof formSchema>;

function newRun({ name, site, cableId, length, frequency, power, source, load }: Read): Partial<NewRun> {
  return {
    name,
    site,
    circuit: {
      source: { kind: "constant", reOhm: source.re, imOhm: source.im },
      elements: [{ kind: "cable", line: { cableId }, lengthM: length }],
      load: { kind: "constant", reOhm: load.re, imOhm: load.im },
      // Where the source has no resistance of its own, reflections need something to be measured against.
      ...(source.re > 0 ? {} : { referenceOhm: 50 }),
    },
    designHz: frequency,
    bandHz: [frequency * 0.99, frequency * 1.01],
    availablePowerW: power ?? null,
  };
}

const quantities = { length: "length", frequency: "frequency", power: "power" } as const;

/** What a text was understood as, where that says more than the text. */
function understood(name: keyof Typed, text: string): string | undefined {
  if (name === "source" || name === "load") {
    const read = readImpedance(text);
    return read.ok ? `= ${read.understood}` : undefined;
  }
  if (!(name in quantities) || !/[a-z'"°]/i.test(text)) return undefined;
  const read = readQuantity(quantities[name as keyof typeof quantities], text);
  return read.ok ? `= ${read.understood}` : undefined;
}

/** The first facts of a run. Everything can be changed later on the strip. */
export function NewRunForm({ cables, cableId }: Props) {
  const router = useRouter();
  const { register, handleSubmit, control, setError, formState } = useForm<Typed, unknown, Read>({
    resolver: zodResolver(formSchema),
    defaultValues: {
      name: "",
      site: "",
      cableId: cables.find((c) => c.id === cableId)?.id ?? "",
      length: "",
      frequency: "",
      power: "",
      source: "50",
      load: "50",
    },
    mode: "onTouched",
  });
  const texts = useWatch({ control });
  const { errors, isSubmitting } = formState;
  const condition = cables.find((cable) => cable.id === texts.cableId)?.condition;

  const send = handleSubmit(async (read) => {
    try {
      const run = await call<Run>("/runs", { method: "POST", body: newRun(read) });
      router.push(`/runs/${run.id}` as Route);
    } catch (error) {
      const detail =
        error instanceof ProblemError
          ? (error.problem.errors?.[0]?.message ?? error.problem.detail)
          : (error as Error).message;
      setError("root", { message: detail });
    }
  });
  const typed = (name: Exclude<keyof Typed, "cableId">, label: string, unit?: string, placeholder?: string) => (
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
      </div>
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
