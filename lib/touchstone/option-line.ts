/** The line that begins with #: unit, parameter, format and reference. */
import type { Lines } from "@/lib/touchstone/lines";
import { type Figure, readFigure } from "@/lib/touchstone/figure";
import { FileFault, type NetworkParameter } from "@/lib/touchstone/network-file";

export type PairFormat = "DB" | "MA" | "RI";

export interface Options {
  /** hertz of one unit of frequency */
  unitHz: number;
  parameter: NetworkParameter;
  format: PairFormat;
  /** as given after R: one value, or one a port */
  referenceOhm: number[];
}

const units: Record<string, number> = { HZ: 1, KHZ: 1e3, MHZ: 1e6, GHZ: 1e9 };
const formats = ["DB", "MA", "RI"] as const;
const parameters = ["S", "Y", "Z"] as const;

/** What the words of the line have said so far. */
type Said = { unit?: number; parameter?: NetworkParameter; format?: PairFormat; referenceOhm?: number[] };

/**
 * The options of the line the reader stands on; its parts in any order, any of them absent: GHz, S, MA, R 50.
 * @throws FileFault for an unknown word, a part given twice, a hybrid parameter, a reference that is none
 */
export function readOptions(lines: Lines): Options {
  const said: Said = {};
  const words = lines.words(lines.start + 1);
  if (words.length > 0 && !/[ \t]/.test(lines.text[lines.start + 1] ?? ""))
    lines.warnings.push({ line: lines.line, message: "There is no blank after #; it was read as if there were one." });
  for (let n = 0; n < words.length; n++) {
    const word = (words[n] ?? "").toUpperCase();
    if (word !== "R") readWord(word, words[n] ?? "", said, lines.line);
    else n = readReference(words, n, said, lines.line);
  }
  const { unit: unitHz = 1e9, parameter = "S", format = "MA", referenceOhm = [50] } = said;
  return { unitHz, parameter, format, referenceOhm };
}

function once<Key extends keyof Said>(said: Said, key: Key, value: Said[Key], line: number): void {
  if (said[key] !== undefined) throw new FileFault(line, `The option line gives the ${names[key]} twice.`);
  said[key] = value;
}

const names: Record<keyof Said, string> = {
  unit: "unit of frequency",
  parameter: "parameter",
  format: "format",
  referenceOhm: "reference",
};

function readWord(word: string, asWritten: string, said: Said, line: number): void {
  const unit = Object.hasOwn(units, word) ? units[word] : undefined;
  const format = formats.find((each) => each === word);
  const parameter = parameters.find((each) => each === word);
  if (unit !== undefined) once(said, "unit", unit, line);
  else if (format) once(said, "format", format, line);
  else if (parameter) once(said, "parameter", parameter, line);
  else if (word === "G" || word === "H")
    throw new FileFault(line, `${word} parameters are not read: a cable is told by S, Y or Z.`);
  else throw new FileFault(line, `“${asWritten.slice(0, 40)}” in the option line is unknown.`);
}

/** Figures after R, as many as there are. @returns the place of the last word read */
function readReference(words: string[], at: number, said: Said, line: number): number {
  const values: number[] = [];
  const read: Figure = { value: 0, fault: undefined };
  let n = at + 1;
  for (; n < words.length; n++) {
    const word = words[n] ?? "";
    readFigure(word, 0, word.length, read);
    if (read.fault !== undefined) break;
    if (!(read.value > 0)) throw new FileFault(line, `The reference must be positive; ${word} is not.`);
    values.push(read.value);
  }
  if (values.length === 0) throw new FileFault(line, "The reference value after R is missing, or is no number.");
  once(said, "referenceOhm", values, line);
  return n - 1;
}
