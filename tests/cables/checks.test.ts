import { describe, expect, test } from "vitest";
import { type Check, type Checked, checksOf } from "@/lib/cables/checks";
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Build, Construction } from "@/lib/cables/schema";
import { lossTangentOf } from "@/lib/line/closed-mapping";
import catalogue from "@/seeds/data/cables.json";
import { modelOf } from "@/seeds/cables";
import { figuresOf } from "@/seeds/figures";
import table from "@/tests/fixtures/cables/impedance-from-velocity-and-capacitance.json";
import { claimed, corrected, entryFrom, foamBuild, foamConstruction, rowsOf } from "@/tests/support/data-sheet";

const named = (checks: Check[], name: string) => checks.find(({ check }) => check === name);
const check = (name: string, entry: Checked) => named(checksOf(entry), name);
const nominal = (change: EntryInputs["nominal"]): EntryInputs => ({ nominal: { ...corrected.nominal, ...change } });
const bare = { construction: null, build: null } as const;

const pair: Construction = {
  ...{ kind: "pair", wireMm: 0.64, spacingMm: 1.655, effectivePermittivity: 1.6437, lossTangent: 6e-4 },
};
const pairBuild: Build = { ...foamBuild, conductor: "0.64 mm solid copper", dielectricName: "foam-skin PE" };
const pairEntry = (change: EntryInputs["nominal"]) =>
  entryFrom(
    { nominal: { z0Ohm: 150, velocityFactor: 0.78, loopResistanceOhmPerM: 0.10718, ...change } },
    { family: "twistedPair", construction: pair, build: pairBuild },
  );

describe("A data sheet whose capacitance belongs to the solid version and whose table has a slip", () => {
  const checks = checksOf(entryFrom(claimed));

  test("is a contradiction of 25 %, and the capacitance is named", () => {
    const triangle = named(checks, "triangle")!;
    expect(triangle).toMatchObject({ verdict: "contradiction", culprit: "the capacitance" });
    expect(triangle.percent).toBeCloseTo(25.0, 0);
    expect(triangle.sentence).toMatch(/0\.664, that of solid polyethylene/);
    expect(triangle.sentence).toMatch(/67\.0 pF\/m is stated, the rest say 53\.6 pF\/m/);
  });

  test("the row at 450 MHz is named by the other eight, which say 13.70 dB/100 m", () => {
    const row = named(checks, "lossRow")!;
    expect(row).toMatchObject({ verdict: "contradiction", culprit: "the row at 450\u00a0MHz" });
    const predicted = Number(/say, ([\d.]+) dB/.exec(row.sentence)?.[1]);
    // By the model rather than by k1·√f + k2·f, which says 13.70; the true row is 13.72.
    expect(Math.abs(predicted / 13.7 - 1)).toBeLessThan(0.005);
  });

  test("and all of it agrees once both are corrected", () => {
    const after = checksOf(entryFrom(corrected));
    expect(after.filter(({ verdict }) => verdict !== "fine")).toEqual([]);
    expect(after.map((each) => each.check)).toEqual(
      expect.arrayContaining([
        ...["triangle", "construction", "conductorResistance", "loopResistance", "velocity", "lossRises", "lossRow"],
        ...["dcFloor", "smoothCopper", "lossTangent", "model", "lossTable"],
      ]),
    );
    expect(named(after, "smoothCopper")?.sentence).toMatch(/1\.0\d times what smooth copper/);
  });
});

describe("Every entry of the demo is without contradiction", () => {
  const entries = catalogue.cables.map((cable) => ({
    ...cable,
    model: modelOf(cable.figures as never),
    figures: figuresOf(cable.figures as never, cable.family as never, cable.build.dielectric as never),
  })) as unknown as (Checked & { id: string })[];
  test.each(entries.map((entry) => [entry.id, entry] as const))("%s", (_, entry) => {
    expect(checksOf(entry).filter(({ verdict }) => verdict !== "fine")).toEqual([]);
  });
});

