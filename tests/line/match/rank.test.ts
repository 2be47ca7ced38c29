import { expect, test } from "vitest";
import fc from "fast-check";
import type { Candidate } from "@/lib/line/match/match-request";
import { rank } from "@/lib/line/match/rank";

function candidate(title: string, figures: Partial<Candidate>): Candidate {
  return {
    method: "shuntStub",
    title,
    elements: [],
    designReturnLossDb: 40,
    bandwidthHz: 1e6,
    worstReturnLossDb: 20,
    worstTransducerLossDb: 0.1,
    worstMatchLossDb: 0.1,
    totalLengthM: 1,
    cuts: [],
    needs: [],
    notes: [],
    ...figures,
  };
}

const titles = (candidates: Candidate[], asked = 14) => rank(candidates, asked).map((each) => each.title);

test("a candidate that keeps the asked return loss over the band comes before a wider one that does not", () => {
  const wide = candidate("wide", { worstReturnLossDb: 13.9, bandwidthHz: 9e6, worstTransducerLossDb: 0.01 });
  expect(titles([wide, candidate("kept", { worstReturnLossDb: 14 })])).toEqual(["kept", "wide"]);
});

test("the better worst return loss comes first, and a perfect match before any number", () => {
  const all = [candidate("good", { worstReturnLossDb: 22 }), candidate("better", { worstReturnLossDb: 30 })];
  expect(titles([...all, candidate("perfect", { worstReturnLossDb: null })])).toEqual(["perfect", "better", "good"]);
});

test("what wastes whole decibels comes after what wastes less, and a line that has to be made after what is at hand", () => {
  const pad = candidate("pad", { worstReturnLossDb: 60, worstMatchLossDb: 5.7, worstTransducerLossDb: 5.7 });
  const made = candidate("made", { worstReturnLossDb: 50, hasIdealLine: true });
  expect(titles([pad, made, candidate("cut", { worstReturnLossDb: 20 })])).toEqual(["cut", "made", "pad"]);
});

test("with a tolerance those that keep it at their limits come first, then the better yield in steps of 5 %", () => {
  const made = (title: string, worstReturnLossAtLimitsDb: number, yieldPercent: number, worstReturnLossDb: number) =>
    candidate(title, { worstReturnLossAtLimitsDb, yieldPercent, worstReturnLossDb });
  const all = [
    made("few", 9, 61, 40),
    made("most", 12, 96, 30),
    made("also most", 12, 97, 20),
    made("all", 15, 100, 18),
  ];
  expect(titles(all)).toEqual(["all", "most", "also most", "few"]);
});

test("where return loss differs by less than half a decibel the lower loss comes first", () => {
  const lossy = candidate("lossy", { worstReturnLossDb: 20.4, worstTransducerLossDb: 0.3 });
  const thrifty = candidate("thrifty", { worstReturnLossDb: 20.1, worstTransducerLossDb: 0.1 });
  expect(titles([lossy, thrifty])).toEqual(["thrifty", "lossy"]);
});

test("then the wider band, then less cable, then the title decide", () => {
  const all = [
    candidate("d", { totalLengthM: 2 }),
    candidate("c", {}),
    candidate("b", {}),
    candidate("a", { totalLengthM: 3 }),
    candidate("z", { bandwidthHz: 2e6 }),
  ];
  expect(titles(all)).toEqual(["z", "b", "c", "d", "a"]);
});

test("a candidate through which no power arrives comes last among equals", () => {
  expect(titles([candidate("dead", { worstTransducerLossDb: null }), candidate("live", {})])).toEqual(["live", "dead"]);
});

test("the order does not depend on the order given, and nothing is lost or changed", () => {
  const figure = fc.double({ min: 0, max: 40, noNaN: true });
  const many = fc.array(fc.tuple(figure, figure, figure), { maxLength: 12 });
  fc.assert(
    fc.property(many, (rows) => {
      const all = rows.map(([worstReturnLossDb, worstTransducerLossDb, bandwidthHz], index) =>
        candidate(`n${index}`, { worstReturnLossDb, worstTransducerLossDb, bandwidthHz }),
      );
      const given = [...all];
      const ranked = rank(all, 14);
      expect(all).toEqual(given);
      expect(titles([...all].reverse())).toEqual(ranked.map((each) => each.title));
      expect(new Set(ranked)).toEqual(new Set(all));
    }),
  );
});
