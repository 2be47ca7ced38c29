import { expect, test } from "vitest";
import fc from "fast-check";
import type { Circuit } from "@/lib/line/element";
import { findMatches } from "@/lib/line/match/find-matches";
import { matchMethods, type Candidate, type MatchRequest } from "@/lib/line/match/match-request";
import { quarterWaveBandwidth } from "@/lib/line/match/quarter-wave";
import { sweep } from "@/lib/line/run";
import sections from "@/tests/fixtures/line/matching-sections.json";
import { c50F10, c50F7, c75F7, lossless } from "@/tests/support/match-lines";

/** 27.2 MHz, load 22 − j35 Ω, C50-F10: the everyday question "where do I match?". */
const everyday: MatchRequest = {
  load: { kind: "constant", reOhm: 22, imOhm: -35 },
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [26.96e6, 27.41e6],
  returnLossDb: 14,
  feeder: c50F10,
  lines: [c50F10],
  partQ: { coilQ: 120, capacitorQ: 1000 },
};

function circuitOf({ targetOhm, load }: MatchRequest, { elements }: Candidate): Circuit {
  return { source: { kind: "constant", reOhm: targetOhm, imOhm: 0 }, elements, load };
}

function lengthsOf({ elements }: Candidate): number[] {
  return elements.map((each) => ("lengthM" in each ? each.lengthM : NaN));
}

test.each([
  { end: "short", stub: 0.951, distance: 0.269, lossDb: 0.063 },
  { end: "short", stub: 3.7, distance: 1.742, lossDb: 0.2 },
  { end: "open", stub: 1.371, distance: 1.733, lossDb: 0.133 },
  { end: "open", stub: 3.29, distance: 0.26, lossDb: 0.131 },
])(
  "27.2 MHz, 22 − j35 Ω on C50-F10: the $end stub of $stub m at $distance m loses $lossDb dB",
  ({ end, stub, distance, lossDb }) => {
    const { candidates, refused } = findMatches({ ...everyday, methods: ["shuntStub"] });
    expect(refused).toEqual([]);
    expect(candidates).toHaveLength(4);
    const found = candidates.find((each) => Math.abs(lengthsOf(each)[0]! - stub) < 0.0006)!;
    expect(found.elements[0]).toMatchObject({ kind: "stub", connection: "shunt", end });
    expect(Math.abs(lengthsOf(found)[1]! - distance)).toBeLessThan(0.0006);
    const { transducerLossDb } = sweep(circuitOf(everyday, found), [everyday.designHz]);
    expect(Math.abs(transducerLossDb[0]! - lossDb)).toBeLessThan(0.0006);
    expect(found.designReturnLossDb).toBeNull();
  },
);

test("27.2 MHz, 22 − j35 Ω: the L-section is 350 nH in series at the load, then the capacitor, and loses 0.10 dB", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["lSection"], partQ: {} });
  const title = "Coil and capacitor, 350 nH and 132 pF".replaceAll(/(\d) /g, "$1\u00a0");
  const ideal = candidates.find((each) => each.title === title)!;
  expect(ideal.elements).toMatchObject([
    { kind: "part", connection: "shunt", cF: expect.closeTo(132e-12, 13) },
    { kind: "part", connection: "series", lH: expect.closeTo(350e-9, 10) },
  ]);
  expect(ideal.worstTransducerLossDb).toBeLessThan(0.002);
  // With Q 120 and 1000 the capacitor that completes the match is 129 pF; the loss is that of the scenario.
  const lossy = findMatches({ ...everyday, methods: ["lSection"] }).candidates.find((each) =>
    each.title.includes("350"),
  )!;
  expect(lossy.elements[1]).toMatchObject({ q: 120, qAtHz: 27.2e6 });
  const { transducerLossDb } = sweep(circuitOf(everyday, lossy), [27.2e6]);
  expect(Math.abs(transducerLossDb[0]! - 0.1)).toBeLessThan(0.005);
});

test("every figure of every candidate is the sweep's own figure for its elements", () => {
  const request = { ...everyday, lines: [c50F10, c75F7], returnLossDb: 18 };
  const frequencies = Array.from({ length: 501 }, (_, k) => 26.96e6 + (0.45e6 * k) / 500);
  for (const candidate of findMatches(request).candidates) {
    const dense = sweep(circuitOf(request, candidate), frequencies);
    expect(candidate.worstReturnLossDb!).toBeLessThanOrEqual(Math.min(...dense.returnLossDb) + 1e-9);
    expect(candidate.worstReturnLossDb!).toBeCloseTo(Math.min(...dense.returnLossDb), 4);
    expect(candidate.worstTransducerLossDb!).toBeCloseTo(Math.max(...dense.transducerLossDb), 6);
    const { returnLossDb } = sweep(circuitOf(request, candidate), [request.designHz]);
    if (candidate.designReturnLossDb === null) expect(returnLossDb[0]!).toBeGreaterThan(180);
    else expect(candidate.designReturnLossDb).toBeCloseTo(returnLossDb[0]!, 9);
  }
});

