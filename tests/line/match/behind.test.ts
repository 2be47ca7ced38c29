/** A network that does not stand at the load but before some of the run: what it sees, and what stays as it was. */
import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import type { Element, Termination } from "@/lib/line/element";
import { findMatches } from "@/lib/line/match/find-matches";
import type { Candidate, MatchRequest } from "@/lib/line/match/match-request";
import { knownRange, seenLoad } from "@/lib/line/match/seen-load";
import { sweep } from "@/lib/line/run";
import { anyElement, anyLoad } from "@/tests/support/arbitrary-run";
import { c50F10, c75F7, circuitOf, everyday, lengthsOf } from "@/tests/support/match-lines";

const feeder: Element = { kind: "cable", name: "Feeder", line: c50F10, lengthM: 36 };
const atTransmitter: MatchRequest = { ...everyday, lines: [c50F10, c75F7], behind: [feeder] };
const isExact = ({ designReturnLossDb }: Candidate) => designReturnLossDb === null;
const plain = (text: string) => text.replaceAll("\u00a0", " ");

test("at the transmitter the stubs stand where 138.6 + j1.8 Ω is matched, not where the load is", () => {
  const { candidates } = findMatches({ ...atTransmitter, methods: ["shuntStub"] });
  const seen: Termination = { kind: "constant", reOhm: 138.6, imOhm: 1.8 };
  const alone = findMatches({ ...everyday, lines: [c50F10, c75F7], load: seen, methods: ["shuntStub"] }).candidates;
  expect(candidates).toHaveLength(8);
  for (const candidate of candidates) {
    const like = alone.find((each) => lengthsOf(each).every((l, k) => Math.abs(l - lengthsOf(candidate)[k]!) < 0.004));
    expect(like, candidate.title).toBeDefined();
  }
});

test("every exact match at the transmitter shows the target there, and its figures are those of the whole run", () => {
  const frequencies = Array.from({ length: 501 }, (_, k) => 26.96e6 + (0.45e6 * k) / 500);
  const { candidates } = findMatches(atTransmitter);
  expect(candidates.filter(isExact).length).toBeGreaterThan(12);
  for (const candidate of candidates) {
    const dense = sweep(circuitOf(atTransmitter, candidate), frequencies);
    expect(candidate.worstReturnLossDb!).toBeCloseTo(Math.min(...dense.returnLossDb), 4);
    expect(candidate.worstTransducerLossDb!).toBeCloseTo(Math.max(...dense.transducerLossDb), 6);
    const feederLoss = dense.elementLossDb.at(-1)!;
    const matchLoss = dense.transducerLossDb.map((loss, k) => loss - feederLoss[k]!);
    expect(candidate.worstMatchLossDb!).toBeCloseTo(Math.max(...matchLoss), 6);
    const { inputImpedance } = sweep(circuitOf(atTransmitter, candidate), [27.2e6]);
    if (isExact(candidate)) expect(inputImpedance.re[0]! - 50).toBeCloseTo(0, 6);
  }
});

test("a match at the transmitter leaves the standing wave and its loss on the line, one at the load takes both away", () => {
  const at = { ...everyday, bandHz: [27.2e6, 27.2e6] as const, methods: ["shuntStub"] as const };
  const here = findMatches({ ...at, behind: [feeder] }).candidates;
  const there = findMatches(at).candidates;
  for (const candidate of here) {
    expect(candidate.worstTransducerLossDb! - candidate.worstMatchLossDb!).toBeCloseTo(1.33, 2);
    const { atPlanes } = sweep(circuitOf({ ...at, behind: [feeder] }, candidate), [27.2e6], {
      planes: [{ at: "load" }],
    });
    expect(atPlanes[0]!.vswr[0]).toBeCloseTo(3.54, 2);
  }
  for (const candidate of there) {
    const matched = sweep(circuitOf(at, { elements: [feeder, ...candidate.elements] }), [27.2e6]);
    expect(matched.elementLossDb[0]![0]).toBeCloseTo(0.76, 2);
    expect(candidate.worstMatchLossDb).toBe(candidate.worstTransducerLossDb);
  }
});

