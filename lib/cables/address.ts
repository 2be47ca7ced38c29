/**
 * The address of a catalogue page <-> what is asked of the catalogue and what is held up to compare, so that any search
 * and any comparison can be sent to a colleague. Pure, and light: it loads no schema.
 */
import type { Range } from "@/lib/cables/query";
import type { CableState, Family } from "@/lib/cables/schema";

/** The figures that can be kept within a range, with their words in the address and in the API. */
export const measures = {
  z0Ohm: "z0",
  velocityFactor: "vf",
  lossDbPer100m: "loss",
  outerDiameterMm: "od",
} as const;
export type Measure = keyof typeof measures;
export const measureNames = Object.keys(measures) as Measure[];

export interface CatalogueAsked {
  q: string;
  isExact: boolean;
  /** hertz */
  lossAtHz: number;
  ranges: Partial<Record<Measure, Range>>;
  /** none means all */
  families: Family[];
  /** none means approved ones, restricted among them */
  states: CableState[];
  sort: CatalogueSort;
  isReversed: boolean;
  /** ids of the cables held up to compare, the reference first */
  held: string[];
  /** the comparison stands open, side by side */
  isCompared: boolean;
}

export const catalogueSorts = ["relevance", "loss", "z0", "velocityFactor", "outerDiameter", "designation"] as const;
export type CatalogueSort = (typeof catalogueSorts)[number];

const families: Record<Family, true> = { coaxial: true, twistedPair: true, twinaxial: true };
const states: Record<CableState, true> = {
  ...{ draft: true, inReview: true, approved: true, restricted: true },
  ...{ quarantined: true, superseded: true, withdrawn: true },
};

export const usualLossHz = 100e6;
/** How many cables can be held up at once. */
export const mostHeld = 4;

export type Parameters = Record<string, string | string[] | undefined> | URLSearchParams;

/** Every value of a word of the address. */
export function valuesOf(parameters: Parameters, name: string): string[] {
  if (parameters instanceof URLSearchParams) return parameters.getAll(name);
  const value = parameters[name];
  return value === undefined ? [] : Array.isArray(value) ? value : [value];
}

const known = <T extends string>(words: Record<T, true>, texts: string[]): T[] => [
  ...new Set(texts.filter((text): text is T => Object.hasOwn(words, text))),
];

/** A figure of the address; undefined for what is none. */
export function readEnd(text: string | undefined): number | undefined {
  const value = text ? Number(text) : NaN;
  return Number.isFinite(value) ? value : undefined;
}

/** "45..55", "45..", "..55"; undefined for what is no range. */
function readRange(text: string | undefined): Range | undefined {
  const [low, high, ...rest] = text?.split("..") ?? [];
  const [from, to] = [readEnd(low), readEnd(high)];
  if (high === undefined || rest.length > 0 || (from ?? to) === undefined || (from ?? -Infinity) > (to ?? Infinity))
    return undefined;
  return { ...(from !== undefined && { from }), ...(to !== undefined && { to }) };
}

/** A range as the address and the API spell it. */
export function rangeText({ from, to }: Range): string {
  return `${from ?? ""}..${to ?? ""}`;
}

/** The frequency losses are asked at, hertz. */
export function readFrequency(parameters: Parameters): number {
  const hertz = Number(valuesOf(parameters, "at")[0]);
  return hertz > 0 && hertz < 1e12 ? hertz : usualLossHz;
}

/** The cables held up, each once, no more than there is room for. */
export function readHeld(parameters: Parameters): string[] {
  return [...new Set(valuesOf(parameters, "held").filter((id) => id !== "" && id.length <= 100))].slice(0, mostHeld);
}

/** The order an address asks for; without one by fit where something is searched for, else by designation. */
function readSort(parameters: Parameters, q: string): Pick<CatalogueAsked, "sort" | "isReversed"> {
  const text = valuesOf(parameters, "sort")[0] ?? "";
  const asked = catalogueSorts.find((key) => key === text.replace(/^-/, ""));
  const isReadable = asked !== undefined && !(asked === "relevance" && q.trim() === "");
  return isReadable ? { sort: asked, isReversed: text.startsWith("-") } : { sort: usualSort(q), isReversed: false };
}

/** The order of a list nobody has ordered otherwise. */
export function usualSort(q: string): CatalogueSort {
  return q.trim() ? "relevance" : "designation";
}

/** What cannot be read in an address is left out: a mangled link still opens the catalogue. */
export function readCatalogueAddress(parameters: Parameters): CatalogueAsked {
  const q = (valuesOf(parameters, "q")[0] ?? "").slice(0, 200);
  const held = readHeld(parameters);
  const ranges = measureNames.flatMap((name) => {
    const range = readRange(valuesOf(parameters, measures[name])[0]);
    return range ? [[name, range] as const] : [];
  });
  return {
    q,
    isExact: valuesOf(parameters, "exact")[0] === "true",
    lossAtHz: readFrequency(parameters),
    ranges: Object.fromEntries(ranges),
    families: known(families, valuesOf(parameters, "family")),
    states: known(states, valuesOf(parameters, "state")),
    ...readSort(parameters, q),
    held,
    isCompared: held.length > 0 && valuesOf(parameters, "compare")[0] === "open",
  };
}

/** A path with the words after it, if there are any. */
export function withQuery(path: string, parameters: URLSearchParams): string {
  const text = parameters.toString();
  return text ? `${path}?${text}` : path;
}

/** The address of a search, without what is as usual. */
export function catalogueAddress(asked: CatalogueAsked): string {
  const parameters = new URLSearchParams();
  if (asked.q) parameters.set("q", asked.q);
  if (asked.isExact) parameters.set("exact", "true");
  if (asked.lossAtHz !== usualLossHz) parameters.set("at", String(asked.lossAtHz));
  for (const name of measureNames) {
    const range = asked.ranges[name];
    if (range) parameters.set(measures[name], rangeText(range));
  }
  for (const family of asked.families) parameters.append("family", family);
  for (const state of asked.states) parameters.append("state", state);
  if (asked.sort !== usualSort(asked.q) || asked.isReversed) parameters.set("sort", sortText(asked));
  for (const id of asked.held) parameters.append("held", id);
  if (asked.isCompared && asked.held.length > 0) parameters.set("compare", "open");
  return withQuery("/cables", parameters);
}

/** An order as the address and the API spell it. */
export const sortText = ({ sort, isReversed }: Pick<CatalogueAsked, "sort" | "isReversed">) =>
  `${isReversed ? "-" : ""}${sort}`;