describe("Impedance, velocity and capacitance", () => {
  const stated = (z0Ohm: number, velocityFactor: number, cFPerM: number, change: Partial<Checked> = bare) =>
    check("triangle", entryFrom({ nominal: { z0Ohm, velocityFactor, cFPerM } }, change))!;

  test.each(table.rows)("of $type, published, give the impedance that is printed and agree with it", (row) => {
    const cFPerM = (row.pfPerFoot * 1e-12) / 0.3048;
    const implied = 1 / (299_792_458 * row.velocityFactor * cFPerM);
    expect(Math.abs(implied - row.z0Ohm)).toBeLessThanOrEqual(0.051);
    expect(stated(row.z0Ohm, row.velocityFactor, cFPerM).verdict).toBe("fine");
  });

  test("are fine to 3 %, to be looked at to 6 %, beyond that a contradiction", () => {
    const exact = 1 / (50 * 299_792_458 * 0.66);
    expect(stated(50, 0.66, exact * 1.029).verdict).toBe("fine");
    expect(stated(50, 0.66, exact * 1.031).verdict).toBe("look");
    expect(stated(50, 0.66, exact * 0.941).verdict).toBe("look");
    expect(stated(50, 0.66, exact * 0.939).verdict).toBe("contradiction");
  });

  test("name the one that construction and the rest speak against, whichever it is", () => {
    expect(stated(75, 0.83, 67e-12, {}).culprit).toBe("the capacitance");
    expect(stated(75, 0.66, 53.6e-12, {}).culprit).toBe("the velocity factor");
    expect(stated(50, 0.83, 53.6e-12, {}).culprit).toBe("the impedance");
  });

  test("without a construction the insulation and usual impedances bear witness; without those none is named", () => {
    expect(stated(75, 0.83, 67e-12, { construction: null }).culprit).toBe("the capacitance");
    const alone = stated(75, 0.83, 67e-12, bare);
    expect(alone.culprit === undefined || alone.culprit === "the capacitance").toBe(true);
    const unusual = stated(68, 0.83, 67e-12, bare);
    expect(unusual.culprit).toBeUndefined();
    expect(unusual.sentence).toMatch(/they do not tell alone/);
  });
});

describe("Inductance", () => {
  const stated = (lInfHPerM: number) =>
    check("inductance", entryFrom({ nominal: { ...corrected.nominal, lInfHPerM } }))!;
  test("agrees with impedance and velocity, or is named", () => {
    expect(stated(301e-9).verdict).toBe("fine");
    expect(stated(340e-9)).toMatchObject({ verdict: "contradiction", culprit: "the inductance" });
  });
});

describe("What the construction says", () => {
  const construction = (change: object) =>
    check("construction", entryFrom(corrected, { construction: { ...foamConstruction, ...change } as Construction }))!;
  test("agrees, or the diameter or the permittivity is named", () => {
    expect(construction({}).verdict).toBe("fine");
    expect(construction({ innerMm: 1.2 })).toMatchObject({ verdict: "contradiction" });
    expect(construction({ innerMm: 1.2 }).culprit).toBe("a diameter of the construction");
    expect(construction({ relativePermittivity: 2.3 }).verdict).toBe("contradiction");
    expect(construction({ innerMm: 5 }).sentence).toMatch(/cannot be/);
  });

  test("of the conductor's resistance agrees; four times as much is not copper, and says so", () => {
    const core = (conductorResistanceOhmPerM: number, build = foamBuild) =>
      check("conductorResistance", entryFrom(nominal({ conductorResistanceOhmPerM }), { build }));
    expect(core(0.0211)?.verdict).toBe("fine");
    expect(core(0.0211 * 4.7)).toMatchObject({
      verdict: "contradiction",
      culprit: "the resistance of the inner conductor",
    });
    expect(core(0.0211 * 4.7)?.sentence).toMatch(/clad steel/);
    expect(core(0.0211 * 4.7, { ...foamBuild, conductor: "copper-clad steel" })).toBeUndefined();
    // Seven strands of 0.14 mm² in 0.50 mm: 71 % of a solid wire's copper.
    const strands = { ...foamBuild, conductor: "7-strand copper, 0.50 mm equivalent, 0.14 mm²", isStranded: true };
    const thin = { ...foamConstruction, innerMm: 0.5 } as Construction;
    const entry = entryFrom(nominal({ conductorResistanceOhmPerM: 0.1231 }), { build: strands, construction: thin });
    expect(check("conductorResistance", entry)?.verdict).toBe("fine");
  });
});

