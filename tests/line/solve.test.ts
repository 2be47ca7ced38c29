import { describe, expect, test } from "vitest";
import type { Circuit } from "@/lib/line/element";
import { sweep } from "@/lib/line/run";
import { solve, type SolveRequest } from "@/lib/line/solve";
import { withValues } from "@/lib/line/moved-circuit";
import type { Target } from "@/lib/line/target";
import { judgeTargets } from "@/lib/line/targets";
import { cable, ohm, rope, run } from "@/tests/support/lossy-run";
import { seededModel } from "@/tests/support/seeded-cables";
import fc from "@/tests/support/property";

const matched = run([cable(20)], ohm(50));
const length = "elements.0.lengthM";
const asked: SolveRequest = {
  circuit: matched,
  frequencies: [1.45e8],
  vary: { path: length, between: [1, 500] },
  targets: [{ quantity: "loss", atMost: 3 }],
};
const lossOf = (circuit: Circuit, frequency = 1.45e8) => sweep(circuit, [frequency]).transducerLossDb[0]!;

test("the longest matched cable within a loss loses just that, and is the limit over its attenuation", () => {
  const { value, binds, margins } = solve(asked);
  expect(lossOf(withValues(matched, { [length]: value! }))).toBeCloseTo(3, 9);
  // nearly matched: within what the mismatch of a lossy 50 Ω cable adds
  expect(value! / (20 * (3 / lossOf(matched)))).toBeCloseTo(1, 3);
  expect([binds, margins.length]).toEqual([0, 1]);
  expect(margins[0]).toBeCloseTo(0, 9);
});

test("of several targets the one that fails first binds; what lies beyond the value fails it", () => {
  const targets: Target[] = [
    { quantity: "loss", atMost: 30 },
    { quantity: "delay", atMost: 2e-7 },
    { quantity: "dcDrop", atMost: 4 },
  ];
  const { value, binds } = solve({ ...asked, targets, supplyV: 5 });
  expect(binds).toBe(1);
  const judged = (at: number) => judgeTargets(withValues(matched, { [length]: at }), targets, { ...asked, supplyV: 5 });
  expect(judged(value!).every(({ isMet }) => isMet)).toBe(true);
  expect(judged(value! * (1 + 1e-9))[1]!.isMet).toBe(false);
});

test("where the whole range holds its end is the answer, and nothing binds", () => {
  expect(solve({ ...asked, vary: { path: length, between: [1, 2] } })).toMatchObject({ value: 2, binds: null });
  expect(solve({ ...asked, vary: { path: length, between: [1, 2] }, want: "smallest" })).toMatchObject({
    value: 1,
    binds: null,
  });
});

test("what does not rise steadily is not taken to: the largest of several stretches that hold is found", () => {
  // an open stub lets a frequency through again and again as it is made longer
  const circuit = run([{ kind: "stub", connection: "shunt", end: "open", line: { model: rope }, lengthM: 1 }], ohm(50));
  const request: SolveRequest = {
    ...{ circuit, frequencies: [1e8], vary: { path: length, between: [0.05, 5] as const } },
    targets: [{ quantity: "loss", atMost: 1 }],
  };
  const { value } = solve(request);
  const half = (299792458 * 0.66) / 1e8 / 2;
  // the last length before 5 m that is near a whole number of half wavelengths: 4.95 m is 5 of them
  expect(value).toBeGreaterThan(4.95 - half / 4);
  expect(lossOf(withValues(circuit, { [length]: value! }), 1e8)).toBeLessThanOrEqual(1);
  const smallest = solve({ ...request, vary: { path: length, between: [0.3, 5] }, want: "smallest" });
  expect(smallest.value).toBeGreaterThan(half / 2);
  expect(smallest.value).toBeLessThan(half);
});

test("a window that falls between the values looked at is climbed to", () => {
  const stub = run(
    [{ kind: "stub", connection: "shunt", end: "open", line: { model: seededModel("c50-f10") }, lengthM: 1 }],
    ohm(50),
  );
  const request: SolveRequest = {
    ...{ circuit: stub, frequencies: [97.3e6], vary: { path: length, between: [0.01, 1.2] as const } },
    targets: [{ quantity: "loss", atLeast: 40 }],
  };
  const [largest, smallest] = [solve(request).value!, solve({ ...request, want: "smallest" }).value!];
  expect(largest).toBeGreaterThan(smallest);
  expect((largest + smallest) / 2).toBeCloseTo(0.654, 2);
});

test("where a target holds nowhere it is named; where only all together fail, none is", () => {
  const impossible: Target = { quantity: "vswr", atMost: 0.5 };
  expect(solve({ ...asked, targets: [asked.targets[0]!, impossible] })).toMatchObject({
    value: null,
    binds: null,
    neverMet: 1,
    margins: [],
  });
  const apart: Target[] = [
    { quantity: "loss", atMost: 1 },
    { quantity: "delay", atLeast: 5e-7 },
  ];
  expect(solve({ ...asked, targets: apart })).toMatchObject({ value: null, neverMet: null });
});

test("the hottest temperature and the least supply are found as a length is", () => {
  const { value } = solve({
    ...asked,
    vary: { path: "temperatureC", between: [-20, 200] },
    targets: [{ quantity: "loss", atMost: 1.1 * lossOf(matched) }],
  });
  expect(sweep(matched, [1.45e8], { temperatureC: value! }).transducerLossDb[0]).toBeCloseTo(1.1 * lossOf(matched), 9);
  const supply = solve({
    ...asked,
    vary: { path: "supplyV", between: [0, 50] },
    targets: [{ quantity: "level", atLeast: 2 }],
    want: "smallest",
  });
  expect(supply.value).toBeCloseTo((2 * (100 + 20 * 0.05)) / 50, 9);
});

test("a narrower limit never makes the answer larger", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.1, max: 20, noNaN: true }),
      fc.double({ min: 0.1, max: 20, noNaN: true }),
      (a, b) => {
        const at = (atMost: number) => solve({ ...asked, targets: [{ quantity: "loss", atMost }] }).value ?? 0;
        expect(at(Math.min(a, b))).toBeLessThanOrEqual(at(Math.max(a, b)));
      },
    ),
    { numRuns: 20 },
  );
});

describe("refuses", () => {
  test.each<[string, Partial<SolveRequest>, RegExp]>([
    ["a path to nothing", { vary: { path: "elements.3.lengthM", between: [1, 2] } }, /no place/],
    ["a range the wrong way round", { vary: { path: length, between: [2, 1] } }, /not in order/],
    ["an impossible value", { vary: { path: length, between: [-2, 1] } }, /at least 0/],
    ["a target that cannot be worked out", { targets: [{ quantity: "skew", atMost: 1 }] }, /skew cannot be worked out/],
  ])("%s", (_, change, message) => {
    expect(() => solve({ ...asked, ...change })).toThrow(message);
  });
});
