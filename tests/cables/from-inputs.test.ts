import { describe, expect, test } from "vitest";
import { type Entered, fromInputs } from "@/lib/cables/from-inputs";
import { lossDbPer100m } from "@/lib/cables/model";
import { routesOf } from "@/lib/cables/ways/routes";
import { nominalFigures } from "@/lib/line/cable";
import fc from "@/tests/support/property";
import { byWay, entered, trunk, trunkLine } from "@/tests/support/entered";

const { nominal, lossTable, readings } = byWay;
const loop = { loopResistanceOhmPerM: nominal.loopResistanceOhmPerM };

/** Each way as somebody has it who has little else. */
const ways: [string, Entered][] = [
  ["construction", entered({}, trunk)],
  ["nominal figures", entered({ nominal })],
  ["a loss table with impedance and velocity", entered({ nominal: { z0Ohm: 75, velocityFactor: 0.83 }, lossTable })],
  ["meter readings", entered({ readings, lossTable })],
];

describe("The same cable entered all four ways", () => {
  test.each(ways)("by %s has the same impedance, velocity and loss within the stated uncertainty", (_, by) => {
    const worked = fromInputs(by);
    const figures = nominalFigures(worked.model!);
    expect(worked.uncertainty!.z0).toBeGreaterThan(0);
    expect(Math.abs(figures.z0 / trunkLine.z0 - 1)).toBeLessThan(worked.uncertainty!.z0);
    expect(Math.abs(figures.velocityFactor / trunkLine.velocityFactor - 1)).toBeLessThan(
      worked.uncertainty!.velocityFactor,
    );
    for (const hertz of [10e6, 100e6, 1e9])
      expect(Math.abs(lossDbPer100m(worked.model!, hertz) / lossDbPer100m(trunkLine.model, hertz) - 1)).toBeLessThan(
        worked.uncertainty!.loss,
      );
  });

  test("with all of them at once the routes lie within each other's whiskers", () => {
    const all = entered({ nominal, lossTable, readings }, trunk);
    const routes = routesOf(all, fromInputs(all), 160e6);
    expect(routes.z0.map(({ route }) => route)).toEqual(["construction", "nominal", "velocityAndC", "readings"]);
    expect(routes.loss.map(({ route }) => route)).toEqual(["construction", "lossTable"]);
    for (const list of [routes.z0, routes.velocityFactor, routes.loss])
      for (const a of list) for (const b of list) expect(Math.abs(a.value - b.value)).toBeLessThan(a.spread + b.spread);
  });
});

describe("Which way rules", () => {
  const apart = (ruling: NonNullable<Entered["inputs"]["ruling"]>) =>
    fromInputs(entered({ nominal: { ...nominal, z0Ohm: 70 }, lossTable, readings, ruling }, trunk));

  test("the chosen way gives impedance and velocity", () => {
    const rest = { loss: "lossTable", resistance: "nominal" } as const;
    expect(nominalFigures(apart({ impedance: "nominal", ...rest }).model!).z0).toBeCloseTo(70, 9);
    expect(nominalFigures(apart({ impedance: "construction", ...rest }).model!).z0).toBeCloseTo(trunkLine.z0, 9);
    expect(nominalFigures(apart({ impedance: "readings", ...rest }).model!).z0).toBeCloseTo(trunkLine.z0, 0);
  });

  test("the chosen way gives the dc resistance, and loss at high frequency stays what it was", () => {
    const by = (resistance: "readings" | "nominal") =>
      apart({ impedance: "construction", loss: "construction", resistance }).model!;
    const dc = (model: ReturnType<typeof by>) => model.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);
    expect(dc(by("nominal"))).toBeCloseTo(nominal.loopResistanceOhmPerM, 12);
    // The meter read at 100 kHz; one lumped term takes the skin effect out of that a little more than there is.
    expect(dc(by("readings")) / trunkLine.r0).toBeGreaterThan(0.85);
    expect(dc(by("readings")) / trunkLine.r0).toBeLessThan(1.05);
    expect(lossDbPer100m(by("readings"), 3e9) / lossDbPer100m(trunkLine.model, 3e9)).toBeCloseTo(1, 2);
  });

  test("a way that has nothing to say is passed over, and what rules is told", () => {
    const worked = fromInputs(
      entered({ ruling: { impedance: "sweep", loss: "lossTable", resistance: "sweep" } }, trunk),
    );
    expect(worked.ruled).toEqual({
      ...{
        impedance: "construction",
        velocityFactor: "construction",
        loss: "construction",
        resistance: "construction",
      },
    });
  });
});

