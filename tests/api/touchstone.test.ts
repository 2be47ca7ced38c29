import { describe, expect, test } from "vitest";
import { POST } from "@/app/api/v1/compute/touchstone/route";
import { POST as computeLine } from "@/app/api/v1/compute/line/route";
import { touchstoneAnswerSchema } from "@/lib/compute/touchstone/schema";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople } from "@/tests/support/people";
import { jsonOf, send } from "@/tests/support/requests";

withDatabase(addPeople);
const ask = (body: unknown) => send(POST, "POST", { as: actor("installer"), body });
const read = (text: string, fileName = "run.s2p") => ask({ fileName, text });

test("A file is answered in SI units, rows and columns as matrices", async () => {
  const text = "! a cable\n# MHz S RI R 50\n1 0.11 0 0.21 0.5 0.12 0.5 0.22 0\n2 0 0 0 0 0 0 0 0\n";
  const answer = touchstoneAnswerSchema.parse(await jsonOf(await read(text)));
  expect(answer).toMatchObject({
    version: "1.1",
    ports: 2,
    parameter: "S",
    referenceOhm: [50, 50],
    comments: ["a cable"],
  });
  expect(answer.frequenciesHz).toEqual([1e6, 2e6]);
  expect(answer.matrix.re[0]).toEqual([
    [0.11, 0.12],
    [0.21, 0.22],
  ]);
  expect(answer.matrix.im[0]).toEqual([
    [0, 0.5],
    [0.5, 0],
  ]);
  expect(answer.warnings).toEqual([]);
});

test.each([
  ["in its second line", "# MHz\n1 0.1\n", 2],
  ["in no single line", "! nothing\n", null],
])("A file at fault %s is refused with it", async (_, text, line) => {
  const problem = await jsonOf<{ line: unknown; detail: string; errors: { path: string }[] }>(await read(text), 422);
  expect(problem.line).toBe(line);
  expect(problem.errors.map(({ path }) => path)).toEqual(["text"]);
  expect(problem.detail.startsWith("Line 2: ")).toBe(line === 2);
});

test.each<[string, unknown, string[]]>([
  ["no text", { fileName: "a.s1p" }, ["text"]],
  ["no name", { text: "" }, ["fileName"]],
  ["an empty name and a number for a text", { fileName: "", text: 1 }, ["fileName", "text"]],
  ["a field of its own", { fileName: "a.s1p", text: "", encoding: "utf-8" }, ["encoding"]],
])("A request with %s is refused at its path", async (_, body, paths) => {
  const { errors } = await jsonOf<{ errors: { path: string }[] }>(await ask(body), 422);
  expect(errors.map(({ path }) => path).sort()).toEqual(paths);
});

describe("A large file", () => {
  const lines = (count: number) => Array.from({ length: count }, (_, k) => `${k + 1} 0.1 0.1`).join("\n");

  test("of more than 1 MB is taken here, and nowhere else", async () => {
    const text = `# Hz S RI R 50\n${lines(70_000)}\n${"! and a long comment\n".repeat(20_000)}`;
    expect(text.length).toBeGreaterThan(1_100_000);
    const { frequenciesHz } = await jsonOf<{ frequenciesHz: number[] }>(await read(text, "a.s1p"));
    expect(frequenciesHz).toHaveLength(70_000);
    expect((await send(computeLine, "POST", { as: actor("designer"), body: { text } })).status).toBe(413);
  });

  test("of more frequencies than an answer carries is refused in words", async () => {
    const { detail } = await jsonOf<{ detail: string }>(await read(`#\n${lines(100_002)}`, "a.s1p"), 422);
    expect(detail).toMatch(/^Line 100003: The file has more than 100001 frequencies/);
  });

  test("of more than 25 MB is refused with 413, before and after it has been taken", async () => {
    expect((await read("!".repeat(25 * 1_048_576 + 1))).status).toBe(413);
    expect((await read("!".repeat(31 * 1_048_576))).status).toBe(413);
  });
});
