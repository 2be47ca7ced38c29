import { describe, expect, test } from "vitest";
import type { NetworkParameter } from "@/lib/touchstone/network-file";
import { readNetworkFile } from "@/lib/touchstone/read";
import { plainestVersion, type Written, writeNetworkFile } from "@/lib/touchstone/write";
import fc from "@/tests/support/property";

/** Any figure but those that are none, tiny and huge ones and −0 among them. */
const figure = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.double({ min: -1, max: 1, noNaN: true }),
  fc.constantFrom(0, -0, 5e-324, -1.7976931348623157e308, 0.1 + 0.2),
);

const anyFile = (parameter: NetworkParameter): fc.Arbitrary<Written> =>
  fc
    .tuple(
      fc.integer({ min: 1, max: 6 }),
      fc.uniqueArray(fc.double({ min: 0, max: 1e12, noNaN: true }), {
        minLength: 1,
        maxLength: 4,
        comparator: "IsStrictlyEqual",
      }),
      fc.boolean(),
    )
    .chain(([ports, frequencies, hasOneReference]) => {
      const values = fc.array(figure, {
        minLength: frequencies.length * ports ** 2,
        maxLength: frequencies.length * ports ** 2,
      });
      const reference = fc.double({ min: 1e-3, max: 1e6, noNaN: true });
      const many = fc.array(reference, { minLength: ports, maxLength: ports });
      const one = reference.map((each) => Array.from({ length: ports }, () => each));
      return fc.record({
        ports: fc.constant(ports),
        parameter: fc.constant(parameter),
        referenceOhm: hasOneReference ? one : many,
        frequenciesHz: fc.constant(Float64Array.from(frequencies.map(Math.abs)).sort()),
        re: values.map((list) => Float64Array.from(list)),
        im: values.map((list) => Float64Array.from(list)),
      });
    });

describe.each<NetworkParameter>(["S", "Y", "Z"])("What is written of %s parameters", (parameter) => {
  test("reads back to the last digit, in every version that holds it", () => {
    fc.assert(
      fc.property(anyFile(parameter), (file) => {
        const versions = new Set([plainestVersion(file), "2.0" as const]);
        for (const version of versions) {
          const back = readNetworkFile(`run.s${file.ports}p`, writeNetworkFile(file, version));
          expect(back.version).toBe(version);
          expect([back.ports, back.parameter, back.referenceOhm]).toEqual([file.ports, parameter, file.referenceOhm]);
          // typed arrays are compared by bits, so −0 counts
          expect(back.frequenciesHz).toEqual(file.frequenciesHz);
          expect(back.re).toEqual(file.re);
          expect(back.im).toEqual(file.im);
        }
      }),
      { numRuns: 150 },
    );
  }, 30_000);
});

const file: Written = {
  ports: 2,
  parameter: "S",
  referenceOhm: [50, 50],
  frequenciesHz: Float64Array.from([1e6]),
  re: Float64Array.from([0.11, 0.12, 0.21, 0.22]),
  im: new Float64Array(4),
  comments: ["made\nfor — a test"],
};

test("A two-port of version 1 has its transmissions in the order 21, 12; one of version 2 says that its rows are in order", () => {
  expect(writeNetworkFile(file)).toBe("! made for   a test\n# Hz S RI R 50\n1000000 0.11 0 0.21 0 0.12 0 0.22 0\n");
  expect(writeNetworkFile(file, "2.0")).toContain("[Two-Port Data Order] 12_21\n");
  expect(writeNetworkFile(file, "2.0")).toContain("1000000 0.11 0 0.12 0 0.21 0 0.22 0\n[End]\n");
});

test("A comment cannot break out of its line", () => {
  const text = writeNetworkFile({ ...file, comments: ["a\r\n# GHz\n1 2 3"] });
  expect(readNetworkFile("a.s2p", text).frequenciesHz).toHaveLength(1);
});

test.each<[Partial<Written>, RegExp]>([
  [{ ports: 0 }, /ports must be/],
  [{ referenceOhm: [50] }, /2 references/],
  [{ referenceOhm: [50, -1] }, /reference must be positive/],
  [{ frequenciesHz: new Float64Array(0) }, /at least one frequency/],
  [{ frequenciesHz: Float64Array.from([-1]) }, /frequencies must ascend/],
  [{ re: new Float64Array(3) }, /4 parameters are needed/],
  [{ im: Float64Array.from([0, 0, NaN, 0]) }, /finite/],
])("writeNetworkFile refuses %o", (off, words) => {
  expect(() => writeNetworkFile({ ...file, ...off })).toThrow(RangeError);
  expect(() => writeNetworkFile({ ...file, ...off })).toThrow(words);
});

test("writeNetworkFile refuses to put into version 1.1 what it would have to round", () => {
  expect(() => writeNetworkFile({ ...file, parameter: "Z" }, "1.1")).toThrow(/version 1.1/);
  expect(() => writeNetworkFile({ ...file, referenceOhm: [50, 75] }, "1.1")).toThrow(/version 1.1/);
});
