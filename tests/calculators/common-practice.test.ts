/**
 * Rules of thumb of the trade, asked of the calculators as a person would type them. Common practice, printed in many
 * handbooks in these roundings; each is held to the digits it is usually given with.
 */
import { describe, expect, test } from "vitest";
import { attenuation, attenuationInputs } from "@/lib/calculators/attenuation";
import { entryCautions } from "@/lib/calculators/cautions";
import { valuesOf, type Inputs, type Outcome, type Texts, type Values } from "@/lib/calculators/input";
import { electricalLength, lengthInputs } from "@/lib/calculators/length";
import { mismatch, mismatchInputs } from "@/lib/calculators/mismatch";
import { perLength, perLengthInputs } from "@/lib/calculators/per-length";
import { stubAndSection, stubInputs } from "@/lib/calculators/stub";
import type { CableLine } from "@/lib/cables/line";
import type { Construction } from "@/lib/cables/schema";
import { coaxCutoff } from "@/lib/line/coax-cutoff";
import data from "@/seeds/data/cables.json";
import { seededModel } from "@/tests/support/seeded-cables";
import * as reader from "@/lib/format/read-quantity";

function entry(id: string): CableLine {
  const cable = data.cables.find((each) => each.id === id)!;
  return {
    ...{ cableId: id, revision: 1, designation: cable.designation, name: cable.name, family: "coaxial" },
    ...{ state: "approved", condition: null, build: null, limits: {}, model: seededModel(id) },
    construction: cable.construction as Construction,
    outerDiameterMm: cable.construction?.outerDiameterMm ?? null,
  };
}
const entries = new Map(data.cables.map(({ id }) => [id, entry(id)]));

/** The result of a calculator whose usual texts are changed as told. */
function ask<I extends Inputs, R>(inputs: I, compute: (values: Values<I>) => Outcome<R>, typed: Texts): R {
  const usual = Object.fromEntries(Object.entries(inputs).map(([name, input]) => [name, input.usual]));
  const outcome = compute(valuesOf(inputs, { ...usual, ...typed }, reader));
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.result;
}
const line = (z0: string, vf: string) => ask(perLengthInputs, perLength, { z0, vf }).agreement.figures;
const joint = (typed: Texts) => ask(mismatchInputs, mismatch, typed);
const cut = (typed: Texts) => ask(lengthInputs, (values) => electricalLength(values, entries), typed);
const loss = (typed: Texts) => ask(attenuationInputs, (values) => attenuation(values, entries), typed);
const stub = (typed: Texts) => ask(stubInputs, (values) => stubAndSection(values, entries), typed);

describe("Per length", () => {
  test.each([
    ["0.66", 5.05],
    ["83 %", 4.02],
    ["0.85", 3.92],
    ["69", 4.83],
  ])("delay is 3.336/VF ns/m: %s gives %s", (vf, ns) => {
    expect(line("50", vf).delay * 1e9).toBeCloseTo(ns, 2);
  });

  test.each([
    ["50", "0.66", 101, 0],
    ["50", "0.85", 78.5, 1],
    ["75", "0.66", 67.4, 1],
    ["75", "0.83", 53.6, 1],
    ["93", "0.84", 42.7, 1],
    ["100", "0.69", 48.3, 1],
    ["150", "0.78", 28.5, 1],
  ])("capacitance is 3336/(Z0·VF) pF/m: %s Ω, %s gives %s", (z0, vf, pF, digits) => {
    expect(line(z0, vf).capacitance * 1e12).toBeCloseTo(pF, digits);
  });

  test.each([
    ["50", "0.66", 253],
    ["75", "0.66", 379],
    ["100", "0.69", 483],
    ["120", "0.667", 600],
  ])("inductance is 3.336·Z0/VF nH/m: %s Ω, %s gives %s", (z0, vf, nH) => {
    expect(line(z0, vf).inductance * 1e9).toBeCloseTo(nH, 0);
  });

  test.each([
    ["0.66", 2.26, 2.3],
    ["0.70", 2.04, 2.1],
    ["0.80", 1.4, 1.57],
    ["0.85", 1.38, 1.4],
  ])("VF is 1/√εr: %s is a permittivity from %s to %s", (vf, low, high) => {
    const { permittivity } = ask(perLengthInputs, perLength, { z0: "50", vf });
    expect(permittivity).toBeGreaterThanOrEqual(low);
    expect(permittivity).toBeLessThanOrEqual(high);
  });
});

