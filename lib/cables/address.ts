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
const measureNames = Object.keys(measures) as Measure[];

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
const perPage = 100;

type Parameters = Record<string, string | string[] | undefined> | URLSearchParams;

/** Every value of a word of the address. */
function all(parameters: Parameters, name: string): string[] {
  if (parameters instanceof URLSearchParams) return parameters.getAll(name);
  const value = parameters[name];
  return value === undefined ? [] : Array.isArray(value) ? value : [value];
}

const known = <T extends string>(words: Record<T, true>, texts: string[]): T[] => [
  ...new Set(texts.filter((text): text is T => Object.hasOwn(words, text))),
];

function readEnd(text: string | undefined): number | undefined {
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

function readFrequency(parameters: Parameters): number {
  const hertz = Number(all(parameters, "at")[0]);
  return hertz > 0 && hertz < 1e12 ? hertz : usualLossHz;
}

function readHeld(parameters: Parameters): string[] {
  return [...new Set(all(parameters, "held").filter((id) => id !== "" && id.length <= 100))].slice(0, mostHeld);
}

/** The order an address asks for; without one by fit where something is searched for, else by designation. */
function readSort(parameters: Parameters, q: string): Pick<CatalogueAsked, "sort" | "isReversed"> {
  const text = all(parameters, "sort")[0] ?? "";
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
  const q = (all(parameters, "q")[0] ?? "").slice(0, 200);
  const held = readHeld(parameters);
  const ranges = measureNames.flatMap((name) => {
    const range = readRange(all(parameters, measures[name])[0]);
    return range ? [[name, range] as const] : [];
  });
  return {
    q,
    isExact: all(parameters, "exact")[0] === "true",
    lossAtHz: readFrequency(parameters),
    ranges: Object.fromEntries(ranges),
    families: known(families, all(parameters, "family")),
    states: known(states, all(parameters, "state")),
    ...readSort(parameters, q),
    held,
    isCompared: held.length > 0 && all(parameters, "compare")[0] === "open",
  };
}

function withQuery(path: string, parameters: URLSearchParams): string {
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

const sortText = ({ sort, isReversed }: CatalogueAsked) => `${isReversed ? "-" : ""}${sort}`;

/** The same search asked of the API; the counts of the filters come with the first page. */
export function cableRequest(asked: CatalogueAsked, cursor: string | null): string {
  const parameters = new URLSearchParams({ limit: String(perPage), lossAtHz: String(asked.lossAtHz) });
  const q = asked.q.trim();
  if (q) parameters.set("q", q);
  if (asked.isExact) parameters.set("exact", "true");
  parameters.set("sort", sortText(asked.sort === "relevance" && !q ? { ...asked, sort: "designation" } : asked));
  for (const name of measureNames) {
    const range = asked.ranges[name];
    if (range) parameters.set(name, rangeText(range));
  }
  for (const family of asked.families) parameters.append("family", family);
  for (const state of asked.states.length > 0 ? asked.states : (["approved"] as const))
    parameters.append("state", state);
  if (cursor) parameters.set("cursor", cursor);
  else parameters.set("facets", "true");
  return withQuery("/cables", parameters);
}

/** What an entry is looked at with. */
export interface EntryAsked {
  /** hertz */
  lossAtHz: number;
  /** °C */
  temperatureC: number;
  held: string[];
}

const usualTemperatureC = 20;

export function readEntryAddress(parameters: Parameters): EntryAsked {
  const temperature = readEnd(all(parameters, "t")[0]) ?? usualTemperatureC;
  return {
    lossAtHz: readFrequency(parameters),
    temperatureC: temperature >= -200 && temperature <= 400 ? temperature : usualTemperatureC,
    held: readHeld(parameters),
  };
}

/** The address of an entry, with what is held up so that it is not lost on the way. */
export function entryAddress(cableId: string, asked: Partial<EntryAsked>): string {
  const { lossAtHz = usualLossHz, temperatureC = usualTemperatureC, held = [] } = asked;
  const parameters = new URLSearchParams();
  if (lossAtHz !== usualLossHz) parameters.set("at", String(lossAtHz));
  if (temperatureC !== usualTemperatureC) parameters.set("t", String(temperatureC));
  for (const id of held) parameters.append("held", id);
  return withQuery(`/cables/${encodeURIComponent(cableId)}`, parameters);
}