test("nothing behind, and a length of nothing behind, are the match at the load", () => {
  const figures = (request: MatchRequest) =>
    findMatches(request).candidates.map(({ method, elements, bandwidthHz }) => ({
      method,
      lengths: elements.map((each) => ("lengthM" in each ? Number(each.lengthM.toPrecision(9)) : 0)),
      bandwidthHz: Math.round(bandwidthHz),
    }));
  const atLoad = figures(everyday);
  expect(figures({ ...everyday, behind: [] })).toEqual(atLoad);
  expect(figures({ ...everyday, behind: [{ ...feeder, lengthM: 0 } as Element] })).toEqual(atLoad);
});

test("whatever stands behind, an exact match is one when the whole run is computed", () => {
  fc.assert(
    fc.property(fc.array(anyElement, { minLength: 1, maxLength: 4 }), anyLoad, (behind, load) => {
      const request: MatchRequest = { ...everyday, load, behind, lines: [c75F7], methods: ["shuntStub", "lSection"] };
      for (const candidate of findMatches(request).candidates.filter(isExact)) {
        const { returnLossDb } = sweep(circuitOf(request, candidate), [27.2e6]);
        expect(returnLossDb[0]!, candidate.title).toBeGreaterThan(150);
      }
    }),
    { numRuns: 80 },
  );
});

test("what the network sees over frequency is the input of the run behind it", () => {
  const behind: Element[] = [
    { kind: "joint", lossDbAtOneGhz: 0.05 },
    feeder,
    { kind: "pad", lossDb: 3, inputOhm: 50, outputOhm: 50 },
  ];
  const seen = seenLoad({ load: everyday.load, behind, temperatureC: 40 }, 50, c50F10);
  const frequencies = [1e6, 27.2e6, 450e6];
  const source = { kind: "constant", reOhm: 50, imOhm: 0 } as const;
  const { inputImpedance } = sweep({ source, elements: behind, load: everyday.load }, frequencies, {
    temperatureC: 40,
  });
  frequencies.forEach((f, k) => {
    const { v, i } = seen(f).port;
    const size = i.re * i.re + i.im * i.im;
    expect((v.re * i.re + v.im * i.im) / size).toBeCloseTo(inputImpedance.re[k]!, 8);
    expect((v.im * i.re - v.re * i.im) / size).toBeCloseTo(inputImpedance.im[k]!, 8);
    expect(seen(f)).toBe(seen(f));
  });
});

test("a joint between the network and the load, with no cable behind, has its loss in the feeder's impedance", () => {
  const behind: Element[] = [{ kind: "joint", name: "J4 antenna", lossDb: 0.5 }];
  const request: MatchRequest = { ...everyday, behind, methods: ["shuntStub"] };
  const { candidates } = findMatches(request);
  expect(candidates).toHaveLength(4);
  for (const candidate of candidates) {
    // In the run the joint stands after the match's own length of feeder, and takes its impedance from that.
    const { returnLossDb } = sweep(circuitOf(request, candidate), [27.2e6]);
    expect(returnLossDb[0]!).toBeGreaterThan(150);
    expect(plain(candidate.title)).toMatch(/ of C50-F10 .* from J4 antenna$/);
    expect(candidate.needs.at(-1)).toMatch(/ of C50-F10 to J4 antenna$/);
  }
  expect(findMatches({ ...request, feeder: undefined, lines: [], methods: ["lSection"] }).candidates).not.toEqual([]);
});

test("a name is never asked of what stands behind, and the sentences then speak of the run behind", () => {
  const { candidates, refused } = findMatches({ ...everyday, behind: [{ ...feeder, name: undefined } as Element] });
  expect(candidates.find(({ method }) => method === "lSection")!.notes.join(" ")).toContain(
    "From the run behind toward",
  );
  expect(refused.map(({ why }) => why).join(" ")).not.toContain("the load ");
});

test("a name too long for a title is left out of it", () => {
  const long = { ...feeder, name: "The main feeder from the mast foot to the mast head" } as Element;
  const { candidates } = findMatches({ ...everyday, behind: [long], methods: ["shuntStub"] });
  for (const { title } of candidates) expect(title).toMatch(/ from the run behind$/);
});

