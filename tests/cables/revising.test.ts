/** New revisions, what is written into them, and the steps that lead to an approved one. */
import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { database } from "@/db/client";
import { cables } from "@/db/schema/cables";
import { notices } from "@/db/schema/notices";
import { members, people } from "@/db/schema/team";
import { approve } from "@/lib/cables/approval/service";
import { createDraft, deleteDraft } from "@/lib/cables/drafts/service";
import { addEvidence, getEvidence, listEvidence } from "@/lib/cables/evidence/service";
import { listEvents } from "@/lib/cables/events/service";
import { newCableSchema } from "@/lib/cables/new-cable";
import { beginRevision, changeDraft } from "@/lib/cables/revising/service";
import { getOpenRevision, getRevision, listRevisions } from "@/lib/cables/revisions/service";
import { getCable } from "@/lib/cables/service";
import { approveSchema } from "@/lib/cables/steps/schema";
import { quarantine, release, restrict, returnRevision, submit } from "@/lib/cables/steps/service";
import type { Actor } from "@/lib/auth/actor";
import { changeRules, rulesInForce, rulesTag } from "@/lib/team/rules/service";
import { createRun } from "@/lib/runs/service";
import { addCable, coaxModel, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, home } from "@/tests/support/people";

const [designer, librarian, admin] = [actor("designer"), actor("librarian"), actor("admin")];
const second: Actor = {
  ...librarian,
  personId: "second-librarian",
  name: "Second librarian",
  email: "second@x.example",
};

withDatabase(async () => {
  await addPeople();
  const { personId, name, email } = second;
  database().insert(people).values({ id: personId, name, email, passwordHash: "", createdAt: "2026-01-01" }).run();
  database().insert(members).values({ teamId: home.id, personId, role: "librarian" }).run();
});

let count = 0;
/** An approved entry of the librarian's. */
function entry(): string {
  const id = `entry-${++count}`;
  addCable({ id });
  return id;
}

const plain = approveSchema.parse({});
const lossier = { ...coaxModel, lossTangent: 2e-4 };

/** A revision of an entry, changed and sent by the librarian. */
function inReview(id: string) {
  const draft = beginRevision(librarian, id, "Measured anew.");
  const changed = changeDraft(librarian, id, draft.version, { model: lossier });
  return submit(librarian, id, changed.version, { note: "" });
}

const told = (personId: string) =>
  database()
    .select()
    .from(notices)
    .where(eq(notices.personId, personId))
    .all()
    .map(({ kind, text }) => `${kind}: ${text}`);

test("A new revision is its author's draft with the values of the current one, which people go on seeing", () => {
  const id = entry();
  const draft = beginRevision(designer, id, "The sheet has a new issue.");
  expect(draft).toMatchObject({ revision: 2, state: "draft", authorId: designer.personId, isCurrent: false });
  expect(draft.model).toEqual(coaxModel);
  expect(getCable(actor("auditor"), id)).toMatchObject({ revision: 1, state: "approved" });
});

test("One revision is worked on at a time", () => {
  const id = entry();
  beginRevision(designer, id, "One.");
  expect(() => beginRevision(librarian, id, "Two.")).toThrow(expect.objectContaining({ code: "conflict" }));
});

test("A draft is changed by its author and by those who review, and by nobody else", () => {
  const id = entry();
  const { version } = beginRevision(librarian, id, "Measured anew.");
  expect(() => changeDraft(designer, id, version, { name: "other" })).toThrow(
    expect.objectContaining({ code: "forbidden" }),
  );
  expect(changeDraft(admin, id, version, { name: "other" })).toMatchObject({ name: "other" });
});

test("A change to a version that has passed is refused with the draft as it now stands", () => {
  const id = entry();
  const { version } = beginRevision(librarian, id, "Measured anew.");
  const changed = changeDraft(librarian, id, version, { name: "first" });
  expect(changed.version).toBeGreaterThan(version);
  const stale = { code: "stale", extra: { members: { current: changed } } };
  expect(() => changeDraft(second, id, version, { name: "second" })).toThrow(
    expect.objectContaining({ code: "stale" }),
  );
  try {
    changeDraft(second, id, version, { name: "second" });
  } catch (error) {
    expect(error).toMatchObject(stale);
  }
  expect(getOpenRevision(librarian, id).name).toBe("first");
});

