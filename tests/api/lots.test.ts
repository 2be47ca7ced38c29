import { describe, expect, test } from "vitest";
import { GET as listLots, POST as addLot } from "@/app/api/v1/cables/[cableId]/lots/route";
import { DELETE as freeReel } from "@/app/api/v1/runs/[runId]/reels/[lotId]/route";
import { GET as listReels, POST as bindReel } from "@/app/api/v1/runs/[runId]/reels/route";
import { database } from "@/db/client";
import { cableEvidence } from "@/db/schema/evidence";
import type { Lot, LotList } from "@/lib/cables/lots/schema";
import { getCable } from "@/lib/cables/service";
import { nominalFigures } from "@/lib/line/cable";
import type { ReelList } from "@/lib/runs/reels/schema";
import { createRun } from "@/lib/runs/service";
import { addCable, coaxModel, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
  addCable({ id: "tail" });
  addCable({ id: "theirs", team: other });
});
const [designer, librarian] = [actor("designer"), actor("librarian")];

const measured = { lot: "Q-114", measuredAt: "2026-02-03", velocityFactor: 0.843, loopResistanceOhmPerM: 0.0089 };
const post = (body: unknown, cableId = "feeder", as = librarian) =>
  send(addLot, "POST", { as, body, params: { cableId } });
const lots = async (cableId = "feeder") =>
  jsonOf<LotList>(await send(listLots, "GET", { as: designer, params: { cableId } }));

describe("A measured lot", () => {
  test("is kept apart: the entry's own values stay as they are", async () => {
    const before = getCable(designer, "feeder");
    const lot = await jsonOf<Lot>(await post({ ...measured, z0Ohm: 51 }), 201);
    expect(getCable(designer, "feeder")).toEqual(before);
    expect(lot.figures.map(({ quantity, valueSi, kind, asTyped }) => [quantity, valueSi, kind, asTyped])).toEqual([
      ["z0Ohm", 51, "measured", "51 Ω"],
      ["velocityFactor", 0.843, "measured", "0.843"],
      ["r0OhmPerM", 0.0089, "measured", "8.9 Ω/km loop"],
    ]);
    expect(nominalFigures(lot.model ?? coaxModel)).toMatchObject({
      z0: expect.closeTo(51, 9),
      velocityFactor: expect.closeTo(0.843, 12),
    });
    expect((await lots()).items).toEqual([lot]);
  });

  test("is there once; another reel of it is another record", async () => {
    expect((await post(measured)).status).toBe(409);
    expect((await post({ ...measured, reel: "7" })).status).toBe(201);
  });

  test("may come with the file it was measured in, which becomes evidence", async () => {
    const form = new FormData();
    form.set("lot", JSON.stringify({ ...measured, lot: "Q-115" }));
    form.set("file", new File(["# MHz S DB R 50\n1 -30 0\n2 -31 0\n"], "q115.s1p"));
    const answer = await send(addLot, "POST", { as: librarian, text: form, params: { cableId: "feeder" } });
    expect(answer.status).toBe(201);
    expect(database().select({ title: cableEvidence.title }).from(cableEvidence).all()).toEqual([
      { title: "Measurement of lot Q-115, 2026-02-03" },
    ]);
  });

  test("with a file that is refused is not there either", async () => {
    const form = new FormData();
    form.set("lot", JSON.stringify({ ...measured, lot: "Q-116" }));
    form.set("file", new File(["<html>"], "q116.s1p"));
    expect((await send(addLot, "POST", { as: librarian, text: form, params: { cableId: "feeder" } })).status).toBe(422);
    expect((await lots()).items.map(({ lot }) => lot)).not.toContain("Q-116");
  });

  test.each<[string, Record<string, unknown>, string[]]>([
    ["without a name", { ...measured, lot: " " }, ["lot"]],
    ["without a figure", { lot: "Q-1", measuredAt: "2026-02-03" }, [""]],
    ["faster than light", { ...measured, lot: "Q-1", velocityFactor: 1.2 }, ["velocityFactor"]],
    ["of tomorrow's tomorrow", { ...measured, lot: "Q-1", measuredAt: "2999-01-01" }, ["measuredAt"]],
    ["with a name that is turned round", { ...measured, lot: "Q\u202e1" }, ["lot"]],
  ])("%s is refused at its place", async (_, body, paths) => {
    const answer = await post(body);
    expect(answer.status).toBe(422);
    expect(await pathsOf(answer)).toEqual(paths);
  });

  test("is not added by a designer to what is approved, nor across teams", async () => {
    expect((await post({ ...measured, lot: "Q-2" }, "feeder", designer)).status).toBe(403);
    expect((await post({ ...measured, lot: "Q-2" }, "theirs")).status).toBe(404);
  });
});

describe("A run bound to a reel", () => {
  const bind = (runId: string, lotId: string, as = designer) =>
    send(bindReel, "POST", { as, body: { lotId }, params: { runId } });

  test("says what its cable measures, and can be freed", async () => {
    const run = createRun(designer, newRun("feeder"));
    const [reel, another] = (await lots()).items;
    const { items } = await jsonOf<ReelList>(await bind(run.id, reel?.id ?? ""));
    expect(items).toEqual([{ cableId: "feeder", designation: "FEEDER", lot: reel }]);
    expect((await bind(run.id, reel?.id ?? "")).status).toBe(200);
    expect((await bind(run.id, another?.id ?? "")).status).toBe(409);
    const params = { runId: run.id, lotId: reel?.id ?? "" };
    expect((await send(freeReel, "DELETE", { as: designer, params })).status).toBe(204);
    expect(await jsonOf(await send(listReels, "GET", { as: actor("auditor"), params }))).toEqual({ items: [] });
  });

  test("must use the lot's cable", async () => {
    const run = createRun(designer, newRun("tail"));
    const [reel] = (await lots()).items;
    const answer = await bind(run.id, reel?.id ?? "");
    expect([answer.status, await pathsOf(answer)]).toEqual([422, ["lotId"]]);
    expect((await bind(run.id, "none")).status).toBe(422);
    expect((await bind(run.id, reel?.id ?? "", actor("designer", other))).status).toBe(404);
  });
});
