/** Walks every operation of every route as every role, as another team's member and as nobody. */
import { beforeAll, describe, expect, test } from "vitest";
import { database } from "@/db/client";
import { cableReports, cableWaivers } from "@/db/schema/cable-records";
import type { Role } from "@/lib/auth/actor";
import type { Handler } from "@/lib/http/handle";
import { operations } from "@/lib/http/all-operations";
import type { Run } from "@/lib/runs/schema";
import { addLimitLine } from "@/lib/limit-lines/service";
import { createRun } from "@/lib/runs/service";
import { addCable, newRun } from "@/tests/support/cables";
import { addFile } from "@/tests/support/evidence";
import { addImport } from "@/tests/support/imports";
import { withDatabase } from "@/tests/support/database";
import { newLimitLine } from "@/tests/support/limit-lines";
import { actor, addPeople, other, roles } from "@/tests/support/people";
import { send } from "@/tests/support/requests";
import { routeFiles } from "@/tests/support/routes";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
  addImport("an-import");
  addFile("feeder", "a-file");
  const by = { cableId: "feeder", personId: actor("auditor").personId };
  const { id: runId } = createRun(actor("designer"), newRun("feeder"));
  database()
    .insert(cableReports)
    .values({ ...by, id: "report", revision: 1, reportedAt: "2026-01-02T00:00:00.000Z", text: "It is stiff." })
    .run();
  database()
    .insert(cableWaivers)
    .values({
      ...{ id: "waiver", cableId: "feeder", runId, reason: "It is there.", until: "2099-01-01" },
      ...{ givenById: by.personId, givenAt: "2026-01-02T00:00:00.000Z" },
    })
    .run();
});

type Access = "anyone" | Role[];

/** Who may, operation by operation: product and contract in one table. A new operation must be added here. */
const expected: Record<string, Access> = {
  readSession: roles,
  openSession: "anyone",
  endSession: roles,
  changeOwnPassword: roles,
  listCables: roles,
  readCable: ["designer", "librarian", "admin", "auditor"], // an installer only those in their runs
  createCable: ["designer", "librarian", "admin"],
  removeCable: ["designer", "librarian", "admin"],
  listEvidence: ["designer", "librarian", "admin", "auditor"], // an installer only of cables in their runs
  addEvidence: ["librarian", "admin"], // a designer only to a draft of their own
  readEvidence: ["designer", "librarian", "admin", "auditor"], // as the list
  listLots: ["designer", "librarian", "admin", "auditor"], // as the list
  addLot: ["librarian", "admin"], // a designer only to a draft of their own
  listReels: ["designer", "librarian", "admin", "auditor"], // an installer only of runs assigned to them
  bindReel: ["designer", "librarian", "admin"],
  freeReel: ["designer", "librarian", "admin"],
  exportCables: ["designer", "librarian", "admin", "auditor"],
  importCables: ["librarian", "admin"],
  listImports: ["librarian", "admin", "auditor"],
  readImport: ["librarian", "admin", "auditor"],
  readCatalogueSchema: "anyone",
  changeCable: ["designer", "librarian", "admin"],
  listCableRevisions: ["designer", "librarian", "admin", "auditor"],
  beginCableRevision: ["designer", "librarian", "admin"],
  readCableRevision: ["designer", "librarian", "admin", "auditor"],
  listCableEvents: ["designer", "librarian", "admin", "auditor"],
  submitCable: ["designer", "librarian", "admin"],
  approveCable: ["librarian", "admin"],
  returnCable: ["librarian", "admin"],
  restrictCable: ["librarian", "admin"],
  quarantineCable: ["librarian", "admin"],
  releaseCable: ["librarian", "admin"],
  supersedeCable: ["librarian", "admin"],
  withdrawCable: ["librarian", "admin"],
  preferCable: ["librarian", "admin"],
  listCableComments: ["designer", "librarian", "admin", "auditor"],
  addCableComment: ["designer", "librarian", "admin"],
  listCableReports: ["designer", "librarian", "admin", "auditor"],
  reportCable: ["designer", "librarian", "admin"], // an installer only of cables in their runs
  settleCableReport: ["librarian", "admin"],
  listWaivers: ["designer", "librarian", "admin", "auditor"],
  giveWaiver: ["librarian", "admin"],
  endWaiver: ["librarian", "admin"],
  countReviews: roles,
  readReviewQueue: ["librarian", "admin", "auditor"],
  readCableUses: ["designer", "librarian", "admin", "auditor"],
  readHouseRules: ["admin", "auditor"],
  changeHouseRules: ["admin"],
  listRuns: roles,
  createRun: ["designer", "librarian", "admin"],
  readRun: ["designer", "librarian", "admin", "auditor"], // an installer only issued ones assigned to them
  changeRun: ["designer", "librarian", "admin"],
  removeRun: ["designer", "librarian", "admin"],
  handOverRun: ["designer", "librarian", "admin"],
  listRunComments: ["designer", "librarian", "admin", "auditor"], // an installer only of runs assigned to them
  addRunComment: ["designer", "librarian", "admin"],
  listLimitLines: ["designer", "librarian", "admin", "auditor"],
  addLimitLine: ["librarian", "admin"],
  removeLimitLine: ["librarian", "admin"],
  listNotices: roles,
  readNotices: roles,
  listLetters: ["admin", "auditor"],
  readAffected: ["designer", "librarian", "admin", "auditor"], // an installer only of runs assigned to them
  computeLine: roles,
  computeSweep: roles,
  computeProfile: roles,
  computeMatches: roles,
  computeGeometry: roles,
  computeFit: roles,
  computeReadings: roles,
  computeExtract: roles,
  computeTouchstone: roles,
  computeStep: roles,
  computeTolerance: roles,
  computeDc: roles,
  computeSwap: roles,
  computeSolve: roles,
  readHealth: "anyone",
  readDescription: "anyone",
};

