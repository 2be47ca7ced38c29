/** The reader before any text at all, and before very much of it. */
import { describe, expect, test } from "vitest";
import { FileFault } from "@/lib/touchstone/network-file";
import { type Figure, readFigure } from "@/lib/touchstone/figure";
import { readNetworkFile } from "@/lib/touchstone/read";
import fc from "@/tests/support/property";

/** Reads or refuses; anything else is a failure. */
function readOrRefused(name: string, text: string): void {
  try {
    const { frequenciesHz, re, im, ports } = readNetworkFile(name, text);
    expect(re.length).toBe(frequenciesHz.length * ports ** 2);
    expect(re.every(Number.isFinite) && im.every(Number.isFinite)).toBe(true);
    frequenciesHz.forEach((f, k) => expect(f).toBeGreaterThan(k === 0 ? -1 : frequenciesHz[k - 1]!));
  } catch (error) {
    expect(error).toBeInstanceOf(FileFault);
    const { line, message } = error as FileFault;
    expect(message).toMatch(/\.$/);
    if (line !== null) expect(line).toBeGreaterThanOrEqual(1);
    if (line !== null) expect(line).toBeLessThanOrEqual(text.split(/\r\n|\r|\n/).length);
  }
}

const pieces = fc.constantFrom(
  ..."# ! [ ] [Version] [Version]_2.0 [Version]_2.1 [Number_of_Ports] [Number_of_Frequencies]_1 [Network_Data] [End]"
    .split(" ")
    .map((piece) => piece.replaceAll("_", " ")),
  ..."[Two-Port_Data_Order]_12_21 [Reference]_50 [Matrix_Format]_Lower [Noise_Data] [Begin_Information]".split(" "),
  ..."Hz MHz GHz S Y Z H RI MA DB R 50 0 1 2 -1 .5 1e3 1e999 0x1 nan inf - . 1,5 \t é \u0000 \uFEFF".split(" "),
  ..."\n \n \r\n \n".split(" "),
  " ",
);
const name = fc.constantFrom("a.s1p", "a.s2p", "a.s3p", "a.s4p", "a.ts", "a", "a.s33p");

test("Any text is read, or refused with a line that it has and a sentence; nothing else is thrown", () => {
  fc.assert(fc.property(name, fc.string({ unit: "binary", maxLength: 300 }), readOrRefused), { numRuns: 500 });
  fc.assert(
    fc.property(name, fc.array(pieces, { maxLength: 60 }), (fileName, list) => readOrRefused(fileName, list.join(" "))),
    { numRuns: 3000 },
  );
}, 30_000);

const sound = [
  "! a\n# MHz S RI R 50\n1 0.1 0 0.9 0 0.9 0 0.1 0\n2 0.1 0 0.9 0 0.9 0 0.1 0\n1 0.8 0.4 31 0.2\n",
  "[Version] 2.0\n# MHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Reference] 50\n75\n[Matrix Format] Full\n[Network Data]\n1 0.1 0 0.9 0\n0.9 0 0.1 0\n[End]\n",
];

test("A sound file with a piece cut out, doubled or changed is read or refused likewise", () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...sound),
      fc.nat(400),
      fc.nat(40),
      pieces,
      fc.nat(2),
      (text, at, length, piece, how) => {
        const middle = ["", text.slice(at, at + length).repeat(2), piece][how]!;
        readOrRefused("a.s2p", text.slice(0, at) + middle + text.slice(at + length));
      },
    ),
    { numRuns: 3000 },
  );
}, 30_000);

test("Figures are read to the last bit, and only figures", () => {
  const read: Figure = { value: 0, fault: undefined };
  const reads = (text: string) => {
    readFigure(`x${text}y`, 1, 1 + text.length, read);
    return read.fault ?? read.value;
  };
  // rounded to fewer digits, the largest number is beyond what there is
  const inDouble = (text: string) => (Math.abs(Number(text)) < Infinity ? Number(text) : "notFinite");
  fc.assert(
    fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.nat(20), (value, digits) => {
      for (const text of [String(value), value.toExponential(digits), value.toExponential().replace("e", "E")])
        expect(Object.is(reads(text), inDouble(text)), text).toBe(true);
      const fixed = value.toFixed(digits);
      expect(Object.is(reads(fixed), inDouble(fixed)), fixed).toBe(true);
    }),
    { numRuns: 2000 },
  );
  for (const text of ["", "+", ".", "e5", "1e", "1e+", "1.2.3", "1 2", "0x1", "1_0", "1e5.0", "½", "--1"])
    expect(reads(text), text).toBe("notANumber");
  for (const text of ["inf", "-Infinity", "NaN", "1e400", `${"9".repeat(400)}`])
    expect(reads(text), text).toBe("notFinite");
  expect(reads("1e-999")).toBe(0);
}, 30_000);

describe("A million lines", () => {
  const lines = 1_000_000;
  const within = (most: { ms: number }, task: () => void) => {
    const start = performance.now();
    task();
    expect(performance.now() - start).toBeLessThan(most.ms);
  };

  test("of one-port data are read within seconds", () => {
    const text = `# Hz S RI R 50\n${Array.from({ length: lines }, (_, k) => `${k + 1} 0.123456 -0.654321`).join("\n")}\n`;
    within({ ms: 5000 }, () => {
      const file = readNetworkFile("a.s1p", text);
      expect(file.frequenciesHz).toHaveLength(lines);
      expect([file.frequenciesHz.at(-1), file.re.at(-1), file.im.at(-1)]).toEqual([lines, 0.123456, -0.654321]);
    });
    within({ ms: 5000 }, () =>
      expect(() => readNetworkFile("a.s1p", `${text}1000001 0 0\n`)).toThrow(/more than 1000000 frequencies/),
    );
  }, 60_000);

  test("at fault in the second line of data, or over a limit, are refused as soon as that is met", () => {
    const text = `# Hz S RI R 50\n${"1 0.1 0.1\n".repeat(lines)}`;
    within({ ms: 1000 }, () => expect(() => readNetworkFile("a.s1p", text)).toThrow(/does not increase/));
    const three = `#\n${Array.from({ length: 200 }, (_, k) => `${k + 1}${" 0 0".repeat(3)}\n${" 0 0".repeat(3)}\n${" 0 0".repeat(3)}`).join("\n")}`;
    const limits = { ports: 4, points: 1000, values: 900 };
    expect(() => readNetworkFile("a.s3p", three, limits)).toThrow(/more than 900 parameters/);
  });

  test.each([
    ["comments", "! c\n", /no option line/],
    ["nothing", "\n", /no option line/],
    ["blanks on one line", "   ", /no option line/],
    ["option lines", "#\n", /there are no data/],
    ["figures on one line", "1 ", /before the option line/],
    ["brackets", "[\n", /first keyword/],
  ])("of %s are refused within seconds", (_, piece, words) => {
    within({ ms: 5000 }, () => expect(() => readNetworkFile("a.s1p", piece.repeat(lines))).toThrow(words));
  });

  test("of figures on one line are refused as too many for a line", () => {
    within({ ms: 2000 }, () =>
      expect(() => readNetworkFile("a.s1p", `#\n${"1 ".repeat(lines)}`)).toThrow(/more than 10000 figures/),
    );
  });
});
