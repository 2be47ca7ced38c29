/** What a match that does not stand at the load leaves on the line behind it, in figures and in words. Pure. */
import { nominalFigures } from "@/lib/line/cable";
import { portReflection, vswr } from "@/lib/line/reflection";
import { sweep } from "@/lib/line/run";
import { abs } from "@/lib/line/complex";
import { decibels, frequency, inWords, ratio } from "@/lib/format/quantity";
import type { MatchAsked } from "@/lib/runs/matching";

export interface LeftBehind {
  /** what the match sees at the design frequency, ohm */
  impedance: { re: number; im: number };
  /** the longest cable behind: its place among the pieces behind, and the VSWR at its load end in its own impedance */
  longest: { index: number; vswr: number } | null;
  /** power into the run behind over power in the load, dB */
  lossDb: number;
  /** what the same pieces lose between matched ends, dB */
  matchedLossDb: number;
}

/** The run behind a match at the design frequency. Throws RangeError as the engine does. */
export function leftBehind({ behind, load, targetOhm, designHz, temperatureC }: MatchAsked): LeftBehind {
  const source = { kind: "constant", reOhm: targetOhm, imOhm: 0 } as const;
  const planes = behind.map((_, k) => (k + 1 < behind.length ? { beforeElement: k + 1 } : ({ at: "load" } as const)));
  const at = sweep({ source, elements: behind, load }, [designHz], { temperatureC, planes });
  const lengths = behind.map((each) => (each.kind === "cable" ? each.lengthM : 0));
  const index = lengths.indexOf(Math.max(0, ...lengths));
  const cable = behind[index];
  const seen = at.atPlanes[index];
  const waveOn = () => {
    if (cable?.kind !== "cable" || !(cable.lengthM > 0) || !seen) return null;
    const z0 = nominalFigures(cable.line.model).z0 / (cable.paralleled ?? 1);
    const end = { re: seen.impedance.re[0]!, im: seen.impedance.im[0]! };
    const isOpen = !(end.re < Infinity);
    const reflection = isOpen ? 1 : abs(portReflection(end, { re: 1, im: 0 }, { re: z0, im: 0 }));
    return { index, vswr: vswr(reflection) };
  };
  return {
    impedance: { re: at.inputImpedance.re[0]!, im: at.inputImpedance.im[0]! },
    longest: waveOn(),
    lossDb: at.transducerLossDb[0]! - at.mismatchLossDb[0]!,
    matchedLossDb: at.matchedLossDb[0]!,
  };
}

/** Below this VSWR, and below this extra loss, nobody would match the line for its own sake. */
const fairVswr = 1.1;
const littleDb = 0.005;

export interface PlaceNames {
  /** whether the match stands at the source, so that no line is left in front of it */
  isAtSource: boolean;
  sourceName: string;
  /** the longest cable behind */
  cableName: string;
}

/**
 * The sentence about the line behind a match, with what is true first and the way out after it.
 * @returns `isWarning` where a standing wave stays on that line
 */
export function leftBehindSentence(
  { longest, lossDb, matchedLossDb }: LeftBehind,
  designHz: number,
  { isAtSource, sourceName, cableName }: PlaceNames,
): { text: string; isWarning: boolean } | null {
  if (!Number.isFinite(lossDb)) return null;
  const db = (value: number) => inWords(decibels(value, 2));
  const lost = `${db(lossDb)} is lost between it and the load at ${inWords(frequency(designHz))}`;
  if (!longest || longest.vswr < fairVswr)
    return { text: `No standing wave worth the name is left behind the match; ${lost}.`, isWarning: false };
  const spared = isAtSource ? sourceName || "the source" : "the line before it";
  const extra = lossDb - matchedLossDb;
  const share = extra < littleDb ? "no more than between matched ends" : `${db(extra)} of it to the standing wave`;
  const atLoad = extra < littleDb ? "" : ` Matched at the load, the same pieces lose ${db(matchedLossDb)}.`;
  return {
    text: `A match here serves ${spared}, not the line behind it: ${cableName} keeps a VSWR of ${inWords(ratio(longest.vswr))}, and ${lost}, ${share}.${atLoad}`,
    isWarning: true,
  };
}
