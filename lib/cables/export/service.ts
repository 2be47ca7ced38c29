/** Taking the catalogue out as a file, a page of entries at a time. */
import { and, asc, gt } from "drizzle-orm";
import type { Actor } from "@/lib/auth/actor";
import { cableRevisions, cables } from "@/db/schema/cables";
import { requirePermission } from "@/lib/auth/permission";
import { readableCables } from "@/lib/auth/visibility/service";
import { catalogueFormat, catalogueVersion, type CatalogueEntry, entryInOrder } from "@/lib/cables/exchange/catalogue";
import { byteOrderMark, csvHead, csvRow } from "@/lib/cables/exchange/csv-write";
import { currentRevision, selectWhole } from "@/lib/cables/rows/service";

export type ExportFormat = "csv" | "json";

const perPage = 100;

/** The entries after a designation, in the order of designations, each as it stands in a file. */
function page(actor: Actor, after: string, most: number): CatalogueEntry[] {
  const rows = selectWhole()
    .innerJoin(cableRevisions, currentRevision)
    .where(and(readableCables(actor), gt(cables.designation, after)))
    .orderBy(asc(cables.designation))
    .limit(most)
    .all();
  return rows.map(({ cable, revision, successorDesignation }) => {
    const { designation, aliases, preferred, equivalence } = cable;
    const { name, family, condition, model, construction, build, figures, limits, inputs, state } = revision;
    const successor = successorDesignation && equivalence && { designation: successorDesignation, equivalence };
    return entryInOrder({
      ...{ designation, aliases, name, family, condition, model, construction, build, figures, limits, inputs },
      standing: { state, revision: revision.revision, preferred, successor: successor || null },
    });
  });
}

interface Asked {
  format: ExportFormat;
  /** the designation after which it begins */
  after?: string;
  /** entries at most */
  limit?: number;
}

/**
 * The catalogue as the actor may read it, in pieces of so many entries: each is read when the one before has been taken,
 * so that a large catalogue is never held whole.
 */
export function* exportCatalogue(actor: Actor, { format, after = "", limit = Infinity }: Asked): Generator<string> {
  requirePermission(actor, "cables.export");
  const isCsv = format === "csv";
  yield isCsv ? byteOrderMark + csvHead() : `{"format":"${catalogueFormat}","version":${catalogueVersion},"cables":[`;
  let [last, count] = [after, 0];
  while (count < limit) {
    const entries = page(actor, last, Math.min(perPage, limit - count));
    if (entries.length === 0) break;
    const text = isCsv ? entries.map(csvRow).join("") : entries.map((entry) => JSON.stringify(entry)).join(",\n");
    yield isCsv ? text : `${count > 0 ? "," : ""}\n${text}`;
    count += entries.length;
    last = entries.at(-1)?.designation ?? last;
  }
  if (!isCsv) yield "\n]}\n";
}
