import { expect, test } from "vitest";
import { entryCautions, modelCautions, voltageCautions } from "@/lib/calculators/cautions";
import type { ChosenLine } from "@/lib/calculators/line-inputs";
import type { CableLine } from "@/lib/cables/line";
import { typedLineModel } from "@/lib/cables/typed-model";
import { spotFigures } from "@/lib/line/spot-figures";

const model = typedLineModel({
  z0: 50,
  velocityFactor: 0.85,
  loopResistance: 0.0086,
  skinCorner: 18e3,
  lossTangent: 1e-4,
});
const entry: CableLine = {
  ...{ cableId: "a", revision: 1, designation: "A1", name: "invented", family: "coaxial", state: "approved" },
  ...{ condition: null, model, construction: null, build: null, outerDiameterMm: 10 },
  limits: { maxFrequencyHz: 3e9, minTemperatureC: -20, maxTemperatureC: 70 },
};
const line = (changed: Partial<CableLine> = {}): ChosenLine => ({
  label: "A1",
  model,
  entry: { ...entry, ...changed },
});
const texts = (cautions: { text: string }[]) => cautions.map(({ text }) => text);

test("an approved cable within its limits needs no caution", () => {
  expect(entryCautions(line(), 1e8, 20)).toEqual([]);
  expect(modelCautions(line(), spotFigures(model, 1e8))).toEqual([]);
});

test.each([
  ["quarantined", "fail", "A1 is quarantined: not for new use."],
  ["withdrawn", "fail", "A1 is withdrawn: not for new use."],
  ["superseded", "fail", "A1 is superseded."],
  ["draft", "fail", "A1 is a draft: nobody has approved its figures."],
] as const)("a cable that is %s says so", (state, weight, text) => {
  expect(entryCautions(line({ state }), 1e8, 20)).toEqual([{ weight, text }]);
});

test("a restricted cable says its condition; limits of frequency and temperature are said when passed", () => {
  const restricted = line({ state: "restricted", condition: "Lengths up to 30 m." });
  expect(texts(entryCautions(restricted, 5e9, 85))).toEqual([
    "A1 is restricted. Lengths up to 30 m.",
    "5\u00a0GHz is beyond the data: the entry goes up to 3\u00a0GHz.",
    "85.0\u00a0°C is outside what A1 is rated for.",
  ]);
  expect(entryCautions(line(), 3e9, 70)).toEqual([]);
});

test("a typed cable has no entry to be cautious about", () => {
  expect(entryCautions({ label: "the typed cable", model, entry: null }, 1e12, 300)).toEqual([]);
});

test("near the skin corner, far below it and without one, the model's limits are said", () => {
  expect(texts(modelCautions(line(), spotFigures(model, 20e3))).join(" ")).toContain("skin corner, 18\u00a0kHz");
  expect(texts(modelCautions(line(), spotFigures(model, 1e3))).join(" ")).toContain(
    "not the 50.0\u00a0Ω of high frequency",
  );
  const flat = typedLineModel({
    z0: 50,
    velocityFactor: 0.85,
    loopResistance: 0.0086,
    skinCorner: undefined,
    lossTangent: 0,
  });
  const typed = { label: "the typed cable", model: flat, entry: null };
  expect(texts(modelCautions(typed, spotFigures(flat, 1e8)))).toEqual([
    "Without a skin corner the resistance stays at its dc value at every frequency.",
  ]);
});

test("more than 50 V rms is high voltage, 50 V is not", () => {
  expect(voltageCautions(50, "on the line")).toEqual([]);
  expect(voltageCautions(141, "on the line")[0]?.text).toMatch(/^High voltage: up to 141\u00a0V rms on the line/);
  expect(voltageCautions(NaN, "on the line")).toEqual([]);
});
