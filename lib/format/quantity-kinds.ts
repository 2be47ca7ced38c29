/** The quantities people type: what each is called, its units, and how it is written back. */
import { frequency, scaled, significantDigits, trimmed, type Figure } from "@/lib/format/quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

interface Kind {
  /** mathjs expression of the SI unit the answer is in; empty for a bare number */
  si: string;
  /** unit taken when none is typed */
  usual: string;
  what: string;
  example: string;
  show: (value: number) => Figure;
}

const plain = (unit: string) => (value: number) => trimmed({ digits: significantDigits(value, 6), unit, spoken: unit });

export const kinds: Record<QuantityKind, Kind> = {
  length: {
    si: "m",
    usual: "m",
    what: "a length",
    example: "36 m or 118 ft",
    show: (v) => (v < 1 && v > 0 ? plain("mm")(v * 1000) : plain("m")(v)),
  },
  frequency: { si: "Hz", usual: "MHz", what: "a frequency", example: "27.2 MHz", show: frequency },
  temperature: { si: "degC", usual: "degC", what: "a temperature", example: "20 °C or 68 °F", show: plain("°C") },
  power: { si: "W", usual: "W", what: "a power", example: "200 W", show: (v) => trimmed(scaled("power", v, 6)) },
  resistance: {
    si: "ohm",
    usual: "ohm",
    what: "a resistance",
    example: "50 Ω",
    show: (v) => trimmed(scaled("resistance", v, 6)),
  },
  inductance: {
    si: "H",
    usual: "nH",
    what: "an inductance",
    example: "350 nH",
    show: (v) => trimmed(scaled("inductance", v, 6)),
  },
  capacitance: {
    si: "F",
    usual: "pF",
    what: "a capacitance",
    example: "132 pF",
    show: (v) => trimmed(scaled("capacitance", v, 6)),
  },
  time: { si: "s", usual: "ns", what: "a time", example: "50 ns", show: (v) => trimmed(scaled("time", v, 6)) },
  voltage: { si: "V", usual: "V", what: "a voltage", example: "300 V", show: (v) => trimmed(scaled("voltage", v, 6)) },
  loss: { si: "dB", usual: "dB", what: "a loss", example: "2.2 dB", show: plain("dB") },
  current: { si: "A", usual: "A", what: "a current", example: "35 mA", show: (v) => trimmed(scaled("current", v, 6)) },
  lossPerLength: {
    si: "dB/m",
    usual: "dB/hm",
    what: "a loss per length",
    example: "4.1 dB/100 m",
    show: (v) => plain("dB/100 m")(v * 100),
  },
  capacitancePerLength: {
    si: "F/m",
    usual: "pF/m",
    what: "a capacitance per length",
    example: "100 pF/m",
    show: (v) => plain("pF/m")(v * 1e12),
  },
  inductancePerLength: {
    si: "H/m",
    usual: "nH/m",
    what: "an inductance per length",
    example: "250 nH/m",
    show: (v) => plain("nH/m")(v * 1e9),
  },
  resistancePerLength: {
    si: "ohm/m",
    usual: "ohm/km",
    what: "a resistance per length",
    example: "8.6 Ω/km",
    show: (v) => plain("Ω/km")(v * 1e3),
  },
  timePerLength: {
    si: "s/m",
    usual: "ns/m",
    what: "a delay per length",
    example: "3.92 ns/m",
    show: (v) => plain("ns/m")(v * 1e9),
  },
  number: { si: "", usual: "", what: "a number", example: "1.5", show: plain("") },
};
