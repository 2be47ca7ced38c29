/** Units of a loss table as spreadsheets and sheets spell them. Pure. */
import { DB_PER_NEPER } from "@/lib/line/constants";

export const frequencyUnits = { Hz: 1, kHz: 1e3, MHz: 1e6, GHz: 1e9 } as const;
export type FrequencyUnit = keyof typeof frequencyUnits;

const FOOT = 0.3048;

/** dB/m of one of each. */
export const lossUnits = {
  "dB/100 m": 1 / 100,
  "dB/100 ft": 1 / (100 * FOOT),
  "dB/km": 1 / 1000,
  "dB/m": 1,
  "dB/ft": 1 / FOOT,
  "Np/km": DB_PER_NEPER / 1000,
  "Np/m": DB_PER_NEPER,
} as const;
export type LossUnit = keyof typeof lossUnits;

/** The frequency units a text names, each once. */
export function frequencyUnitsIn(text: string): FrequencyUnit[] {
  const found = [...text.matchAll(/(?<![a-z])([kmg]?)hz(?![a-z])/gi)].map(([, size = ""]) => {
    const unit = { "": "Hz", k: "kHz", m: "MHz", g: "GHz" }[size.toLowerCase()];
    return unit as FrequencyUnit;
  });
  return [...new Set(found)];
}

const lossPattern =
  /(?<![a-z])(db|decibels?|np|nepers?)\s*(?:\/|per|\u2044|\u2215)\s*(?:(\d+)\s*)?(km|kilomet(?:re|er)s?|ft|feet|foot|'|′|m|met(?:re|er)s?)(?![a-z])/gi;

function lossUnitOf(over: string, count: string | undefined, under: string): LossUnit | undefined {
  const length = /^k/i.test(under) ? "km" : /^(f|'|′)/i.test(under) ? "ft" : "m";
  const many = count === undefined || count === "1" ? "" : `${count} `;
  const unit = `${/^n/i.test(over) ? "Np" : "dB"}/${many === "1000 " && length === "m" ? "km" : `${many}${length}`}`;
  return Object.hasOwn(lossUnits, unit) ? (unit as LossUnit) : undefined;
}

/** The loss units a text names, each once; one that nobody here knows is undefined. */
export function lossUnitsIn(text: string): (LossUnit | undefined)[] {
  const found = [...text.matchAll(lossPattern)].map(([, over = "", count, under = ""]) =>
    lossUnitOf(over, count, under),
  );
  return [...new Set(found)];
}

/** Whether a text speaks of decibels or nepers at all. */
export const namesLoss = (text: string) =>
  /(?<![a-z])(db|decibels?|np|nepers?|loss|attenuation|att\.?)(?![a-z])/i.test(text);
