import { describe, expect, test } from "vitest";
import { limitFor, limitOver, limitRange, type LimitCurve, type LimitLine } from "@/lib/limit-lines/limit";
import { limitLineSchema } from "@/lib/limit-lines/schema";
import { standardItems } from "@/lib/limit-lines/standards";
import { limitAt, worstMargin } from "@/lib/line/limits/limit-line";
import { standardLimits } from "@/lib/line/limits/standard-limits";
import fc from "@/tests/support/property";

const line = (curve: LimitCurve, change: Partial<LimitLine> = {}): LimitLine => ({
  ...{ quantity: "insertionLoss", of: "channel", curve },
  ...change,
});
const formula: LimitCurve = {
  ...{ form: "formula", referenceHz: 1e6 },
  pieces: [
    { fromHz: 1e6, toHz: 10e6, k0: 20, kLog: 5 },
    { fromHz: 10e6, toHz: 20e6, k0: 30 },
    { fromHz: 40e6, toHz: 100e6, k1: 2, k2: 0.02, k3: 0.2 },
  ],
};
const points: LimitCurve = {
  form: "points",
  points: [
    { frequencyHz: 1e6, value: 10 },
    { frequencyHz: 100e6, value: 20 },
    { frequencyHz: 200e6, value: 20 },
  ],
};
const at = (curve: LimitCurve, ...megahertz: number[]) => [
  ...limitOver(
    line(curve),
    megahertz.map((f) => f * 1e6),
  ),
];

describe("A formula", () => {
  test("is k0 + k1·√x + k2·x + k3/√x + kLog·log₁₀x, worked by hand at 64 and 100 MHz and at 1 and √10 MHz", () => {
    expect(at(formula, 1)[0]).toBeCloseTo(20, 12);
    expect(at(formula, Math.sqrt(10))[0]).toBeCloseTo(22.5, 12);
    expect(at(formula, 64)[0]).toBeCloseTo(2 * 8 + 0.02 * 64 + 0.2 / 8, 12);
    expect(at(formula, 100)[0]).toBeCloseTo(22.02, 12);
  });

  test("says nothing below, above and between its pieces, and at a shared end the lower piece counts", () => {
    expect(at(formula, 0.999, 10, 10.001, 20, 21, 39.9, 40, 101)).toEqual([
      ...[NaN, 25, 30, 30, NaN, NaN],
      ...[expect.closeTo(2 * Math.sqrt(40) + 0.8 + 0.2 / Math.sqrt(40), 12), NaN],
    ]);
  });
});

describe("Points", () => {
  test("are joined straight over the logarithm of frequency, and nothing is said beyond them", () => {
    expect(at(points, 0.9, 1, 10, 100, 150, 200, 201)).toEqual([NaN, 10, expect.closeTo(15, 12), 20, 20, 20, NaN]);
  });

  test("are met at every one of them", () => {
    const curve = fc
      .uniqueArray(fc.integer({ min: 1, max: 10_000 }), { minLength: 2, maxLength: 20 })
      .map((list) => list.sort((a, b) => a - b).map((f, i) => ({ frequencyHz: f * 1e4, value: 1 + ((i * 7) % 5) })));
    fc.assert(
      fc.property(curve, (given) => {
        const values = limitOver(
          line({ form: "points", points: given }),
          given.map(({ frequencyHz }) => frequencyHz),
        );
        given.forEach(({ value }, i) => expect(values[i]).toBeCloseTo(value, 9));
      }),
    );
  });
});

test("A formula that counts in other units than megahertz gives the same limits", () => {
  const inGigahertz: LimitCurve = {
    ...{ form: "formula", referenceHz: 1e9 },
    pieces: [{ fromHz: 1e6, toHz: 1e9, k0: 3, k1: 2 * Math.sqrt(1000), k2: 20, k3: 0.2 / Math.sqrt(1000), kLog: 5 }],
  };
  const inMegahertz: LimitCurve = {
    ...{ form: "formula", referenceHz: 1e6 },
    pieces: [{ fromHz: 1e6, toHz: 1e9, k0: 3 - 15, k1: 2, k2: 0.02, k3: 0.2, kLog: 5 }],
  };
  const [a, b] = [inGigahertz, inMegahertz].map((curve) => at(curve, 1, 7, 64, 1000));
  a?.forEach((value, i) => expect(value).toBeCloseTo(b?.[i] ?? NaN, 9));
});

