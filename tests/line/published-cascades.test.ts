/**
 * Networks of several lines and stubs as print gives them, put together from the engine's own elements and swept: what
 * they show must be what they were designed for.
 */
import { expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import { abs, complex, type Complex } from "@/lib/line/complex";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { Circuit, Element } from "@/lib/line/element";
import { solvePair } from "@/lib/line/match/solve-pair";
import { reflection } from "@/lib/line/reflection";
import { sweep } from "@/lib/line/run";
import fixture from "@/tests/fixtures/line/published-cascades.json";

interface Check {
  id: string;
  topic: string;
  source: string;
  inputs: Record<string, unknown>;
  expected: Record<string, unknown>;
  tolerance: { rel?: number; abs?: number };
}
const checks = fixture.checks as Check[];
const about = (topic: string) =>
  checks
    .filter((each) => each.topic.startsWith(topic))
    .map((check) => [`${check.id}: ${check.source}`, check] as const);
const number = (values: Record<string, unknown>, key: string) => values[key] as number;
const numbers = (values: Record<string, unknown>, key: string) => values[key] as number[];

/** Frequency at which a line of velocity factor 1 has a wavelength of 1 m. */
const oneMetreWave = SPEED_OF_LIGHT;
const cable = (z0: number, wavelengths: number): Element => ({
  kind: "cable",
  line: { model: modelFromNominal({ z0, velocityFactor: 1 }) },
  lengthM: wavelengths,
});
const ohms = ({ re, im }: Complex) => ({ kind: "constant" as const, reOhm: re, imOhm: im });
const run = (z0: number, elements: Element[], load: Complex): Circuit => ({
  source: ohms(complex(z0)),
  elements,
  load: ohms(load),
});
const reflectionAt = (circuit: Circuit, ratio: number): Complex => {
  const { re, im } = sweep(circuit, [ratio * oneMetreWave]).reflection;
  return complex(re[0]!, im[0]!);
};

test.each(about("double stub"))("a double stub shows its line at the lengths in print: %s", (_name, check) => {
  const { inputs, expected, tolerance } = check;
  const z0 = number(inputs, "Z0_ohm");
  const end = check.topic.includes("open") ? "open" : "short";
  const stub = (lengthM: number): Element => ({
    kind: "stub",
    connection: "shunt",
    end,
    line: { model: modelFromNominal({ z0, velocityFactor: 1 }) },
    lengthM,
  });
  const spacing = cable(z0, number(inputs, "spacing_wavelengths"));
  const lead = cable(z0, number(inputs, "load_to_first_stub_wavelengths"));
  for (const lengths of expected.l1_l2_wavelengths as [number, number][]) {
    const residual = (first: number, second: number) =>
      reflectionAt(
        run(z0, [stub(Math.max(0, second)), spacing, stub(Math.max(0, first)), lead], inputs.ZL as Complex),
        1,
      );
    const { value, converged } = solvePair(residual, lengths, [0.01, 0.01]);
    expect(converged).toBe(true);
    value.forEach((length, k) => expect(Math.abs(length - lengths[k]!)).toBeLessThanOrEqual(tolerance.abs!));
  }
});

/** A transformer of quarter-wave sections from a real load to a real line. */
const transformer = (z0: number, sections: number[], load: number) =>
  run(
    z0,
    sections.map((each) => cable(each, 0.25)),
    complex(load),
  );

/** The width, over the design frequency, in which the reflection stays within a limit, from its outer edges inward. */
function fractionalWidth(circuit: Circuit, limit: number): number {
  const isOutside = (ratio: number) => abs(reflectionAt(circuit, ratio)) > limit;
  let [low, high] = [0.01, 0.01];
  while (isOutside(high)) [low, high] = [high, high + 0.005];
  for (let k = 0; k < 40; k++) {
    const middle = (low + high) / 2;
    if (isOutside(middle)) low = middle;
    else high = middle;
  }
  return 2 - 2 * low;
}

test.each(
  checks.filter(({ id }) => /^D8[56]/.test(id)).map((check) => [`${check.id}: ${check.source}`, check] as const),
)(
  "three sections of the impedances in print keep the reflection over the band in print: %s",
  (_name, { inputs, expected, tolerance }) => {
    const circuit = transformer(number(inputs, "Z0_ohm"), numbers(expected, "Z_ohm"), number(inputs, "ZL_ohm"));
    const width = number(expected, "FBW");
    const got = fractionalWidth(circuit, number(inputs, "gamma_max"));
    expect(Math.abs(got - width)).toBeLessThanOrEqual(tolerance.rel! * width);
  },
);

test.each(about("Chebyshev two-section"))("the ripple over the band is that in print: %s", (_name, check) => {
  const { inputs, expected, tolerance } = check;
  const circuit = transformer(number(inputs, "Z0_ohm"), numbers(expected, "Z_ohm"), number(inputs, "ZL_ohm"));
  const half = number(inputs, "FBW") / 2;
  const ratios = Array.from({ length: 601 }, (_, k) => 1 - half + (half * k) / 300);
  const worst = Math.max(...ratios.map((ratio) => abs(reflectionAt(circuit, ratio))));
  const ripple = number(expected, "gamma_max");
  expect(Math.abs(worst - ripple)).toBeLessThanOrEqual(tolerance.rel! * ripple);
});

/** |Γ|² / (1 − |Γ|²) of a lossless cascade, as its design law gives it, back to |Γ|. */
const magnitudeOf = (ratio: number) => Math.sqrt(ratio / (1 + ratio));
/** What impedances rounded as in print can change: each by half its relative error, all in step. */
const slack = (sections: number[], allowed: number) =>
  sections.reduce((sum, each) => sum + allowed / (2 * each), 0) + 1e-9;
const phases = Array.from({ length: 46 }, (_, k) => ((k + 0.5) * Math.PI) / 92);

test.each(about("binomial coefficient table"))(
  "sections of the impedances in print reflect as the flattest response does, at every phase: %s",
  (_name, { inputs, expected, tolerance }) => {
    const [count, load] = [number(inputs, "N"), number(inputs, "ZL_over_Z0")];
    const sections = numbers(expected, "Zn_over_Z0");
    const circuit = transformer(1, sections, load);
    for (const phase of phases) {
      // Flattest: (R − 1)²/(4R)·cos^{2N} θ, from 0 at a quarter wave to the load alone at no length.
      const law = magnitudeOf(((load - 1) ** 2 / (4 * load)) * Math.cos(phase) ** (2 * count));
      const got = abs(reflectionAt(circuit, phase / (Math.PI / 2)));
      expect(Math.abs(got - law)).toBeLessThanOrEqual(slack(sections, tolerance.abs!));
    }
  },
);

/** T_n(x) inside and outside −1 to 1. */
function chebyshev(n: number, x: number): number {
  return Math.abs(x) <= 1 ? Math.cos(n * Math.acos(x)) : Math.cosh(n * Math.acosh(Math.abs(x)));
}

test.each(about("Chebyshev coefficient table"))(
  "sections of the impedances in print reflect as the equal ripple does, at every phase: %s",
  (_name, { inputs, expected, tolerance }) => {
    const [count, load, ripple] = [number(inputs, "N"), number(inputs, "ZL_over_Z0"), number(inputs, "gamma_max")];
    const sections = numbers(expected, "Zn_over_Z0");
    const circuit = transformer(1, sections, load);
    const edge = (Math.PI / 2) * (1 - number(expected, "FBW") / 2);
    for (const phase of phases) {
      const law = (ripple ** 2 / (1 - ripple ** 2)) * chebyshev(count, Math.cos(phase) / Math.cos(edge)) ** 2;
      const got = abs(reflectionAt(circuit, phase / (Math.PI / 2)));
      expect(Math.abs(got - magnitudeOf(law))).toBeLessThanOrEqual(slack(sections, tolerance.abs!));
    }
  },
);

test.each(about("theory of small reflections"))(
  "two steps reflect exactly as in print, and less than the sum of both: %s",
  (_name, { inputs, expected, tolerance }) => {
    const [first, second, third] = [number(inputs, "Z1"), number(inputs, "Z2"), number(inputs, "Z3")];
    const between = cable(second, number(inputs, "electrical_deg") / 360);
    const exact = reflectionAt(run(first, [between], complex(third)), 1).re;
    const sum = reflection(complex(second), complex(first)).re + reflection(complex(third), complex(second)).re;
    const got = { exact_gamma: exact, small_reflection_gamma: sum, error_percent: 100 * (sum / exact - 1) };
    for (const [key, value] of Object.entries(got))
      expect(Math.abs(value - number(expected, key))).toBeLessThanOrEqual(tolerance.rel! * number(expected, key));
  },
);

test("every check of the file is one of those above", () => {
  const topics = /^(double stub|binomial|Chebyshev|theory of small reflections)/;
  expect(checks.filter(({ topic }) => !topics.test(topic))).toEqual([]);
  expect(checks).toHaveLength(35);
});
