import { describe, expect, test } from "vitest";
import type { z } from "zod";
import { POST as dc } from "@/app/api/v1/compute/dc/route";
import { POST as solve } from "@/app/api/v1/compute/solve/route";
import { POST as swap } from "@/app/api/v1/compute/swap/route";
import { POST as tolerance } from "@/app/api/v1/compute/tolerance/route";
import { dcAnswerSchema } from "@/lib/compute/dc/schema";
import { solveAnswerSchema } from "@/lib/compute/solve/schema";
import { swapAnswerSchema } from "@/lib/compute/swap/schema";
import { toleranceAnswerSchema } from "@/lib/compute/tolerance/schema";
import type { Handler } from "@/lib/http/handle";
import { modelFromNominal } from "@/lib/line/cable";
import { addCable, coaxModel } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
  addCable({ id: "thick", model: modelFromNominal({ z0: 50, velocityFactor: 0.85 }) });
  addCable({ id: "short-only", state: "restricted", condition: "Lengths up to 30 m." });
  addCable({ id: "slow", maxFrequencyHz: 1e6 });
  addCable({ id: "draft", state: "draft" });
  addCable({ id: "theirs", team: other });
});

const asked = (handler: Handler, body: unknown) => send(handler, "POST", { as: actor("designer"), body });
const answer = async <S extends z.ZodType>(handler: Handler, body: unknown, schema: S): Promise<z.output<S>> =>
  schema.parse(await jsonOf(await asked(handler, body)));

const source = { kind: "constant", reOhm: 50, imOhm: 0 };
const feeder = (lengthM: number) => ({ kind: "cable", line: { cableId: "feeder" }, lengthM });
const circuit = (elements: object[], load: object = source) => ({ source, elements, load });
const run = circuit([feeder(20)], { kind: "constant", reOhm: 75, imOhm: 0 });
const frequenciesHz = [1e7, 1.45e8];
const length = { path: "elements.0.lengthM", limits: [19, 21] };

describe("/compute/tolerance", () => {
  const body = { circuit: run, frequenciesHz, spread: [length], draws: 200, seed: 4 };

  test("answers shares of the draws, corners, yield and contributors", async () => {
    const targets = [
      { quantity: "loss", atMost: 100 },
      { quantity: "returnLoss", atLeast: 100 },
    ];
    const found = await answer(tolerance, { ...body, corners: true, targets }, toleranceAnswerSchema);
    expect(found.frequenciesHz).toEqual(frequenciesHz);
    expect(found.transducerLossDb.min[1]).toBeLessThan(found.transducerLossDb.max[1] ?? NaN);
    expect(found.corners?.transducerLossDb.max[1]).toBeGreaterThan(found.transducerLossDb.max[1] ?? NaN);
    expect([found.yieldPercent, ...found.targetPercents]).toEqual([0, 100, 0]);
    expect(found.contributors).toMatchObject([{ path: "elements.0.lengthM" }]);
    expect((await answer(tolerance, body, toleranceAnswerSchema)).yieldPercent).toBeNull();
  });

  test("the same seed answers the same, and a path reaches into a cable of the catalogue", async () => {
    const spread = [{ path: "elements.0.line.model.lossTangent", limits: [0, 0.01], distribution: "triangular" }];
    const first = await answer(tolerance, { ...body, spread }, toleranceAnswerSchema);
    expect(await answer(tolerance, { ...body, spread }, toleranceAnswerSchema)).toEqual(first);
    expect(first.contributors[0]?.effectDb).toBeGreaterThan(0);
  });

  test.each<[string, object, string[]]>([
    ["too many draws", { draws: 20_001 }, ["draws"]],
    ["no draw, and a seed of 1.5", { draws: 0, seed: 1.5 }, ["draws", "seed"]],
    ["limits the wrong way round", { spread: [{ ...length, limits: [2, 1] }] }, ["spread.0.limits"]],
    [
      "a path to nothing, and an impossible limit",
      {
        spread: [
          { path: "elements.4.lengthM", limits: [1, 2] },
          { ...length, limits: [-1, 2] },
        ],
      },
      ["spread.0.path", "spread.1.limits.0"],
    ],
    ["a path named twice", { spread: [length, length] }, ["spread.1.path"]],
    ["a distribution nobody knows", { spread: [{ ...length, distribution: "bimodal" }] }, ["spread.0.distribution"]],
    [
      "a load moved in two ways",
      {
        spread: [
          { path: "load.reOhm", limits: [70, 80] },
          { path: "load.reflectionPhase", limits: [0, 1] },
        ],
      },
      ["spread"],
    ],
    [
      "corners of 13 paths",
      { corners: true, spread: Array.from({ length: 13 }, (_, n) => ({ path: `elements.0.${n}`, limits: [0, 1] })) },
      ["corners"],
    ],
    [
      "a target that cannot be worked out",
      {
        targets: [
          { quantity: "loss", atMost: 3 },
          { quantity: "level", atLeast: 1 },
        ],
      },
      ["targets.1"],
    ],
    ["too much work", { draws: 20_000, frequenciesHz: Array.from({ length: 10_001 }, (_, k) => 1e6 + k) }, ["draws"]],
  ])("refuses %s at its path", async (_, change, paths) => {
    expect((await pathsOf(await asked(tolerance, { ...body, ...change }))).sort()).toEqual(paths);
  });

  test("a request as large as one may be answers within its half minute", async () => {
    const most = { ...body, draws: 20_000, frequenciesHz: Array.from({ length: 201 }, (_, k) => 1e8 + k * 1e5) };
    const found = await answer(tolerance, most, toleranceAnswerSchema);
    expect(found.returnLossDb.median).toHaveLength(201);
  });
});

