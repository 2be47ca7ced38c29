/** A length along the line, or a stub, as it may be cut: exact at any length, without objects. */
import { propagation } from "@/lib/line/cable";
import type { CableElement, StubElement } from "@/lib/line/element";
import { atTemperature } from "@/lib/line/temperature";

/** Multiplies a walk, (V, I) as re and im of each, by the matrix [a b; c d] that stands at a place of an array. */
export function chainWalk(walk: Float64Array, m: Float64Array, at: number): void {
  const vRe = walk[0]!;
  const vIm = walk[1]!;
  const iRe = walk[2]!;
  const iIm = walk[3]!;
  walk[0] = m[at]! * vRe - m[at + 1]! * vIm + m[at + 2]! * iRe - m[at + 3]! * iIm;
  walk[1] = m[at]! * vIm + m[at + 1]! * vRe + m[at + 2]! * iIm + m[at + 3]! * iRe;
  walk[2] = m[at + 4]! * vRe - m[at + 5]! * vIm + m[at + 6]! * iRe - m[at + 7]! * iIm;
  walk[3] = m[at + 4]! * vIm + m[at + 5]! * vRe + m[at + 6]! * iIm + m[at + 7]! * iRe;
}

/**
 * A cable or an open or shorted stub as a step of a walk. A stub's end is cleared of fractions, so that no resonance
 * divides by 0: the matrix is then its own times V or I at the stub's near end, which a reflection does not feel.
 * @param most - by which its length may be off, metre
 * @returns a function of the walk, the frequency's index and the share, −1 to 1, by which the length is off
 */
export function madeLine(
  element: CableElement | StubElement,
  most: number,
  temperatureC: number,
  frequencies: readonly number[],
): (walk: Float64Array, k: number, share: number) => void {
  const { lengthM, paralleled = 1 } = element;
  const { model } = atTemperature(element.line.model, temperatureC);
  const perMetre = frequencies.map((frequency) => propagation(model, { re: 0, im: 2 * Math.PI * frequency }));
  const gamma = Float64Array.from(perMetre.flatMap(({ gamma: g }) => [g.re, g.im]));
  const impedance = Float64Array.from(perMetre.flatMap(({ zc }) => [zc.re / paralleled, zc.im / paralleled]));
  const matrix = new Float64Array(8);
  const isStub = element.kind === "stub";
  const isOpen = isStub && element.end === "open";
  const isSeries = isStub && element.connection === "series";
  return (walk, k, share) => {
    const length = Math.max(0, lengthM + share * most);
    fillLine(matrix, gamma[2 * k]! * length, gamma[2 * k + 1]! * length, impedance[2 * k]!, impedance[2 * k + 1]!);
    if (isStub) asBranch(matrix, isOpen, isSeries);
    chainWalk(walk, matrix, 0);
  };
}

/** Writes cosh γl, Zc·sinh γl, sinh γl/Zc and cosh γl, re and im of each. */
export function fillLine(m: Float64Array, loss: number, phase: number, zRe: number, zIm: number): void {
  const grown = Math.exp(loss);
  const even = (grown + 1 / grown) / 2;
  const odd = (grown - 1 / grown) / 2;
  const cosine = Math.cos(phase);
  const sine = Math.sin(phase);
  const sRe = odd * cosine;
  const sIm = even * sine;
  const size = zRe * zRe + zIm * zIm;
  m[0] = m[6] = even * cosine;
  m[1] = m[7] = odd * sine;
  m[2] = zRe * sRe - zIm * sIm;
  m[3] = zRe * sIm + zIm * sRe;
  m[4] = (sRe * zRe + sIm * zIm) / size;
  m[5] = (sIm * zRe - sRe * zIm) / size;
}

/** V and I at a stub's near end are cosh and sinh/Zc open, Zc·sinh and cosh shorted. */
function asBranch(m: Float64Array, isOpen: boolean, isSeries: boolean): void {
  const vRe = isOpen ? m[0]! : m[2]!;
  const vIm = isOpen ? m[1]! : m[3]!;
  const iRe = isOpen ? m[4]! : m[0]!;
  const iIm = isOpen ? m[5]! : m[1]!;
  m[0] = m[6] = isSeries ? iRe : vRe;
  m[1] = m[7] = isSeries ? iIm : vIm;
  m[2] = isSeries ? vRe : 0;
  m[3] = isSeries ? vIm : 0;
  m[4] = isSeries ? 0 : iRe;
  m[5] = isSeries ? 0 : iIm;
}
