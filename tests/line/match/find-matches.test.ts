import { expect, test } from "vitest";
import fc from "fast-check";
import { complex } from "@/lib/line/complex";
import { findMatches } from "@/lib/line/match/find-matches";
import { matchMethods, type MatchMethod, type MatchRequest } from "@/lib/line/match/match-request";
import { quarterWaveBandwidth } from "@/lib/line/match/quarter-wave";
import { seriesSection } from "@/lib/line/match/series-section";
import { sweep } from "@/lib/line/run";
import sections from "@/tests/fixtures/line/matching-sections.json";
import { c50F10, c50F7, c75F7, circuitOf, everyday, lengthsOf, lossless } from "@/tests/support/match-lines";

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
  const near: MatchMethod[] = ["quarterWave", "binomial", "equalRipple"];
  const exact = matchMethods.filter((method) => !near.includes(method));
  const tenths = (min: number, max: number) => fc.integer({ min: 10 * min, max: 10 * max }).map((each) => each / 10);
  const resistance = tenths(2, 1000);
  const reactance = tenths(-500, 500);
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
        ({ title }) => !title.includes("E24") && !title.startsWith("One") && !title.startsWith("Even pad"),
      )) {
        const { inputImpedance } = sweep(circuitOf(request, candidate), [145e6]);
        expect(inputImpedance.re[0]).toBeCloseTo(50, 5);
        expect(inputImpedance.im[0]).toBeCloseTo(0, 5);
        for (const length of lengthsOf(candidate).filter(Number.isFinite)) expect(length).toBeLessThan(halfWave);
      }
    }),
    { numRuns: 12 },
  );
});

test("a mismatched load on its own line has four shunt and four series stubs of each line given, whatever the loss", () => {
  const { candidates } = findMatches({ ...everyday, lines: [c50F10, c75F7], methods: ["shuntStub", "seriesStub"] });
  expect(candidates.filter((each) => each.method === "shuntStub")).toHaveLength(8);
  expect(candidates.filter((each) => each.method === "seriesStub")).toHaveLength(8);
});

test("paralleled lengths are the series section of their joint impedance, two to four of them, counted in the cable", () => {
  const { candidates } = findMatches({
    ...everyday,
    feeder: lossless(50),
    lines: [lossless(75)],
    methods: ["parallelCables"],
  });
  const wavelength = (0.66 * 299792458) / 27.2e6;
  for (const count of [2, 3, 4]) {
    const plan = { load: complex(22, -35), lineOhm: 50, targetOhm: 50, sectionOhm: 75 / count };
    const found = candidates.filter(
      ({ elements: [section] }) => section?.kind === "cable" && section.paralleled === count,
    );
    const lengths = found
      .map((each) => lengthsOf(each).map((length) => length / wavelength))
      .sort((a, b) => a[1]! - b[1]!);
    const expected = seriesSection(plan);
    expect(lengths).toHaveLength(expected.length);
    expected.forEach(({ distance, length }, index) => {
      expect(lengths[index]![0]).toBeCloseTo(length, 9);
      expect(lengths[index]![1]).toBeCloseTo(distance, 9);
    });
    for (const each of found) expect(each.needs).toContain(`2 junctions of ${count} cables`);
  }
});

test("a lossy quarter-wave section is a quarter wave by its own phase and leaves no reactance at the target", () => {
  const request = { ...everyday, lines: [c75F7], methods: ["quarterWave" as const] };
  const { candidates } = findMatches(request);
  expect(candidates).toHaveLength(1);
  const { inputImpedance } = sweep(circuitOf(request, candidates[0]!), [27.2e6]);
  expect(Math.abs(inputImpedance.im[0]!)).toBeLessThan(1e-8);
  // A nominal velocity factor of 0.83 would give 2.288 m; internal inductance makes the cable a little slower.
  expect(lengthsOf(candidates[0]!)[0]).toBeGreaterThan(2.26);
  expect(lengthsOf(candidates[0]!)[0]).toBeLessThan(2.285);
});

test("a warmer line loses more in the same kind of match", () => {
  const loss = (temperatureC: number) =>
    Math.max(
      ...findMatches({ ...everyday, temperatureC, methods: ["shuntStub"] }).candidates.map(
        (each) => each.worstTransducerLossDb!,
      ),
    );
  expect(loss(60) / loss(20)).toBeGreaterThan(1.05);
});

test("a measured load ends the bandwidth where its samples end, and the notes say so", () => {
  const frequenciesHz = [26.9e6, 27.2e6, 27.5e6];
  const load = {
    kind: "sampled" as const,
    referenceOhm: 50,
    frequenciesHz,
    reflection: { re: [0.3, 0.3, 0.3], im: [0, 0, 0] },
  };
  const { candidates } = findMatches({ ...everyday, load, methods: ["shuntStub"], returnLossDb: 12 });
  expect(candidates).toHaveLength(4);
  for (const { bandwidthHz, notes } of candidates) {
    expect(bandwidthHz).toBeCloseTo(0.6e6, 3);
    expect(notes.join(" ")).toContain("The bandwidth is at least this");
  }
});
