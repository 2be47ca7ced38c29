import { expect, test } from "vitest";
import { readTypedLine } from "@/lib/cables/typed-line";
import { typedLineModel } from "@/lib/cables/typed-model";
import { lineModelSchema } from "@/lib/cables/schema";
import { nominalFigures } from "@/lib/line/cable";

const texts = { z0: "50", vf: "85 %", r0: "8.6 Ω/km", corner: "18 kHz", tan: "0.00015" };

test("a typed cable is the model that its figures say, one lumped term with its skin corner", () => {
  const read = readTypedLine(texts);
  if (!read.ok) throw new Error(read.message);
  expect(nominalFigures(read.value).z0).toBeCloseTo(50, 9);
  expect(nominalFigures(read.value).velocityFactor).toBeCloseTo(0.85, 12);
  expect(read.value.conductors).toEqual([{ form: "sqrt", r0OhmPerM: 0.0086, skinCornerRadPerS: 2 * Math.PI * 18e3 }]);
  expect(read.value.lossTangent).toBe(0.00015);
  expect(lineModelSchema.safeParse(read.value).success).toBe(true);
});

test("without a skin corner, or without resistance, the resistance stays what it is", () => {
  const plain = { z0: 50, velocityFactor: 0.85, lossTangent: 0 };
  const flat = typedLineModel({ ...plain, loopResistance: 0.01, skinCorner: undefined });
  expect(flat.conductors).toEqual([{ form: "constant", r0OhmPerM: 0.01 }]);
  const none = typedLineModel({ ...plain, loopResistance: 0, skinCorner: 18e3 });
  expect(none.conductors).toEqual([{ form: "constant", r0OhmPerM: 0 }]);
});

test("losses that are left empty are none", () => {
  const read = readTypedLine({ ...texts, r0: "", corner: "", tan: "" });
  expect(read.ok && read.value).toMatchObject({ lossTangent: 0, conductors: [{ form: "constant", r0OhmPerM: 0 }] });
});

test.each([
  ["z0", "0"],
  ["z0", ""],
  ["vf", "fast"],
  ["r0", "-1"],
  ["corner", "0"],
  ["corner", "18 parsnips"],
  ["tan", "2"],
])("a typed cable with %s %j is refused", (name, text) => {
  expect(readTypedLine({ ...texts, [name]: text }).ok).toBe(false);
});
