import { abs, isFinite, type Complex } from "@/lib/line/complex";
import { propagation } from "@/lib/line/cable";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { Line } from "@/lib/line/element";
import { reflectionAgainst } from "@/lib/line/match/line-angle";
import type { MatchLine, MatchRequest } from "@/lib/line/match/match-request";
import { frequencyText, listText, ohmText } from "@/lib/line/match/wording";
import { atTemperature } from "@/lib/line/temperature";
import { terminationImpedance } from "@/lib/line/termination";

/** A line at the design frequency and the request's temperature. */
export interface DesignLine {
  /** for elements: the line without its label */
  line: Line;
  label: string;
  /** 1/m */
  gamma: Complex;
  /** ohm */
  zc: Complex;
  wavelengthM: number;
  velocityFactor: number;
}

/** Everything a method designs with. */
export interface DesignPoint {
  request: MatchRequest;
  load: Complex;
  feeder: DesignLine | undefined;
  isFeederAssumed: boolean;
  lines: DesignLine[];
}

/** A load whose reflection is within this of 0 or of total cannot or need not be matched (80 dB, 60 dB of loss). */
const matched = 1e-4;
const absorbed = 1e-6;

/**
 * The load and the lines at the design frequency. Without a feeder, the line whose impedance is nearest to the target
 * takes its place.
 * @throws RangeError when the load is not known there, or a line has no positive resistivity at the temperature
 */
export function designPoint(request: MatchRequest): DesignPoint {
  const lines = request.lines.map((line) => designLine(line, request));
  const named = request.feeder && designLine(request.feeder, request);
  return {
    request,
    load: terminationImpedance(request.load, { re: 0, im: 2 * Math.PI * request.designHz }),
    feeder: named ?? nearest(lines, request.targetOhm),
    isFeederAssumed: named === undefined,
    lines,
  };
}

function designLine({ label, ...line }: MatchLine, { designHz, temperatureC = 20 }: MatchRequest): DesignLine {
  const omega = 2 * Math.PI * designHz;
  const { gamma, zc } = propagation(atTemperature(line.model, temperatureC).model, { re: 0, im: omega });
  return {
    line,
    label: label ?? `the ${ohmText(zc.re)} line`,
    gamma: { re: gamma.re, im: gamma.im },
    zc,
    wavelengthM: (2 * Math.PI) / gamma.im,
    velocityFactor: omega / gamma.im / SPEED_OF_LIGHT,
  };
}

/** The line whose impedance is nearest to a resistance, by ratio; undefined where there is none. */
function nearest(lines: readonly DesignLine[], ohms: number): DesignLine | undefined {
  const distance = (each: DesignLine) => Math.abs(Math.log(each.zc.re / ohms));
  return lines.reduce<DesignLine | undefined>(
    (best, each) => (best && distance(best) <= distance(each) ? best : each),
    undefined,
  );
}

/** The sentence that says why no method at all can help; undefined where one may. */
export function hopeless({ load, request }: DesignPoint): string | undefined {
  const at = frequencyText(request.designHz);
  if (!(load.re < Infinity)) return `The load is open at ${at}: it takes no power, so there is nothing to match.`;
  if (!isFinite(load)) return `The load has no impedance at ${at}.`;
  const size = abs(reflectionAgainst(load, request.targetOhm));
  if (size < matched) return `The load already is ${ohmText(request.targetOhm)} at ${at}: nothing to match.`;
  if (!(load.re > 0) || 1 - size * size < absorbed)
    return `The load is all but a pure reactance at ${at}: it takes no power, so there is nothing to match.`;
  return undefined;
}

/** The frequencies over which the load is known, and those of its own samples. */
export function knownRange({ load }: MatchRequest): { knownHz: [number, number]; besidesHz: readonly number[] } {
  if (load.kind !== "sampled") return { knownHz: [0, Infinity], besidesHz: [] };
  const { frequenciesHz } = load;
  return {
    knownHz: [frequenciesHz[0] ?? Infinity, frequenciesHz[frequenciesHz.length - 1] ?? 0],
    besidesHz: frequenciesHz,
  };
}

/** The sentence that says the load's samples do not cover the job; undefined where they do. */
export function unknownLoad(request: MatchRequest): string | undefined {
  const { knownHz } = knownRange(request);
  const asked = [request.designHz, ...request.bandHz];
  if (asked.every((f) => f >= knownHz[0] && f <= knownHz[1])) return undefined;
  const range = knownHz.map(frequencyText).join(" to ");
  return `The load was measured from ${range}, which does not cover the design frequency and the band.`;
}

/** The notes every match made of cable carries: how long the lengths are, and what was assumed. */
export function lengthNotes(point: DesignPoint, used: readonly DesignLine[]): string[] {
  const distinct = used.filter((each, index) => used.findIndex((other) => other.label === each.label) === index);
  const factors = distinct.map((each) => `${each.velocityFactor.toFixed(4)} for ${each.label}`);
  const notes = [
    `Lengths are physical, velocity factor ${listText(factors)} at ${frequencyText(point.request.designHz)}; nothing is taken off for ends and joints.`,
  ];
  const feeder = point.feeder;
  if (point.isFeederAssumed && feeder && distinct.includes(feeder))
    notes.push(
      `No feeder was named: ${feeder.label}, nearest to ${ohmText(point.request.targetOhm)}, is taken from the load on.`,
    );
  return notes;
}
