import { describe, expect, test } from "vitest";
import { database } from "@/db/client";
import { runs } from "@/db/schema/runs";
import { createRun } from "@/lib/runs/service";
import { placesIn } from "@/lib/runs/uses";
import { listUses } from "@/lib/runs/uses/service";
import type { Circuit } from "@/lib/runs/circuit-schema";
import { addCable, coaxModel, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";

const end = { kind: "constant", reOhm: 50, imOhm: 0 } as const;
const circuit: Circuit = {
  source: end,
  elements: [
    { kind: "cable", line: { cableId: "a" }, lengthM: 2 },
    { kind: "stub", connection: "shunt", end: "short", line: { cableId: "b" }, lengthM: 0.5, paralleled: 2 },
    { kind: "cable", line: { cableId: "b" }, lengthM: 30 },
    { kind: "joint" },
    { kind: "cable", line: { cableId: "a", revision: 2 }, lengthM: 3, paralleled: 2 },
    { kind: "cable", line: { model: coaxModel }, lengthM: 5 },
  ],
  load: end,
};

describe("placesIn(circuit, cable)", () => {
  test("gives each stretch of the main path from the source, whichever revision lies there", () => {
    expect(placesIn(circuit, "a")).toEqual({
      ...{ totalLengthM: 40, cableLengthM: 8, stubsAtM: [] },
      stretches: [
        { fromM: 0, toM: 2 },
        { fromM: 32, toM: 35 },
      ],
    });
  });

  test("counts a stub to what has to be cut, and tells where it hangs", () => {
    expect(placesIn(circuit, "b")).toMatchObject({
      ...{ cableLengthM: 31, stubsAtM: [2] },
      stretches: [{ fromM: 2, toM: 32 }],
    });
  });

  test("finds nothing of a cable that is not there", () => {
    expect(placesIn(circuit, "c")).toMatchObject({ cableLengthM: 0, stretches: [], stubsAtM: [] });
  });
});

describe("Where a cable is used", () => {
  withDatabase(async () => {
    await addPeople();
    addCable({ id: "a" });
    addCable({ id: "theirs", team: other });
  });
  const designer = actor("designer");

  test("are the runs that the reader may see, the last changed first, without removed ones", () => {
    const names = ["one", "two", "three"];
    const made = names.map((name) => createRun(designer, newRun("a", { name })));
    made.forEach(({ id }, i) =>
      database()
        .$client.prepare("update runs set changed_at = ? where id = ?")
        .run(`2026-01-0${i + 1}`, id),
    );
    createRun(actor("designer", other), newRun("theirs"));
    expect(listUses(designer, "a")).toMatchObject({
      total: 3,
      items: [{ name: "three", cableLengthM: 12, totalLengthM: 12 }, { name: "two" }, { name: "one" }],
    });
    database().update(runs).set({ removedAt: "2026-02-01" }).run();
    expect(listUses(designer, "a")).toEqual({ total: 0, items: [] });
  });

  test("is not told of runs that an installer was not given", () => {
    createRun(designer, newRun("a"));
    expect(listUses(actor("installer"), "a").total).toBe(0);
    expect(listUses(actor("admin", other), "a").total).toBe(0);
  });
});
