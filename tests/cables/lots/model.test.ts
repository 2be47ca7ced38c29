import { describe, expect, test } from "vitest";
import { modelOfLot } from "@/lib/cables/lots/model";
import { lossDbPer100m } from "@/lib/cables/model";
import { nominalFigures } from "@/lib/line/cable";
import { atTemperature } from "@/lib/line/temperature";
import fc from "@/tests/support/property";
import { seededModel } from "@/tests/support/seeded-cables";

const model = seededModel("c50-f10");
const of = (...figures: Parameters<typeof modelOfLot>[1]) => modelOfLot(model, figures) ?? model;

describe("The model of a lot", () => {
  test("is the entry's where nothing but what is nominal was measured", () => {
    const { z0, velocityFactor } = nominalFigures(model);
    const same = of({ quantity: "z0Ohm", valueSi: z0 }, { quantity: "velocityFactor", valueSi: velocityFactor });
    expect(nominalFigures(same).capacitance / model.cFPerM).toBeCloseTo(1, 12);
    expect(modelOfLot(model, [])).toEqual({
      ...model,
      lInfHPerM: expect.closeTo(model.lInfHPerM, 18),
      cFPerM: expect.closeTo(model.cFPerM, 22),
    });
  });

  // 3.336/VF ns/m: 3.957 for 0.843, 0.8 % more than for 0.85.
  test("of VF 0.843 delays 3.957 ns/m and keeps the impedance", () => {
    const lot = of({ quantity: "velocityFactor", valueSi: 0.843 });
    expect(nominalFigures(lot).delay * 1e9).toBeCloseTo(3.957, 3);
    expect(nominalFigures(lot).z0).toBeCloseTo(nominalFigures(model).z0, 9);
  });

  test("has the dc resistance measured, brought to 20 °C, and leaves the loss at high frequency alone", () => {
    const warm = of({ quantity: "r0OhmPerM", valueSi: 0.0089 * (1 + 0.00393 * 12), temperatureC: 32 });
    expect(warm.conductors[0]?.r0OhmPerM).toBeCloseTo(0.0089, 12);
    // Far above the corner, R is R0·√(ω/2ωs): the same to what the corner still shows at 1 GHz.
    expect(lossDbPer100m(warm, 1e9) / lossDbPer100m(model, 1e9)).toBeCloseTo(1, 4);
  });

  test("loses at one frequency exactly what was measured far above the corner, whatever the temperature", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.7, max: 1.4, noNaN: true }),
        fc.integer({ min: -20, max: 60 }),
        (ratio, temperatureC) => {
          const expected = lossDbPer100m(atTemperature(model, temperatureC).model, 1e9) / 100;
          const lot = of({ quantity: "lossDbPerM", valueSi: expected * ratio, fromHz: 1e9, temperatureC });
          const now = lossDbPer100m(atTemperature(lot, temperatureC).model, 1e9) / 100;
          expect(now / (expected * ratio)).toBeCloseTo(1, 3);
        },
      ),
    );
  });

  test("is none where what was measured makes no line", () => {
    expect(modelOfLot(model, [{ quantity: "z0Ohm", valueSi: 0 }])).toBeNull();
    expect(
      modelOfLot({ ...model, lossTangent: 0.9 }, [{ quantity: "lossDbPerM", valueSi: 1e6, fromHz: 1e9 }]),
    ).toBeNull();
  });
});
