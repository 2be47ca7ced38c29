/** What a meter's readings of a sample say of its cable. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import { exactly, type Estimate, propagated, within } from "@/lib/cables/ways/estimate";
import { loopOf } from "@/lib/cables/ways/loss-way";
import { unlessRefused } from "@/lib/cables/ways/unless-refused";
import { usualSpreads } from "@/lib/cables/ways/usual-spreads";
import type { WayResult } from "@/lib/cables/ways/way";
import { nominalFigures } from "@/lib/line/cable";
import { COPPER_TEMPERATURE_COEFFICIENT } from "@/lib/line/constants";
import type { ConductorForm } from "@/lib/line/element";
import { modelFromReadings, type ReadingNote, type ReadModel, type Readings } from "@/lib/line/readings";

export type SampleReadings = NonNullable<EntryInputs["readings"]>;

const sentences: Record<ReadingNote, string> = {
  innerInductanceKept:
    "The meter's inductance still holds what lies inside the conductors: Z0 comes out a little high.",
  noResistance: "No resistance was read: the model of the sample has no conductor loss.",
  cornerFromInductance:
    "Where the skin effect begins was told by what the inductance has beyond capacitance and delay.",
  electricallyLong: "The sample is long for the meter's frequency; its length was taken out of the readings.",
};

/** Frequency of a meter nobody named, hertz. */
export const usualMeterHz = 1e3;

/** Readings as the engine takes them; resistance brought to 20 °C. */
export function readingsOf(readings: SampleReadings, form: ConductorForm): Readings {
  const { lengthM, openCapacitanceF, shortInductanceH, shortResistanceOhm, oneWayDelayS, roundTripS } = readings;
  const warmth = 1 + COPPER_TEMPERATURE_COEFFICIENT * ((readings.temperatureC ?? 20) - 20);
  return {
    length: lengthM,
    meterFrequency: readings.meterHz ?? usualMeterHz,
    openCapacitance: openCapacitanceF,
    shortInductance: shortInductanceH,
    ...(shortResistanceOhm !== undefined && shortResistanceOhm > 0 && { shortResistance: shortResistanceOhm / warmth }),
    delay: oneWayDelayS ?? (roundTripS === undefined ? undefined : roundTripS / 2),
    form,
  };
}

const read = (readings: Readings): ReadModel | undefined => unlessRefused(() => modelFromReadings(readings));

const moved = ["length", "openCapacitance", "shortInductance", "shortResistance", "delay"] as const;

const spreads: Record<(typeof moved)[number], number> = {
  length: usualSpreads.reading.length,
  openCapacitance: usualSpreads.reading.capacitance,
  shortInductance: usualSpreads.reading.inductance,
  shortResistance: usualSpreads.reading.resistance,
  delay: usualSpreads.reading.delay,
};

/** What little a sample says that gives no line: capacitance or resistance alone. */
function parts({ length, openCapacitance, shortResistance }: Readings): Partial<WayResult> {
  const perMetre = (value: number, spread: number): Estimate =>
    propagated(
      (reading, metres) => (reading ?? NaN) / (metres ?? NaN),
      [within(value, spread), within(length, spreads.length)],
    );
  return {
    ...(openCapacitance !== undefined && { capacitance: perMetre(openCapacitance, spreads.openCapacitance) }),
    ...(shortResistance !== undefined && { loopResistance: perMetre(shortResistance, spreads.shortResistance) }),
  };
}

export function readingsWay(sample: SampleReadings, form: ConductorForm): WayResult {
  const readings = readingsOf(sample, form);
  const given = [readings.openCapacitance, readings.shortInductance, readings.delay].filter((v) => v !== undefined);
  if (given.length < 2) return { ...parts(readings), notes: [] };
  const whole = read(readings);
  if (!whole)
    return {
      ...parts(readings),
      refusal: "No line reads like this: a reading, the length or the meter’s frequency is wrong.",
      notes: [],
    };
  const from = moved.map((name) => {
    const value = readings[name];
    return value === undefined ? exactly(NaN) : within(value, spreads[name]);
  });
  const models = new Map<string, ReadModel | undefined>();
  const of = (figure: (model: ReadModel) => number) =>
    propagated((...values) => {
      const key = values.join(" ");
      const at = Object.fromEntries(moved.map((name, i) => [name, Number.isNaN(values[i]) ? undefined : values[i]]));
      const model = models.has(key) ? models.get(key) : read({ ...readings, ...at });
      models.set(key, model);
      return model ? figure(model) : NaN;
    }, from);
  return {
    z0: of(({ model }) => nominalFigures(model).z0),
    velocityFactor: of(({ model }) => nominalFigures(model).velocityFactor),
    capacitance: of(({ model }) => model.cFPerM),
    inductance: of(({ model }) => model.lInfHPerM),
    ...(readings.shortResistance !== undefined && { loopResistance: of(({ model }) => loopOf(model)) }),
    model: whole.model,
    notes: whole.notes.map((note) => sentences[note]),
  };
}
