import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, test } from "vitest";
import { GET as getExport } from "@/app/api/v1/cables/export/route";
import { POST as postImport } from "@/app/api/v1/cables/import/route";
import { GET as getImport } from "@/app/api/v1/cables/imports/[importId]/route";
import { GET as listImports } from "@/app/api/v1/cables/imports/route";
import { database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { cableImports } from "@/db/schema/imports";
import type { ImportList, ImportReport, KeptImport } from "@/lib/cables/imports/schema";
import { mostFileBytes } from "@/lib/http/body";
import { withDatabase } from "@/tests/support/database";
import { oldSheet } from "@/tests/support/imports";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, send } from "@/tests/support/requests";
import { addCable } from "@/tests/support/cables";

withDatabase(addPeople);
const librarian = actor("librarian");
beforeEach(() => {
  database().delete(cables).run();
  database().delete(cableImports).run();
});

const csv = { "content-type": "text/csv" };
const sent = (text: string | Uint8Array<ArrayBuffer>, query = "", headers: Record<string, string> = csv) =>
  send(postImport, "POST", { as: librarian, text, headers, path: `/cables/import${query}` });
const report = async (text: string | Uint8Array<ArrayBuffer>, query = "?fileName=old.csv", headers = csv) =>
  jsonOf<ImportReport>(await sent(text, query, headers));
const detailOf = async (answer: Response) => {
  const { detail } = await jsonOf<{ detail: string }>(answer, 422);
  return detail;
};
const outcomes = ({ rows }: ImportReport) => rows.map(({ row, outcome }) => [row, outcome]);
const stored = () => database().select().from(cables).all().length;

describe("A list as somebody keeps it", () => {
  test("is told row by row in a dry run, which stores nothing", async () => {
    const dry = await report(oldSheet, "?dryRun=true&fileName=old.csv");
    expect(outcomes(dry)).toEqual([
      [2, "draft"],
      [3, "quarantined"],
      [4, "draft"],
      [5, "duplicate"],
      [6, "noEntry"],
      [7, "noEntry"],
    ]);
    expect(dry).toMatchObject({ importId: null, rowCount: 6, fileName: "old.csv" });
    expect(dry.counts).toEqual({ draft: 2, quarantined: 1, unchanged: 0, duplicate: 1, noEntry: 2 });
    expect([stored(), database().select().from(cableImports).all()]).toEqual([0, []]);
  });

  test("says as what each column was read, and what a row was read in", async () => {
    const { columns, rows } = await report(oldSheet, "?dryRun=true");
    expect(columns.map(({ readAs }) => readAs?.replaceAll(/[\u00a0\u202f]/g, " "))).toEqual([
      ...["designation", "name", "family", "impedance, Ohm", "velocity factor, %", "capacitance, pF/m"],
      ...["loop resistance, Ω/km", "loss at 10 MHz, dB/100m", "loss at 100 MHz, dB/100m"],
    ]);
    expect(rows[2]?.notes).toEqual(["“Cap. pF/m”: read in pF/ft, not in the unit of the head."]);
    // 93 Ω and 0.84 make 42.7 pF/m, 13.0 pF in a foot.
    expect(rows[2]?.figures?.z0Ohm).toBeCloseTo(93, 6);
  });

  test("says how far apart the figures are where a row contradicts itself", async () => {
    const [, contradiction] = (await report(oldSheet, "?dryRun=true")).rows;
    // 75 Ω and 0.83 make 53.6 pF/m; 67 is a quarter more, the figure of the solid kind.
    expect(contradiction?.faults.join(" ")).toMatch(/25\.0.% apart/);
  });

  test("committed, makes drafts of the asker's own, quarantines what contradicts itself, keeps every row that became none", async () => {
    const { importId, rows, counts } = await report(oldSheet);
    expect(counts.draft + counts.quarantined).toBe(stored());
    const revisions = database().select().from(cableRevisions).all();
    expect(revisions.map(({ state }) => state).sort()).toEqual(["draft", "draft", "quarantined"]);
    expect(new Set(revisions.map(({ authorId }) => authorId))).toEqual(new Set([librarian.personId]));
    const quarantined = rows[1]?.cableId ?? "";
    const events = database().select().from(cableEvents).where(eq(cableEvents.cableId, quarantined)).all();
    expect(events.map(({ step, state }) => [step, state])).toEqual([
      ["begin", "draft"],
      ["quarantine", "quarantined"],
    ]);
    expect(events[1]?.note).toMatch(/25\.0.% apart/);
    const kept = await jsonOf<KeptImport>(
      await send(getImport, "GET", { as: librarian, params: { importId: importId ?? "" } }),
    );
    expect(kept).toMatchObject({ fileName: "old.csv", rowCount: 6, drafts: 2, quarantined: 1, skipped: 3 });
    expect(kept.rows.map(({ row, cableId }) => [row, cableId])).toEqual([
      [3, quarantined],
      [5, null],
      [6, null],
      [7, null],
    ]);
    expect(kept.rows[3]).toMatchObject({
      text: "=cmd|'/C calc'!A0,formula,coax,50,85,,,,",
      faults: [expect.any(String)],
    });
    const { items } = await jsonOf<ImportList>(await send(listImports, "GET", { as: librarian }));
    expect(items.map(({ id }) => id)).toEqual([importId]);
  });

  test("brought in a second time changes nothing", async () => {
    await report(oldSheet);
    const before = stored();
    const { counts } = await report(oldSheet);
    expect(counts).toMatchObject({ draft: 0, quarantined: 0, unchanged: 3 });
    expect(stored()).toBe(before);
  });

  test("leaves an entry alone whose values are others, and says which revision there is", async () => {
    addCable({ id: "qa", designation: "QA-50" });
    const { rows } = await report(oldSheet);
    expect(rows[0]).toMatchObject({ outcome: "duplicate", cableId: null });
    expect(rows[0]?.faults[0]).toContain("revision 1, approved");
  });

  test("is another team's business in another team", async () => {
    addCable({ id: "theirs", designation: "QA-50", team: other });
    expect((await report(oldSheet)).rows[0]?.outcome).toBe("draft");
  });
});

