import type { Complex } from "@/lib/line/complex";
import { propagation } from "@/lib/line/cable";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { Line } from "@/lib/line/element";
import type { MatchLine, MatchRequest } from "@/lib/line/match/match-request";
import type { MatchPieceName } from "@/lib/line/match/piece-name";
import { seenLoad, type SeenLoadAt } from "@/lib/line/match/seen-load";
import { frequencyText, lengthText, listText, ohmText } from "@/lib/line/match/wording";
import { atTemperature } from "@/lib/line/temperature";
import { portImpedance } from "@/lib/line/termination";

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
  /** the load, or what the run behind the network shows in its place, ohm */
  load: Complex;
  seen: SeenLoadAt;
  words: PlaceWords;
  feeder: DesignLine | undefined;
  isFeederAssumed: boolean;
  lines: DesignLine[];
}

/** How sentences call what is matched and where. */
export interface PlaceWords {
  /** "the load", or the first piece behind the network */
  place: string;
  /** what the network sees, after "the" or "this": "load" or "run behind" */
  matched: string;
}

/**
 * The load and the lines at the design frequency. Without a feeder, the line whose impedance is nearest to the target
 * takes its place.
 * @throws RangeError when the load is not known there, an element behind the network is impossible, or a line has no
 *   positive resistivity at the temperature
 */
export function designPoint(request: MatchRequest): DesignPoint {
  const lines = request.lines.map((line) => designLine(line, request));
  const named = request.feeder && designLine(request.feeder, request);
  const feeder = named ?? nearest(lines, request.targetOhm);
  const seen = seenLoad(request, request.targetOhm, feeder?.line);
  return {
    request,
    load: portImpedance(seen(request.designHz).port),
    seen,
    words: placeWords(request),
    feeder,
    isFeederAssumed: named === undefined,
    lines,
  };
}

function placeWords({ behind = [] }: MatchRequest): PlaceWords {
  const [first] = behind;
  if (!first) return { place: "the load", matched: "load" };
  const isShort = first.name !== undefined && first.name !== "" && first.name.length <= longestName;
  return { place: isShort ? first.name! : "the run behind", matched: "run behind" };
}

/** Letters of a piece's name that a title still takes. */
const longestName = 32;

/** Phase of a line at a frequency and the request's temperature, 1/m. */
export function phaseAt({ line }: DesignLine, { temperatureC = 20 }: MatchRequest, frequency: number): number {
  const s = { re: 0, im: 2 * Math.PI * frequency };
  return propagation(atTemperature(line.model, temperatureC).model, s).gamma.im;
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

/** Where a network stands: "269 mm from the load", "at J2 mast foot". */
export function placeText({ words }: DesignPoint, distance: number): string {
  return distance > 0 ? `${lengthText(distance)} from ${words.place}` : `at ${words.place}`;
}

/** The name of the length of feeder between a stub or section and what it matches. */
export function leadName({ request }: DesignPoint, what: "Stub" | "Section"): MatchPieceName {
  return request.behind?.length ? `${what} to run` : `${what} to load`;
}

/** A length to cut: the physical one less what its ends and joints add. */
export function cutText({ request }: DesignPoint, length: number): string {
  return lengthText(Math.max(0, length - (request.endAllowanceM ?? 0)));
}

/** The notes every match made of cable carries: how long the lengths are, and what was assumed. */
export function lengthNotes(point: DesignPoint, used: readonly DesignLine[]): string[] {
  const distinct = used.filter((each, index) => used.findIndex((other) => other.label === each.label) === index);
  const factors = distinct.map((each) => `${each.velocityFactor.toFixed(4)} for ${each.label}`);
  const { endAllowanceM = 0, designHz } = point.request;
  const taken = endAllowanceM > 0 ? `${lengthText(endAllowanceM)} of each piece is` : "nothing is";
  const notes = [
    `Lengths are physical, velocity factor ${listText(factors)} at ${frequencyText(designHz)}; ${taken} taken off for ends and joints${endAllowanceM > 0 ? " in what to cut" : ""}.`,
  ];
  const feeder = point.feeder;
  if (point.isFeederAssumed && feeder && distinct.includes(feeder))
    notes.push(
      `No feeder was named: ${feeder.label}, nearest to ${ohmText(point.request.targetOhm)}, is taken from ${point.words.place} on.`,
    );
  return notes;
}
