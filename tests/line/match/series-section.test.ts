import { expect, test } from "vitest";
import fc from "fast-check";
import { abs, complex } from "@/lib/line/complex";
import { impedanceAlong, reflectionAgainst } from "@/lib/line/match/line-angle";
import { seriesSection } from "@/lib/line/match/series-section";
import fixture from "@/tests/fixtures/line/matching-sections.json";
import { closeTo, type Expected } from "@/tests/support/tolerance";

const cases = fixture.cases.filter((each) => each.name === "series section");

test.each(cases.map((each) => ({ ...each.inputs, inputs: each.inputs, expected: each.expected })))(
  "a section of $section_z0_ohm Ω in $z0_ohm Ω for $load_re_ohm, $load_im_ohm Ω has both known solutions, or none",
  ({ inputs, expected }) => {
    const found = seriesSection({
      load: complex(inputs.load_re_ohm, inputs.load_im_ohm),
      lineOhm: inputs.z0_ohm,
      targetOhm: inputs.z0_ohm,
      sectionOhm: inputs.section_z0_ohm!,
    });
    if (!expected.solvable) {
      expect(found).toEqual([]);
      return;
    }
    closeTo(
      found.map((each) => each.distance),
      expected.main_line_length_from_load_wavelengths as Expected,
      "distance",
    );
    closeTo(
      found.map((each) => each.length),
      expected.section_length_wavelengths as Expected,
      "section",
    );
  },
);

test("every series-section solution, for any load and any three impedances, shows the target when computed forward", () => {
  const tenths = (min: number, max: number) => fc.integer({ min: 10 * min, max: 10 * max }).map((each) => each / 10);
  const ohms = tenths(10, 600);
  const reactance = tenths(-500, 500);
  let solved = 0;
  fc.assert(
    fc.property(ohms, reactance, ohms, ohms, ohms, (re, im, lineOhm, sectionOhm, targetOhm) => {
      const load = complex(re, im);
      for (const { distance, length } of seriesSection({ load, lineOhm, sectionOhm, targetOhm })) {
        const seen = impedanceAlong(impedanceAlong(load, lineOhm, distance), sectionOhm, length);
        expect(abs(reflectionAgainst(seen, targetOhm))).toBeLessThan(1e-6);
        solved += 1;
      }
    }),
    { numRuns: 300 },
  );
  expect(solved).toBeGreaterThan(20);
});

test("a section equal to its line matches nothing", () => {
  expect(seriesSection({ load: complex(22, -35), lineOhm: 50, sectionOhm: 50, targetOhm: 50 })).toEqual([]);
});
