import type { DesignPoint } from "@/lib/line/match/design-point";
import {
  ladderElements,
  ladderNotes,
  partNeed,
  partsQ,
  seriesRung,
  shuntRung,
  standardLadder,
  valueText,
  type Ladder,
} from "@/lib/line/match/ladder";
import { lSections, type LSolution, type PartValue } from "@/lib/line/match/l-section";
import { lossySections, type PartsQ } from "@/lib/line/match/l-section-lossy";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { listText, ohmText } from "@/lib/line/match/wording";

/**
 * A coil or capacitor in series and one across, every solution of both topologies: the closed form for parts without
 * loss, else solved with their Q, and each again with standard E24 values as a candidate of its own. One part alone that
 * would match without its loss is a candidate too.
 */
export function lSectionMatches(point: DesignPoint): Outcome {
  const { load, request, words } = point;
  const q = partsQ(request);
  const lossless = lSections(load, request.targetOhm);
  const single = lossless.filter((each) => each.shuntSusceptanceS === 0 || each.seriesReactanceOhm === 0);
  const isLossy = q.coil < Infinity || q.capacitor < Infinity;
  const solutions = isLossy ? [...lossySections(load, request.targetOhm, q), ...single] : lossless;
  const proposals = solutions.flatMap((solution) => {
    const exact = ladderOf(solution, request.designHz, q);
    const standard = standardLadder(point, exact);
    return [proposal(point, exact), ...(standard ? [proposal(point, standard, exact)] : [])];
  });
  return { proposals, why: `No two parts bring the ${words.matched} to ${ohmText(request.targetOhm)}.` };
}

/** The parts that are there, from the target side to the load. */
function ladderOf(solution: LSolution, frequency: number, q: PartsQ): Ladder {
  const { topology, shuntSusceptanceS: b, seriesReactanceOhm: x } = solution;
  const series = x === 0 ? [] : [seriesRung(x, frequency)];
  const shunt = b === 0 ? [] : [shuntRung(b, frequency, q)];
  return topology === "shuntAtLoad" ? [...series, ...shunt] : [...shunt, ...series];
}

function proposal(point: DesignPoint, ladder: Ladder, standardOf?: Ladder): Proposal {
  const { request } = point;
  const isStandard = standardOf !== undefined;
  const list = coilsFirst(ladder);
  const values = listText(list.map((part) => valueText(part, isStandard)));
  const exact = standardOf && listText(coilsFirst(standardOf).map((part) => valueText(part)));
  return {
    method: "lSection",
    title: isStandard ? `${kindOf(list)}, E24 values ${values}` : `${kindOf(list)}, ${values}`,
    elements: ladderElements(ladder, request),
    needs: list.map((part) => partNeed(part, request, isStandard)),
    notes: [
      ...(exact ? [`Standard E24 values; the exact ones are ${exact}.`] : []),
      ...ladderNotes(ladder, point, isStandard),
    ],
  };
}

/** Coils first, and of two alike the one in series. */
function coilsFirst(ladder: Ladder): PartValue[] {
  const list = [...ladder].sort((a, b) => Number(a.connection === "shunt") - Number(b.connection === "shunt"));
  return list.sort((a, b) => b.part.localeCompare(a.part));
}

function kindOf(list: PartValue[]): string {
  const coils = list.filter((part) => part.part === "coil").length;
  if (list.length === 1) return coils === 1 ? "One coil" : "One capacitor";
  return ["Two capacitors", "Coil and capacitor", "Two coils"][coils] ?? "";
}
