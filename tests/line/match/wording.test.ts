import { expect, test } from "vitest";
import { countWord, decibelText, figure, frequencyText, lengthText, listText, ohmText } from "@/lib/line/match/wording";

const plain = (text: string) => text.replaceAll("\u00a0", " ");

test.each([
  [350.04e-9, "H", 3, "350 nH"],
  [132.1e-12, "F", 3, "132 pF"],
  [0.99996e-6, "H", 3, "1.00 µH"],
  [56e-9, "H", 2, "56 nH"],
  [360e-9, "H", 2, "360 nH"],
  [86.602, "Ω", 3, "86.6 Ω"],
  [1234, "Ω", 3, "1.23 kΩ"],
  [4.5e-15, "F", 3, "0.00450 pF"],
  [0, "Hz", 3, "0 Hz"],
])("figure(%s, %s, %i) is written %s", (value, unit, digits, text) => {
  expect(plain(figure(value, unit, digits))).toBe(text);
});

test.each([
  [27.2e6, "27.2 MHz"],
  [452e6, "452 MHz"],
  [1575.42e6, "1.57542 GHz"],
  [187.5e3, "187.5 kHz"],
  [50, "50 Hz"],
  [0.2, "0.2 Hz"],
])("a frequency of %s Hz is written %s", (value, text) => {
  expect(plain(frequencyText(value))).toBe(text);
});

test("lengths are whole millimetres under a metre and metres to the millimetre above", () => {
  expect([0.2694, 0.9994, 0.9996, 3.7].map((each) => plain(lengthText(each)))).toEqual([
    "269 mm",
    "999 mm",
    "1.000 m",
    "3.700 m",
  ]);
});

test("resistances, decibels, counts and lists are written as in a sentence", () => {
  expect(plain(ohmText(50))).toBe("50.0 Ω");
  expect(plain(decibelText(14.049))).toBe("14.0 dB");
  expect([2, 3, 4, 9].map(countWord)).toEqual(["Two", "Three", "Four", "9"]);
  expect(listText([])).toBe("");
  expect(listText(["a"])).toBe("a");
  expect(listText(["a", "b", "c"])).toBe("a, b and c");
  expect(listText(["a", "b"], "or")).toBe("a or b");
});
