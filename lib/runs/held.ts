/**
 * Changes of a run that the server does not have yet, kept in the browser so that a closed tab or a dead battery loses
 * nothing. One person's in one browser; signing out forgets them.
 */
import { z } from "zod";
import type { RunDraft } from "@/lib/runs/edit";

export interface Held {
  draft: RunDraft;
  /** what the draft was made from, so that what others changed meanwhile stays theirs */
  base: RunDraft;
  /** the version the draft was made from */
  version: number;
}

/** As far as a draft must be whole for a page to draw it; the server checks the rest when it is sent. */
const draftSchema = z.looseObject({
  name: z.string(),
  circuit: z.looseObject({ elements: z.array(z.looseObject({ kind: z.string() })) }),
});
const heldSchema = z.looseObject({ draft: draftSchema, base: draftSchema, version: z.number() });

const prefix = "ropewalk-held:";

export function heldKey(personId: string, runId: string): string {
  return `${prefix}${personId}:${runId}`;
}

/** What is kept under a key; whatever cannot be read there counts as nothing. */
export function readHeld(key: string): Held | null {
  try {
    const held: unknown = JSON.parse(window.localStorage.getItem(key) ?? "null");
    const read = heldSchema.safeParse(held);
    return read.success ? (held as Held) : null;
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
