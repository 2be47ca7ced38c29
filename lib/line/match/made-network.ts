/**
 * A network as it may be made, its lengths and values off by shares of a tolerance: the same figures as `responder`,
 * without objects, for many makings at a few frequencies.
 */
import type { Element, PartElement } from "@/lib/line/element";
import { prepareElement } from "@/lib/line/element-two-port";
import type { CutTolerance } from "@/lib/line/match/at-limits";
import { madeBeside } from "@/lib/line/match/made-beside";
import { chainWalk, madeLine } from "@/lib/line/match/made-line";
import type { Ends } from "@/lib/line/match/response";
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
  if (element.kind === "cable" || element.kind === "stub" || element.kind === "parallel") return lengthM > 0;
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
  const ends = Float64Array.from(
    frequencies.flatMap((frequency) => {
      const { v, i } = seen(frequency).port;
      return [v.re, v.im, i.re, i.im];
    }),
  );
  const walk = new Float64Array(4);
  const figures = loose.filter(Boolean).length;
  return {
    figures,
    magnitude: (k, shares) => {
      for (let n = 0; n < 4; n++) walk[n] = ends[4 * k + n]!;
      let figure = figures;
      for (let e = steps.length - 1; e >= 0; e--) steps[e]!(walk, k, loose[e] ? shares[--figure]! : 0);
      const iRe = targetOhm * walk[2]!;
      const iIm = targetOhm * walk[3]!;
      const away = (walk[0]! - iRe) ** 2 + (walk[1]! - iIm) ** 2;
      return Math.sqrt(away / ((walk[0]! + iRe) ** 2 + (walk[1]! + iIm) ** 2));
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
    return madeLine(element, lengthM, element.temperatureC ?? temperatureC, frequencies);
  if (element.kind === "parallel")
    return madeBeside(element, lengthM, element.temperatureC ?? temperatureC, frequencies);
  const twoPort = prepareElement(element, { temperatureC });
  if (element.kind === "part") return partStep(element, twoPort, valuePercent / 100, frequencies);
  return fixedStep(twoPort, frequencies);
}

/** Of an element that is never off. Its matrix is the same up to a real factor, which a reflection does not feel. */
function fixedStep(twoPort: TwoPortAt, frequencies: readonly number[]): Step {
  const m = Float64Array.from(
    frequencies.flatMap((frequency) => {
      const { a, b, c, d } = twoPort(axis(frequency));
      return [a, b, c, d].flatMap(({ re, im }) => [re, im]);
    }),
  );
  return (walk, k) => chainWalk(walk, m, 8 * k);
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
  const to = isSeries ? 0 : 2;
  const from = isSeries ? 2 : 0;
  return (walk, k, share) => {
    const factor = isInverse ? 1 / (1 + share * most) : 1 + share * most;
    const re = values[3 * k]! * factor;
    const im = values[3 * k + 1]! * factor;
    const unit = values[3 * k + 2]!;
    const x = walk[from]!;
    const y = walk[from + 1]!;
    walk[to] = unit * walk[to]! + re * x - im * y;
    walk[to + 1] = unit * walk[to + 1]! + re * y + im * x;
    walk[from] = unit * x;
    walk[from + 1] = unit * y;
  };
}
