import { describe, expect, test } from "vitest";
import { POST as step } from "@/app/api/v1/compute/step/route";
import { stepAnswerSchema } from "@/lib/compute/step/schema";
import { addCable } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

const lossless = { conductors: [{ form: "constant", r0OhmPerM: 0 }], lInfHPerM: 250e-9, cFPerM: 100e-12 }; // 50 Ω, 5 ns/m

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
  addCable({ id: "theirs", team: other });
});

const ohm = (reOhm: number, imOhm = 0) => ({ kind: "constant", reOhm, imOhm });
const cable = (lengthM: number, ref: object = { model: lossless }) => ({ kind: "cable", line: ref, lengthM });
const tap = (lengthM: number, end: unknown = "open") => ({
  kind: "stub",
  connection: "shunt",
  end,
  line: { model: lossless },
  lengthM,
});
const circuit = (elements: object[], load: object = ohm(50), source: object = ohm(50)) => ({ source, elements, load });
const drive = { kind: "step", amplitudeV: 2, riseS: 5e-9 };
const plain = { circuit: circuit([cable(10)]), drive, windowS: 200e-9, points: 201 };

const asked = (body: unknown) => send(step, "POST", { as: actor("auditor"), body });
const answer = async (fields: object = {}) =>
  stepAnswerSchema.parse(await jsonOf(await asked({ ...plain, ...fields })));

test("a matched lossless cable delivers half the e.m.f. one delay later", async () => {
  const { timeS, sourceNodeV, loadNodeV, tapNodesV, readings, tapDips } = await answer();
  expect(timeS).toHaveLength(201);
  expect([timeS[0], timeS[200]]).toEqual([0, 200e-9]);
  expect(loadNodeV).toHaveLength(201);
  expect(tapNodesV).toEqual([]);
  expect(tapDips).toBeUndefined();
  expect(sourceNodeV[10]!).toBeCloseTo(1, 4);
  expect(loadNodeV[49]!).toBeCloseTo(0, 4);
  expect(loadNodeV[60]!).toBeCloseTo(1, 4);
  expect(readings.delayS!).toBeCloseTo(50e-9, 12);
  expect(readings.reachedS!).toBeCloseTo(52.5e-9, 12);
  expect(readings.settledV!).toBeCloseTo(2 / 2, 9);
  expect(Math.abs(readings.overshoot!)).toBeLessThan(1e-4);
});

test("fronts name their node, their jump and the way they came", async () => {
  const { fronts, omitted } = await answer({ circuit: circuit([cable(10)], ohm(150), ohm(0)), windowS: 160e-9 });
  expect(fronts.map(({ node, passed }) => [node, passed])).toEqual([
    ["source", 0],
    ["load", 1],
    ["load", 3],
  ]);
  expect(fronts.map(({ amplitudeV }) => amplitudeV)).toEqual([2, 3, -1.5].map((v) => expect.closeTo(v, 9)));
  expect(fronts[2]!.path).toEqual(["source", "load", "source", "load"]);
  expect(fronts[2]!.timeS).toBeCloseTo(150e-9, 15);
  expect(omitted).toBe(0);
});

test("every shunt stub is a tap with a signal, readings and, if asked, a dip", async () => {
  const bus = circuit([cable(5), tap(4), cable(5), tap(0.1), cable(5)]);
  const { tapNodesV, tapReadings, tapDips, fronts } = await answer({ circuit: bus, tapDips: true });
  expect(tapNodesV.map((each) => each.length)).toEqual([201, 201]);
  expect(tapReadings).toHaveLength(2);
  expect(new Set(fronts.map(({ node }) => node))).toEqual(new Set(["source", "load", "taps.0", "taps.1"]));
  expect(tapDips!.map(({ element }) => element)).toEqual([1, 3]);
  expect(tapDips![0]!.dip!).toBeCloseTo(1 / 3, 2);
});

test("a cable of the catalogue and the same temperature as elsewhere are used", async () => {
  const cold = await answer({
    circuit: circuit([cable(100, { cableId: "feeder" })]),
    windowS: 2e-6,
    temperatureC: -20,
  });
  const hot = await answer({ circuit: circuit([cable(100, { cableId: "feeder" })]), windowS: 2e-6, temperatureC: 60 });
  expect(hot.readings.settledV!).toBeLessThan(cold.readings.settledV!);
});

test("delay runs to any fraction or voltage, and settling into any band", async () => {
  const lossy = { circuit: circuit([cable(100, { cableId: "feeder" })]), windowS: 4e-6 };
  const half = await answer(lossy);
  const late = await answer({ ...lossy, delayFraction: 0.9 });
  const volts = await answer({ ...lossy, thresholdV: 0.5 * half.readings.settledV! });
  const strict = await answer({ ...lossy, settlingBand: 0.01 });
  expect(late.readings.delayS!).toBeGreaterThan(half.readings.delayS!);
  expect(volts.readings.delayS!).toBeCloseTo(half.readings.delayS!, 12);
  expect(strict.readings.settlingS!).toBeGreaterThan(half.readings.settlingS!);
});

