/** Two versions of what stands in the fields: where they differ, and one laid over the other. Pure. */
import { figureFields, type FigureName } from "@/lib/cables/editor/fields";
import type { EntryTexts } from "@/lib/cables/editor/texts";
import { alike } from "@/lib/runs/alike";

type Path = readonly string[];

/** The places at which people change something: each field, and of lists the whole. */
function placesOf(value: unknown, at: Path = []): Path[] {
  // A sweep is one thing: the line that was worked out of a file.
  if (at[0] === "sweep" || value === null || typeof value !== "object" || Array.isArray(value)) return [at];
  return Object.entries(value).flatMap(([key, inner]) => placesOf(inner, [...at, key]));
}

function valueAt(value: unknown, path: Path): unknown {
  return path.reduce<unknown>((inner, key) => (inner as Record<string, unknown> | undefined)?.[key], value);
}

function withValue(value: unknown, [key, ...rest]: Path, next: unknown): unknown {
  if (key === undefined) return next;
  const inner = value as Record<string, unknown>;
  return { ...inner, [key]: withValue(inner[key], rest, next) };
}

/** What changed from a base, laid over another version; what did not change stays theirs. */
export function laidOver(base: EntryTexts, mine: EntryTexts, theirs: EntryTexts): EntryTexts {
  return placesOf(mine)
    .filter((path) => !alike(valueAt(base, path), valueAt(mine, path)))
    .reduce<unknown>((over, path) => withValue(over, path, valueAt(mine, path)), theirs) as EntryTexts;
}

const words: Record<string, string> = {
  designation: "Designation",
  aliases: "Also called",
  name: "What it is",
  family: "Family",
  kind: "Construction",
  metal: "Metal",
  rows: "Loss table",
  lossUnit: "Unit of the loss table",
  tableKind: "Kind of the loss table",
  form: "Form of the conductor",
  instrument: "Instrument",
  sweep: "Sweep of a sample",
  "ruling.impedance": "Z and velocity are ruled by",
  "ruling.loss": "Loss is ruled by",
  "ruling.resistance": "Dc resistance is ruled by",
};

function nameOf(path: Path): string {
  const [first = "", second = "", third = ""] = path;
  if (first === "figures" && Object.hasOwn(figureFields, second)) return figureFields[second as FigureName].label;
  if (first === "sources") return `Source of ${second === "lossTable" ? "the loss table" : second}, ${third}`;
  if (first === "build") return `Make: ${second}`;
  return words[path.join(".")] ?? words[first] ?? path.join(" ");
}

function shown(value: unknown): string {
  if (Array.isArray(value))
    return value
      .map((each: unknown) => {
        if (typeof each !== "object" || each === null) return String(each);
        const { frequency, loss, isLeftOut } = each as EntryTexts["rows"][number];
        return `${frequency}: ${loss}${isLeftOut ? " (left out)" : ""}`;
      })
      .join(", ");
  if (typeof value === "boolean") return value ? "yes" : "no";
  if (typeof value === "object" && value !== null) return (value as { fileName?: string }).fileName ?? "a sweep";
  return value === undefined || value === null || value === "" ? "nothing" : String(value as string | number);
}

export interface Difference {
  what: string;
  theirs: string;
  mine: string;
}

export function differences(theirs: EntryTexts, mine: EntryTexts): Difference[] {
  return placesOf(mine)
    .filter((path) => !alike(valueAt(theirs, path), valueAt(mine, path)))
    .map((path) => ({ what: nameOf(path), theirs: shown(valueAt(theirs, path)), mine: shown(valueAt(mine, path)) }));
}
