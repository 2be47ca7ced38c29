import { readFileSync, readdirSync } from "node:fs";
import { and, eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { notices } from "@/db/schema/notices";
import { people, teams } from "@/db/schema/team";
import { findSessionActor, signIn } from "@/lib/auth/service";
import { lossDbPer100m } from "@/lib/cables/model";
import { listEvents } from "@/lib/cables/events/service";
import { getCableOn } from "@/lib/cables/history/service";
import { getQueue } from "@/lib/cables/queue/service";
import { getRevision, listRevisions } from "@/lib/cables/revisions/service";
import { cableSchema } from "@/lib/cables/schema";
import { getCable } from "@/lib/cables/service";
import { circuitSchema } from "@/lib/runs/circuit-schema";
import { listNotices } from "@/lib/notices/inbox/service";
import { noticeSchema } from "@/lib/notices/schema";
import { getRun } from "@/lib/runs/service";
import { refuseMixing, seedDemo } from "@/seeds/index";
import cableData from "@/seeds/data/cables.json";
import teamData from "@/seeds/data/team.json";
import { seedFirstAdmin } from "@/seeds/team";
import { withDatabase } from "@/tests/support/database";

/** Every row of every table, for telling whether anything changed. */
function everything(): Record<string, unknown[]> {
  const { $client: client } = database();
  const tables = client.prepare("SELECT name FROM sqlite_master WHERE type = 'table' ORDER BY name").all() as {
    name: string;
  }[];
  return Object.fromEntries(tables.map(({ name }) => [name, client.prepare(`SELECT * FROM "${name}"`).all()]));
}

describe("The demo", () => {
  withDatabase(seedDemo);

  const signedIn = async (email: string) => {
    const { key } = await signIn({ email, password: teamData.password }, "test");
    const found = findSessionActor(key);
    if (!found) throw new Error(`${email} is not signed in`);
    return found;
  };

  test("Seeding it again changes nothing", async () => {
    const before = everything();
    await seedDemo();
    expect(everything()).toEqual(before);
  });

  test("It holds twelve people, 26 entries and runs R1 and R5", () => {
    expect(database().select().from(people).all()).toHaveLength(12);
    expect(database().select().from(cables).all()).toHaveLength(26);
  });

  test("What its people were told leads to pages of the product, and is of a kind it has", async () => {
    const librarian = await signedIn("nils.ferrant@quillhaven.example");
    const { items, unread } = listNotices(librarian);
    expect(unread).toBeGreaterThan(0);
    for (const notice of items) {
      noticeSchema.parse(notice);
      expect(getCable(librarian, notice.link.replace("/cables/", "")).state).toBe("inReview");
    }
  });

  test.each(teamData.people)("$name can sign in as $role", async ({ email, role }) => {
    expect((await signedIn(email)).role).toBe(role);
  });

  test.each(cableData.cables)("$designation is an entry the product would accept, whole", async ({ id }) => {
    const librarian = await signedIn("nils.ferrant@quillhaven.example");
    expect(cableSchema.parse(getCable(librarian, id))).toMatchObject({ id, revision: id === "c75-f7" ? 3 : 1 });
  });

  // The table gives three decimals, the model's figures three to five digits: half a last digit and 0.1 %.
  test.each(cableData.cables)("$designation loses at each frequency what its loss table says", ({ id, figures }) => {
    const row = database()
      .select({ model: cableRevisions.model })
      .from(cableRevisions)
      .innerJoin(cables, eq(cables.currentRevision, cableRevisions.revision))
      .where(and(eq(cableRevisions.cableId, id), eq(cables.id, id)))
      .get();
    const frequencies = { "1MHz": 1e6, "10MHz": 1e7, "100MHz": 1e8, "1GHz": 1e9 };
    for (const [at, hz] of Object.entries(frequencies)) {
      const stated = figures.lossDbPer100m[at as keyof typeof frequencies];
      if (!row) throw new Error(`no revision of ${id}`);
      expect(Math.abs(lossDbPer100m(row.model, hz) - stated)).toBeLessThan(0.0005 + stated * 0.001);
    }
  });

  test.each(cableData.cables)(
    "The three of impedance, velocity and capacitance of $designation agree",
    ({ figures }) => {
      const expected = 1e12 / (figures.z0Ohm * 299_792_458 * figures.velocityFactor);
      expect(Math.abs(figures.capacitancePfPerM / expected - 1)).toBeLessThan(0.01);
    },
  );

  test("Run R1 is issued to Rhys Colborne, with the cables it pins", async () => {
    const run = getRun(await signedIn("rhys.colborne@quillhaven.example"), "mast-m2-telemetry");
    expect(run).toMatchObject({ number: "R1", state: "issued", ownerName: "Ines Hartwell", availablePowerW: 25 });
    expect(run.pinned).toEqual([
      { cableId: "c50-f10", revision: 1 },
      { cableId: "c50-f28", revision: 1 },
    ]);
    expect(circuitSchema.safeParse(run.circuit).success).toBe(true);
  });

  test("The import whose figures contradict each other is quarantined, and the checks say by how much", async () => {
    const librarian = await signedIn("nils.ferrant@quillhaven.example");
    const { state, checks } = getRevision(librarian, "x-imp-07", 1);
    expect(state).toBe("quarantined");
    const triangle = checks.find(({ check }) => check === "triangle");
    expect(triangle?.verdict).toBe("contradiction");
    expect(triangle?.percent).toBeCloseTo(25, 0);
  });

  test("C75-F7 stands at its third revision, R5 still uses the second, and its owner has been told", async () => {
    const owen = await signedIn("owen.castlebay@quillhaven.example");
    expect(listRevisions(owen, "c75-f7").map(({ revision, state }) => [revision, state])).toEqual([
      [3, "approved"],
      [2, "superseded"],
      [1, "superseded"],
    ]);
    expect(getRun(owen, "studio-2-tie-line").pinned).toContainEqual({ cableId: "c75-f7", revision: 2 });
    const told = database().select().from(notices).where(eq(notices.personId, owen.personId)).all();
    expect(told.map(({ text }) => text)).toContainEqual(expect.stringMatching(/C75-F7 .*revision 3.*R5/));
  });

  test("C93-F4 was returned once with its note; C50-F28 waits for Nils Ferrant, who did not write it", async () => {
    const nils = await signedIn("nils.ferrant@quillhaven.example");
    expect(listEvents(nils, "c93-f4").map(({ step, note }) => [step, note])).toEqual([
      ["begin", "First entry."],
      ["submit", ""],
      ["return", "tan δ estimated, not measured"],
      ["submit", "Marked as an estimate."],
    ]);
    const waiting = getQueue(nils).waiting.find(({ cableId }) => cableId === "c50-f28");
    expect(waiting).toMatchObject({ revision: 2, authorName: "Libby Thornquist", refusal: null });
    expect(getRevision(nils, "c50-f28", 2).checks.filter(({ verdict }) => verdict === "contradiction")).toEqual([]);
  });

  test("Every entry stands in the state that its steps led to", async () => {
    const nils = await signedIn("nils.ferrant@quillhaven.example");
    for (const { id } of database().select({ id: cables.id }).from(cables).all()) {
      const { state, condition, revision } = getCable(nils, id);
      expect(getCableOn(nils, id, new Date().toISOString().slice(0, 10)), id).toMatchObject({
        state,
        condition,
        revision,
      });
    }
  });

  test("A database that holds the demo is not started without it: the demo's passwords are public", () => {
    expect(() => refuseMixing(false)).toThrow(/DATABASE_FILE/);
    expect(() => refuseMixing(true)).not.toThrow();
  });
});

describe("Without the demo", () => {
  withDatabase();

  test("Nobody can sign in until the first admin is named", async () => {
    expect(await seedFirstAdmin({ NODE_ENV: "test" })).toMatch(/ADMIN_EMAIL/);
    expect(database().select().from(people).all()).toEqual([]);
  });

  test("A first admin's password that is too short is refused with the reason", async () => {
    const settings = { NODE_ENV: "test" as const, ADMIN_EMAIL: "a@b.example", ADMIN_PASSWORD: "short" };
    await expect(seedFirstAdmin(settings)).rejects.toThrow(/at least 10 characters/);
    expect(database().select().from(teams).all()).toEqual([]);
  });

  test("The first start makes the admin named in the settings, a later one makes nobody", async () => {
    const settings = {
      NODE_ENV: "test" as const,
      ADMIN_EMAIL: "Ada@Works.example",
      ADMIN_PASSWORD: "a long enough one",
    };
    await seedFirstAdmin({ ...settings, TEAM_NAME: "The works" });
    const { actor } = await signIn({ email: "ada@works.example", password: "a long enough one" }, "test");
    expect(actor).toMatchObject({ role: "admin", teamName: "The works" });
    expect(await seedFirstAdmin({ ...settings, ADMIN_EMAIL: "second@works.example" })).toBeUndefined();
    expect(database().select().from(people).all()).toHaveLength(1);
  });

  test("The demo, whose passwords are public, is not put into a team's own database", () => {
    expect(() => refuseMixing(true)).toThrow(/DEMO=off/);
  });
});

test("Every seed file says where its data comes from", () => {
  const folder = `${process.cwd()}/seeds/data`;
  for (const name of readdirSync(folder)) {
    const { source } = JSON.parse(readFileSync(`${folder}/${name}`, "utf8")) as { source?: string };
    expect(source, name).toMatch(/\w{5}/);
  }
});
