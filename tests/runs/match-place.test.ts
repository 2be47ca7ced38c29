import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import {
  feederTo,
  isAtSource,
  isKept,
  piecesBehind,
  placeOfMatch,
  withMatch,
  withoutMatch,
} from "@/lib/runs/match-place";
import type { Element } from "@/lib/runs/circuit-schema";

const cable = (cableId: string, lengthM: number, name?: string): Element => ({
  kind: "cable",
  ...(name !== undefined && { name }),
  line: { cableId },
  lengthM,
});
const joint = (name: string): Element => ({ kind: "joint", name, lossDbAtOneGhz: 0.05 });
const run = [joint("J1"), cable("f10", 1.5, "Jumper"), joint("J2"), cable("f28", 48, "Feeder"), joint("J3")];
const stub: Element = {
  kind: "stub",
  name: "Stub",
  connection: "shunt",
  end: "short",
  line: { cableId: "f28" },
  lengthM: 0.4,
};
const match = [stub, cable("f28", 0.25, "Stub to run")];
const allPlaces = Array.from({ length: run.length + 1 }, (_, place) => place);

test("a match put in at any place stands there, is found there and nowhere else, and comes out without a trace", () => {
  for (const place of allPlaces) {
    const matched = withMatch(run, match, place);
    expect(matched).toHaveLength(run.length + match.length);
    expect(piecesBehind(matched, place)).toEqual(piecesBehind(run, place));
    expect(allPlaces.filter((other) => isKept(matched, match, other))).toEqual([place]);
    expect(placeOfMatch(matched)).toBe(place);
    expect(withoutMatch(matched, match, place)).toEqual(run);
  }
});

test("length on the line of the cable just before the match is taken from that cable, and from no other", () => {
  for (const place of allPlaces) {
    const matched = withMatch(run, match, place);
    const total = matched.reduce((sum, each) => sum + (each.kind === "cable" ? each.lengthM : 0), 0);
    // Only before J3 does the main feeder itself lead to the match.
    expect(total).toBeCloseTo(place === 1 ? 49.5 : 49.75, 9);
  }
  expect(withMatch(run, match, 1)[3]).toEqual(cable("f28", 47.75, "Feeder"));
});

test("a place is at the source where only a match stands in front of it", () => {
  expect(allPlaces.map((place) => isAtSource(run, place))).toEqual([false, false, false, false, false, true]);
  expect(isAtSource(withMatch(run, match, run.length), run.length)).toBe(true);
  expect(isAtSource(withMatch(run, match, 2), 2)).toBe(false);
});

test("a cable shorter than what the match would take of it is left whole", () => {
  const short = [cable("f28", 0.2)];
  expect(withMatch(short, match, 0)).toEqual([...short, ...match]);
});

test("the feeder is the last single cable before the place, not one of the match that stands there, else the first behind", () => {
  expect(allPlaces.map((place) => feederTo(run, place))).toEqual(
    ["f28", "f28", "f10", "f10", "f10", "f10"].map((cableId) => ({ cableId })),
  );
  const section = [cable("c75", 2, "Section")];
  expect(feederTo(withMatch(run, section, 0), 0)).toEqual({ cableId: "f28" });
  expect(feederTo(withMatch(run, section, 2), 2)).toEqual({ cableId: "f10" });
  expect(feederTo([joint("J1")], 0)).toBeUndefined();
  expect(feederTo([{ ...cable("f10", 1), paralleled: 2 } as Element], 0)).toBeUndefined();
});

test("a run without a match has its place at the load, and a place beyond the run is the source", () => {
  expect(placeOfMatch(run)).toBe(0);
  expect(placeOfMatch([])).toBe(0);
  expect(piecesBehind(run, 99)).toEqual(run);
  expect(withMatch(run, match, 99)).toEqual([...match, ...run]);
  expect(isKept([], match, 0)).toBe(false);
  expect(isKept(run, [], 0)).toBe(false);
});

test("putting a match in and taking it out again leaves any run as it was", () => {
  const piece = fc.oneof(
    fc.constantFrom("f10", "f28").chain((id) => fc.integer({ min: 1, max: 90_000 }).map((mm) => cable(id, mm / 1000))),
    fc.constant(joint("J")),
  );
  fc.assert(
    fc.property(fc.array(piece, { maxLength: 6 }), fc.integer({ min: 0, max: 6 }), (elements, wish) => {
      const place = Math.min(wish, elements.length);
      const matched = withMatch(elements, match, place);
      expect(isKept(matched, match, place)).toBe(true);
      expect(withoutMatch(matched, match, place)).toEqual(elements);
    }),
  );
});
