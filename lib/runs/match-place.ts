/**
 * Where in a run a match stands, and putting it there. A place is the number of pieces between it and the load, so that
 * it stays the same place when a match is put in or taken out: 0 is the load, all of them the source. Pure.
 */
import { matchPieceNames } from "@/lib/line/match/piece-name";
import { alike } from "@/lib/runs/alike";
import type { Element, LineRef } from "@/lib/runs/circuit-schema";

/** The run in front of a place and behind it. */
function cutAt(elements: readonly Element[], place: number): { before: Element[]; behind: Element[] } {
  const at = Math.max(0, elements.length - place);
  return { before: elements.slice(0, at), behind: elements.slice(at) };
}

/** The pieces between a place and the load. */
export function piecesBehind(elements: readonly Element[], place: number): Element[] {
  return cutAt(elements, place).behind;
}

/** Whether the match stands at the place. */
export function isKept(elements: readonly Element[], match: readonly Element[], place: number): boolean {
  const { before } = cutAt(elements, place);
  return match.length > 0 && before.length >= match.length && alike(before.slice(-match.length), match);
}

const names: readonly (string | undefined)[] = matchPieceNames;
const isMatchPiece = ({ name }: Element) => names.includes(name);

/** The place of a match that is in the run, by what its pieces are called; the load where there is none. */
export function placeOfMatch(elements: readonly Element[]): number {
  const last = elements.findLastIndex(isMatchPiece);
  return last < 0 ? 0 : elements.length - 1 - last;
}

/** Whether nothing of the run stands in front of a place but a match that is there. */
export function isAtSource(elements: readonly Element[], place: number): boolean {
  return cutAt(elements, place).before.every(isMatchPiece);
}

const single = (element: Element | undefined) =>
  element?.kind === "cable" && (element.paralleled ?? 1) === 1 ? element : null;

/** The line that leads to a place: the last cable before it that is not of a match there, else the first behind it. */
export function feederTo(elements: readonly Element[], place: number): LineRef | undefined {
  const { before, behind } = cutAt(elements, place);
  const own = before.slice(0, before.findLastIndex((element) => !isMatchPiece(element)) + 1);
  const feeder = own.findLast((element) => single(element)) ?? behind.find((element) => single(element));
  return single(feeder)?.line;
}

/** Length of the match that is cut from the feeder itself, metres. */
function fromFeeder(match: readonly Element[], feeder: LineRef): number {
  return match.reduce(
    (sum, element) => sum + (alike(single(element)?.line, feeder) ? (single(element)?.lengthM ?? 0) : 0),
    0,
  );
}

/**
 * The run with a match at a place. Length of the match on the cable before it is taken from that cable, where there is
 * enough, so that what stands behind stays where it is.
 */
export function withMatch(elements: readonly Element[], match: readonly Element[], place: number): Element[] {
  const { before, behind } = cutAt(elements, place);
  const feeder = single(before.at(-1));
  const taken = feeder ? fromFeeder(match, feeder.line) : 0;
  if (!feeder || taken === 0 || taken >= feeder.lengthM) return [...before, ...match, ...behind];
  return [...before.slice(0, -1), { ...feeder, lengthM: feeder.lengthM - taken }, ...match, ...behind];
}

/** The run without the match at a place; the length goes back to the cable before it. */
export function withoutMatch(elements: readonly Element[], match: readonly Element[], place: number): Element[] {
  const { before: matched, behind } = cutAt(elements, place);
  const before = matched.slice(0, -match.length);
  const feeder = single(before.at(-1));
  const taken = feeder ? fromFeeder(match, feeder.line) : 0;
  if (!feeder || taken === 0) return [...before, ...behind];
  const whole = Number((feeder.lengthM + taken).toPrecision(12));
  return [...before.slice(0, -1), { ...feeder, lengthM: whole }, ...behind];
}
