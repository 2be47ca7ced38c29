import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import { complex, polar } from "@/lib/line/complex";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import {
  powersOnLine,
  ratingShares,
  rippleDb,
  standingVoltage,
  voltageMaximumAt,
  waveExtremes,
} from "@/lib/line/mismatched-power";
import { impedanceOfReflection, magnitudeOfVswr, mismatchedLineLossDb } from "@/lib/line/reflection";
import { standingWave } from "@/lib/line/standing-wave";
import { agrees, number, published, type PublishedCheck } from "@/tests/support/published";

const named = (id: string) =>
  published((each) => each === id).map((check) => [`${check.id}: ${check.source}`, check] as [string, PublishedCheck]);

test.each(named("D48-bird-44.18"))("reflected power agrees with print: %s", (_name, check) => {
  const given = { watts: number(check.inputs, "incident_mW") / 1000, kind: "forward" } as const;
  const { load } = powersOnLine(magnitudeOfVswr(number(check.inputs, "vswr")), 0, given);
  agrees(check, { reflected_mW: load.reflectedW * 1000 });
});

test.each(named("D54-frenzel-13.6"))("power in the load agrees with print: %s", (_name, check) => {
  const given = { watts: number(check.inputs, "forward_W"), kind: "forward" } as const;
  agrees(check, { load_W: powersOnLine(magnitudeOfVswr(number(check.inputs, "vswr")), 0, given).load.netW });
});

test.each(["S1.5", "S2", "S3", "S5"].flatMap((id) => named(`B-voltage-${id}`)))(
  "highest voltage and current of a net power agree with the derivation: %s",
  (_name, check) => {
    const magnitude = magnitudeOfVswr(number(check.inputs, "vswr"));
    const { near } = powersOnLine(magnitude, 0, { watts: number(check.inputs, "P_W"), kind: "net" });
    const extremes = waveExtremes(near.forwardW, magnitude, number(check.inputs, "Z0_ohm"));
    const { Vmax_rms_V, Vmax_peak_V, Imax_rms_A } = check.expected;
    expect(extremes.highestV / (Vmax_rms_V as number)).toBeCloseTo(1, 4);
    expect((extremes.highestV * Math.SQRT2) / (Vmax_peak_V as number)).toBeCloseTo(1, 4);
    expect(extremes.highestA / (Imax_rms_A as number)).toBeCloseTo(1, 4);
  },
);

const magnitudes = fc.double({ min: 0, max: 0.99, noNaN: true });
const losses = fc.double({ min: 0, max: 40, noNaN: true });
const watts = fc.double({ min: 1e-3, max: 1e5, noNaN: true });

test("what goes in and does not reach the load is the loss of the mismatched line", () => {
  fc.assert(
    fc.property(magnitudes, losses, watts, fc.constantFrom("forward" as const, "net" as const), (m, a, w, kind) => {
      const { near, load } = powersOnLine(m, a, { watts: w, kind });
      expect(10 * Math.log10(near.netW / load.netW)).toBeCloseTo(mismatchedLineLossDb(m, a), 9);
      expect(near.forwardW - near.reflectedW).toBeCloseTo(near.netW, 6);
      expect((kind === "net" ? near.netW : near.forwardW) / w).toBeCloseTo(1, 12);
    }),
  );
});

test("the extremes are those of the exact standing wave of a lossless line", () => {
  fc.assert(
    fc.property(magnitudes, fc.double({ min: -3, max: 3, noNaN: true }), (magnitude, angle) => {
      const z0 = 75;
      const load = impedanceOfReflection(polar(magnitude, angle), z0);
      const wave = standingWave(
        {
          source: { kind: "constant", reOhm: z0, imOhm: 0 },
          elements: [{ kind: "cable", line: { model: modelFromNominal({ z0, velocityFactor: 1 }) }, lengthM: 1 }],
          load: { kind: "constant", reOhm: load.re, imOhm: load.im },
        },
        SPEED_OF_LIGHT,
        10,
        { pointsPerElement: 2 },
      );
      // a source of the line's own impedance sends its available power as the forward wave
      const { highestV, highestA } = waveExtremes(10, magnitude, z0);
      expect(wave.maxVoltageV / highestV).toBeCloseTo(1, 9);
      expect(wave.maxCurrentA / highestA).toBeCloseTo(1, 9);
    }),
  );
});

test("ratingShares: at VSWR 2 half of the net power, 56 % of the forward power", () => {
  const { net, forward } = ratingShares(magnitudeOfVswr(2));
  expect(net).toBeCloseTo(0.5, 12);
  expect(forward).toBeCloseTo(0.5625, 12);
  expect(ratingShares(0)).toEqual({ net: 1, forward: 1 });
});

test("rippleDb: two 50 to 75 Ω joints swing by 0.70 dB, less with loss between them, without end when both are open", () => {
  expect(rippleDb(0.2, 0.2)).toBeCloseTo(0.695, 3);
  expect(rippleDb(0.2, 0.2, 10)).toBeCloseTo(0.0695, 4);
  expect(rippleDb(0, 0.5)).toBe(0);
  expect(rippleDb(1, 1)).toBe(Infinity);
});

test("voltageMaximumAt: at an open or high load at once, a quarter wave before a short or low one", () => {
  expect(voltageMaximumAt(complex(0.5))).toBe(0);
  expect(voltageMaximumAt(complex(-1))).toBeCloseTo(0.25, 12);
  // a capacitive load has its maximum before the next quarter is over, an inductive one within the first
  expect(voltageMaximumAt(polar(0.5, -Math.PI / 2))).toBeCloseTo(0.375, 12);
  expect(voltageMaximumAt(polar(0.5, Math.PI / 2))).toBeCloseTo(0.125, 12);
});

test("standingVoltage runs between 1 − |Γ| and 1 + |Γ|, greatest where voltageMaximumAt says", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 1, noNaN: true }),
      fc.double({ min: -3, max: 3, noNaN: true }),
      (m, angle) => {
        const gamma = polar(m, angle);
        const at = voltageMaximumAt(gamma);
        expect(standingVoltage(gamma, at)).toBeCloseTo(1 + m, 9);
        expect(standingVoltage(gamma, at + 0.25)).toBeCloseTo(1 - m, 9);
        expect(standingVoltage(gamma, at + 0.1)).toBeLessThan(1 + m);
      },
    ),
  );
});

test("a line that reflects everything takes no net power, and says what forward power alone does", () => {
  const { near, load } = powersOnLine(1, 0, { watts: 10, kind: "forward" });
  expect([near.netW, load.netW, load.reflectedW]).toEqual([0, 0, 10]);
  expect(powersOnLine(1, 0, { watts: 10, kind: "net" }).near.forwardW).toBe(Infinity);
  expect(powersOnLine(1, 0, { watts: 0, kind: "net" }).near.forwardW).toBe(0);
});

test("figures out of range are refused by name", () => {
  const given = { watts: 1, kind: "net" } as const;
  expect(() => powersOnLine(1.1, 0, given)).toThrow("powersOnLine: magnitude must be from 0 to 1, got 1.1");
  expect(() => powersOnLine(0.5, -1, given)).toThrow("powersOnLine: lossDb must be at least 0, got -1");
  expect(() => powersOnLine(0.5, 0, { ...given, watts: NaN })).toThrow(
    "powersOnLine: watts must be at least 0, got NaN",
  );
  expect(() => waveExtremes(1, 0, 0)).toThrow("waveExtremes: z0 must be positive, got 0");
});
