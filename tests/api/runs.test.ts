import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import * as run from "@/app/api/v1/runs/[runId]/route";
import * as runs from "@/app/api/v1/runs/route";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { runAssignees, runRevisions, runs as runTable } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import type { CableState } from "@/lib/cables/schema";
import type { RunPage } from "@/lib/runs/query";
import { type NewRun, type Run, runSchema } from "@/lib/runs/schema";
import { createRun } from "@/lib/runs/service";
import { addCable, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

const designer = actor("designer");
const states: CableState[] = ["draft", "inReview", "approved", "restricted", "quarantined", "superseded", "withdrawn"];

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder", designation: "FEEDER" });
  addCable({ id: "jumper", designation: "JUMPER" });
  for (const state of states)
    addCable({ id: state, state, successorId: state === "superseded" ? "feeder" : undefined });
  addCable({ id: "theirs", team: other });
});

const start = async (body: unknown = newRun("feeder"), as: Actor = designer) =>
  jsonOf<Run>(await send(runs.POST, "POST", { as, body }), 201);

const change = (
  target: Run,
  body: unknown,
  headers: Record<string, string> = { "if-match": `"${target.version}"` },
  as = designer,
) => send(run.PATCH, "PATCH", { as, body, headers, params: { runId: target.id } });

const read = (id: string, as: Actor = designer) => send(run.GET, "GET", { as, params: { runId: id } });

function set(target: Run, values: Partial<typeof runTable.$inferInsert>): void {
  database().update(runTable).set(values).where(eq(runTable.id, target.id)).run();
}

function withCable(cableId: string, revision?: number): NewRun["circuit"] {
  const { circuit } = newRun(cableId);
  return { ...circuit, elements: [{ kind: "cable", line: { cableId, revision }, lengthM: 12 }] };
}

describe("Starting a run", () => {
  test("answers 201 with the run, its address and its version", async () => {
    const answer = await send(runs.POST, "POST", { as: designer, body: newRun("feeder") });
    const made = runSchema.parse(await jsonOf(answer.clone(), 201));
    expect(answer.headers.get("location")).toBe(`/api/v1/runs/${made.id}`);
    expect(answer.headers.get("etag")).toBe('"1"');
    expect(made).toMatchObject({
      state: "draft",
      version: 1,
      ownerId: designer.personId,
      changedByName: designer.name,
    });
    expect(made.pinned).toEqual([{ cableId: "feeder", revision: 1 }]);
    expect(await jsonOf(await read(made.id))).toEqual(made);
  });

  test("needs only a name and a circuit", async () => {
    const { name, circuit } = newRun("feeder");
    expect(await start({ name, circuit })).toMatchObject({
      temperatureC: 20,
      bandHz: null,
      targets: [],
      availablePowerW: null,
    });
  });

  test("takes the middle of the band as the design frequency when none is given", async () => {
    const { name, circuit } = newRun("feeder");
    expect((await start({ name, circuit, bandHz: [450e6, 454e6] })).designHz).toBe(452e6);
    const targets = [{ quantity: "loss", bandHz: [100e6, 200e6], atMost: 3 }];
    expect((await start({ name, circuit, targets })).designHz).toBe(150e6);
  });

  test("is possible without any element, and with a line of one's own", async () => {
    const { circuit } = newRun("feeder");
    await start({ name: "bare", circuit: { ...circuit, elements: [] } });
    const model = { conductors: [{ form: "constant", r0OhmPerM: 0 }], lInfHPerM: 2e-7, cFPerM: 8e-11 };
    const own = await start({
      name: "own",
      circuit: { ...circuit, elements: [{ kind: "cable", line: { model }, lengthM: 1 }] },
    });
    expect(own.pinned).toEqual([]);
  });

  test("numbers the team's runs one after the other, and never gives a number twice", async () => {
    const first = await start();
    await send(run.DELETE, "DELETE", { as: designer, headers: { "if-match": "*" }, params: { runId: first.id } });
    const second = await start();
    expect(Number(second.number.slice(1))).toBe(Number(first.number.slice(1)) + 1);
    expect(first.number).toMatch(/^R\d+$/);
  });
});

