/** The history of an entry. */
import { and, desc, eq } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { readableCables } from "@/lib/auth/visibility/service";

const approvers = alias(people, "approvers");

/** The revisions of an entry that the actor may read, the newest first. */
export function listRevisions(actor: Actor, cableId: string) {
  requirePermission(actor, "cables.read");
  return database()
    .select({
      revision: cableRevisions.revision,
      state: cableRevisions.state,
      condition: cableRevisions.condition,
      reason: cableRevisions.reason,
      authorName: people.name,
      createdAt: cableRevisions.createdAt,
      approvedByName: approvers.name,
      approvedAt: cableRevisions.approvedAt,
    })
    .from(cableRevisions)
    .innerJoin(cables, eq(cables.id, cableRevisions.cableId))
    .innerJoin(people, eq(people.id, cableRevisions.authorId))
    .leftJoin(approvers, eq(approvers.id, cableRevisions.approvedById))
    .where(and(readableCables(actor), eq(cables.id, cableId)))
    .orderBy(desc(cableRevisions.revision))
    .all();
}

export type RevisionLine = ReturnType<typeof listRevisions>[number];
