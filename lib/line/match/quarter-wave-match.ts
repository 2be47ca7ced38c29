import { abs, type Complex } from "@/lib/line/complex";
import type { Element } from "@/lib/line/element";
import {
  cutText,
  leadName,
  lengthNotes,
  placeText,
  type DesignLine,
  type DesignPoint,
} from "@/lib/line/match/design-point";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { reflectionAgainst } from "@/lib/line/match/line-angle";
import { realPoints, sectionImpedance } from "@/lib/line/match/quarter-wave";
import { along, loadPair } from "@/lib/line/match/pair";
import { trimNotes } from "@/lib/line/match/trim";
import { withoutReactance } from "@/lib/line/match/without-reactance";
import { decibelText, lengthText, listText, ohmText } from "@/lib/line/match/wording";
import { portReflection, returnLossDb } from "@/lib/line/reflection";

interface Place {
  /** metre of feeder, load to section */
  distance: number;
  /** the section's ideal impedance here, ohm */
  neededOhm: number;
}

interface Try extends Place {
  line: DesignLine;
  returnLossDb: number;
}

/** What a section must add to the return loss without it, dB. */
const leastGainDb = 1;

/**
 * A quarter-wave section where the feeder shows a resistance: at the load itself where that is one, else at the extremes
 * of voltage. The section is a real line, electrically a quarter wave by its own phase; its distance is solved again so
 * that the loss leaves no reactance, and what it reaches at the design frequency decides whether it is a match.
 */
export function quarterWaveMatches(point: DesignPoint): Outcome {
  const { feeder, lines, request } = point;
  if (!feeder || lines.length === 0) return { proposals: [], why: "No line was named to cut a section from." };
  const places = realPoints(point.load, feeder.zc.re).map(({ distance, resistanceOhm }) => ({
    distance: distance * feeder.wavelengthM,
    neededOhm: sectionImpedance(request.targetOhm, resistanceOhm),
  }));
  if (places.length === 0) places.push({ distance: 0, neededOhm: sectionImpedance(request.targetOhm, point.load.re) });
  const tries = lines.flatMap((line) => places.map((place) => tryLine(point, feeder, line, place)));
  // A section near the feeder's own impedance changes nothing: where the load is fair already, that is no match.
  const alone = returnLossDb(abs(reflectionAgainst(point.load, request.targetOhm)));
  const reached = tries.filter((each) => each.returnLossDb >= Math.max(request.returnLossDb, alone + leastGainDb));
  return {
    proposals: reached.map((each) => proposal(point, feeder, each)),
    why: reached.length === 0 ? reason(point, places, tries, alone) : "",
  };
}

function tryLine(point: DesignPoint, feeder: DesignLine, line: DesignLine, place: Place): Try {
  const reflection = (distance: number): Complex => {
    const { v, i } = along(along(loadPair(point), feeder, distance), line, line.wavelengthM / 4);
    return portReflection(v, i, { re: point.request.targetOhm, im: 0 });
  };
  const halfWave = feeder.wavelengthM / 2;
  const solved = withoutReactance((distance) => reflection(distance).im, place.distance, halfWave / 50);
  // Loss can push the place just past the load; the load itself is then the nearest that can be built.
  const distance = solved < 0 ? (place.distance < halfWave / 50 ? 0 : solved + halfWave) : solved;
  return { ...place, distance, line, returnLossDb: returnLossDb(abs(reflection(distance))) };
}

function proposal(point: DesignPoint, feeder: DesignLine, { line, distance, neededOhm }: Try): Proposal {
  const length = line.wavelengthM / 4;
  const build = (lengthM: number): Element[] => [
    { kind: "cable", name: "Quarter-wave section", line: line.line, lengthM },
    ...(distance > 0
      ? [{ kind: "cable" as const, name: leadName(point, "Section"), line: feeder.line, lengthM: distance }]
      : []),
  ];
  const where = placeText(point, distance);
  return {
    method: "quarterWave",
    title: `Quarter-wave section, ${lengthText(length)} of ${line.label} ${where}`,
    elements: build(length),
    needs: [
      "2 joints",
      `${cutText(point, length)} of ${line.label} for the section`,
      ...(distance > 0 ? [`${cutText(point, distance)} of ${feeder.label} to ${point.words.place}`] : []),
    ],
    notes: [
      `An exact section here would be ${ohmText(neededOhm)}; ${line.label} is ${ohmText(line.zc.re)}.`,
      ...lengthNotes(point, distance > 0 ? [line, feeder] : [line]),
      ...trimNotes(point, "section", build, length),
    ],
  };
}

function reason(point: DesignPoint, places: Place[], tries: Try[], alone: number): string {
  const needed = places.map((each) => `${ohmText(each.neededOhm)} ${placeText(point, each.distance)}`);
  const best = tries.reduce((a, b) => (b.returnLossDb > a.returnLossDb ? b : a));
  const { returnLossDb: asked } = point.request;
  const short =
    best.returnLossDb < asked
      ? `not ${decibelText(asked)}`
      : `not a decibel better than the ${point.words.matched} alone with ${decibelText(alone)}`;
  return `A quarter-wave section needs ${listText(needed, "or")}; of the lines given, ${best.line.label} of ${ohmText(best.line.zc.re)} comes nearest and reaches ${decibelText(best.returnLossDb)}, ${short}.`;
}
