/** Rows of the catalogue's tables -> the shapes of the wire. Who may see them has been decided by the caller. */
import { and, countDistinct, eq, inArray } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { runCables, runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { visibleRuns } from "@/lib/auth/visibility/service";
import type { Candidate } from "@/lib/cables/filter";
import type { Cable, CableItem } from "@/lib/cables/schema";

/** Joins an entry with the revision people see of it. */
export const currentRevision = and(
  eq(cableRevisions.cableId, cables.id),
  eq(cableRevisions.revision, cables.currentRevision),
);
const successors = alias(cables, "successors");

/** Entries with what names their successor; join `cable_revisions` to say in which revision. */
export function selectWhole() {
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

export function toCable({ cable, revision, successorDesignation }: WholeRow): Cable {
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

/** In how many runs that the actor may see each cable is used. */
function countUses(actor: Actor, ids: string[]): Map<string, number> {
  const rows = database()
    .select({ cableId: runCables.cableId, uses: countDistinct(runCables.runId) })
    .from(runCables)
    .innerJoin(runs, eq(runs.id, runCables.runId))
    .where(and(inArray(runCables.cableId, ids), visibleRuns(actor)))
    .groupBy(runCables.cableId)
    .all();
  return new Map(rows.map((row) => [row.cableId, row.uses]));
}

/** The rows of the catalogue for entries that a search has found, in its order. */
export function listItems(actor: Actor, entries: Candidate[]): CableItem[] {
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
