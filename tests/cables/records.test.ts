/** What is kept beside an entry: comments, reports, waivers, its end, and how it stood on any day. */
import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { notices } from "@/db/schema/notices";
import { approve } from "@/lib/cables/approval/service";
import { addCableComment, listCableComments } from "@/lib/cables/comments/service";
import { prefer, supersede, withdraw } from "@/lib/cables/ending/service";
import { standingAt } from "@/lib/cables/history/on-day";
import { getCableOn } from "@/lib/cables/history/service";
import { countWaiting, getQueue } from "@/lib/cables/queue/service";
import { listReports, report, settleReport } from "@/lib/cables/reports/service";
import { beginRevision, changeDraft } from "@/lib/cables/revising/service";
import { getCurrentRevision, getOpenRevision } from "@/lib/cables/revisions/service";
import { getCable } from "@/lib/cables/service";
import { approveSchema } from "@/lib/cables/steps/schema";
import { quarantine, restrict, submit } from "@/lib/cables/steps/service";
import { holdsOn, today } from "@/lib/cables/waivers/schema";
import { endWaiver, giveWaiver, listWaivers } from "@/lib/cables/waivers/service";
import { createRun, getRun, updateRun } from "@/lib/runs/service";
import { addCable, coaxModel, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";

const [designer, librarian, admin, auditor] = [
  ...[actor("designer"), actor("librarian"), actor("admin"), actor("auditor")],
] as const;
withDatabase(addPeople);

let count = 0;
function entry(given: Partial<Parameters<typeof addCable>[0]> = {}): string {
  const id = `cable-${++count}`;
  addCable({ id, ...given });
  return id;
}
const versionOf = (id: string) => getCurrentRevision(librarian, id).version;
const told = (personId: string) =>
  database()
    .select()
    .from(notices)
    .where(eq(notices.personId, personId))
    .all()
    .map(({ text }) => text);

describe("Comments", () => {
  test("are about the revision being worked on, unless they say which", () => {
    const id = entry();
    addCableComment(designer, id, { text: "Of the first." });
    beginRevision(designer, id, "Measured anew.");
    addCableComment(designer, id, { text: "Of the draft." });
    addCableComment(librarian, id, { text: "Of the first again.", revision: 1 });
    expect(listCableComments(librarian, id).map(({ revision, text }) => [revision, text])).toEqual([
      [1, "Of the first."],
      [2, "Of the draft."],
      [1, "Of the first again."],
    ]);
  });

  test("on somebody else's draft are its author's and its reviewers' to read", () => {
    const id = entry();
    beginRevision(librarian, id, "Measured anew.");
    addCableComment(librarian, id, { text: "Not yet." });
    expect(listCableComments(designer, id)).toEqual([]);
    expect(() => addCableComment(designer, id, { text: "?", revision: 2 })).toThrow(
      expect.objectContaining({ code: "forbidden" }),
    );
    expect(listCableComments(auditor, id)).toHaveLength(1);
  });
});

describe("A report of a problem", () => {
  test("reaches the reviewers, and its settlement whoever reported it", () => {
    const id = entry();
    const { id: reportId } = report(designer, id, "The braid is loose.");
    expect(told(librarian.personId)).toContainEqual(expect.stringMatching(/reported a problem .*The braid is loose\./));
    settleReport(librarian, id, reportId, { outcome: "noFault", answer: "It is meant to be." });
    expect(told(designer.personId)).toContainEqual(expect.stringMatching(/settled: It is meant to be\./));
    expect(listReports(designer, id)).toMatchObject([{ outcome: "noFault", settledByName: librarian.name }]);
    expect(getCable(designer, id).state).toBe("approved");
  });

  test("can be settled by a quarantine, in one step", () => {
    const id = entry();
    const { id: reportId } = report(designer, id, "Velocity is off.");
    settleReport(librarian, id, reportId, { outcome: "quarantined", answer: "So it is." });
    expect(getCable(designer, id).state).toBe("quarantined");
  });

  test("whose quarantine is impossible stays open, and nothing of it is written", () => {
    const id = entry({ state: "withdrawn" });
    const { id: reportId } = report(designer, id, "Velocity is off.");
    expect(() => settleReport(librarian, id, reportId, { outcome: "quarantined", answer: "So it is." })).toThrow(
      expect.objectContaining({ code: "conflict" }),
    );
    expect(listReports(designer, id)[0]?.settledAt).toBeNull();
  });

  test("is settled once", () => {
    const id = entry();
    const { id: reportId } = report(designer, id, "Stiff.");
    settleReport(librarian, id, reportId, { outcome: "corrected", answer: "Said so in the limits." });
    expect(() => settleReport(admin, id, reportId, { outcome: "noFault", answer: "No." })).toThrow(
      expect.objectContaining({ code: "conflict" }),
    );
  });

  test("of others is not a designer's to read", () => {
    const id = entry();
    report(librarian, id, "Stiff.");
    expect(listReports(designer, id)).toEqual([]);
    expect(listReports(auditor, id)).toHaveLength(1);
  });
});

describe("A waiver", () => {
  const inRun = (cableId: string) => {
    const free = entry();
    const run = createRun(designer, newRun(free));
    const { circuit } = newRun(cableId);
    return { run, take: () => updateRun(designer, run.id, getRun(designer, run.id).version, { circuit }) };
  };

  test("lets the one run have a quarantined cable, and no other", () => {
    const id = entry({ state: "quarantined" });
    const [one, another] = [inRun(id), inRun(id)];
    expect(one.take).toThrow(expect.objectContaining({ code: "invalid_input" }));
    giveWaiver(librarian, id, { runId: one.run.id, reason: "Nothing else is on the shelf.", until: today() });
    expect(one.take().pinned).toEqual([{ cableId: id, revision: 1 }]);
    expect(another.take).toThrow(expect.objectContaining({ code: "invalid_input" }));
  });

  test("is not given for what was quarantined without ever having been approved", () => {
    const id = entry({ state: "quarantined" });
    const { run } = inRun(id);
    database().update(cableRevisions).set({ approvedAt: null }).where(eq(cableRevisions.cableId, id)).run();
    expect(() => giveWaiver(librarian, id, { runId: run.id, reason: "Now.", until: today() })).toThrow(
      expect.objectContaining({ code: "conflict", message: expect.stringContaining("was never approved") }),
    );
  });

  test("that was taken back lets nothing more in, and stays in the list", () => {
    const id = entry({ state: "withdrawn" });
    const { run, take } = inRun(id);
    const { id: waiverId } = giveWaiver(librarian, id, {
      runId: run.id,
      reason: "The last reel.",
      until: "2999-01-01",
    });
    endWaiver(admin, id, waiverId);
    expect(take).toThrow(expect.objectContaining({ code: "invalid_input" }));
    expect(listWaivers(auditor, id)).toMatchObject([{ holds: false, runNumber: run.number }]);
  });

  test("holds through its last day and not a day longer", () => {
    const waiver = { until: "2026-03-01", endedAt: null };
    expect([holdsOn(waiver, "2026-03-01"), holdsOn(waiver, "2026-03-02")]).toEqual([true, false]);
    expect(holdsOn({ ...waiver, endedAt: "2026-02-01T00:00:00.000Z" }, "2026-02-15")).toBe(false);
  });

  test.each([
    ["an approved cable, which needs none", "approved", {}, "conflict"],
    ["a draft, which nobody has reviewed", "draft", {}, "conflict"],
    ["a day that has passed", "quarantined", { until: "2020-01-01" }, "invalid_input"],
    ["a run that is not there", "quarantined", { runId: "none" }, "invalid_input"],
  ] as const)("is not given for %s", (_, state, change, code) => {
    const id = entry({ state });
    const given = { runId: inRun(id).run.id, reason: "Once.", until: "2999-01-01", ...change };
    expect(() => giveWaiver(librarian, id, given)).toThrow(expect.objectContaining({ code }));
  });
});

describe("A successor", () => {
  const give = (id: string, successorId: string) =>
    supersede(librarian, id, versionOf(id), { successorId, equivalence: "dropIn", note: "" });

  test("is named with how far it takes the place, and the owners of runs are told", () => {
    const [id, successorId] = [entry(), entry()];
    const { number } = createRun(designer, newRun(id));
    const superseded = give(id, successorId);
    expect(superseded).toMatchObject({
      state: "superseded",
      successor: { cableId: successorId, equivalence: "dropIn" },
    });
    expect(told(designer.personId)).toContainEqual(
      `${id.toUpperCase()} is superseded by ${successorId.toUpperCase()}: a drop-in replacement. Used in ${number}.`,
    );
  });

  test.each([
    ["itself", (id: string) => id],
    ["what is not there", () => "none"],
    ["another team's", () => (addCable({ id: `theirs-${++count}`, team: other }), `theirs-${count}`)],
    ["a draft", () => entry({ state: "draft" })],
    ["what is quarantined", () => entry({ state: "quarantined" })],
    [
      "what it has itself taken the place of, which would be a circle",
      (id: string) => {
        const former = entry();
        give(former, id);
        return former;
      },
    ],
  ])("is not %s", (_, make) => {
    const id = entry();
    const successorId = make(id);
    expect(() => give(id, successorId)).toThrow(
      expect.objectContaining({ code: "invalid_input", fields: { successorId: [expect.any(String)] } }),
    );
    expect(getCable(designer, id).state).toBe("approved");
  });

  test("ends the entry: no new revision is begun, and one in review is not approved", () => {
    const [id, successorId] = [entry(), entry()];
    const draft = beginRevision(librarian, id, "Measured anew.");
    const { version } = submit(librarian, id, draft.version, { note: "" });
    give(id, successorId);
    expect(() => approve(admin, id, version, approveSchema.parse({}))).toThrow(
      expect.objectContaining({ code: "conflict" }),
    );
    const ended = entry();
    withdraw(librarian, ended, versionOf(ended), { note: "No longer made." });
    expect(() => beginRevision(designer, ended, "Again.")).toThrow(expect.objectContaining({ code: "conflict" }));
  });
});

test("Only what may be used can be preferred, and the mark goes with its end", () => {
  const id = entry();
  expect(prefer(librarian, id, versionOf(id), { preferred: true, note: "" }).preferred).toBe(true);
  withdraw(librarian, id, versionOf(id), { note: "No longer made." });
  expect(getCable(designer, id).preferred).toBe(false);
  expect(() => prefer(librarian, id, versionOf(id), { preferred: true, note: "" })).toThrow(
    expect.objectContaining({ code: "conflict" }),
  );
});

describe("An entry on a day", () => {
  const step = (at: string, revision: number, name: "begin" | "submit" | "approve" | "quarantine" | "supersede") => ({
    ...{ at: `${at}T10:00:00.000Z`, revision, step: name, condition: null },
    state: (
      {
        begin: "draft",
        submit: "inReview",
        approve: "approved",
        quarantine: "quarantined",
        supersede: "superseded",
      } as const
    )[name],
  });
  const life = [
    step("2026-01-01", 1, "begin"),
    step("2026-01-05", 1, "approve"),
    step("2026-02-01", 2, "begin"),
    step("2026-02-10", 1, "quarantine"),
    step("2026-02-20", 2, "approve"),
    step("2026-02-20", 1, "supersede"),
  ];

  test.each([
    ["2025-12-31", undefined],
    ["2026-01-03", { revision: 1, state: "draft" }],
    ["2026-01-05", { revision: 1, state: "approved" }],
    ["2026-02-05", { revision: 1, state: "approved" }],
    ["2026-02-15", { revision: 1, state: "quarantined" }],
    ["2026-03-01", { revision: 2, state: "approved" }],
  ])("%s", (day, expected) => {
    const found = standingAt(life, `${day}T23:59:59.999Z`);
    if (expected === undefined) expect(found).toBeUndefined();
    else expect(found).toMatchObject(expected);
  });

  test("is told from what was written down, values and all, and from before that by its revisions", () => {
    const id = entry();
    const draft = beginRevision(librarian, id, "Measured anew.");
    const model = { ...coaxModel, lossTangent: 3e-4 };
    const { version } = changeDraft(librarian, id, draft.version, { model });
    approve(admin, id, submit(librarian, id, version, { note: "" }).version, approveSchema.parse({}));
    expect(getCableOn(auditor, id, today())).toMatchObject({ revision: 2, state: "approved", model });
    expect(getCableOn(auditor, id, "2026-01-01")).toMatchObject({ revision: 1, state: "approved", model: coaxModel });
    expect(() => getCableOn(auditor, id, "2025-01-01")).toThrow(expect.objectContaining({ code: "not_found" }));
  });

  test("keeps the state of that day, whatever has become of the entry", () => {
    const id = entry();
    restrict(librarian, id, versionOf(id), { condition: "Indoors.", note: "" });
    expect(getCableOn(auditor, id, "2026-01-01").state).toBe("approved");
    expect(getCableOn(auditor, id, today())).toMatchObject({ state: "restricted", condition: "Indoors." });
  });
});

describe("The queue", () => {
  test("counts what changed, and says why one may not approve one's own", () => {
    const id = entry();
    const draft = beginRevision(librarian, id, "Measured anew.");
    const changed = changeDraft(librarian, id, draft.version, {
      model: { ...coaxModel, lossTangent: 3e-4 },
      name: "x",
    });
    submit(librarian, id, changed.version, { note: "" });
    const find = (as: typeof librarian) => getQueue(as).waiting.find(({ cableId }) => cableId === id);
    expect(find(librarian)).toMatchObject({
      revision: 2,
      changedFields: 1,
      refusal: expect.stringMatching(/your own/),
    });
    expect(find(admin)?.refusal).toBeNull();
    expect(countWaiting(admin)).toBe(getQueue(admin).waitingTotal);
    expect(countWaiting(designer)).toBe(0);
    expect(getQueue(actor("admin", other)).waiting).toEqual([]);
  });

  test("names what was settled lately, and the entries due for another look, the first due first", () => {
    const [soon, later, past] = [entry(), entry(), entry()];
    const inDays = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString();
    for (const [id, days] of [
      [soon, 30],
      [later, 200],
      [past, -3],
    ] as const)
      database()
        .update(cables)
        .set({ reviewDueAt: inDays(days) })
        .where(eq(cables.id, id))
        .run();
    expect(getQueue(auditor).due.map(({ cableId, isOverdue }) => [cableId, isOverdue])).toEqual([
      [past, true],
      [soon, false],
    ]);
    const draft = beginRevision(librarian, soon, "Looked at again.");
    approve(admin, soon, submit(librarian, soon, draft.version, { note: "" }).version, approveSchema.parse({}));
    expect(getQueue(auditor).due.map(({ cableId }) => cableId)).toEqual([past]);
    expect(getQueue(auditor).settled[0]).toMatchObject({ cableId: soon, step: "approve", personName: admin.name });
  });
});

test("A quarantine written over by nobody: the version that was looked at must be the one there is", () => {
  const id = entry();
  const version = versionOf(id);
  restrict(librarian, id, version, { condition: "Indoors.", note: "" });
  expect(() => quarantine(admin, id, version, { note: "In doubt." })).toThrow(
    expect.objectContaining({ code: "stale" }),
  );
});

test("Nothing of an entry is open to another team", () => {
  const id = entry();
  const stranger = actor("admin", other);
  for (const ask of [
    () => beginRevision(stranger, id, "x"),
    () => getOpenRevision(stranger, id),
    () => report(stranger, id, "x"),
    () => listWaivers(stranger, id),
    () => addCableComment(stranger, id, { text: "x" }),
    () => getCableOn(stranger, id, today()),
  ])
    expect(ask).toThrow(expect.objectContaining({ code: "not_found" }));
});