test("A change that changes nothing is no change", () => {
  const id = entry();
  const { version, name, model } = beginRevision(librarian, id, "Measured anew.");
  expect(changeDraft(librarian, id, version, { name, model }).version).toBe(version);
});

test("What an approved entry is called stays, whatever a later draft says", () => {
  const id = entry();
  const { version } = beginRevision(librarian, id, "Measured anew.");
  expect(() => changeDraft(librarian, id, version, { designation: "ELSE" })).toThrow(
    expect.objectContaining({ code: "invalid_input", fields: { designation: [expect.stringMatching(/stays/)] } }),
  );
});

test("An entry that was never approved can be renamed, but not to what another is called", () => {
  const taken = entry();
  const draft = createDraft(
    designer,
    newCableSchema.parse({ designation: "NEW", family: "coaxial", model: coaxModel }),
  );
  const { version } = getOpenRevision(designer, draft.id);
  expect(() => changeDraft(designer, draft.id, version, { designation: taken.toUpperCase() })).toThrow(
    expect.objectContaining({ code: "conflict" }),
  );
  const renamed = changeDraft(designer, draft.id, version, { designation: "NEWER", aliases: ["Grey"] });
  expect(renamed).toMatchObject({ designation: "NEWER", aliases: ["Grey"] });
});

test("Taking back a draft revision that was never submitted leaves the entry as it was", () => {
  const id = entry();
  beginRevision(designer, id, "A whim.");
  deleteDraft(designer, id);
  expect(listRevisions(librarian, id).map(({ revision }) => revision)).toEqual([1]);
  expect(beginRevision(designer, id, "In earnest.").revision).toBe(2);
});

test("A page that still shows a draft taken back cannot write into the next one", () => {
  const id = entry();
  const { version } = beginRevision(designer, id, "A whim.");
  deleteDraft(designer, id);
  beginRevision(designer, id, "In earnest.");
  expect(() => changeDraft(designer, id, version, { name: "Of the whim" })).toThrow(
    expect.objectContaining({ code: "stale" }),
  );
});

test("A file of somebody else's stays when a draft is taken back, and the draft's own are not shown before it is approved", () => {
  const id = entry();
  beginRevision(designer, id, "A whim.");
  const file = (text: string) => ({ fileName: "a.csv", bytes: new TextEncoder().encode(`a,b\n1,${text}\n`) });
  addEvidence(librarian, id, { file: file("kept"), fields: { title: "Kept" } });
  const { id: own } = addEvidence(designer, id, { file: file("draft"), fields: { title: "Of the draft" } });
  expect(listEvidence(actor("auditor"), id).items).toHaveLength(2);
  const colleague: Actor = { ...designer, personId: "another-designer" };
  expect(listEvidence(colleague, id).items).toEqual([]);
  expect(() => getEvidence(colleague, id, own)).toThrow(expect.objectContaining({ code: "not_found" }));
  deleteDraft(designer, id);
  expect(listEvidence(colleague, id).items).toMatchObject([{ title: "Kept", revision: 1 }]);
});

test("A draft goes to review by its author alone, and the reviewers are told", () => {
  const id = entry();
  const { version } = beginRevision(designer, id, "Measured anew.");
  expect(() => submit(librarian, id, version, { note: "" })).toThrow(expect.objectContaining({ code: "forbidden" }));
  submit(designer, id, version, { note: "Please look at the loss." });
  const sentence = `reviewAsked: ${designer.name} sent revision 2 of ${id.toUpperCase()} for review.`;
  for (const { personId } of [librarian, second, admin]) expect(told(personId)).toContain(sentence);
  expect(told(designer.personId)).not.toContain(sentence);
});

