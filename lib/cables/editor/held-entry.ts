/**
 * What is typed of an entry and the server does not have yet, kept in the browser beside what is kept of runs: one
 * person's in one browser, and forgotten when they sign out.
 */
import { heldKey } from "@/lib/runs/held";
import type { EntryTexts } from "@/lib/cables/editor/texts";

export interface HeldEntry {
  texts: EntryTexts;
  /** what the texts were made from, so that what others changed meanwhile stays theirs */
  base: EntryTexts;
  /** the version the texts were made from; 0 for an entry that is not on the server */
  version: number;
}

/** @param cableId - null for an entry that is not on the server yet */
export function entryKey(personId: string, cableId: string | null): string {
  return heldKey(personId, cableId === null ? "new-cable" : `cable-${cableId}`);
}

/** Whether something is whole enough for a form to show. */
function isTexts(value: unknown): value is EntryTexts {
  if (typeof value !== "object" || value === null) return false;
  const { designation, figures, rows, build, sources, ruling } = value as Record<string, unknown>;
  const areObjects = [figures, build, sources, ruling].every((each) => typeof each === "object" && each !== null);
  return typeof designation === "string" && areObjects && Array.isArray(rows);
}

export function readHeldEntry(key: string): HeldEntry | null {
  try {
    const held: unknown = JSON.parse(window.localStorage.getItem(key) ?? "null");
    if (typeof held !== "object" || held === null) return null;
    const { texts, base, version } = held as Record<string, unknown>;
    return isTexts(texts) && isTexts(base) && typeof version === "number" ? { texts, base, version } : null;
  } catch {
    return null;
  }
}

/** Keeps texts, or forgets them with null; false where the browser has no room for them. */
export function holdEntry(key: string, held: HeldEntry | null): boolean {
  try {
    if (held === null) window.localStorage.removeItem(key);
    else window.localStorage.setItem(key, JSON.stringify(held));
    return true;
  } catch {
    return false;
  }
}
