import fc from "fast-check";
import { expect, test } from "vitest";
import type { Circuit, Line } from "@/lib/line/element";
import { analyseRun } from "@/lib/runs/analysis";
import { shownFrequencies } from "@/lib/runs/shown";
import { maskingSentence, seenFromSource, targetWords } from "@/lib/runs/sentences";
import { masking, verdicts } from "@/lib/runs/targets";
import { worstIn } from "@/lib/runs/worst";
import { draftOfCircuit } from "@/tests/support/drafts";

/** C50-F10 of the demo: one `sqrt` term. */
const line: Line = {
  model: {
    conductors: [{ form: "sqrt", r0OhmPerM: 8.611e-3, skinCornerRadPerS: 2 * Math.PI * 17.71e3 }],
    lInfHPerM: 196.17e-9,
    cFPerM: 78.51e-12,
    lossTangent: 1.5e-4,
  },
};
const fifty = { kind: "constant", reOhm: 50, imOhm: 0 } as const;

function run(load: Circuit["load"], lengthM = 36): Circuit {
  return { source: fifty, elements: [{ kind: "cable", line, lengthM }], load };
}
const conditions = { designHz: 27.2e6, bandHz: [26.9e6, 27.5e6] as const, availablePowerW: 200, temperatureC: 20 };
const whip = run({ kind: "constant", reOhm: 22, imOhm: -35 });

// An independent line model of the same single-term cable: 36 m of it at 27.2 MHz into 22 − j35 Ω.
test("analyseRun(36 m at 27.2 MHz into 22 − j35 Ω) agrees with an independent line model", () => {
  const { spot, pieces } = analyseRun(whip, conditions);
  expect(spot.loadVswr).toBeCloseTo(3.54, 2);
  expect(spot.loadReturnLossDb).toBeCloseTo(5.04, 2);
  expect(spot.matchedLossDb).toBeCloseTo(0.76, 2);
  expect(pieces[0]?.lossDb).toBeCloseTo(1.33, 2);
  expect(spot.sourceVswr).toBeCloseTo(2.77, 2);
  expect(spot.inputImpedance.re).toBeCloseTo(138.6, 1);
  expect(spot.inputImpedance.im).toBeCloseTo(1.8, 1);
});

test("the ledger's rows and what mismatch adds make up the whole loss", () => {
  const { spot, pieces } = analyseRun(whip, conditions);
  const matched = pieces.reduce((sum, piece) => sum + piece.matchedLossDb, 0);
  expect(matched + spot.mismatchLossDb + spot.extraLossDb).toBeCloseTo(spot.transducerLossDb, 9);
});

test("shownFrequencies(conditions) holds both ends of the band and never reaches 0", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1, max: 1e10, noNaN: true }),
      fc.double({ min: 1e-6, max: 100, noNaN: true }),
      (from, width) => {
        const bandHz = [from, from * (1 + width)] as const;
        const shown = shownFrequencies({ ...conditions, bandHz });
        expect(shown[0]).toBeGreaterThan(0);
        for (const end of bandHz)
          expect(Math.min(...shown.map((f) => Math.abs(f / end - 1)))).toBeLessThan(1e-9 * (1 + width));
      },
    ),
    { seed: 7 },
  );
});

test("worstIn(frequencies, values, band) finds a dip that lies between two samples", () => {
  const valueAt = (f: number) => (f - 10.37) ** 2;
  const frequencies = Float64Array.from({ length: 21 }, (_, i) => i);
  const worst = worstIn(frequencies, frequencies.map(valueAt), [5, 15], valueAt);
  expect(worst.frequencyHz).toBeCloseTo(10.37, 2);
  expect(worstIn(frequencies, frequencies.map(valueAt), [12, 15], valueAt)).toEqual({
    frequencyHz: 12,
    value: valueAt(12),
  });
});

test("a limit that the line alone would keep is called blind, one it would not is not", () => {
  const target = { quantity: "returnLoss", plane: { at: "source" }, atLeast: 14 } as const;
  for (const [lengthM, isBlind] of [
    [1500, true],
    [36, false],
  ] as const) {
    const circuit = run({ kind: "constant", reOhm: 75, imOhm: 0 }, lengthM);
    const guard = masking([target], analyseRun(circuit, conditions));
    expect(guard?.isOpenUnseen).toBe(isBlind);
    const said = guard && maskingSentence(guard, draftOfCircuit(lengthM));
    expect(said?.text).toMatch(isBlind ? /cannot detect a missing or a shorted load/ : /notices both/);
  }
});

test("a target is met, missed or cannot be told, and never met by accident of a missing figure", () => {
  const analysis = analyseRun(whip, conditions);
  const met = verdicts(
    [
      { quantity: "loss", atMost: 3 },
      { quantity: "vswr", plane: { at: "load" }, atMost: 1.5 },
      { quantity: "returnLoss", plane: { at: "source" }, atLeast: 6 },
      { quantity: "voltage", atMost: 300 },
      { quantity: "skew", atMost: 1 },
    ],
    analysis,
  ).map(({ isMet }) => isMet);
  expect(met).toEqual([true, false, true, true, null]);
  const powerless = analyseRun(whip, { ...conditions, availablePowerW: null });
  expect(verdicts([{ quantity: "voltage", atMost: 1 }], powerless)[0]?.isMet).toBeNull();
});

