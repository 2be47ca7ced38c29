/** Writing what an import has read: one transaction. */
import { and, eq, inArray, sql } from "drizzle-orm";
import type { SQLiteTable } from "drizzle-orm/sqlite-core";
import { type Database, database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { cableImportRows, cableImports } from "@/db/schema/imports";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import type { Prepared } from "@/lib/cables/exchange/judge-entry";
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

/** The columns of a table as places to be filled, so that a statement is made once for thousands of rows. */
function places<Table extends SQLiteTable>(table: Table, names: readonly (keyof Table["$inferInsert"] & string)[]) {
  return Object.fromEntries(names.map((name) => [name, sql.placeholder(name)])) as Table["$inferInsert"];
}

function statements(tx: Transaction) {
  const cable = places(cables, ["id", "teamId", "designation", "aliases", "createdAt"]);
  const revision = places(cableRevisions, [
    ...([
      "cableId",
      "state",
      "condition",
      "reason",
      "authorId",
      "createdAt",
      "inputs",
      "name",
      "family",
      "model",
    ] as const),
    ...(["construction", "build", "figures", "limits", "z0Ohm", "velocityFactor", "capacitanceFPerM"] as const),
    ...(["delaySPerM", "lossLowDbPer100m", "lossHighDbPer100m", "outerDiameterMm", "maxFrequencyHz", "words"] as const),
  ]);
  const event = places(cableEvents, ["cableId", "at", "personId", "step", "state", "condition", "note"]);
  return {
    cable: tx
      .insert(cables)
      .values({ ...cable, currentRevision: 1 })
      .prepare(),
    revision: tx
      .insert(cableRevisions)
      .values({ ...revision, revision: 1 })
      .prepare(),
    event: tx
      .insert(cableEvents)
      .values({ ...event, revision: 1 })
      .prepare(),
  };
}

type Statements = ReturnType<typeof statements>;

/** An entry with its first revision and the steps that led to its state. */
function insertEntry(into: Statements, writing: Writing, read: RowRead, { entry, derived, words }: Prepared): string {
  const { actor, fileName, at } = writing;
  const { designation, aliases, standing: _, ...values } = entry;
  const cableId = crypto.randomUUID();
  const isQuarantined = read.outcome === "quarantined";
  const reason = `Import of ${fileName}, row ${read.row}.`;
  into.cable.run({ id: cableId, teamId: actor.teamId, designation, aliases, createdAt: at });
  into.revision.run({
    ...{ cableId, state: isQuarantined ? "quarantined" : "draft", reason, authorId: actor.personId, createdAt: at },
    ...values,
    ...derived,
    words,
  });
  const event = { cableId, at, personId: actor.personId };
  into.event.run({ ...event, step: "begin", state: "draft", condition: values.condition, note: reason });
  if (isQuarantined)
    into.event.run({
      ...event,
      step: "quarantine",
      state: "quarantined",
      condition: null,
      note: read.faults.join(" "),
    });
  return cableId;
}

function insertEntries(tx: Transaction, writing: Writing, rows: readonly RowRead[]): Map<number, string> {
  const into = statements(tx);
  return new Map(
    rows.flatMap((read) => (read.prepared ? [[read.row, insertEntry(into, writing, read, read.prepared)]] : [])),
  );
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
