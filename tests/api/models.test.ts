/** `/compute/geometry`, `/fit`, `/readings` and `/extract`: from what people know to a model. */
import { describe, expect, test } from "vitest";
import { POST as extract } from "@/app/api/v1/compute/extract/route";
import { POST as fit } from "@/app/api/v1/compute/fit/route";
import { POST as geometry } from "@/app/api/v1/compute/geometry/route";
import { POST as readings } from "@/app/api/v1/compute/readings/route";
import { POST as readLine } from "@/app/api/v1/compute/line/route";
import { extractAnswerSchema } from "@/lib/compute/extract/schema";
import { fitAnswerSchema } from "@/lib/compute/fit/schema";
import { geometryAnswerSchema } from "@/lib/compute/geometry/schema";
import { readingsAnswerSchema } from "@/lib/compute/readings/schema";
import type { Handler } from "@/lib/http/handle";
import { modelFromNominal, prepareLine } from "@/lib/line/cable";
import { lineSection } from "@/lib/line/section";
import { scattering } from "@/lib/line/two-port";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople } from "@/tests/support/people";
import { jsonOf, send } from "@/tests/support/requests";

withDatabase(addPeople);
const post = (handler: Handler, body: unknown) => send(handler, "POST", { as: actor("designer"), body });

async function pathsOf(handler: Handler, body: unknown): Promise<string[]> {
  const { errors } = await jsonOf<{ errors: { path: string }[] }>(await post(handler, body), 422);
  return errors.map(({ path }) => path).sort();
}

const coax = { kind: "coax", innerMm: 0.9, dielectricMm: 2.95, relativePermittivity: 2.25, lossTangent: 4e-4 };
const pair = { kind: "pair", wireMm: 0.511, spacingMm: 0.92, effectivePermittivity: 1.9, lossTangent: 1e-3 };

describe("Geometry", () => {
  test("answers a coaxial line whose model the other routes take, and says which shield it took", async () => {
    const answer = geometryAnswerSchema.parse(
      await jsonOf(await post(geometry, { construction: coax, frequencyHz: 1e8 })),
    );
    expect(answer.z0Ohm).toBeCloseTo(47.4538, 4);
    expect(answer.cutoffHz! / 33.048e9).toBeCloseTo(1, 4);
    expect(answer.highFrequencyROhmPerM).toBeCloseTo(1.204224, 6);
    expect(answer.model.conductors.map(({ form }) => form)).toEqual(["round", "sheet"]);
    expect(answer.notes).toEqual([expect.stringContaining("0.15 mm")]);
    const line = await jsonOf<{ rOhmPerM: number[] }>(
      await post(readLine, { line: { model: answer.model }, frequenciesHz: [1e8] }),
    );
    expect(line.rOhmPerM[0]).toBe(answer.rOhmPerM);
  });

  test("answers a pair without a cut-off, and no resistance at a frequency that was not asked for", async () => {
    const answer = geometryAnswerSchema.parse(await jsonOf(await post(geometry, { construction: pair })));
    expect(answer.cutoffHz).toBeNull();
    expect(answer.r0OhmPerM).toBeCloseTo(0.168136, 6);
    expect(answer).not.toHaveProperty("rOhmPerM");
  });

  test.each<[string, object, string[]]>([
    ["a bore inside the conductor", { ...coax, dielectricMm: 0.9 }, ["construction.dielectricMm"]],
    [
      "an insulation emptier than nothing",
      { ...coax, relativePermittivity: 0.9 },
      ["construction.relativePermittivity"],
    ],
    [
      "wires that touch, with too little permittivity",
      { ...pair, spacingMm: 0.5, effectivePermittivity: 0.5 },
      ["construction.effectivePermittivity", "construction.spacingMm"],
    ],
    ["a screen that is too small", { ...pair, screen: { innerMm: 1.4 } }, ["construction.screen.innerMm"]],
    ["no diameter", { ...coax, innerMm: 0 }, ["construction.innerMm"]],
  ])("refuses %s at its path", async (_, construction, paths) => {
    expect(await pathsOf(geometry, { construction })).toEqual(paths);
  });
});

