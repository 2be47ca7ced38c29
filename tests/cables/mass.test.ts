import { expect, test } from "vitest";
import { massPerMetre } from "@/lib/cables/mass";
import type { Build, Construction, Figure } from "@/lib/cables/schema";

const build: Build = {
  ...{ conductor: "1.00 mm solid copper", isStranded: false, dielectric: "solid", dielectricName: "PE" },
  ...{ screen: ["braid"], screenName: "braid", jacket: "PE", pairCount: 1 },
};
const coax: Construction = {
  ...{ kind: "coax", innerMm: 1, dielectricMm: 3.6, relativePermittivity: 2.28, lossTangent: 0, outerDiameterMm: 6 },
};
const stated: Figure = {
  quantity: "massKgPerM",
  valueSi: 0.123,
  asTyped: "123 kg/km",
  kind: "nominal",
  source: "test",
};
const mm2 = (d: number) => (Math.PI / 4) * d * d;

test("a stated mass is taken as it is", () => {
  expect(massPerMetre({ figures: [stated], construction: null, build: null })).toBe(0.123);
});

test("a coaxial cable weighs what its copper, insulation and sheath weigh", () => {
  // worked out by hand: 8.89 g/cm³ copper, 0.92 g/cm³ polyethylene, a screen of 0.15 mm
  const byHand =
    (8.89 * (mm2(1) + mm2(3.9) - mm2(3.6)) + 0.92 * (mm2(3.6) - mm2(1)) + 0.92 * (mm2(6) - mm2(3.9))) / 1000;
  expect(massPerMetre({ figures: [], construction: coax, build })).toBeCloseTo(byHand, 12);
});

test("a foam weighs less than the solid, and air hardly anything", () => {
  const of = (relativePermittivity: number) =>
    massPerMetre({ figures: [], construction: { ...coax, relativePermittivity }, build })!;
  const insulation = (0.92 * (mm2(3.6) - mm2(1))) / 1000;
  expect(of(2.28) - of(1)).toBeCloseTo(insulation, 9);
  expect(of(1.45)).toBeGreaterThan(of(1));
  expect(of(1.45)).toBeLessThan(of(2.28));
});

test.each<[string, Construction | null, Build | null]>([
  ["nothing is known of it", null, null],
  [
    "it is a pair, whose lay-up is not stated",
    { kind: "pair", wireMm: 0.5, spacingMm: 1, effectivePermittivity: 2, lossTangent: 0 },
    build,
  ],
  ["its conductor is a tube", coax, { ...build, conductor: "9.00 mm copper tube" }],
  ["its conductor is clad steel", coax, { ...build, conductor: "1.02 mm copper-clad steel" }],
  ["its insulation is mostly air", coax, { ...build, dielectric: "airSpaced" }],
  ["nobody knows what the sheath is made of", coax, { ...build, jacket: "tarred hemp" }],
  ["nobody knows how thick the sheath is", { ...coax, outerDiameterMm: undefined }, build],
])("the mass is unknown where %s", (_, construction, made) => {
  expect(massPerMetre({ figures: [], construction, build: made })).toBeNull();
});
