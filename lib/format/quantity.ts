/**
 * SI number -> figure and unit for a reader. The only place that rounds. Reading what people type is `read-quantity.ts`;
 * this file does not load mathjs, so that a page which only shows figures stays light.
 */

import { withPowerOfTen } from "@/lib/format/power-of-ten";

/** A figure ready to show: the digits, the unit beside them, and the unit in words for a screen reader. */
export interface Figure {
  digits: string;
  unit: string;
  spoken: string;
}

export const notComputed = "–";
const minus = "\u2212";
const thinSpace = "\u202f";
const mostDecimals = 20;

/** Digits with a true minus and thin spaces between thousands; a dash for what has no finite number. */
export function digits(value: number | null | undefined, decimals: number): string {
  if (value == null || !Number.isFinite(value)) return notComputed;
  const rounded = Math.abs(value).toFixed(Math.min(decimals, mostDecimals));
  const [whole = "0", fraction] = rounded.split(".");
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, thinSpace) : whole;
  const isZero = Number(rounded) === 0;
  return `${value < 0 && !isZero ? minus : ""}${grouped}${fraction ? `.${fraction}` : ""}`;
}

/** Decimals that leave `significant` digits of a value; never more than can be read. */
export function decimalsFor(value: number, significant: number): number {
  if (!Number.isFinite(value) || value === 0) return 0;
  const magnitude = Math.floor(Math.log10(Math.abs(Number(value.toPrecision(significant)))));
  return Math.min(mostDecimals, Math.max(0, significant - 1 - magnitude));
}

/** Digits with a fixed count of significant figures; what is too small to write out is written with a power of ten. */
export function significantDigits(value: number | null | undefined, significant: number): string {
  if (value == null || !Number.isFinite(value)) return notComputed;
  if (value !== 0 && Math.abs(value) < 1e-12) return withPowerOfTen(value, significant);
  return digits(value, decimalsFor(value, significant));
}

/** "0.660" → "0.66", "90.000" → "90"; whole numbers stay. */
export function withoutTrailingZeros(text: string): string {
  return text.includes(".") ? text.replace(/\.?0+$/, "") : text;
}

/** A figure as people write it by hand: without zeros that say nothing. */
export function trimmed(figure: Figure): Figure {
  return { ...figure, digits: withoutTrailingZeros(figure.digits) };
}

interface Unit {
  symbol: string;
  factor: number;
  spoken: string;
}

const scales = {
  frequency: [
    { symbol: "GHz", factor: 1e9, spoken: "gigahertz" },
    { symbol: "MHz", factor: 1e6, spoken: "megahertz" },
    { symbol: "kHz", factor: 1e3, spoken: "kilohertz" },
    { symbol: "Hz", factor: 1, spoken: "hertz" },
  ],
  time: [
    { symbol: "s", factor: 1, spoken: "seconds" },
    { symbol: "ms", factor: 1e-3, spoken: "milliseconds" },
    { symbol: "µs", factor: 1e-6, spoken: "microseconds" },
    { symbol: "ns", factor: 1e-9, spoken: "nanoseconds" },
    { symbol: "ps", factor: 1e-12, spoken: "picoseconds" },
  ],
  power: [
    { symbol: "MW", factor: 1e6, spoken: "megawatts" },
    { symbol: "kW", factor: 1e3, spoken: "kilowatts" },
    { symbol: "W", factor: 1, spoken: "watts" },
    { symbol: "mW", factor: 1e-3, spoken: "milliwatts" },
    { symbol: "µW", factor: 1e-6, spoken: "microwatts" },
  ],
  voltage: [
    { symbol: "kV", factor: 1e3, spoken: "kilovolts" },
    { symbol: "V", factor: 1, spoken: "volts" },
    { symbol: "mV", factor: 1e-3, spoken: "millivolts" },
    { symbol: "µV", factor: 1e-6, spoken: "microvolts" },
  ],
  current: [
    { symbol: "kA", factor: 1e3, spoken: "kiloamperes" },
    { symbol: "A", factor: 1, spoken: "amperes" },
    { symbol: "mA", factor: 1e-3, spoken: "milliamperes" },
    { symbol: "µA", factor: 1e-6, spoken: "microamperes" },
  ],
  inductance: [
    { symbol: "H", factor: 1, spoken: "henries" },
    { symbol: "mH", factor: 1e-3, spoken: "millihenries" },
    { symbol: "µH", factor: 1e-6, spoken: "microhenries" },
    { symbol: "nH", factor: 1e-9, spoken: "nanohenries" },
  ],
  capacitance: [
    { symbol: "F", factor: 1, spoken: "farads" },
    { symbol: "mF", factor: 1e-3, spoken: "millifarads" },
    { symbol: "µF", factor: 1e-6, spoken: "microfarads" },
    { symbol: "nF", factor: 1e-9, spoken: "nanofarads" },
    { symbol: "pF", factor: 1e-12, spoken: "picofarads" },
  ],
  resistance: [
    { symbol: "MΩ", factor: 1e6, spoken: "megohms" },
    { symbol: "kΩ", factor: 1e3, spoken: "kilohms" },
    { symbol: "Ω", factor: 1, spoken: "ohms" },
  ],
} satisfies Record<string, Unit[]>;

