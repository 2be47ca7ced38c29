/** A file's text -> the answer of the wire. Pure. */
import { Refusal } from "@/lib/compute/apart/refusal";
import type { TouchstoneAnswer, TouchstoneRequest } from "@/lib/compute/touchstone/schema";
import { FileFault, type FileLimits, type NetworkFile } from "@/lib/touchstone/network-file";
import { readNetworkFile } from "@/lib/touchstone/read";

/** What one answer can carry. */
export const answeredLimits: FileLimits = { ports: 32, points: 100_001, values: 500_000 };

function matricesOf(values: Float64Array, ports: number): number[][][] {
  return Array.from({ length: values.length / (ports * ports) }, (_, k) =>
    Array.from({ length: ports }, (__, i) => {
      const start = (k * ports + i) * ports;
      return Array.from(values.subarray(start, start + ports));
    }),
  );
}

function read({ fileName, text }: TouchstoneRequest): NetworkFile {
  try {
    return readNetworkFile(fileName, text, answeredLimits);
  } catch (error) {
    throw error instanceof FileFault ? new Refusal(error.message, { line: error.line }) : error;
  }
}

/** @throws Refusal with the line where the file is refused */
export function touchstoneAnswer(request: TouchstoneRequest): TouchstoneAnswer {
  const { re, im, noise, frequenciesHz, ...file } = read(request);
  return {
    ...file,
    frequenciesHz: Array.from(frequenciesHz),
    matrix: { re: matricesOf(re, file.ports), im: matricesOf(im, file.ports) },
    ...(noise && { noise }),
  };
}
