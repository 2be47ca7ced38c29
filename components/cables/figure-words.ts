/** What an entry's figures are called and in which unit they are shown. */
import { digits, frequency, inWords, significantDigits } from "@/lib/format/quantity";
import type { Figure } from "@/lib/cables/schema";

interface Named {
  name: string;
  unit: string;
  /** SI times this is the unit */
  perSi: number;
  show: (value: number) => string;
}

const fixed = (decimals: number) => (value: number) => digits(value, decimals);
const significant = (count: number) => (value: number) => significantDigits(value, count);

const known: Record<string, Named> = {
  z0Ohm: { name: "Impedance", unit: "Ω", perSi: 1, show: fixed(1) },
  velocityFactor: { name: "Velocity factor", unit: "", perSi: 1, show: fixed(3) },
  cFPerM: { name: "Capacitance", unit: "pF/m", perSi: 1e12, show: fixed(1) },
  lInfHPerM: { name: "Inductance", unit: "nH/m", perSi: 1e9, show: fixed(0) },
  delaySPerM: { name: "Delay", unit: "ns/m", perSi: 1e9, show: fixed(2) },
  r0OhmPerM: { name: "Loop resistance, dc", unit: "mΩ/m", perSi: 1e3, show: significant(3) },
  conductorOhmPerM: { name: "Resistance of one conductor, dc", unit: "mΩ/m", perSi: 1e3, show: significant(3) },
  lMeterHPerM: { name: "Inductance, as read", unit: "nH/m", perSi: 1e9, show: fixed(0) },
  rMeterOhmPerM: { name: "Loop resistance, as read", unit: "mΩ/m", perSi: 1e3, show: significant(3) },
  lossDbPerM: { name: "Loss", unit: "dB/100 m", perSi: 100, show: significant(3) },
  lossTangent: { name: "Loss tangent", unit: "", perSi: 1, show: significant(2) },
  delayPerK: { name: "Delay over temperature", unit: "ppm/K", perSi: 1e6, show: fixed(0) },
};

/** What a quantity is called; one nobody here has heard of keeps its own name. */
export function quantityName(quantity: string): string {
  return Object.hasOwn(known, quantity) ? (known[quantity]?.name ?? quantity) : quantity;
}

function named(quantity: string): Named {
  const found = Object.hasOwn(known, quantity) ? known[quantity] : undefined;
  return found ?? { name: quantity, unit: "", perSi: 1, show: significant(4) };
}

/** "Loss at 100 MHz": a figure's name with the frequency it is meant at, where there is one and it matters. */
export function figureName({ quantity, fromHz, toHz }: Figure): string {
  const name = quantityName(quantity);
  return quantity === "lossDbPerM" && fromHz !== undefined && (toHz ?? fromHz) === fromHz
    ? `${name} at ${inWords(frequency(fromHz))}`
    : name;
}

/** A value in the unit it is shown in. */
export function figureValue(quantity: string, valueSi: number): { digits: string; unit: string } {
  const { unit, perSi, show } = named(quantity);
  return { digits: show(valueSi * perSi), unit };
}

/** "±2.0": a tolerance in the unit of its figure, with as many decimals as the figure. */
export function toleranceWords(quantity: string, toleranceSi: number): string {
  const { perSi, show } = named(quantity);
  return `±${show(toleranceSi * perSi)}`;
}

/** "20 °C, 1 MHz": what a figure holds for. */
export function conditionWords({ temperatureC, fromHz, toHz }: Figure): string {
  const words = temperatureC === undefined ? [] : [`${digits(temperatureC, 0)} °C`];
  if (fromHz !== undefined && (toHz === undefined || toHz === fromHz)) words.push(inWords(frequency(fromHz)));
  else if (fromHz !== undefined) words.push(`${inWords(frequency(fromHz))} to ${inWords(frequency(toHz))}`);
  return words.join(", ");
}
