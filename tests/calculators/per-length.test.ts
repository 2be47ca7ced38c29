import { expect, test } from "vitest";
import { valuesOf, type Texts } from "@/lib/calculators/input";
import { perLength, perLengthInputs } from "@/lib/calculators/per-length";
import { insulationsOf } from "@/lib/calculators/dielectrics";
import { published, number, type PublishedCheck } from "@/tests/support/published";
import * as reader from "@/lib/format/read-quantity";

const empty = { z0: "", vf: "", delay: "", c: "", l: "" };
const of = (typed: Texts) => perLength(valuesOf(perLengthInputs, { ...empty, ...typed }, reader));

function result(typed: Texts) {
  const outcome = of(typed);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.result;
}

test.each([
  [{}, "z0", /two of the five/],
  [{ z0: "50" }, "vf", /one more/],
  [{ c: "101 pF/m" }, "z0", /one more/],
  [{ vf: "0.66", delay: "5.05" }, "z0", /say the same thing/],
])("%j is too little, and it is said which field to fill", (typed, name, message) => {
  expect(of(typed)).toEqual({ ok: false, faults: { [name]: expect.stringMatching(message) } });
});

test("impedance and capacitance per foot give the velocity: 75 Ω and 20.5 pF/ft are solid polyethylene", () => {
  const { agreement, grade } = result({ z0: "75", c: "20.5 pF/ft" });
  expect(agreement.figures.velocityFactor).toBeCloseTo(0.661, 3);
  expect(insulationsOf(agreement.figures.velocityFactor)).toEqual(["solid polyethylene"]);
  expect(grade).toBe("alone");
});

test.each([
  ["54.5 pF/m", "fine"],
  ["56 pF/m", "look"],
  ["67 pF/m", "contradiction"],
  ["48 pF/m", "contradiction"],
])("beside 75 Ω and 83 %%, where 53.6 pF/m follow, %s is %s", (c, grade) => {
  expect(result({ z0: "75", vf: "83 %", c }).grade).toBe(grade);
});

test("three that contradict: each could be the wrong one, and its insulation gives a hint", () => {
  const { alternatives } = result({ z0: "75", vf: "0.83", c: "67 pF/m" });
  expect(alternatives.map(({ quantity }) => quantity)).toEqual(["z0", "velocityFactor", "capacitance"]);
  const velocity = alternatives.find(({ quantity }) => quantity === "velocityFactor")!;
  expect(velocity.others.velocityFactor).toBeCloseTo(0.664, 3);
  expect(insulationsOf(velocity.others.velocityFactor)).toEqual(["solid polyethylene"]);
});

test("a fourth figure names the wrong one, and no alternatives are needed", () => {
  const { agreement, alternatives, grade } = result({ z0: "75", vf: "0.83", c: "67 pF/m", l: "301 nH/m" });
  expect(grade).toBe("contradiction");
  expect(agreement.oddOneOut).toBe("capacitance");
  expect(alternatives).toEqual([]);
});

const consistent: [string, PublishedCheck][] = published((id) => id.startsWith("B-consist")).map((check) => [
  `${check.id}: ${check.source}`,
  check,
]);

test("there are published lines to hold against one another", () => {
  expect(consistent.length).toBeGreaterThan(3);
});

test.each(consistent)("velocity and capacitance of a published line give its impedance: %s", (_name, check) => {
  const { inputs, expected, tolerance } = check;
  const typed = { vf: `${number(inputs, "VF")}`, c: `${number(inputs, "C_pF_per_ft")} pF/ft` };
  const nominal = number(expected, "nominal_Z0_ohm");
  expect(Math.abs(result(typed).agreement.figures.z0 / nominal - 1)).toBeLessThanOrEqual(tolerance.rel!);
});