describe("Lengths", () => {
  test("a quarter wave in cable is 74.95·VF/f: 0.655 m at 97.3 MHz and 0.85", () => {
    const typed = { cable: "typed", z0: "50", vf: "0.85", r0: "0", tan: "0", corner: "" };
    expect(cut({ ...typed, frequency: "97.3 MHz", wanted: "λ/4" }).cutM).toBeCloseTo(0.655, 3);
    // of a real cable a little less: its loop inductance slows it
    expect(cut({ cable: "c50-f10", frequency: "97.3 MHz", wanted: "λ/4" }).cutM).toBeCloseTo(0.654, 3);
  });

  test.each([
    ["1 kHz", 2000, 0.15],
    ["100 kHz", 98, 0.65],
    ["1 MHz", 10, 0.69],
  ])("an LCR meter at %s is true to λ/20, about %s m of a 120 Ω pair, at a velocity factor of %s", (f, metres, vf) => {
    const { cutM, spot } = cut({ cable: "p120-s1", frequency: f, wanted: "λ/20" });
    // given with one or two digits in print
    expect(Math.abs(cutM / metres - 1)).toBeLessThan(0.15);
    expect(spot.velocityFactor).toBeCloseTo(vf, 1);
  });

  test("one degree at 1420.4 MHz in C50-X5 is 0.469 mm, and 18 m are 38 399 degrees", () => {
    const { spot, whole } = cut({ cable: "c50-x5", frequency: "1420.4 MHz", wanted: "18 m" });
    expect((Math.PI / 180 / spot.phaseRadPerM) * 1000).toBeCloseTo(0.469, 3);
    expect(Math.abs((whole.phaseRad * 180) / Math.PI / 38399 - 1)).toBeLessThan(1e-3);
  });
});

describe("Mismatch", () => {
  test.each([
    [1.05, 32.3],
    [1.1, 26.4],
    [1.2, 20.8],
    [1.25, 19.1],
    [1.3, 17.7],
    [1.5, 14.0],
    [1.92, 10.0],
    [2, 9.54],
    [3, 6.02],
    [5, 3.52],
  ])("VSWR %s is a return loss of %s dB", (vswr, returnLoss) => {
    expect(Math.abs(joint({ given: "vswr", vswr: `${vswr}` }).load.returnLossDb - returnLoss)).toBeLessThan(0.051);
    const back = joint({ given: "returnLoss", returnLoss: `${returnLoss}` }).load.vswr;
    expect(Math.abs(back / vswr - 1)).toBeLessThan(0.005);
  });

  test.each([
    ["1.5", 0.177],
    ["2:1", 0.512],
    ["3 to 1", 1.25],
    ["5", 2.55],
  ])("VSWR %s is a mismatch loss of %s dB", (vswr, lost) => {
    expect(joint({ given: "vswr", vswr }).mismatchLossDb).toBeCloseTo(lost, 2);
  });

  test("a decibel of line, one way, lifts the return loss at the near end by two", () => {
    const { near, load } = joint({ given: "returnLoss", returnLoss: "11", loss: "1 dB" });
    expect(near.returnLossDb - load.returnLossDb).toBeCloseTo(2, 12);
  });

  test("50 against 75 Ω: Γ 0.2, 14.0 dB, 0.18 dB, and up to 0.70 dB of ripple from two such joints", () => {
    const { magnitude, load, mismatchLossDb, rippleDb } = joint({ given: "load", load: "75", reference: "50" });
    expect(magnitude).toBeCloseTo(0.2, 12);
    expect(load.returnLossDb).toBeCloseTo(14.0, 1);
    expect(mismatchLossDb).toBeCloseTo(0.18, 2);
    expect(rippleDb).toBeCloseTo(0.7, 1);
  });

  test("two ohms off 50 are 34.2 dB", () => {
    expect(joint({ given: "load", load: "52" }).load.returnLossDb).toBeCloseTo(34.2, 1);
  });

  test.each([
    ["3 dB", "2", 3.39],
    ["3 dB", "3", 3.97],
    ["6 dB", "3", 7.18],
    ["1 dB", "3", 1.5],
  ])("%s of line before a VSWR of %s lose %s dB in all", (matched, vswr, total) => {
    expect(joint({ given: "vswr", vswr, loss: matched }).totalLossDb).toBeCloseTo(total, 2);
  });

  test("100 W net into VSWR 2 on 50 Ω are 141 V peak; of a forward power 0.56 is left for the same voltage", () => {
    const { near, rating } = joint({ given: "vswr", vswr: "2", power: "100 W", as: "net" });
    expect(near.extremes.highestV * Math.SQRT2).toBeCloseTo(141.4, 1);
    expect(rating.forward).toBeCloseTo(0.56, 2);
    expect(rating.net).toBeCloseTo(0.5, 12);
  });
});

