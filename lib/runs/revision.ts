/** A save told in a sentence. Pure. */
import { alike } from "@/lib/runs/alike";
import type { Circuit } from "@/lib/runs/circuit-schema";
import type { RunChange } from "@/lib/runs/schema";

type Content = Omit<Required<RunChange>, "circuit"> & { circuit: Circuit };

const named: Record<Exclude<keyof Content, "circuit">, string> = {
  name: "the name",
  site: "the site",
  folder: "the folder",
  temperatureC: "the temperature",
  designHz: "the design frequency",
  availablePowerW: "the power",
  bandHz: "the band",
  targets: "the targets",
  sourceName: "the source's name",
  loadName: "the load's name",
};

function changesInElements(before: Circuit["elements"], after: Circuit["elements"]): string[] {
  const difference = after.length - before.length;
  if (difference > 0) return [difference === 1 ? "one more element" : `${difference} more elements`];
  if (difference < 0) return [difference === -1 ? "one element fewer" : `${-difference} elements fewer`];
  const changed = after.flatMap((element, i) => (alike(element, before[i]) ? [] : [i]));
  const [only] = changed;
  if (only === undefined) return [];
  if (changed.length > 1) return [`${changed.length} elements`];
  return [after[only]?.name ? `the element “${after[only].name}”` : `element ${only + 1}`];
}

function changesInCircuit(before: Circuit, after: Circuit): string[] {
  const changes: string[] = [];
  if (!alike(before.source, after.source)) changes.push("the source");
  changes.push(...changesInElements(before.elements, after.elements));
  if (!alike(before.load, after.load)) changes.push("the load");
  if (before.referenceOhm !== after.referenceOhm) changes.push("the reference");
  return changes;
}

function enumerate(parts: string[]): string {
  if (parts.length < 2) return parts.join("");
  return `${parts.slice(0, -1).join(", ")} and ${parts.at(-1)}`;
}

/** What differs between two states of a run, for example "Changed the load and 2 elements."; undefined when nothing does. */
export function saveSentence(before: Content, after: Content): string | undefined {
  const changes = changesInCircuit(before.circuit, after.circuit);
  for (const key of Object.keys(named) as (keyof typeof named)[])
    if (!alike(before[key], after[key])) changes.push(named[key]);
  return changes.length === 0 ? undefined : `Changed ${enumerate(changes)}.`;
}
