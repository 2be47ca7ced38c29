/** Bringing in many entries at once: read in a thread of its own, compared with the catalogue, written all or nothing. */
import { and, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { valuesText } from "@/lib/cables/exchange/catalogue";
import type { FileAsked, FileHead, FilePart, RowRead } from "@/lib/cables/exchange/read-rows";
import type { ImportCounts, ImportReport, ImportRow } from "@/lib/cables/imports/schema";
import { writeImport } from "@/lib/cables/imports/write/service";
import { currentRevision } from "@/lib/cables/rows/service";
import { computePartsApart } from "@/lib/compute/apart/compute-apart";
import { AppError } from "@/lib/http/errors";

export interface ImportFile extends FileAsked {
  bytes: Uint8Array;
  isDryRun: boolean;
}

export interface ImportProgress {
  done: number;
  of: number;
}

/** The values the catalogue has under these designations, as text, with what to call them. */
function known(actor: Actor, designations: string[]): Map<string, { values: string; standing: string }> {
  const rows = database()
    .select({ cable: cables, revision: cableRevisions })
    .from(cables)
    .innerJoin(cableRevisions, currentRevision)
    .where(and(eq(cables.teamId, actor.teamId), inArray(cables.designation, designations)))
    .all();
  return new Map(
    rows.map(({ cable, revision }) => {
      const { designation, aliases } = cable;
      const { name, family, condition, model, construction, build, figures, limits, inputs, state } = revision;
      const values = {
        designation,
        aliases,
        name,
        family,
        condition,
        model,
        construction,
        build,
        figures,
        limits,
        inputs,
      };
      return [designation, { values: valuesText(values), standing: `revision ${revision.revision}, ${state}` }];
    }),
  );
}

/** Rows whose designation the catalogue has: unchanged, or left alone with the reason. */
function compared(actor: Actor, rows: RowRead[]): RowRead[] {
  const designations = rows.flatMap(({ prepared }) => (prepared ? [prepared.entry.designation] : []));
  if (designations.length === 0) return rows;
  const inCatalogue = known(actor, designations);
  return rows.map((row) => {
    const there = row.prepared && inCatalogue.get(row.prepared.entry.designation);
    if (!there || !row.prepared) return row;
    const { prepared, ...rest } = row;
    if (valuesText(prepared.entry) === there.values) return { ...rest, outcome: "unchanged", faults: [] };
    const fault = `The catalogue has it with other values (${there.standing}). A change of it is a new revision.`;
    return { ...rest, outcome: "duplicate", faults: [fault] };
  });
}

function rowOf({ row, designation, outcome, faults, notes, prepared }: RowRead, cableId: string | null): ImportRow {
  const derived = prepared?.derived;
  const figures = derived && {
    z0Ohm: derived.z0Ohm,
    velocityFactor: derived.velocityFactor,
    lossDbPer100m: derived.lossHighDbPer100m,
  };
  return { row, designation, outcome, faults, notes, figures: figures ?? null, cableId };
}

export function countsOf(rows: readonly { outcome: ImportRow["outcome"] }[]): ImportCounts {
  const counts: ImportCounts = { draft: 0, quarantined: 0, unchanged: 0, duplicate: 0, noEntry: 0 };
  for (const { outcome } of rows) counts[outcome]++;
  return counts;
}

/** Reads the file apart, part by part; each is compared as it comes, so that nobody else waits for long. */
async function readApart(actor: Actor, file: ImportFile, told?: (progress: ImportProgress) => void) {
  const { bytes, isDryRun: _, ...asked } = file;
  let head: FileHead | undefined;
  const rows: RowRead[] = [];
  try {
    await computePartsApart(
      "importRows",
      (json) => {
        const part = JSON.parse(new TextDecoder().decode(json)) as FilePart;
        if ("head" in part) head = part.head;
        else rows.push(...compared(actor, part.rows));
        if (head) told?.({ done: rows.length, of: head.rowCount });
      },
      bytes,
      asked,
    );
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw new AppError("invalid_input", error.message.replace(/^\w+: /, ""));
  }
  if (!head) throw new Error("readApart: rows without a head");
  return { head, rows };
}

/**
 * Reads a file of entries and, unless it is a dry run, writes them: each a draft of the actor, or in quarantine where it
 * contradicts itself. Either all of them are there afterwards or none.
 * @param told - called as rows are done
 * @throws AppError `forbidden`; `invalid_input` what is wrong with the file as a whole
 */
export async function importCables(
  actor: Actor,
  file: ImportFile,
  told?: (progress: ImportProgress) => void,
): Promise<ImportReport> {
  requirePermission(actor, "cables.import");
  const { head, rows } = await readApart(actor, file, told);
  const written = file.isDryRun ? undefined : writeImport(actor, file.fileName, head.rowCount, rows);
  const final = written?.rows ?? rows;
  return {
    importId: written?.importId ?? null,
    fileName: file.fileName,
    ...head,
    counts: countsOf(final),
    rows: final.map((row) => rowOf(row, written?.cableIds.get(row.row) ?? null)),
  };
}
