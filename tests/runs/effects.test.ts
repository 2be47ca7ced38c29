/** What another revision of a cable does to the runs that use it. */
import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { database } from "@/db/client";
import { runs } from "@/db/schema/runs";
import { DB_PER_NEPER } from "@/lib/line/constants";
import { propagation } from "@/lib/line/cable";
import { approve } from "@/lib/cables/approval/service";
import { beginRevision, changeDraft } from "@/lib/cables/revising/service";
import { getOpenRevision } from "@/lib/cables/revisions/service";
import { approveSchema } from "@/lib/cables/steps/schema";
import { submit } from "@/lib/cables/steps/service";
import { getAffected } from "@/lib/runs/affected/service";
import { analyseRun } from "@/lib/runs/analysis";
import { judgeable } from "@/lib/runs/effects/judge";
import type { CableUses } from "@/lib/runs/effects/schema";
import { computeUses } from "@/lib/runs/effects/service";
import type { NewRun, Target } from "@/lib/runs/schema";
import { createRun } from "@/lib/runs/service";
import { verdicts } from "@/lib/runs/targets";
import { addCable, coaxModel, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople } from "@/tests/support/people";

const [designer, librarian, admin] = [actor("designer"), actor("librarian"), actor("admin")];
withDatabase(addPeople);

const lossier = { ...coaxModel, lossTangent: 1e-3 };
const matched: NewRun["circuit"]["load"] = { kind: "constant", reOhm: 50, imOhm: 0 };

async function usesOf(id: string, revision?: number, as = librarian): Promise<CableUses> {
  return JSON.parse(new TextDecoder().decode(await computeUses(as, id, revision))) as CableUses;
}

/** Adds an approved entry with a lossier draft of it. */
function entry(id: string): void {
  addCable({ id });
  const draft = beginRevision(librarian, id, "Measured anew.");
  changeDraft(librarian, id, draft.version, { model: lossier });
}

function run(cableId: string, lengthM: number, targets: Target[], as = designer) {
  const { circuit, ...rest } = newRun(cableId, { targets, bandHz: null });
  return createRun(as, {
    ...rest,
    circuit: { ...circuit, load: matched, elements: [{ kind: "cable", line: { cableId }, lengthM }] },
  });
}

const matchedLoss = (model: typeof coaxModel, lengthM: number) =>
  propagation(model, { re: 0, im: 2 * Math.PI * 100e6 }).gamma.re * DB_PER_NEPER * lengthM;

test("Each target is told as it is and as it would be, the loss being that of the revision's own model", async () => {
  entry("feeder");
  const { id } = run("feeder", 100, [{ quantity: "loss", atMost: matchedLoss(coaxModel, 100) + 0.5 }]);
  const { items, total, revision } = await usesOf("feeder", 2);
  expect({ total, revision }).toEqual({ total: 1, revision: 2 });
  const [effect] = items[0]?.effects ?? [];
  expect(items[0]).toMatchObject({ runId: id, revisions: [1], changesState: true, isAffected: false });
  // The line is 50 Ω to within its internal inductance, so the transducer loss is the matched loss but for a thousandth.
  expect(effect?.now.value).toBeCloseTo(matchedLoss(coaxModel, 100), 2);
  expect(effect?.then.value).toBeCloseTo(matchedLoss(lossier, 100), 2);
  expect([effect?.now.isMet, effect?.then.isMet]).toEqual([true, false]);
  expect(effect?.changePercent).toBeCloseTo((100 * (effect!.then.value! - effect!.now.value!)) / effect!.now.value!, 9);
});

test("A run without a target on its loss is told its loss all the same, without a verdict", async () => {
  entry("plain");
  run("plain", 20, []);
  const { items } = await usesOf("plain", 2);
  expect(items[0]?.effects).toMatchObject([{ quantity: "loss", atMost: null, now: { isMet: null } }]);
});

test("Runs whose targets change state come first, then the largest change", async () => {
  entry("trunk");
  const short = run("trunk", 1, []);
  const long = run("trunk", 500, []);
  const broken = run("trunk", 2, [{ quantity: "loss", atMost: matchedLoss(coaxModel, 2) * 1.01 }]);
  const { items } = await usesOf("trunk", 2);
  expect(items[0]?.runId).toBe(broken.id);
  const sizes = items.slice(1).map(({ largestPercent }) => Math.abs(largestPercent ?? 0));
  expect(sizes).toEqual([...sizes].sort((a, b) => b - a));
  expect(items.map(({ runId }) => runId).sort()).toEqual([short.id, long.id, broken.id].sort());
});

