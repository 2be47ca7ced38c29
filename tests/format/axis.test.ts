import { expect, test } from "vitest";
import { asGiven, frequencyAxis } from "@/lib/format/axis";

test("asGiven(value) keeps every digit of a limit and adds none", () => {
  expect([14, 14.25, 2.205, 1.505, 0.1 + 0.2].map(asGiven)).toEqual(["14", "14.25", "2.205", "1.505", "0.3"]);
});

test("frequencyAxis(highest) takes the unit in which neighbouring marks differ", () => {
  const low = frequencyAxis(31_500);
  expect(low.unit).toBe("kHz");
  expect([31_000, 31_100, 31_200].map(low.format)).toEqual(["31", "31.1", "31.2"]);
  const high = frequencyAxis(454e6);
  expect([high.unit, high.format(450e6), high.format(452.5e6)]).toEqual(["MHz", "450", "452.5"]);
  expect(frequencyAxis(6e9).unit).toBe("GHz");
});
