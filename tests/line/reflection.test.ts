import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { abs, complex, type Complex } from "@/lib/line/complex";
import {
  impedanceOfReflection,
  magnitudeOfReturnLoss,
  magnitudeOfVswr,
  magnitudeThroughLine,
  mismatchedLineLossDb,
  mismatchLossDb,
  portReflection,
  reflection,
  reflectionMagnitude,
  returnLossDb,
  vswr,
} from "@/lib/line/reflection";
import { checks } from "@/tests/support/line-checks";
import { closeTo, type Expected } from "@/tests/support/tolerance";

interface Inputs {
  reflection_magnitude: number[];
  vswr: number[];
  return_loss_db: number[];
  load_reflection_magnitude: number;
  matched_loss_db: number[];
  z0_ohm: number;
  load_re_ohm: number;
  load_im_ohm: number;
  source_re_ohm: number;
  source_im_ohm: number;
}

function ofMagnitudes(magnitudes: number[]): Record<string, number[]> {
  return {
    reflection_magnitude: magnitudes,
    vswr: magnitudes.map(vswr),
    return_loss_db: magnitudes.map(returnLossDb),
    mismatch_loss_db: magnitudes.map(mismatchLossDb),
    reflected_power_percent: magnitudes.map((magnitude) => 100 * magnitude ** 2),
  };
}

function throughLine({ load_reflection_magnitude: far, matched_loss_db: losses }: Inputs): Record<string, number[]> {
  const near = losses.map((loss) => magnitudeThroughLine(far, loss));
  const total = losses.map((loss) => mismatchedLineLossDb(far, loss));
  return {
    input_reflection_magnitude: near,
    input_vswr: near.map(vswr),
    input_return_loss_db: near.map(returnLossDb),
    total_loss_db: total,
    extra_loss_from_standing_waves_db: total.map((loss, k) => loss - losses[k]!),
  };
}

function ofLoad(load: Complex, source: Complex): Record<string, number> {
  const gamma = reflection(load, source);
  const powerRatio = (4 * source.re * load.re) / ((source.re + load.re) ** 2 + (source.im + load.im) ** 2);
  return {
    reflection_re: gamma.re,
    reflection_im: gamma.im,
    vswr: vswr(abs(gamma)),
    return_loss_db: returnLossDb(abs(gamma)),
    mismatch_loss_db: mismatchLossDb(abs(gamma)),
    mismatch_loss_from_power_db: -10 * Math.log10(powerRatio),
  };
}

function computed(name: string, inputs: Inputs): Record<string, number | number[]> {
  if (name === "from reflection magnitude") return ofMagnitudes(inputs.reflection_magnitude);
  if (name === "from vswr") return ofMagnitudes(inputs.vswr.map(magnitudeOfVswr));
  if (name === "from return loss") return ofMagnitudes(inputs.return_loss_db.map(magnitudeOfReturnLoss));
  if (name.startsWith("mismatched load through")) return throughLine(inputs);
  const load = complex(inputs.load_re_ohm, inputs.load_im_ohm);
  return ofLoad(
    load,
    name === "load on line" ? complex(inputs.z0_ohm) : complex(inputs.source_re_ohm, inputs.source_im_ohm),
  );
}

const numbered = checks<Inputs>("reflection-identities").map((check, k) => ({
  ...check,
  label: `${k + 1}, ${check.name}`,
}));

test.each(numbered)(
  "reflection, VSWR, return loss and mismatch loss agree with the closed forms: $label",
  ({ name, inputs, expected }) => {
    const got = computed(name, inputs);
    for (const [key, value] of Object.entries(expected)) {
      // the file holds a loss of exactly nothing; power and reflection round differently there
      const allowed: Expected =
        value.value === 0 ? { ...value, abs_tolerance: Math.max(value.abs_tolerance, 1e-15) } : value;
      closeTo(got[key]!, allowed, key);
    }
  },
);

const ohm = fc.double({ min: -3, max: 4, noNaN: true }).map((decade) => 10 ** decade);
const reactance = fc.double({ min: -1e4, max: 1e4, noNaN: true });

test("a load with resistance never reflects more than all, and a lossless one exactly all", () => {
  fc.assert(
    fc.property(ohm, reactance, ohm, reactance, (r, x, sourceR, sourceX) => {
      expect(reflectionMagnitude(complex(r, x), complex(sourceR, sourceX))).toBeLessThanOrEqual(1 + 1e-12);
      expect(reflectionMagnitude(complex(0, x), complex(sourceR, sourceX))).toBeCloseTo(1, 12);
    }),
  );
});

test("an impedance comes back from its reflection", () => {
  fc.assert(
    fc.property(ohm, reactance, (r, x) => {
      const back = impedanceOfReflection(reflection(complex(r, x), complex(50)), 50);
      // near total reflection 1 − Γ keeps few digits: the error grows with |Z|²
      const allowed = 1e-14 * (50 + (r * r + x * x) / 50 + Math.hypot(r, x));
      expect(Math.hypot(back.re - r, back.im - x)).toBeLessThanOrEqual(allowed);
    }),
  );
});

test("VSWR and return loss are inverses of their magnitudes", () => {
  for (const magnitude of [0.001, 0.1, 0.5, 0.999]) {
    expect(magnitudeOfVswr(vswr(magnitude))).toBeCloseTo(magnitude, 12);
    expect(magnitudeOfReturnLoss(returnLossDb(magnitude))).toBeCloseTo(magnitude, 12);
  }
  expect(magnitudeOfVswr(Infinity)).toBe(1);
  expect(magnitudeOfReturnLoss(Infinity)).toBe(0);
});

test("an open, a short and a match have their limits, without NaN", () => {
  expect(reflection({ re: Infinity, im: NaN }, complex(50))).toEqual({ re: 1, im: 0 });
  expect(portReflection(complex(1), complex(0), complex(50, 10))).toEqual({ re: 1, im: 0 });
  expect(portReflection(complex(0), complex(1), complex(50)).re).toBe(-1);
  expect(returnLossDb(0)).toBe(Infinity);
  expect(returnLossDb(1)).toBe(0);
  expect(vswr(0)).toBe(1);
  expect(vswr(1)).toBe(Infinity);
  expect(mismatchLossDb(1)).toBe(Infinity);
  expect(mismatchLossDb(0)).toBe(0);
  expect(impedanceOfReflection(complex(1), 50).re).toBe(Infinity);
});

test("what reflection cannot be asked is refused by name", () => {
  expect(() => reflection(complex(50), complex(0, 10))).toThrow(
    "reflection: source resistance must be positive, got 0",
  );
  expect(() => impedanceOfReflection(complex(0), -50)).toThrow(
    "impedanceOfReflection: referenceOhm must be positive, got -50",
  );
  expect(() => magnitudeOfVswr(0.9)).toThrow("magnitudeOfVswr: ratio must be at least 1, got 0.9");
  expect(() => magnitudeOfReturnLoss(-1)).toThrow("magnitudeOfReturnLoss: lossDb must be at least 0, got -1");
});
