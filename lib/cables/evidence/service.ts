/** Evidence of an entry: files kept whole beside it. */
import { createHash } from "node:crypto";
import { and, count, desc, eq, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { cableEvidence } from "@/db/schema/evidence";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { readableCables } from "@/lib/auth/visibility/service";
import { evidenceFieldsSchema, type Evidence, type EvidenceList } from "@/lib/cables/evidence/schema";
import { type EvidenceType, typeByContent } from "@/lib/cables/evidence/media";
import { mayAddRecords, requireRecords } from "@/lib/cables/records/service";
import { getCable } from "@/lib/cables/service";
import { AppError } from "@/lib/http/errors";
import type { ReadForm, Upload } from "@/lib/http/form";
import { parse } from "@/lib/http/parse";

const mebibyte = 1_048_576;
const mostOfTeam = 2_000 * mebibyte;
const mostOfCable = 100;

function checkedType({ bytes }: Upload): EvidenceType {
  const type = typeByContent(bytes);
  if (type) return type;
  const what = "Its content is none of PDF, PNG, JPEG, WebP, Touchstone and CSV, whatever its name says.";
  throw new AppError("invalid_input", what, { file: [what] });
}

const inMb = (bytes: number) => `${Math.ceil(bytes / mebibyte).toLocaleString("en")} MB`;

/** Call inside the transaction that adds. */
function checkRoom(actor: Actor, cableId: string, size: number, hash: string): void {
  const db = database();
  const same = db
    .select({ fileName: cableEvidence.fileName })
    .from(cableEvidence)
    .where(and(eq(cableEvidence.cableId, cableId), eq(cableEvidence.hash, hash)))
    .get();
  if (same) throw new AppError("conflict", `The entry has this file already, as ${same.fileName}.`);
  const taken = db
    .select({ bytes: sql<number>`coalesce(sum(${cableEvidence.sizeBytes}), 0)` })
    .from(cableEvidence)
    .innerJoin(cables, eq(cables.id, cableEvidence.cableId))
    .where(eq(cables.teamId, actor.teamId))
    .get()?.bytes;
  if ((taken ?? 0) + size > mostOfTeam)
    throw new AppError(
      "too_large",
      `The team's evidence takes ${inMb(taken ?? 0)} of ${inMb(mostOfTeam)}; this file of ${inMb(size)} does not fit.`,
    );
  const [counted] = db.select({ files: count() }).from(cableEvidence).where(eq(cableEvidence.cableId, cableId)).all();
  if ((counted?.files ?? 0) >= mostOfCable)
    throw new AppError("conflict", `An entry has at most ${mostOfCable} files.`);
}

/**
 * Adds a file. Who may has been asked before the form was read, and is asked again.
 * @throws AppError `forbidden`; `invalid_input`; `conflict` for the same file; `too_large` where the team has no room
 */
export function addEvidence(actor: Actor, cableId: string, { file, fields }: ReadForm): Evidence {
  const revision = requireRecords(actor, cableId);
  const { title } = parse(evidenceFieldsSchema, fields);
  if (!file || file.bytes.byteLength === 0)
    throw new AppError("invalid_input", "There is no file in the form.", { file: ["Add a file that is not empty."] });
  const mediaType = checkedType(file);
  const content = Buffer.from(file.bytes);
  const hash = createHash("sha256").update(content).digest("hex");
  const id = crypto.randomUUID();
  const addedAt = new Date().toISOString();
  const sizeBytes = content.byteLength;
  const told = { id, revision, fileName: file.fileName, mediaType, sizeBytes, hash, title };
  database().transaction(
    (tx) => {
      checkRoom(actor, cableId, sizeBytes, hash);
      tx.insert(cableEvidence)
        .values({ ...told, cableId, content, addedById: actor.personId, addedAt })
        .run();
    },
    { behavior: "immediate" },
  );
  return { ...told, addedByName: actor.name, addedAt };
}

const revisionOf = and(
  eq(cableRevisions.cableId, cableEvidence.cableId),
  eq(cableRevisions.revision, cableEvidence.revision),
);

/**
 * Of an entry that the actor may read; what was added to an open revision is for those who may read that.
 * @throws AppError `not_found`, `forbidden` as reading the entry
 */
export function listEvidence(actor: Actor, cableId: string): EvidenceList {
  requirePermission(actor, "cables.read");
  getCable(actor, cableId);
  const { id, revision, fileName, mediaType, sizeBytes, hash, title, addedAt } = cableEvidence;
  const rows = database()
    .select({ id, revision, fileName, mediaType, sizeBytes, hash, title, addedAt, addedByName: people.name })
    .from(cableEvidence)
    .innerJoin(people, eq(people.id, cableEvidence.addedById))
    .innerJoin(cables, eq(cables.id, cableEvidence.cableId))
    .innerJoin(cableRevisions, revisionOf)
    .where(and(readableCables(actor), eq(cables.id, cableId)))
    .orderBy(desc(addedAt))
    .all();
  return { items: rows as Evidence[], mayAdd: mayAddRecords(actor, cableId) };
}

/** One file, whole. @throws AppError `not_found`, `forbidden` */
export function getEvidence(actor: Actor, cableId: string, evidenceId: string) {
  requirePermission(actor, "cables.read");
  getCable(actor, cableId);
  const { fileName, mediaType, content } = cableEvidence;
  const found = database()
    .select({ fileName, mediaType, content })
    .from(cableEvidence)
    .innerJoin(cables, eq(cables.id, cableEvidence.cableId))
    .innerJoin(cableRevisions, revisionOf)
    .where(and(readableCables(actor), eq(cables.id, cableId), eq(cableEvidence.id, evidenceId)))
    .get();
  if (!found) throw new AppError("not_found", "There is no such file.");
  return found;
}
