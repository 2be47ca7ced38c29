import { expect, test } from "vitest";
import fc from "fast-check";
import { abs, add, complex, reciprocal, type Complex } from "@/lib/line/complex";
import { reflectionAgainst } from "@/lib/line/match/line-angle";
import { lSections, seriesPart, shuntPart, type LSolution, type PartValue } from "@/lib/line/match/l-section";
import fixture from "@/tests/fixtures/line/matching-l-section.json";
import published from "@/tests/fixtures/line/published-matching.json";
import { closeTo, type Expected } from "@/tests/support/tolerance";

const solutions = fixture.cases.filter((each) => each.name === "L-section");
const counts = fixture.cases.filter((each) => each.name === "number of L-section solutions");
type Parts = { connection: string; part: string; value_f?: Expected; value_h?: Expected }[];

/** The solution's parts from the load on, as the check file lists them. */
function partsFromLoad(found: LSolution, frequency: number): { connection: string; part: PartValue }[] {
  const shunt = { connection: "shunt", part: shuntPart(found.shuntSusceptanceS, frequency) };
  const series = { connection: "series", part: seriesPart(found.seriesReactanceOhm, frequency) };
  return found.topology === "shuntAtLoad" ? [shunt, series] : [series, shunt];
}

test.each(solutions.map((each) => ({ ...each.inputs, inputs: each.inputs, expected: each.expected })))(
  "the L-section for $load_re_ohm, $load_im_ohm Ω, $topology, susceptance sign $sign_of_shunt_susceptance, has the known parts",
  ({ inputs, expected }) => {
    const topology = inputs.topology === "shunt_at_load" ? "shuntAtLoad" : "seriesAtLoad";
    const susceptance = expected.shunt_susceptance_s as Expected;
    const all = lSections(complex(inputs.load_re_ohm, inputs.load_im_ohm), inputs.z0_ohm);
    const found = all.find(
      (each) =>
        each.topology === topology &&
        Math.sign(each.shuntSusceptanceS) === inputs.sign_of_shunt_susceptance &&
        Math.abs(each.shuntSusceptanceS / (susceptance.value as number) - 1) < 1e-3,
    )!;
    closeTo(found.shuntSusceptanceS, susceptance, "susceptance");
    closeTo(found.seriesReactanceOhm, expected.series_reactance_ohm as Expected, "reactance");
    const parts = partsFromLoad(found, inputs.frequency_hz!);
    (expected.parts_from_load as Parts).forEach((wanted, index) => {
      const { connection, part } = parts[index]!;
      expect(connection).toBe(wanted.connection);
      expect(part.part).toBe(wanted.part === "C" ? "capacitor" : "coil");
      closeTo(part.part === "coil" ? part.lH : part.cF, (wanted.value_h ?? wanted.value_f)!, wanted.part);
    });
  },
);

test.each(
  counts.map((each) => ({ ...each.inputs, inputs: each.inputs, expected: each.expected.solutions as Expected })),
)("a load of $load_re_ohm, $load_im_ohm Ω on $z0_ohm Ω has the known number of L-sections", ({ inputs, expected }) => {
  closeTo(lSections(complex(inputs.load_re_ohm, inputs.load_im_ohm), inputs.z0_ohm).length, expected);
});

interface PublishedL {
  load: Complex;
  target: number;
  frequency: number;
  wanted: Record<string, number>[];
}
/** Each published network as its parts: Cs, Ls in series, Cp, Lp across. */
function publishedOf(id: string): PublishedL & { rel: number } {
  const check = published.checks.find((each) => each.id.startsWith(id))!;
  const inputs = check.inputs as unknown as Record<string, number>;
  const expected = check.expected as unknown as Record<string, Record<string, number>>;
  const rel = check.tolerance.rel!;
  const base = { rel, frequency: inputs.f_Hz!, target: inputs.Z0_ohm ?? inputs.R_low_ohm! };
  if (id === "D92") {
    const [one, two] = [expected.sol1!, expected.sol2!];
    const wanted: Record<string, number>[] = [
      { Cp_pF: one.C_pF!, Ls_nH: one.L_nH! },
      { Lp_nH: two.L_nH!, Cs_pF: two.C_pF! },
    ];
    return { ...base, load: inputs.ZL as unknown as Complex, wanted };
  }
  const load = (inputs.ZL ??
    (inputs.YL_S && reciprocal(inputs.YL_S as unknown as Complex)) ??
    complex(inputs.R_high_ohm!)) as Complex;
  return { ...base, load, wanted: [expected.a!, expected.b!] };
}