test("What cannot be worked out is said, and never guessed", async () => {
  entry("odd");
  run("odd", 5, [
    { quantity: "overshoot", atMost: 0.1 },
    { quantity: "returnLoss", plane: { beforeElement: 0 }, atLeast: 14 },
  ]);
  const { items } = await usesOf("odd", 2);
  expect(items[0]?.effects.slice(0, 2)).toMatchObject([
    { now: { value: null, isMet: null }, why: expect.stringMatching(/not worked out/) },
    { then: { value: null, isMet: null }, why: expect.stringMatching(/inside the run/) },
  ]);
});

test("A run that the engine refuses stands in the list with the reason, and holds up no other", async () => {
  entry("refused");
  const { circuit, ...rest } = newRun("refused");
  createRun(designer, { ...rest, circuit: { ...circuit, source: { kind: "short" } } });
  run("refused", 5, []);
  const { items } = await usesOf("refused", 2);
  expect(items.map(({ why }) => why === null)).toEqual([true, false]);
  expect(items[1]?.why).toMatch(/cannot be worked out/);
});

test("A revision of one cable leaves the others of a run as they are", async () => {
  entry("one");
  addCable({ id: "two" });
  const { circuit, ...rest } = newRun("one");
  const elements = ["one", "two"].map((cableId) => ({ kind: "cable" as const, line: { cableId }, lengthM: 10 }));
  createRun(designer, { ...rest, bandHz: null, circuit: { ...circuit, load: matched, elements } });
  const { items } = await usesOf("one", 2);
  const { now, then } = items[0]!.effects[0]!;
  expect(then.value! - now.value!).toBeCloseTo(matchedLoss(lossier, 10) - matchedLoss(coaxModel, 10), 3);
});

test("Once a revision has been approved, issued runs on the one before are affected, and drafts are not", async () => {
  entry("lively");
  const draft = run("lively", 5, []);
  const issued = run("lively", 7, []);
  database().update(runs).set({ state: "issued" }).where(eq(runs.id, issued.id)).run();
  const sent = submit(librarian, "lively", getOpenRevision(librarian, "lively").version, { note: "" });
  approve(admin, "lively", sent.version, approveSchema.parse({}));
  const later = run("lively", 6, []);
  const affected = await getAffected(designer, issued.id);
  expect(affected).toMatchObject({ isAffected: true, cables: [{ cableId: "lively", uses: 1, current: 2 }] });
  const { now, then } = affected.effect!.effects[0]!;
  expect(then.value! / now.value!).toBeCloseTo(matchedLoss(lossier, 7) / matchedLoss(coaxModel, 7), 3);
  expect(await getAffected(designer, later.id)).toEqual({ isAffected: false, cables: [], effect: null });
  const { items } = await usesOf("lively");
  expect(
    Object.fromEntries(items.map(({ runId, isAffected, revisions }) => [runId, [isAffected, ...revisions]])),
  ).toEqual({ [draft.id]: [false, 1], [issued.id]: [true, 1], [later.id]: [false, 2] });
});

describe("Whose runs are told", () => {
  test("a designer's own, and everybody's to those who review", async () => {
    entry("shared");
    run("shared", 5, [], designer);
    run("shared", 6, [], librarian);
    // The draft is not the designer's to read; what is approved is.
    expect((await usesOf("shared", 1, designer)).total).toBe(1);
    expect((await usesOf("shared", 1, librarian)).total).toBe(2);
  });

  test("and none to somebody who may not read the revision asked", () => {
    expect(() => computeUses(designer, "shared", 2)).toThrow(expect.objectContaining({ code: "forbidden" }));
    expect(() => computeUses(librarian, "shared", 9)).toThrow(expect.objectContaining({ code: "not_found" }));
  });
});

test("What a run is judged by here is what its Line view shows, target by target", () => {
  const circuit = {
    source: { kind: "constant" as const, reOhm: 50, imOhm: 0 },
    elements: [{ kind: "cable" as const, line: { model: coaxModel }, lengthM: 37 }],
    load: { kind: "constant" as const, reOhm: 22, imOhm: -35 },
  };
  const conditions = { designHz: 100e6, bandHz: [90e6, 110e6] as const, availablePowerW: 10, temperatureC: 35 };
  const targets: Target[] = [
    ...(["loss", "returnLoss", "vswr", "voltage"] as const).map((quantity) => ({ quantity, atMost: 3 })),
    { quantity: "returnLoss", plane: { at: "load" }, atLeast: 3 },
    { quantity: "loss", bandHz: [95e6, 97e6], atMost: 3 },
  ];
  const here = verdicts(targets, judgeable(circuit, conditions));
  const there = verdicts(targets, analyseRun(circuit, conditions));
  here.forEach(({ value, isMet }, i) => {
    // The two sweeps sample the band at other points and refine the worst from there.
    expect(Math.abs(value! / there[i]!.value! - 1)).toBeLessThan(1e-6);
    expect(isMet).toBe(there[i]!.isMet);
  });
});
