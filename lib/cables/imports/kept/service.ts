/** Imports of the past, with the rows that became no draft. */
import { and, asc, desc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableImportRows, cableImports } from "@/db/schema/imports";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import type { ImportList, KeptImport } from "@/lib/cables/imports/schema";
import { AppError } from "@/lib/http/errors";

const mostListed = 200;

function selectImports(actor: Actor, id?: string) {
  return database()
    .select({
      id: cableImports.id,
      fileName: cableImports.fileName,
      startedByName: people.name,
      startedAt: cableImports.startedAt,
      rowCount: cableImports.rowCount,
      drafts: cableImports.drafts,
      quarantined: cableImports.quarantined,
      skipped: cableImports.skipped,
    })
    .from(cableImports)
    .innerJoin(people, eq(people.id, cableImports.startedById))
    .where(and(eq(cableImports.teamId, actor.teamId), id === undefined ? undefined : eq(cableImports.id, id)));
}

/** The team's imports, the newest first. */
export function listImports(actor: Actor): ImportList {
  requirePermission(actor, "cables.readImports");
  return { items: selectImports(actor).orderBy(desc(cableImports.startedAt)).limit(mostListed).all() };
}

/** @throws AppError `not_found`, also for another team's */
export function getImport(actor: Actor, importId: string): KeptImport {
  requirePermission(actor, "cables.readImports");
  const found = selectImports(actor, importId).get();
  if (!found) throw new AppError("not_found", "There is no such import.");
  const { row, text, faults, cableId } = cableImportRows;
  const rows = database()
    .select({ row, text, faults, cableId })
    .from(cableImportRows)
    .where(eq(cableImportRows.importId, importId))
    .orderBy(asc(row))
    .all();
  return { ...found, rows };
}