describe("/compute/dc", () => {
  test("answers what a meter reads, and levels only with a supply", async () => {
    const body = {
      circuit: circuit([feeder(100), { kind: "shunt", termination: { kind: "open" } }]),
      temperatureC: 45,
    };
    const unpowered = await answer(dc, body, dcAnswerSchema);
    expect(unpowered.points.map(({ at, element }) => [at, element])).toEqual([
      ["end", undefined],
      ["tap", 1],
      ["end", undefined],
    ]);
    expect(unpowered.points[0]?.voltageV).toBeNull();
    const r0 = coaxModel.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0) * 100 * (1 + 0.00393 * 25);
    expect(unpowered.loopResistanceOhm).toBeCloseTo(r0, 9);
    expect(unpowered.points[0]?.ohmMeterReadsOhm).toBeCloseTo((50 * (50 + r0)) / (100 + r0), 9);
    const powered = await answer(dc, { ...body, supplyV: 5 }, dcAnswerSchema);
    expect(powered.points.at(-1)?.voltageV).toBeCloseTo((5 * 50) / (100 + r0), 9);
  });

  test("an open run reads nothing finite, and a measured end is refused where it stands", async () => {
    const open = {
      source: { kind: "network", topology: "series", cF: 1e-6 },
      elements: [feeder(1)],
      load: { kind: "open" },
    };
    expect((await answer(dc, { circuit: open }, dcAnswerSchema)).points[0]?.ohmMeterReadsOhm).toBeNull();
    const sampled = { kind: "sampled", referenceOhm: 50, frequenciesHz: [1e6], reflection: { re: [0], im: [0] } };
    expect(await pathsOf(await asked(dc, { circuit: circuit([feeder(1)], sampled) }))).toEqual(["circuit.load"]);
  });

  test("an ideal transformer passes direct current, and the answer says that a real one does not", async () => {
    const found = await answer(dc, { circuit: circuit([{ kind: "transformer", turnsRatio: 2 }]) }, dcAnswerSchema);
    expect(found.points[0]?.ohmMeterReadsOhm).toBeCloseTo(40, 12);
    expect(found.notes).toHaveLength(1);
  });
});