test("bits go up and down, and the last one stays", async () => {
  const bits = { kind: "bits", amplitudeV: 2, riseS: 5e-9, edge: "raisedCosine", bits: "0110", bitS: 30e-9 };
  const { sourceNodeV, readings } = await answer({ drive: bits });
  expect([20, 50, 80, 110, 190].map((k) => sourceNodeV[k])).toEqual([0, 1, 1, 0, 0].map((v) => expect.closeTo(v, 3)));
  expect(readings.settledV).toBe(0);
  expect(readings.delayS!).toBeCloseTo(50e-9, 12);
});

test("what does not happen within the window is null", async () => {
  const { readings } = await answer({ windowS: 40e-9 });
  expect([readings.delayS, readings.riseS, readings.settlingS]).toEqual([null, null, null]);
  const shorted = await answer({ circuit: circuit([cable(10)], { kind: "short" }) });
  expect([shorted.readings.delayS, shorted.readings.overshoot]).toEqual([null, null]);
  expect(shorted.readings.settledV).toBe(0);
});

describe("refusals", () => {
  const sampled = { kind: "sampled", referenceOhm: 50, frequenciesHz: [1e6], reflection: { re: [0], im: [0] } };
  const coil = { kind: "part", connection: "series", lH: 1e-6, q: 50 };
  test.each<[string, object, string[]]>([
    ["a load with a reactance", { circuit: circuit([cable(1)], ohm(50, 10)) }, ["circuit.load.imOhm"]],
    ["a source with a reactance", { circuit: circuit([], ohm(50), ohm(50, 1)) }, ["circuit.source.imOhm"]],
    ["a measured load", { circuit: circuit([cable(1)], sampled) }, ["circuit.load"]],
    ["a measured tap", { circuit: circuit([tap(1, sampled)]) }, ["circuit.elements.0.end"]],
    [
      "a measured branch, and a coil of the same Q everywhere, both at once",
      { circuit: circuit([{ kind: "shunt", termination: sampled }, coil]) },
      ["circuit.elements.0.termination", "circuit.elements.1.q"],
    ],
    ["a window of too many edges", { windowS: 2049 * 5e-9 }, ["windowS"]],
    ["a window that shows nothing of the edge", { windowS: 1e-15 }, ["windowS"]],
    ["too many points", { points: 65_537 }, ["points"]],
    ["one point", { points: 1 }, ["points"]],
    ["an edge of no time", { drive: { ...drive, riseS: 0 } }, ["drive.riseS"]],
    ["a pulse of no width", { drive: { ...drive, kind: "pulse", widthS: 0 } }, ["drive.widthS"]],
    ["bits that are none", { drive: { ...drive, kind: "bits", bits: "012", bitS: 1e-8 } }, ["drive.bits"]],
    ["no bits", { drive: { ...drive, kind: "bits", bits: "", bitS: 1e-8 } }, ["drive.bits"]],
    ["too many bits", { drive: { ...drive, kind: "bits", bits: "0".repeat(1025), bitS: 1e-8 } }, ["drive.bits"]],
    ["another edge", { drive: { ...drive, edge: "square" } }, ["drive.edge"]],
    ["another drive", { drive: { ...drive, kind: "ramp" } }, ["drive.kind"]],
    ["a fraction of 1", { delayFraction: 1 }, ["delayFraction"]],
    ["a band of 0", { settlingBand: 0 }, ["settlingBand"]],
    [
      "a cable of another team",
      { circuit: circuit([cable(1, { cableId: "theirs" })]) },
      ["circuit.elements.0.line.cableId"],
    ],
    [
      "many places at many points",
      { circuit: circuit(Array.from({ length: 40 }, () => tap(1))), points: 65_536 },
      ["points"],
    ],
    [
      "a long window of many bundles",
      {
        circuit: circuit(
          Array.from({ length: 100 }, () => ({
            kind: "parallel",
            branches: [1, 2, 3].map((lengthM) => ({ line: { model: lossless }, lengthM })),
          })),
        ),
        windowS: 2048 * 5e-9,
      },
      ["circuit.elements"],
    ],
  ])("refuses %s at its path", async (_, fields, paths) => {
    const answered = await asked({ ...plain, ...fields });
    expect(answered.status).toBe(422);
    expect((await pathsOf(answered)).sort()).toEqual(paths);
  });

  test("a window that is too long is told the shortest edge that fits", async () => {
    const answered = await asked({ ...plain, windowS: 2048e-6 });
    const { errors } = await jsonOf<{ errors: { message: string }[] }>(answered, 422);
    expect(errors[0]!.message).toContain(`${2048e-6 / 2048} s`);
  });

  test("a joint whose impedance nothing tells is refused", async () => {
    const joint = { kind: "joint", lossDb: 1 };
    const answered = await asked({ ...plain, circuit: circuit([joint], ohm(50), { kind: "short" }) });
    expect(answered.status).toBe(422);
  });
});

test("the longest window and the most points are answered", async () => {
  const { loadNodeV } = await answer({ windowS: 2048 * 5e-9, points: 65_536 });
  expect(loadNodeV).toHaveLength(65_536);
  expect(loadNodeV.at(-1)!).toBeCloseTo(1, 4);
});
