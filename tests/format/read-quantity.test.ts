import { expect, test } from "vitest";
import { asTyped, impedanceAsTyped, readImpedance, readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

const understood: [QuantityKind, string, number, string][] = [
  ["length", "118 ft", 35.9664, "35.9664 m"],
  ["length", "36", 36, "36 m"],
  ["length", "36m", 36, "36 m"],
  ["length", "1,5 km", 1500, "1500 m"],
  ["length", "12' 6\"", 3.81, "3.81 m"],
  ["length", "12 ft 6 in", 3.81, "3.81 m"],
  ["length", "650mm", 0.65, "650 mm"],
  ["length", "± 10 mm", 0.01, "10 mm"],
  ["length", "10 milimeter", 0.01, "10 mm"],
  ["length", "2 metres", 2, "2 m"],
  ["length", "1 200 m", 1200, "1200 m"],
  ["frequency", "27.2 MHz", 27.2e6, "27.2 MHz"],
  ["frequency", "27.2mhz", 27.2e6, "27.2 MHz"],
  ["frequency", "27.2", 27.2e6, "27.2 MHz"],
  ["frequency", "145e6 Hz", 145e6, "145 MHz"],
  ["frequency", "1.57542 GHz", 1.57542e9, "1.57542 GHz"],
  ["frequency", "2.4G", 2.4e9, "2.4 GHz"],
  ["frequency", "450 M", 450e6, "450 MHz"],
  ["frequency", "31.25 kHz", 31250, "31.25 kHz"],
  ["temperature", "20 °C", 20, "20 °C"],
  ["temperature", "−20", -20, "−20 °C"],
  ["temperature", "68 F", 20, "20 °C"],
  ["power", "200 W", 200, "200 W"],
  ["power", "0.2kW", 200, "200 W"],
  ["resistance", "1.2k", 1200, "1.2 kΩ"],
  ["resistance", "50 ohms", 50, "50 Ω"],
  ["resistance", "50Ω", 50, "50 Ω"],
  ["inductance", "350 nH", 350e-9, "350 nH"],
  ["inductance", "0.35 µH", 350e-9, "350 nH"],
  ["capacitance", "132p", 132e-12, "132 pF"],
  ["capacitancePerLength", "100 pF/m", 100e-12, "100 pF/m"],
  ["capacitancePerLength", "30 pF/ft", 30e-12 / 0.3048, "98.4252 pF/m"],
  ["lossPerLength", "4.1 dB/100 m", 0.041, "4.1 dB/100 m"],
  ["lossPerLength", "4.1", 0.041, "4.1 dB/100 m"],
  ["lossPerLength", "3 dB/100ft", 3 / 30.48, "9.84252 dB/100 m"],
  ["lossPerLength", "0.1 Np/km", 0.1 * 8.685889638e-3, "0.0868589 dB/100 m"],
  ["lossPerLength", "41 dB/1000 m", 0.041, "4.1 dB/100 m"],
  ["inductancePerLength", "253", 253e-9, "253 nH/m"],
  ["inductancePerLength", "0.25 µH/m", 250e-9, "250 nH/m"],
  ["resistancePerLength", "8.6", 8.6e-3, "8.6 Ω/km"],
  ["resistancePerLength", "70 mΩ/m", 0.07, "70 Ω/km"],
  ["resistancePerLength", "9.4 Ω/100 m", 0.094, "94 Ω/km"],
  ["resistancePerLength", "16 ohm/1000 ft", 16 / 304.8, "52.4934 Ω/km"],
  ["timePerLength", "3.92", 3.92e-9, "3.92 ns/m"],
  ["timePerLength", "1.54 ns/ft", 1.54e-9 / 0.3048, "5.05249 ns/m"],
  ["current", "35 mA", 0.035, "35 mA"],
  ["power", "44 dBm", 1e-3 * 10 ** 4.4, "25.1189 W"],
  ["power", "-3dBW", 10 ** -0.3, "501.187 mW"],
  ["loss", "2.2", 2.2, "2.2 dB"],
  ["number", "1.5", 1.5, "1.5"],
];

test.each(understood)("readQuantity(%s, %j) is read as people mean it", (kind, text, value, words) => {
  const read = readQuantity(kind, text);
  expect(read.ok).toBe(true);
  if (!read.ok) return;
  expect(Math.abs(read.value - value)).toBeLessThan(1e-9 * Math.abs(value));
  expect(read.understood.replace(/\u00a0/g, " ")).toBe(words);
});

const refused: [QuantityKind, string, RegExp][] = [
  ["length", "", /Type a length/],
  ["length", "36 kg", /not a unit of length/],
  ["length", "27.2 MHz", /not a unit of length/],
  ["length", "long", /not a length/],
  ["length", "1,500", /thousand or a decimal/],
  ["length", "36 m; drop table", /not a/],
  ["frequency", "5 m 3", /not a frequency/],
  ["frequency", "1e400", /too large/],
  ["number", "1.5 m", /not a unit/],
];

test.each(refused)("readQuantity(%s, %j) is refused with a sentence", (kind, text, message) => {
  const read = readQuantity(kind, text);
  expect(read).toEqual({ ok: false, message: expect.stringMatching(message) });
});

test.each([
  ["22-35j", 22, -35],
  ["22 − j35 Ω", 22, -35],
  ["22 - j 35", 22, -35],
  ["22-35i", 22, -35],
  ["22+j35", 22, 35],
  ["j50", 0, 50],
  ["-j50", 0, -50],
  ["75", 75, 0],
  ["75 ohm", 75, 0],
  ["1.2k", 1200, 0],
  ["22,5-35,5j", 22.5, -35.5],
  ["50∠-30°", 43.30127, -25],
])("readImpedance(%j) is the impedance meant", (text, re, im) => {
  const read = readImpedance(text);
  expect(read.ok).toBe(true);
  if (!read.ok) return;
  expect(read.value.re).toBeCloseTo(re, 5);
  expect(read.value.im).toBeCloseTo(im, 5);
});

test.each(["", "abc", "22-", "22-35jj", "1/0", "22-35j+4k"])("readImpedance(%j) is refused with a sentence", (text) => {
  expect(readImpedance(text)).toEqual({ ok: false, message: expect.stringMatching(/impedance/) });
});

test("what a field shows is read back to the same value", () => {
  for (const [kind, value] of [
    ["length", 35.9664],
    ["length", 0.269],
    ["frequency", 27.2e6],
    ["power", 200],
    ["temperature", -20],
    ["inductance", 350e-9],
  ] as const) {
    const read = readQuantity(kind, asTyped(kind, value));
    expect(read.ok && Math.abs(read.value / value - 1) < 1e-6).toBe(true);
  }
  expect(readImpedance(impedanceAsTyped({ re: 22, im: -35 }))).toMatchObject({ ok: true, value: { re: 22, im: -35 } });
});

test.each(["1,234", "22-1,500j"])("readImpedance(%j) asks whether the comma is a thousand or a decimal", (text) => {
  expect(readImpedance(text)).toEqual({ ok: false, message: expect.stringMatching(/thousand or a decimal/) });
});