describe("/compute/swap", () => {
  const body = { circuit: run, paths: ["elements.0"], frequenciesHz, targets: [{ quantity: "loss", atMost: 0.5 }] };

  test("answers every approved cable, best first; restricted ones are refused with their condition", async () => {
    const { items, refused } = await answer(swap, body, swapAnswerSchema);
    expect(items.map(({ cableId }) => cableId)).toEqual(["thick", "feeder"]);
    expect(items.map(({ targetsMet }) => targetsMet)).toEqual([1, 0]);
    expect(items[0]?.margins[0]).toBeCloseTo(0.5 - (items[0]?.totalLossDb ?? NaN), 12);
    expect(refused).toEqual([
      expect.objectContaining({ cableId: "short-only", why: "Restricted: Lengths up to 30 m." }),
      expect.objectContaining({ cableId: "slow", why: "Stated up to 1000000 Hz only." }),
    ]);
  });

  test("refuses places where no cable stands, at their paths", async () => {
    const paths = ["elements.1", "elements.0", "elements.0", "load"];
    expect((await pathsOf(await asked(swap, { ...body, paths }))).sort()).toEqual(["paths.0", "paths.2", "paths.3"]);
    expect(await pathsOf(await asked(swap, { ...body, paths: [] }))).toEqual(["paths"]);
  });
});

describe("/compute/solve", () => {
  const matched = circuit([feeder(20)]);
  const body = {
    circuit: matched,
    frequenciesHz: [1.45e8],
    vary: { path: "elements.0.lengthM", between: [1, 1000] },
    targets: [
      { quantity: "returnLoss", atLeast: 10 },
      { quantity: "loss", atMost: 3 },
    ],
  };

  test("answers the longest length, and which target binds", async () => {
    const found = await answer(solve, body, solveAnswerSchema);
    expect(found.binds).toBe(1);
    expect(found.margins[1]).toBeCloseTo(0, 9);
    expect(found.value).toBeGreaterThan(1);
    expect(found.why).toContain("loss");
  });

  test("answers the fastest edge with a target on a question of time", async () => {
    const drive = { kind: "step", amplitudeV: 1, riseS: 1e-7 };
    const mismatched = circuit([feeder(20)], { kind: "constant", reOhm: 75, imOhm: 0 });
    const targets = [{ quantity: "settling", atMost: 1e-6 }];
    const vary = { path: "drive.riseS", between: [1e-8, 1e-5] };
    const found = await answer(solve, { ...body, circuit: mismatched, drive, targets, vary }, solveAnswerSchema);
    expect(found.value).toBeGreaterThan(9e-7);
    expect(found.binds).toBe(0);
  });

  test("says why there is no value", async () => {
    const found = await answer(
      solve,
      { ...body, targets: [{ quantity: "loss", atLeast: 3, atMost: 2 }] },
      solveAnswerSchema,
    );
    expect(found).toMatchObject({
      value: null,
      binds: null,
      margins: [],
      why: "The target on loss holds nowhere in the range.",
    });
  });

  test.each<[string, object, string[]]>([
    ["no target", { targets: [] }, ["targets"]],
    ["a path to nothing", { vary: { path: "elements.9.lengthM", between: [1, 2] } }, ["vary.path"]],
    [
      "a range of impossible lengths",
      { vary: { path: "elements.0.lengthM", between: [-2, -1] } },
      ["vary.between.0", "vary.between.1"],
    ],
    ["an edge of no time", { vary: { path: "drive.riseS", between: [0, 1] } }, ["vary.between.0"]],
    ["a range the wrong way round", { vary: { path: "elements.0.lengthM", between: [2, 1] } }, ["vary.between"]],
    ["a target on time without a step", { targets: [{ quantity: "overshoot", atMost: 0.1 }] }, ["targets.0"]],
    [
      "too much work",
      {
        circuit: circuit(Array.from({ length: 200 }, () => feeder(1))),
        frequenciesHz: Array.from({ length: 2000 }, (_, k) => 1e6 + k),
      },
      ["circuit.elements"],
    ],
  ])("refuses %s at its path", async (_, change, paths) => {
    expect((await pathsOf(await asked(solve, { ...body, ...change }))).sort()).toEqual(paths);
  });
});
