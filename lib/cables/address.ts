/** The address of a catalogue page <-> what is asked of the catalogue, so that any search can be sent to a colleague. Pure. */
import { familySchema, stateSchema, type CableState, type Family } from "@/lib/cables/schema";

export interface CatalogueAsked {
  q: string;
  isExact: boolean;
  /** hertz */
  lossAtHz: number;
  families: Family[];
  states: CableState[];
  sort: CatalogueSort;
}

export const catalogueSorts = ["relevance", "loss", "z0", "velocityFactor", "outerDiameter", "designation"] as const;
export type CatalogueSort = (typeof catalogueSorts)[number];

const usualLossHz = 100e6;

type Parameters = Record<string, string | string[] | undefined>;

const all = (value: string | string[] | undefined) =>
  value === undefined ? [] : Array.isArray(value) ? value : [value];

/** What cannot be read in an address is left out: a mangled link still opens the catalogue. */
export function readCatalogueAddress(parameters: Parameters): CatalogueAsked {
  const lossAtHz = Number(all(parameters.at)[0]);
  const sort = catalogueSorts.find((key) => key === parameters.sort);
  const q = (all(parameters.q)[0] ?? "").slice(0, 200);
  return {
    q,
    isExact: parameters.exact === "true",
    lossAtHz: lossAtHz > 0 && lossAtHz < 1e12 ? lossAtHz : usualLossHz,
    families: all(parameters.family).flatMap((text) => familySchema.safeParse(text).data ?? []),
    states: all(parameters.state).flatMap((text) => stateSchema.safeParse(text).data ?? []),
    sort: sort ?? (q ? "relevance" : "designation"),
  };
}

/** The address of a search, without what is as usual. */
export function catalogueAddress(asked: CatalogueAsked): string {
  const parameters = new URLSearchParams();
  if (asked.q) parameters.set("q", asked.q);
  if (asked.isExact) parameters.set("exact", "true");
  if (asked.lossAtHz !== usualLossHz) parameters.set("at", String(asked.lossAtHz));
  for (const family of asked.families) parameters.append("family", family);
  for (const state of asked.states) parameters.append("state", state);
  if (asked.sort !== (asked.q ? "relevance" : "designation")) parameters.set("sort", asked.sort);
  const text = parameters.toString();
  return text ? `/cables?${text}` : "/cables";
}

/** The same search asked of the API. */
export function cableRequest(asked: CatalogueAsked, cursor: string | null): string {
  const parameters = new URLSearchParams({ limit: "60", facets: "true", lossAtHz: String(asked.lossAtHz) });
  if (asked.q.trim()) parameters.set("q", asked.q.trim());
  if (asked.isExact) parameters.set("exact", "true");
  parameters.set("sort", asked.q.trim() || asked.sort !== "relevance" ? asked.sort : "designation");
  for (const family of asked.families) parameters.append("family", family);
  for (const state of asked.states.length > 0 ? asked.states : (["approved"] as const))
    parameters.append("state", state);
  if (cursor) parameters.set("cursor", cursor);
  return `/cables?${parameters}`;
}