describe("Attenuation", () => {
  test.each([
    ["10 kHz", 661],
    ["100 MHz", 6.6],
  ])("the skin depth of copper at %s is %s µm", (frequency, micrometres) => {
    const { skinDepthM } = loss({ cable: "c50-f10", frequency });
    expect(Math.abs((skinDepthM * 1e6) / micrometres - 1)).toBeLessThan(2e-3);
  });

  test.each([
    ["p120-s1", "0.22 mm²", 157],
    ["p120-b1", "0.34 mm²", 101],
    ["p100-u4", "0.51 mm", 169],
    ["p150-s1", "0.64 mm", 107],
  ])("a kilometre of %s, cores of %s, has a loop of %s Ω", (cable, _core, ohms) => {
    expect(loss({ cable, length: "1 km" }).whole.dcResistanceOhm).toBeCloseTo(ohms, 0);
  });

  test("the drop of a direct current counts both cores: 35 mA through 62 m of C50-F10 are 19 mV", () => {
    const { dropV, whole } = loss({ cable: "c50-f10", length: "62 m", current: "35 mA" });
    expect(whole.dcResistanceOhm).toBeCloseTo(0.53, 2);
    expect(dropV! * 1000).toBeCloseTo(18.7, 1);
  });

  test.each([
    ["1 kHz", 745],
    ["31 kHz", 149],
    ["1 MHz", 106],
  ])("the impedance of a 100 Ω pair at %s is about %s Ω", (frequency, ohms) => {
    const { re, im } = loss({ cable: "p100-u4", frequency }).spot.zc;
    // told for a pair like this one, not for this one
    expect(Math.abs(Math.hypot(re, im) / ohms - 1)).toBeLessThan(0.03);
    if (frequency === "1 kHz") expect((Math.atan2(im, re) * 180) / Math.PI).toBeCloseTo(-45, -1);
  });

  test("coaxial loss grows by 0.2 % a kelvin above the skin corner, dc resistance by 0.39 %: 25 K are 5 % and 9.8 %", () => {
    const { whole, reference } = loss({ cable: "c50-f10", frequency: "100 MHz", temperature: "45" });
    expect(whole.lossDb / reference.lossDb).toBeCloseTo(1.05, 2);
    expect(whole.dcResistanceOhm / reference.dcResistanceOhm).toBeCloseTo(1.098, 3);
  });

  test.each([
    ["c50-f10", 16],
    ["c50-f28", 5.2],
  ])("the cut-off of %s is %s GHz, and beyond it the calculators warn", (id, gigahertz) => {
    const construction = entry(id).construction as Extract<Construction, { kind: "coax" }>;
    const { innerMm, dielectricMm, relativePermittivity } = construction;
    const cutoff = coaxCutoff(innerMm / 1e3, dielectricMm / 1e3, relativePermittivity);
    expect(cutoff / 1e9).toBeCloseTo(gigahertz, gigahertz > 10 ? 0 : 1);
    const chosen = { label: id, model: seededModel(id), entry: entry(id) };
    expect(
      entryCautions(chosen, cutoff * 1.01, 20)
        .map(({ text }) => text)
        .join(),
    ).toContain("other modes");
    expect(entryCautions(chosen, cutoff * 0.99, 20)).toEqual([]);
  });
});

describe("Sections", () => {
  test("a quarter-wave section is √(Z1·Z2): 61.2 Ω between 50 and 75, or two sections of 0.0815 λ of the two themselves", () => {
    const { section } = stub({ cable: "c50-f10", source: "50", load: "75" });
    expect(section.neededOhm).toBeCloseTo(61.2, 1);
    expect(section.alternating).toBeCloseTo(0.0815, 4);
    expect(stub({ cable: "c50-f10", source: "75", load: "50" }).section.alternating).toBeCloseTo(0.0815, 4);
  });

  test("an open quarter-wave stub of C50-F10 takes 44.3 dB from a 50 Ω line at 97.3 MHz", () => {
    const { stub: notch } = stub({ cable: "c50-f10", frequency: "97.3 MHz", length: "λ/4", across: "50" });
    expect(Math.abs(notch.acrossDb - 44.3)).toBeLessThan(0.3);
    expect(notch.lengthM).toBeCloseTo(0.654, 3);
  });
});