test.each(["D92", "D93", "D94", "D95"])(
  "published L-section %s: both printed networks are among the solutions",
  (id) => {
    const { load, target, frequency, wanted, rel } = publishedOf(id);
    const found = lSections(load, target).map((each) => {
      const values: Record<string, number> = {};
      const shunt = shuntPart(each.shuntSusceptanceS, frequency);
      const series = seriesPart(each.seriesReactanceOhm, frequency);
      if (shunt.part === "coil") values.Lp_nH = shunt.lH * 1e9;
      else values.Cp_pF = shunt.cF * 1e12;
      if (series.part === "coil") values.Ls_nH = series.lH * 1e9;
      else values.Cs_pF = series.cF * 1e12;
      return values;
    });
    for (const parts of wanted) {
      const agrees = found.some((each) =>
        Object.entries(parts).every(([key, value]) => Math.abs(each[key]! / value - 1) <= rel),
      );
      expect(agrees, `${id}: ${JSON.stringify(parts)} among ${JSON.stringify(found)}`).toBe(true);
    }
  },
);

test("published D93: the series and shunt reactances of 600 to 50 Ω and their Q are the printed ones", () => {
  const check = published.checks.find((each) => each.id.startsWith("D93"))!;
  const expected = check.expected as unknown as Record<string, number>;
  const tolerance = { rel_tolerance: check.tolerance.rel!, abs_tolerance: 0 };
  for (const each of lSections(complex(600), 50)) {
    closeTo(Math.abs(each.seriesReactanceOhm), { value: expected.Xs_ohm!, ...tolerance });
    closeTo(Math.abs(1 / each.shuntSusceptanceS), { value: expected.Xp_ohm!, ...tolerance });
    closeTo(Math.abs(each.seriesReactanceOhm) / 50, { value: expected.Q!, ...tolerance });
  }
});

function forward(load: Complex, found: LSolution): Complex {
  const series = complex(0, found.seriesReactanceOhm);
  const shunt = complex(0, found.shuntSusceptanceS);
  if (found.topology === "seriesAtLoad") return reciprocal(add(reciprocal(add(load, series)), shunt));
  return add(reciprocal(add(reciprocal(load), shunt)), series);
}

test("every L-section of any load that takes power shows the target when computed forward, and there are two to four", () => {
  const tenths = (min: number, max: number) => fc.integer({ min: 10 * min, max: 10 * max }).map((each) => each / 10);
  const resistance = tenths(1, 1000);
  const reactance = tenths(-1000, 1000);
  fc.assert(
    fc.property(resistance, reactance, tenths(1, 1000), (re, im, target) => {
      const load = complex(re, im);
      fc.pre(abs(reflectionAgainst(load, target)) > 1e-3);
      const found = lSections(load, target);
      expect([1, 2, 3, 4]).toContain(found.length);
      for (const each of found) expect(abs(reflectionAgainst(forward(load, each), target))).toBeLessThan(1e-6);
    }),
  );
});

test("a load that only lacks a reactance or a susceptance needs one part, listed once", () => {
  const series = lSections(complex(50, -30), 50);
  expect(series.filter((each) => each.shuntSusceptanceS === 0)).toEqual([
    { topology: expect.any(String), shuntSusceptanceS: 0, seriesReactanceOhm: expect.closeTo(30, 9) },
  ]);
  const shunt = lSections(reciprocal(complex(1 / 50, 0.01)), 50);
  expect(shunt.filter((each) => each.seriesReactanceOhm === 0)).toEqual([
    { topology: expect.any(String), shuntSusceptanceS: expect.closeTo(-0.01, 12), seriesReactanceOhm: 0 },
  ]);
});

test("a load equal to the target, a pure reactance, a short and a load of no number have no L-section", () => {
  for (const load of [complex(50), complex(0, 20), complex(0), complex(NaN, 3)])
    expect(lSections(load, 50)).toEqual([]);
});
