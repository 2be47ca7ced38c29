import { abs, type Complex } from "@/lib/line/complex";
import type { PartElement } from "@/lib/line/element";
import type { DesignPoint } from "@/lib/line/match/design-point";
import { e24Around } from "@/lib/line/match/e-series";
import {
  lSections,
  seriesPart,
  shuntPart,
  type LSolution,
  type LTopology,
  type PartValue,
} from "@/lib/line/match/l-section";
import type { MatchRequest, Outcome, Proposal } from "@/lib/line/match/match-request";
import type { MatchPieceName } from "@/lib/line/match/piece-name";
import { reflectionOf } from "@/lib/line/match/response";
import { lossySections, type PartsQ } from "@/lib/line/match/l-section-lossy";
import { figure, frequencyText, listText, ohmText } from "@/lib/line/match/wording";

interface Parts {
  topology: LTopology;
  /** either may be missing, not both */
  series?: PartValue;
  shunt?: PartValue;
}

/**
 * A coil or capacitor in series and one across, every solution of both topologies: the closed form for parts without
 * loss, else solved with their Q, and each again with standard E24 values as a candidate of its own. One part alone that
 * would match without its loss is a candidate too.
 */
export function lSectionMatches(point: DesignPoint): Outcome {
  const { load, request, words } = point;
  const q = { coil: request.partQ?.coilQ ?? Infinity, capacitor: request.partQ?.capacitorQ ?? Infinity };
  const lossless = lSections(load, request.targetOhm);
  const single = lossless.filter((each) => each.shuntSusceptanceS === 0 || each.seriesReactanceOhm === 0);
  const isLossy = q.coil < Infinity || q.capacitor < Infinity;
  const solutions = isLossy ? [...lossySections(load, request.targetOhm, q), ...single] : lossless;
  const proposals = solutions.flatMap((solution) => {
    const exact = partsOf(solution, request.designHz, q);
    const standard = standardParts(point, exact);
    return [proposal(point, exact), ...(standard ? [proposal(point, standard, exact)] : [])];
  });
  return { proposals, why: `No two parts bring the ${words.matched} to ${ohmText(request.targetOhm)}.` };
}

function partsOf(
  { topology, shuntSusceptanceS: b, seriesReactanceOhm: x }: LSolution,
  frequency: number,
  q: PartsQ,
): Parts {
  // The susceptance of a lossy part is a little less than that of its reactance alone: 1/(X·(1 + 1/Q²)).
  const lossless = b * (1 + 1 / (b > 0 ? q.capacitor : q.coil) ** 2);
  return {
    topology,
    ...(b !== 0 ? { shunt: shuntPart(lossless, frequency) } : {}),
    ...(x !== 0 ? { series: seriesPart(x, frequency) } : {}),
  };
}

/** Of the standard values on either side, those that match best; undefined where the parts are standard already. */
function standardParts(point: DesignPoint, exact: Parts): Parts | undefined {
  const around = (part?: PartValue) =>
    part ? e24Around(valueOf(part)).map((value) => withValue(part, value)) : [undefined];
  const all = around(exact.series).flatMap((series) =>
    around(exact.shunt).map((shunt): Parts => ({
      topology: exact.topology,
      ...(series && { series }),
      ...(shunt && { shunt }),
    })),
  );
  if (all.length === 1) return undefined;
  return all.reduce((best, each) =>
    abs(reflectionWith(point, each)) < abs(reflectionWith(point, best)) ? each : best,
  );
}

const valueOf = (part: PartValue): number => (part.part === "coil" ? part.lH : part.cF);
const withValue = (part: PartValue, value: number): PartValue =>
  part.part === "coil" ? { part: "coil", lH: value } : { part: "capacitor", cF: value };

/** The parts as elements from the target side to the load. */
function elementsOf({ topology, series, shunt }: Parts, request: MatchRequest): PartElement[] {
  const inSeries = series && [element("series", series, request)];
  const across = shunt && [element("shunt", shunt, request)];
  const [near, far] = topology === "shuntAtLoad" ? [inSeries, across] : [across, inSeries];
  return [...(near ?? []), ...(far ?? [])];
}

function element(connection: "shunt" | "series", part: PartValue, request: MatchRequest): PartElement {
  const name = `${connection === "series" ? "Series" : "Shunt"} ${part.part}` satisfies MatchPieceName;
  const value = part.part === "coil" ? { lH: part.lH } : { cF: part.cF };
  const q = qOf(part, request);
  return { kind: "part", name, connection, ...value, ...(q === undefined ? {} : { q, qAtHz: request.designHz }) };
}

function qOf(part: PartValue, { partQ }: MatchRequest): number | undefined {
  return part.part === "coil" ? partQ?.coilQ : partQ?.capacitorQ;
}

function reflectionWith({ request, seen }: DesignPoint, parts: Parts): Complex {
  return reflectionOf(elementsOf(parts, request), { ...request, seen }, request.designHz);
}

function proposal({ request, words }: DesignPoint, parts: Parts, standardOf?: Parts): Proposal {
  const list = coilsFirst(parts);
  const values = listText(list.map((part) => valueText(part, Boolean(standardOf))));
  const exact = standardOf && listText(coilsFirst(standardOf).map((part) => valueText(part)));
  return {
    method: "lSection",
    title: standardOf ? `${kindOf(list)}, E24 values ${values}` : `${kindOf(list)}, ${values}`,
    elements: elementsOf(parts, request),
    needs: list.map((part) => needOf(part, request, Boolean(standardOf))),
    notes: [
      ...(exact ? [`Standard E24 values; the exact ones are ${exact}.`] : []),
      placeNote(parts, words.place, Boolean(standardOf)),
      ...(list.some((part) => qOf(part, request) === undefined) ? ["A part without a Q is taken as lossless."] : []),
    ],
  };
}

function coilsFirst({ series, shunt }: Parts): PartValue[] {
  const list = [series, shunt].filter((part) => part !== undefined);
  return list.sort((a, b) => b.part.localeCompare(a.part));
}

function kindOf(list: PartValue[]): string {
  const coils = list.filter((part) => part.part === "coil").length;
  if (list.length === 1) return coils === 1 ? "One coil" : "One capacitor";
  return ["Two capacitors", "Coil and capacitor", "Two coils"][coils] ?? "";
}

/** Standard values are given as they are printed on the part, 56 nH rather than 56.0 nH. */
function valueText(part: PartValue, isStandard = false): string {
  const digits = isStandard ? 2 : 3;
  return part.part === "coil" ? figure(part.lH, "H", digits) : figure(part.cF, "F", digits);
}

function needOf(part: PartValue, request: MatchRequest, isStandard: boolean): string {
  const q = qOf(part, request);
  const quality =
    q === undefined ? "" : `, Q at least ${Number(q.toPrecision(4))} at ${frequencyText(request.designHz)}`;
  return `1 ${part.part} ${valueText(part, isStandard)}${quality}`;
}

function placeNote({ topology, series, shunt }: Parts, place: string, isStandard: boolean): string {
  const inSeries = series && `${valueText(series, isStandard)} in series`;
  const across = shunt && `${valueText(shunt, isStandard)} across the line`;
  const [near, far] = topology === "shuntAtLoad" ? [across, inSeries] : [inSeries, across];
  return `From ${place} toward the source: ${[near, far].filter((each) => each !== undefined).join(", then ")}.`;
}
