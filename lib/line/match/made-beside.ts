/** Different cables side by side as they may be cut: exact at any length, without objects. */
import { propagation } from "@/lib/line/cable";
import type { ParallelElement } from "@/lib/line/element";
import { chainWalk, fillLine } from "@/lib/line/match/made-line";
import { atTemperature } from "@/lib/line/temperature";

/** Lengths side by side are never nothing, metre. */
const shortest = 1e-9;

/**
 * Cables side by side as a step of a walk; all of them are off by the same length. Their admittance matrices add.
 * @param most - by which the lengths may be off, metre
 * @returns see `madeLine`
 */
export function madeBeside(
  { branches }: ParallelElement,
  most: number,
  temperatureC: number,
  frequencies: readonly number[],
): (walk: Float64Array, k: number, share: number) => void {
  const lines = branches.map(({ line, lengthM }) => {
    const { model } = atTemperature(line.model, temperatureC);
    const perMetre = frequencies.map((frequency) => propagation(model, { re: 0, im: 2 * Math.PI * frequency }));
    return {
      lengthM,
      figures: Float64Array.from(perMetre.flatMap(({ gamma, zc }) => [gamma.re, gamma.im, zc.re, zc.im])),
    };
  });
  const matrix = new Float64Array(8);
  const sum = new Float64Array(4);
  return (walk, k, share) => {
    sum.fill(0);
    for (const { lengthM, figures } of lines) {
      const length = Math.max(shortest, lengthM + share * most);
      fillLine(
        matrix,
        figures[4 * k]! * length,
        figures[4 * k + 1]! * length,
        figures[4 * k + 2]!,
        figures[4 * k + 3]!,
      );
      addAdmittance(sum, matrix);
    }
    writeChain(matrix, sum);
    chainWalk(walk, matrix, 0);
  };
}

/** Adds a/b and 1/b of a symmetrical chain matrix: its own and, but for the sign, its transfer admittance. */
function addAdmittance(sum: Float64Array, m: Float64Array): void {
  const size = m[2]! * m[2]! + m[3]! * m[3]!;
  sum[0]! += (m[0]! * m[2]! + m[1]! * m[3]!) / size;
  sum[1]! += (m[1]! * m[2]! - m[0]! * m[3]!) / size;
  sum[2]! += m[2]! / size;
  sum[3]! -= m[3]! / size;
}

/** The chain matrix of own admittance Y and transfer admittance T, times T: a = d = Y, b = 1, c = Y² − T². */
function writeChain(m: Float64Array, [yRe, yIm, tRe, tIm]: Float64Array): void {
  m[0] = m[6] = yRe!;
  m[1] = m[7] = yIm!;
  m[2] = 1;
  m[3] = 0;
  m[4] = yRe! * yRe! - yIm! * yIm! - tRe! * tRe! + tIm! * tIm!;
  m[5] = 2 * (yRe! * yIm! - tRe! * tIm!);
}