/** The refusal an installer gets instead of 403 where the record does not exist for them. */
const hiddenFromInstallers = [
  ...["readCable", "readRun", "listRunComments"],
  ...["listEvidence", "readEvidence", "listLots", "listReels"],
  ...["readCable", "listCableRevisions", "readCableRevision", "listCableEvents"],
  ...["listCableComments", "listCableReports", "reportCable", "listWaivers"],
  ...["readRun", "listRunComments", "readAffected"],
];

let handlers: Map<string, Handler>;
beforeAll(async () => {
  const found = (await routeFiles()).flatMap((file) => Object.values(file.handlers));
  handlers = new Map(found.flatMap((handler) => (handler.operation ? [[handler.operation.id, handler]] : [])));
});

test("The table names every operation, and nothing else", () => {
  expect(Object.keys(expected).sort()).toEqual(operations.map(({ id }) => id).sort());
  expect([...handlers.keys()].sort()).toEqual(operations.map(({ id }) => id).sort());
});

/** A fresh run of the team, so that one case's change does not meet another's. */
function ask(id: string, as: ReturnType<typeof actor> | undefined, run: Run): Promise<Response> {
  const operation = operations.find((one) => one.id === id);
  const handler = handlers.get(id);
  if (!operation || !handler) throw new Error(`no operation ${id}`);
  // The same for a limit line, of which a team holds only so many.
  const isOfLine = operation.path.includes("{limitLineId}");
  const limitLineId = isOfLine ? addLimitLine(actor("admin"), newLimitLine(`Line of ${run.id}`)).id : "";
  return send(handler, operation.method, {
    as,
    params: {
      ...{ cableId: "feeder", revision: "1", reportId: "report", waiverId: "waiver", runId: run.id, limitLineId },
      ...{ importId: "an-import", evidenceId: "a-file", lotId: "a-lot" },
    },
    headers: operation.needsMatch ? { "if-match": "*" } : {},
    // An impossible body: whoever may is told so (422), whoever may not never gets that far.
    body: (operation.body ?? operation.accepts?.["application/json"]) ? { impossible: true } : undefined,
  });
}

/** What is asked for is impossible here: nothing of the approved entry is open, a file is none. Only whoever may is told so. */
const impossible: Record<string, number> = {
  addEvidence: 415,
  ...{ removeCable: 409, changeCable: 409, submitCable: 409, approveCable: 409, returnCable: 409 },
  endWaiver: 409, // taken back by whoever came before
};

const isAnswer = (id: string, status: number) => status < 300 || status === 422 || status === impossible[id];

describe.each(Object.entries(expected))("%s", (id, access) => {
  test.each(roles)(`as %s`, async (role) => {
    const run = createRun(actor("designer"), newRun("feeder"));
    const { status } = await ask(id, actor(role), run);
    if (access === "anyone" || access.includes(role)) expect(isAnswer(id, status), `status ${status}`).toBe(true);
    else expect(status).toBe(role === "installer" && hiddenFromInstallers.includes(id) ? 404 : 403);
  });

  test("as nobody", async () => {
    const run = createRun(actor("designer"), newRun("feeder"));
    const { status } = await ask(id, undefined, run);
    if (access === "anyone") expect(isAnswer(id, status), `status ${status}`).toBe(true);
    else expect(status).toBe(401);
  });

  test("as an admin of another team, who is told that the record does not exist", async () => {
    const run = createRun(actor("designer"), newRun("feeder"));
    const { status } = await ask(id, actor("admin", other), run);
    if (operations.find((one) => one.id === id)?.path.includes("{")) expect(status).toBe(404);
    else expect(isAnswer(id, status), `status ${status}`).toBe(true);
  });
});

test("An auditor changes nothing but what is their own: every operation that does is refused to one", () => {
  const changing = operations.filter(
    ({ method, path }) => method !== "GET" && !/^\/(session|compute|notices)/.test(path),
  );
  expect(changing.length).toBeGreaterThan(0);
  for (const { id } of changing) expect(expected[id]).not.toContain("auditor");
});
