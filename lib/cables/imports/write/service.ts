/** Writing what an import has read: one transaction. */
import { and, eq, inArray } from "drizzle-orm";
import { type Database, database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { cableImportRows, cableImports } from "@/db/schema/imports";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import type { RowRead } from "@/lib/cables/exchange/read-rows";

export interface Written {
  importId: string;
  /** as they turned out: a designation may have been taken since the file was read */
  rows: RowRead[];
  /** by the number of the row */
  cableIds: Map<number, string>;
}

interface Writing {
  actor: Actor;
  importId: string;
  fileName: string;
  at: string;
}

type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];

/** SQLite takes so many values in one statement; a batch stays well below. */
const batch = 100;

function batches<Item>(items: readonly Item[]): Item[][] {
  return Array.from({ length: Math.ceil(items.length / batch) }, (_, i) => items.slice(i * batch, (i + 1) * batch));
}

/** Of rows to be brought in, those whose designation somebody has taken meanwhile are left. */
function stillFree(tx: Transaction, actor: Actor, rows: readonly RowRead[]): RowRead[] {
  const taken = new Set<string>();
  for (const some of batches(rows.flatMap(({ prepared }) => (prepared ? [prepared.entry.designation] : []))))
    for (const { designation } of tx
      .select({ designation: cables.designation })
      .from(cables)
      .where(and(eq(cables.teamId, actor.teamId), inArray(cables.designation, some)))
      .all())
      taken.add(designation);
  return rows.map((row) => {
    if (!row.prepared || !taken.has(row.prepared.entry.designation)) return row;
    const { prepared: _, ...rest } = row;
    return { ...rest, outcome: "duplicate", faults: ["The catalogue has got this designation meanwhile."] };
  });
}

function entryRows({ actor, fileName, at }: Writing, { row, outcome, faults, prepared }: RowRead, cableId: string) {
  if (!prepared) throw new Error("entryRows: a row without an entry");
  const { entry, derived, words } = prepared;
  const { designation, aliases, name, family, condition, model, construction, build, figures, limits, inputs } = entry;
  const state = outcome === "quarantined" ? ("quarantined" as const) : ("draft" as const);
  const reason = `Import of ${fileName}, row ${row}.`;
  const event = { cableId, revision: 1, at, personId: actor.personId };
  return {
    cable: { id: cableId, teamId: actor.teamId, designation, aliases, currentRevision: 1, createdAt: at },
    revision: {
      ...{ cableId, revision: 1, state, condition, reason, authorId: actor.personId, createdAt: at, inputs },
      ...{ name, family, model, construction, build, figures, limits, ...derived, words },
    },
    events: [
      { ...event, step: "begin" as const, state: "draft" as const, condition, note: reason },
      ...(state === "quarantined" ? [{ ...event, step: "quarantine" as const, state, note: faults.join(" ") }] : []),
    ],
  };
}

function insertEntries(tx: Transaction, writing: Writing, rows: readonly RowRead[]): Map<number, string> {
  const cableIds = new Map<number, string>();
  for (const some of batches(rows.filter(({ prepared }) => prepared))) {
    const made = some.map((row) => {
      const cableId = crypto.randomUUID();
      cableIds.set(row.row, cableId);
      return entryRows(writing, row, cableId);
    });
    tx.insert(cables)
      .values(made.map(({ cable }) => cable))
      .run();
    tx.insert(cableRevisions)
      .values(made.map(({ revision }) => revision))
      .run();
    tx.insert(cableEvents)
      .values(made.flatMap(({ events }) => events))
      .run();
  }
  return cableIds;
}

function insertKept(tx: Transaction, importId: string, rows: readonly RowRead[], cableIds: Map<number, string>): void {
  const kept = rows.filter(({ outcome }) => outcome !== "draft" && outcome !== "unchanged");
  for (const some of batches(kept))
    tx.insert(cableImportRows)
      .values(
        some.map(({ row, text, faults }) => ({ importId, row, text, faults, cableId: cableIds.get(row) ?? null })),
      )
      .run();
}

/**
 * Writes the rows that are to be brought in, and keeps those that are not, with the reason: all in one transaction.
 * @param rows - as read and compared with the catalogue
 */
export function writeImport(actor: Actor, fileName: string, rowCount: number, rows: readonly RowRead[]): Written {
  requirePermission(actor, "cables.import");
  const at = new Date().toISOString();
  const importId = crypto.randomUUID();
  return database().transaction(
    (tx) => {
      const free = stillFree(tx, actor, rows);
      const count = (...outcomes: RowRead["outcome"][]) =>
        free.filter(({ outcome }) => outcomes.includes(outcome)).length;
      tx.insert(cableImports)
        .values({
          ...{ id: importId, teamId: actor.teamId, fileName, startedById: actor.personId, startedAt: at, rowCount },
          ...{ committedAt: at, drafts: count("draft"), quarantined: count("quarantined") },
          skipped: count("unchanged", "duplicate", "noEntry"),
        })
        .run();
      const cableIds = insertEntries(tx, { actor, importId, fileName, at }, free);
      insertKept(tx, importId, free, cableIds);
      return { importId, rows: free, cableIds };
    },
    { behavior: "immediate" },
  );
}
