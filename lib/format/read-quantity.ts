/**
 * What people type -> SI number, with what was understood. "118 ft", "27.2mhz", "1,5 km", "12' 6\"", "3 dB/100ft",
 * "22-35j". Numbers and units go through mathjs, which also does the dimension check; this file only turns human
 * spelling into mathjs spelling. It loads mathjs: import it where something is typed, not where figures are shown.
 */
import { complexDependencies, create, createUnitDependencies, unitDependencies, type FactoryFunctionMap } from "mathjs";
import { impedance, inWords } from "@/lib/format/quantity";
import { kinds } from "@/lib/format/quantity-kinds";
import { mathUnit, perCount, type QuantityKind } from "@/lib/format/unit-spelling";

const math = create({ unitDependencies, complexDependencies, createUnitDependencies } as FactoryFunctionMap);
math.createUnit!("dB");
math.createUnit!("Np", "8.685889638065035 dB");

export type Read<T> = { ok: true; value: T; understood: string } | { ok: false; message: string };

const numberPattern = String.raw`[+\-]?(?:\d+(?:[ \u202f\u00a0]\d{3})*(?:[.,]\d*)?|[.,]\d+)(?:e[+\-]?\d+)?`;
const partPattern = new RegExp(
  String.raw`(${numberPattern})\s*([^\d\s+\-/][^\d+\-/]*(?:\/\s*(?:\d+\s*)?[^\d+\-/]+)?)?`,
  "giy",
);

/** A decimal comma is a comma followed by one, two or four or more digits; three digits could be thousands, so it is refused. */
function toNumber(text: string): number {
  const joined = text.replace(/[ \u202f\u00a0]/g, "");
  if (/^[+-]?[1-9]\d{0,2},\d{3}$/.test(joined)) return NaN;
  return Number(joined.replace(",", "."));
}

function tidy(text: string): string {
  return text
    .trim()
    .replace(/[\u2212\u2013]/g, "-")
    .replace(/^±\s*/, "")
    .replace(/''/g, '"');
}

/** Reads one quantity. The message of a refusal says what was expected, with an example. */
export function readQuantity(kind: QuantityKind, text: string): Read<number> {
  const { what, example, si, show } = kinds[kind];
  const typed = tidy(text);
  if (typed === "") return { ok: false, message: `Type ${what}, for example ${example}.` };
  partPattern.lastIndex = 0;
  let total = 0;
  let read = 0;
  while (partPattern.lastIndex < typed.length) {
    const part = partPattern.exec(typed);
    if (!part || (read > 0 && kind !== "length"))
      return { ok: false, message: `“${text.trim()}” is not ${what}. Try ${example}.` };
    const value = toNumber(part[1] ?? "");
    if (Number.isNaN(value))
      return {
        ok: false,
        message: `Is “${part[1]}” a thousand or a decimal? Write it with a point, or without the comma.`,
      };
    const unitText = (part[2] ?? "").trim();
    try {
      total += si === "" && unitText === "" ? value : toSi(kind, value, unitText);
    } catch {
      return { ok: false, message: `“${unitText}” is not a unit of ${what.replace(/^an? /, "")}. Try ${example}.` };
    }
    read++;
  }
  if (!Number.isFinite(total)) return { ok: false, message: `“${text.trim()}” is too large to work with.` };
  return { ok: true, value: total, understood: inWords(show(total)) };
}

/** Watts at 0 dB of a level: dBm is over a milliwatt, dBW over a watt. */
const levels: Record<string, number> = { dbm: 1e-3, dbw: 1 };

function toSi(kind: QuantityKind, value: number, unitText: string): number {
  const { si, usual } = kinds[kind];
  const level = kind === "power" ? levels[unitText.toLowerCase()] : undefined;
  if (level !== undefined) return Number((level * 10 ** (value / 10)).toPrecision(15));
  if (si === "") throw new Error("a bare number takes no unit");
  const from = mathUnit(kind, unitText, usual);
  const inSi = from === si ? value : math.unit!(value, from).toNumber(si);
  const count = perCount(unitText);
  return inSi === value && count === 1 ? value : Number((inSi / count).toPrecision(15));
}

/** A quantity as it stands in its field: SI -> the text a person would have typed. */
export function asTyped(kind: QuantityKind, value: number): string {
  const figure = kinds[kind].show(value);
  return (
    figure.digits.replace(/\u2212/g, "-").replace(/\u202f/g, "") +
    (figure.unit && figure.unit !== "" ? ` ${figure.unit}` : "")
  );
}

/** Reads an impedance: "22-35j", "22 − j35 Ω", "j50", "75", "50∠-30°", "1.2k". Ohm. */
export function readImpedance(text: string): Read<{ re: number; im: number }> {
  const refuse = { ok: false, message: `“${text.trim()}” is not an impedance. Try 22-35j, 50 or 75∠-20°.` } as const;
  const given = tidy(text)
    .replace(/\s*(ohms?|Ω|\u2126)$/i, "")
    .replace(/\s+/g, "");
  const doubtful = /(?<![\d.,])[1-9]\d{0,2},\d{3}(?![\d,])/.exec(given)?.[0];
  if (doubtful)
    return {
      ok: false,
      message: `Is “${doubtful}” a thousand or a decimal? Write it with a point, or without the comma.`,
    };
  const typed = given.replace(/(\d),(\d)/g, "$1.$2");
  if (typed === "") return { ok: false, message: "Type an impedance, for example 22-35j." };
  const polarForm = /^([\d.]+(?:e[+-]?\d+)?)(?:∠|<|@)([+-]?[\d.]+)°?$/i.exec(typed);
  if (polarForm) {
    const [r, phi] = [Number(polarForm[1]), (Number(polarForm[2]) * Math.PI) / 180];
    return impedanceRead(r * Math.cos(phi), r * Math.sin(phi)) ?? refuse;
  }
  const bare = /^([+-]?[\d.]+)k$/i.exec(typed);
  if (bare) return impedanceRead(Number(bare[1]) * 1000, 0) ?? refuse;
  const spelled = typed.replace(/([+-]|^)[ji](\d[\d.]*(?:e[+-]?\d+)?)/gi, "$1$2i").replace(/j/gi, "i");
  try {
    const value = math.complex!(spelled) as unknown as { re: number; im: number };
    return impedanceRead(value.re, value.im) ?? refuse;
  } catch {
    return refuse;
  }
}

function impedanceRead(re: number, im: number): Read<{ re: number; im: number }> | null {
  if (!Number.isFinite(re) || !Number.isFinite(im)) return null;
  const decimals = [re, im].some((v) => Math.abs(v * 10 - Math.round(v * 10)) > 1e-9) ? 2 : 1;
  return { ok: true, value: { re, im }, understood: inWords(impedance({ re, im }, decimals)) };
}

/** An impedance as it stands in its field. */
export function impedanceAsTyped(value: { re: number; im: number }): string {
  const part = (v: number) => String(Number(v.toPrecision(8)));
  if (value.im === 0) return part(value.re);
  return `${part(value.re)}${value.im < 0 ? "-" : "+"}${part(Math.abs(value.im))}j`;
}
