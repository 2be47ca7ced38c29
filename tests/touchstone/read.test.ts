import { describe, expect, test } from "vitest";
import { FileFault, type NetworkFile } from "@/lib/touchstone/network-file";
import { readNetworkFile } from "@/lib/touchstone/read";
import { checks } from "@/tests/support/line-checks";
import { agrees, number, published } from "@/tests/support/published";
import { closeTo, type Expected } from "@/tests/support/tolerance";

interface FileInputs {
  file_name: string;
  file_text: string;
}
interface Verdict {
  name: string;
  inputs: FileInputs;
  expected: { verdict: "reject" | "accept_with_warning"; line: number | null; reason: string };
}

const valid = checks<FileInputs>("touchstone-valid");
const malformed = checks<FileInputs>("touchstone-malformed") as unknown as Verdict[];

/** Whatever the reader does with a text: the file, or its refusal. */
function outcome(fileName: string, text: string): NetworkFile | FileFault {
  try {
    return readNetworkFile(fileName, text);
  } catch (error) {
    if (error instanceof FileFault) return error;
    throw error;
  }
}

function refusal(fileName: string, text: string): FileFault {
  const got = outcome(fileName, text);
  if (!(got instanceof FileFault)) throw new Error("the file was accepted");
  return got;
}

/** Parts of the matrices as the checks hold them: [k][i][j]. */
function nested({ ports }: NetworkFile, values: Float64Array): number[][][] {
  return Array.from({ length: values.length / ports ** 2 }, (_, k) =>
    Array.from({ length: ports }, (__, i) =>
      Array.from(values.subarray((k * ports + i) * ports, (k * ports + i + 1) * ports)),
    ),
  );
}

describe("A proper file holds what an independent program wrote into it", () => {
  test("and all of them are there", () => expect(valid).toHaveLength(39));

  test.each(valid)("$name", ({ inputs, expected }) => {
    const file = readNetworkFile(inputs.file_name, inputs.file_text);
    const { version, ports, parameter, reference_ohm, points } = expected as Record<string, unknown>;
    expect([file.version, file.ports, file.parameter, file.referenceOhm]).toEqual([
      version,
      ports,
      parameter,
      reference_ohm,
    ]);
    expect(file.frequenciesHz).toHaveLength(points as number);
    closeTo(file.frequenciesHz, expected.frequency_hz as Expected, "frequency");
    closeTo(nested(file, file.re), expected.matrix_re as Expected, "re");
    closeTo(nested(file, file.im), expected.matrix_im as Expected, "im");
  });
});

describe("A malformed file", () => {
  test("and all of them are there", () => expect(malformed).toHaveLength(31));

  test.each(malformed.filter(({ expected }) => expected.verdict === "reject"))(
    "is refused with its line: $name",
    ({ inputs, expected }) => {
      const { line, message } = refusal(inputs.file_name, inputs.file_text);
      expect(line).toBe(expected.line);
      expect(message.length).toBeGreaterThan(10);
    },
  );

  test.each(malformed.filter(({ expected }) => expected.verdict !== "reject"))(
    "is accepted with a warning: $name",
    ({ inputs, expected }) => {
      const { warnings } = readNetworkFile(inputs.file_name, inputs.file_text);
      expect(warnings.map(({ line }) => line)).toEqual([expected.line]);
    },
  );
});

const v2 = (body: string, options = "# MHz S RI R 50") => `[Version] 2.0\n${options}\n${body}`;
const onePort = "[Number of Ports] 1\n[Number of Frequencies] 1\n";
const twoPorts = "[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n";
const onePoint = "[Network Data]\n1 0.1 0\n[End]\n";

