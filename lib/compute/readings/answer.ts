/** Readings of the wire -> the engine's model and what a meter reads on it -> the wire. Pure. */
import type { ReadingsAnswer, ReadingsRequest } from "@/lib/compute/readings/schema";
import { wireNumber } from "@/lib/compute/wire";
import { digits } from "@/lib/format/quantity";
import { nominalFigures, propagation } from "@/lib/line/cable";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";
import { checkReadings, type ReadingCheck } from "@/lib/line/reading-checks";
import { modelFromReadings, type ReadingNote, type Readings } from "@/lib/line/readings";
import { sampleReading, secondOrderInductance } from "@/lib/line/sample-meter";

const usualMeters = [1e3, 1e4, 1e5];

function meterReading(model: LineModel, lengthM: number, frequencyHz: number): ReadingsAnswer["meterWillRead"][number] {
  const omega = 2 * Math.PI * frequencyHz;
  const { z, y, gamma, zc } = propagation(model, { re: 0, im: omega });
  const reading = sampleReading(model, lengthM, frequencyHz);
  const perMetre = { r: z.re, l: z.im / omega, c: y.im / omega };
  return {
    frequencyHz,
    openCapacitanceF: wireNumber(reading.openCapacitance),
    shortInductanceH: wireNumber(reading.shortInductance),
    shortResistanceOhm: wireNumber(reading.shortResistance),
    shortInductanceSecondOrderH: wireNumber(secondOrderInductance(perMetre, lengthM)),
    zcOhm: { re: wireNumber(zc.re), im: wireNumber(zc.im) },
    velocityFactor: wireNumber(omega / gamma.im / SPEED_OF_LIGHT),
  };
}

const sentences: Record<ReadingNote, string> = {
  innerInductanceKept:
    "The inductance inside the conductors could not be told from the rest: L∞ is up to about 0.1 µH/m too high. A delay with the capacitance, or k1 with the resistance, tells it.",
  noResistance: "No resistance was read: the model has no conductor loss.",
  cornerFromInductance:
    "The skin corner follows from a small difference of inductances: one per cent of the reading moves it by many.",
  electricallyLong: "The sample is long for the meter's frequency; its length was taken out, but errors grow with it.",
};

/** A long thin sample reads less than its own inductance; that is no error of the meter. */
function lowReading(reading: ReadingsAnswer["meterWillRead"][number], model: LineModel, lengthM: number): string[] {
  const { shortInductanceH, frequencyHz } = reading;
  const omega = 2 * Math.PI * frequencyHz;
  const l = (propagation(model, { re: 0, im: omega }).z.im / omega) * lengthM;
  const share = (shortInductanceH ?? l) / l - 1;
  if (Math.abs(share) < 0.01) return [];
  const way = share < 0 ? "low" : "high";
  return [
    `The shorted reading is ${digits(100 * Math.abs(share), 1)} % ${way} for the length of the sample; that is no error of the meter.`,
  ];
}

const names: Record<ReadingCheck["check"], ReadingsAnswer["checks"][number]["reading"]> = {
  shortInductance: "shortInductanceH",
  velocityFactor: "velocityFactor",
  delays: "oneWayDelayS",
};

/** @throws RangeError where the engine refuses */
export function readingsAnswer(asked: ReadingsRequest): ReadingsAnswer {
  const { lengthM, roundTripS, oneWayDelayS } = asked;
  const readings: Readings = {
    length: lengthM,
    meterFrequency: asked.meterHz,
    openCapacitance: asked.openCapacitanceF,
    shortInductance: asked.shortInductanceH,
    shortResistance: asked.shortResistanceOhm,
    delay: oneWayDelayS ?? (roundTripS === undefined ? undefined : roundTripS / 2),
    k1: asked.k1DbPerMRootHz,
    form: asked.form,
  };
  const read = modelFromReadings(readings);
  const { z0, velocityFactor } = nominalFigures(read.model);
  const meters = [asked.meterHz, ...usualMeters.filter((each) => each !== asked.meterHz)];
  const meterWillRead = meters.map((frequencyHz) => meterReading(read.model, lengthM, frequencyHz));
  const [own] = meterWillRead;
  const checks = checkReadings(readings, oneWayDelayS === undefined ? undefined : roundTripS, read);
  return {
    model: read.model,
    z0Ohm: z0,
    velocityFactor,
    checks: checks.map(({ check, given, expected, deviation, verdict }) => ({
      reading: names[check],
      givenSi: given,
      expectedSi: expected,
      deviationPercent: 100 * deviation,
      verdict,
    })),
    meterWillRead,
    notes: [...read.notes.map((note) => sentences[note]), ...(own ? lowReading(own, read.model, lengthM) : [])],
  };
}
