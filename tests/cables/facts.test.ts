import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { Kept } from "@/lib/cables/facts/kept";
import { listFacts } from "@/lib/cables/facts/service";
import { lossDbPer100m } from "@/lib/cables/model";
import { addCable, coaxModel } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { addPeople, home, other } from "@/tests/support/people";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "b" });
  addCable({ id: "a" });
  addCable({ id: "draft", state: "draft" });
  addCable({ id: "theirs", team: other });
});

const fact = (id: string, lossAtHz?: number) => listFacts(home.id, lossAtHz).find((entry) => entry.id === id);
const revision = (id: string) => and(eq(cableRevisions.cableId, id), eq(cableRevisions.revision, 1));

test("The copy in memory is a team's own, by designation, and the same array while nothing changes", () => {
  expect(listFacts(home.id, undefined).map(({ id }) => id)).toEqual(["a", "b", "draft"]);
  expect(listFacts(other.id, undefined).map(({ id }) => id)).toEqual(["theirs"]);
  expect(listFacts("nobody", undefined)).toEqual([]);
  expect(listFacts(home.id, 1e8)).toBe(listFacts(home.id, 1e8));
});

test("The loss is that of the entry's own model at the frequency asked, and none without a frequency", () => {
  expect(fact("a", 1e8)?.lossDbPer100m).toBe(lossDbPer100m(coaxModel, 1e8));
  expect(fact("a", 2e8)?.lossDbPer100m).toBe(lossDbPer100m(coaxModel, 2e8));
  expect(fact("a")?.lossDbPer100m).toBeNull();
});

test("A state and a preference that change in the database are seen at the next look", () => {
  const db = database();
  db.update(cableRevisions).set({ state: "quarantined" }).where(revision("a")).run();
  expect(fact("a")?.state).toBe("quarantined");
  db.update(cables).set({ preferred: true }).where(eq(cables.id, "a")).run();
  expect(fact("a")?.preferred).toBe(true);
});

test("A draft's new model gives its new loss, and the others keep theirs", () => {
  const before = fact("b", 1e8)?.lossDbPer100m;
  const model = { ...coaxModel, lossTangent: 0.01 };
  database().update(cableRevisions).set({ model }).where(revision("draft")).run();
  expect(fact("draft", 1e8)?.lossDbPer100m).toBe(lossDbPer100m(model, 1e8));
  expect(fact("b", 1e8)?.lossDbPer100m).toBe(before);
});

test("An entry added or deleted, with all that hangs on it, is seen at the next look", () => {
  addCable({ id: "new" });
  expect(fact("new")).toBeDefined();
  database().delete(cables).where(eq(cables.id, "new")).run();
  expect(fact("new")).toBeUndefined();
});

test("A map that keeps two values forgets the one longest unused", () => {
  const kept = new Kept<string, number>(2);
  kept.put("a", 1);
  kept.put("b", 2);
  kept.get("a");
  kept.put("c", 3);
  expect([...kept.entries()]).toEqual([
    ["a", 1],
    ["c", 3],
  ]);
});
