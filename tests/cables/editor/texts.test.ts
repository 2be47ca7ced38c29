import { describe, expect, test } from "vitest";
import { changeBetween, editedEntry } from "@/lib/cables/editor/entry-draft";
import { readTexts } from "@/lib/cables/editor/read-texts";
import { startTexts } from "@/lib/cables/editor/start-texts";
import { emptyTexts, type EntryTexts } from "@/lib/cables/editor/texts";
import { entryInputsSchema } from "@/lib/cables/inputs";
import { newCableSchema } from "@/lib/cables/new-cable";
import { lossDbPer100m } from "@/lib/cables/model";
import type { Cable } from "@/lib/cables/schema";
import { nominalFigures } from "@/lib/line/cable";
import catalogue from "@/seeds/data/cables.json";
import { modelOf } from "@/seeds/cables";
import { figuresOf } from "@/seeds/figures";

const sheet: EntryTexts = {
  ...emptyTexts,
  ...{ designation: "C75-F9", aliases: "Trunk; old trunk", name: "75 Ω trunk" },
  figures: {
    ...emptyTexts.figures,
    ...{ conductor: "1.02", insulation: "4.6", permittivity: "1.4516", tangent: "1.5e-4", outer: "0.27 in" },
    ...{ z0: "75", z0Tolerance: "2", velocity: "83 %", c: "53.6", loop: "30.1 mΩ/m", core: "21.1" },
    ...{ sample: "20", openC: "1.074 nF", delay: "80.4", meterHz: "100", maxFrequency: "3" },
  },
  rows: [
    { frequency: "10", loss: "1,94", isLeftOut: false, note: "" },
    { frequency: "100", loss: "6.28", isLeftOut: true, note: "smudged" },
    { frequency: "1.5 GHz", loss: "26.18", isLeftOut: false, note: "" },
    { frequency: "", loss: "", isLeftOut: false, note: "" },
  ],
  sources: {
    ...emptyTexts.sources,
    nominal: { ...emptyTexts.sources.nominal, kind: "dataSheet", title: "A sheet", page: "2" },
  },
};

describe("What is typed", () => {
  const read = readTexts(sheet);

  test("is read in the unit of its field or in any other, and what was understood of the other is told", () => {
    expect(read.faults).toEqual({});
    expect(read.construction).toMatchObject({ kind: "coax", innerMm: 1.02, outerDiameterMm: 6.858 });
    expect(read.inputs.nominal).toMatchObject({ z0Ohm: 75, velocityFactor: 0.83, loopResistanceOhmPerM: 0.0301 });
    expect(read.inputs.nominal?.cFPerM).toBeCloseTo(53.6e-12, 20);
    expect(read.inputs.readings).toMatchObject({ lengthM: 20, meterHz: 100e3 });
    expect(read.understood.outer).toBe("= 6.858\u00a0mm");
    expect(read.understood.conductor).toBeUndefined();
  });

  test("makes rows with decimal commas and units of their own; an empty row is none", () => {
    const rows = read.inputs.lossTable!.rows;
    expect(rows.map(({ frequencyHz }) => frequencyHz)).toEqual([10e6, 100e6, 1.5e9]);
    expect(rows[0]!.lossDbPerM).toBeCloseTo(0.0194, 12);
    expect(rows[1]).toMatchObject({ isLeftOut: true, note: "smudged", typed: "6.28 dB/100 m at 100 MHz" });
  });

  test("is what the API takes", () => {
    const { draft } = editedEntry(sheet, null);
    const { inputs, ...entry } = draft!;
    expect(newCableSchema.safeParse(entry).error?.issues ?? []).toEqual([]);
    expect(entryInputsSchema.safeParse(inputs).error?.issues ?? []).toEqual([]);
    expect(entry.aliases).toEqual(["Trunk", "old trunk"]);
  });

  test("comes back as it was typed when the entry is opened again", () => {
    const { draft } = editedEntry(sheet, null);
    const again = startTexts(JSON.parse(JSON.stringify(draft)) as typeof draft & object);
    expect(again.figures).toEqual(sheet.figures);
    expect(again.rows.map(({ frequency, loss }) => [frequency, loss])).toEqual([
      ["10", "1.94"],
      ["100", "6.28"],
      ["1500", "26.18"],
    ]);
    expect(again.sources.nominal).toEqual(sheet.sources.nominal);
    expect(changeBetween(draft!, editedEntry(again, null).draft!)).not.toHaveProperty("model");
  });
});

test("A field that cannot be read is told at its place, and the rest still makes a model", () => {
  const wrong = {
    ...sheet,
    designation: " ",
    figures: { ...sheet.figures, permittivity: "0.5", c: "many", z0Tolerance: "-1" },
    rows: [
      ...sheet.rows,
      { frequency: "10", loss: "2", isLeftOut: false, note: "" },
      { frequency: "20", loss: "0", isLeftOut: false, note: "" },
    ],
  };
  const { read, worked } = editedEntry(wrong, null);
  expect(Object.keys(read.faults).sort()).toEqual(
    [
      "designation",
      "figures.c",
      "figures.permittivity",
      "figures.z0Tolerance",
      "rows.4.frequency",
      "rows.5.loss",
    ].sort(),
  );
  expect(read.faults["figures.c"]).toMatch(/“many” is not a capacitance|“many pF\/m”/);
  expect(worked.model).not.toBeNull();
});

describe("An entry of which only its figures are stored", () => {
  const entries = catalogue.cables.map((cable) => ({
    ...cable,
    model: modelOf(cable.figures as never),
    figures: figuresOf(cable.figures as never, cable.family as never, cable.build.dielectric as never),
    inputs: null,
  })) as unknown as (Cable & { inputs: null })[];

  test.each(entries.map((entry) => [entry.id, entry] as const))(
    "%s opens without a fault and keeps its line",
    (_, entry) => {
      const { read, worked, draft, checks } = editedEntry(startTexts(entry), entry);
      expect(read.faults).toEqual({});
      const [before, after] = [nominalFigures(entry.model), nominalFigures(worked.model!)];
      expect(after.z0 / before.z0).toBeCloseTo(1, 2);
      for (const hertz of [1e6, 100e6, 1e9])
        expect(Math.abs(lossDbPer100m(worked.model!, hertz) / lossDbPer100m(entry.model, hertz) - 1)).toBeLessThan(
          0.02,
        );
      const limits = (list: Cable["figures"]) => list.filter(({ kind }) => kind === "maximum");
      expect(limits(draft!.figures)).toEqual(limits(entry.figures));
      expect(checks.filter(({ verdict }) => verdict === "contradiction")).toEqual([]);
    },
  );
});