export type Scaled = keyof typeof scales;

export function unitFor(kind: Scaled, value: number): Unit {
  const units: Unit[] = scales[kind];
  const size = Math.abs(value) * (1 + 1e-12);
  const last = units[units.length - 1] as Unit;
  if (size === 0) return units.find((unit) => unit.factor === 1) ?? last;
  return units.find((unit) => size >= unit.factor) ?? last;
}

const dash = (kind: Scaled): Figure => {
  const unit = unitFor(kind, 1);
  return { digits: notComputed, unit: unit.symbol, spoken: unit.spoken };
};

/** A quantity in the unit of its own size: 27.2 MHz, 350 nH, 72.8 µs. `significant` digits, default 4. */
export function scaled(kind: Scaled, value: number | null | undefined, significant = 4): Figure {
  if (value == null || !Number.isFinite(value)) return dash(kind);
  // The unit of the rounded value: 999.96 ns is 1.000 µs, not 1000 ns.
  const unit = unitFor(kind, Number(value.toPrecision(significant)));
  return { digits: significantDigits(value / unit.factor, significant), unit: unit.symbol, spoken: unit.spoken };
}

/** A frequency as people write it: no trailing zeros, up to seven digits, 27.2 MHz and 1.57542 GHz. */
export function frequency(value: number | null | undefined): Figure {
  if (value == null || !Number.isFinite(value)) return dash("frequency");
  const unit = unitFor("frequency", value);
  const short = Number((value / unit.factor).toPrecision(7));
  const decimals = short.toString().includes("e") ? 0 : (short.toString().split(".")[1]?.length ?? 0);
  return { digits: digits(short, decimals), unit: unit.symbol, spoken: unit.spoken };
}

/** Digits of a frequency in MHz, to the kilohertz where it needs them: for axes and tables whose head says MHz. */
export function megahertz(value: number): string {
  const short = Number((value / 1e6).toFixed(3));
  return digits(short, short.toString().split(".")[1]?.length ?? 0);
}

export function decibels(value: number | null | undefined, decimals = 2): Figure {
  return { digits: digits(value, decimals), unit: "dB", spoken: "decibels" };
}

/** Metres to the centimetre. */
export function metres(value: number | null | undefined, decimals = 2): Figure {
  return { digits: digits(value, decimals), unit: "m", spoken: "metres" };
}

/** A length to be cut: whole millimetres under a metre, metres to the millimetre above. */
export function cutLength(value: number | null | undefined): Figure {
  if (value != null && Math.abs(value) < 0.9995)
    return { digits: digits(value * 1000, 0), unit: "mm", spoken: "millimetres" };
  return metres(value, 3);
}

export function nanoseconds(value: number | null | undefined, decimals = 1): Figure {
  return { digits: digits(value == null ? value : value * 1e9, decimals), unit: "ns", spoken: "nanoseconds" };
}

/** VSWR, two decimals; beyond 100 the digits mean nothing more, so it says over 100. */
export function ratio(value: number | null | undefined, decimals = 2): Figure {
  if (value != null && value > 100) return { digits: "over 100", unit: "", spoken: "" };
  return { digits: digits(value, decimals), unit: "", spoken: "" };
}

/** An impedance set tight: 31.0−j9.6. */
export function impedance(value: { re: number; im: number } | null | undefined, decimals = 1): Figure {
  const unit = { unit: "Ω", spoken: "ohms" };
  if (!value || !Number.isFinite(value.re) || !Number.isFinite(value.im)) return { digits: notComputed, ...unit };
  const reactance = digits(Math.abs(value.im), decimals);
  if (Number(Math.abs(value.im).toFixed(decimals)) === 0) return { digits: digits(value.re, decimals), ...unit };
  return { digits: `${digits(value.re, decimals)}${value.im < 0 ? minus : "+"}j${reactance}`, ...unit };
}

/** Figure and unit in one string, for sentences and names. */
export function inWords(figure: Figure): string {
  return figure.unit ? `${figure.digits}\u00a0${figure.unit}` : figure.digits;
}

/** Figure and spelt-out unit, for screen readers. */
export function spoken(figure: Figure): string {
  return figure.spoken ? `${figure.digits} ${figure.spoken}` : figure.digits;
}
