import { describe, expect, test } from "vitest";
import type { Element } from "@/lib/line/element";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { sweep } from "@/lib/line/run";
import { circuitOf, c50F10, everyday, lengthsOf } from "@/tests/support/match-lines";
import { seededModel } from "@/tests/support/seeded-cables";

const cable = (id: string) => ({ label: id, cableId: id, model: seededModel(id) });
const f10 = cable("c50-f10");
const plain = (text: string) => text.replaceAll("\u00a0", " ");

/** Notch 97.3 MHz, keep 151.4 MHz, of cables of the demo catalogue. */
const request: MatchRequest = {
  load: { kind: "constant", reOhm: 50, imOhm: 0 },
  targetOhm: 50,
  designHz: 151.4e6,
  bandHz: [151.3e6, 151.5e6],
  returnLossDb: 20,
  feeder: f10,
  lines: [f10],
  notchHz: 97.3e6,
  methods: ["notchStub"],
};
const found = (id: string) => {
  const line = cable(id);
  const { candidates } = findMatches({ ...request, feeder: line, lines: [line] });
  return candidates.find(({ elements: [notch, second] }) => {
    if (notch?.kind !== "stub" || second?.kind !== "stub") return false;
    return notch.end === "open" && second.end === "short";
  })!;
};
const loss = (elements: Element[], frequencies: number[]) =>
  sweep(circuitOf(request, { elements }), frequencies).transducerLossDb;

describe("notch 97.3 MHz, keep 151.4 MHz", () => {
  test.each([
    ["c50-s3", 0.503, 30.4, 0.85],
    ["c50-s5", 0.505, 34.8, 0.79],
    ["c50-f10", 0.654, 44.3, 0.73],
    ["c50-f28", NaN, 54.5, 0.71],
  ])(
    "the open quarter-wave stub of %s is %d m, %d dB deep, and alone loses %d dB of what is wanted",
    (id, length, depth, alone) => {
      const { elements } = found(id);
      const [notch] = elements;
      if (!Number.isNaN(length)) expect(Math.abs(lengthsOf(found(id))[0]! - length)).toBeLessThan(0.0006);
      expect(Math.abs(loss([notch!], [97.3e6])[0]! - depth)).toBeLessThan(0.06);
      expect(Math.abs(loss([notch!], [151.4e6])[0]! - alone)).toBeLessThan(0.006);
    },
  );

  test("on C50-F10 a second, shorted stub of 0.607 m at the same tee leaves 0.055 dB and 44 dB of return loss, the notch as deep", () => {
    const candidate = found("c50-f10");
    expect(lengthsOf(candidate)[1]).toBeCloseTo(0.607, 3);
    expect(candidate.designReturnLossDb).toBeCloseTo(44, 0);
    expect(loss(candidate.elements, [151.4e6])[0]).toBeCloseTo(0.055, 3);
    expect(candidate.notchLossDb).toBeCloseTo(44.3, 1);
    const frequencies = Array.from({ length: 4001 }, (_, k) => 96.3e6 + 500 * k);
    const losses = loss(candidate.elements, frequencies);
    const deepest = frequencies[losses.indexOf(Math.max(...losses))]!;
    expect(Math.abs(deepest - 97.3e6)).toBeLessThan(0.05e6);
  });

  test("the 20, 25 and 30 dB widths of an open stub of the line's own impedance are 6.4, 3.6 and 2.0 % of its frequency", () => {
    const stub = found("c50-f10").elements[0]!;
    const frequencies = Array.from({ length: 20_001 }, (_, k) => 92.3e6 + 500 * k);
    const losses = loss([stub], frequencies);
    const width = (depth: number) => (losses.filter((each) => each >= depth).length * 500) / 97.3e6;
    expect(width(20) * 100).toBeCloseTo(6.4, 1);
    expect(width(25) * 100).toBeCloseTo(3.6, 1);
    expect(width(30) * 100).toBeCloseTo(2.0, 1);
  });

  test("the depth is 20·log((R + Z0/2)/R) of the stub's end resistance R = Z0·tanh αl", () => {
    const stub = found("c50-f10").elements[0]!;
    const alone = sweep({ source: request.load, elements: [stub], load: { kind: "open" } }, [97.3e6]);
    const resistance = alone.inputImpedance.re[0]!;
    expect(resistance).toBeCloseTo(0.153, 3);
    expect(loss([stub], [97.3e6])[0]).toBeCloseTo(20 * Math.log10((resistance + 25) / resistance), 2);
  });

  test("the trim note says how long to cut it first and how the notch then moves", () => {
    const notes = found("c50-f10").notes.map(plain);
    expect(notes[0]).toBe(
      "Trim the notch first: cut it 673 mm, 3 % long, then each 10 mm off moves the notch up by 1.49 MHz; 1 % of velocity factor is 973 kHz of notch.",
    );
  });
});

test("with an awkward load the same two stubs match it too: every one shows the target, and keeps the notch from it", () => {
  const asked: MatchRequest = { ...everyday, notchHz: 40e6, methods: ["notchStub"] };
  const { candidates } = findMatches(asked);
  expect(candidates.length).toBeGreaterThanOrEqual(8);
  for (const candidate of candidates) {
    const { inputImpedance, transducerLossDb } = sweep(circuitOf(asked, candidate), [27.2e6, 40e6]);
    expect(Math.hypot(inputImpedance.re[0]! - 50, inputImpedance.im[0]!), candidate.title).toBeLessThan(1e-6);
    expect(candidate.notchLossDb).toBeCloseTo(transducerLossDb[1]!, 9);
    expect(candidate.notchLossDb!).toBeGreaterThan(25);
  }
});

test.each<[string, Partial<MatchRequest>, RegExp]>([
  ["no notch is named", { notchHz: undefined, load: everyday.load }, /^No notch frequency was named\.$/],
  [
    "the notch is the design frequency",
    { notchHz: 151.4e6 },
    /^A stub that shorts 151\.4 MHz shorts 151\.4 MHz too\.$/,
  ],
  ["no line is at hand", { lines: [] }, /^No line was named to cut a stub from\.$/],
])("is refused where %s", (_what, change, sentence) => {
  const { candidates, refused } = findMatches({ ...request, ...change });
  expect(candidates).toEqual([]);
  expect(plain(refused[0]!.why)).toMatch(sentence);
});

test("a load that is matched already is refused by every other method, and a measured load says nothing of a notch outside its samples", () => {
  const { candidates, refused } = findMatches({ ...request, methods: undefined });
  expect(new Set(candidates.map(({ method }) => method))).toEqual(new Set(["notchStub"]));
  expect(refused).toHaveLength(13);
  const sampled = {
    kind: "sampled",
    referenceOhm: 50,
    frequenciesHz: [150e6, 152e6],
    reflection: { re: [0.3, 0.3], im: [0, 0] },
  } as const;
  const asked: MatchRequest = {
    ...request,
    feeder: c50F10,
    load: { ...sampled, frequenciesHz: [150e6, 152e6], reflection: { re: [0.3, 0.3], im: [0, 0] } },
  };
  for (const { notchLossDb } of findMatches(asked).candidates) expect(notchLossDb).toBeNull();
});
