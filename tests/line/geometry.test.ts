import { describe, expect, test } from "vitest";
import { perMetre } from "@/lib/line/cable";
import { coaxGeometry, type Geometry, pairGeometry, type PairConstruction } from "@/lib/line/geometry";
import screened from "@/tests/fixtures/line/screened-pair.json";
import { checks } from "@/tests/support/line-checks";
import fc from "@/tests/support/property";
import { closeTo, type Expected } from "@/tests/support/tolerance";

interface Inputs {
  inner_diameter_m: number;
  outer_diameter_m: number;
  relative_permittivity: number;
  resistivity_inner_ohm_m: number;
  wire_diameter_m: number;
  centre_spacing_m: number;
  effective_permittivity: number;
  resistivity_ohm_m: number;
  lay_length_m: number | null;
  frequency_hz: number;
}

const cases = checks<Inputs>("geometry");

function geometryOf(name: string, inputs: Inputs): Geometry {
  if (name === "coax")
    return coaxGeometry({
      inner: inputs.inner_diameter_m,
      bore: inputs.outer_diameter_m,
      permittivity: inputs.relative_permittivity,
      resistivity: inputs.resistivity_inner_ohm_m,
    });
  return pairGeometry({
    wire: inputs.wire_diameter_m,
    spacing: inputs.centre_spacing_m,
    permittivity: inputs.effective_permittivity,
    resistivity: inputs.resistivity_ohm_m,
    lay: inputs.lay_length_m ?? undefined,
  });
}

describe("coaxGeometry and pairGeometry agree with the closed forms evaluated independently", () => {
  test("and all of them are there", () => expect(cases).toHaveLength(7));

  test.each(cases.map((each, i) => [`${each.name} ${i + 1}`, each] as const))("%s", (_, { name, inputs, expected }) => {
    const geometry = geometryOf(name, inputs);
    const got: Record<string, number | undefined> = {
      linf_h_per_m: geometry.inductance,
      c_f_per_m: geometry.capacitance,
      z0_ohm: geometry.z0,
      velocity_factor: geometry.velocityFactor,
      r_hf_ohm_per_m: geometry.highFrequencyResistance(inputs.frequency_hz),
      te11_cutoff_hz_approx: geometry.cutoff,
      r0_ohm_per_m: geometry.r0,
    };
    const { lay_factor, proximity_factor, ...rest } = expected;
    for (const [key, value] of Object.entries<Expected>(rest)) closeTo(got[key]!, value, key);
    if (!lay_factor || !proximity_factor) return;
    const straight = geometryOf(name, { ...inputs, lay_length_m: null });
    closeTo(geometry.inductance / straight.inductance, lay_factor, "lay factor");
    const apart = geometryOf(name, { ...inputs, lay_length_m: null, centre_spacing_m: 1e3 });
    const ratio = straight.highFrequencyResistance(1e6) / apart.highFrequencyResistance(1e6);
    closeTo(ratio, { ...proximity_factor, rel_tolerance: 1e-9 }, "proximity factor");
  });
});

test("a screened pair agrees with a field solution within the bounds its source line states", () => {
  for (const { spacing_over_wire: p, spacing_over_bore: q, x, resistance_factor } of screened.cases) {
    const wire = 0.5e-3;
    const spacing = p * wire;
    const bare = pairGeometry({ wire, spacing: 1e3, permittivity: 1 });
    const got = pairGeometry({ wire, spacing, permittivity: 1, screenBore: spacing / q });
    expect(Math.abs((got.inductance * Math.PI) / 4e-7 / Math.PI / x - 1)).toBeLessThan(p >= 2.5 ? 0.007 : 0.021);
    const factor = got.highFrequencyResistance(1e9) / bare.highFrequencyResistance(1e9);
    if (p >= 1.8 && q <= 0.4) expect(Math.abs(factor / resistance_factor - 1)).toBeLessThan(0.018);
  }
});

test("a screen far away leaves the pair alone: within 0.45 % from spacing over diameter of 1.8", () => {
  for (const ratio of [1.8, 2, 3, 10]) {
    const pair: PairConstruction = { wire: 1e-3, spacing: ratio * 1e-3, permittivity: 2 };
    const [bare, far] = [pairGeometry(pair), pairGeometry({ ...pair, screenBore: 100 })];
    expect(Math.abs(far.z0 / bare.z0 - 1)).toBeLessThan(0.0045);
    expect(Math.abs(far.highFrequencyResistance(1e8) / bare.highFrequencyResistance(1e8) - 1)).toBeLessThan(0.025);
  }
});

const size = (min: number, max: number) => fc.double({ min, max, noNaN: true });

