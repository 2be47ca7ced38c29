/**
 * A network as it may be made, its lengths and values off by shares of a tolerance: the same figures as `responder`,
 * without objects, for many makings at a few frequencies.
 */
import { propagation } from "@/lib/line/cable";
import type { CableElement, Element, PartElement, StubElement } from "@/lib/line/element";
import { prepareElement } from "@/lib/line/element-two-port";
import type { CutTolerance } from "@/lib/line/match/at-limits";
import type { Ends } from "@/lib/line/match/response";
import { atTemperature } from "@/lib/line/temperature";
import type { TwoPortAt } from "@/lib/line/two-port";

/** Voltage and current, re and im of each, walked from the load to the target. */
type Walk = Float64Array;

/** One element: takes the walk to its target side at frequency `k`, its figure off by `share` of the tolerance. */
type Step = (walk: Walk, k: number, share: number) => void;

export interface MadeNetwork {
  /** how many of its figures can be off; shares come in the order of the elements that have one */
  figures: number;
  /** |Γ| against the target at `frequencies[k]`, with figure j off by `shares[j]`, −1 to 1, of its tolerance */
  magnitude: (k: number, shares: ArrayLike<number>) => number;
}

const axis = (frequency: number) => ({ re: 0, im: 2 * Math.PI * frequency });

/** Whether something of an element can be off. */
export function isLoose(element: Element, { lengthM = 0, valuePercent = 0 }: CutTolerance): boolean {
  if (element.kind === "cable" || element.kind === "stub") return lengthM > 0;
  return element.kind === "part" && valuePercent > 0;
}

/**
 * @param elements - from the target side to the load; pads as their parts where their resistors can be off
 * @param frequencies - hertz, where what is seen is known
 * @throws RangeError when an element is impossible
 */
export function madeNetwork(
  elements: readonly Element[],
  tolerance: CutTolerance,
  { seen, targetOhm, temperatureC = 20 }: Ends,
  frequencies: readonly number[],
): MadeNetwork {
  const loose = elements.map((element) => isLoose(element, tolerance));
  const steps = elements.map((element) => stepOf(element, tolerance, temperatureC, frequencies));
  const ends = frequencies.map((frequency) => seen(frequency).port);
  const walk = new Float64Array(4);
  const figures = loose.filter(Boolean).length;
  return {
    figures,
    magnitude: (k, shares) => {
      const { v, i } = ends[k]!;
      walk[0] = v.re;
      walk[1] = v.im;
      walk[2] = i.re;
      walk[3] = i.im;
      let figure = figures;
      for (let e = steps.length - 1; e >= 0; e--) steps[e]!(walk, k, loose[e] ? shares[--figure]! : 0);
      const [vRe, vIm, iRe, iIm] = [walk[0], walk[1], targetOhm * walk[2], targetOhm * walk[3]];
      return Math.sqrt(((vRe - iRe) ** 2 + (vIm - iIm) ** 2) / ((vRe + iRe) ** 2 + (vIm + iIm) ** 2));
    },
  };
}

function stepOf(
  element: Element,
  { lengthM = 0, valuePercent = 0 }: CutTolerance,
  temperatureC: number,
  frequencies: readonly number[],
): Step {
  if (element.kind === "cable" || (element.kind === "stub" && typeof element.end === "string"))
    return lineStep(element, lengthM, element.temperatureC ?? temperatureC, frequencies);
  const twoPort = prepareElement(element, { temperatureC });
  if (element.kind === "part") return partStep(element, twoPort, valuePercent / 100, frequencies);
  return fixedStep(twoPort, frequencies);
}

/** Multiplies the walk by [a b; c d], each re and im in turn. */
function chain(walk: Walk, m: Float64Array, at: number): void {
  const [vRe, vIm, iRe, iIm] = [walk[0]!, walk[1]!, walk[2]!, walk[3]!];
  const row = (to: number, from: number) => {
    walk[to] = m[from]! * vRe - m[from + 1]! * vIm + m[from + 2]! * iRe - m[from + 3]! * iIm;
    walk[to + 1] = m[from]! * vIm + m[from + 1]! * vRe + m[from + 2]! * iIm + m[from + 3]! * iRe;
  };
  row(0, at);
  row(2, at + 4);
}

/** Of an element that is never off. Its matrix is the same up to a real factor, which a reflection does not feel. */
function fixedStep(twoPort: TwoPortAt, frequencies: readonly number[]): Step {
  const m = Float64Array.from(
    frequencies.flatMap((frequency) => {
      const { a, b, c, d } = twoPort(axis(frequency));
      return [a, b, c, d].flatMap(({ re, im }) => [re, im]);
    }),
  );
  return (walk, k) => chain(walk, m, 8 * k);
}