const table = [5, 10, 50, 100, 200, 450, 900, 1500, 3000].map((f, n) => ({
  frequencyHz: f * 1e6,
  lossDbPerM: [1.37, 1.94, 4.4, 6.28, 8.98, 11.92, 19.85, 26.18, 38.48][n]! / 100,
}));
const sheet = { z0Ohm: 75, velocityFactor: 0.83, r0OhmPerM: 0.03005, points: table };

describe("Fit", () => {
  test("names the row of a data sheet that does not go with the others, and what it should be", async () => {
    const answer = fitAnswerSchema.parse(await jsonOf(await post(fit, sheet)));
    expect(answer.residuals[5]!.errorPercent).toBeCloseTo(-12.8, 1);
    expect(answer.residuals[5]!.leftOutErrorPercent).toBeCloseTo(-14.97, 1);
    expect(answer.warnings).toHaveLength(1);
    expect(answer.warnings[0]).toMatch(/450.MHz.*11\.92 dB\/100 m.*13\.70 dB\/100 m/);
    expect(answer.model.conductors[0]!.form).toBe("sqrt");
    expect(answer.refit.rmsPercent).toBeGreaterThan(0);
  });

  test("holds k1 against smooth conductors of a construction", async () => {
    const construction = { ...coax, innerMm: 1.02, dielectricMm: 4.6, relativePermittivity: 1.45 };
    const points = table.toSpliced(5, 1);
    const answer = fitAnswerSchema.parse(await jsonOf(await post(fit, { ...sheet, points, construction })));
    expect(answer.k1OverSmooth).toBeCloseTo(1.06, 2);
    expect(answer.warnings).toEqual([]);
  });

  test.each<[string, object, string[]]>([
    ["one point", { points: table.slice(0, 1) }, ["points"]],
    [
      "a loss of nothing and a weight below it",
      { points: [table[0], { frequencyHz: 1e9, lossDbPerM: 0, weight: -1 }] },
      ["points.1.lossDbPerM", "points.1.weight"],
    ],
    ["too many points", { points: Array.from({ length: 1001 }, () => table[0]) }, ["points"]],
    ["no impedance and an unknown form", { z0Ohm: undefined, form: "square" }, ["form", "z0Ohm"]],
    ["a construction that is none", { construction: { ...coax, dielectricMm: 0.1 } }, ["construction.dielectricMm"]],
  ])("refuses %s at its path", async (_, off, paths) => {
    expect(await pathsOf(fit, { ...sheet, ...off })).toEqual(paths);
  });
});

describe("Readings", () => {
  const sample = { lengthM: 20, openCapacitanceF: 2.02e-9, oneWayDelayS: 1.011e-7 };

  test("answer the model and what a meter will read, at its own frequency first", async () => {
    const body = { ...sample, shortInductanceH: 6.2e-6, shortResistanceOhm: 0.9, meterHz: 2000 };
    const answer = readingsAnswerSchema.parse(await jsonOf(await post(readings, body)));
    expect(answer.z0Ohm).toBeCloseTo(50.05, 1);
    expect(answer.meterWillRead.map(({ frequencyHz }) => frequencyHz)).toEqual([2000, 1e3, 1e4, 1e5]);
    expect(answer.meterWillRead[0]!.shortInductanceH! / 6.2e-6).toBeCloseTo(1, 9);
    expect(answer.checks.map(({ reading, verdict }) => `${reading}: ${verdict}`)).toEqual([
      "shortInductanceH: fine",
      "velocityFactor: fine",
    ]);
  });

  test("take the round trip for the delay, and hold both against each other", async () => {
    const { oneWayDelayS, ...rest } = sample;
    const [once, twice] = await Promise.all(
      [sample, { ...rest, roundTripS: 2 * oneWayDelayS }].map(async (body) =>
        readingsAnswerSchema.parse(await jsonOf(await post(readings, body))),
      ),
    );
    expect(twice!.model).toEqual(once!.model);
    const both = readingsAnswerSchema.parse(await jsonOf(await post(readings, { ...sample, roundTripS: 2.2e-7 })));
    expect(both.checks[0]).toMatchObject({ reading: "oneWayDelayS", verdict: "contradiction" });
  });

  test.each<[string, object, string[]]>([
    ["a capacitance alone", { lengthM: 20, openCapacitanceF: 1e-9 }, ["oneWayDelayS", "shortInductanceH"]],
    ["k1 without a resistance", { ...sample, k1DbPerMRootHz: 1e-5 }, ["shortResistanceOhm"]],
    ["no length", { ...sample, lengthM: 0 }, ["lengthM"]],
  ])("refuse %s at its path", async (_, body, paths) => {
    expect(await pathsOf(readings, body)).toEqual(paths);
  });

  test("that no line has are refused in words", async () => {
    const { detail } = await jsonOf<{ detail: string }>(
      await post(readings, { ...sample, oneWayDelayS: undefined, shortInductanceH: 1, meterHz: 1e6 }),
      422,
    );
    expect(detail).toMatch(/no line reads like this/);
  });
});