const measured: Termination = {
  kind: "sampled",
  referenceOhm: 50,
  frequenciesHz: [26.9e6, 27.2e6, 27.5e6],
  reflection: { re: [0.1, 0.1, 0.1], im: [0, 0, 0] },
};

test("a measured node behind ends the bandwidth where its samples end, as a measured load does", () => {
  const behind: Element[] = [{ kind: "stub", connection: "shunt", end: measured, line: c50F10, lengthM: 0.3 }, feeder];
  const { candidates } = findMatches({ ...everyday, behind, methods: ["lSection"], returnLossDb: 3 });
  expect(candidates.length).toBeGreaterThan(0);
  for (const { bandwidthHz } of candidates) expect(bandwidthHz).toBeLessThanOrEqual(0.6e6 * (1 + 1e-9));
  expect(knownRange({ load: everyday.load, behind })).toEqual({
    knownHz: [26.9e6, 27.5e6],
    besidesHz: measured.kind === "sampled" ? measured.frequenciesHz : [],
  });
});

test.each<[string, Partial<MatchRequest>, RegExp]>([
  [
    "a load that is not there, behind a line that would take the power",
    { load: { kind: "open" } },
    /^The load is open at/,
  ],
  ["a shorted load behind a lossy line", { load: { kind: "short" } }, /^The load is all but a pure reactance/],
  [
    "a run that is matched already",
    {
      load: { kind: "constant", reOhm: 50, imOhm: 0 },
      behind: [{ kind: "pad", lossDb: 100, inputOhm: 50, outputOhm: 50 }],
    },
    /^The run behind already is 50\.0 Ω/,
  ],
  [
    "a short across the run",
    { behind: [{ kind: "shunt", termination: { kind: "short" } }] },
    /^The run behind is all but a pure reactance/,
  ],
  [
    "samples of a node that do not cover the band",
    { behind: [{ kind: "shunt", termination: measured }], bandHz: [26e6, 28e6] },
    /^What stands behind the match was measured from 26\.9 MHz to 27\.5 MHz, which does not cover/,
  ],
  [
    "samples that have no frequency in common",
    {
      load: measured,
      behind: [{ kind: "shunt", termination: { ...measured, frequenciesHz: [1e6, 2e6, 3e6] } as Termination }],
    },
    /^What stands behind the match was measured at no one frequency, which does not cover/,
  ],
])("%s is refused by every method, in a sentence", (_name, change, sentence) => {
  const { candidates, refused } = findMatches({ ...atTransmitter, ...change });
  expect(candidates).toEqual([]);
  expect(refused.length).toBeGreaterThan(0);
  for (const { why } of refused) expect(plain(why)).toMatch(sentence);
});

test("a bus whose far end is open is matched all the same: its taps take the power", () => {
  const behind: Element[] = [feeder, { kind: "shunt", termination: { kind: "constant", reOhm: 130, imOhm: 0 } }];
  const { candidates } = findMatches({ ...everyday, load: { kind: "open" }, behind, methods: ["lSection"] });
  expect(candidates.filter(isExact).length).toBeGreaterThan(1);
  for (const { worstTransducerLossDb, worstMatchLossDb } of candidates) {
    expect(worstTransducerLossDb).toBeNull();
    expect(worstMatchLossDb).toBeLessThan(1);
  }
});

test("an impossible element behind is refused by the engine, which names it", () => {
  const behind: Element[] = [{ kind: "cable", line: c50F10, lengthM: -1 }];
  expect(() => findMatches({ ...everyday, behind })).toThrow(RangeError);
});

test("over a wide band the ripples of a long run behind are all looked at", () => {
  const long: Element = { ...feeder, lengthM: 400 } as Element;
  const request: MatchRequest = {
    ...atTransmitter,
    behind: [long],
    designHz: 145e6,
    bandHz: [130e6, 160e6],
    methods: ["lSection"],
  };
  // 400 m at 3.92 ns/m ripple every 319 kHz, 94 times in the band.
  const frequencies = Array.from({ length: 6001 }, (_, k) => 130e6 + 5e3 * k);
  for (const candidate of findMatches(request).candidates) {
    const { returnLossDb } = sweep(circuitOf(request, candidate), frequencies);
    expect(candidate.worstReturnLossDb!).toBeCloseTo(Math.min(...returnLossDb), 2);
  }
});
