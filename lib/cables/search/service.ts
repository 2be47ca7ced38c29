/** Finding entries by text: how a search is read in the team's own words, and what the full-text table finds for it. */
import { and, eq, type SQL, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { teams } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { readableCables } from "@/lib/auth/visibility/service";
import type { Candidate } from "@/lib/cables/filter";
import { lossDbPer100m } from "@/lib/cables/model";
import { matchExpression, readSearch, type SearchReading, type Vocabulary, vocabulary } from "@/lib/cables/read-search";
import { currentRevision } from "@/lib/cables/rows/service";
import type { LineModel } from "@/lib/line/element";

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

const ranged = {
  z0Ohm: sql`${cableRevisions.z0Ohm}`,
  outerDiameterMm: sql`${cableRevisions.outerDiameterMm}`,
  velocityFactor: sql`${cableRevisions.velocityFactor}`,
  capacitancePfPerM: sql`${cableRevisions.capacitanceFPerM} * 1e12`,
};

function withinRanges(reading: SearchReading | undefined): SQL | undefined {
  const conditions = reading?.terms.flatMap((term) =>
    term.kind === "range" ? [sql`${ranged[term.quantity]} between ${term.from} and ${term.to}`] : [],
  );
  return and(...(conditions ?? []));
}

const onItsRevision = sql`cable_search.cable_id = ${cables.id} and cable_search.revision = ${cables.currentRevision}`;

/**
 * The entries that the actor may read and the search finds, with what they are filtered and sorted by.
 * @param lossAtHz - frequency for the loss, hertz; the loss is null without it
 */
export function listCandidates(
  actor: Actor,
  reading: SearchReading | undefined,
  lossAtHz: number | undefined,
): Candidate[] {
  const match = reading ? matchExpression(actor.teamId.replaceAll("-", ""), reading.terms) : null;
  const columns = {
    id: cables.id,
    designation: cables.designation,
    preferred: cables.preferred,
    family: cableRevisions.family,
    state: cableRevisions.state,
    z0Ohm: cableRevisions.z0Ohm,
    velocityFactor: cableRevisions.velocityFactor,
    outerDiameterMm: cableRevisions.outerDiameterMm,
    maxFrequencyHz: cableRevisions.maxFrequencyHz,
    // bm25 is negative, and the more so the better
    relevance: match === null ? sql<number>`0` : sql<number>`-bm25(cable_search)`,
    ...(lossAtHz !== undefined && { model: cableRevisions.model }),
  };
  const query = database().select(columns).from(cables).innerJoin(cableRevisions, currentRevision).$dynamic();
  if (match !== null) query.innerJoin(sql`cable_search`, onItsRevision);
  const matches = match === null ? undefined : sql`cable_search match ${match}`;
  const rows = query.where(and(matches, readableCables(actor), withinRanges(reading))).all();
  return (rows as (Omit<Candidate, "lossDbPer100m"> & { model?: LineModel })[]).map(({ model, ...row }) => ({
    ...row,
    lossDbPer100m: model && lossAtHz !== undefined ? lossDbPer100m(model, lossAtHz) : null,
  }));
}
