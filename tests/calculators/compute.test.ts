import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { attenuation, attenuationInputs } from "@/lib/calculators/attenuation";
import { readInput, valuesOf, type Inputs, type Outcome, type Texts } from "@/lib/calculators/input";
import { electricalLength, lengthInputs } from "@/lib/calculators/length";
import { mismatch, mismatchInputs } from "@/lib/calculators/mismatch";
import { pad, padInputs } from "@/lib/calculators/pad";
import { perLength, perLengthInputs } from "@/lib/calculators/per-length";
import { stubAndSection, stubInputs } from "@/lib/calculators/stub";
import * as reader from "@/lib/format/read-quantity";

const none = new Map<string, never>();
const calculators: [string, Inputs, (values: never) => Outcome<unknown>][] = [
  ["per length", perLengthInputs, perLength],
  ["attenuation", attenuationInputs, (values) => attenuation(values, none)],
  ["mismatch", mismatchInputs, mismatch],
  ["length", lengthInputs, (values) => electricalLength(values, none)],
  ["stub", stubInputs, (values) => stubAndSection(values, none)],
  ["pad", padInputs, pad],
];

/** Numbers from nothing to far too much, as people would have to type them, and texts with units of their own. */
const anyNumber = fc
  .tuple(fc.constantFrom("", "-"), fc.integer({ min: 0, max: 99999 }), fc.integer({ min: -15, max: 15 }))
  .map(([sign, digits, power]) => `${sign}${digits}e${power}`);
const anyText = fc.oneof(
  anyNumber,
  fc.constantFrom("", "0", "1", "50", "λ/4", "λ/1000", "1e6 λ", "90°", "1 ns", "1 mm", "22-35j", "0-1000j", "1e-9"),
  fc.constantFrom("typed", "load", "gamma", "returnLoss", "net", "short", "j50", "-j1e4", "350 nH", "1 pF"),
);

function textsFrom(inputs: Inputs, typed: Texts): Texts {
  const entries = Object.entries(inputs).map(([name, input]) => {
    const text = typed[name] ?? input.usual;
    return [name, readInput(input, text, reader).ok ? text : input.usual];
  });
  return { ...(Object.fromEntries(entries) as Texts), ...(inputs.cable ? { cable: "typed" } : {}) };
}

/** Every number in a result, with its place. */
function numbersIn(value: unknown, place = "result"): [string, number][] {
  if (typeof value === "number") return [[place, value]];
  if (ArrayBuffer.isView(value) || Array.isArray(value))
    return Array.from(value as ArrayLike<unknown>).flatMap((each, i) => numbersIn(each, `${place}[${i}]`));
  if (typeof value === "object" && value !== null)
    return Object.entries(value).flatMap(([key, each]) => numbersIn(each, `${place}.${key}`));
  return [];
}

/** An open end has no angle, and a lossless stub's Q at resonance is nothing over nothing: screens show neither as a number. */
const mayBeUndefined = [/\.impedance\.im$/, /\.stub\.q$/];

test.each(calculators)(
  "%s: whatever is typed gives a result or a sentence, never a crash, never NaN",
  (_n, inputs, of) => {
    const anyTexts = fc.record(Object.fromEntries(Object.keys(inputs).map((name) => [name, anyText])));
    fc.assert(
      fc.property(anyTexts, (typed) => {
        const outcome = of(valuesOf(inputs, textsFrom(inputs, typed as Texts), reader) as never);
        if (outcome.ok) {
          const undefinedOnes = numbersIn(outcome.result)
            .filter(([place, value]) => Number.isNaN(value) && !mayBeUndefined.some((allowed) => allowed.test(place)))
            .map(([place]) => place);
          expect(undefinedOnes).toEqual([]);
        } else {
          expect(Object.keys(outcome.faults).length).toBeGreaterThan(0);
          for (const [name, message] of Object.entries(outcome.faults)) {
            expect(name in inputs).toBe(true);
            expect(message).toMatch(/\.$/);
          }
        }
      }),
      { numRuns: 300 },
    );
  },
);

test.each(calculators)("%s: what is usual gives a result", (_name, inputs, of) => {
  const usual = Object.fromEntries(Object.entries(inputs).map(([name, { usual: text }]) => [name, text]));
  expect(of(valuesOf(inputs, usual, reader) as never).ok).toBe(true);
});
