import { describe, expect, test } from "vitest";
import { modelFromNominal, nominalFigures, prepareLine } from "@/lib/line/cable";
import { complex, divide } from "@/lib/line/complex";
import type { ConductorForm, LineModel } from "@/lib/line/element";
import { extractLine, type ExtractRequest } from "@/lib/line/extract/extract";
import { measuredLine } from "@/lib/line/extract/per-metre";
import { onePortPoints, type OnePortSweeps, type TwoPortSweep } from "@/lib/line/extract/sample-sweep";
import { unwrapped } from "@/lib/line/extract/unwrap";
import { type ComplexArray, complexArray, lineFigures } from "@/lib/line/line-figures";
import { reflection } from "@/lib/line/reflection";
import { lineSection } from "@/lib/line/section";
import { scattering } from "@/lib/line/two-port";
import { complexOf, number, published } from "@/tests/support/published";
import fc from "@/tests/support/property";

function put(into: ComplexArray, k: number, { re, im }: { re: number; im: number }): void {
  into.re[k] = re;
  into.im[k] = im;
}

/** What an analyser sees of a sample. */
function twoPortOf(
  model: LineModel,
  length: number,
  frequencies: number[],
  referenceOhm = 50,
): ExtractRequest["sweep"] {
  const section = lineSection(prepareLine(model), length);
  const [s11, s21, s12, s22] = [0, 1, 2, 3].map(() => complexArray(frequencies.length)) as [
    ComplexArray,
    ComplexArray,
    ComplexArray,
    ComplexArray,
  ];
  frequencies.forEach((f, k) => {
    const s = scattering(section({ re: 0, im: 2 * Math.PI * f }), referenceOhm);
    put(s11, k, s.s11);
    put(s21, k, s.s21);
    put(s12, k, s.s12);
    put(s22, k, s.s22);
  });
  return { kind: "twoPort", data: { referenceOhm, frequencies, s11, s21, s12, s22 } };
}

function onePortsOf(
  model: LineModel,
  length: number,
  frequencies: number[],
  referenceOhm = 50,
): ExtractRequest["sweep"] {
  const section = lineSection(prepareLine(model), length);
  const [open, short] = [complexArray(frequencies.length), complexArray(frequencies.length)];
  frequencies.forEach((f, k) => {
    const { a, b, c, d } = section({ re: 0, im: 2 * Math.PI * f });
    put(open, k, reflection(divide(a, c), complex(referenceOhm)));
    put(short, k, reflection(divide(b, d), complex(referenceOhm)));
  });
  return { kind: "onePorts", data: { referenceOhm, frequencies, open, short } };
}

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const decades = (min: number, max: number) => between(Math.log10(min), Math.log10(max)).map((power) => 10 ** power);
const linear = (from: number, to: number, points: number) =>
  Array.from({ length: points }, (_, k) => from + ((to - from) * k) / (points - 1));

/** Cables that exist: what is inside their conductors is at most 0.2 µH/m. */
const anyCable = fc
  .record({
    form: fc.constantFrom<ConductorForm>("round", "sqrt", "sheet"),
    z0: between(35, 150),
    velocityFactor: between(0.6, 0.9),
    r0: decades(5e-3, 0.3),
    corner: decades(1e5, 2e6),
    lossTangent: decades(5e-5, 0.01),
    length: between(5, 60),
  })
  .filter(({ r0, corner }) => r0 / (2 * corner) < 0.2e-6);
type Drawn = typeof anyCable extends fc.Arbitrary<infer T> ? T : never;
const modelOf = ({ form, z0, velocityFactor, r0, corner, lossTangent }: Drawn): LineModel =>
  modelFromNominal({
    z0,
    velocityFactor,
    conductors: [{ form, r0OhmPerM: r0, skinCornerRadPerS: corner }],
    lossTangent,
  });

/** @param reaches - whether the sweep reaches the skin corner; above it only R0/√ωs, the loss, can be known */
function expectModel(got: LineModel, model: LineModel, reaches: boolean): void {
  const [found, drawn] = [nominalFigures(got), nominalFigures(model)];
  expect(found.z0 / drawn.z0).toBeCloseTo(1, 5);
  expect(found.delay / drawn.delay).toBeCloseTo(1, 5);
  expect(got.lossTangent! / model.lossTangent!).toBeCloseTo(1, 2);
  const [term, own] = [got.conductors[0]!, model.conductors[0]!];
  const high = ({ r0OhmPerM, skinCornerRadPerS }: typeof own) => r0OhmPerM / Math.sqrt(skinCornerRadPerS!);
  expect(high(term) / high(own)).toBeCloseTo(1, 3);
  if (!reaches) return;
  expect(term.r0OhmPerM / own.r0OhmPerM).toBeCloseTo(1, 2);
  expect(term.skinCornerRadPerS! / own.skinCornerRadPerS!).toBeCloseTo(1, 2);
}