test.each<[string, string, string, number | null, RegExp]>([
  ["a name that tells no ports", "run.txt", "# MHz S RI R 50\n1 0 0\n", null, /name must end in \.s1p/],
  ["a name of no ports", "run.s0p", "#\n1 0 0\n", null, /0 ports/],
  ["a name of very many ports", "run.s999p", "#\n1 0 0\n", null, /1 to 32/],
  ["hybrid parameters", "a.s2p", "# MHz H RI R 50\n1 1 0 0 0 0 0 1 0\n", 1, /H parameters are not read/],
  ["inverse hybrid parameters", "a.s2p", "# MHz G RI R 50\n", 1, /G parameters are not read/],
  ["a unit twice", "a.s1p", "# MHz GHz\n1 0 0\n", 1, /unit of frequency twice/],
  ["a reference twice", "a.s1p", "# R 50 S R 75\n1 0 0\n", 1, /reference twice/],
  ["a complex reference", "a.s1p", "# R 50+j5\n1 0 0\n", 1, /after R is missing, or is no number/],
  ["a reference of nothing", "a.s1p", "# R 0\n1 0 0\n", 1, /must be positive/],
  ["too many references", "a.s2p", "# R 50 75 100\n", 1, /gives 3 references/],
  ["a keyword without [Version]", "a.s1p", "# MHz\n[Number of Ports] 1\n1 0 0\n", 2, /begins with \[Version\]/],
  ["[Version] after the option line", "a.s1p", "# MHz\n[Version] 2.0\n", 2, /must come before all else/],
  ["a number that overflows", "a.s1p", "#\n1 1e999 0\n", 2, /column 3 is not a finite number/],
  ["a magnitude that overflows", "a.s1p", "# DB\n1 1e9 0\n", 2, /too large/],
  ["a frequency that overflows", "a.s1p", "# GHz\n1e305 0 0\n", 2, /too large/],
  ["a Fortran exponent", "a.s1p", "#\n1 1.0D0 0\n", 2, /“1.0D0” in column 3 is not a number/],
  ["two signs", "a.s1p", "#\n1 --1 0\n", 2, /not a number/],
  ["a bare sign", "a.s1p", "#\n1 - 0\n", 2, /not a number/],
  ["a control character", "a.s1p", "#\n1 0\u0000 0\n", 2, /control character/],
  ["a letter outside ASCII", "a.s1p", "#\n1 0 0 é\n", 2, /outside ASCII/],
  [
    "two-port noise that does not ascend",
    "a.s2p",
    "#\n2 0 0 1 0 1 0 0 0\n1 1 0 0 1\n1 1 0 0 1\n",
    4,
    /does not increase/,
  ],
  [
    "a two-port frequency that falls back",
    "a.s2p",
    "#\n2 0 0 1 0 1 0 0 0\n1 0 0 1 0 1 0 0 0\n",
    3,
    /does not increase/,
  ],
  [
    "three ports, a short row",
    "a.s3p",
    "#\n1 0 0 0 0 0 0\n0 0 0 0 0 0\n2 0 0 0 0 0 0\n",
    4,
    /not the rest of the point/,
  ],
  [
    "three ports, a long point",
    "a.s3p",
    "#\n1 0 0 0 0 0 0\n0 0 0 0 0 0 0 0 0 0 0 0 0 0\n",
    3,
    /too many in this point/,
  ],
  ["three ports, half a pair", "a.s3p", "#\n1 0 0 0\n", 2, /pair is incomplete/],
  ["three ports, cut short", "a.s3p", "#\n1 0 0 0 0 0 0\n0 0 0 0 0 0\n", 2, /incomplete/],
  ["a first keyword other than [Version]", "a.s1p", "[Number of Ports] 1\n", 1, /first keyword must be \[Version\]/],
  ["[Version] twice", "a.s1p", v2("[Version] 2.0\n"), 3, /twice/],
  ["a bracket left open", "a.s1p", v2("[Number of Ports 1\n"), 3, /not closed/],
  ["no option line", "a.s1p", `[Version] 2.0\n${onePort}${onePoint}`, 4, /option line .* is missing/],
  ["ports of no number", "a.s1p", v2("[Number of Ports] one\n"), 3, /whole number/],
  ["no ports", "a.s1p", v2("[Number of Ports] 0\n"), 3, /at least 1/],
  ["very many ports", "a.s1p", v2("[Number of Ports] 33\n"), 3, /at most 32/],
  [
    "very many frequencies",
    "a.s1p",
    v2("[Number of Ports] 1\n[Number of Frequencies] 1000001\n"),
    4,
    /at most 1000000/,
  ],
  ["ports twice", "a.s1p", v2("[Number of Ports] 1\n[Number of Ports] 1\n"), 4, /given twice/],
  [
    "no number of frequencies",
    "a.s1p",
    v2(`[Number of Ports] 1\n${onePoint}`),
    null,
    /\[Number of Frequencies\] is missing/,
  ],
  ["a data order for one port", "a.s1p", v2(`${onePort}[Two-Port Data Order] 12_21\n${onePoint}`), 5, /two ports only/],
  ["a matrix format of its own", "a.s1p", v2(`${onePort}[Matrix Format] Round\n`), 5, /Full, Lower or Upper/],
  ["mixed-mode data", "a.s2p", v2(`${twoPorts}[Mixed-Mode Order] D1,2 C1,2\n`), 6, /Mixed-mode/],
  ["a reference before the ports", "a.s1p", v2("[Reference] 50\n"), 3, /must come before \[Reference\]/],
  ["a reference too many", "a.s1p", v2(`${onePort}[Reference] 50 75\n`), 5, /one value per port/],
  ["a reference of no number", "a.s1p", v2(`${onePort}[Reference] fifty\n`), 5, /positive number/],
  ["several references on the option line", "a.s2p", v2("", "# R 50 75"), 2, /takes one reference/],
  [
    "a point that does not end with its line",
    "a.s1p",
    v2(`${onePort}[Network Data]\n1 0.1 0 2 0.1 0\n`),
    6,
    /does not fit 1 ports/,
  ],
  ["a point cut short", "a.s1p", v2(`${onePort}[Network Data]\n1 0.1\n[End]\n`), 6, /incomplete/],
  ["network data twice", "a.s1p", v2(`${onePort}[Network Data]\n1 0 0\n[Network Data]\n`), 7, /twice/],
  ["ports after the data", "a.s1p", v2(`${onePort}[Network Data]\n1 0 0\n[Number of Ports] 1\n`), 7, /before the data/],
  ["no network data", "a.s1p", v2(`${onePort}[End]\n`), null, /\[Network Data\] is missing/],
  ["information left open", "a.s1p", v2(`${onePort}[Begin Information]\n1 2\n`), 5, /not closed/],
  ["information closed only", "a.s1p", v2(`${onePort}[End Information]\n`), 5, /without \[Begin/],
  ["noise of a one-port", "a.s1p", v2(`${onePort}[Network Data]\n1 0 0\n[Noise Data]\n`), 7, /two ports only/],
  [
    "noise of no stated number",
    "a.s2p",
    v2(`${twoPorts}[Network Data]\n1 0 0 0 0 0 0 0 0\n[Noise Data]\n`),
    8,
    /Noise Frequencies\] is missing/,
  ],
  ["noise before the data", "a.s2p", v2(`${twoPorts}[Noise Data]\n`), 6, /must follow/],
])("A file with %s is refused in words", (_, name, text, line, words) => {
  const fault = refusal(name, text);
  expect(fault.line).toBe(line);
  expect(fault.message).toMatch(words);
});

