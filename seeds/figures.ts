/** The figures of a demo entry as a sheet would state them: value, kind, tolerance, conditions, source. */
import type { Build, Family, Figure } from "@/lib/cables/schema";

/** Units as in the keys; 20 °C; resistance and inductance are loop values. */
export interface GivenFigures {
  z0Ohm: number;
  velocityFactor: number;
  capacitancePfPerM: number;
  inductanceNhPerM: number;
  loopResistanceOhmPerKm: number;
  skinCornerKhz: number;
  lossTangent: number;
  lossDbPer100m: Record<string, number>;
  delayPpmPerK: number | null;
}

const sheet = "Ternledge cable sheet, issue 2";
const table = "Ternledge cable sheet, issue 2, loss table";
const workedOut = "worked out from impedance and velocity factor";
const estimate = "estimate from the kind of dielectric, not measured";

const frequencyHz: Record<string, number> = { "1MHz": 1e6, "10MHz": 10e6, "100MHz": 100e6, "1GHz": 1e9 };
const spoken: Record<string, string> = { "1MHz": "1 MHz", "10MHz": "10 MHz", "100MHz": "100 MHz", "1GHz": "1 GHz" };

// House tolerances: impedance ±2 Ω for coax and ±10 % for pairs, velocity ±1 % (foam ±1.5 %), capacitance ±3 %,
// dc resistance at most 5 % above nominal, loss at most 8 % above typical.
const mostResistance = 1.05;
const mostLoss = 1.08;

function geometryFigures(given: GivenFigures, family: Family, dielectric: Build["dielectric"]): Figure[] {
  const { z0Ohm, velocityFactor, capacitancePfPerM, inductanceNhPerM } = given;
  const common = { temperatureC: 20, source: sheet };
  const z0Tolerance = family === "coaxial" ? 2 : z0Ohm / 10;
  const velocityTolerance = velocityFactor * (dielectric === "foam" ? 0.015 : 0.01);
  return [
    { quantity: "z0Ohm", valueSi: z0Ohm, asTyped: `${z0Ohm} Ω`, kind: "nominal", toleranceSi: z0Tolerance, ...common },
    {
      ...{
        quantity: "velocityFactor",
        valueSi: velocityFactor,
        asTyped: `${velocityFactor}`,
        kind: "nominal",
        ...common,
      },
      toleranceSi: velocityTolerance,
    },
    {
      ...{
        quantity: "cFPerM",
        valueSi: capacitancePfPerM / 1e12,
        asTyped: `${capacitancePfPerM} pF/m`,
        kind: "nominal",
      },
      ...{ toleranceSi: (capacitancePfPerM * 0.03) / 1e12, ...common, fromHz: 1e6, toHz: 1e6 },
    },
    {
      ...{
        quantity: "lInfHPerM",
        valueSi: inductanceNhPerM / 1e9,
        asTyped: `${inductanceNhPerM} nH/m`,
        kind: "derived",
      },
      ...{ temperatureC: 20, source: workedOut },
    },
  ];
}

function resistanceFigures({ loopResistanceOhmPerKm: loop }: GivenFigures): Figure[] {
  const most = Number((loop * mostResistance).toPrecision(4));
  const common = { quantity: "r0OhmPerM", temperatureC: 20, source: sheet };
  return [
    { ...common, valueSi: loop / 1000, asTyped: `${loop} Ω/km loop`, kind: "nominal" },
    { ...common, valueSi: most / 1000, asTyped: `${most} Ω/km loop`, kind: "maximum" },
  ];
}

function lossFigures({ lossDbPer100m, lossTangent }: GivenFigures): Figure[] {
  const rows = Object.entries(lossDbPer100m).flatMap(([at, typical]): Figure[] => {
    const hz = frequencyHz[at];
    if (hz === undefined) throw new Error(`lossFigures: unknown frequency ${at}`);
    const common = { quantity: "lossDbPerM", temperatureC: 20, fromHz: hz, toHz: hz, source: table };
    const most = Number((typical * mostLoss).toPrecision(4));
    return [
      { ...common, valueSi: typical / 100, asTyped: `${typical} dB/100 m at ${spoken[at]}`, kind: "typical" },
      { ...common, valueSi: most / 100, asTyped: `${most} dB/100 m at ${spoken[at]}`, kind: "maximum" },
    ];
  });
  // The fit is as wide as the table, however far the cable is rated.
  const range = { fromHz: 1e6, toHz: 1e9 };
  const source = "fitted to the loss table";
  return [
    ...rows,
    {
      quantity: "lossTangent",
      valueSi: lossTangent,
      asTyped: `${lossTangent}`,
      kind: "derived",
      temperatureC: 20,
      ...range,
      source,
    },
  ];
}

function delayFigures({ delayPpmPerK }: GivenFigures): Figure[] {
  if (delayPpmPerK === null) return [];
  const asTyped = `${delayPpmPerK > 0 ? "+" : "−"}${Math.abs(delayPpmPerK)} ppm/K`;
  return [{ quantity: "delayPerK", valueSi: delayPpmPerK / 1e6, asTyped, kind: "typical", source: estimate }];
}

/** Every figure of an entry, with the house's tolerances. */
export function figuresOf(given: GivenFigures, family: Family, dielectric: Build["dielectric"]): Figure[] {
  return [
    ...geometryFigures(given, family, dielectric),
    ...resistanceFigures(given),
    ...lossFigures(given),
    ...delayFigures(given),
  ];
}