describe("extract(simulate(model)) is the model", () => {
  // from below the skin corner to where the dielectric tells, steps narrow enough to count the turns
  const frequencies = [...linear(1e4, 9.9e5, 40), ...linear(1e6, 2e8, 800)];

  test.each<[string, typeof twoPortOf]>([
    ["from a two-port sweep", twoPortOf],
    ["from sweeps with the far end open and short", onePortsOf],
  ])(
    "%s",
    (_, simulated) => {
      fc.assert(
        fc.property(anyCable, fc.constantFrom(50, 75, 100), (drawn, referenceOhm) => {
          const model = modelOf(drawn);
          const sweep = simulated(model, drawn.length, frequencies, referenceOhm);
          const { model: got, residuals, warnings } = extractLine({ length: drawn.length, sweep, form: drawn.form });
          const said = warnings.map(({ warning }) => warning);
          expectModel(got, model, !said.includes("aboveCorner"));
          expect(residuals.rmsPercent).toBeLessThan(1e-3);
          for (const wrong of ["fasterThanLight", "poorFit", "notPassive", "turnsFromSlope"])
            expect(said).not.toContain(wrong);
        }),
        { numRuns: 25, endOnFailure: true },
      );
    },
    60_000,
  );
});

describe("Published open and short impedances", () => {
  const measured = (open: { re: number; im: number }, short: { re: number; im: number }, length: number) => {
    // an analyser of the line's own size: far from it the impedance would count as unsound
    const referenceOhm = Math.sqrt(Math.hypot(open.re, open.im) * Math.hypot(short.re, short.im));
    const gamma = (z: { re: number; im: number }): ComplexArray => {
      const { re, im } = reflection(z, complex(referenceOhm));
      return { re: Float64Array.of(re), im: Float64Array.of(im) };
    };
    const sweeps: OnePortSweeps = { referenceOhm, frequencies: [1e6], open: gamma(open), short: gamma(short) };
    return measuredLine(onePortPoints(sweeps), length);
  };

  test.each(published((id) => /^D3[234]-/.test(id)).map((check) => [`${check.id}: ${check.source}`, check] as const))(
    "give the impedance, and β where the length is known: %s",
    (_, { inputs, expected, tolerance }) => {
      const [open, short] =
        "Zoc" in inputs
          ? [complexOf(inputs.Zoc), complexOf(inputs.Zsc)]
          : [complex(0, number(inputs, "Zoc_im")), complex(0, number(inputs, "Zsc_im"))];
      const length = "length_m" in inputs ? number(inputs, "length_m") : 1;
      const { zc, phase } = measured(open, short, length);
      const printed = "Zc" in expected ? complexOf(expected.Zc) : complex(number(expected, "Z0_ohm"));
      const off = Math.hypot(zc.re[0]! - printed.re, zc.im[0]! - printed.im) / Math.hypot(printed.re, printed.im);
      expect(off).toBeLessThanOrEqual(tolerance.rel!);
      if ("beta_rad_per_m" in expected)
        expect(Math.abs(phase[0]! / number(expected, "beta_rad_per_m") - 1)).toBeLessThanOrEqual(tolerance.rel!);
    },
  );
});

const feeder = modelFromNominal({
  z0: 50,
  velocityFactor: 0.85,
  conductors: [{ form: "sqrt", r0OhmPerM: 0.0086, skinCornerRadPerS: 1.11e5 }],
  lossTangent: 1.5e-4,
});
const names = (request: ExtractRequest) => extractLine(request).warnings.map(({ warning }) => warning);

test("at multiples of a half wavelength impedance comes from the neighbours, attenuation stays its own, and it is said", () => {
  const lossless = modelFromNominal({ z0: 75, velocityFactor: 2 / 3 });
  const length = 10;
  const half = (299_792_458 * (2 / 3)) / (2 * length);
  // every fourth frequency is a multiple of the half wave, exactly
  const frequencies = Array.from({ length: 41 }, (_, k) => (half * (k + 1)) / 4);
  const { measured, warnings } = extractLine({ length, sweep: twoPortOf(lossless, length, frequencies) });
  expect(warnings).toContainEqual({ warning: "impedanceFromNeighbours", count: 10, passes: 1 });
  measured.zc.re.forEach((re) => expect(re).toBeCloseTo(75, 6));
  frequencies.forEach((f, k) => {
    expect(measured.phase[k]! / (2 * Math.PI * f * nominalFigures(lossless).delay)).toBeCloseTo(1, 9);
    expect(measured.attenuation[k]).toBeCloseTo(0, 9);
  });
});

