/** A two-port sweep of a sample -> its line. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import { unlessRefused } from "@/lib/cables/ways/unless-refused";
import { extractSentence } from "@/lib/compute/extract/answer";
import type { ConductorForm } from "@/lib/line/element";
import { extractLine } from "@/lib/line/extract/extract";
import type { ComplexArray } from "@/lib/line/line-figures";
import { FileFault, type NetworkFile } from "@/lib/touchstone/network-file";
import { readNetworkFile } from "@/lib/touchstone/read";

export type SweepRead =
  { ok: true; sweep: NonNullable<EntryInputs["sweep"]>; warnings: string[] } | { ok: false; message: string };

const refused = (message: string): SweepRead => ({ ok: false, message });

/** One parameter of a two-port over frequency, from its first frequency above 0 on. */
function parameter({ re, im, frequenciesHz }: NetworkFile, at: number): ComplexArray {
  const first = frequenciesHz[0] === 0 ? 1 : 0;
  const every = (values: Float64Array) =>
    Float64Array.from(frequenciesHz.subarray(first), (_, k) => values[4 * (k + first) + at]!);
  return { re: every(re), im: every(im) };
}

/**
 * Reads a file of network parameters of a sample with its line at both ports.
 * @param lengthM - of the sample, above 0
 */
export function readSweep(fileName: string, text: string, lengthM: number, form: ConductorForm): SweepRead {
  let file: NetworkFile;
  try {
    file = readNetworkFile(fileName, text);
  } catch (error) {
    if (!(error instanceof FileFault)) throw error;
    return refused(error.line === null ? error.message : `Line ${error.line}: ${error.message}`);
  }
  const [reference, other] = file.referenceOhm;
  if (file.ports !== 2 || file.parameter !== "S" || reference === undefined || reference !== other)
    return refused("A sweep of a sample is a file of S-parameters with two ports of one reference, a .s2p.");
  const frequencies = file.frequenciesHz.filter((hertz) => hertz > 0);
  const [s11, s12, s21, s22] = [0, 1, 2, 3].map((at) => parameter(file, at)) as [
    ComplexArray,
    ComplexArray,
    ComplexArray,
    ComplexArray,
  ];
  const data = { referenceOhm: reference, frequencies, s11, s12, s21, s22 };
  const extracted = unlessRefused(() => extractLine({ length: lengthM, sweep: { kind: "twoPort", data }, form }));
  if (!extracted)
    return refused("No line has this sweep: the length, or what stood at the ports, is not what was swept.");
  const warnings = [...file.warnings.map(({ message }) => message), ...extracted.warnings.map(extractSentence)];
  return { ok: true, sweep: { lengthM, fileName: fileName.slice(0, 200), model: extracted.model }, warnings };
}