describe("A file with its decimals and its letters in another way", () => {
  const german = "Typ;Z0 [Ω];VF;C [pF/m];family\r\nQB-50;50,0;0,85;78,5;coax\r\n".replace("Typ", "Type");

  test("decimal commas between semicolons are read, and said", async () => {
    const { rows, notes } = await report(german, "?dryRun=true");
    expect(rows[0]).toMatchObject({ outcome: "draft", faults: [] });
    expect(notes).toEqual(["Its cells are parted by semicolons.", "Decimals are parted by a comma."]);
  });

  test("a figure that could be a thousand is not guessed at", async () => {
    const { rows } = await report("Type;Z0 [Ω];VF;family\nQB-1;1,250;0.85;coax", "?dryRun=true");
    expect(rows[0]?.outcome).toBe("noEntry");
    expect(rows[0]?.faults[0]).toContain("a thousand or a decimal");
  });

  test("UTF-16 with its mark and Latin-1 are read, and named", async () => {
    const wide = new Uint8Array(Buffer.from(`\ufeff${german}`, "utf16le"));
    expect((await report(wide, "?dryRun=true")).notes[0]).toBe("The file is in UTF-16.");
    const latin = new Uint8Array(
      Buffer.from("Type,Description,Z0 [Ohm],VF,family\nQB-2,für außen,50,0.85,coax", "latin1"),
    );
    const read = await report(latin, "?dryRun=true");
    expect(read.notes[0]).toBe("The file is in Windows-1252.");
    expect(read.rows[0]?.outcome).toBe("draft");
  });

  test.each([
    ["UTF-16 without its mark", new Uint8Array(Buffer.from(german, "utf16le")), "UTF-16 without its mark"],
    ["a workbook", new Uint8Array([0x50, 0x4b, 3, 4, 20, 0]), "a workbook"],
    ["a packed file", new Uint8Array([0x1f, 0x8b, 8, 0]), "compressed"],
    ["a PDF", new Uint8Array(Buffer.from("%PDF-1.7\n")), "a PDF"],
    ["no text at all", new Uint8Array([0x41, 0x81, 0x8d, 0x01]), "neither UTF-8"],
  ])("%s is refused by its name", async (_, bytes, name) => {
    expect(await detailOf(await sent(bytes))).toContain(name);
  });

  test("a unit that nobody gives is asked for, since feet and metres are both possible", async () => {
    const { rows } = await report("Type,Z0,VF,Loss 10 MHz,family\nQB-3,50,0.85,1.3,coax", "?dryRun=true");
    expect(rows[0]?.outcome).toBe("noEntry");
    expect(rows[0]?.faults[0]).toContain("in which unit");
  });

  test("dB/100 ft and dB/100 m give the same model for the same cable", async () => {
    const rows = (head: string, loss: number) =>
      report(`Type,Z0,VF,R loop [Ω/km],${head},family\nQB-4,50,0.85,8.6,${loss},coax`, "?dryRun=true");
    const metres = await rows("Loss 100 MHz [dB/100 m]", 4.1);
    const feet = await rows("Loss 100 MHz [dB/100 ft]", 4.1 * 0.3048);
    expect(feet.rows[0]?.figures?.lossDbPer100m).toBeCloseTo(metres.rows[0]?.figures?.lossDbPer100m ?? NaN, 9);
  });
});

