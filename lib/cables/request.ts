/** What is asked of the catalogue, as the API is asked. Pure. */
import { measureNames, rangeText, sortText, withQuery, type CatalogueAsked } from "@/lib/cables/address";

const perPage = 100;
const withFacets = "facets=true";

/** The first page of a search, with the counts of its filters. What is held up to compare makes no difference. */
export function cableRequest(asked: CatalogueAsked): string {
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
  // None asked: the API knows which are meant for whom.
  for (const state of asked.states) parameters.append("state", state);
  return `${withQuery("/cables", parameters)}&${withFacets}`;
}

/** The page after one that ended at a cursor; the filters have been counted by then. */
export function nextRequest(first: string, cursor: string): string {
  return `${first.replace(`&${withFacets}`, "")}&cursor=${encodeURIComponent(cursor)}`;
}

/** The words of a request as the API's schema takes them: a repeated one as a list. */
export function readRequest(request: string): Record<string, string | string[]> {
  const words = new URLSearchParams(request.slice(request.indexOf("?")));
  return Object.fromEntries(
    [...new Set(words.keys())].map((name) => {
      const values = words.getAll(name);
      return [name, values.length === 1 ? (values[0] ?? "") : values];
    }),
  );
}