describe("Loop against one conductor", () => {
  test("of a pair is twice a wire; once is one core's, four times counts twice", () => {
    const loop = (conductorResistanceOhmPerM: number) =>
      check("loopResistance", pairEntry({ conductorResistanceOhmPerM }));
    expect(loop(0.0536)?.verdict).toBe("fine");
    expect(loop(0.1072)).toMatchObject({ verdict: "contradiction", culprit: "the loop resistance" });
    expect(loop(0.1072)?.sentence).toMatch(/resistance of one core/);
    expect(loop(0.0268)?.sentence).toMatch(/counts the pair twice/);
  });

  test("the construction tells it too, where one wire's is not given", () => {
    expect(check("loopResistance", pairEntry({}))).toBeUndefined();
    expect(check("loopResistance", pairEntry({ loopResistanceOhmPerM: 0.0536 }))?.sentence).toMatch(/one core/);
  });

  test("of a coaxial cable is more than the inner conductor alone", () => {
    const loop = (loopResistanceOhmPerM: number) =>
      check("loopResistance", entryFrom(nominal({ loopResistanceOhmPerM })));
    expect(loop(0.0301)?.verdict).toBe("fine");
    expect(loop(0.0205)).toMatchObject({ verdict: "contradiction", culprit: "the loop resistance" });
  });
});

describe("Slips of velocity", () => {
  const velocity = (velocityFactor: number, change: Partial<Checked> = {}) =>
    check("velocity", entryFrom({ nominal: { z0Ohm: 75, velocityFactor } }, change))!;
  test("a velocity that fits its insulation is fine", () => {
    expect(velocity(0.83)).toMatchObject({ verdict: "fine" });
    expect(velocity(0.83).sentence).toMatch(/fits foamed polyethylene \(0\.76 to 0\.90\)/);
  });
  test("1/VF is told, with what it would be", () => {
    expect(velocity(1.19, bare)).toMatchObject({ verdict: "contradiction", culprit: "the velocity factor" });
    expect(velocity(1.19, bare).sentence).toMatch(/likely 1\/VF, and the velocity factor 0\.840/);
  });
  test("v/2 is told by the construction, by impedance and capacitance, or by the insulation", () => {
    for (const change of [{}, { construction: null }])
      expect(velocity(0.415, change)).toMatchObject({ verdict: "contradiction", culprit: "the velocity factor" });
    expect(velocity(0.415).sentence).toMatch(/likely v\/2/);
    const byC = entryFrom({ nominal: { z0Ohm: 75, velocityFactor: 0.415, cFPerM: 53.6e-12 } }, bare);
    expect(check("velocity", byC)?.sentence).toMatch(/likely v\/2/);
  });
  test("one that goes with another insulation is to be looked at", () => {
    expect(velocity(0.66, { construction: null })).toMatchObject({ verdict: "look" });
    expect(velocity(0.66, { construction: null }).sentence).toMatch(/would fit solid polyethylene/);
  });
});

