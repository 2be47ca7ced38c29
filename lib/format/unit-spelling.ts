/** How people spell units -> how mathjs spells them. */

export type QuantityKind =
  | "length"
  | "frequency"
  | "temperature"
  | "power"
  | "resistance"
  | "inductance"
  | "capacitance"
  | "time"
  | "voltage"
  | "current"
  | "loss"
  | "lossPerLength"
  | "capacitancePerLength"
  | "inductancePerLength"
  | "resistancePerLength"
  | "timePerLength"
  | "number";

const unitSpellings: [RegExp, string][] = [
  [/^[Ωω\u2126]|^ohms?$/i, "ohm"],
  [/^(k|M)(Ω|\u2126)$/, "$1ohm"],
  [/^(milli|centi|kilo)?(metres?|meters?|metters?)$/i, "$1meter"],
  [/^mm$/i, "mm"],
  [/^millimet(re|er)s?$|^milimet(re|er)s?$/i, "mm"],
  [/^(feet|foot|ft\.?|'|′)$/i, "ft"],
  [/^(inch(es)?|in\.?|"|″|'')$/i, "inch"],
  [/^(yards?|yd)$/i, "yard"],
  [/^(g|gig|ghz)$/i, "GHz"],
  [/^(meg|mhz)$/i, "MHz"],
  [/^khz$/i, "kHz"],
  [/^hz$/i, "Hz"],
  [/^(°|deg ?|degrees? ?)?c(elsius)?$/i, "degC"],
  [/^(°|deg ?|degrees? ?)?f(ahrenheit)?$/i, "degF"],
  [/^db$/i, "dB"],
  [/^nep(er)?s?$|^np$/i, "Np"],
  [/^(watts?)$/i, "W"],
  [/^kw$/i, "kW"],
  [/^(volts?)$/i, "V"],
];

/** Letters after a number that mean a size, by kind: nobody means millihertz. */
const bareSizes: Partial<Record<QuantityKind, Record<string, string>>> = {
  frequency: { k: "kHz", K: "kHz", m: "MHz", M: "MHz", G: "GHz" },
  resistance: { k: "kohm", K: "kohm", M: "Mohm", R: "ohm" },
  power: { k: "kW", m: "mW", M: "MW", w: "W" },
  inductance: { n: "nH", u: "uH", µ: "uH", m: "mH" },
  capacitance: { p: "pF", n: "nF", u: "uF", µ: "uF" },
  time: { n: "ns", u: "us", µ: "us", p: "ps", m: "ms" },
};

/**
 * mathjs spelling of a typed unit.
 * @param usual - what is meant when no unit is typed
 */
export function mathUnit(kind: QuantityKind, text: string, usual: string): string {
  if (text === "") return usual;
  const sizes = bareSizes[kind] ?? {};
  const size = Object.hasOwn(sizes, text) ? sizes[text] : undefined;
  if (size) return size;
  const micro = text.replace(/[µμ]/g, "u").replace(/\u2126/g, "Ω");
  const [over, under] = micro.split("/").map((part) => part.trim());
  const one = (part: string) => {
    for (const [pattern, to] of unitSpellings) if (pattern.test(part)) return part.replace(pattern, to);
    return part.replace(/Ω/g, "ohm");
  };
  if (under === undefined) return one(over ?? "");
  const count = /^(\d+)\s*(.*)$/.exec(under);
  return `${one(over ?? "")}/${one(count ? (count[2] ?? "") : under)}`;
}

/** "100" in "dB/100 ft" divides the number: mathjs has no such unit. */
export function perCount(unitText: string): number {
  const count = /\/\s*(\d+)\s*[a-z'"′″]/i.exec(unitText);
  return count ? Number(count[1]) : 1;
}
