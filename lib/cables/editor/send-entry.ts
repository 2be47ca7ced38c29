/** Calls of the editor to the API. */
import { changeBetween, type EntryDraft } from "@/lib/cables/editor/entry-draft";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import type { Cable } from "@/lib/cables/schema";
import { call, ProblemError } from "@/lib/http/call";

const tag = (version: number) => `"${version}"`;
const pathOf = (cableId: string) => `/cables/${encodeURIComponent(cableId)}`;

/** Adds an entry with what was typed of it; two calls, since a new entry is given without its inputs. */
export async function createEntry({ inputs, ...entry }: EntryDraft): Promise<CableRevision> {
  const { id, revision } = await call<Cable>("/cables", { method: "POST", body: entry });
  const { version } = await call<CableRevision>(`${pathOf(id)}/revisions/${revision}`);
  return call<CableRevision>(pathOf(id), { method: "PATCH", body: { inputs }, ifMatch: tag(version) });
}

/**
 * Saves what has changed of a draft. Where the answer to an earlier try was lost, the server may have it already: that
 * is as good.
 */
export async function saveEntry(
  { id, version }: Pick<CableRevision, "id" | "version">,
  change: Partial<EntryDraft>,
  next: EntryDraft,
): Promise<CableRevision> {
  try {
    return await call<CableRevision>(pathOf(id), { method: "PATCH", body: change, ifMatch: tag(version) });
  } catch (error) {
    const current = currentOf(error);
    if (current && Object.keys(changeBetween(draftOf(current), next)).length === 0) return current;
    throw error;
  }
}

/** The revision as it now stands, from the refusal of a stale change. */
export function currentOf(error: unknown): CableRevision | undefined {
  const isStale = error instanceof ProblemError && error.problem.status === 412;
  return isStale ? (error.problem.current as CableRevision | undefined) : undefined;
}

export function draftOf(revision: CableRevision): EntryDraft {
  const { designation, aliases, name, family, model, construction, build, figures, limits, inputs } = revision;
  return { designation, aliases, name, family, model, construction, build, figures, limits, inputs: inputs ?? {} };
}

export function submitEntry(
  { id, version }: Pick<CableRevision, "id" | "version">,
  note: string,
): Promise<CableRevision> {
  return call<CableRevision>(`${pathOf(id)}/submit`, { method: "POST", body: { note }, ifMatch: tag(version) });
}

export function discardEntry(cableId: string): Promise<void> {
  return call<undefined>(pathOf(cableId), { method: "DELETE" });
}

export function beginRevision(cableId: string, reason: string): Promise<CableRevision> {
  return call<CableRevision>(`${pathOf(cableId)}/revisions`, { method: "POST", body: { reason } });
}

/** What a refusal says to whoever asked. */
export function refusalWords(error: unknown): string {
  if (error instanceof ProblemError) return error.problem.errors?.[0]?.message ?? error.problem.detail;
  return error instanceof Error ? error.message : "Something went wrong. Try again.";
}