test("What is in review no longer changes", () => {
  const id = entry();
  const { version } = inReview(id);
  expect(() => changeDraft(librarian, id, version, { name: "sly" })).toThrow(
    expect.objectContaining({ code: "conflict" }),
  );
});

test("An approved revision is what people see; the one before is superseded, and owners of runs that use it are told", () => {
  const id = entry();
  const { number } = createRun(designer, newRun(id));
  const { version } = inReview(id);
  const approved = approve(second, id, version, plain);
  expect(approved).toMatchObject({ revision: 2, state: "approved", approvedByName: second.name, isCurrent: true });
  expect(getCable(designer, id)).toMatchObject({ revision: 2, model: lossier });
  expect(getRevision(designer, id, 1).state).toBe("superseded");
  expect(told(librarian.personId)).toContain(`approved: ${second.name} approved revision 2 of ${id.toUpperCase()}.`);
  expect(told(designer.personId).find((text) => text.includes(id.toUpperCase()))).toMatch(
    new RegExp(`^superseded: .* revision 2: Measured anew. .*Used in ${number}\\.$`),
  );
});

test("A first approval says when the entry is due for another look, by the house rule", () => {
  const id = entry();
  approve(second, id, inReview(id).version, plain);
  const row = database().select().from(cables).where(eq(cables.id, id)).get();
  const months = (Date.parse(row?.reviewDueAt ?? "") - Date.now()) / (86_400_000 * 30.44);
  expect(months).toBeCloseTo(36, 0);
});

describe("Nobody decides on a revision of their own", () => {
  test("not its author", () => {
    const { id, version } = inReview(entry());
    for (const decide of [
      () => approve(librarian, id, version, plain),
      () => returnRevision(librarian, id, version, { note: "No." }),
    ])
      expect(decide).toThrow(
        expect.objectContaining({ code: "forbidden", message: expect.stringMatching(/your own/) }),
      );
  });

  test("nor whoever else has written in it", () => {
    const id = entry();
    const draft = beginRevision(designer, id, "Measured anew.");
    const changed = changeDraft(second, id, draft.version, { model: lossier });
    const { version } = submit(designer, id, changed.version, { note: "" });
    expect(() => approve(second, id, version, plain)).toThrow(expect.objectContaining({ code: "forbidden" }));
    expect(approve(librarian, id, version, plain).state).toBe("approved");
  });

  test("unless the team has agreed otherwise", () => {
    const { id, version } = inReview(entry());
    const rules = rulesInForce(admin);
    const changed = changeRules(admin, rulesTag(rules), { isTwoPerson: false });
    expect(approve(librarian, id, version, plain).state).toBe("approved");
    changeRules(admin, rulesTag(changed), rules);
  });
});

test("A house rule can take approval away from admins, but not returning", () => {
  const { id, version } = inReview(entry());
  const rules = rulesInForce(admin);
  const changed = changeRules(admin, rulesTag(rules), { mayAdminsApprove: false });
  expect(() => approve(admin, id, version, plain)).toThrow(
    expect.objectContaining({ code: "forbidden", message: expect.stringMatching(/house rule/) }),
  );
  expect(returnRevision(admin, id, version, { note: "Source?" }).state).toBe("draft");
  changeRules(admin, rulesTag(changed), rules);
});

test("Approving what changed a second ago is refused: the reviewer has not seen it", () => {
  const id = entry();
  const { version } = inReview(id);
  const returned = returnRevision(second, id, version, { note: "Source?" });
  const changed = changeDraft(librarian, id, returned.version, { name: "with source" });
  submit(librarian, id, changed.version, { note: "" });
  expect(() => approve(second, id, version, plain)).toThrow(expect.objectContaining({ code: "stale" }));
});

test("No two revisions of an entry ever share a version, so a tag of one never fits the other", () => {
  const id = entry();
  const draft = beginRevision(librarian, id, "Measured anew.");
  const restricted = restrict(second, id, getRevision(second, id, 1).version, { condition: "Indoors.", note: "" });
  const versions = [draft.version, restricted.version, submit(librarian, id, draft.version, { note: "" }).version];
  expect(new Set(versions).size).toBe(3);
});

