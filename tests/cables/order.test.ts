import fc from "fast-check";
import { expect, test } from "vitest";
import type { Candidate } from "@/lib/cables/filter";
import { filters, sift } from "@/lib/cables/filter";
import { comparePlaces, firstInOrder, sortedBy } from "@/lib/cables/order";

const entry = (id: string, z0Ohm: number, outerDiameterMm: number | null): Candidate => ({
  ...{ id, designation: id.toUpperCase(), family: "coaxial", state: "approved", preferred: false, revision: 1 },
  ...{ authorId: "x", z0Ohm, velocityFactor: 0.8, capacitanceFPerM: 1e-10, outerDiameterMm, maxFrequencyHz: null },
  lossDbPer100m: null,
});

// Few different values, so that ties and missing ones are common.
const entries = fc
  .array(fc.tuple(fc.integer({ min: 1, max: 4 }), fc.option(fc.integer({ min: 1, max: 4 }))), { maxLength: 40 })
  .map((pairs) => pairs.map(([z0, outer], i) => entry(`c${i}`, z0, outer)));

test("firstInOrder(entries, …) finds what sorting them all and cutting the front off finds, from any place on", () => {
  fc.assert(
    fc.property(entries, fc.boolean(), fc.integer({ min: 1, max: 7 }), fc.nat(39), (all, isReversed, most, from) => {
      const valueOf = sortedBy("outerDiameter", () => 0);
      const place = (one: Candidate) => ({ key: valueOf(one), id: one.id });
      const sorted = [...all].sort((a, b) => comparePlaces(place(a), place(b), isReversed));
      const start = sorted[from];
      const rest = start ? sorted.slice(from + 1) : sorted;
      const found = firstInOrder(all, valueOf, isReversed, { after: start && place(start), most });
      expect(found.items.map(({ id }) => id)).toEqual(rest.slice(0, most).map(({ id }) => id));
      expect(found.count).toBe(rest.length);
    }),
  );
});

test("sift(entries, filters) tells what passes all filters, and what one filter alone keeps out", () => {
  const all = [entry("a", 50, 5), entry("b", 75, 5), entry("c", 75, 20), entry("d", 50, null)];
  const asked = filters({ z0Ohm: { to: 60 }, outerDiameterMm: { to: 10 } }, undefined);
  const { passing, keptOutBy } = sift(all, asked);
  expect(passing.map(({ id }) => id)).toEqual(["a"]);
  expect(keptOutBy.z0Ohm?.map(({ id }) => id)).toEqual(["b"]);
  expect(keptOutBy.outerDiameterMm?.map(({ id }) => id)).toEqual(["d"]);
});

test("sift(entries, filters) counts an entry that two filters of one name keep out under that name", () => {
  const asked = filters({ maxFrequencyHz: 1e9, preferred: true }, undefined);
  expect(sift([entry("a", 50, 5)], asked).keptOutBy.others).toHaveLength(1);
});
