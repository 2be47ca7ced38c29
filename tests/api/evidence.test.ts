import { beforeEach, describe, expect, test } from "vitest";
import { GET as readFile } from "@/app/api/v1/cables/[cableId]/evidence/[evidenceId]/route";
import { GET as listFiles, POST as addFile } from "@/app/api/v1/cables/[cableId]/evidence/route";
import { database } from "@/db/client";
import { cableEvidence } from "@/db/schema/evidence";
import { typeByContent } from "@/lib/cables/evidence/media";
import type { Evidence, EvidenceList } from "@/lib/cables/evidence/schema";
import { mostFileBytes } from "@/lib/http/body";
import { addCable } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, send } from "@/tests/support/requests";

const designer = actor("designer");
const librarian = actor("librarian");
withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
  addCable({ id: "own", state: "draft", authorId: designer.personId });
  addCable({ id: "theirs", team: other });
});
beforeEach(() => database().delete(cableEvidence).run());

const bytes = (text: string) => Uint8Array.from(text, (letter) => letter.charCodeAt(0));
const pdf = bytes("%PDF-1.7\n1 0 obj<<>>endobj\nxref\ntrailer<<>>\nstartxref\n9\n%%EOF\n");
const png = bytes("\x89PNG\r\n\x1a\n\0\0\0\rIHDR\0\0\0\x01\0\0\0\x01\x08\0\0\0\0crc!\0\0\0\0IEND\xaeB\x60\x82");
const jpeg = bytes("\xff\xd8\xff\xe0\0\x10JFIF\0data\xff\xd9");
const webp = bytes("RIFF\x0c\0\0\0WEBPVP8 \0\0\0\0");
const s1p = bytes("! swept on site\n# MHz S DB R 50\n10 -20.1 45\n20 -19.8 50 ! end\n");
const csv = bytes("f [MHz];dB/100 m\n10;1,27\n100;4,1\n");

const form = (content: Uint8Array<ArrayBuffer>, name = "sheet.pdf", title = "A sheet, issue 2, page 3") => {
  const made = new FormData();
  made.set("title", title);
  made.set("file", new File([content], name, { type: "application/pdf" }));
  return made;
};
const add = (sent: FormData, as = librarian, cableId = "feeder") =>
  send(addFile, "POST", { as, text: sent, params: { cableId } });

test("A form of very many parts is refused unread, and a long name keeps whole characters", async () => {
  const many = form(csv);
  for (let i = 0; i < 60; i++) many.set(`f${i}`, "x");
  expect((await add(many)).status).toBe(413);
  const { fileName } = await jsonOf<Evidence>(await add(form(csv, `${"😀".repeat(200)}a.csv`)), 201);
  expect(fileName).toBe(`${"😀".repeat(115)}a.csv`);
});

describe("What a file is", () => {
  const most = 24 * 1_048_576;
  test.each([
    ["one line of digits that is no number", `# MHz S RI R 50\n${"1".repeat(most)}x\n`, undefined],
    ["an option line that goes on and on", `# ${"hz".repeat(most / 2)}?\n1 2 3\n`, undefined],
    ["one row of very many numbers", `# MHz S RI R 50\n${"1 ".repeat(most / 2)}\n`, undefined],
    ["one quotation mark after the other", `${'"'.repeat(most)},b\n1,2\n`, undefined],
    ["a table of very many rows", `a,b\n${"1,2\n".repeat(most / 4)}`, "text/csv"],
  ])("is told in one pass: %s", (_, text, type) => {
    const content = new TextEncoder().encode(text);
    const begin = performance.now();
    expect(typeByContent(content)).toBe(type);
    // Patterns took from seconds to for ever; a pass takes some tenths, wide apart for busy machines.
    expect(performance.now() - begin).toBeLessThan(3000);
  });

  test.each([
    ["a PDF", pdf, "application/pdf"],
    ["a PNG", png, "image/png"],
    ["a JPEG", jpeg, "image/jpeg"],
    ["a WebP", webp, "image/webp"],
    ["Touchstone", s1p, "application/touchstone"],
    ["a table", csv, "text/csv"],
  ])("%s is told by its content", (_, content, type) => {
    expect(typeByContent(content)).toBe(type);
  });

  test.each([
    ["a PDF in its first line only", bytes("%PDF-1.7\n<script>alert(1)</script>")],
    ["a PDF that begins elsewhere", bytes(`<html>${String.fromCharCode(...pdf)}`)],
    ["a picture cut short", png.slice(0, 40)],
    ["markup", bytes("<html><body>a,b\nc,d</body></html>\n")],
    ["a drawing with a script in it", bytes('<svg xmlns="x" onload="a,b()">\n<a>,</a>\n</svg>')],
    ["a program", bytes("MZ\x90\0\x03")],
    ["Touchstone with a line of words", bytes("# MHz S DB R 50\n10 -20 45\n<script>\n")],
    ["plain words", bytes("Dear all,\nplease find enclosed\n")],
    ["nothing", new Uint8Array()],
    ["a container that is longer than it says", bytes("RIFF\x0c\0\0\0WEBPVP8 \0\0\0\0 and more")],
  ])("%s is none of them", (_, content) => {
    expect(typeByContent(content)).toBeUndefined();
  });
});

