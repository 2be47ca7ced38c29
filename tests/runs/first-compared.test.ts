import { expect, test } from "vitest";
import type { CableLine } from "@/lib/cables/line";
import data from "@/seeds/data/cables.json";
import { firstCompared } from "@/lib/runs/first-compared";
import { matchesFor, type MatchAsked } from "@/lib/runs/matching";
import { seededModel } from "@/tests/support/seeded-cables";

function line(id: string): CableLine {
  const plain = { construction: null, build: null, outerDiameterMm: null, limits: {}, condition: null };
  const named = { cableId: id, revision: 1, designation: id.toUpperCase(), name: id, family: "coaxial" } as const;
  return { ...named, ...plain, state: "approved", model: seededModel(id) };
}

const coaxial = data.cables.filter(({ id }) => /^c\d/.test(id)).map(({ id }) => line(id));
const feeder = coaxial.find(({ cableId }) => cableId === "c50-f10")!;
const asked: MatchAsked = {
  load: { kind: "constant", reOhm: 22, imOhm: -35 },
  behind: [],
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [26.96e6, 27.41e6],
  returnLossDb: 14,
  coilQ: 120,
  capacitorQ: 1000,
  temperatureC: 20,
};
const { candidates } = matchesFor(asked, feeder, feeder, coaxial);
const methodOf = (title: string) => candidates.find((each) => each.title === title)?.method;

test("of 22 − j35 Ω at 27.2 MHz the first four are each the best of a method and of at most two pieces, the short stub among them", () => {
  const four = firstCompared(candidates, undefined, 4);
  expect(new Set(four.map(methodOf)).size).toBe(4);
  expect(four.map((each) => each.replaceAll("\u00a0", " "))).toContain(
    "Shorted stub, 951 mm of C50-F10 269 mm from the load",
  );
  for (const title of four)
    expect(candidates.find((each) => each.title === title)!.elements.length).toBeLessThanOrEqual(2);
});

test("the one kept stands first, and a notch that is asked for before the rest", () => {
  const kept = candidates.at(-1)!;
  expect(firstCompared(candidates, kept, 4)[0]).toBe(kept.title);
  const notched = matchesFor({ ...asked, notchHz: 40e6 }, feeder, feeder, coaxial).candidates;
  const [first] = firstCompared(notched, undefined, 4);
  expect(notched.find(({ title }) => title === first)?.method).toBe("notchStub");
});

test("with nothing found nothing stands there, and with one method its best ones fill the places", () => {
  expect(firstCompared([], undefined, 4)).toEqual([]);
  const stubs = candidates.filter(({ method }) => method === "shuntStub");
  expect(firstCompared(stubs, undefined, 4)).toEqual(stubs.slice(0, 4).map(({ title }) => title));
});
