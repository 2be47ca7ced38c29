/** The life of an entry as a script drives it: tags, refusals, the answers of every step. */
import { describe, expect, test } from "vitest";
import { POST as approve } from "@/app/api/v1/cables/[cableId]/approve/route";
import { POST as quarantine } from "@/app/api/v1/cables/[cableId]/quarantine/route";
import { POST as giveBack } from "@/app/api/v1/cables/[cableId]/return/route";
import { GET as getRevision } from "@/app/api/v1/cables/[cableId]/revisions/[revision]/route";
import { GET as getRevisions, POST as begin } from "@/app/api/v1/cables/[cableId]/revisions/route";
import { GET as getCable, PATCH as change } from "@/app/api/v1/cables/[cableId]/route";
import { POST as submit } from "@/app/api/v1/cables/[cableId]/submit/route";
import { POST as supersede } from "@/app/api/v1/cables/[cableId]/supersede/route";
import { GET as getUses } from "@/app/api/v1/cables/[cableId]/uses/route";
import { POST as createCable } from "@/app/api/v1/cables/route";
import { GET as getQueue } from "@/app/api/v1/review/route";
import { GET as getRules, PATCH as changeRules } from "@/app/api/v1/team/rules/route";
import { cableRevisionSchema } from "@/lib/cables/revisions/schema";
import { queueSchema } from "@/lib/cables/queue/schema";
import type { Handler } from "@/lib/http/handle";
import { usesSchema } from "@/lib/runs/effects/schema";
import { createRun } from "@/lib/runs/service";
import { addCable, coaxModel, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

const [designer, librarian, admin] = [actor("designer"), actor("librarian"), actor("admin")];
withDatabase(addPeople);

let count = 0;
function entry(): string {
  const id = `api-${++count}`;
  addCable({ id });
  return id;
}

interface Sent {
  as?: typeof librarian;
  body?: unknown;
  tag?: string | null;
  revision?: string;
}
const ask = (
  handler: Handler,
  method: string,
  cableId: string,
  { as = librarian, body, tag, revision = "" }: Sent = {},
) => send(handler, method, { as, body, params: { cableId, revision }, headers: tag ? { "if-match": tag } : {} });

/** A revision in review, with its tag. */
async function inReview(id: string) {
  const begun = await ask(begin, "POST", id, { body: { reason: "Measured anew." } });
  const changed = await ask(change, "PATCH", id, {
    body: { model: { ...coaxModel, lossTangent: 2e-4 } },
    tag: begun.headers.get("etag"),
  });
  const sent = await ask(submit, "POST", id, { body: {}, tag: changed.headers.get("etag") });
  return { sent, tag: sent.headers.get("etag") };
}

test("From a new revision to an approved one, each answer carries the tag that the next step needs", async () => {
  const id = entry();
  const { sent, tag } = await inReview(id);
  expect(cableRevisionSchema.parse(await jsonOf(sent))).toMatchObject({ revision: 2, state: "inReview" });
  const approved = await ask(approve, "POST", id, { as: admin, body: {}, tag });
  expect(cableRevisionSchema.parse(await jsonOf(approved))).toMatchObject({ state: "approved", isCurrent: true });
  const current = await ask(getCable, "GET", id, { as: designer });
  expect(current.headers.get("etag")).toBe(approved.headers.get("etag"));
  expect(await jsonOf(current)).toMatchObject({ revision: 2, state: "approved" });
  const { items } = await jsonOf<{ items: { revision: number; state: string }[] }>(await ask(getRevisions, "GET", id));
  expect(items.map(({ revision, state }) => [revision, state])).toEqual([
    [2, "approved"],
    [1, "superseded"],
  ]);
});

test("A step without If-Match is refused with 428, with a stale one with 412 and the revision as it now stands", async () => {
  const id = entry();
  const { tag } = await inReview(id);
  expect((await ask(approve, "POST", id, { as: admin, body: {} })).status).toBe(428);
  await ask(giveBack, "POST", id, { as: admin, body: { note: "Source?" }, tag });
  const stale = await ask(approve, "POST", id, { as: admin, body: {}, tag });
  const { current } = await jsonOf<{ current: unknown }>(stale, 412);
  expect(cableRevisionSchema.parse(current)).toMatchObject({ revision: 2, state: "draft" });
});

test("A tag of the approved revision does not approve the one in review", async () => {
  const id = entry();
  await inReview(id);
  const tag = (await ask(getRevision, "GET", id, { revision: "1" })).headers.get("etag");
  expect((await ask(approve, "POST", id, { as: admin, body: {}, tag })).status).toBe(412);
});

test("The author's own approval is 403 in words", async () => {
  const id = entry();
  const { tag } = await inReview(id);
  expect(await jsonOf(await ask(approve, "POST", id, { body: {}, tag }), 403)).toMatchObject({
    detail: expect.stringMatching(/cannot review your own changes/),
  });
});

test("Approving what is not in review, and beginning while one is open, are 409", async () => {
  const id = entry();
  const begun = await ask(begin, "POST", id, { body: { reason: "One." } });
  expect((await ask(begin, "POST", id, { body: { reason: "Two." } })).status).toBe(409);
  const tag = begun.headers.get("etag");
  expect(await jsonOf(await ask(approve, "POST", id, { as: admin, body: {}, tag }), 409)).toMatchObject({
    detail: "Only what is in review can be approved; this is a draft.",
  });
});

test.each([
  ["no reason for a revision", begin, { reason: " " }, ["reason"]],
  ["a reason that is no text", begin, { reason: 7 }, ["reason"]],
  ["a quarantine that says nothing", quarantine, {}, ["note"]],
  ["an unknown equivalence and no successor", supersede, { equivalence: "same" }, ["successorId", "equivalence"]],
  ["a field that is not there", quarantine, { note: "x", state: "approved" }, ["state"]],
] as const)("%s is 422 at its path", async (_, handler, body, paths) => {
  const answer = await ask(handler, "POST", entry(), { body, tag: "*" });
  expect(answer.status).toBe(422);
  expect((await pathsOf(answer)).sort()).toEqual([...paths].sort());
});

test("A revision that is no number is 404", async () => {
  const id = entry();
  for (const revision of ["0", "-1", "1.5", "two", "99"])
    expect((await ask(getRevision, "GET", id, { revision })).status, revision).toBe(404);
});

test("A script enters a cable, keeps its inputs as they were typed, and sends it", async () => {
  const draft = { designation: `NEW-${++count}`, family: "coaxial", model: coaxModel };
  const { id } = await jsonOf<{ id: string }>(await send(createCable, "POST", { as: designer, body: draft }), 201);
  const inputs = {
    nominal: { z0Ohm: 50, velocityFactor: 0.83, typed: { z0Ohm: "50 ohm" } },
    lossTable: { kind: "typical", rows: [{ frequencyHz: 1e8, lossDbPerM: 0.06, typed: "100 MHz 6 dB/100 m" }] },
  };
  const changed = await ask(change, "PATCH", id, { as: designer, body: { inputs }, tag: "*" });
  expect(await jsonOf(changed)).toMatchObject({
    inputs: { ...inputs, lossTable: { ...inputs.lossTable, temperatureC: 20 } },
  });
  const sent = await ask(submit, "POST", id, { as: designer, body: { note: "" }, tag: changed.headers.get("etag") });
  expect(sent.status).toBe(200);
  const queue = queueSchema.parse(await jsonOf(await send(getQueue, "GET", { as: librarian })));
  expect(queue.waiting.find(({ cableId }) => cableId === id)).toMatchObject({ changedFields: null, refusal: null });
});

describe("Where a cable is used", () => {
  test("is answered as the description says, for a revision or for the current one", async () => {
    const id = entry();
    createRun(designer, newRun(id));
    await inReview(id);
    for (const path of ["/", "/?revision=2"]) {
      const answer = await send(getUses, "GET", { as: librarian, params: { cableId: id }, path });
      expect(usesSchema.parse(await jsonOf(answer))).toMatchObject({ total: 1, revision: path === "/" ? 1 : 2 });
    }
  });

  test("of a revision that is no number is 422", async () => {
    const answer = await send(getUses, "GET", { as: librarian, params: { cableId: entry() }, path: "/?revision=x" });
    expect(answer.status).toBe(422);
  });
});

test("A day that is not on the calendar is 422, one before the entry 404", async () => {
  const on = (day: string, id: string) =>
    send(getCable, "GET", { as: librarian, params: { cableId: id }, path: `/?on=${day}` });
  const id = entry();
  expect((await on("2026-02-30", id)).status).toBe(422);
  expect((await on("yesterday", id)).status).toBe(422);
  expect((await on("2001-01-01", id)).status).toBe(404);
  expect((await on("2026-06-01", id)).status).toBe(200);
});

test("House rules are changed against their tag, by an admin", async () => {
  const rules = await send(getRules, "GET", { as: admin });
  const tag = rules.headers.get("etag") ?? "";
  expect(await jsonOf(rules)).toEqual({ isTwoPerson: true, mayAdminsApprove: true, reviewMonths: 36 });
  const patch = (body: unknown, match: string) =>
    send(changeRules, "PATCH", { as: admin, body, headers: { "if-match": match } });
  const changed = await patch({ reviewMonths: 12 }, tag);
  expect(await jsonOf(changed)).toMatchObject({ isTwoPerson: true, reviewMonths: 12 });
  expect((await patch({ reviewMonths: 24 }, tag)).status).toBe(412);
  expect((await patch({ reviewMonths: 0 }, changed.headers.get("etag") ?? "")).status).toBe(422);
  expect((await patch({ reviewMonths: 36 }, changed.headers.get("etag") ?? "")).status).toBe(200);
});
