/** One cable described by each of the ways in: a 75 Ω foam cable of 1.02/4.60 mm, its figures worked out from its construction. */
import type { Entered } from "@/lib/cables/from-inputs";
import type { EntryInputs } from "@/lib/cables/inputs";
import { lossDbPer100m } from "@/lib/cables/model";
import type { Construction } from "@/lib/cables/schema";
import { geometryOf } from "@/lib/compute/geometry/answer";
import { sampleReading } from "@/lib/line/sample-meter";

export const trunk: Construction = {
  ...{ kind: "coax", innerMm: 1.02, dielectricMm: 4.6, relativePermittivity: 1.4516, lossTangent: 1.5e-4 },
  ...{ shieldThicknessMm: 0.15, outerDiameterMm: 6.9 },
};
export const trunkLine = geometryOf(trunk);

const megahertz = [5, 10, 50, 100, 200, 450, 900, 1500, 3000];
const sampleM = 20;
const reading = sampleReading(trunkLine.model, sampleM, 100e3);
const round = (value: number, digits: number) => Number(value.toPrecision(digits));

/** As a sheet would round them. */
export const byWay = {
  nominal: {
    z0Ohm: round(trunkLine.z0, 3),
    velocityFactor: round(trunkLine.velocityFactor, 2),
    cFPerM: round(trunkLine.capacitance, 3),
    loopResistanceOhmPerM: round(trunkLine.r0, 3),
    conductorResistanceOhmPerM: round(trunkLine.model.conductors[0]!.r0OhmPerM, 3),
    lossTangent: 1.5e-4,
  },
  lossTable: {
    temperatureC: 20,
    kind: "nominal",
    rows: megahertz.map((mhz) => ({
      frequencyHz: mhz * 1e6,
      lossDbPerM: round(lossDbPer100m(trunkLine.model, mhz * 1e6), 4) / 100,
    })),
  },
  readings: {
    lengthM: sampleM,
    openCapacitanceF: round(reading.openCapacitance, 4),
    shortInductanceH: round(reading.shortInductance, 4),
    shortResistanceOhm: round(reading.shortResistance, 4),
    oneWayDelayS: round(sampleM * Math.sqrt(trunkLine.model.lInfHPerM * trunkLine.model.cFPerM), 4),
    meterHz: 100e3,
  },
} satisfies EntryInputs;

export const entered = (inputs: EntryInputs, construction: Construction | null = null): Entered => ({
  ...{ family: "coaxial", construction, inputs },
});