test("the model's resistance tends to the closed form far above the skin corners, factors included", () => {
  const factor = size(1, 2);
  fc.assert(
    fc.property(
      size(1e-4, 5e-3),
      size(1.3, 8),
      factor,
      factor,
      size(1e-5, 1e-3),
      (inner, ratio, strand, braid, wall) => {
        const construction = { inner, bore: inner * ratio, permittivity: 2.1, shieldWall: wall };
        const coax = coaxGeometry({ ...construction, strandFactor: strand, braidFactor: braid });
        const pair = pairGeometry({ wire: inner, spacing: inner * ratio, permittivity: 2, lay: 40 * inner });
        for (const { model, highFrequencyResistance } of [coax, pair]) {
          const f = 1e16;
          const { re } = perMetre(model, { re: 0, im: 2 * Math.PI * f }).z;
          expect(Math.abs(re / highFrequencyResistance(f) - 1)).toBeLessThan(1e-3);
        }
        // dc resistance does not know of stranding and braiding
        expect(coax.r0).toBeCloseTo(coaxGeometry(construction).r0, 12);
      },
    ),
  );
});

test("impedance, permittivity and velocity keep their law: Z0·C·v = 1, and VF = 1/√εr without lay", () => {
  fc.assert(
    fc.property(size(1e-4, 5e-3), size(1.6, 8), size(1, 5), (inner, ratio, permittivity) => {
      const spacing = inner * ratio;
      const all = [
        coaxGeometry({ inner, bore: spacing, permittivity }),
        pairGeometry({ wire: inner, spacing, permittivity }),
        pairGeometry({ wire: inner, spacing, permittivity, screenBore: 3 * spacing }),
      ];
      for (const { z0, capacitance, velocityFactor } of all) {
        expect(z0 * capacitance * velocityFactor * 299_792_458).toBeCloseTo(1, 12);
        expect(velocityFactor * Math.sqrt(permittivity)).toBeCloseTo(1, 12);
      }
    }),
  );
});

test("lay lengthens the wires: it divides the velocity factor and leaves the impedance", () => {
  const pair: PairConstruction = { wire: 0.5e-3, spacing: 0.9e-3, permittivity: 1.9 };
  const [straight, laid] = [pairGeometry(pair), pairGeometry({ ...pair, lay: 0.012 })];
  const factor = Math.hypot(1, (Math.PI * 0.9) / 12);
  expect(laid.z0).toBeCloseTo(straight.z0, 10);
  expect(straight.velocityFactor / laid.velocityFactor).toBeCloseTo(factor, 12);
  expect(laid.r0 / straight.r0).toBeCloseTo(factor, 12);
});

test("what was taken and what is told poorly is said", () => {
  const coax = { inner: 1e-3, bore: 3.5e-3, permittivity: 2.3 };
  expect(coaxGeometry(coax).notes).toEqual(["shieldWallTaken"]);
  expect(coaxGeometry({ ...coax, shieldWall: 1e-4 }).notes).toEqual([]);
  const pair = { wire: 1e-3, spacing: 2e-3, permittivity: 2 };
  expect(pairGeometry(pair).notes).toEqual([]);
  expect(pairGeometry({ ...pair, spacing: 1.4e-3 }).notes).toEqual(["proximityPoor"]);
  expect(pairGeometry({ ...pair, screenBore: 6e-3 }).notes).toEqual(["screenLossInWires"]);
  expect(pairGeometry({ ...pair, screenBore: 3.5e-3 }).notes).toEqual(["screenLossInWires", "screenFormulaRough"]);
});

test.each([
  [{ inner: 0 }, /inner must be positive, got 0/],
  [{ bore: 0.5e-3 }, /boreM must be above 0.001/],
  [{ permittivity: 0.9 }, /permittivity must be at least 1/],
  [{ lossTangent: -1 }, /lossTangent must be at least 0/],
  [{ strandFactor: NaN }, /strandFactor must be positive/],
  [{ shieldWall: 0 }, /wall must be positive/],
  [{ resistivity: Infinity }, /resistivity must be positive/],
])("coaxGeometry refuses %o", (off, message) => {
  const construction = { inner: 1e-3, bore: 3e-3, permittivity: 2, ...off };
  expect(() => coaxGeometry(construction)).toThrow(RangeError);
  expect(() => coaxGeometry(construction)).toThrow(message);
});

test.each([
  [{ wire: -1 }, /wire must be positive/],
  [{ spacing: 1e-3 }, /spacing must be above 0.001/],
  [{ permittivity: 0 }, /permittivity must be at least 1/],
  [{ lay: 0 }, /lay must be positive/],
  [{ screenBore: 2.9e-3 }, /screenBore must be above 0.003/],
])("pairGeometry refuses %o", (off, message) => {
  const construction = { wire: 1e-3, spacing: 2e-3, permittivity: 2, ...off };
  expect(() => pairGeometry(construction)).toThrow(RangeError);
  expect(() => pairGeometry(construction)).toThrow(message);
});
