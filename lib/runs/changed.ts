/** Two versions of a run, field by field, in words. Pure. */
import { frequency, impedance, inWords, metres, scaled } from "@/lib/format/quantity";
import { alike } from "@/lib/runs/alike";
import type { RunDraft } from "@/lib/runs/edit";
import { terminationWords } from "@/lib/runs/leaf/termination-fields";
import type { Termination } from "@/lib/line/element";
import type { Element } from "@/lib/runs/circuit-schema";
import { bandWords, targetWords } from "@/lib/runs/sentences";

export interface ChangedField {
  what: string;
  before: string;
  after: string;
}

function terminationText(termination: Termination): string {
  if (termination.kind !== "constant") return terminationWords(termination);
  return inWords(impedance({ re: termination.reOhm, im: termination.imOhm }));
}

function elementText(element: Element | undefined): string {
  if (!element) return "not there";
  const parts: string[] = [element.name ?? element.kind];
  if ("line" in element && "cableId" in element.line) parts.push(element.line.cableId);
  if ("lengthM" in element) parts.push(inWords(metres(element.lengthM, 3)));
  if (element.kind === "part") {
    if (element.lH !== undefined) parts.push(inWords(scaled("inductance", element.lH)));
    if (element.cF !== undefined) parts.push(inWords(scaled("capacitance", element.cF)));
    if (element.rOhm !== undefined) parts.push(inWords(scaled("resistance", element.rOhm)));
  }
  return parts.join(", ");
}

const none = "none";
type Simple = Exclude<keyof RunDraft, "circuit">;

const simple: { key: Simple; what: string; text: (draft: RunDraft) => string }[] = [
  { key: "name", what: "Name", text: (d) => d.name },
  { key: "site", what: "Site", text: (d) => d.site || none },
  { key: "folder", what: "Folder", text: (d) => d.folder || none },
  { key: "temperatureC", what: "Temperature", text: (d) => `${d.temperatureC} °C` },
  { key: "designHz", what: "Frequency", text: (d) => inWords(frequency(d.designHz)) },
  {
    key: "availablePowerW",
    what: "Power",
    text: (d) => (d.availablePowerW === null ? none : inWords(scaled("power", d.availablePowerW))),
  },
  { key: "bandHz", what: "Band", text: (d) => (d.bandHz ? bandWords(d.bandHz) : none) },
  {
    key: "targets",
    what: "Targets",
    text: (d) => d.targets.map((t) => `${t.quantity} ${targetWords(t, t.bandHz ?? null)}`).join("; ") || none,
  },
  { key: "sourceName", what: "Source's name", text: (d) => d.sourceName },
  { key: "loadName", what: "Load's name", text: (d) => d.loadName },
];

/** Every field in which two drafts differ. */
export function changedFields(before: RunDraft, after: RunDraft): ChangedField[] {
  const rows = simple
    .filter(({ key }) => !alike(before[key], after[key]))
    .map(({ what, text }) => ({ what, before: text(before), after: text(after) }));
  for (const end of ["source", "load"] as const)
    if (!alike(before.circuit[end], after.circuit[end]))
      rows.push({
        what: end === "source" ? "Source" : "Load",
        before: terminationText(before.circuit[end]),
        after: terminationText(after.circuit[end]),
      });
  const count = Math.max(before.circuit.elements.length, after.circuit.elements.length);
  for (let i = 0; i < count; i++) {
    const [a, b] = [before.circuit.elements[i], after.circuit.elements[i]];
    if (!alike(a, b)) rows.push({ what: `Piece ${i + 1}`, before: elementText(a), after: elementText(b) });
  }
  return rows;
}
