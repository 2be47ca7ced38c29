import { expect, test } from "vitest";
import { POST as matches } from "@/app/api/v1/compute/matches/route";
import { POST as sweep } from "@/app/api/v1/compute/sweep/route";
import type { z } from "zod";
import { matchesAnswerSchema } from "@/lib/compute/matches/schema";
import { sweepAnswerSchema } from "@/lib/compute/schema";
import type { Handler } from "@/lib/http/handle";
import { addCable } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
  addCable({ id: "theirs", team: other });
});

const asked = (handler: Handler, body: unknown) => send(handler, "POST", { as: actor("auditor"), body });
const answer = async <S extends z.ZodType>(handler: Handler, body: unknown, schema: S): Promise<z.output<S>> =>
  schema.parse(await jsonOf(await asked(handler, body)));

const source = { kind: "constant", reOhm: 50, imOhm: 0 };
const line = { cableId: "feeder" };
const behind = [
  { kind: "joint", name: "J1 transmitter", lossDbAtOneGhz: 0.05 },
  { kind: "cable", name: "Main feeder", line, lengthM: 36 },
];
const job = {
  load: { kind: "constant", reOhm: 22, imOhm: -35 },
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [27e6, 27.4e6],
  returnLossDb: 18,
  feeder: line,
  lines: [line],
};

test("a match asked for before the run behind it shows the target when that run is swept, and says what each part loses", async () => {
  const { candidates } = await answer(matches, { ...job, place: { behind } }, matchesAnswerSchema);
  expect(candidates.length).toBeGreaterThan(8);
  for (const { elements, designReturnLossDb, worstTransducerLossDb, worstMatchLossDb, title, notes } of candidates) {
    const run = { source, elements: [...elements, ...behind], load: job.load };
    const figures = await answer(sweep, { circuit: run, frequenciesHz: [job.designHz] }, sweepAnswerSchema);
    if (designReturnLossDb === null) expect(figures.returnLossDb[0] ?? Infinity, title).toBeGreaterThan(150);
    expect(worstTransducerLossDb! - worstMatchLossDb!, title).toBeGreaterThan(0.5);
    expect(`${title} ${notes.join(" ")}`).toContain("J1 transmitter");
  }
});

test("no place, and nothing behind it, are both the match at the load", async () => {
  const atLoad = await answer(matches, job, matchesAnswerSchema);
  expect(await answer(matches, { ...job, place: { behind: [] } }, matchesAnswerSchema)).toEqual(atLoad);
  for (const { worstMatchLossDb, worstTransducerLossDb } of atLoad.candidates)
    expect(worstMatchLossDb).toBe(worstTransducerLossDb);
});

test("with a tolerance each candidate says what it keeps at its limits, without one it does not", async () => {
  const tolerance = { lengthM: 0.005, valuePercent: 5 };
  const { candidates } = await answer(matches, { ...job, tolerance }, matchesAnswerSchema);
  for (const { worstReturnLossAtLimitsDb, worstReturnLossDb } of candidates)
    expect(worstReturnLossAtLimitsDb!).toBeLessThanOrEqual(worstReturnLossDb!);
  const plain = await answer(matches, job, matchesAnswerSchema);
  for (const candidate of plain.candidates) expect(candidate).not.toHaveProperty("worstReturnLossAtLimitsDb");
});

test.each<[string, object, string]>([
  [
    "a cable of another team behind",
    { place: { behind: [behind[0], { ...behind[1], line: { cableId: "theirs" } }] } },
    "place.behind.1.line.cableId",
  ],
  ["a length below nothing behind", { place: { behind: [{ ...behind[1], lengthM: -1 }] } }, "place.behind.0.lengthM"],
  ["a place that is not one", { place: "load" }, "place"],
  ["a place without what stands behind it", { place: {} }, "place.behind"],
  ["more behind than a run may have", { place: { behind: Array(201).fill(behind[0]) } }, "place.behind"],
  ["a tolerance below nothing", { tolerance: { lengthM: -0.001 } }, "tolerance.lengthM"],
  ["a value that may vanish", { tolerance: { valuePercent: 100 } }, "tolerance.valuePercent"],
])("%s is refused at its path", async (_, fields, path) => {
  expect(await pathsOf(await asked(matches, { ...job, ...fields }))).toEqual([path]);
});