test("near half waves a small error of the data does not become a large one of the attenuation", () => {
  const length = 20;
  const frequencies = linear(1e6, 3e8, 600);
  const sweep = twoPortOf(feeder, length, frequencies, 75);
  const { data } = sweep as { data: TwoPortSweep };
  // the same noise at every run, a thousandth of full scale
  let state = 1;
  const noise = () => (state = (state * 48271) % 2147483647) / 2147483647 - 0.5;
  for (const each of [data.s11, data.s21, data.s12, data.s22])
    for (let k = 0; k < frequencies.length; k++) {
      each.re[k]! += 1e-3 * noise();
      each.im[k]! += 1e-3 * noise();
    }
  const { measured, model, warnings } = extractLine({ length, sweep, r0: 0.0086 });
  const figures = lineFigures(feeder, frequencies);
  frequencies.forEach((f, k) => {
    if (f < 1e7) return;
    expect(Math.abs(measured.attenuation[k]! * 8.685889638 - figures.attenuationDbPerM[k]!) * length).toBeLessThan(
      0.05,
    );
    expect(Math.abs(measured.zc.re[k]! / 50 - 1)).toBeLessThan(0.02);
  });
  const found = lineFigures(model, frequencies);
  // at the first of these the sample loses 0.25 dB, and the noise is 4 % of that
  for (const k of [50, 200, 599])
    expect(Math.abs(found.attenuationDbPerM[k]! / figures.attenuationDbPerM[k]! - 1)).toBeLessThan(0.025);
  expect(nominalFigures(model).z0 / 50).toBeCloseTo(1, 3);
  expect(nominalFigures(model).velocityFactor / 0.85).toBeCloseTo(1, 3);
  expect(warnings.map(({ warning }) => warning)).toEqual(["impedanceFromNeighbours"]);
});

test("a sweep that begins many wavelengths up has its turns from the slope", () => {
  const length = 48;
  const frequencies = linear(4e8, 5e8, 401);
  const { measured, warnings } = extractLine({ length, sweep: twoPortOf(feeder, length, frequencies) });
  const exact = lineFigures(feeder, frequencies).phaseRadPerM;
  frequencies.forEach((_, k) => expect(measured.phase[k]! / exact[k]!).toBeCloseTo(1, 9));
  expect(warnings).toContainEqual({
    warning: "turnsFromSlope",
    turns: Math.round((exact[0]! * length) / (2 * Math.PI)),
  });
  expect(warnings.map(({ warning }) => warning)).toContain("aboveCorner");
}, 30_000);

test("turns are counted right as long as steps are under seven eighths of one", () => {
  const frequencies = linear(1e6, 2e7, 20);
  fc.assert(
    fc.property(between(0.05, 5.4), (step) => {
      const straight = frequencies.map((f) => (step * f) / 1e6);
      const angle = Float64Array.from(straight, (each) => Math.atan2(Math.sin(each), Math.cos(each)));
      const { phase, largestStep } = unwrapped(angle, new Float64Array(20), frequencies);
      straight.forEach((each, k) => expect(phase[k]).toBeCloseTo(each, 6));
      expect(largestStep).toBeCloseTo(step, 6);
    }),
  );
});

test("what is odd about a sweep is said", () => {
  const length = 20;
  const frequencies = linear(1e5, 1e8, 300);
  const sweep = () => twoPortOf(feeder, length, frequencies) as { kind: "twoPort"; data: TwoPortSweep };
  const changed = (change: (data: TwoPortSweep) => void) => {
    const made = sweep();
    change(made.data);
    return names({ length, sweep: made });
  };
  expect(changed(() => undefined)).toEqual(["impedanceFromNeighbours", "aboveCorner"]);
  expect(changed(({ s21 }) => s21.re.fill(0.5, 0, 3))).toContain("notReciprocal");
  expect(changed(({ s22 }) => s22.re.fill(0.3, 0, 3))).toContain("notSymmetric");
  expect(changed(({ s11 }) => s11.re.fill(1.2, 0, 3))).toContain("notPassive");
  expect(names({ length: 40, sweep: sweep() })).toContain("fasterThanLight");
  const wide = linear(1e6, 1e8, 12);
  expect(names({ length, sweep: twoPortOf(feeder, length, wide) })).toContain("wideSteps");
  const lossy = modelFromNominal({
    z0: 50,
    velocityFactor: 0.66,
    conductors: [{ form: "sqrt", r0OhmPerM: 1, skinCornerRadPerS: 1e6 }],
  });
  const deep = { length: 60, sweep: onePortsOf(lossy, 60, linear(1e5, 1e9, 2000)) };
  expect(names(deep)).toContain("nothingThrough");
  expect(Number.isNaN(extractLine(deep).measured.attenuation.at(-1)!)).toBe(true);
}, 30_000);

test.each<[string, (request: ExtractRequest) => void, RegExp]>([
  ["no length", (request) => (request.length = 0), /length must be positive/],
  ["no reference", ({ sweep }) => (sweep.data.referenceOhm = -50), /referenceOhm must be positive/],
  ["frequencies that fall", ({ sweep }) => (sweep.data.frequencies = [3e7, 2e7, 1e7]), /frequencies must ascend/],
  ["a value too few", ({ sweep }) => ((sweep.data as TwoPortSweep).s12 = complexArray(2)), /s12 needs as many values/],
  [
    "a sample that is nothing",
    ({ sweep }) => Object.assign(sweep.data, (twoPortOf(feeder, 0, [1e7, 2e7, 3e7]) as { data: object }).data),
    /too short/,
  ],
])("extractLine refuses %s", (_, change, words) => {
  const request: ExtractRequest = { length: 5, sweep: twoPortOf(feeder, 5, [1e7, 2e7, 3e7]) };
  change(request);
  expect(() => extractLine(request)).toThrow(RangeError);
  expect(() => extractLine(request)).toThrow(words);
});
