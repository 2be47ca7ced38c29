import { describe, expect, test } from "vitest";
import { fromInputs } from "@/lib/cables/from-inputs";
import { figureSchema, type Figure } from "@/lib/cables/schema";
import { figuresOf, otherFigures } from "@/lib/cables/ways/figures";
import type { EntryInputs } from "@/lib/cables/inputs";
import { byWay, entered, trunk } from "@/tests/support/entered";

const figures = (inputs: EntryInputs, others: Figure[] = []) =>
  figuresOf(inputs, fromInputs(entered(inputs, trunk)), others);
const one = (list: Figure[], quantity: string, kind: Figure["kind"]) =>
  list.find((figure) => figure.quantity === quantity && figure.kind === kind);

describe("Every figure says what it is", () => {
  test("as typed with its unit, its kind, its tolerance and its source in words and in parts", () => {
    const provenance = { kind: "dataSheet" as const, title: "Ternledge cable sheet", issue: "2", page: "3" };
    const list = figures({
      nominal: { z0Ohm: 75, z0ToleranceOhm: 2, velocityFactor: 0.83, typed: { z0Ohm: "75 Ω" } },
      sources: { nominal: provenance },
    });
    expect(one(list, "z0Ohm", "nominal")).toMatchObject({
      ...{ valueSi: 75, asTyped: "75 Ω", toleranceSi: 2, temperatureC: 20, provenance },
      source: "Data sheet: Ternledge cable sheet, issue 2, page 3",
    });
    for (const figure of list) expect(figureSchema.safeParse(figure).success).toBe(true);
  });

  test("what nobody stated is worked out, with how far it may be off, and says from what", () => {
    const capacitance = one(figures({ nominal: { z0Ohm: 75, velocityFactor: 0.83 } }), "cFPerM", "derived");
    expect(capacitance?.valueSi).toBeCloseTo(53.585e-12, 14);
    expect(capacitance?.source).toBe("worked out from nominal figures");
    const impedance = one(figures({}), "z0Ohm", "derived");
    expect(impedance?.source).toBe("worked out from the construction");
    expect(impedance!.toleranceSi! / impedance!.valueSi).toBeGreaterThan(0.005);
  });

  test("a reading is a measured figure per metre with the meter's frequency; a row left out of the fit is no figure", () => {
    const { readings, lossTable } = byWay;
    const [first, ...rest] = lossTable.rows;
    const list = figures({ readings, lossTable: { ...lossTable, rows: [{ ...first!, isLeftOut: true }, ...rest] } });
    expect(one(list, "cFPerM", "measured")).toMatchObject({ fromHz: 100e3, valueSi: readings.openCapacitanceF / 20 });
    expect(list.filter(({ quantity }) => quantity === "lossDbPerM")).toHaveLength(rest.length);
  });
});

test("Limits and quantities that no way in makes stay as they were; what is made anew is not there twice", () => {
  const common = { asTyped: "x", source: "a sheet" };
  const most: Figure = { ...common, quantity: "lossDbPerM", valueSi: 0.07, kind: "maximum", fromHz: 1e8, toHz: 1e8 };
  const drift: Figure = { ...common, quantity: "delayPerK", valueSi: 25e-6, kind: "typical" };
  const before: Figure[] = [most, drift, { ...common, quantity: "z0Ohm", valueSi: 74, kind: "nominal" }];
  const inputs: EntryInputs = { nominal: { z0Ohm: 75, velocityFactor: 0.83 } };
  const list = figures(inputs, otherFigures(before, inputs));
  expect(list).toContainEqual(most);
  expect(list).toContainEqual(drift);
  expect(list.filter(({ quantity }) => quantity === "z0Ohm").map(({ valueSi }) => valueSi)).toEqual([75]);
  const limits: EntryInputs = { ...inputs, lossTable: { ...byWay.lossTable, kind: "maximum" } };
  expect(otherFigures(before, limits)).toEqual([drift]);
});
