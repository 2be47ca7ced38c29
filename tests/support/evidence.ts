/** Files as evidence, for tests. */
import { database } from "@/db/client";
import { cableEvidence } from "@/db/schema/evidence";
import { actor } from "@/tests/support/people";

/** A small table beside an entry's first revision. */
export function addFile(cableId: string, id: string): void {
  const content = Buffer.from("f,loss\n1,2\n");
  database()
    .insert(cableEvidence)
    .values({
      ...{ id, cableId, revision: 1, fileName: "table.csv", mediaType: "text/csv", sizeBytes: content.byteLength },
      ...{ hash: id, title: "A table", content, addedById: actor("librarian").personId },
      addedAt: "2026-01-01T00:00:00.000Z",
    })
    .run();
}
