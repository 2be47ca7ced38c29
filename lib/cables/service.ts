/** The catalogue as its reader may see it. */
import { and, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { knownCables, readableCables } from "@/lib/auth/visibility/service";
import { facetsOf } from "@/lib/cables/facets";
import { type Candidate, comparePlaces, filters, sortAsked, sortValue } from "@/lib/cables/filter";
import { unapprovedStates } from "@/lib/cables/model";
import type { CablePage, CableQuery } from "@/lib/cables/query";
import { currentRevision, listItems, selectWhole, toCable } from "@/lib/cables/rows/service";
import type { Cable, CableState } from "@/lib/cables/schema";
import { loosenings } from "@/lib/cables/search/loosen";
import { listCandidates, readSearchIn } from "@/lib/cables/search/service";
import { AppError } from "@/lib/http/errors";
import { defaultLimit, encodeCursor } from "@/lib/http/list";

/**
 * One entry, its current revision whole.
 * @throws AppError `not_found`, also for another team's; `forbidden` for somebody else's draft or review
 */
export function getCable(actor: Actor, cableId: string): Cable {
  requirePermission(actor, "cables.read");
  const row = selectWhole()
    .innerJoin(cableRevisions, currentRevision)
    .where(and(knownCables(actor), eq(cables.id, cableId)))
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
    .where(and(knownCables(actor), inArray(cableRevisions.state, ["approved", "restricted"])))
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
    .where(and(readableCables(actor), inArray(cables.id, ids)))
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

/** The designations of cables by id. Call with the ids in a run the actor may see. */
export function listDesignations(actor: Actor, ids: string[]): Map<string, string> {
  const rows = database()
    .select({ id: cables.id, designation: cables.designation })
    .from(cables)
    .where(and(eq(cables.teamId, actor.teamId), inArray(cables.id, ids)))
    .all();
  return new Map(rows.map((row) => [row.id, row.designation]));
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
