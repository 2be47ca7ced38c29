import { expect, test } from "vitest";
import type { CableLine } from "@/lib/cables/line";
import { modelFromNominal } from "@/lib/line/cable";
import { isKept, withMatch, withoutMatch } from "@/lib/runs/match-place";
import { candidateCurve, candidateSteps, matchesFor, storedElements, type MatchAsked } from "@/lib/runs/matching";
import type { Element } from "@/lib/runs/circuit-schema";

function cable(designation: string, z0: number): CableLine {
  return {
    cableId: designation.toLowerCase(),
    revision: 1,
    designation,
    name: designation,
    family: "coaxial",
    state: "approved",
    condition: null,
    model: modelFromNominal({
      z0,
      velocityFactor: 0.85,
      conductors: [{ form: "sqrt", r0OhmPerM: 0.0086, skinCornerRadPerS: 1.1e5 }],
    }),
    construction: null,
    build: null,
    outerDiameterMm: null,
    limits: {},
  };
}
const feeder = cable("F50", 50);
const asked: MatchAsked = {
  load: { kind: "constant", reOhm: 22, imOhm: -35 },
  behind: [],
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [26.9e6, 27.5e6],
  returnLossDb: 14,
  coilQ: 120,
  capacitorQ: 1000,
  temperatureC: 20,
};
const found = matchesFor(asked, feeder, feeder, [feeder, cable("F93", 93)]);
const run: Element[] = [{ kind: "cable", line: { cableId: "f50" }, lengthM: 36 }];

test("matchesFor(asked, …) finds stubs, parts and sections and ranks them together", () => {
  const methods = new Set(found.candidates.map(({ method }) => method));
  for (const method of ["shuntStub", "doubleStub", "lSection", "piNetwork", "pad", "quarterWave", "binomial"] as const)
    expect(methods.has(method), method).toBe(true);
  expect(found.candidates.length).toBeGreaterThanOrEqual(6);
});

test("every exact candidate ends at the middle of the Smith chart", () => {
  for (const { elements, designReturnLossDb } of found.candidates) {
    const last = candidateSteps(elements, asked).at(-1);
    const magnitude = Math.hypot(last?.re ?? 1, last?.im ?? 1);
    expect(magnitude).toBeCloseTo(designReturnLossDb === null ? 0 : 10 ** (-designReturnLossDb / 20), 6);
  }
});

test("the load alone keeps its own return loss", () => {
  const { returnLossDb } = candidateCurve([], asked, [27.2e6]);
  expect(returnLossDb[0]).toBeCloseTo(5.038, 3);
});

test("withMatch keeps the run's length where the match is of the feeder's own cable, and withoutMatch gives it back", () => {
  for (const { elements, method } of found.candidates) {
    const match = storedElements(elements);
    const matched = withMatch(run, match, 0);
    expect(isKept(matched, match, 0), method).toBe(true);
    expect(withoutMatch(matched, match, 0)).toEqual(run);
    const single = matched.filter(
      (e) => e.kind === "cable" && e.line && "cableId" in e.line && e.line.cableId === "f50" && !e.paralleled,
    );
    const length = single.reduce((sum, e) => sum + (e.kind === "cable" ? e.lengthM : 0), 0);
    expect(length).toBeCloseTo(36, 9);
  }
});

test("a match longer than its feeder is added whole rather than leaving a negative length", () => {
  const short: Element[] = [{ kind: "cable", line: { cableId: "f50" }, lengthM: 0.1 }];
  const match = storedElements(found.candidates.find(({ method }) => method === "shuntStub")?.elements ?? []);
  expect(withMatch(short, match, 0)).toEqual([...short, ...match]);
});

test("before the run behind, the steps start at what the match sees there and still end at the middle", () => {
  const behind = [{ kind: "cable" as const, name: "Feeder", line: feeder, lengthM: 36 }];
  const there = { ...asked, behind };
  const { candidates } = matchesFor(there, feeder, feeder, [feeder]);
  expect(candidates.length).toBeGreaterThanOrEqual(6);
  const alone = candidateCurve([], there, [27.2e6]);
  for (const { elements, designReturnLossDb } of candidates) {
    const steps = candidateSteps(elements, there);
    expect(steps[0]!.re).toBeCloseTo(alone.reflection.re[0]!, 12);
    if (designReturnLossDb !== null) continue;
    expect(Math.hypot(steps.at(-1)!.re, steps.at(-1)!.im)).toBeCloseTo(0, 6);
  }
});
