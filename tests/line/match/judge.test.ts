import { expect, test } from "vitest";
import type { Element, Termination } from "@/lib/line/element";
import type { Band } from "@/lib/line/match/extreme";
import { judge } from "@/lib/line/match/judge";
import { responder } from "@/lib/line/match/response";
import { seenLoad } from "@/lib/line/match/seen-load";
import { sweep } from "@/lib/line/run";
import { c50F10 } from "@/tests/support/match-lines";

const band: Band = {
  designHz: 100,
  bandHz: [90, 110],
  returnLossDb: 20,
  knownHz: [0, Infinity],
  besidesHz: [],
  rippleHz: Infinity,
};
const constantLoss = (magnitude: (f: number) => number) => (f: number) => ({
  magnitude: magnitude(f),
  lossDb: 0,
  matchLossDb: 0,
});

test("the bandwidth is the distance between the two crossings of the asked return loss, to a part in 10⁹", () => {
  // |Γ| = 0.01·|f − 100| + 0.02 reaches 0.1 at 92 and 108.
  const verdict = judge(
    constantLoss((f) => 0.02 + 0.01 * Math.abs(f - 100)),
    band,
  );
  expect(Math.abs(verdict.bandwidthHz - 16)).toBeLessThan(16e-9);
  expect(verdict.isAtLeast).toBe(false);
});

test("the bandwidth is contiguous: a second match beyond a failing stretch does not count", () => {
  const magnitude = (f: number) => (Math.abs(f - 100) < 3 ? 0.05 : f > 120 ? 0.01 : 0.5);
  expect(judge(constantLoss(magnitude), band).bandwidthHz).toBeCloseTo(6, 9);
});

test("the bandwidth may exceed the band, and is 0 where the return loss does not hold at the design frequency", () => {
  expect(
    judge(
      constantLoss((f) => Math.abs(f - 100) / 400),
      band,
    ).bandwidthHz,
  ).toBeCloseTo(80, 9);
  expect(
    judge(
      constantLoss(() => 0.2),
      band,
    ),
  ).toMatchObject({ bandwidthHz: 0, isAtLeast: false });
});

test("a match that never fails is said to be at least as wide as was looked for, or as the load is known", () => {
  const everywhere = judge(
    constantLoss(() => 0.01),
    band,
  );
  expect(everywhere).toMatchObject({ isAtLeast: true });
  expect(everywhere.bandwidthHz).toBeCloseTo(1000 - 0.1, 9);
  const known = judge(
    constantLoss(() => 0.01),
    { ...band, knownHz: [80, 130] },
  );
  expect(known).toMatchObject({ isAtLeast: true, bandwidthHz: 50 });
});

test("the worst figures are the true extremes, not the nearest sample", () => {
  const peak = 97.123456;
  const below = (f: number, width: number) => ((f - peak) / width) ** 2;
  const respond = (f: number) => ({
    magnitude: 0.3 - below(f, 30),
    lossDb: 1 - below(f, 10),
    matchLossDb: 0.4 - below(f, 20),
  });
  const verdict = judge(respond, band);
  expect(verdict.worstReturnLossDb).toBeCloseTo(-20 * Math.log10(0.3), 9);
  expect(verdict.worstTransducerLossDb).toBeCloseTo(1, 9);
  expect(verdict.worstMatchLossDb).toBeCloseTo(0.4, 9);
});

test("a narrow peak at a sample of the load is seen although it falls between the even samples", () => {
  const magnitude = (f: number) => (Math.abs(f - 95.017) < 0.001 ? 0.9 : 0.05);
  const blind = judge(constantLoss(magnitude), band);
  const seeing = judge(constantLoss(magnitude), { ...band, besidesHz: [95.017] });
  expect(blind.worstReturnLossDb).toBeCloseTo(-20 * Math.log10(0.05), 9);
  expect(seeing.worstReturnLossDb).toBeCloseTo(-20 * Math.log10(0.9), 9);
});