describe("A cable in a run", () => {
  const refused = async (circuit: unknown) => send(runs.POST, "POST", { as: designer, body: { name: "x", circuit } });
  const sentence = async (cableId: string) => {
    const { errors } = await jsonOf<{ errors: { message: string }[] }>(await refused(withCable(cableId)), 422);
    return errors[0]?.message;
  };

  test.each(["approved", "restricted"])("may be used anew when it is %s", async (state) => {
    expect((await refused(withCable(state))).status).toBe(201);
  });

  test.each(["draft", "inReview", "quarantined", "superseded", "withdrawn", "theirs", "unknown"])(
    "is refused at its place when it is %s",
    async (cableId) => {
      expect(await pathsOf(await refused(withCable(cableId)))).toEqual(["circuit.elements.0.line.cableId"]);
    },
  );

  test("is refused with what to do instead", async () => {
    expect(await sentence("superseded")).toBe("SUPERSEDED is superseded; use FEEDER.");
    expect(await sentence("quarantined")).toBe("QUARANTINED is quarantined and must not be used anew.");
    expect(await sentence("theirs")).toBe(await sentence("unknown"));
  });

  test("is refused in a revision that does not exist", async () => {
    expect(await pathsOf(await refused(withCable("feeder", 7)))).toEqual(["circuit.elements.0.line.cableId"]);
  });

  test("is found in stubs and parallel branches too, all at once", async () => {
    const { circuit } = newRun("feeder");
    const line = { cableId: "unknown" };
    const elements = [
      { kind: "stub", connection: "shunt", end: "open", line, lengthM: 1 },
      {
        kind: "parallel",
        branches: [
          { line: { cableId: "feeder" }, lengthM: 1 },
          { line, lengthM: 1 },
        ],
      },
    ];
    expect(await pathsOf(await refused({ ...circuit, elements }))).toEqual([
      "circuit.elements.0.line.cableId",
      "circuit.elements.1.branches.1.line.cableId",
    ]);
  });

  test("stays usable in the run that pins it after it has been quarantined, but not in another", async () => {
    addCable({ id: "soon-bad" });
    const made = await start(newRun("soon-bad"));
    database().update(cableRevisions).set({ state: "quarantined" }).where(eq(cableRevisions.cableId, "soon-bad")).run();
    const circuit = withCable("soon-bad");
    expect((await change(made, { circuit: { ...circuit, load: { kind: "open" } } })).status).toBe(200);
    expect((await refused(circuit)).status).toBe(422);
  });

  test("keeps the revision the run pins when a newer one is approved, unless the run asks for that", async () => {
    addCable({ id: "revised" });
    const made = await start(newRun("revised"));
    const row = database().select().from(cableRevisions).where(eq(cableRevisions.cableId, "revised")).get();
    if (!row) throw new Error("no revision");
    database()
      .insert(cableRevisions)
      .values({ ...row, revision: 2 })
      .run();
    database().update(cables).set({ currentRevision: 2 }).where(eq(cables.id, "revised")).run();
    const same = await jsonOf<Run>(await change(made, { circuit: { ...made.circuit, load: { kind: "short" } } }));
    expect(same.pinned).toEqual([{ cableId: "revised", revision: 1 }]);
    const moved = await jsonOf<Run>(await change(same, { circuit: withCable("revised", 2) }));
    expect(moved.pinned).toEqual([{ cableId: "revised", revision: 2 }]);
    expect((await start(newRun("revised"))).pinned).toEqual([{ cableId: "revised", revision: 2 }]);
  });
});

