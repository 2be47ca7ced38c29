/** Handing a run over, and what is said about it. */
import { expect, test } from "vitest";
import { GET as comments, POST as comment } from "@/app/api/v1/runs/[runId]/comments/route";
import { POST as handOver } from "@/app/api/v1/runs/[runId]/owner/route";
import type { Run } from "@/lib/runs/schema";
import { createRun } from "@/lib/runs/service";
import { addCable, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { send } from "@/tests/support/requests";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
});

const designer = actor("designer");
const librarian = actor("librarian");
const start = () => createRun(designer, newRun("feeder"));

function give(run: Run, as: ReturnType<typeof actor>, ownerId: string, version = run.version): Promise<Response> {
  return send(handOver, "POST", {
    as,
    params: { runId: run.id },
    headers: { "if-match": `"${version}"` },
    body: { ownerId },
  });
}

test("An owner hands a run over, and it is a save of its own", async () => {
  const run = start();
  const answer = await give(run, designer, librarian.personId);
  expect(answer.status).toBe(200);
  expect(await answer.json()).toMatchObject({ ownerId: librarian.personId, ownerName: librarian.name, version: 2 });
});

test("A librarian hands over anybody's run, a designer only their own", async () => {
  const run = createRun(librarian, newRun("feeder"));
  expect((await give(run, designer, designer.personId)).status).toBe(403);
  expect((await give(run, actor("admin"), designer.personId)).status).toBe(200);
});

test.each([
  ["an installer", actor("installer").personId],
  ["somebody of another team", actor("designer", other).personId],
  ["nobody", "nobody-at-all"],
])("A run cannot be handed to %s", async (_who, ownerId) => {
  const answer = await give(start(), designer, ownerId);
  expect(answer.status).toBe(422);
  expect(await answer.json()).toMatchObject({ errors: [{ path: "ownerId" }] });
});

test("A run that has changed meanwhile is not handed over unseen", async () => {
  const run = start();
  await give(run, designer, librarian.personId);
  const answer = await give(run, actor("admin"), designer.personId);
  expect(answer.status).toBe(412);
  expect(await answer.json()).toMatchObject({ current: { version: 2 } });
});

test("Comments stand in order with who said them, and are read by whoever sees the run", async () => {
  const run = start();
  const params = { runId: run.id };
  for (const [as, text] of [
    [designer, "Is 36 m the route or the cut?"],
    [librarian, "  The route; add 1.5 m. <b>Ω</b>  "],
  ] as const)
    expect((await send(comment, "POST", { as, params, body: { text } })).status).toBe(201);
  const read = await send(comments, "GET", { as: actor("auditor"), params });
  expect(await read.json()).toMatchObject({
    items: [
      { personName: designer.name, text: "Is 36 m the route or the cut?" },
      { personName: librarian.name, text: "The route; add 1.5 m. <b>Ω</b>" },
    ],
  });
});

test("An empty comment, one too long, and one on another team's run are refused", async () => {
  const run = start();
  const say = (as: ReturnType<typeof actor>, text: string) =>
    send(comment, "POST", { as, params: { runId: run.id }, body: { text } });
  expect((await say(designer, "  ")).status).toBe(422);
  expect((await say(designer, "x".repeat(2001))).status).toBe(422);
  expect((await say(actor("designer", other), "hello")).status).toBe(404);
  expect((await say(actor("auditor"), "hello")).status).toBe(403);
});