describe("Extraction", () => {
  const model = modelFromNominal({
    z0: 75,
    velocityFactor: 0.8,
    conductors: [{ form: "sqrt", r0OhmPerM: 0.05, skinCornerRadPerS: 8e5 }],
    lossTangent: 5e-4,
  });
  const frequenciesHz = Array.from({ length: 400 }, (_, k) => 1e5 + k * 5e5);
  const swept = () => {
    const section = lineSection(prepareLine(model), 15);
    const all = frequenciesHz.map((f) => scattering(section({ re: 0, im: 2 * Math.PI * f }), 50));
    const of = (key: "s11" | "s21" | "s12" | "s22") => ({
      re: all.map((s) => s[key].re),
      im: all.map((s) => s[key].im),
    });
    return { referenceOhm: 50, frequenciesHz, s11: of("s11"), s21: of("s21"), s12: of("s12"), s22: of("s22") };
  };
  const ramp = { re: [0.1, 0.1, 0.1], im: [0, 0, 0] };
  const onePort = { referenceOhm: 50, frequenciesHz: [1e6, 2e6, 3e6], reflection: ramp };

  test("finds the line of a simulated sample again", async () => {
    const answer = extractAnswerSchema.parse(await jsonOf(await post(extract, { lengthM: 15, twoPort: swept() })));
    expect(answer.model.lInfHPerM / model.lInfHPerM).toBeCloseTo(1, 4);
    expect(answer.model.lossTangent! / 5e-4).toBeCloseTo(1, 2);
    expect(answer.residuals.rmsPercent!).toBeLessThan(0.01);
    expect(answer.warnings[0]).toMatch(/half wavelength/);
  });

  test.each<[string, object, string[]]>([
    ["no sweep", {}, ["twoPort"]],
    ["an open alone", { open: onePort }, ["short"]],
    [
      "both kinds at once",
      { open: onePort, twoPort: { ...onePort, reflection: undefined, s11: ramp, s21: ramp, s12: ramp, s22: ramp } },
      ["twoPort"],
    ],
    [
      "open and short of other frequencies and references",
      { open: onePort, short: { ...onePort, referenceOhm: 75, frequenciesHz: [1e6, 2e6, 4e6] } },
      ["short.frequenciesHz", "short.referenceOhm"],
    ],
    ["values too few", { open: { ...onePort, reflection: { re: [1], im: [1] } }, short: onePort }, ["open.reflection"]],
    [
      "frequencies that fall",
      { open: { ...onePort, frequenciesHz: [3e6, 2e6, 1e6] }, short: onePort },
      ["open.frequenciesHz", "short.frequenciesHz"],
    ],
  ])("refuses %s at its path", async (_, body, paths) => {
    expect(await pathsOf(extract, { lengthM: 10, ...body })).toEqual(paths);
  });

  test("refuses a sample that is nothing, in words", async () => {
    const through = { re: [1, 1, 1], im: [0, 0, 0] };
    const none = { re: [0, 0, 0], im: [0, 0, 0] };
    const twoPort = {
      referenceOhm: 50,
      frequenciesHz: [1e6, 2e6, 3e6],
      s11: none,
      s21: through,
      s12: through,
      s22: none,
    };
    const { detail } = await jsonOf<{ detail: string }>(await post(extract, { lengthM: 10, twoPort }), 422);
    expect(detail).toMatch(/too short/);
  });
});