/** A part's impedance grows with the value of a coil or resistor and with the inverse of a capacitor's. */
function partStep(part: PartElement, twoPort: TwoPortAt, most: number, frequencies: readonly number[]): Step {
  const isSeries = part.connection === "series";
  const values = Float64Array.from(
    frequencies.flatMap((frequency) => {
      const { a, b, c, d } = twoPort(axis(frequency));
      const [value, unit] = isSeries ? [b, d] : [c, a];
      // Where a part shorts or opens everything the matrix stands without its 1.
      return [value.re, value.im, unit.re];
    }),
  );
  const isInverse = (part.cF !== undefined) === isSeries;
  const [to, from] = isSeries ? [0, 2] : [2, 0];
  return (walk, k, share) => {
    const factor = isInverse ? 1 / (1 + share * most) : 1 + share * most;
    const [re, im, unit] = [values[3 * k]! * factor, values[3 * k + 1]! * factor, values[3 * k + 2]!];
    const [x, y] = [walk[from]!, walk[from + 1]!];
    walk[to] = unit * walk[to]! + re * x - im * y;
    walk[to + 1] = unit * walk[to + 1]! + re * y + im * x;
    walk[from] = unit * x;
    walk[from + 1] = unit * y;
  };
}

/** A length along the line, or a stub, whose end is cleared of fractions so that no resonance divides by 0. */
function lineStep(
  element: CableElement | StubElement,
  most: number,
  temperatureC: number,
  frequencies: readonly number[],
): Step {
  const { lengthM, paralleled = 1 } = element;
  const { model } = atTemperature(element.line.model, temperatureC);
  const perMetre = frequencies.map((frequency) => propagation(model, axis(frequency)));
  const gamma = Float64Array.from(perMetre.flatMap(({ gamma: g }) => [g.re, g.im]));
  const impedance = Float64Array.from(perMetre.flatMap(({ zc }) => [zc.re / paralleled, zc.im / paralleled]));
  const matrix = new Float64Array(8);
  const fill = element.kind === "cable" ? fillLine : fillStub(element);
  return (walk, k, share) => {
    const length = Math.max(0, lengthM + share * most);
    const [grow, turn] = [Math.exp(gamma[2 * k]! * length), gamma[2 * k + 1]! * length];
    const [even, odd] = [(grow + 1 / grow) / 2, (grow - 1 / grow) / 2];
    const [cosine, sine] = [Math.cos(turn), Math.sin(turn)];
    fill(matrix, even * cosine, odd * sine, odd * cosine, even * sine, impedance[2 * k]!, impedance[2 * k + 1]!);
    chain(walk, matrix, 0);
  };
}

/** Writes a matrix from cosh γl, sinh γl and the characteristic impedance, re and im of each. */
type Fill = (m: Float64Array, cRe: number, cIm: number, sRe: number, sIm: number, zRe: number, zIm: number) => void;

const fillLine: Fill = (m, cRe, cIm, sRe, sIm, zRe, zIm) => {
  const size = zRe * zRe + zIm * zIm;
  m[0] = m[6] = cRe;
  m[1] = m[7] = cIm;
  m[2] = zRe * sRe - zIm * sIm;
  m[3] = zRe * sIm + zIm * sRe;
  m[4] = (sRe * zRe + sIm * zIm) / size;
  m[5] = (sIm * zRe - sRe * zIm) / size;
};

/** V and I at the stub's near end are cosh and sinh/Zc open, Zc·sinh and cosh shorted; the matrix is V or I times its own. */
function fillStub({ end, connection }: StubElement): Fill {
  const isOpen = end === "open";
  const isSeries = connection === "series";
  return (m, cRe, cIm, sRe, sIm, zRe, zIm) => {
    fillLine(m, cRe, cIm, sRe, sIm, zRe, zIm);
    const [vRe, vIm, iRe, iIm] = isOpen ? [cRe, cIm, m[4]!, m[5]!] : [m[2]!, m[3]!, cRe, cIm];
    m[0] = m[6] = isSeries ? iRe : vRe;
    m[1] = m[7] = isSeries ? iIm : vIm;
    m[2] = isSeries ? vRe : 0;
    m[3] = isSeries ? vIm : 0;
    m[4] = isSeries ? 0 : iRe;
    m[5] = isSeries ? 0 : iIm;
  };
}
