/** The address of an entry <-> what it is looked at with. Pure. */
import {
  readEnd,
  readFrequency,
  readHeld,
  usualLossHz,
  valuesOf,
  withQuery,
  type Parameters,
} from "@/lib/cables/address";

/** What an entry is looked at with. */
export interface EntryAsked {
  /** hertz */
  lossAtHz: number;
  /** °C */
  temperatureC: number;
  held: string[];
}

const usualTemperatureC = 20;

export function readEntryAddress(parameters: Parameters): EntryAsked {
  const temperature = readEnd(valuesOf(parameters, "t")[0]) ?? usualTemperatureC;
  return {
    lossAtHz: readFrequency(parameters),
    temperatureC: temperature >= -200 && temperature <= 400 ? temperature : usualTemperatureC,
    held: readHeld(parameters),
  };
}

/** The address of an entry, with what is held up so that it is not lost on the way. */
export function entryAddress(cableId: string, asked: Partial<EntryAsked>): string {
  const { lossAtHz = usualLossHz, temperatureC = usualTemperatureC, held = [] } = asked;
  const parameters = new URLSearchParams();
  if (lossAtHz !== usualLossHz) parameters.set("at", String(lossAtHz));
  if (temperatureC !== usualTemperatureC) parameters.set("t", String(temperatureC));
  for (const id of held) parameters.append("held", id);
  return withQuery(`/cables/${encodeURIComponent(cableId)}`, parameters);
}