describe("A loss table", () => {
  const rows = corrected.lossTable!.rows;
  const withRows = (lossRows: typeof rows, change: Partial<Checked> = {}) =>
    entryFrom({ ...corrected, lossTable: { ...corrected.lossTable!, rows: lossRows } }, change);
  const scaled = (by: number) => rows.map((row) => ({ ...row, lossDbPerM: row.lossDbPerM * by }));

  test("in dB/100 ft read as dB/100 m is told by smooth copper, and the other way round", () => {
    expect(check("lossUnit", withRows(rows))).toBeUndefined();
    const feet = check("lossUnit", withRows(scaled(0.3048)))!;
    expect(feet).toMatchObject({ verdict: "contradiction", culprit: "the unit of the loss table" });
    expect(feet.sentence).toMatch(/dB\/100 ft and was read as dB\/100 m/);
    expect(check("lossUnit", withRows(scaled(1 / 0.3048)))?.sentence).toMatch(/dB\/100 m and was read as dB\/100 ft/);
  });

  test("below the dc floor is a contradiction that names the row", () => {
    expect(check("dcFloor", withRows(rows))?.verdict).toBe("fine");
    const low = check("dcFloor", withRows([{ frequencyHz: 1e6, lossDbPerM: 0.0012 }, ...rows]))!;
    expect(low.verdict).toBe("contradiction");
    expect(low.culprit).toMatch(/the row at 1\u00a0MHz/);
  });

  test("less than smooth copper is impossible; twice as much is to be looked at", () => {
    expect(check("smoothCopper", withRows(rows))?.verdict).toBe("fine");
    expect(check("smoothCopper", withRows(scaled(0.8)))?.verdict).toBe("contradiction");
    expect(check("smoothCopper", withRows(scaled(0.88)))?.verdict).toBe("look");
    expect(check("smoothCopper", withRows(scaled(2.1)))?.verdict).toBe("look");
  });

  test("that rises too fast does not go with its insulation", () => {
    expect(check("lossTangent", withRows(rows))?.verdict).toBe("fine");
    const k2 = (tangent: number) => tangent / lossTangentOf(0.83, 1);
    const wet = (tangent: number) =>
      withRows(rows.map((row) => ({ ...row, lossDbPerM: row.lossDbPerM + k2(tangent) * row.frequencyHz })));
    expect(check("lossTangent", wet(0.004))).toMatchObject({ verdict: "look" });
    expect(check("lossTangent", wet(0.03))).toMatchObject({ verdict: "contradiction" });
    const pvc = { ...foamBuild, dielectric: "solid", dielectricName: "PVC" } as const;
    expect(check("lossTangent", { ...wet(0.03), build: pvc })?.verdict).toBe("fine");
  });

  test("that falls with frequency is a contradiction at that row", () => {
    expect(check("lossRises", withRows(rows))?.verdict).toBe("fine");
    const swapped = check("lossRises", withRows(rowsOf([1.37, 1.94, 4.4, 6.28, 4.98, 13.72])))!;
    expect(swapped).toMatchObject({ verdict: "contradiction", culprit: "the row at 200\u00a0MHz" });
  });

  test("names a mistyped row wherever it stands, and none in a clean table", () => {
    for (let at = 0; at < rows.length; at++) {
      const slip = rows.map((row, i) => (i === at ? { ...row, lossDbPerM: row.lossDbPerM * 1.15 } : row));
      const found = check("lossRow", withRows(slip))!;
      expect(found.culprit, `row ${at}`).toBe(
        `the row at ${rows[at]!.frequencyHz / 1e6}\u00a0MHz`
          .replace("1500\u00a0M", "1.5\u00a0G")
          .replace("3000\u00a0M", "3\u00a0G"),
      );
      expect(found.verdict).toBe("contradiction");
    }
    expect(check("lossRow", withRows(rows))?.verdict).toBe("fine");
  });

  test("a row off by 6 % is to be looked at; kept with a reason it no longer stands in the way", () => {
    const off = (by: number, note?: string) =>
      check(
        "lossRow",
        withRows(rows.map((row, i) => (i === 5 ? { ...row, lossDbPerM: row.lossDbPerM * by, note } : row))),
      )!;
    expect(off(1.062).verdict).toBe("look");
    expect(off(1.15, "the sheet says so").verdict).toBe("look");
    expect(off(1.15, "the sheet says so").sentence).toMatch(/It is kept: the sheet says so/);
  });

  test("that the model does not follow is told", () => {
    const entry = withRows(rows);
    expect(check("lossTable", entry)?.verdict).toBe("fine");
    const model = { ...entry.model, lossTangent: 0.01 };
    expect(check("lossTable", { ...entry, model })?.verdict).toBe("contradiction");
  });
});

describe("Core to core and core to screen", () => {
  test("a screened pair's capacitance near twice what it should be is that of a core to core and screen", () => {
    const stated = (cFPerM: number) => check("coreCapacitance", pairEntry({ cFPerM }));
    expect(stated(28.5e-12)?.verdict).toBe("fine");
    expect(stated(51e-12)).toMatchObject({ verdict: "contradiction", culprit: "the capacitance" });
    expect(stated(51e-12)?.sentence).toMatch(/to the other core and the screen/);
    expect(check("coreCapacitance", entryFrom(corrected))).toBeUndefined();
  });
});

describe("The highest rated frequency", () => {
  test("lies below where a coaxial cable's second mode begins, or is a contradiction", () => {
    const rated = (maxFrequencyHz: number) => check("cutoff", entryFrom(corrected, { limits: { maxFrequencyHz } }))!;
    expect(rated(6e9).verdict).toBe("fine");
    expect(rated(30e9)).toMatchObject({ verdict: "contradiction", culprit: "the highest rated frequency" });
  });
});

describe("A meter's readings", () => {
  const read = (readings: NonNullable<EntryInputs["readings"]>) => checksOf(entryFrom({ ...corrected, readings }));
  const sample = { lengthM: 5, meterHz: 1e6, shortInductanceH: 1.58e-6, openCapacitanceF: 0.27e-9 };

  test("are held against what the model's sample reads at the meter's frequency, and it says why that is more", () => {
    const checks = read(sample);
    expect(named(checks, "meterCapacitance")?.verdict).toBe("fine");
    expect(named(checks, "meterInductance")?.sentence).toMatch(
      /above the high-frequency figure, since current still fills/,
    );
  });

  test("that are off are named", () => {
    const checks = read({ ...sample, openCapacitanceF: 0.34e-9 });
    expect(named(checks, "meterCapacitance")).toMatchObject({
      verdict: "contradiction",
      culprit: "the meter’s capacitance",
    });
  });
});
