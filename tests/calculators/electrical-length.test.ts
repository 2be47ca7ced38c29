import { expect, test } from "vitest";
import { readGivenLength } from "@/lib/calculators/electrical-length";
import { readWantedReactance, wantedOhm } from "@/lib/calculators/reactance-wanted";
import * as reader from "@/lib/format/read-quantity";

test.each([
  ["90°", Math.PI / 2, "90° or 0.25 λ"],
  ["90 deg", Math.PI / 2, "90° or 0.25 λ"],
  ["22,5 degrees", Math.PI / 8, "22.5° or 0.0625 λ"],
  ["λ/4", Math.PI / 2, "90° or 0.25 λ"],
  ["λ / 20", Math.PI / 10, "18° or 0.05 λ"],
  ["3λ/4", (3 * Math.PI) / 2, "270° or 0.75 λ"],
  ["0.0815 λ", 0.163 * Math.PI, "29.34° or 0.0815 λ"],
  ["1/4 wave", Math.PI / 2, "90° or 0.25 λ"],
  ["half wave", Math.PI, "180° or 0.5 λ"],
  ["a quarter-wavelength", Math.PI / 2, "90° or 0.25 λ"],
  ["2 wavelengths", 4 * Math.PI, "720° or 2 λ"],
  ["1.5 rad", 1.5, "85.944° or 0.23873 λ"],
])("readGivenLength(%j) is an angle", (text, radians, understood) => {
  const read = readGivenLength(text, reader);
  expect(read).toMatchObject({ ok: true, understood, value: { kind: "angle" } });
  if (read.ok && read.value.kind === "angle") expect(read.value.radians).toBeCloseTo(radians, 12);
});

test.each([
  ["24.3 ns", { kind: "delay", seconds: 24.3e-9 }],
  ["1.2 µs", { kind: "delay", seconds: 1.2e-6 }],
  ["18 m", { kind: "length", metres: 18 }],
  ["610 mm", { kind: "length", metres: 0.61 }],
  ["2 ft", { kind: "length", metres: 0.6096 }],
])("readGivenLength(%j) tells metres from time", (text, value) => {
  const read = readGivenLength(text, reader);
  expect(read.ok && read.value).toEqual(value);
});

test.each([
  ["", /Type a length/],
  ["90", /Degrees, wavelengths, time or metres/],
  ["0°", /More than 0/],
  ["0 mm", /More than 0/],
  ["-3 m", /More than 0/],
  ["λ/0", /More than 0/],
  ["90 parsnips", /not a length of line/],
])("readGivenLength(%j) is refused with a sentence", (text, message) => {
  expect(readGivenLength(text, reader)).toEqual({ ok: false, message: expect.stringMatching(message) });
});

test.each([
  ["j50", 50, "+j50\u00a0Ω"],
  ["50j", 50, "+j50\u00a0Ω"],
  ["-j35", -35, "\u2212j35\u00a0Ω"],
  ["− j 35 Ω", -35, "\u2212j35\u00a0Ω"],
  ["50", 50, "+j50\u00a0Ω"],
  ["+120 ohms", 120, "+j120\u00a0Ω"],
  ["0", 0, "+j0\u00a0Ω"],
  ["350 nH", 2 * Math.PI * 27.2e6 * 350e-9, "350\u00a0nH"],
  ["132 pF", -1 / (2 * Math.PI * 27.2e6 * 132e-12), "132\u00a0pF"],
])("readWantedReactance(%j) is that reactance at 27.2 MHz", (text, ohm, understood) => {
  const read = readWantedReactance(text, reader);
  expect(read).toMatchObject({ ok: true, understood });
  if (read.ok) expect(wantedOhm(read.value, 27.2e6)).toBeCloseTo(ohm, 9);
});

test.each(["", "j", "jj50", "j50j", "50-35j", "350 nH m", "much", "1e12"])(
  "readWantedReactance(%j) is refused with a sentence",
  (text) => {
    expect(readWantedReactance(text, reader)).toEqual({ ok: false, message: expect.stringMatching(/reactance|GΩ/) });
  },
);
