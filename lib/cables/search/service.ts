/** Finding entries by text: how a search is read in the team's own words, and what the full-text table finds for it. */
import { eq, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { teams } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { readableEntries } from "@/lib/auth/visibility/service";
import { listFacts } from "@/lib/cables/facts/service";
import type { Candidate } from "@/lib/cables/filter";
import {
  matchExpression,
  type RangeQuantity,
  readSearch,
  type SearchReading,
  type Vocabulary,
  vocabulary,
} from "@/lib/cables/read-search";
import { currentRevision } from "@/lib/cables/rows/service";

// The vocabulary of each team, good as long as no word of its catalogue has changed.
const vocabularies = new Map<string, { wordsVersion: number; words: Vocabulary }>();

function vocabularyOf(teamId: string): Vocabulary {
  const db = database();
  const team = db.select({ wordsVersion: teams.wordsVersion }).from(teams).where(eq(teams.id, teamId)).get();
  const wordsVersion = team?.wordsVersion ?? 0;
  const kept = vocabularies.get(teamId);
  if (kept?.wordsVersion === wordsVersion) return kept.words;
  const rows = db
    .select({ words: cableRevisions.words })
    .from(cables)
    .innerJoin(cableRevisions, currentRevision)
    .where(eq(cables.teamId, teamId))
    .all();
  const words = vocabulary(rows.flatMap((row) => row.words.split(" ")));
  vocabularies.set(teamId, { wordsVersion, words });
  return words;
}

/** How the team's catalogue understands a text; undefined for an empty one. */
export function readSearchIn(actor: Actor, text: string | undefined, isExact: boolean): SearchReading | undefined {
  return text ? readSearch(text, vocabularyOf(actor.teamId), isExact) : undefined;
}

const ranged: Record<RangeQuantity, (entry: Candidate) => number | null> = {
  z0Ohm: (entry) => entry.z0Ohm,
  outerDiameterMm: (entry) => entry.outerDiameterMm,
  velocityFactor: (entry) => entry.velocityFactor,
  capacitancePfPerM: (entry) => entry.capacitanceFPerM * 1e12,
};

function isWithinRanges(reading: SearchReading, entry: Candidate): boolean {
  return reading.terms.every((term) => {
    if (term.kind === "word") return true;
    const value = ranged[term.quantity](entry);
    return value !== null && value >= term.from && value <= term.to;
  });
}

/** How well entries fit the words of a search, by id; undefined when it has no words. */
function fits(teamId: string, reading: SearchReading, entries: readonly Candidate[]): Map<string, number> | undefined {
  const match = matchExpression(teamId.replaceAll("-", ""), reading.terms);
  if (match === null) return undefined;
  // bm25 is negative, and the more so the better
  const rows = database().all<{ id: string; revision: number; fit: number }>(
    sql`select cable_id as id, revision, -bm25(cable_search) as fit from cable_search where cable_search match ${match}`,
  );
  const revisions = new Map(entries.map((entry) => [entry.id, entry.revision]));
  const found = new Map<string, number>();
  for (const { id, revision, fit } of rows) if (revisions.get(id) === revision) found.set(id, fit);
  return found;
}

export interface Found {
  /** by designation */
  entries: readonly Candidate[];
  /** the more, the better an entry fits the search; 0 without words */
  relevance: (entry: Candidate) => number;
  /** how many entries there are to search, whatever is searched for */
  readable: number;
}

/**
 * The entries that the actor may read and the search finds, with what they are filtered and sorted by.
 * @param lossAtHz - frequency for the loss, hertz; the loss is null without it
 */
export function findCandidates(actor: Actor, reading: SearchReading | undefined, lossAtHz: number | undefined): Found {
  const entries = listFacts(actor.teamId, lossAtHz).filter(readableEntries(actor));
  const readable = entries.length;
  if (!reading) return { entries, relevance: () => 0, readable };
  const within = entries.filter((entry) => isWithinRanges(reading, entry));
  const found = fits(actor.teamId, reading, within);
  if (!found) return { entries: within, relevance: () => 0, readable };
  return {
    entries: within.filter(({ id }) => found.has(id)),
    relevance: ({ id }) => found.get(id) ?? 0,
    readable,
  };
}
