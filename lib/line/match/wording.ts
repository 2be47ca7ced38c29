/**
 * The figures inside the sentences of a match: three digits and the unit of their size. Figures that a screen sets by
 * themselves are not written here.
 */
const space = "\u00a0";
const prefixes: [number, string][] = [
  [1e9, "G"],
  [1e6, "M"],
  [1e3, "k"],
  [1, ""],
  [1e-3, "m"],
  [1e-6, "µ"],
  [1e-9, "n"],
  [1e-12, "p"],
];

/** 350 nH, 27.2 MHz, 86.6 Ω: `digits` significant ones, trailing zeros kept. */
export function figure(value: number, unit: string, digits = 3): string {
  if (value === 0) return `0${space}${unit}`;
  const rounded = Number(value.toPrecision(digits));
  const [factor, prefix] = prefixes.find(([each]) => Math.abs(rounded) >= each * (1 - 1e-9)) ?? [1e-12, "p"];
  const scaled = rounded / factor;
  const before = Math.floor(Math.log10(Math.abs(scaled)) + 1e-9) + 1;
  return `${scaled.toFixed(Math.max(0, digits - before))}${space}${prefix}${unit}`;
}

/** A frequency without trailing zeros: 27.2 MHz, 452 MHz, 1.57542 GHz. */
export function frequencyText(hertz: number): string {
  const [factor, prefix] = prefixes.find(([each]) => each >= 1 && hertz >= each) ?? [1, ""];
  return `${Number((hertz / factor).toPrecision(7))}${space}${prefix}Hz`;
}

/** A length to cut: whole millimetres under a metre, else metres to the millimetre. */
export function lengthText(metres: number): string {
  return metres < 0.9995 ? `${(metres * 1000).toFixed(0)}${space}mm` : `${metres.toFixed(3)}${space}m`;
}

export function ohmText(ohms: number): string {
  return figure(ohms, "Ω");
}

/** A length in wavelengths: "0.125 λ". */
export function waveText(wavelengths: number): string {
  return `${wavelengths.toFixed(3)}${space}λ`;
}

export function decibelText(decibels: number): string {
  return `${decibels.toFixed(1)}${space}dB`;
}

const counts = ["No", "One", "Two", "Three", "Four", "Five", "Six"];
/** One, Two, Three … at the start of a title. */
export function countWord(count: number): string {
  return counts[count] ?? String(count);
}

/** "a", "a and b", "a, b and c"; or with "or". */
export function listText(items: readonly string[], word: "and" | "or" = "and"): string {
  if (items.length < 2) return items.join("");
  return `${items.slice(0, -1).join(", ")} ${word} ${items[items.length - 1]}`;
}