describe("Changing a run", () => {
  test("changes the fields given, leaves the rest, and makes the next version, named after who saved it", async () => {
    const made = await start();
    const answer = await change(made, { name: "Renamed", bandHz: null }, undefined, actor("librarian"));
    const changed = await jsonOf<Run>(answer.clone());
    expect(answer.headers.get("etag")).toBe('"2"');
    expect(changed).toEqual({
      ...made,
      ...{ name: "Renamed", bandHz: null, version: 2, changedByName: actor("librarian").name },
      changedAt: changed.changedAt,
    });
  });

  test("keeps every save whole, with who, when and what in a sentence", async () => {
    const made = await start();
    const second = await jsonOf<Run>(await change(made, { name: "Renamed", site: "Pier 4" }));
    const circuit = { ...made.circuit, load: { kind: "open" }, elements: [] };
    await change(second, { circuit }, { "if-match": '"2"' }, actor("admin"));
    const saves = database().select().from(runRevisions).where(eq(runRevisions.runId, made.id)).all();
    expect(saves.map(({ version, sentence, savedById }) => [version, sentence, savedById])).toEqual([
      [1, "Started the run.", designer.personId],
      [2, "Changed the name and the site.", designer.personId],
      [3, "Changed one element fewer and the load.", actor("admin").personId],
    ]);
    expect(saves.map(({ content }) => content.name)).toEqual(["Buoy link", "Renamed", "Renamed"]);
    expect(saves[0]?.content).toEqual(made);
  });

  test("is not a save when nothing changes", async () => {
    const made = await start();
    expect(await jsonOf(await change(made, { name: made.name, circuit: made.circuit }))).toEqual(made);
    expect(await jsonOf(await change(made, {}))).toEqual(made);
  });

  test("without If-Match is refused with 428", async () => {
    expect((await change(await start(), { name: "x" }, {})).status).toBe(428);
  });

  test.each(['"0"', '"2"', '"99"', 'W/"1"', "1", "*1", ""])(
    "with If-Match %s, which is not its version, is refused with 412",
    async (tag) => {
      expect((await change(await start(), { name: "x" }, { "if-match": tag })).status).toBe(412);
    },
  );

  test.each(['"1"', "*", '"7", "1"'])("with If-Match %s goes through", async (tag) => {
    expect((await change(await start(), { name: "x" }, { "if-match": tag })).status).toBe(200);
  });

  test("by two people at once loses neither's work: the second is refused and given the first's version", async () => {
    const made = await start();
    const [mine, theirs] = [{ name: "Mine" }, { name: "Theirs" }];
    await change(made, theirs, undefined, actor("admin"));
    const answer = await change(made, mine);
    const { current, detail } = await jsonOf<{ current: Run; detail: string }>(answer.clone(), 412);
    expect(detail).toContain(actor("admin").name);
    expect(answer.headers.get("etag")).toBe('"2"');
    expect(runSchema.parse(current)).toMatchObject({ name: "Theirs", version: 2 });
    expect(await jsonOf(await read(made.id))).toEqual(current);
    // Mine is kept by whoever sent it; with the version now known it can be saved over, and Theirs stays in the history.
    expect(await jsonOf(await change(current, mine))).toMatchObject({ name: "Mine", version: 3 });
    const names = database().select().from(runRevisions).where(eq(runRevisions.runId, made.id)).all();
    expect(names.map(({ content }) => content.name)).toEqual(["Buoy link", "Theirs", "Mine"]);
  });

  test("saved while the other's body was still being read is refused all the same", async () => {
    const made = await start();
    const answers = await Promise.all([change(made, { name: "One" }), change(made, { name: "Two" })]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
  });

  test("is refused with 409 once it is issued: the sheet is out", async () => {
    const made = await start();
    set(made, { state: "issued" });
    const { detail } = await jsonOf(await change(made, { name: "x" }), 409);
    expect(detail).toContain("issued");
    const remove = { as: designer, headers: { "if-match": "*" }, params: { runId: made.id } };
    expect((await send(run.DELETE, "DELETE", remove)).status).toBe(409);
  });

  test("cannot touch what the server keeps", async () => {
    const made = await start();
    const answer = await change(made, { state: "issued", ownerId: "x", version: 9, number: "R1", pinned: [], id: "x" });
    expect((await pathsOf(answer)).sort()).toEqual(["id", "number", "ownerId", "pinned", "state", "version"]);
  });
});

describe("Removing a run", () => {
  const remove = (target: Run, headers: Record<string, string>) =>
    send(run.DELETE, "DELETE", { as: designer, headers, params: { runId: target.id } });

  test("takes it out of sight and keeps its history", async () => {
    const made = await start();
    expect((await remove(made, { "if-match": '"1"' })).status).toBe(204);
    expect((await read(made.id)).status).toBe(404);
    expect(database().select().from(runRevisions).where(eq(runRevisions.runId, made.id)).all()).toHaveLength(1);
  });

  test("needs its version", async () => {
    const made = await start();
    expect((await remove(made, {})).status).toBe(428);
    expect((await remove(made, { "if-match": '"2"' })).status).toBe(412);
    expect((await read(made.id)).status).toBe(200);
  });
});

describe("An installer", () => {
  const installer = actor("installer");

  test("sees a run only while it is issued and assigned to them", async () => {
    const made = await start();
    const status = async () => (await read(made.id, installer)).status;
    set(made, { state: "issued" });
    expect(await status()).toBe(404);
    database().insert(runAssignees).values({ runId: made.id, personId: installer.personId }).run();
    expect(await status()).toBe(200);
    set(made, { state: "draft" });
    expect(await status()).toBe(404);
    set(made, { state: "verified" });
    const { items, total } = await jsonOf<RunPage>(await send(runs.GET, "GET", { as: installer }));
    expect([items.map(({ id }) => id), total]).toEqual([[made.id], 1]);
  });
});

describe("The list of runs", () => {
  const list = async (query: string, as: Actor = actor("auditor")) =>
    jsonOf<RunPage>(await send(runs.GET, "GET", { as, path: `/runs?${query}` }));

  test("gives each once, the latest changed first, page by page, with a Link to the next", async () => {
    const { total } = await list("limit=1");
    const seen: string[] = [];
    let next: string | null = "limit=4";
    while (next !== null) {
      const answer: Response = await send(runs.GET, "GET", { as: designer, path: `/runs?${next}` });
      const link: string | undefined = /^<\/api\/v1\/runs\?(.*)>; rel="next"$/.exec(
        answer.headers.get("link") ?? "",
      )?.[1];
      const page: RunPage = await jsonOf<RunPage>(answer);
      expect(page.total).toBe(total);
      expect(page.nextCursor === null).toBe(link === undefined);
      seen.push(...page.items.map(({ id }) => id));
      next = link ?? null;
    }
    expect(seen).toHaveLength(total);
    expect(new Set(seen).size).toBe(total);
    const all = await list("limit=200");
    expect(all.items.map(({ id }) => id)).toEqual(seen);
    const times = all.items.map(({ changedAt }) => changedAt);
    expect(times).toEqual([...times].sort().reverse());
  });

  test("tells each run's length and cables, in order, once each", async () => {
    const { circuit } = newRun("feeder");
    const cable = (cableId: string, lengthM: number) => ({ kind: "cable", line: { cableId }, lengthM });
    const stub = { kind: "stub", connection: "shunt", end: "short", line: { cableId: "jumper" }, lengthM: 9 };
    const elements = [cable("jumper", 1.5), cable("feeder", 48), stub, cable("jumper", 1.5)];
    await start({ name: "Three pieces", circuit: { ...circuit, elements } });
    const { items } = await list("q=three%20pieces");
    expect(items).toMatchObject([{ name: "Three pieces", totalLengthM: 51, cables: ["JUMPER", "FEEDER"] }]);
  });

  test("finds text anywhere in number, name, site and folder, whatever its case and its signs", async () => {
    await start({ ...newRun("feeder"), name: "100 % link_a", folder: "Øst" });
    expect((await list("q=100%20%25")).total).toBe(1);
    expect((await list("q=K_A")).total).toBe(1);
    expect((await list("q=pier%203&limit=1")).total).toBeGreaterThan(1);
    expect((await list("q=%C3%B8st")).total).toBe(1);
    expect((await list("q=%C3%98ST")).total).toBe(1);
    expect((await list("q=nothing%20like%20it")).items).toEqual([]);
  });

  test("can be narrowed to states", async () => {
    const { items } = await list("state=issued&state=verified&limit=200");
    expect(items.length).toBeGreaterThan(0);
    for (const { state } of items) expect(["issued", "verified"]).toContain(state);
  });

  test("never shows another team's", async () => {
    addCable({ id: "theirs-too", team: other });
    const theirs = createRun(actor("designer", other), newRun("theirs-too"));
    const { items } = await list("limit=200");
    expect(items.map(({ id }) => id)).not.toContain(theirs.id);
    expect((await list("", actor("admin", other))).items.map(({ id }) => id)).toEqual([theirs.id]);
  });

  test.each([
    ["limit=0", "limit"],
    ["limit=201", "limit"],
    ["limit=ten", "limit"],
    ["limit=5&limit=6", "limit"],
    ["cursor=abc", "cursor"],
    ["cursor=W10", "cursor"],
    ["state=lost", "state.0"],
    ["colour=red", "colour"],
    ["__proto__=x", "__proto__"],
  ])("refuses %s at %s", async (query, path) => {
    const answer = await send(runs.GET, "GET", { as: designer, path: `/runs?${query}` });
    expect([answer.status, await pathsOf(answer)]).toEqual([422, [path]]);
  });
});
