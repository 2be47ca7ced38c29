/** A step with an entry as the API is asked for it. Pure. */
import type { EntryStanding, PossibleStep } from "@/lib/cables/possible-steps";

export interface StepRequest {
  path: string;
  method: "POST" | "DELETE";
  body?: unknown;
  /** the version of the revision that the step is taken with */
  ifMatch?: string;
}

const paths: Partial<Record<PossibleStep, string>> = { revise: "/revisions", waive: "/waivers", unprefer: "/prefer" };

/** What is left empty is not sent: the API knows what holds then. */
const filled = (values: Record<string, string>) =>
  Object.fromEntries(
    Object.entries(values)
      .map(([name, value]) => [name, value.trim()])
      .filter(([, value]) => value !== ""),
  );

export function stepRequest(
  cableId: string,
  step: PossibleStep,
  { current, open }: EntryStanding,
  values: Record<string, string>,
): StepRequest {
  const path = `/cables/${encodeURIComponent(cableId)}`;
  if (step === "takeBack") return { path, method: "DELETE" };
  const at = { path: `${path}${paths[step] ?? `/${step}`}`, method: "POST" as const };
  if (step === "revise" || step === "waive") return { ...at, body: filled(values) };
  const { version } = step === "submit" && open ? open : current;
  const body = step === "prefer" || step === "unprefer" ? { preferred: step === "prefer" } : filled(values);
  return { ...at, body, ifMatch: `"${version}"` };
}
