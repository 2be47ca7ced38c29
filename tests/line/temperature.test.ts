import { expect, test } from "vitest";
import { lineFigures } from "@/lib/line/line-figures";
import type { LineModel, LossSlope } from "@/lib/line/element";
import { atTemperature } from "@/lib/line/temperature";
import { published } from "@/tests/support/published";

const pair: LineModel = {
  conductors: [{ form: "round", r0OhmPerM: 0.17, skinCornerRadPerS: 6e5 }],
  lInfHPerM: 4.83e-7,
  cFPerM: 4.83e-11,
  lossTangent: 6e-4,
};
const unscreened: LossSlope[] = [
  { fromC: 20, toC: 40, perK: 0.004 },
  { fromC: 40, toC: 60, perK: 0.006 },
];
const screened: LossSlope[] = [{ fromC: 20, toC: 60, perK: 0.002 }];

test("at 20 °C a model is itself", () => {
  const { model, resistivityRatio, lossRatio } = atTemperature(pair, 20);
  expect(resistivityRatio).toBe(1);
  expect(lossRatio).toBe(1);
  expect(model.conductors).toEqual(pair.conductors);
  expect(model.lossTangent).toBe(pair.lossTangent);
});

test("without declared slopes dc resistance follows resistivity and high-frequency loss its square root", () => {
  const { model, resistivityRatio, lossRatio, slope } = atTemperature({ ...pair, lossTangent: 0 }, 60);
  expect(slope).toBe("resistivity");
  expect(resistivityRatio).toBeCloseTo(1.1572, 12);
  expect(lossRatio).toBeCloseTo(Math.sqrt(1.1572), 12);
  expect(model.conductors[0]!.r0OhmPerM / 0.17).toBeCloseTo(1.1572, 12);
  const cold = lineFigures({ ...pair, lossTangent: 0 }, [1e9]).attenuationDbPerM[0]!;
  const warm = lineFigures(model, [1e9]).attenuationDbPerM[0]!;
  // far above the corner; what is left of R0/4 is below 1e-3 of it
  expect(warm / cold).toBeCloseTo(Math.sqrt(1.1572), 3);
});

const slopes = published((id) => id === "A-temperature")[0]!;
const standard = (key: string) => slopes.expected[key] as number[];

test.each([
  ["unscreened", unscreened, standard("UTP_dB")],
  ["screened", screened, standard("screened_dB")],
] as const)(
  "declared slopes of a %s pair give the standard's loss at each temperature",
  (_name, lossSlopes, expected) => {
    (slopes.inputs.T_C as number[]).forEach((temperatureC, k) => {
      const { lossRatio, slope } = atTemperature({ ...pair, lossSlopes: [...lossSlopes] }, temperatureC);
      expect(slope).toBe("declared");
      expect(lossRatio * (slopes.inputs.base_dB_at_20C as number)).toBeCloseTo(expected[k]!, 9);
    });
  },
);

test("a declared slope scales high-frequency loss, dielectric included, while dc resistance follows resistivity", () => {
  const model = { ...pair, lossSlopes: unscreened };
  const warm = atTemperature(model, 60);
  expect(warm.resistivityRatio).toBeCloseTo(1.1572, 12);
  expect(warm.model.conductors[0]!.r0OhmPerM).toBeCloseTo(0.17 * 1.1572, 12);
  expect(warm.model.lossTangent).toBeCloseTo(6e-4 * 1.2, 15);
  const ratio =
    lineFigures(model, [1e9], 60).attenuationDbPerM[0]! / lineFigures(model, [1e9], 20).attenuationDbPerM[0]!;
  // at 1 GHz R0/4 and what is left of internal inductance still tell by less than 0.1 %
  expect(Math.abs(ratio / 1.2 - 1)).toBeLessThan(1e-3);
});

test("outside its declared ranges a cable's loss does not move", () => {
  expect(atTemperature({ ...pair, lossSlopes: screened }, -40).lossRatio).toBe(1);
  expect(atTemperature({ ...pair, lossSlopes: screened }, 90).lossRatio).toBeCloseTo(1.08, 12);
});

test("a range below 20 °C takes loss away on the way down", () => {
  expect(atTemperature({ ...pair, lossSlopes: [{ fromC: -20, toC: 20, perK: 0.002 }] }, 0).lossRatio).toBeCloseTo(
    0.96,
    12,
  );
});

test("a model at its temperature is not moved again", () => {
  for (const lossSlopes of [undefined, unscreened]) {
    const once = atTemperature({ ...pair, lossSlopes }, 55).model;
    expect(atTemperature(once, 80).model).toEqual(once);
  }
});

test("a temperature without positive resistivity or loss is refused", () => {
  expect(() => atTemperature(pair, -300)).toThrow("atTemperature: no positive resistivity at temperatureC = -300");
  expect(() => atTemperature(pair, NaN)).toThrow(RangeError);
  expect(() => atTemperature({ ...pair, lossSlopes: [{ fromC: 20, toC: 60, perK: -0.1 }] }, 60)).toThrow(
    /no positive loss/,
  );
});