test("A line per length grows with it; one for the whole does not", () => {
  const constant: LimitCurve = { form: "constant", value: 45 };
  expect([...limitOver(line(constant, { perLengthM: 100 }), [1, 1e9], 50)]).toEqual([22.5, 22.5]);
  expect([...limitOver(line(constant), [1], 50)]).toEqual([45]);
});

test("The range is that of the first and the last piece or point, and none for a constant", () => {
  expect(limitRange(formula)).toEqual([1e6, 100e6]);
  expect(limitRange(points)).toEqual([1e6, 200e6]);
  expect(limitRange({ form: "constant", value: 1 })).toBeNull();
});

describe("Held against a line", () => {
  const frequencies = [0.5e6, 1e6, 10e6, 100e6];

  test("a ceiling leaves the limit less the value, where that is least", () => {
    const limit = limitFor(line(points));
    expect(worstMargin(limit, frequencies, [99, 8, 14, 17])).toEqual({
      ...{ margin: expect.closeTo(1, 12), frequency: 10e6 },
    });
    expect(worstMargin(limit, frequencies, [99, 8, 14, 21])).toMatchObject({ margin: expect.closeTo(-1, 9) });
  });

  test("a floor leaves the value less the limit", () => {
    const floor = limitFor(line(points, { quantity: "returnLoss" }));
    expect(worstMargin(floor, frequencies, [0, 12, 16, 19])).toMatchObject({ frequency: 100e6 });
  });

  test("a line says nothing outside its range", () => {
    expect(worstMargin(limitFor(line(points)), [1e3, 2e3], [1, 1])).toBeUndefined();
  });
});

describe("The limits of standards", () => {
  test.each(standardLimits.map((limit, i) => [limit.id, limit, standardItems[i]] as const))(
    "%s gives on the wire what it gives in the engine",
    (_, limit, item) => {
      if (!item) throw new Error("left out");
      limitLineSchema.parse(item);
      const [from, to] = limitRange(item.curve) ?? [1, 1e9];
      const frequencies = Array.from({ length: 50 }, (_value, i) => from * (to / from) ** (i / 50));
      const values = limitOver(item, frequencies, item.perLengthM);
      frequencies.forEach((frequency, i) => {
        const expected = limitAt(limit, frequency);
        expect(Math.abs((values[i] ?? NaN) / expected - 1)).toBeLessThan(1e-9);
      });
      expect(limitOver(item, [to * 1.001], item.perLengthM)[0]).toEqual(limitAt(limit, to * 1.001));
    },
  );

  test("have names and ids of their own, and what is recalled says to check one's edition", () => {
    expect(new Set(standardItems.map(({ name }) => name)).size).toBe(standardItems.length);
    expect(new Set(standardItems.map(({ id }) => id)).size).toBe(standardItems.length);
    for (const { mark, note } of standardItems) {
      expect(note).not.toBe("");
      if (mark === "memory") expect(note).toMatch(/check your edition/);
    }
  });
});

describe("Refused:", () => {
  const per = line({ form: "constant", value: 1 }, { perLengthM: 100 });
  test.each([
    ["a frequency of 0", () => limitOver(line(points), [0])],
    ["a frequency that is none", () => limitOver(line(points), [NaN])],
    ["a line per length without one", () => limitOver(per, [1e6])],
    ["a length of 0", () => limitOver(per, [1e6], 0)],
    ["an endless length", () => limitOver(per, [1e6], Infinity)],
  ])("%s", (_, ask) => {
    expect(ask).toThrow(RangeError);
  });
});
