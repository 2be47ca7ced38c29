import { abs2, reciprocal, type Complex } from "@/lib/line/complex";
import { distancesAtCosine, impedanceAlong, reflectionAgainst } from "@/lib/line/match/line-angle";
import { stubLength, type StubEnd } from "@/lib/line/match/single-stub";

export interface DoubleStubPlan {
  load: Complex;
  /** the line between load, stubs and target, ohm, above 0 */
  lineOhm: number;
  /** what the match must show, ohm, above 0 */
  targetOhm: number;
  stubOhm: number;
  /** of both stubs, across the line */
  end: StubEnd;
  /** wavelengths of the line from the load to the first stub, at least 0 */
  firstDistance: number;
  /** wavelengths of the line from the first stub to the second, above 0 */
  spacing: number;
}

export interface DoubleStubSolution {
  /** wavelengths of the stub's own line, nearer to the load */
  first: number;
  second: number;
}

/** Conductances nearer to the limit than this share of it stand on it. */
const rounding = 1e-12;

/**
 * Largest conductance at the first stub from which the second can complete a match: (Y0²/Yt)/sin²(2π·spacing).
 * @returns siemens; Infinity where the stubs are whole half waves apart, and then only the target's own can be matched
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, eq. 5.21, here for a target that need not be the line.
 */
export function largestConductance(lineOhm: number, targetOhm: number, spacing: number): number {
  const sine = Math.sin(2 * Math.PI * spacing);
  return targetOhm / (lineOhm * sine) ** 2;
}

/** Conductance that the line shows where the first stub stands, siemens. */
export function conductanceAt(load: Complex, lineOhm: number, distance: number): number {
  return reciprocal(impedanceAlong(load, lineOhm, distance)).re;
}

/**
 * Double-stub match on lossless lines, both solutions: the first stub brings the line's admittance to where the spacing
 * carries it onto the target's conductance, the second takes away the rest.
 * @returns sorted by the first stub; one where both coincide, none in the forbidden region (see `largestConductance`) or
 *   where the load takes no power
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, section 5.3, with cosine and sine in the place of the
 * tangent so that a quarter wave is no exception, and for a target that need not be the line; convention e^{+jωt}.
 */
export function doubleStub(plan: DoubleStubPlan): DoubleStubSolution[] {
  const { load, lineOhm, targetOhm, firstDistance, spacing } = plan;
  if (!(load.re > 0)) return [];
  const seen = reciprocal(impedanceAlong(load, lineOhm, firstDistance));
  const [line, target] = [1 / lineOhm, 1 / targetOhm];
  const [cosine, sine] = [Math.cos(2 * Math.PI * spacing), Math.sin(2 * Math.PI * spacing)];
  // (Y0·cos − B·sin)² is what is left for the susceptance B after the first stub.
  const left = (seen.re * line * line) / target - (seen.re * sine) ** 2;
  if (Math.abs(sine) < rounding || left < -rounding * (seen.re * sine) ** 2) return [];
  const reach = Math.sqrt(Math.max(0, left));
  return (reach === 0 ? [0] : [reach, -reach])
    .map((each) => {
      const total = (line * cosine - each) / sine;
      return {
        first: lengthOf(plan, total - seen.im),
        second: lengthOf(plan, -susceptanceAfter({ re: seen.re, im: total }, line, cosine, sine)),
      };
    })
    .sort((a, b) => a.first - b.first);
}

function lengthOf({ stubOhm, end }: DoubleStubPlan, susceptance: number): number {
  return stubLength(susceptance, 1 / stubOhm, end === "open");
}

/** Im of Y0·(Y·cos + j·Y0·sin)/(Y0·cos + j·Y·sin), siemens. */
function susceptanceAfter({ re: g, im: b }: Complex, line: number, cosine: number, sine: number): number {
  const under = { re: line * cosine - b * sine, im: g * sine };
  const over = { re: g * cosine, im: b * cosine + line * sine };
  return (line * (over.im * under.re - over.re * under.im)) / abs2(under);
}

/** A choice of places that just works; undefined where no value of it does. */
export interface NearestPlaces {
  spacing?: number;
  firstDistance?: number;
}

/**
 * The spacing and the first distance nearest to those asked, each with the other as asked, at which a match in the
 * forbidden region becomes possible. Both stand on its edge, where the two solutions are one.
 * @returns wavelengths; the spacing above 0 and under a half wave, the distance 0 to under a half wave
 * Source: derived here from `largestConductance` and |Γ| on the line.
 */
export function nearestPlaces({ load, lineOhm, targetOhm, firstDistance, spacing }: DoubleStubPlan): NearestPlaces {
  const conductance = conductanceAt(load, lineOhm, firstDistance);
  const sine = Math.sqrt(targetOhm / conductance) / lineOhm;
  const away = Math.asin(Math.min(1, sine)) / (2 * Math.PI);
  const reflection = reflectionAgainst(load, lineOhm);
  const size = abs2(reflection);
  const most = largestConductance(lineOhm, targetOhm, spacing);
  const cosine = ((1 - size) / (most * lineOhm) - 1 - size) / (2 * Math.sqrt(size));
  const distances = distancesAtCosine(reflection, cosine).map((each) => ({
    each,
    far: turnsApart(each, firstDistance),
  }));
  // Of two equally near ones that which needs less line.
  const isTie = (a: number, b: number) => Math.abs(a - b) < 1e-9;
  const nearest = distances.sort((a, b) => (isTie(a.far, b.far) ? a.each - b.each : a.far - b.far))[0];
  return {
    ...(away > 0 && { spacing: turnsApart(away, spacing) <= turnsApart(0.5 - away, spacing) ? away : 0.5 - away }),
    ...(nearest && { firstDistance: nearest.each }),
  };
}

/** Distance of two places on a line that repeats itself each half wave. */
function turnsApart(a: number, b: number): number {
  const apart = Math.abs(a - b) % 0.5;
  return Math.min(apart, 0.5 - apart);
}
