/** Writes network parameters as a file that reads back to the last digit. */
import type { NetworkFile } from "@/lib/touchstone/network-file";

export type Written = Pick<NetworkFile, "ports" | "parameter" | "referenceOhm" | "frequenciesHz" | "re" | "im"> & {
  comments?: readonly string[];
};

export type WrittenVersion = "1.1" | "2.0";

const pairsALine = 4;

/**
 * The oldest version that holds the parameters as they are: 1.1 for S against one reference. Z and Y of version 1 are
 * divided by the reference, and several references are not its own.
 */
export function plainestVersion({ parameter, referenceOhm }: Written): WrittenVersion {
  return parameter === "S" && referenceOhm.every((each) => each === referenceOhm[0]) ? "1.1" : "2.0";
}

/**
 * The text of a file: frequencies in hertz, real and imaginary parts, each figure as short as reads back to itself.
 * @param version - default the oldest that holds them
 * @throws RangeError where a figure is not finite, frequencies do not ascend, a reference is not positive, the numbers
 * of figures do not fit, or the version cannot hold the parameters exactly
 */
export function writeNetworkFile(file: Written, version: WrittenVersion = plainestVersion(file)): string {
  check(file, version);
  const { ports, parameter, referenceOhm, frequenciesHz, comments = [] } = file;
  const lines = comments.map((comment) => `! ${comment.replaceAll(/[^\t\x20-\x7e]+/g, " ")}`);
  const option = `# Hz ${parameter} RI R ${referenceOhm[0]}`;
  if (version === "1.1") lines.push(option);
  else {
    lines.push("[Version] 2.0", option, `[Number of Ports] ${ports}`);
    if (ports === 2) lines.push("[Two-Port Data Order] 12_21");
    lines.push(`[Number of Frequencies] ${frequenciesHz.length}`, `[Reference] ${referenceOhm.join(" ")}`);
    lines.push("[Network Data]");
  }
  for (let k = 0; k < frequenciesHz.length; k++) writePoint(file, k, version, lines);
  if (version === "2.0") lines.push("[End]");
  return `${lines.join("\n")}\n`;
}

/** One point: a line for a one-port and a two-port, otherwise every row of the matrix begins a line. */
function writePoint(
  { ports, frequenciesHz, re, im }: Written,
  k: number,
  version: WrittenVersion,
  into: string[],
): void {
  let line = figure(frequenciesHz[k] ?? NaN);
  const pair = (i: number, j: number) => {
    const at = (k * ports + i) * ports + j;
    return ` ${figure(re[at] ?? NaN)} ${figure(im[at] ?? NaN)}`;
  };
  if (ports === 2) {
    const [second, third] = version === "1.1" ? [pair(1, 0), pair(0, 1)] : [pair(0, 1), pair(1, 0)];
    into.push(`${line}${pair(0, 0)}${second}${third}${pair(1, 1)}`);
    return;
  }
  for (let i = 0; i < ports; i++)
    for (let j = 0; j < ports; j++) {
      line += pair(i, j);
      if (j % pairsALine !== pairsALine - 1 && j < ports - 1) continue;
      into.push(line);
      line = "";
    }
}

/** As short as reads back to the same number, −0 included. */
const figure = (value: number) => (Object.is(value, -0) ? "-0" : String(value));

function check(file: Written, version: WrittenVersion): void {
  const { ports, referenceOhm, frequenciesHz, re, im } = file;
  const refuse = (what: string): never => {
    throw new RangeError(`writeNetworkFile: ${what}`);
  };
  if (!(Number.isInteger(ports) && ports >= 1)) refuse(`ports must be a whole number of at least 1, got ${ports}`);
  if (referenceOhm.length !== ports) refuse(`${ports} references are needed, got ${referenceOhm.length}`);
  if (!referenceOhm.every((each) => each > 0 && each < Infinity)) refuse("a reference must be positive");
  const values = frequenciesHz.length * ports * ports;
  if (frequenciesHz.length === 0) refuse("at least one frequency is needed");
  if (re.length !== values || im.length !== values) refuse(`${values} parameters are needed, got ${re.length}`);
  let last = -1;
  for (const frequency of frequenciesHz) {
    if (!(frequency >= 0 && frequency > last && frequency < Infinity)) refuse("frequencies must ascend from 0");
    last = frequency;
  }
  if (!re.every(Number.isFinite) || !im.every(Number.isFinite)) refuse("every parameter must be finite");
  if (version === "1.1" && plainestVersion(file) !== "1.1")
    refuse("version 1.1 holds S against one reference only, exactly");
}
