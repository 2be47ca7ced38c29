import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { calculatorAddress, readAddress } from "@/lib/calculators/address";
import { attenuationInputs } from "@/lib/calculators/attenuation";
import { readInput, shownInputs, valuesOf, type Inputs } from "@/lib/calculators/input";
import { lengthInputs } from "@/lib/calculators/length";
import { mismatchInputs } from "@/lib/calculators/mismatch";
import { padInputs } from "@/lib/calculators/pad";
import { perLengthInputs } from "@/lib/calculators/per-length";
import { stubInputs } from "@/lib/calculators/stub";
import * as reader from "@/lib/format/read-quantity";

const calculators: [string, Inputs][] = [
  ["/calculate/per-length", perLengthInputs],
  ["/calculate/attenuation", attenuationInputs],
  ["/calculate/mismatch", mismatchInputs],
  ["/calculate/length", lengthInputs],
  ["/calculate/stub", stubInputs],
  ["/calculate/pad", padInputs],
];

/** Texts that people type into fields of all kinds; each field takes those that it can read. */
const typings = ["", "36", "0.83", "83 %", "1.2", "118 ft", "1,5 km", "27.2 MHz", "λ/4", "90°", "24 ns", "j50", "-j35"];
const moreTypings = [
  "22−35j",
  "75 Ω",
  "1.5:1",
  "14 dB",
  "44 dBm",
  "200 W",
  "67 pF/m",
  "9.4 Ω/100 m",
  "45 °C",
  "c50-f10",
];
const parametersOf = (address: string) => Object.fromEntries(new URL(address, "http://x").searchParams);

test.each(calculators)("%s: every state that can be typed comes back from its own address", (path, inputs) => {
  const anyText = fc.constantFrom(...typings, ...moreTypings, "typed", "load", "returnLoss", "net", "short");
  const anyTexts = fc.record(Object.fromEntries(Object.keys(inputs).map((name) => [name, anyText])));
  fc.assert(
    fc.property(anyTexts, (typed) => {
      const texts = Object.fromEntries(
        Object.entries(inputs).map(([name, input]) => {
          const text = typed[name] ?? "";
          return [name, readInput(input, text, reader).ok ? text : input.usual];
        }),
      );
      const opened = readAddress(inputs, parametersOf(calculatorAddress(path, inputs, texts)), reader);
      expect(opened.notes).toEqual([]);
      for (const name of shownInputs(inputs, texts)) expect(opened.texts[name]).toBe(texts[name]);
      expect(calculatorAddress(path, inputs, opened.texts)).toBe(calculatorAddress(path, inputs, texts));
    }),
  );
});

test.each(calculators)("%s: an address mangled in any way opens, with texts that can all be read", (_path, inputs) => {
  const junk = fc.oneof(
    fc.string(),
    fc.constantFrom(...typings, "NaN", "Infinity", "-1", "1e999", "\u0000", "%", "💥"),
  );
  const value = fc.oneof(junk, fc.array(junk, { maxLength: 3 }), fc.constant(undefined));
  const known = Object.fromEntries(Object.keys(inputs).map((name) => [name, value]));
  fc.assert(
    fc.property(fc.record(known, { requiredKeys: [] }), fc.dictionary(fc.string(), value), (own, stray) => {
      const { texts, notes } = readAddress(inputs, { ...stray, ...own }, reader);
      expect(() => valuesOf(inputs, texts, reader)).not.toThrow();
      for (const note of notes) expect(note).toMatch(/\.$/);
    }),
  );
});

test.each(calculators)("%s: without anything in the address everything is usual and nothing is noted", (_p, inputs) => {
  const { texts, notes } = readAddress(inputs, {}, reader);
  expect(notes).toEqual([]);
  for (const [name, input] of Object.entries(inputs)) expect(texts[name]).toBe(input.usual);
});

test("what cannot be read says what it was, why not, and what stands in its place", () => {
  const { texts, notes } = readAddress(
    lengthInputs,
    { frequency: "27.2 parsnips", ends: "10 mm", lenght: "3" },
    reader,
  );
  expect(texts).toMatchObject({ frequency: "100 MHz", ends: "10 mm" });
  expect(notes).toEqual([
    "Frequency: the address held “27.2 parsnips”. “parsnips” is not a unit of frequency. Try 27.2 MHz. The usual 100 MHz stands here.",
    "The address also holds “lenght”, which means nothing here.",
  ]);
});

test("with some figures in the address, those that may be left out are left out", () => {
  expect(readAddress(perLengthInputs, { z0: "75", c: "67 pF/m" }, reader).texts).toEqual({
    z0: "75",
    vf: "",
    delay: "",
    c: "67 pF/m",
    l: "",
  });
});

test("names that every object has mean nothing in an address", () => {
  const { notes } = readAddress(padInputs, { constructor: "x", __proto__: "y", toString: "z" } as never, reader);
  expect(notes.join(" ")).toContain("“constructor”");
});

test("the address of a typed cable carries its figures, that of a chosen one only its name", () => {
  const texts = readAddress(attenuationInputs, {}, reader).texts;
  expect(calculatorAddress("/x", attenuationInputs, { ...texts, cable: "c50-f10" })).not.toContain("z0=");
  expect(calculatorAddress("/x", attenuationInputs, { ...texts, cable: "typed", z0: "75" })).toContain("z0=75&vf=");
});
