/** The catalogue as its reader may see it. */
import { and, countDistinct, eq, inArray, isNull } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { runCables, runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { currentRevision, known, readable } from "@/lib/cables/access/service";
import { facetsOf } from "@/lib/cables/facets";
import { type Candidate, comparePlaces, filters, sortAsked, sortValue } from "@/lib/cables/filter";
import { unapprovedStates } from "@/lib/cables/model";
import type { CablePage, CableQuery } from "@/lib/cables/query";
import type { Cable, CableItem, CableState } from "@/lib/cables/schema";
import { loosenings } from "@/lib/cables/search/loosen";
import { listCandidates, readSearchIn } from "@/lib/cables/search/service";
import { AppError } from "@/lib/http/errors";
import { defaultLimit, encodeCursor } from "@/lib/http/list";

const successors = alias(cables, "successors");

function selectWhole() {
  return database()
    .select({ cable: cables, revision: cableRevisions, successorDesignation: successors.designation })
    .from(cables)
    .leftJoin(successors, eq(successors.id, cables.successorId));
}
type WholeRow = {
  cable: typeof cables.$inferSelect;
  revision: typeof cableRevisions.$inferSelect;
  successorDesignation: string | null;
};

function toCable({ cable, revision, successorDesignation }: WholeRow): Cable {
  const { successorId, equivalence } = cable;
  return {
    id: cable.id,
    designation: cable.designation,
    aliases: cable.aliases,
    name: revision.name,
    family: revision.family,
    state: revision.state,
    condition: revision.condition,
    preferred: cable.preferred,
    revision: revision.revision,
    model: revision.model,
    construction: revision.construction,
    build: revision.build,
    figures: revision.figures,
    limits: revision.limits,
    successor:
      successorId !== null && equivalence !== null && successorDesignation !== null
        ? { cableId: successorId, designation: successorDesignation, equivalence }
        : null,
  };
}

/**
 * One entry, its current revision whole.
 * @throws AppError `not_found`, also for another team's; `forbidden` for somebody else's draft or review
 */
export function getCable(actor: Actor, cableId: string): Cable {
  requirePermission(actor, "cables.read");
  const row = selectWhole()
    .innerJoin(cableRevisions, currentRevision)
    .where(and(known(actor), eq(cables.id, cableId)))
    .get();
  if (!row) throw new AppError("not_found", "There is no such cable.");
  const isOpen = may(actor, "cables.readUnapproved") || row.revision.authorId === actor.personId;
  if (unapprovedStates.includes(row.revision.state) && !isOpen)
    throw new AppError("forbidden", "Until it is approved, an entry is read by its author and its reviewers.");
  return toCable(row);
}

/** Every entry that may go into a new run, whole: what a run is edited and matched with. */
export function listUsableCables(actor: Actor): Cable[] {
  requirePermission(actor, "cables.read");
  return selectWhole()
    .innerJoin(cableRevisions, currentRevision)
    .where(and(known(actor), inArray(cableRevisions.state, ["approved", "restricted"])))
    .orderBy(cables.designation)
    .all()
    .map(toCable);
}

/** A reference to a cable; without a revision it means the current one. */
export interface CableReference {
  cableId: string;
  revision?: number;
}

/**
 * A look-up of cables by reference, among those the actor may read.
 * @param references - all that will be looked up
 */
export function cableFinder(
  actor: Actor,
  references: CableReference[],
): (reference: CableReference) => Cable | undefined {
  if (references.length === 0) return () => undefined;
  const ids = [...new Set(references.map((reference) => reference.cableId))];
  const rows = selectWhole()
    .innerJoin(cableRevisions, eq(cableRevisions.cableId, cables.id))
    .where(and(readable(actor), inArray(cables.id, ids)))
    .all();
  const byRevision = new Map(rows.map((row) => [`${row.cable.id} ${row.revision.revision}`, row]));
  const currentRevisions = new Map(rows.map(({ cable }) => [cable.id, cable.currentRevision]));
  return ({ cableId, revision }) => {
    const row = byRevision.get(`${cableId} ${revision ?? currentRevisions.get(cableId)}`);
    return row && toCable(row);
  };
}

/** The cables referred to that the actor may read, in the order of the references. */
export function listReferredCables(actor: Actor, references: CableReference[]): Cable[] {
  const find = cableFinder(actor, references);
  return references.flatMap((reference) => find(reference) ?? []);
}

function countUses(actor: Actor, ids: string[]): Map<string, number> {
  const rows = database()
    .select({ cableId: runCables.cableId, uses: countDistinct(runCables.runId) })
    .from(runCables)
    .innerJoin(runs, eq(runs.id, runCables.runId))
    .where(and(inArray(runCables.cableId, ids), eq(runs.teamId, actor.teamId), isNull(runs.removedAt)))
    .groupBy(runCables.cableId)
    .all();
  return new Map(rows.map((row) => [row.cableId, row.uses]));
}

function listItems(actor: Actor, entries: Candidate[]): CableItem[] {
  if (entries.length === 0) return []; // SQLite would walk the whole catalogue to find none of it
  const ids = entries.map((entry) => entry.id);
  const uses = countUses(actor, ids);
  const rows = selectWhole().innerJoin(cableRevisions, currentRevision).where(inArray(cables.id, ids)).all();
  const byId = new Map(rows.map((row) => [row.cable.id, row]));
  return entries.flatMap(({ id, lossDbPer100m }) => {
    const row = byId.get(id);
    if (!row) return [];
    const { model: _model, figures: _figures, limits: _limits, successor: _successor, ...cable } = toCable(row);
    const { z0Ohm, velocityFactor, capacitanceFPerM, delaySPerM, outerDiameterMm } = row.revision;
    const lossRangeDbPer100m: [number, number] = [row.revision.lossLowDbPer100m, row.revision.lossHighDbPer100m];
    const figures = {
      z0Ohm,
      velocityFactor,
      capacitanceFPerM,
      delaySPerM,
      outerDiameterMm,
      lossDbPer100m,
      lossRangeDbPer100m,
    };
    return [{ ...cable, ...figures, usedInRuns: uses.get(id) ?? 0 }];
  });
}

/** A page of the catalogue: what the query finds of what the actor may read. */
export function listCables(actor: Actor, query: CableQuery): CablePage {
  requirePermission(actor, "cables.read");
  const reading = readSearchIn(actor, query.q, query.exact ?? false);
  const entries = listCandidates(actor, reading, query.lossAtHz);
  // Whoever sees the catalogue is shown what may be used; an installer, what was used.
  const defaultStates: CableState[] | undefined = may(actor, "cables.readCatalogue") ? ["approved"] : undefined;
  const passes = filters(query, defaultStates);
  const { key, isReversed } = sortAsked(query);
  const isPassing = (entry: Candidate) => Object.values(passes).every((isPassed) => isPassed(entry));
  const passing = entries
    .filter(isPassing)
    .map((entry) => ({ entry, place: { key: sortValue(entry, key), id: entry.id } }))
    .sort((a, b) => comparePlaces(a.place, b.place, isReversed));
  const { cursor } = query;
  const rest = cursor ? passing.filter(({ place }) => comparePlaces(place, cursor, isReversed) > 0) : passing;
  const page = rest.slice(0, query.limit ?? defaultLimit);
  const last = page.at(-1);
  return {
    items: listItems(
      actor,
      page.map(({ entry }) => entry),
    ),
    nextCursor: last && rest.length > page.length ? encodeCursor(last.place) : null,
    total: passing.length,
    ...(reading && { readAs: reading.text, corrected: reading.corrected }),
    ...(reading &&
      passing.length === 0 && {
        loosenings: loosenings(reading, (less) => listCandidates(actor, less, query.lossAtHz).filter(isPassing).length),
      }),
    ...(query.facets && { facets: facetsOf(entries, passes) }),
  };
}
