/** The catalogue as its reader may see it. */
import { and, desc, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { knownCables, readableCables } from "@/lib/auth/visibility/service";
import { facetsOf } from "@/lib/cables/facets";
import { type Candidate, filters, sift } from "@/lib/cables/filter";
import { unapprovedStates } from "@/lib/cables/model";
import { firstInOrder, sortAsked, sortedBy } from "@/lib/cables/order";
import type { CablePage, CableQuery } from "@/lib/cables/query";
import { currentRevision, listItems, selectWhole, toCable } from "@/lib/cables/rows/service";
import type { Cable, CableState } from "@/lib/cables/schema";
import { loosenings } from "@/lib/cables/search/loosen";
import { findCandidates, readSearchIn } from "@/lib/cables/search/service";
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

/**
 * The entries that may go into a new run, whole: what a run is edited and matched with. By designation, the preferred
 * first where there are more than asked for.
 * @param most - of a large catalogue, no more than this
 */
export function listUsableCables(actor: Actor, most = -1): Cable[] {
  requirePermission(actor, "cables.read");
  return selectWhole()
    .innerJoin(cableRevisions, currentRevision)
    .where(and(knownCables(actor), inArray(cableRevisions.state, ["approved", "restricted"])))
    .orderBy(desc(cables.preferred), cables.designation)
    .limit(most)
    .all()
    .map(toCable)
    .sort((a, b) => (a.designation < b.designation ? -1 : 1));
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
  const { entries, relevance, readable } = findCandidates(actor, reading, query.lossAtHz);
  // Whoever sees the catalogue is shown what may be used; an installer, what was used.
  const defaultStates: CableState[] | undefined = may(actor, "cables.readCatalogue") ? ["approved"] : undefined;
  const asked = filters(query, defaultStates);
  const sifted = sift(entries, asked);
  const { items, nextCursor } = pageOf(sifted.passing, query, relevance);
  return {
    items: listItems(actor, items),
    nextCursor,
    total: sifted.passing.length,
    outOf: readable,
    ...(reading && { readAs: reading.text, corrected: reading.corrected }),
    ...(reading &&
      sifted.passing.length === 0 && {
        loosenings: loosenings(
          reading,
          (less) => sift(findCandidates(actor, less, query.lossAtHz).entries, asked).passing.length,
        ),
      }),
    ...(query.facets && { facets: facetsOf(entries, sifted) }),
  };
}

/** Of what passed, the page a query asks for. */
function pageOf(passing: Candidate[], query: CableQuery, relevance: (entry: Candidate) => number) {
  const { key, isReversed } = sortAsked(query);
  const wanted = { after: query.cursor, most: query.limit ?? defaultLimit };
  const { items, count, last } = firstInOrder(passing, sortedBy(key, relevance), isReversed, wanted);
  return { items, nextCursor: last && count > items.length ? encodeCursor(last) : null };
}