test("ripples of a long run behind are neither missed in the band nor stepped over by the bandwidth", () => {
  // One narrow bump every 0.5 Hz: 20 % of a ripple wide, and the even samples of the band fall beside all of them.
  const bump = (f: number) => {
    const beside = Math.abs(((f - 99.9) / 0.5) % 1);
    return Math.min(beside, 1 - beside) < 0.1 ? 0.2 : 0.05;
  };
  const coarse = judge(constantLoss(bump), { ...band, bandHz: [90.15, 110.15], rippleHz: Infinity });
  const fine = judge(constantLoss(bump), { ...band, bandHz: [90.15, 110.15], rippleHz: 0.5 });
  expect(fine.worstReturnLossDb).toBeCloseTo(-20 * Math.log10(0.2), 9);
  expect(fine.bandwidthHz).toBeLessThan(0.5);
  expect(coarse.bandwidthHz).toBeGreaterThan(100);
});

test("a band of one frequency is judged there", () => {
  const verdict = judge(
    constantLoss((f) => f / 1000),
    { ...band, bandHz: [95, 95] },
  );
  expect(verdict.worstReturnLossDb).toBeCloseTo(-20 * Math.log10(0.095), 12);
});

/** The antenna of the everyday scenario, R 22 Ω and X = −35 + 176·(f/f0 − f0/f) Ω, sampled finely. */
function antenna(): Termination {
  const frequenciesHz = Array.from({ length: 4001 }, (_, k) => 25.2e6 + 1000 * k);
  const reflection = { re: [] as number[], im: [] as number[] };
  for (const f of frequenciesHz) {
    const x = -35 + 176 * (f / 27.2e6 - 27.2e6 / f);
    const [re, im, under] = [22 ** 2 + x * x - 50 ** 2, 2 * 50 * x, (22 + 50) ** 2 + x * x];
    reflection.re.push(re / under);
    reflection.im.push(im / under);
  }
  return { kind: "sampled", referenceOhm: 50, frequenciesHz, reflection };
}

const f0 = 27.2e6;
const network: Element[] = [
  { kind: "part", connection: "shunt", cF: 132e-12, q: 1000, qAtHz: f0 },
  { kind: "part", connection: "series", lH: 350e-9, q: 120, qAtHz: f0 },
];
const scenario: Band = {
  designHz: f0,
  bandHz: [26.96e6, 27.41e6],
  returnLossDb: 20 * Math.log10(5),
  knownHz: [25.2e6, 29.2e6],
  besidesHz: [],
  rippleHz: Infinity,
};

test("the VSWR 1.5 bandwidth of the scenario's L-section reads 1189 kHz at the antenna and 1420 kHz at the transmitter", () => {
  const seen = seenLoad({ load: antenna() }, 50);
  const atAntenna = judge(responder(network, { seen, targetOhm: 50 }), scenario);
  expect(Math.abs(atAntenna.bandwidthHz / 1e3 - 1189)).toBeLessThan(1);
  const feeder: Element = { kind: "cable", line: c50F10, lengthM: 36 };
  const atTransmitter = judge(responder([feeder, ...network], { seen, targetOhm: 50 }), scenario);
  expect(Math.abs(atTransmitter.bandwidthHz / 1e3 - 1420)).toBeLessThan(1);
});

test("responder(elements, ends) gives the sweep's own reflection and transducer loss", () => {
  const elements: Element[] = [{ kind: "cable", line: c50F10, lengthM: 36 }, ...network];
  const load = antenna();
  const respond = responder(elements, { seen: seenLoad({ load }, 50), targetOhm: 50, temperatureC: 40 });
  const frequencies = [26.4e6, 27.2e6, 28.1e6];
  const source = { kind: "constant", reOhm: 50, imOhm: 0 } as const;
  const { returnLossDb, transducerLossDb } = sweep({ source, elements, load }, frequencies, { temperatureC: 40 });
  frequencies.forEach((f, k) => {
    expect(-20 * Math.log10(respond(f).magnitude)).toBeCloseTo(returnLossDb[k]!, 10);
    expect(respond(f).lossDb).toBeCloseTo(transducerLossDb[k]!, 10);
  });
});
