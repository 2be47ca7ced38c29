/** What a file of network parameters holds, in SI units. */

export type NetworkParameter = "S" | "Y" | "Z";

/** Something odd that was accepted, and what was understood. */
export interface FileWarning {
  /** from 1; null where no single line is at fault */
  line: number | null;
  message: string;
}

/** Noise of an active two-port, one value a frequency. */
export interface NoiseData {
  frequenciesHz: number[];
  minimumFigureDb: number[];
  /** source reflection of the least noise, against the reference */
  reflection: { re: number[]; im: number[] };
  resistanceOhm: number[];
}

export interface NetworkFile {
  /** 1.1 for a file without a [Version] */
  version: "1.1" | "2.0" | "2.1";
  ports: number;
  parameter: NetworkParameter;
  /** one value a port */
  referenceOhm: number[];
  /** strictly ascending, length N */
  frequenciesHz: Float64Array;
  /** [k·ports² + i·ports + j], row i, column j at frequency k; S without unit, Z in ohm, Y in siemens */
  re: Float64Array;
  im: Float64Array;
  comments: string[];
  warnings: FileWarning[];
  noise?: NoiseData;
}

/** Why a file is refused. */
export class FileFault extends Error {
  override readonly name = "FileFault";

  /**
   * @param line - from 1; null where no single line is at fault
   * @param message - a sentence for whoever made or brought the file
   */
  constructor(
    readonly line: number | null,
    message: string,
  ) {
    super(message);
  }
}

/** What one file may hold, so that none exhausts the memory of whoever reads it. */
export interface FileLimits {
  ports: number;
  /** frequencies */
  points: number;
  /** frequencies times parameters of a matrix */
  values: number;
}

export const usualFileLimits: FileLimits = { ports: 32, points: 1_000_000, values: 4_000_000 };