describe("Checks before approval", () => {
  const figure = (quantity: string, valueSi: number) => ({
    ...{ quantity, valueSi, asTyped: String(valueSi), kind: "nominal" as const, source: "a sheet" },
  });
  const sent = (cFPerM: number) => {
    const id = entry();
    const draft = beginRevision(librarian, id, "Figures of the sheet.");
    // The model has 50 Ω, 0.8339 and 80 pF/m.
    const figures = [figure("z0Ohm", 50), figure("velocityFactor", 0.8339), figure("cFPerM", cFPerM)];
    const { version } = changeDraft(librarian, id, draft.version, { figures });
    return submit(librarian, id, version, { note: "" });
  };

  test("an entry that contradicts itself is not approved, whatever the reviewer says, and the check is named", () => {
    const { id, version, checks } = sent(100e-12);
    expect(checks.some(({ verdict }) => verdict === "contradiction")).toBe(true);
    const answers = Object.fromEntries(checks.map(({ check }) => [check, "All well."]));
    expect(() => approve(second, id, version, { ...plain, answers })).toThrow(
      expect.objectContaining({ code: "conflict", message: expect.stringMatching(/triangle/) }),
    );
  });

  test("one to look at waits for the reviewer's answer, and the answer is kept", () => {
    const { id, version, checks } = sent(83.5e-12);
    const open = checks.filter(({ verdict }) => verdict === "look").map(({ check }) => check);
    expect(open.length).toBeGreaterThan(0);
    expect(() => approve(second, id, version, plain)).toThrow(
      expect.objectContaining({
        code: "invalid_input",
        fields: expect.objectContaining({ [`answers.${open[0]}`]: [expect.any(String)] }),
      }),
    );
    const answers = Object.fromEntries(open.map((check) => [check, "The sheet rounds."]));
    approve(second, id, version, { ...plain, answers });
    expect(listEvents(librarian, id).find(({ step }) => step === "approve")?.answers).toEqual(answers);
  });
});

describe("A restriction", () => {
  const restricted = () => {
    const id = entry();
    restrict(second, id, getRevision(second, id, 1).version, { condition: "Up to 1 GHz.", note: "" });
    return { id, version: inReview(id).version };
  };

  test("carries over to the next revision", () => {
    const { id, version } = restricted();
    expect(approve(second, id, version, plain)).toMatchObject({ state: "restricted", condition: "Up to 1 GHz." });
  });

  test("is lifted, or another put in its place, where the approval says so", () => {
    const lifted = restricted();
    expect(approve(second, lifted.id, lifted.version, { ...plain, condition: null })).toMatchObject({
      ...{ state: "approved", condition: null },
    });
    const other = restricted();
    expect(approve(second, other.id, other.version, { ...plain, condition: "Indoors." }).condition).toBe("Indoors.");
  });
});

test("A quarantine keeps a cable out of new runs and tells the owners; its release lets it back in", () => {
  const id = entry();
  createRun(designer, newRun(id));
  const { version } = quarantine(second, id, getRevision(second, id, 1).version, { note: "Velocity in doubt." });
  expect(() => createRun(designer, newRun(id))).toThrow(expect.objectContaining({ code: "invalid_input" }));
  expect(told(designer.personId)).toContainEqual(
    expect.stringMatching(/^quarantined: .*Velocity in doubt\. Used in R/),
  );
  release(second, id, version, { note: "Measured: it is right." });
  expect(createRun(designer, newRun(id)).pinned).toEqual([{ cableId: id, revision: 1 }]);
});

test("Every step stands in the history, with who took it and the state it led to", () => {
  const id = entry();
  approve(second, id, inReview(id).version, plain);
  expect(
    listEvents(librarian, id).map(({ revision, step, state, personName }) => [revision, step, state, personName]),
  ).toEqual([
    [2, "begin", "draft", librarian.name],
    [2, "submit", "inReview", librarian.name],
    [2, "approve", "approved", second.name],
    [1, "supersede", "superseded", second.name],
  ]);
});
