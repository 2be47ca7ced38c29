import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { GET as getCable } from "@/app/api/v1/cables/[cableId]/route";
import { GET as getCables } from "@/app/api/v1/cables/route";
import { database } from "@/db/client";
import { runAssignees, runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { type CablePage, cablePageSchema } from "@/lib/cables/query";
import { cableSchema } from "@/lib/cables/schema";
import { createRun } from "@/lib/runs/service";
import { addCable, coaxModel, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

/** Z0 and velocity factor of a model change with its inductance. */
const withImpedance = (z0: number) => ({ ...coaxModel, lInfHPerM: z0 * z0 * coaxModel.cFPerM });

withDatabase(async () => {
  await addPeople();
  addCable({ id: "a50", name: "mast feeder low-loss", outerDiameterMm: 10.3, preferred: true, maxFrequencyHz: 3e9 });
  addCable({ id: "b75", name: "studio trunk", model: withImpedance(75), outerDiameterMm: 6.9, maxFrequencyHz: 6e9 });
  addCable({ id: "c120", name: "bus pair", family: "twistedPair", model: withImpedance(120), outerDiameterMm: 7.1 });
  addCable({ id: "d50r", name: "thin lead", state: "restricted", outerDiameterMm: 2.8 });
  addCable({ id: "e78", name: "twin lead", family: "twinaxial", model: withImpedance(78) });
  addCable({ id: "old", name: "old feeder", state: "superseded", successorId: "a50" });
  addCable({ id: "bad", name: "contradictory", state: "quarantined" });
  addCable({ id: "mine", name: "own draft", state: "draft", authorId: actor("designer").personId });
  addCable({ id: "review", name: "under review", state: "inReview" });
  addCable({ id: "theirs", team: other });
});

const designer = actor("designer");
const list = async (query: string, as: Actor = designer) => {
  const page = await jsonOf<CablePage>(await send(getCables, "GET", { as, path: `/cables?${query}` }));
  return cablePageSchema.parse(page);
};
const ids = async (query: string, as?: Actor) => (await list(query, as)).items.map(({ id }) => id);

describe("The catalogue", () => {
  test("shows approved entries with the restricted ones among them, by designation", async () => {
    expect(await ids("")).toEqual(["a50", "b75", "c120", "d50r", "e78"]);
  });

  test.each<[string, string[]]>([
    ["family=twistedPair", ["c120"]],
    ["family=twistedPair&family=twinaxial", ["c120", "e78"]],
    ["z0Ohm=70..80", ["b75", "e78"]],
    ["z0Ohm=..50.1", ["a50", "d50r"]],
    ["z0Ohm=119..", ["c120"]],
    ["outerDiameterMm=..7", ["b75", "d50r"]],
    ["outerDiameterMm=7..1.1e1", ["a50", "c120"]],
    ["maxFrequencyHz=4e9", ["b75"]],
    ["preferred=true", ["a50"]],
    ["preferred=false", ["b75", "c120", "d50r", "e78"]],
    ["state=superseded", ["old"]],
    ["state=restricted", ["d50r"]],
    ["state=quarantined&state=superseded", ["bad", "old"]],
    ["sort=-designation", ["e78", "d50r", "c120", "b75", "a50"]],
    ["sort=-z0&limit=2", ["c120", "e78"]],
    // What has no diameter comes last either way.
    ["sort=outerDiameter", ["d50r", "b75", "c120", "a50", "e78"]],
    ["sort=-outerDiameter", ["a50", "c120", "b75", "d50r", "e78"]],
    ["velocityFactor=0.8..0.85", ["a50", "d50r"]],
    ["q=feeder", ["a50"]],
    ["q=feeder&state=superseded", ["old"]],
    ["q=loss+mast", ["a50"]],
    ["q=twistedPair", ["c120"]],
    ["q=nothing", []],
  ])("with %s shows %j", async (query, expected) => {
    expect(await ids(query)).toEqual(expected);
  });

  test("tells the loss at the frequency asked, in dB per 100 m, and filters and sorts by it", async () => {
    const { items } = await list("lossAtHz=100e6&sort=loss");
    const losses = items.map(({ lossDbPer100m }) => lossDbPer100m ?? NaN);
    expect(losses).toEqual([...losses].sort((a, b) => a - b));
    // α = R/(2·Z0) + dielectric at high frequency: twice the impedance, half the copper loss.
    expect(items[0]?.id).toBe("c120");
    const [least = 0, , , , most = 0] = losses;
    expect(await ids(`lossAtHz=1e8&lossDbPer100m=..${least + 1e-9}`)).toEqual(["c120"]);
    expect(await ids(`lossAtHz=1e8&lossDbPer100m=${most - 1e-9}..`)).toEqual(["a50", "d50r"]);
  });

  test("tells no loss when no frequency is named", async () => {
    expect((await list("")).items.map(({ lossDbPer100m }) => lossDbPer100m)).toEqual([null, null, null, null, null]);
  });

  test("pages through the same order whatever it is sorted by", async () => {
    for (const sort of ["designation", "-z0", "outerDiameter", "-outerDiameter", "-loss", "velocityFactor"]) {
      const whole = await ids(`sort=${sort}&lossAtHz=1e8`);
      const seen: string[] = [];
      let cursor = "";
      do {
        const page = await list(`sort=${sort}&lossAtHz=1e8&limit=2${cursor}`);
        seen.push(...page.items.map(({ id }) => id));
        cursor = page.nextCursor === null ? "" : `&cursor=${page.nextCursor}`;
      } while (cursor !== "");
      expect(seen, sort).toEqual(whole);
    }
  });

  test("neither skips nor repeats an entry when another is added between two pages", async () => {
    const first = await list("limit=2");
    addCable({ id: "added", designation: "A51" });
    const rest = await ids(`cursor=${first.nextCursor}`);
    expect(rest).toEqual(["c120", "d50r", "e78"]);
  });

  test("says how it read the search, and which words it took for others", async () => {
    const page = await list("q=studoi");
    expect(page).toMatchObject({ readAs: "studio", corrected: [{ typed: "studoi", read: "studio" }] });
    expect(page.items.map(({ id }) => id)).toEqual(["b75"]);
    expect(await ids("q=studoi&exact=true")).toEqual([]);
  });

  test("finds an entry by its new words as soon as they are stored", async () => {
    expect(await ids("q=gannet")).toEqual([]);
    addCable({ id: "gannet", name: "gannet lead", state: "withdrawn" });
    expect(await ids("q=gannet&state=withdrawn")).toEqual(["gannet"]);
    expect(await ids("q=gannte&state=withdrawn")).toEqual(["gannet"]);
  });

  test.each([
    'q="',
    "q=*",
    "q=a%20OR%20b",
    "q=team:x",
    "q=(",
    "q=%27;drop%20table%20cables",
    "q=%00",
    "q=NEAR(a%20b)",
    "q=%25",
  ])("takes %s as words, not as a command", async (query) => {
    expect((await send(getCables, "GET", { as: designer, path: `/cables?${query}` })).status).toBe(200);
  });

  test("never finds another team's entry, in no way of asking", async () => {
    for (const query of ["q=theirs", "state=approved&limit=200", "q=fen", "q=test+cable"])
      expect(await ids(query, actor("admin"))).not.toContain("theirs");
    expect(await ids("q=theirs", actor("designer", other))).toEqual(["theirs"]);
  });

  test.each([
    ["z0Ohm=50", "z0Ohm"],
    ["z0Ohm=..", "z0Ohm"],
    ["z0Ohm=a..b", "z0Ohm"],
    ["z0Ohm=60..50", "z0Ohm"],
    ["z0Ohm=1e999..", "z0Ohm"],
    ["z0Ohm=1..2&z0Ohm=3..4", "z0Ohm"],
    ["lossAtHz=0", "lossAtHz"],
    ["lossAtHz=-1e6", "lossAtHz"],
    ["lossAtHz=1e999", "lossAtHz"],
    ["lossDbPer100m=..6", "lossAtHz"],
    ["sort=loss", "lossAtHz"],
    ["sort=colour", "sort"],
    ["family=rope", "family.0"],
    ["family=coaxial&family=rope", "family.1"],
    ["state=lost", "state.0"],
    ["preferred=yes", "preferred"],
    ["maxFrequencyHz=high", "maxFrequencyHz"],
    ["z0=50", "z0"],
  ])("refuses %s at %s", async (query, path) => {
    const answer = await send(getCables, "GET", { as: designer, path: `/cables?${query}` });
    expect([answer.status, await pathsOf(answer)]).toEqual([422, [path]]);
  });
});

describe("Facets", () => {
  const facets = async (query: string) => {
    const page = await list(`${query}&facets=true`);
    if (!page.facets) throw new Error("no facets");
    return page.facets;
  };
  const counted = (bins: { count: number }[]) => bins.reduce((sum, { count }) => sum + count, 0);

  test("count each value under all the other filters, not under its own", async () => {
    const { family, z0Ohm } = await facets("family=twistedPair&z0Ohm=..130");
    expect(family.find(({ value }) => value === "coaxial")?.count).toBeGreaterThan(0);
    expect(family.find(({ value }) => value === "twistedPair")?.count).toBe(1);
    expect(counted(z0Ohm)).toBe(1);
  });

  test("count every entry once, in bins that follow one another", async () => {
    const { z0Ohm, outerDiameterMm, lossDbPer100m } = await facets("lossAtHz=1e8");
    const { total, items } = await list("limit=200");
    expect(counted(z0Ohm)).toBe(total);
    expect(counted(lossDbPer100m)).toBe(total);
    expect(counted(outerDiameterMm)).toBe(items.filter((item) => item.outerDiameterMm !== null).length);
    for (const [i, bin] of z0Ohm.entries()) if (i > 0) expect(bin.from).toBe(z0Ohm[i - 1]?.to);
  });

  test("have no loss without its frequency", async () => {
    expect((await facets("")).lossDbPer100m).toEqual([]);
  });

  test("count states whatever state is asked for", async () => {
    const { state } = await facets("");
    expect(state).toContainEqual({ value: "superseded", count: 1 });
  });
});

describe("Drafts and reviews", () => {
  test.each(["librarian", "admin", "auditor"] as const)("are listed for a %s", async (role) => {
    expect(await ids("state=draft&state=inReview", actor(role))).toEqual(["mine", "review"]);
  });

  test("are listed for their author, who sees nobody else's", async () => {
    expect(await ids("state=draft&state=inReview")).toEqual(["mine"]);
  });

  test("are read by their author and their reviewers; others are told they may not", async () => {
    const status = async (cableId: string, as: Actor) =>
      (await send(getCable, "GET", { as, params: { cableId } })).status;
    expect(await status("mine", designer)).toBe(200);
    expect(await status("review", designer)).toBe(403);
    for (const role of ["librarian", "admin", "auditor"] as const)
      expect(await status("review", actor(role))).toBe(200);
  });
});

describe("An installer", () => {
  const installer = actor("installer");
  const status = async (cableId: string) =>
    (await send(getCable, "GET", { as: installer, params: { cableId } })).status;

  test("sees no cable before a run is issued to them, then those of the run, whatever has become of them", async () => {
    expect(await ids("", installer)).toEqual([]);
    const { id } = createRun(designer, newRun("b75"));
    database().insert(runAssignees).values({ runId: id, personId: installer.personId }).run();
    expect(await ids("", installer)).toEqual([]);
    database().update(runs).set({ state: "issued" }).where(eq(runs.id, id)).run();
    expect(await ids("", installer)).toEqual(["b75"]);
    expect([await status("b75"), await status("a50")]).toEqual([200, 404]);
    database().update(runs).set({ removedAt: "2026-01-01" }).where(eq(runs.id, id)).run();
    expect(await status("b75")).toBe(404);
  });
});

describe("One entry", () => {
  test("is answered whole", async () => {
    const answer = await send(getCable, "GET", { as: designer, params: { cableId: "old" } });
    expect(cableSchema.parse(await jsonOf(answer))).toMatchObject({
      id: "old",
      state: "superseded",
      model: coaxModel,
      successor: { cableId: "a50", designation: "A50", equivalence: "needsRedesign" },
    });
  });

  test.each(["theirs", "unknown", "", "%", "__proto__"])("called %j does not exist", async (cableId) => {
    const answer = await send(getCable, "GET", { as: designer, params: { cableId } });
    expect(await jsonOf(answer, 404)).toMatchObject({ detail: "There is no such cable." });
  });

  test("counts the runs it is used in, each once, without removed ones", async () => {
    const uses = async () => (await list("q=twin")).items.find(({ id }) => id === "e78")?.usedInRuns;
    const before = await uses();
    const made = createRun(designer, newRun("e78"));
    createRun(designer, newRun("e78"));
    expect(await uses()).toBe((before ?? 0) + 2);
    database().update(runs).set({ removedAt: "2026-01-01" }).where(eq(runs.id, made.id)).run();
    expect(await uses()).toBe((before ?? 0) + 1);
  });
});