describe("A hostile file", () => {
  test("of a million rows is refused in words before they are read", async () => {
    const started = performance.now();
    expect(await detailOf(await sent(`Type,Z0\n${"x,1\n".repeat(1_000_000)}`))).toContain("more than 20,000 rows");
    expect(performance.now() - started).toBeLessThan(20_000);
  });

  test("of more than 25 MB is refused with 413, and how to part it", async () => {
    const answer = await sent("x".repeat(mostFileBytes + 1));
    expect(answer.status).toBe(413);
    expect(((await answer.json()) as { detail: string }).detail).toContain("Part it");
  });

  test.each([
    ["nothing", "", 400],
    ["a head alone", "Type,Z0\n", 422],
    ["no head", "QB-1,50,0.85\nQB-2,50,0.85", 422],
    ["quotation marks without end", `Type,Z0\n"${"x".repeat(50_000)}`, 422],
    ["a row of thousands of columns", `Type,Z0\n${",".repeat(5_000)}`, 422],
    ["a cell without end", `Type,Z0\n${"x".repeat(300_000)},1`, 422],
    ["blank lines", `Type,Z0${"\n".repeat(100_000)}`, 422],
  ])("of %s is refused in words", async (_, text, status) => {
    expect((await sent(text)).status).toBe(status);
    expect(stored()).toBe(0);
  });

  test("that is compressed on the way, or of another kind, is refused with 415", async () => {
    expect((await sent("x", "", { ...csv, "content-encoding": "gzip" })).status).toBe(415);
    expect((await sent("x", "", { "content-type": "text/plain" })).status).toBe(415);
  });

  test("cannot hide characters in a designation, nor carry them into another text", async () => {
    const { rows } = await report(
      "Type,Description,Z0,VF,family\nQB\u202e-5,x,50,0.85,coax\nQB-6,a\u200bb\u0007,50,0.85,coax",
    );
    expect(rows[0]).toMatchObject({ outcome: "noEntry", designation: null });
    expect(rows[0]?.faults[0]).toContain("turns the direction");
    expect(rows[1]).toMatchObject({
      outcome: "draft",
      notes: [expect.any(String), expect.stringContaining("taken out")],
    });
    const named = database().select({ name: cableRevisions.name }).from(cableRevisions).all();
    expect(named).toEqual([{ name: "ab" }]);
  });

  const json = { "content-type": "application/json" };
  test.each([
    ["no catalogue", "{}"],
    ["a newer version", '{"format":"ropewalk-catalogue","version":2,"cables":[]}'],
    ["no JSON", "Type,Z0"],
    ["deep lists", `{"format":"ropewalk-catalogue","version":1,"cables":${"[".repeat(100_000)}${"]".repeat(100_000)}}`],
    ["__proto__", '{"__proto__":{"format":"ropewalk-catalogue"},"version":1,"cables":[{}]}'],
  ])("of JSON with %s is refused, or kept as rows that are none", async (_, text) => {
    const answer = await sent(text, "?dryRun=true", json);
    expect([200, 422]).toContain(answer.status);
    if (answer.status === 200)
      for (const row of (await jsonOf<ImportReport>(answer)).rows) expect(row.outcome).toBe("noEntry");
  });
});

describe("Taken out and brought in", () => {
  const taken = async (format: "csv" | "json", as = librarian, more = "") => {
    const answer = await send(getExport, "GET", { as, path: `/cables/export?format=${format}${more}` });
    expect(answer.status).toBe(200);
    return answer;
  };

  test.each(["csv", "json"] as const)("as %s, the catalogue of another team becomes the same", async (format) => {
    await report(oldSheet);
    addCable({ id: "x", designation: "=1+1", name: "@name", maxFrequencyHz: 1.1e9 });
    const file = await (await taken(format)).text();
    const type = { "content-type": format === "csv" ? "text/csv" : "application/json" };
    const admin = actor("admin", other);
    const answer = await send(postImport, "POST", { as: admin, text: file, headers: type, path: "/cables/import" });
    expect((await jsonOf<ImportReport>(answer)).counts).toMatchObject({ draft: 3, quarantined: 1 });
    const again = await (await taken(format, admin)).text();
    // What was approved stands as a draft: only that may differ.
    expect(again.replaceAll("draft", "approved")).toBe(file.replaceAll("draft", "approved"));
  });

  test("in parts is the same as whole", async () => {
    await report(oldSheet);
    const whole = await (await taken("csv")).text();
    const first = await (await taken("csv", librarian, "&limit=2")).text();
    const rest = await (await taken("csv", librarian, "&after=QA-75")).text();
    expect(first + rest.slice(rest.indexOf("\r\n") + 2)).toBe(whole);
  });

  test("is a file to keep, and no designer finds another's draft in it", async () => {
    await report(oldSheet);
    const answer = await taken("csv", actor("designer"));
    expect(answer.headers.get("content-disposition")).toMatch(/^attachment; filename="catalogue-[\d-]+\.csv"/);
    const text = await answer.text();
    expect(text).not.toContain("QA-50");
    expect(text).toContain("QA-75"); // in quarantine: everybody is warned
  });
});

test("Long work is told line by line where lines are asked for", async () => {
  const answer = await sent(oldSheet, "?dryRun=true", { ...csv, accept: "application/x-ndjson" });
  const lines = (await answer.text())
    .trim()
    .split("\n")
    .map((line) => JSON.parse(line) as Record<string, unknown>);
  expect(lines.at(0)).toEqual({ progress: { done: 0, of: 6 } });
  expect(lines.at(-2)).toEqual({ progress: { done: 6, of: 6 } });
  expect(lines.at(-1)).toMatchObject({ report: { rowCount: 6 } });
  const refused = await sent("Type,Z0\n", "", { ...csv, accept: "application/x-ndjson" });
  expect((await refused.text()).trim()).toContain('{"problem":{"type":"about:blank","title":"Unprocessable Content"');
});