test("what the source sees names the line that hides the load", () => {
  const draft = draftOfCircuit(36);
  expect(seenFromSource(analyseRun(whip, conditions), draft, []).text).toMatch(
    /only because 0\.76\sdB of line each way hides the load at 5\.0\sdB/,
  );
  expect(targetWords({ quantity: "returnLoss", atLeast: 14 }, [450e6, 454e6]).replace(/\u00a0/g, " ")).toBe(
    "at least 14, 450–454 MHz",
  );
});

test("open, shorted, lossless, very long and empty runs are analysed without a figure that is not a number on the way out", () => {
  const loads: Circuit["load"][] = [
    { kind: "open" },
    { kind: "short" },
    fifty,
    { kind: "network", topology: "series", cF: 1e-12 },
  ];
  for (const load of loads)
    for (const lengthM of [0, 1, 1e5]) {
      const { spot, worst } = analyseRun(run(load, lengthM), conditions);
      expect(Number.isNaN(spot.sourceReturnLossDb)).toBe(false);
      expect(Number.isNaN(worst.sourceReturnLoss.value)).toBe(false);
    }
  expect(() => analyseRun({ source: fifty, elements: [], load: fifty }, conditions)).not.toThrow();
});

test("a source without resistance is refused by name unless the run has a reference", () => {
  const circuit: Circuit = { ...whip, source: { kind: "constant", reOhm: 0, imOhm: 0 } };
  expect(() => analyseRun(circuit, conditions)).toThrow(/referenceOhm/);
  const { wave, spot } = analyseRun({ ...circuit, referenceOhm: 50 }, conditions);
  expect(wave).toBeNull();
  expect(spot.loadVswr).toBeCloseTo(3.54, 2);
});

test("a match between source and load is said to be a match, not a loss of the line", () => {
  const matched: Circuit = {
    ...whip,
    elements: [
      ...whip.elements,
      { kind: "part", connection: "shunt", cF: 132e-12 },
      { kind: "part", connection: "series", lH: 350e-9 },
    ],
  };
  const said = seenFromSource(analyseRun(matched, conditions), draftOfCircuit(36), []);
  expect(said.text).toMatch(/what stands between brings the load up from 5\.0/);
  expect(said.text).not.toMatch(/hides/);
});

test("a target is judged over its own band where it has one", () => {
  // Source return loss of this run: 6.56 dB over 27–27.4 MHz, 6.34 dB over 20–21 MHz (a second, 40-digit computation).
  const analysis = analyseRun(whip, { ...conditions, bandHz: [27e6, 27.4e6] });
  const target = { quantity: "returnLoss", plane: { at: "source" }, atLeast: 6.4 } as const;
  expect(verdicts([target, { ...target, bandHz: [20e6, 21e6] }], analysis).map(({ isMet }) => isMet)).toEqual([
    true,
    false,
  ]);
  expect(verdicts([{ ...target, bandHz: [20e6, 21e6] }], analysis)[0]?.value).toBeCloseTo(6.34, 2);
});

test("the masking guard finds the least reading between its points", () => {
  // 460 m of P120-S1, 120 Ω, shorted, 0.1–5 MHz: 3.92 dB at 139.2 kHz (a second, 40-digit computation).
  const pair: Line = {
    model: {
      conductors: [{ form: "sqrt", r0OhmPerM: 0.156727, skinCornerRadPerS: 2 * Math.PI * 125.01e3 }],
      lInfHPerM: 555.94e-9,
      cFPerM: 38.61e-12,
      lossTangent: 1.5e-3,
    },
  };
  const ohm120 = { kind: "constant", reOhm: 120, imOhm: 0 } as const;
  const bus: Circuit = { source: ohm120, elements: [{ kind: "cable", line: pair, lengthM: 460 }], load: ohm120 };
  const { masking: gone } = analyseRun(bus, { ...conditions, designHz: 1e6, bandHz: [0.1e6, 5e6] });
  expect(gone.shortDb).toBeCloseTo(3.92, 2);
});

test("the path counts what lies on it once: stubs add nothing, cables side by side do", () => {
  const { pieces } = analyseRun(
    {
      ...whip,
      elements: [
        ...whip.elements,
        { kind: "stub", connection: "shunt", end: "short", line, lengthM: 0.951 },
        {
          kind: "parallel",
          branches: [
            { line, lengthM: 2 },
            { line, lengthM: 2 },
          ],
        },
        { kind: "part", connection: "series", rOhm: 100 },
      ],
    },
    conditions,
  );
  expect(pieces.map(({ pathM }) => pathM)).toEqual([36, 0, 2, 0]);
  expect(pieces.map(({ isMatched }) => isMatched)).toEqual([true, false, false, false]);
  expect(pieces[3]?.lossDb).toBeGreaterThan(3);
});
