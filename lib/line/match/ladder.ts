/** Coils and capacitors in a row, across and in series: as elements, in standard values, in words. */
import { abs } from "@/lib/line/complex";
import type { PartElement } from "@/lib/line/element";
import type { DesignPoint } from "@/lib/line/match/design-point";
import { e24Around } from "@/lib/line/match/e-series";
import { seriesPart, shuntPart, type PartValue } from "@/lib/line/match/l-section";
import type { PartsQ } from "@/lib/line/match/l-section-lossy";
import type { MatchRequest } from "@/lib/line/match/match-request";
import type { MatchPieceName } from "@/lib/line/match/piece-name";
import { reflectionOf } from "@/lib/line/match/response";
import { figure, frequencyText } from "@/lib/line/match/wording";

export type Rung = { connection: "shunt" | "series" } & PartValue;

/** A ladder from the target side to the load. */
export type Ladder = readonly Rung[];

/** Q of the request's parts; Infinity for those without loss. */
export function partsQ({ partQ }: MatchRequest): PartsQ {
  return { coil: partQ?.coilQ ?? Infinity, capacitor: partQ?.capacitorQ ?? Infinity };
}

/** The part in series that has a reactance, ohm, not 0. */
export function seriesRung(reactanceOhm: number, frequency: number): Rung {
  return { connection: "series", ...seriesPart(reactanceOhm, frequency) };
}

/**
 * The part across that has a susceptance with its own loss, siemens, not 0. The susceptance of a lossy part is a little
 * less than that of its reactance alone: 1/(X·(1 + 1/Q²)).
 */
export function shuntRung(susceptanceS: number, frequency: number, q: PartsQ): Rung {
  const lossless = susceptanceS * (1 + 1 / (susceptanceS > 0 ? q.capacitor : q.coil) ** 2);
  return { connection: "shunt", ...shuntPart(lossless, frequency) };
}

const valueOf = (part: PartValue): number => (part.part === "coil" ? part.lH : part.cF);

function withValue({ connection, part }: Rung, value: number): Rung {
  return part === "coil" ? { connection, part, lH: value } : { connection, part, cF: value };
}

export function qOf({ part }: PartValue, { partQ }: MatchRequest): number | undefined {
  return part === "coil" ? partQ?.coilQ : partQ?.capacitorQ;
}

/** The ladder as elements from the target side to the load. */
export function ladderElements(ladder: Ladder, request: MatchRequest): PartElement[] {
  return ladder.map((rung) => {
    const name = `${rung.connection === "series" ? "Series" : "Shunt"} ${rung.part}` satisfies MatchPieceName;
    const value = rung.part === "coil" ? { lH: rung.lH } : { cF: rung.cF };
    const q = qOf(rung, request);
    const quality = q === undefined ? {} : { q, qAtHz: request.designHz };
    return { kind: "part", name, connection: rung.connection, ...value, ...quality };
  });
}

/** Of the E24 values on either side of each part, those that match best; undefined where all are standard already. */
export function standardLadder({ request, seen }: DesignPoint, exact: Ladder): Ladder | undefined {
  const all = exact.reduce<Rung[][]>(
    (begun, rung) =>
      begun.flatMap((list) => e24Around(valueOf(rung)).map((value) => [...list, withValue(rung, value)])),
    [[]],
  );
  if (all.length === 1) return undefined;
  const tried = all.map((ladder) => ({
    ladder,
    size: abs(reflectionOf(ladderElements(ladder, request), { ...request, seen }, request.designHz)),
  }));
  return tried.reduce((best, each) => (each.size < best.size ? each : best)).ladder;
}

/** Standard values are given as they are printed on the part, 56 nH rather than 56.0 nH. */
export function valueText(part: PartValue, isStandard = false): string {
  const digits = isStandard ? 2 : 3;
  return part.part === "coil" ? figure(part.lH, "H", digits) : figure(part.cF, "F", digits);
}

/** What to buy for a part. */
export function partNeed(part: PartValue, request: MatchRequest, isStandard: boolean): string {
  const q = qOf(part, request);
  const quality =
    q === undefined ? "" : `, Q at least ${Number(q.toPrecision(4))} at ${frequencyText(request.designHz)}`;
  return `1 ${part.part} ${valueText(part, isStandard)}${quality}`;
}

/** Where each part of a ladder goes, from what is matched on, and whether their loss is counted. */
export function ladderNotes(ladder: Ladder, { request, words }: DesignPoint, isStandard: boolean): string[] {
  const rungs = ladder.map(
    (rung) => `${valueText(rung, isStandard)} ${rung.connection === "series" ? "in series" : "across the line"}`,
  );
  return [
    `From ${words.place} toward the source: ${rungs.reverse().join(", then ")}.`,
    ...(ladder.some((rung) => qOf(rung, request) === undefined) ? ["A part without a Q is taken as lossless."] : []),
  ];
}