test.each<[string, string, string, number | null, RegExp]>([
  ["no blank after #", "a.s1p", "#MHz S RI R 50\n1 0 0\n", 1, /no blank after #/],
  ["one reference a port", "a.s2p", "# GHz S MA R 50 75\n1 0 0 1 0 1 0 0 0\n", 1, /One reference a port/],
  ["a byte-order mark", "a.s1p", "\uFEFF#\n1 0 0\n", 1, /byte-order mark/],
  ["letters outside ASCII in a comment", "a.s1p", "! Gerät\n#\n1 0 0\n", 1, /outside ASCII/],
  ["three ports on one line", "a.s3p", `#\n1${" 0 0".repeat(9)}\n`, 2, /read row by row/],
  ["an impedance of negative resistance", "a.s1p", "# Z RI\n1 -1 0\n", 2, /negative real part/],
  ["a name of other ports", "a.s2p", v2(`${onePort}${onePoint}`), null, /name says 2 ports, the file says 1/],
  ["something after [End]", "a.s1p", v2(`${onePort}${onePoint}9 9 9\n`), 8, /after \[End\]/],
])("A file with %s is accepted, and how it was understood is said", (_, name, text, line, words) => {
  const { warnings } = readNetworkFile(name, text);
  expect(warnings).toEqual([{ line, message: expect.stringMatching(words) as string }]);
});

test("An indented option line, carriage returns alone and a frequency of zero are as good as any", () => {
  const file = readNetworkFile("a.s1p", "  # hz s ri r 50 \r0 0.5 -0.25\r1 0 0");
  expect([Array.from(file.frequenciesHz), file.re[0], file.im[0], file.warnings]).toEqual([[0, 1], 0.5, -0.25, []]);
});

test("Upper triangles, 21_12 and wrapped points of version 2 fill the whole matrix", () => {
  const upper = v2(
    `[Number of Ports] 3\n[Number of Frequencies] 1\n[Matrix Format] Upper\n[Network Data]\n1 .11 0 .12 0\n.13 0 .22 0 .23 0 .33\n0\n[End]`,
  );
  expect(Array.from(readNetworkFile("a.s3p", upper).re)).toEqual([
    0.11, 0.12, 0.13, 0.12, 0.22, 0.23, 0.13, 0.23, 0.33,
  ]);
});

test("Impedances of version 1 are normalised to R, those of version 2 are plain, as published", () => {
  const all = published((_, topic) => topic === "Touchstone normalisation", "published-models");
  expect(all).toHaveLength(5);
  for (const check of all) {
    const text = `# MHz Z RI R ${number(check.inputs, "R_ohm")}\n1 ${number(check.inputs, "v1_normalised_Z")} 0\n`;
    agrees(check, { v2_Z_ohm: readNetworkFile("a.s1p", text).re[0]! });
    const plain = v2(`${onePort}[Network Data]\n1 ${number(check.expected, "v2_Z_ohm")} 0\n[End]\n`, "# Z RI R 75");
    agrees(check, { v2_Z_ohm: readNetworkFile("a.s1p", plain).re[0]! });
  }
  const admittance = readNetworkFile("a.s1p", "# Y RI R 50\n1 2 -1\n");
  expect([admittance.re[0], admittance.im[0]]).toEqual([0.04, -0.02]);
});

test("Noise resistance is normalised in version 1 and plain in version 2, as published", () => {
  const [check] = published((id) => id === "E-touchstone-noise", "published-models");
  const [first, second] = check!.inputs.v1_rn as number[];
  const network = "2 0 0 1 0 1 0 0 0";
  const old = `# GHz S MA R ${number(check!.inputs, "R_ohm")}\n${network}\n1 0.8 0.5 90 ${first}\n1.5 0.8 0.5 90 ${second}\n`;
  const { noise } = readNetworkFile("a.s2p", old);
  agrees(check!, { v2_Rn_ohm: noise!.resistanceOhm });
  expect(noise!.frequenciesHz).toEqual([1e9, 1.5e9]);
  expect(noise!.reflection.im[0]).toBeCloseTo(0.5, 12);
  const head =
    "[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Number of Noise Frequencies] 2\n";
  const now = v2(`${head}[Network Data]\n${network}\n[Noise Data]\n1 0.8 0.5 90 19\n1.5 0.8 0.5 90 20\n[End]\n`);
  agrees(check!, { v2_Rn_ohm: readNetworkFile("a.s2p", now).noise!.resistanceOhm });
  expect(refusal("a.s2p", now.replace("1.5 0.8 0.5 90 20\n", "")).message).toMatch(/noise rows, 1, differs/);
});

test("Comments are kept as written, and only so many", () => {
  const many = `${"! x\n".repeat(500)}#\n1 0 0 ! last\n`;
  const file = readNetworkFile("a.s1p", many);
  expect(file.comments).toHaveLength(201);
  expect(file.warnings).toEqual([{ line: 201, message: expect.stringMatching(/not kept/) as string }]);
});
