import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { modelFromNominal, nominalFigures, type NominalFigures } from "@/lib/line/cable";
import { agreementOf, figuresFromTwo, permittivityOf, perLengthQuantities, type Stated } from "@/lib/line/per-length";

const anyLine = fc.record({
  z0: fc.double({ min: 20, max: 500, noNaN: true }),
  velocityFactor: fc.double({ min: 0.4, max: 1, noNaN: true }),
});
const all = (figures: NominalFigures): Stated[] =>
  perLengthQuantities.map((quantity) => ({ quantity, value: figures[quantity] }));

test("any two figures that determine a line give the other three", () => {
  fc.assert(
    fc.property(anyLine, (line) => {
      const figures = nominalFigures(modelFromNominal(line));
      const stated = all(figures);
      for (const first of stated)
        for (const second of stated) {
          const found = figuresFromTwo(first, second);
          const isSame =
            first === second || [first, second].every(({ quantity }) => /^(velocity|delay)/.test(quantity));
          expect(found === undefined).toBe(isSame);
          if (found)
            for (const quantity of perLengthQuantities) expect(found[quantity] / figures[quantity]).toBeCloseTo(1, 12);
        }
    }),
  );
});

test("figures that agree, however many, compare with no deviation and name nobody", () => {
  fc.assert(
    fc.property(anyLine, (line) => {
      const agreement = agreementOf(all(nominalFigures(modelFromNominal(line))));
      expect(agreement?.from).toEqual(["z0", "velocityFactor"]);
      expect(agreement?.compared).toHaveLength(3);
      expect(agreement?.worst).toBeLessThan(1e-12);
      expect(agreement?.oddOneOut).toBeUndefined();
    }),
  );
});

test("the sheet that copies the capacitance of the solid version is 25 % out, and three figures cannot say which", () => {
  // The example of a data sheet: 75 Ω, 83 %, 67 pF/m where 53.6 would follow.
  const agreement = agreementOf([
    { quantity: "capacitance", value: 67e-12 },
    { quantity: "z0", value: 75 },
    { quantity: "velocityFactor", value: 0.83 },
  ]);
  expect(agreement?.from).toEqual(["z0", "velocityFactor"]);
  expect(agreement!.compared[0]!.implied * 1e12).toBeCloseTo(53.585, 2);
  expect(agreement?.compared[0]?.deviation).toBeCloseTo(0.25, 2);
  expect(agreement?.oddOneOut).toBeUndefined();
});

test("with four figures the one that does not fit is named, whichever it is", () => {
  fc.assert(
    fc.property(
      anyLine,
      fc.constantFrom("z0", "velocityFactor", "capacitance", "inductance"),
      fc.constantFrom(0.75, 0.9, 1.1, 1.25),
      (line, wrong, factor) => {
        const figures = nominalFigures(modelFromNominal(line));
        const stated = all(figures)
          .filter(({ quantity }) => quantity !== "delay")
          .map(({ quantity, value }) => ({ quantity, value: quantity === wrong ? value * factor : value }));
        expect(agreementOf(stated)?.oddOneOut).toBe(wrong);
      },
    ),
  );
});

test("too little is no line: nothing, one figure, or velocity factor and delay alone", () => {
  expect(agreementOf([])).toBeUndefined();
  expect(agreementOf([{ quantity: "z0", value: 50 }])).toBeUndefined();
  const velocity: Stated = { quantity: "velocityFactor", value: 0.66 };
  expect(agreementOf([velocity, { quantity: "delay", value: 5.05e-9 }])).toBeUndefined();
  const three = agreementOf([velocity, { quantity: "delay", value: 5.05e-9 }, { quantity: "z0", value: 50 }]);
  expect(three?.compared.map(({ quantity }) => quantity)).toEqual(["delay"]);
});

test("permittivityOf is one over the square of the velocity factor: solid polyethylene, foam", () => {
  expect(permittivityOf(0.66)).toBeCloseTo(2.2957, 4);
  expect(permittivityOf(1)).toBe(1);
});

test.each([0, -50, NaN, Infinity])("a figure of %s is refused by name", (value) => {
  expect(() => figuresFromTwo({ quantity: "z0", value }, { quantity: "delay", value: 4e-9 })).toThrow(
    `figuresFromTwo: z0 must be positive, got ${value}`,
  );
});
