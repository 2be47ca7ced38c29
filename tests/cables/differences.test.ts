/** What differs between two revisions, field by field. */
import { expect, test } from "vitest";
import { differences, fieldsOfBoth, type Compared } from "@/lib/cables/revisions/differences";
import type { Figure } from "@/lib/cables/schema";
import { coaxModel } from "@/tests/support/cables";

const loss = (dbPer100m: number, fromHz: number): Figure => ({
  ...{ quantity: "lossDbPerM", valueSi: dbPer100m / 100, asTyped: `${dbPer100m} dB/100 m`, kind: "typical" },
  ...{ fromHz, toHz: fromHz, source: "Sheet, page 2" },
});
const before: Compared = {
  ...{ name: "75 Ω trunk", family: "coaxial", model: coaxModel, build: null },
  construction: { kind: "coax", innerMm: 1, dielectricMm: 5.05, relativePermittivity: 1.48, lossTangent: 1e-4 },
  figures: [loss(17.9, 860e6), loss(6.2, 100e6)],
  limits: { minBendMm: 70 },
};

test("A revision differs from itself in nothing", () => {
  expect(differences(before, structuredClone(before))).toEqual([]);
  expect(fieldsOfBoth(before, before).every(({ isSame }) => isSame)).toBe(true);
});

test("A changed diameter is told with both values and by how many per cent", () => {
  const after = { ...before, construction: { ...before.construction!, dielectricMm: 5.19 } } as Compared;
  expect(differences(before, after)).toMatchObject([
    {
      field: "construction.dielectricMm",
      isGiven: true,
      before: 5.05,
      after: 5.19,
      percent: expect.closeTo(2.7723, 4),
    },
  ]);
});

test("Figures are paired by what they are and where they hold, whatever their order", () => {
  const after = { ...before, figures: [loss(6.2, 100e6), loss(18.82, 860e6), loss(9.3, 200e6)] };
  expect(differences(before, after)).toMatchObject([
    { beforeTyped: "17.9 dB/100 m", afterTyped: "18.82 dB/100 m", atHz: 860e6, source: "Sheet, page 2" },
    { before: null, after: expect.closeTo(0.093, 12), percent: null, atHz: 200e6 },
  ]);
});

test("What was taken away is told as such", () => {
  expect(differences(before, { ...before, limits: {} })).toMatchObject([
    { field: "limits.minBendMm", before: 70, after: null, percent: null },
  ]);
});

test("A changed model shows in what is worked out from it, and that stands apart from what was given", () => {
  const after = { ...before, model: { ...coaxModel, cFPerM: coaxModel.cFPerM * 1.02 } };
  const found = differences(before, after);
  expect(found.find(({ field }) => field === "derived.z0Ohm")).toMatchObject({
    isGiven: false,
    percent: expect.closeTo(100 * (1 / Math.sqrt(1.02) - 1), 9),
  });
  expect(found.filter(({ isGiven }) => isGiven).map(({ field }) => field)).toEqual(["model.cFPerM"]);
});
