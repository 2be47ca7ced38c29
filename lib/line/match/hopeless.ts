import { abs, isFinite, type Complex } from "@/lib/line/complex";
import type { DesignPoint } from "@/lib/line/match/design-point";
import { reflectionAgainst } from "@/lib/line/match/line-angle";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { knownRange } from "@/lib/line/match/seen-load";
import { frequencyText, ohmText } from "@/lib/line/match/wording";
import { portImpedance } from "@/lib/line/termination";

/** A load whose reflection is within this of 0 or of total cannot or need not be matched (80 dB, 60 dB of loss). */
const matched = 1e-4;
const absorbed = 1e-6;

/** The sentence that says why no method at all can help; undefined where one may. */
export function hopeless(point: DesignPoint): string | undefined {
  const { load, seen, request, words } = point;
  const { designHz } = request;
  // Power that a lossy line behind the network takes is no use to a load that takes none.
  const lost = isTappedBehind(request) ? undefined : idle(portImpedance(seen(designHz).end), "load", request);
  if (lost) return lost;
  const what = `The ${words.matched}`;
  const at = frequencyText(designHz);
  if (load.re < Infinity && !isFinite(load)) return `${what} has no impedance at ${at}.`;
  return idle(load, words.matched, request);
}

/** The sentence that says there is nothing to match; undefined where there is. */
export function alreadyMatched({ load, request, words }: DesignPoint): string | undefined {
  const { targetOhm, designHz } = request;
  if (!(abs(reflectionAgainst(load, targetOhm)) < matched)) return undefined;
  return `The ${words.matched} already is ${ohmText(targetOhm)} at ${frequencyText(designHz)}: nothing to match.`;
}

/** The sentence that says an impedance takes no power; undefined where it takes some, or is not known. */
function idle(impedance: Complex, what: string, { targetOhm, designHz }: MatchRequest): string | undefined {
  const at = frequencyText(designHz);
  const waste = "it takes no power, so there is nothing to match.";
  if (!(impedance.re < Infinity)) return `The ${what} is open at ${at}: ${waste}`;
  const size = abs(reflectionAgainst(impedance, targetOhm));
  if (!(impedance.re > 0) || 1 - size * size < absorbed)
    return `The ${what} is all but a pure reactance at ${at}: ${waste}`;
  return undefined;
}

/** Whether something between the network and the load is there to take power: a node of a bus, a tap. */
function isTappedBehind({ behind = [] }: MatchRequest): boolean {
  return behind.some((each) => each.kind === "shunt" || (each.kind === "stub" && typeof each.end !== "string"));
}

/** The sentence that says the samples of what is matched do not cover the job; undefined where they do. */
export function unknownLoad(request: MatchRequest): string | undefined {
  const { knownHz } = knownRange(request);
  const asked = [request.designHz, ...request.bandHz];
  if (asked.every((f) => f >= knownHz[0] && f <= knownHz[1])) return undefined;
  const what = request.behind?.length ? "What stands behind the match" : "The load";
  const range = knownHz[0] > knownHz[1] ? "at no one frequency" : `from ${knownHz.map(frequencyText).join(" to ")}`;
  return `${what} was measured ${range}, which does not cover the design frequency and the band.`;
}
