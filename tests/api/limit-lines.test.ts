import { beforeEach, describe, expect, test } from "vitest";
import { DELETE as removeLine } from "@/app/api/v1/limit-lines/[limitLineId]/route";
import { GET as getLines, POST as postLine } from "@/app/api/v1/limit-lines/route";
import { database } from "@/db/client";
import { limitLines } from "@/db/schema/limit-lines";
import { type LimitLineItem, limitLineSchema, newLimitLineSchema } from "@/lib/limit-lines/schema";
import { limitOver, limitRange } from "@/lib/limit-lines/limit";
import { standardLimits } from "@/lib/line/limits/standard-limits";
import { withDatabase } from "@/tests/support/database";
import { newLimitLine } from "@/tests/support/limit-lines";
import { actor, addPeople, other } from "@/tests/support/people";
import fc from "@/tests/support/property";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

withDatabase(() => addPeople());
beforeEach(() => void database().delete(limitLines).run());

const librarian = actor("librarian");
const read = async (query = "", as = actor("designer")) =>
  (await jsonOf<{ items: LimitLineItem[] }>(await send(getLines, "GET", { as, path: `/limit-lines${query}` }))).items;
const add = (body: unknown, as = librarian) => send(postLine, "POST", { as, body });
const remove = (limitLineId: string, as = librarian) => send(removeLine, "DELETE", { as, params: { limitLineId } });

describe("Limit lines", () => {
  test("hold those of the standards first, marked, with title, edition and how they are known", async () => {
    await add(newLimitLine("Aardvark"));
    const items = await read();
    expect(items.map(({ isStandard }) => isStandard)).toEqual([...standardLimits.map(() => true), false]);
    expect(items.find(({ id }) => id === "cat6Cable")).toMatchObject({
      ...{ isStandard: true, mark: "memory", addedByName: null },
      source: { title: "ANSI/TIA-568-C.2", edition: "2009", clause: null },
      note: expect.stringContaining("check your edition"),
    });
    for (const item of items) limitLineSchema.parse(item);
  });

  test("come back as they were added, and give the same limits", async () => {
    const line = newLimitLine("Trunk at 20 °C");
    const added = await jsonOf<LimitLineItem>(await add(line), 201);
    expect(added).toMatchObject({ ...line, isStandard: false, mark: null, addedByName: librarian.name });
    const [read1] = (await read()).filter(({ isStandard }) => !isStandard);
    expect(read1).toEqual(added);
    expect([...limitOver(read1!, [1e6, 100e6], 50)]).toEqual([...limitOver(line, [1e6, 100e6], 50)]);
  });

  test("are found by quantity and by what they limit", async () => {
    const items = await read("?quantity=returnLoss&of=link");
    expect(items.length).toBeGreaterThan(0);
    expect(items.every(({ quantity, of }) => quantity === "returnLoss" && of === "link")).toBe(true);
    expect((await send(getLines, "GET", { as: librarian, path: "/?quantity=colour" })).status).toBe(422);
  });

  test("of another team are neither seen nor taken away", async () => {
    const { id } = await jsonOf<LimitLineItem>(await add(newLimitLine("Ours")), 201);
    expect((await read("", actor("admin", other))).every(({ isStandard }) => isStandard)).toBe(true);
    expect((await remove(id, actor("admin", other))).status).toBe(404);
    expect((await add(newLimitLine("Ours"), actor("admin", other))).status).toBe(201);
    expect((await remove(id)).status).toBe(204);
    expect((await remove(id)).status).toBe(404);
  });

  test("have names of their own: one that is taken, by a standard too, is refused", async () => {
    await add(newLimitLine("Trunk"));
    expect((await add(newLimitLine("Trunk"))).status).toBe(409);
    expect((await add(newLimitLine(" Trunk "))).status).toBe(409);
    expect((await add(newLimitLine("Category 5e cable, insertion loss"))).status).toBe(409);
  });

  test("of a standard are not the team's to take away", async () => {
    expect((await remove("cat6Cable")).status).toBe(409);
    expect((await read("?quantity=insertionLoss&of=cable")).some(({ id }) => id === "cat6Cable")).toBe(true);
  });
});

const piece = (fromHz: number, toHz: number, k: object = { k0: 10 }) => ({ fromHz, toHz, ...k });
const formula = (...pieces: object[]) => ({ curve: { form: "formula", referenceHz: 1e6, pieces } });
const points = (...list: [number, number][]) => ({
  curve: { form: "points", points: list.map(([frequencyHz, value]) => ({ frequencyHz, value })) },
});

