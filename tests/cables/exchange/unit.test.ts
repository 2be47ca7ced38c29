import { describe, expect, test } from "vitest";
import { moved, shiftedText } from "@/lib/cables/exchange/decimal";
import { inSi, isUnitOf, siOf } from "@/lib/cables/exchange/unit";
import { readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";
import fc from "@/tests/support/property";

const spelled: Partial<Record<QuantityKind, string[]>> = {
  length: ["m", "mm", "cm", "in", "inch", '"', "ft", "feet", "yd"],
  frequency: ["Hz", "kHz", "MHz", "GHz", "mhz"],
  resistance: ["Ω", "ohm", "Ohms", "kΩ", "mΩ"],
  voltage: ["V", "kV"],
  lossPerLength: [
    "dB/100 m",
    "dB/100m",
    "dB/km",
    "dB/m",
    "dB/100 ft",
    "dB/100ft",
    "dB/ft",
    "Np/km",
    "Np/m",
    "db/100 feet",
  ],
  capacitancePerLength: ["pF/m", "pF/ft", "nF/km", "nF/100 m", "µF/km"],
  inductancePerLength: ["nH/m", "µH/m", "uH/ft", "mH/km"],
  resistancePerLength: ["Ω/km", "mΩ/m", "ohm/100m", "Ω/1000 ft", "ohms/km"],
  timePerLength: ["ns/m", "ns/ft", "µs/km", "ps/m", "ns/100 m"],
};
const cases = Object.entries(spelled).flatMap(([kind, units]) =>
  units.map((unit) => [kind as QuantityKind, unit] as const),
);

describe("A unit of a table", () => {
  test.each(cases)("of %s, %s, is worth what the house's reader of quantities says", (kind, unit) => {
    const read = readQuantity(kind, `7.25 ${unit}`);
    expect(read.ok).toBe(true);
    const [ours, theirs] = [inSi(kind, "7.25", unit), read.ok ? read.value : NaN];
    // Fifteen digits are kept where the factor is no power of ten.
    expect(Math.abs(ours / theirs - 1)).toBeLessThan(1e-14);
  });

  test("of temperature is Celsius or Fahrenheit", () => {
    expect([
      inSi("temperature", "-40", "°F"),
      inSi("temperature", "212", "F"),
      inSi("temperature", "75", "°C"),
    ]).toEqual([-40, 100, 75]);
    expect(isUnitOf("temperature", "K")).toBe(false);
  });

  test.each<[QuantityKind, string]>([
    ["lossPerLength", "dB"],
    ["lossPerLength", "pF/m"],
    ["capacitancePerLength", "F"],
    ["capacitancePerLength", "pF/s"],
    ["length", "Hz"],
    ["length", "5 m"],
    ["resistance", "Ω/km"],
    ["frequency", ""],
    ["resistance", "__proto__"],
    ["resistance", "constructorohm"],
  ])("of %s is not %s", (kind, unit) => {
    expect(siOf(kind, unit)).toBeUndefined();
  });
});

test("A number written with its point moved reads back as the very same number", () => {
  fc.assert(
    fc.property(
      fc.double({ noNaN: true, noDefaultInfinity: true }),
      fc.integer({ min: -15, max: 15 }),
      (value, shift) => {
        expect(moved(shiftedText(value, shift), -shift)).toBe(value + 0);
      },
    ),
    { numRuns: 5_000 },
  );
  expect(shiftedText(78.5e-12, 12)).toBe("78.5");
  expect(shiftedText(0.0086, 3)).toBe("8.6");
  expect(shiftedText(-40, 0)).toBe("-40");
});

test("What is no number is none", () => {
  for (const text of ["", ".", "1.2.3", "1,2", "0x10", "Infinity", "NaN", "1e", "--1", "1 2"])
    expect(moved(text, 0)).toBeNaN();
});
