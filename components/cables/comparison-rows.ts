/** The rows of a comparison: what is compared, and how each figure is written. */
import type { CompareFigures, CompareQuantity } from "@/lib/cables/compare";
import { digits, frequency, inWords, scaled, significantDigits, type Figure } from "@/lib/format/quantity";

export interface ComparisonRow {
  name: string;
  quantity: CompareQuantity;
  figure: (value: number | null) => Figure;
  /** a difference in per cent says nothing of it */
  isBare?: boolean;
}

const plain =
  (decimals: number, unit: string, factor = 1) =>
  (value: number | null): Figure => ({
    digits: digits(value === null ? null : value * factor, decimals),
    unit,
    spoken: unit,
  });
const significant =
  (count: number, unit: string, factor = 1) =>
  (value: number | null): Figure => ({
    digits: significantDigits(value === null ? null : value * factor, count),
    unit,
    spoken: unit,
  });

/** @param lossAtHz - frequency of the loss that was asked for */
export function comparisonRows(lossAtHz: number): ComparisonRow[] {
  const loss = plain(2, "dB/100 m");
  return [
    { name: `Loss at ${inWords(frequency(lossAtHz))}`, quantity: "lossDbPer100m", figure: loss },
    { name: "Loss at 10 MHz", quantity: "lossLowDbPer100m", figure: loss },
    { name: "Loss at 1 GHz", quantity: "lossHighDbPer100m", figure: loss },
    { name: "Impedance", quantity: "z0Ohm", figure: plain(1, "Ω") },
    { name: "Velocity factor", quantity: "velocityFactor", figure: plain(3, "") },
    { name: "Delay", quantity: "delaySPerM", figure: plain(2, "ns/m", 1e9) },
    { name: "Capacitance", quantity: "capacitanceFPerM", figure: plain(1, "pF/m", 1e12) },
    { name: "Inductance", quantity: "inductanceHPerM", figure: plain(0, "nH/m", 1e9) },
    { name: "Loop resistance, dc", quantity: "loopResistanceOhmPerM", figure: significant(3, "mΩ/m", 1e3) },
    { name: "Outer diameter", quantity: "outerDiameterMm", figure: plain(1, "mm") },
    { name: "Bend radius, least", quantity: "minBendMm", figure: plain(0, "mm") },
    { name: "Rated up to", quantity: "maxFrequencyHz", figure: (value) => frequency(value) },
    { name: "Highest voltage", quantity: "maxVoltageV", figure: (value) => scaled("voltage", value, 3) },
    { name: "Lowest temperature", quantity: "minTemperatureC", figure: plain(0, "°C"), isBare: true },
    { name: "Highest temperature", quantity: "maxTemperatureC", figure: plain(0, "°C"), isBare: true },
  ];
}

/** Rows of which at least one cable says something. */
export function toldRows(rows: readonly ComparisonRow[], figures: readonly CompareFigures[]): ComparisonRow[] {
  return rows.filter(({ quantity }) => figures.some((each) => each[quantity] !== null));
}