describe("What is not given", () => {
  test("without impedance or velocity there is no model, and a sentence says what is missing", () => {
    expect(fromInputs(entered({})).missing).toMatch(/the impedance and the velocity/);
    expect(fromInputs(entered({ nominal: { z0Ohm: 75 } })).missing).toMatch(/the velocity yet/);
    expect(fromInputs(entered({ nominal: { z0Ohm: 75 } })).model).toBeNull();
  });

  test("velocity follows from impedance and capacitance", () => {
    const worked = fromInputs(entered({ nominal: { z0Ohm: 50, cFPerM: 101e-12 } }));
    expect(nominalFigures(worked.model!).velocityFactor).toBeCloseTo(0.6605, 4);
  });

  test("a dc resistance nobody gave is that of smooth copper with the loss of the table, and is said", () => {
    const worked = fromInputs(entered({ nominal: { z0Ohm: 75, velocityFactor: 0.83 }, lossTable }));
    expect(worked.ruled?.resistance).toBe("smoothCopper");
    const dc = worked.model!.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);
    expect(dc / trunkLine.r0).toBeGreaterThan(0.9);
    expect(dc / trunkLine.r0).toBeLessThan(1.1);
    expect(worked.notes.join(" ")).toMatch(/smooth copper/);
  });

  test("a construction that cannot be is refused in words and the other ways still count", () => {
    const worked = fromInputs(entered({ nominal: { ...nominal, ...loop } }, { ...trunk, dielectricMm: 1 } as never));
    expect(worked.ways.construction?.refusal).toMatch(/wider than the inner conductor/);
    expect(worked.ruled?.impedance).toBe("nominal");
  });

  test("loss slopes and leakage of the entry are not lost by an edit", () => {
    const kept = { lossSlopes: [{ fromC: 20, toC: 40, perK: 0.004 }], g0SPerM: 1e-12 };
    expect(fromInputs({ ...entered({ nominal }), kept }).model).toMatchObject(kept);
  });
});

test("Whatever is typed, a model has finite, positive figures or is not there", () => {
  const size = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
  const small = fc.double({ min: 1e-15, max: 1, noNaN: true });
  fc.assert(
    fc.property(
      fc.record(
        { z0Ohm: size, velocityFactor: small, cFPerM: small, loopResistanceOhmPerM: small },
        { requiredKeys: [] },
      ),
      fc.array(fc.record({ frequencyHz: fc.double({ min: 1, max: 1e11, noNaN: true }), lossDbPerM: small }), {
        maxLength: 5,
      }),
      fc.option(fc.record({ innerMm: size, dielectricMm: size, relativePermittivity: size })),
      (nominalFigure, rows, sizes) => {
        const construction = sizes && { kind: "coax" as const, lossTangent: 1e-4, ...sizes };
        const worked = fromInputs(
          entered({ nominal: nominalFigure, lossTable: { temperatureC: 20, kind: "nominal", rows } }, construction),
        );
        expect(worked.missing === null).toBe(worked.model !== null);
        if (!worked.model) return;
        const { z0, velocityFactor } = nominalFigures(worked.model);
        expect(z0 > 0 && z0 < Infinity && velocityFactor > 0).toBe(true);
      },
    ),
    { numRuns: 200 },
  );
});