describe("A file added to an entry", () => {
  test("is listed with what it was found to be, and comes back byte by byte", async () => {
    const added = await jsonOf<Evidence>(await add(form(s1p, "C:\\sweeps\\..\\run\u202e.pdf")), 201);
    expect(added).toMatchObject({ mediaType: "application/touchstone", fileName: "run.pdf", sizeBytes: s1p.length });
    const { items, mayAdd } = await jsonOf<EvidenceList>(
      await send(listFiles, "GET", { as: designer, params: { cableId: "feeder" } }),
    );
    expect([items, mayAdd]).toEqual([[added], false]);
    const answer = await send(readFile, "GET", { as: designer, params: { cableId: "feeder", evidenceId: added.id } });
    expect(new Uint8Array(await answer.arrayBuffer())).toEqual(s1p);
  });

  test("is given out so that nothing in it can run, and shown only where it is a picture or a PDF", async () => {
    const read = async (content: Uint8Array<ArrayBuffer>, view = "") => {
      const { id } = await jsonOf<Evidence>(await add(form(content, 'sh"eet é.pdf')), 201);
      const params = { cableId: "feeder", evidenceId: id };
      return (await send(readFile, "GET", { as: librarian, params, path: `/x${view}` })).headers;
    };
    const kept = await read(pdf);
    expect(kept.get("content-disposition")).toBe(
      "attachment; filename=\"sheet _.pdf\"; filename*=UTF-8''sheet%20%C3%A9.pdf",
    );
    for (const headers of [kept, await read(png, "?view=true"), await read(csv, "?view=true")]) {
      expect(headers.get("content-security-policy")).toMatch(/default-src 'none';.* sandbox$/);
      expect(headers.get("x-content-type-options")).toBe("nosniff");
      const isPicture = headers.get("content-type") === "image/png";
      expect(headers.get("content-disposition")?.startsWith(isPicture ? "inline" : "attachment")).toBe(true);
    }
  });

  test("that is not what it says is refused, and nothing is kept", async () => {
    const answer = await add(form(bytes("%PDF-1.7\nnot really")));
    expect((await jsonOf<{ detail: string }>(answer, 422)).detail).toContain("none of PDF");
    expect(database().select().from(cableEvidence).all()).toEqual([]);
  });

  test("a second time is refused as the same", async () => {
    await add(form(pdf));
    expect((await add(form(pdf, "copy.pdf"))).status).toBe(409);
  });

  test.each([
    ["no title", form(pdf, "a.pdf", " "), 422],
    ["no file", new FormData(), 422],
    ["an empty file", form(new Uint8Array()), 422],
  ])("with %s is refused at its field", async (_, sent, status) => {
    expect((await add(sent)).status).toBe(status);
  });

  test("of more than 25 MB is refused while it comes", async () => {
    let sent = 0;
    const body = new ReadableStream<Uint8Array>({
      pull: (controller) => {
        sent += 65_536;
        controller.enqueue(new Uint8Array(65_536)); // never ends
      },
    });
    const { cookieOf } = await import("@/tests/support/requests");
    const headers = {
      cookie: await cookieOf(librarian),
      "sec-fetch-site": "same-origin",
      "content-type": "multipart/form-data; boundary=x",
    };
    const request = new Request("http://ropewalk.test/x", {
      method: "POST",
      headers,
      body,
      duplex: "half",
    } as RequestInit);
    expect((await addFile(request, { params: Promise.resolve({ cableId: "feeder" }) })).status).toBe(413);
    expect(sent).toBeLessThan(mostFileBytes + 1_000_000);
  });

  test.each([
    [
      "cut short",
      '--x\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\nabc',
      "multipart/form-data; boundary=x",
      400,
    ],
    ["without its boundary", "abc", "multipart/form-data", 400],
    ["that is no form", "{}", "application/json", 415],
  ])("in a form %s is refused", async (_, text, type, status) => {
    const answer = await send(addFile, "POST", {
      ...{ as: librarian, text, headers: { "content-type": type }, params: { cableId: "feeder" } },
    });
    expect(answer.status).toBe(status);
  });

  test("is added by the author of a draft, not by a designer to what is approved, and never across teams", async () => {
    expect((await add(form(pdf), designer, "own")).status).toBe(201);
    expect((await add(form(pdf), designer, "feeder")).status).toBe(403);
    expect((await add(form(pdf), librarian, "theirs")).status).toBe(404);
    const { id } = await jsonOf<Evidence>(await add(form(png), actor("admin", other), "theirs"), 201);
    const params = { cableId: "feeder", evidenceId: id };
    expect((await send(readFile, "GET", { as: librarian, params })).status).toBe(404);
  });
});
