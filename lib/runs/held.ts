/**
 * Changes of a run that the server does not have yet, kept in the browser so that a closed tab or a dead battery loses
 * nothing. One person's in one browser; signing out forgets them.
 */
import type { RunDraft } from "@/lib/runs/edit";

export interface Held {
  draft: RunDraft;
  /** what the draft was made from, so that what others changed meanwhile stays theirs */
  base: RunDraft;
  /** the version the draft was made from */
  version: number;
}

/**
 * Whether something is whole enough for a page to draw; the server checks the rest when it is sent. By hand, since every
 * page loads this file and the schemas would come with it.
 */
function isDraft(value: unknown): boolean {
  if (typeof value !== "object" || value === null || !("name" in value) || !("circuit" in value)) return false;
  const { name, circuit } = value;
  const isCircuit = typeof circuit === "object" && circuit !== null && "elements" in circuit;
  return typeof name === "string" && isCircuit && Array.isArray(circuit.elements);
}

const prefix = "ropewalk-held:";

export function heldKey(personId: string, runId: string): string {
  return `${prefix}${personId}:${runId}`;
}

/** What is kept under a key; whatever cannot be read there counts as nothing. */
export function readHeld(key: string): Held | null {
  try {
    const held: unknown = JSON.parse(window.localStorage.getItem(key) ?? "null");
    if (typeof held !== "object" || held === null || !("draft" in held && "base" in held && "version" in held))
      return null;
    return isDraft(held.draft) && isDraft(held.base) ? (held as Held) : null;
  } catch {
    return null;
  }
}

/** Keeps a draft, or forgets it with null. A browser without room keeps nothing, and the page still asks before it closes. */
export function hold(key: string, held: Held | null): void {
  try {
    if (held === null) window.localStorage.removeItem(key);
    else window.localStorage.setItem(key, JSON.stringify(held));
  } catch {
    return;
  }
}

/** How many changes one person has kept in this browser. */
export function countHeld(personId: string): number {
  return Object.keys(window.localStorage).filter((key) => key.startsWith(`${prefix}${personId}:`)).length;
}

/** Forgets one person's changes; whoever else uses this browser keeps theirs. */
export function forgetHeld(personId: string): void {
  for (const key of Object.keys(window.localStorage))
    if (key.startsWith(`${prefix}${personId}:`)) window.localStorage.removeItem(key);
}
