import { expect, test } from "vitest";
import {
  cutLength,
  decibels,
  decimalsFor,
  digits,
  frequency,
  impedance,
  inWords,
  metres,
  ratio,
  scaled,
  significantDigits,
  spoken,
} from "@/lib/format/quantity";

const words = (figure: Parameters<typeof inWords>[0]) => inWords(figure).replace(/\u00a0/g, " ");

test("digits(value, decimals) sets a true minus, thin thousands and never a negative zero", () => {
  expect(digits(-9.64, 1)).toBe("\u22129.6");
  expect(digits(-0.001, 1)).toBe("0.0");
  expect(digits(12345.6, 1)).toBe("12\u202f345.6");
  expect(digits(1234, 0)).toBe("1234");
});

test.each([null, undefined, NaN, Infinity, -Infinity])(
  "what has no finite number, %s, is a dash and never its name",
  (value) => {
    expect(digits(value, 2)).toBe("–");
    expect(words(decibels(value))).toBe("– dB");
    expect(words(scaled("voltage", value))).toBe("– V");
    expect(words(frequency(value))).toBe("– Hz");
  },
);

test.each([
  [350e-9, "inductance", "350.0 nH"],
  [132e-12, "capacitance", "132.0 pF"],
  [57.6, "voltage", "57.60 V"],
  [0.8, "current", "800.0 mA"],
  [999.96, "power", "1.000 kW"],
  [72.8e-6, "time", "72.80 µs"],
  [0, "power", "0 W"],
] as const)("scaled(%s) as %s picks the unit of its own size", (value, kind, expected) => {
  expect(words(scaled(kind, value))).toBe(expected);
});

test("a frequency keeps the digits it was given and no more", () => {
  expect(words(frequency(27.2e6))).toBe("27.2 MHz");
  expect(words(frequency(1575.42e6))).toBe("1.57542 GHz");
  expect(words(frequency(60))).toBe("60 Hz");
});

test("an impedance is set tight and a vanishing reactance is left out", () => {
  expect(words(impedance({ re: 31, im: -9.6 }))).toBe("31.0\u2212j9.6 Ω");
  expect(words(impedance({ re: 50, im: 1e-9 }))).toBe("50.0 Ω");
  expect(words(impedance({ re: Infinity, im: 0 }))).toBe("– Ω");
});

test("a cut length is whole millimetres below a metre and metres to the millimetre above", () => {
  expect(words(cutLength(0.2694))).toBe("269 mm");
  expect(words(cutLength(1.2345))).toBe("1.234 m");
  expect(words(cutLength(0.9999))).toBe("1.000 m");
});

test("VSWR beyond a hundred says so instead of giving digits", () => {
  expect(words(ratio(1.873))).toBe("1.87");
  expect(words(ratio(1e9))).toBe("over 100");
  expect(words(ratio(null))).toBe("–");
});

test("a screen reader hears the unit in words", () => {
  expect(spoken(metres(38.6))).toBe("38.60 metres");
});

test("every finite number can be written, however small or large", () => {
  for (let power = -323; power <= 308; power++)
    for (const value of [Number(`1e${power}`), Number(`-7.77e${power}`)]) {
      expect(significantDigits(value, 4)).not.toMatch(/NaN|Infinity/);
      expect(digits(value, 3)).not.toMatch(/NaN|Infinity/);
      expect(scaled("power", value).digits).not.toMatch(/NaN|Infinity/);
    }
  expect(significantDigits(1.234e-110, 3)).toBe("1.23×10⁻¹¹⁰");
  expect(Number.isFinite(decimalsFor(5e-324, 4))).toBe(true);
});