describe("A line that cannot be is refused, with a sentence where it is wrong:", () => {
  test.each<[string, object, string[]]>([
    ["no name", { name: "  " }, ["name"]],
    ["no edition", { source: { title: "House", edition: "" } }, ["source.edition"]],
    ["an unknown quantity", { quantity: "colour" }, ["quantity"]],
    ["no length", { perLengthM: 0 }, ["perLengthM"]],
    ["no pieces", formula(), ["curve.pieces"]],
    ["a range that ends below where it begins", formula(piece(2e6, 1e6)), ["curve.pieces.0.toHz"]],
    ["ranges over each other", formula(piece(1e6, 5e6), piece(4e6, 9e6)), ["curve.pieces.1.fromHz"]],
    ["a piece of nothing", formula(piece(1e6, 5e6), piece(5e6, 9e6, {})), ["curve.pieces.1"]],
    ["a limit that falls below 0", formula(piece(1e6, 100e6, { k0: 5, k1: -1 })), ["curve.pieces.0"]],
    ["a limit beyond sense", formula(piece(1e6, 1e11, { k2: 1 })), ["curve.pieces.0"]],
    ["one point", points([1e6, 5]), ["curve.points"]],
    ["points out of order", points([2e6, 5], [1e6, 5]), ["curve.points.1.frequencyHz"]],
    ["a point of no limit", points([1e6, 0], [2e6, 5]), ["curve.points.0.value"]],
    ["a return loss per length", { quantity: "returnLoss" }, ["perLengthM"]],
    ["a loop resistance over frequency", { quantity: "dcLoop", perLengthM: undefined }, ["curve.form"]],
    ["a delay of minutes", { quantity: "delay", curve: { form: "constant", value: 60 } }, ["curve"]],
    ["a curve of no form", { curve: { form: "spline" } }, ["curve.form"]],
    ["more than there is", { isStandard: true }, ["isStandard"]],
  ])("%s", async (_, change, paths) => {
    const answer = await add({ ...newLimitLine("Wrong"), ...change });
    expect(answer.status).toBe(422);
    expect(await pathsOf(answer)).toEqual(paths);
  });

  test("never by a fault of ours, whatever numbers it is made of", () => {
    const number = fc.oneof(fc.double(), fc.constantFrom(0, -1, 1e-300, 1e-320, 1e300, 1e6, 1e12, null, "1"));
    const pieces = fc.array(fc.record({ fromHz: number, toHz: number, k0: number, k3: number, kLog: number }), {
      maxLength: 3,
    });
    const curve = fc.oneof(
      fc.record({ form: fc.constant("formula"), referenceHz: number, pieces }),
      fc.record({ form: fc.constant("points"), points: fc.array(fc.record({ frequencyHz: number, value: number })) }),
      fc.record({ form: fc.constant("constant"), value: number }),
    );
    const quantity = fc.constantFrom("insertionLoss", "returnLoss", "delay", "skew", "dcLoop", "x");
    fc.assert(
      fc.property(curve, number, quantity, (given, perLengthM, of) => {
        const read = newLimitLineSchema.safeParse({ ...newLimitLine("Any"), curve: given, perLengthM, quantity: of });
        const at = read.success ? (limitRange(read.data.curve)?.[0] ?? 1) : 1;
        if (read.success) expect(limitOver(read.data, [at], 100)[0]).toBeGreaterThan(0);
      }),
      { numRuns: 2000 },
    );
  });

  test("and a sound one of every form is taken", async () => {
    const changes = [
      formula(piece(1e6, 5e6), piece(5e6, 9e6)),
      points([1e6, 5], [2e6, 6]),
      { curve: { form: "constant", value: 3 } },
    ];
    for (const [i, change] of changes.entries())
      expect((await add({ ...newLimitLine(`Sound ${i}`), ...change })).status).toBe(201);
  });
});

test("A team holds no more lines than a list can show", async () => {
  for (let i = 0; i < 200; i++) expect((await add(newLimitLine(`Line ${i}`))).status).toBe(201);
  const answer = await add(newLimitLine("One more"));
  expect((await jsonOf<{ detail: string }>(answer, 409)).detail).toMatch(/at most 200/);
});
