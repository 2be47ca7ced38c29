import { expect, test } from "vitest";
import { compareFigures, differencePercent } from "@/lib/cables/compare";
import catalogue from "@/seeds/data/cables.json";
import { modelOf } from "@/seeds/cables";
import type { Construction } from "@/lib/cables/schema";

const entry = (id: string) => {
  const { figures, limits, construction } = catalogue.cables.find((cable) => cable.id === id)!;
  return { model: modelOf(figures as never), limits, construction: construction as Construction };
};

test("Two cables are as far apart in loss as their printed loss at 100 MHz says: C50-F7 loses 41 % more than C50-F10", () => {
  // 5.819 and 4.125 dB/100 m in the catalogue's own check values, to three decimals
  const given = (id: string) => catalogue.cables.find((cable) => cable.id === id)!.figures.lossDbPer100m["100MHz"];
  const [reference, other] = [compareFigures(entry("c50-f10"), 100e6), compareFigures(entry("c50-f7"), 100e6)];
  expect(reference.lossDbPer100m).toBeCloseTo(given("c50-f10"), 2);
  expect(differencePercent(other.lossDbPer100m, reference.lossDbPer100m)).toBeCloseTo(
    100 * (given("c50-f7") / given("c50-f10") - 1),
    1,
  );
  expect(other.outerDiameterMm).toBe(7.3);
});

test("The figures of a comparison hang together: Z0² = L/C, delay² = L·C", () => {
  const figures = compareFigures(entry("p120-s1"), 1e6);
  expect(figures.z0Ohm ** 2).toBeCloseTo(figures.inductanceHPerM / figures.capacitanceFPerM, 6);
  expect(figures.delaySPerM ** 2).toBeCloseTo(figures.inductanceHPerM * figures.capacitanceFPerM, 25);
});

test("What an entry does not say is missing, not 0", () => {
  const figures = compareFigures({ ...entry("c50-f10"), limits: {}, construction: null }, 1e8);
  expect([figures.outerDiameterMm, figures.minBendMm, figures.maxVoltageV, figures.minTemperatureC]).toEqual([
    null,
    null,
    null,
    null,
  ]);
});

test.each([
  [150, 100, 50],
  [57, 100, -43],
  [100, 100, 0],
  [null, 100, null],
  [100, null, null],
  [100, 0, null],
  [-55, -40, 37.5],
])("differencePercent(%j, %j) is %j", (value, reference, expected) => {
  const percent = differencePercent(value, reference);
  if (expected === null) expect(percent).toBeNull();
  else expect(percent).toBeCloseTo(expected, 9);
});
