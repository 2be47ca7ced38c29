import { describe, expect, test } from "vitest";
import { agreementOfEntry } from "@/lib/cables/agreement";
import { lossTable, tableFit, tableRange } from "@/lib/cables/loss-rows";
import type { Cable, Figure } from "@/lib/cables/schema";
import { modelFromNominal } from "@/lib/line/cable";
import catalogue from "@/seeds/data/cables.json";
import { modelOf } from "@/seeds/cables";
import { figuresOf } from "@/seeds/figures";

type Entry = Pick<Cable, "model" | "figures" | "construction" | "limits">;

const entries = catalogue.cables.map((cable): Entry & { id: string } => ({
  id: cable.id,
  model: modelOf(cable.figures as never),
  figures: figuresOf(cable.figures as never, cable.family as never, cable.build.dielectric as never),
  construction: cable.construction as never,
  limits: cable.limits,
}));
const entry = (id: string) => entries.find((one) => one.id === id)!;

const figure = (quantity: string, valueSi: number, change: Partial<Figure> = {}): Figure => ({
  ...{ quantity, valueSi, asTyped: `${valueSi}`, kind: "nominal", source: "a sheet" },
  ...change,
});

describe("Every entry of the demo", () => {
  test.each(entries)("$id agrees with itself, with its model and with its loss table", (one) => {
    const { checks, oddOneOut } = agreementOfEntry(one);
    const named = Object.fromEntries(checks.map((check) => [check.check, check.verdict]));
    expect(named).toMatchObject({ triangle: "fine", model: "fine", lossTable: "fine" });
    expect(Object.values(named)).not.toContain("contradiction");
    expect(oddOneOut).toBeUndefined();
  });

  // A clad centre conductor has its skin corner at 300 kHz and above: at 1 MHz its loss does not yet rise with √f.
  const copper = entries.filter(({ model }) => model.conductors[0]!.skinCornerRadPerS! < 2 * Math.PI * 300e3);
  test.each(copper)("$id, of copper, has a table that k1·√f + k2·f fits within 6 %", (one) => {
    expect(tableFit(lossTable(one.figures))?.worstPercent).toBeLessThan(6);
    expect(copper.length).toBe(23);
  });
});

test("An import whose capacitance is another construction's is a contradiction of 25 %", () => {
  // "75 Ω foam, velocity 0.83, 67 pF/m": the capacitance belongs to solid dielectric.
  const model = modelFromNominal({ z0: 75, velocityFactor: 0.83 });
  const figures = [figure("z0Ohm", 75), figure("velocityFactor", 0.83), figure("cFPerM", 67e-12)];
  const { checks, routes } = agreementOfEntry({ model, figures, construction: null, limits: {} });
  const triangle = checks.find(({ check }) => check === "triangle");
  expect(triangle?.verdict).toBe("contradiction");
  expect(triangle?.percent).toBeCloseTo(25.0, 0);
  expect(routes.find(({ route }) => route === "capacitanceAndVelocity")?.z0Ohm).toBeCloseTo(60.0, 0);
});

test("A figure that was worked out from the others bears no witness", () => {
  const model = modelFromNominal({ z0: 50, velocityFactor: 0.66 });
  const figures = [
    figure("z0Ohm", 50),
    figure("velocityFactor", 0.66),
    figure("lInfHPerM", 1e-6, { kind: "derived" }),
    figure("cFPerM", 1e-12, { kind: "maximum" }),
  ];
  expect(agreementOfEntry({ model, figures, construction: null, limits: {} }).checks.map(({ check }) => check)).toEqual(
    ["model"],
  );
});

test("The tolerances of the stated figures spread each route: 50 ± 2 Ω reaches from 48 to 52", () => {
  const [stated, derived] = agreementOfEntry(entry("c50-f10")).routes;
  expect([stated?.fromOhm, stated?.toOhm].map((ohm) => Math.round(ohm ?? 0))).toEqual([48, 52]);
  // C ± 3 %, velocity ± 1.5 %: both at their limits, 4.5 % and a little
  expect(derived!.toOhm / derived!.z0Ohm).toBeCloseTo(1 / (0.97 * 0.985), 9);
});

test("A cable rated up to where its second mode begins is a contradiction", () => {
  const { limits, ...cable } = entry("c50-f28");
  const verdict = (maxFrequencyHz: number) =>
    agreementOfEntry({ ...cable, limits: { ...limits, maxFrequencyHz } }).checks.find(
      ({ check }) => check === "cutoff",
    );
  expect(verdict(4e9)?.verdict).toBe("fine");
  // 2c/(π·(9.0 + 23.2) mm·√ε) is 5.2 GHz at the velocity of 0.88
  expect(verdict(5.5e9)?.verdict).toBe("contradiction");
});

describe("The loss table of an entry", () => {
  const row = (mhz: number, loss: number, change: Partial<Figure> = {}) =>
    figure("lossDbPerM", loss / 100, { kind: "typical", fromHz: mhz * 1e6, toHz: mhz * 1e6, ...change });

  test("has its rows in order, limits apart, and nothing that is no row of it", () => {
    const table = lossTable([
      row(100, 4),
      row(10, 1.2),
      row(100, 4.4, { kind: "maximum" }),
      row(50, 0),
      row(50, 2, { toHz: 60e6 }),
      figure("lossDbPerM", 0.01),
      figure("z0Ohm", 50),
    ]);
    expect(table.points.map(({ frequencyHz, lossDbPer100m }) => [frequencyHz, lossDbPer100m])).toEqual([
      [10e6, 1.2],
      [100e6, 4],
    ]);
    expect(table.limits.map(({ lossDbPer100m }) => lossDbPer100m)).toEqual([4.4]);
    expect(tableRange(table)).toEqual([10e6, 100e6]);
  });

  test("of one row, or of none, reaches nowhere and is not fitted", () => {
    for (const figures of [[], [row(100, 4)], [row(100, 4), row(100, 4.1)]]) {
      expect(tableRange(lossTable(figures))).toBeNull();
      expect(tableFit(lossTable(figures))).toBeUndefined();
    }
  });

  test("of rows at several temperatures is not fitted across them", () => {
    expect(tableFit(lossTable([row(10, 1.2), row(100, 4.2, { temperatureC: 40 })]))).toBeUndefined();
  });
});
