import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { database } from "@/db/client";
import { cableRevisions } from "@/db/schema/cables";
import { addCable } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { addPeople } from "@/tests/support/people";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "approved" });
  addCable({ id: "draft", state: "draft" });
});

function change(cableId: string, values: Partial<typeof cableRevisions.$inferInsert>): () => unknown {
  const revision = and(eq(cableRevisions.cableId, cableId), eq(cableRevisions.revision, 1));
  return () => database().update(cableRevisions).set(values).where(revision).run();
}

test.each(["name", "model", "construction", "build", "figures", "limits"] as const)(
  "The %s of an approved revision never changes, whoever asks the database",
  (column) => {
    const value = { name: "other", model: { conductors: [], lInfHPerM: 1, cFPerM: 1 }, figures: [], limits: {} };
    expect(change("approved", { [column]: { ...value, construction: null, build: null }[column] })).toThrow(
      "the values of an approved revision never change",
    );
  },
);

test("The state of an approved revision can change", () => {
  change("approved", { state: "quarantined" })();
  const row = database().select().from(cableRevisions).where(eq(cableRevisions.cableId, "approved")).get();
  expect(row?.state).toBe("quarantined");
});

test("A draft's values can change", () => {
  change("draft", { name: "renamed" })();
  const row = database().select().from(cableRevisions).where(eq(cableRevisions.cableId, "draft")).get();
  expect(row?.name).toBe("renamed");
});
