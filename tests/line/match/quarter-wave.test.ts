import { expect, test } from "vitest";
import { abs, complex, reciprocal, type Complex } from "@/lib/line/complex";
import { impedanceAlong, reflectionAgainst } from "@/lib/line/match/line-angle";
import { quarterWaveBandwidth, realPoints, sectionImpedance } from "@/lib/line/match/quarter-wave";
import fixture from "@/tests/fixtures/line/matching-sections.json";
import published from "@/tests/fixtures/line/published-matching.json";
import { closeTo, type Expected } from "@/tests/support/tolerance";

const load = (inputs: { load_re_ohm: number; load_im_ohm: number }) => complex(inputs.load_re_ohm, inputs.load_im_ohm);
const named = (name: string) =>
  fixture.cases
    .filter((each) => each.name === name)
    .map((each) => ({ ...each.inputs, inputs: each.inputs, expected: each.expected }));

test.each(named("quarter-wave at the real-impedance points"))(
  "a load of $load_re_ohm, $load_im_ohm Ω on $z0_ohm Ω shows a resistance at both extremes of voltage",
  ({ inputs, expected }) => {
    const points = realPoints(load(inputs), inputs.z0_ohm);
    const sections = points.map((each) => sectionImpedance(inputs.z0_ohm, each.resistanceOhm));
    closeTo(
      points.map((each) => each.distance),
      expected.distance_from_load_wavelengths as Expected,
      "distance",
    );
    closeTo(sections, expected.section_z0_ohm as Expected, "section");
    expect(points.map((each) => (each.point === "voltageMaximum" ? "voltage_maximum" : "voltage_minimum"))).toEqual(
      expected.point,
    );
  },
);

test.each(named("quarter-wave, real load"))(
  "the quarter-wave section from $load_re_ohm to $z0_ohm Ω has the known impedance and band",
  ({ inputs, expected }) => {
    closeTo(sectionImpedance(inputs.z0_ohm, inputs.load_re_ohm), expected.section_z0_ohm as Expected, "section");
    const width = quarterWaveBandwidth(inputs.z0_ohm, inputs.load_re_ohm, inputs.max_reflection!);
    closeTo(width, expected.fractional_bandwidth_at_max_reflection as Expected, "band");
  },
);

const checkOf = (id: string) => {
  const check = published.checks.find((each) => each.id.startsWith(id))!;
  return {
    inputs: check.inputs as unknown as Record<string, number>,
    expected: check.expected as unknown as Record<string, number>,
    allowed: { rel_tolerance: check.tolerance.rel ?? 0, abs_tolerance: check.tolerance.abs ?? 0 },
  };
};

test.each(["D59", "D80", "D81", "D82", "D84"])("published quarter-wave section %s has the printed impedance", (id) => {
  const { inputs, expected, allowed } = checkOf(id);
  closeTo(sectionImpedance(inputs.Z0_ohm!, inputs.ZL_ohm!), { value: expected.Zt_ohm!, ...allowed });
});

test.each(["D80", "D81"])("published quarter-wave section %s has the printed fractional bandwidth", (id) => {
  const { inputs, expected, allowed } = checkOf(id);
  const limit = inputs.gamma_max ?? (inputs.max_vswr! - 1) / (inputs.max_vswr! + 1);
  closeTo(quarterWaveBandwidth(inputs.Z0_ohm!, inputs.ZL_ohm!, limit), { value: expected.FBW!, ...allowed });
});

test("published D59: 600 Ω to 73 Ω through its section, a tenth below the design frequency, shows the recomputed VSWR", () => {
  const { inputs, expected, allowed } = checkOf("D59");
  const section = sectionImpedance(inputs.Z0_ohm!, inputs.ZL_ohm!);
  const seen = impedanceAlong(complex(inputs.ZL_ohm!), section, 0.25 * inputs.f_over_f0!);
  const size = abs(reflectionAgainst(seen, inputs.Z0_ohm!));
  const wanted = expected.Zin as unknown as Complex;
  closeTo([seen.re, seen.im], { value: [wanted.re, wanted.im], ...allowed });
  closeTo((1 + size) / (1 - size), { value: expected.vswr!, ...allowed });
});

test("published D74: a stub at the load and a quarter-wave section have the printed reactance and impedance", () => {
  const { inputs, expected, allowed } = checkOf("D74");
  const admittance = reciprocal(inputs.ZL as unknown as Complex);
  closeTo(1 / admittance.im, { value: expected.stub_X_ohm!, ...allowed });
  closeTo(sectionImpedance(inputs.Z0_ohm!, 1 / admittance.re), { value: expected.Zt_ohm!, ...allowed });
});

test("published D75: the extremes of voltage lie where recomputed, not where the print misread the chart", () => {
  const { inputs, expected, allowed } = checkOf("D75");
  const points = realPoints(inputs.ZL as unknown as Complex, inputs.Z0_ohm!);
  const maximum = points.find((each) => each.point === "voltageMaximum")!;
  const minimum = points.find((each) => each.point === "voltageMinimum")!;
  closeTo(maximum.distance, { value: expected.d_max_wavelengths!, ...allowed });
  closeTo(minimum.distance, { value: expected.d_min_wavelengths!, ...allowed });
  closeTo(minimum.resistanceOhm, { value: expected.R_at_min_ohm!, ...allowed });
  closeTo(sectionImpedance(inputs.Z0_ohm!, minimum.resistanceOhm), { value: expected.Zt_ohm!, ...allowed });
});

test("published D82: the section reflects equally at both of its ends", () => {
  const { inputs, expected, allowed } = checkOf("D82");
  const section = sectionImpedance(inputs.Z0_ohm!, inputs.ZL_ohm!);
  const steps = [
    reflectionAgainst(complex(section), inputs.Z0_ohm!),
    reflectionAgainst(complex(inputs.ZL_ohm!), section),
  ];
  for (const step of steps) closeTo(abs(step), { value: expected.gamma_at_each_step!, ...allowed });
});

test("published D83: a section of solid dielectric is a quarter of the shortened wavelength and of the printed bore", () => {
  const { inputs, expected, allowed } = checkOf("D83");
  const section = sectionImpedance(inputs.R1_ohm!, inputs.R2_ohm!);
  closeTo(section, { value: expected.Zt_ohm!, ...allowed });
  const root = Math.sqrt(inputs.er!);
  // The book takes 60·ln(b/a)/√εr and c = 3·10⁸ m/s.
  closeTo(inputs.b_cm! / Math.exp((section * root) / 60), { value: expected.a_cm!, ...allowed });
  closeTo((100 * 3e8) / (4 * inputs.f_Hz! * root), { value: expected.length_cm!, ...allowed });
});

test("quarterWaveBandwidth(target, resistance, limit) is the whole 2 where the reflection never exceeds the limit", () => {
  expect(quarterWaveBandwidth(50, 50, 0.1)).toBe(2);
  expect(quarterWaveBandwidth(50, 55, 0.1)).toBe(2);
});

test.each([0, 1, NaN, -0.2])("quarterWaveBandwidth refuses the limit %s", (limit) => {
  expect(() => quarterWaveBandwidth(50, 100, limit)).toThrow(RangeError);
});

test("a load equal to its line and a load that takes no power have no real points", () => {
  expect(realPoints(complex(50), 50)).toEqual([]);
  expect(realPoints(complex(0, 25), 50)).toEqual([]);
});
