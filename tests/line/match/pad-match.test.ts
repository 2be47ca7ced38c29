import { expect, test } from "vitest";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { padAsParts } from "@/lib/line/match/pad-as-parts";
import { sweep } from "@/lib/line/run";
import fixture from "@/tests/fixtures/line/matching-pads.json";
import { circuitOf, everyday } from "@/tests/support/match-lines";
import { closeTo, type Expected } from "@/tests/support/tolerance";

const request: MatchRequest = { ...everyday, feeder: undefined, lines: [], methods: ["pad"], returnLossDb: 20 };
const plain = (text: string) => text.replaceAll("\u00a0", " ");

const leastLoss = fixture.cases.filter(({ name }) => name === "minimum-loss pad");

test.each(leastLoss.map((each) => ({ ...each.inputs, ...each })))(
  "between $higher_ohm Ω and $lower_ohm Ω the least-loss pad has the loss and the resistors of the check, either way round",
  ({ inputs, expected }) => {
    const { higher_ohm = NaN, lower_ohm = NaN } = inputs as unknown as Record<string, number>;
    const wanted = expected as unknown as Record<string, Expected>;
    const pad = (targetOhm: number, reOhm: number) => {
      const { candidates } = findMatches({ ...request, targetOhm, load: { kind: "constant", reOhm, imOhm: 0 } });
      return candidates.find(({ title }) => title.startsWith("Least-loss") && !title.includes("E24"))!;
    };
    const up = pad(lower_ohm, higher_ohm);
    const down = pad(higher_ohm, lower_ohm);
    closeTo(up.worstTransducerLossDb!, { ...wanted.loss_db!, rel_tolerance: 1e-9 });
    closeTo(down.worstTransducerLossDb!, { ...wanted.loss_db!, rel_tolerance: 1e-9 });
    for (const [first, shunt, last] of [up.resistorsOhm!, [...down.resistorsOhm!].reverse()]) {
      expect(first).toBe(0);
      closeTo(shunt!, wanted.shunt_at_lower_side_ohm!);
      closeTo(last!, wanted.series_at_higher_side_ohm!);
    }
    expect(up.designReturnLossDb).toBeNull();
  },
);

test("an even pad is just lossy enough: it gives the asked return loss to the load as it is", () => {
  const asked: MatchRequest = { ...request, load: { kind: "constant", reOhm: 22, imOhm: -35 } };
  const { candidates } = findMatches(asked);
  const even = candidates.find(({ title }) => title.startsWith("Even pad") && !title.includes("E24"))!;
  // |Γ| of 22 − j35 Ω on 50 Ω is 0.560, 5.04 dB: (20 − 5.04)/2 = 7.48 dB.
  expect(even.elements).toMatchObject([{ kind: "pad", lossDb: expect.closeTo(7.48, 2) }]);
  expect(even.designReturnLossDb).toBeCloseTo(20, 9);
  expect(even.worstReturnLossDb).toBeCloseTo(20, 9);
});

test("E24 pads are made of parts with the resistors they name, and state what those give", () => {
  const asked: MatchRequest = { ...request, load: { kind: "constant", reOhm: 75, imOhm: 0 } };
  const { candidates } = findMatches(asked);
  const standard = candidates.filter(({ title }) => title.includes("E24"));
  expect(standard.length).toBeGreaterThan(0);
  for (const candidate of standard) {
    expect(candidate.elements).toEqual(padAsParts(candidate.resistorsOhm!, "T"));
    const { returnLossDb } = sweep(circuitOf(asked, candidate), [27.2e6]);
    expect(candidate.designReturnLossDb).toBeCloseTo(returnLossDb[0]!, 9);
  }
  expect(standard.map(({ resistorsOhm }) => resistorsOhm)).toContainEqual([0, 91, 43]);
});

test("a complex load gets its least-loss pad where the feeder shows a resistance", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["pad"] });
  const least = candidates.filter(({ title }) => title.startsWith("Least-loss") && !title.includes("E24"));
  expect(least).toHaveLength(2);
  for (const each of least) {
    expect(each.designReturnLossDb).toBeNull();
    expect(each.elements[1]).toMatchObject({ kind: "cable", name: "Section to load" });
  }
});

test("a pad never stands before a match that loses less than a decibel, and is refused where none is needed", () => {
  const { candidates } = findMatches({ ...everyday, returnLossDb: 14 });
  const first = candidates.findIndex(({ method }) => method === "pad");
  const lossless = candidates.findLastIndex(
    (each) => each.worstMatchLossDb! < 1 && (each.worstReturnLossDb ?? Infinity) >= 14,
  );
  expect(lossless).toBeGreaterThan(10);
  expect(first).toBeGreaterThan(lossless);
  const fair: MatchRequest = { ...request, load: { kind: "constant", reOhm: 50, imOhm: 4 } };
  expect(plain(findMatches(fair).refused[0]!.why)).toBe(
    "The load already keeps 28.0 dB over the band, so no pad is needed.",
  );
});