test.each(sections.cases.filter((each) => each.name === "quarter-wave, real load").map((each) => each.inputs))(
  "the bandwidth found for a lossless section from $load_re_ohm to $z0_ohm Ω is that of the closed form",
  ({ z0_ohm, load_re_ohm, max_reflection }) => {
    const returnLossDb = -20 * Math.log10(max_reflection!);
    const { candidates } = findMatches({
      load: { kind: "constant", reOhm: load_re_ohm, imOhm: 0 },
      targetOhm: z0_ohm,
      designHz: 100e6,
      bandHz: [95e6, 105e6],
      returnLossDb,
      feeder: lossless(z0_ohm),
      lines: [lossless(Math.sqrt(z0_ohm * load_re_ohm))],
      methods: ["quarterWave"],
    });
    expect(candidates).toHaveLength(1);
    const width = quarterWaveBandwidth(z0_ohm, load_re_ohm, max_reflection!);
    expect(candidates[0]!.bandwidthHz / 100e6).toBeCloseTo(width, 7);
    expect(candidates[0]!.elements).toMatchObject([
      { kind: "cable", lengthM: expect.closeTo((0.66 * 299792458) / 4e8, 9) },
    ]);
  },
);

test("every exact candidate, for any load and lossy lines, shows the target when its run is computed, lengths under a half wave", () => {
  const halfWave = (0.9 * 299792458) / (2 * 145e6);
  const exact = matchMethods.filter((method) => method !== "quarterWave");
  const resistance = fc.double({ min: 2, max: 1000, noNaN: true });
  const reactance = fc.double({ min: -500, max: 500, noNaN: true });
  fc.assert(
    fc.property(resistance, reactance, (reOhm, imOhm) => {
      const request: MatchRequest = {
        ...everyday,
        designHz: 145e6,
        bandHz: [144e6, 146e6],
        load: { kind: "constant", reOhm, imOhm },
        lines: [c50F7, c75F7],
        methods: exact,
      };
      const { candidates } = findMatches(request);
      for (const candidate of candidates.filter(
        (each) => !each.title.includes("E24") && !each.title.startsWith("One"),
      )) {
        const { inputImpedance } = sweep(circuitOf(request, candidate), [145e6]);
        expect(inputImpedance.re[0]).toBeCloseTo(50, 5);
        expect(inputImpedance.im[0]).toBeCloseTo(0, 5);
        for (const length of lengthsOf(candidate).filter(Number.isFinite)) expect(length).toBeLessThan(halfWave);
      }
    }),
    { numRuns: 60 },
  );
});

test("a mismatched load on its own line has four shunt and four series stubs of each line given, whatever the loss", () => {
  const { candidates } = findMatches({ ...everyday, lines: [c50F10, c75F7], methods: ["shuntStub", "seriesStub"] });
  expect(candidates.filter((each) => each.method === "shuntStub")).toHaveLength(8);
  expect(candidates.filter((each) => each.method === "seriesStub")).toHaveLength(8);
});

test("candidates carry the catalogue's reference of their lines and no label, names for every element, and their cable counted", () => {
  const { candidates } = findMatches({ ...everyday, lines: [c75F7] });
  for (const { elements, totalLengthM } of candidates) {
    expect(elements.every((each) => Boolean(each.name))).toBe(true);
    const cables = elements.filter((each) => each.kind === "cable" || each.kind === "stub");
    for (const { line } of cables) expect(Object.keys(line).sort()).toEqual(["cableId", "model"]);
    const sum = cables.reduce((total, each) => total + each.lengthM * (each.paralleled ?? 1), 0);
    expect(totalLengthM).toBeCloseTo(sum, 12);
  }
});

test("standard part values are candidates of their own, marked, and keep to the E24 series", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["lSection"] });
  const standard = candidates.filter((each) => each.title.includes("E24"));
  expect(standard).toHaveLength(candidates.length / 2);
  const titles = standard.map((each) => each.title.replaceAll("\u00a0", " "));
  expect(titles).toContain("Coil and capacitor, E24 values 360 nH and 130 pF");
  for (const each of standard) expect(each.designReturnLossDb).toBeLessThan(60);
});

test("without a feeder the line nearest to the target runs from the load, and the notes say so", () => {
  const { candidates } = findMatches({
    ...everyday,
    feeder: undefined,
    lines: [c75F7, c50F10],
    methods: ["shuntStub"],
  });
  for (const { elements, notes } of candidates) {
    expect(elements[1]).toMatchObject({ kind: "cable", line: { cableId: "C50-F10" } });
    expect(notes.join(" ")).toContain("No feeder was named: C50-F10");
  }
});

test("the trimming note gives the direction and amount by which the best frequency really moves", () => {
  const { candidates } = findMatches({ ...everyday, methods: ["shuntStub"] });
  const shorted = candidates.find((each) => each.title.startsWith("Shorted stub, 951"))!;
  const note = shorted.notes.find((each) => each.includes("moves the best frequency"))!.replaceAll("\u00a0", " ");
  const [, moved] = /^10 mm off the stub moves the best frequency up by (\d+) kHz\.$/.exec(note)!;
  const [stub, cable] = shorted.elements;
  const trimmed = { ...stub!, lengthM: lengthsOf(shorted)[0]! - 0.01 } as typeof stub & object;
  const frequencies = Array.from({ length: 2001 }, (_, k) => 27e6 + k * 500);
  const { returnLossDb } = sweep(circuitOf(everyday, { ...shorted, elements: [trimmed, cable!] }), frequencies);
  const best = frequencies[returnLossDb.indexOf(Math.max(...returnLossDb))]!;
  expect(Math.abs(best - 27.2e6 - Number(moved) * 1000)).toBeLessThan(0.03 * Number(moved) * 1000);
});

test("candidates come in the order of the ranking, whatever the order of the lines", () => {
  const lines = [c50F10, c75F7, c50F7];
  const one = findMatches({ ...everyday, lines }).candidates.map((each) => each.title);
  const other = findMatches({ ...everyday, lines: [...lines].reverse() }).candidates.map((each) => each.title);
  expect(other).toEqual(one);
});
