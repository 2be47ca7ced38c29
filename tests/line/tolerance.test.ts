import { describe, expect, test } from "vitest";
import { nominalFigures } from "@/lib/line/cable";
import type { Circuit, Element, LineModel } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { withValues } from "@/lib/line/moved-circuit";
import { sweep } from "@/lib/line/run";
import { distributions } from "@/lib/line/distribution";
import { startTolerance, tolerance, type ToleranceRequest } from "@/lib/line/tolerance";
import { putCorner, type Spread } from "@/lib/line/spread";
import { anyRun } from "@/tests/support/arbitrary-run";
import { bothForms, modelOf, type CheckCable } from "@/tests/support/line-checks";
import { cable, ohm, run } from "@/tests/support/lossy-run";
import fc from "@/tests/support/property";
import { closeTo } from "@/tests/support/tolerance";

interface CornerInputs {
  cable: CheckCable;
  length_m: number;
  source: { re_ohm: number };
  load: { re_ohm: number; im_ohm: number };
  tolerances: Partial<
    Record<
      | "z0_relative"
      | "velocity_factor_relative"
      | "length_relative"
      | "r0_relative"
      | "load_re_relative"
      | "tan_delta_relative",
      number
    >
  >;
  frequency_hz: number[];
}

/**
 * The check scales resistance and skin corner together, which is a change of resistivity: 1 + a·(T − 20) of the
 * element's temperature is that, with no other effect.
 */
function spreadOf({ cable: given, length_m, load, tolerances: t }: CornerInputs): Spread[] {
  const around = (path: string, value: number, share: number | undefined): Spread[] =>
    share === undefined ? [] : [{ path, limits: [value * (1 - share), value * (1 + share)] }];
  const percent = (path: string, share: number | undefined): Spread[] =>
    share === undefined ? [] : [{ path: `elements.0.${path}`, limits: [-100 * share, 100 * share] }];
  const warm = (t.r0_relative ?? 0) / given.temp_coeff_per_k;
  return [
    ...percent("z0Percent", t.z0_relative),
    ...percent("velocityFactorPercent", t.velocity_factor_relative),
    ...around("elements.0.lengthM", length_m, t.length_relative),
    ...(t.r0_relative === undefined
      ? []
      : [{ path: "elements.0.temperatureC", limits: [20 - warm, 20 + warm] as const }]),
    ...around("load.reOhm", load.re_ohm, t.load_re_relative),
    ...around("elements.0.line.model.lossTangent", given.tan_delta, t.tan_delta_relative),
  ];
}

function cornerRequest(inputs: CornerInputs): ToleranceRequest {
  const circuit: Circuit = {
    source: ohm(inputs.source.re_ohm),
    elements: [{ kind: "cable", line: { model: modelOf(inputs.cable) }, lengthM: inputs.length_m }],
    load: ohm(inputs.load.re_ohm, inputs.load.im_ohm),
  };
  return { circuit, frequencies: inputs.frequency_hz, spread: spreadOf(inputs), draws: 500, seed: 1, corners: true };
}

describe.each(bothForms<CornerInputs>("tolerance-corners"))("$name", ({ inputs, expected }) => {
  const request = cornerRequest(inputs);

  test("the cable as drawn is the nominal one of the check", () => {
    const element = request.circuit.elements[0]!;
    const { z0, velocityFactor } = nominalFigures(
      element.kind === "cable" ? element.line.model : modelOf(inputs.cable),
    );
    expect(z0 / Math.round(z0)).toBeCloseTo(1, 9);
    expect(velocityFactor * 100).toBeCloseTo(Math.round(velocityFactor * 100), 7);
    const nominal = sweep(request.circuit, request.frequencies);
    closeTo(nominal.returnLossDb, expected.return_loss_db_nominal!, "return loss");
    closeTo(nominal.transducerLossDb, expected.transducer_loss_db_nominal!, "transducer loss");
  });

  test("the extremes over all corners are those of the check", () => {
    const { corners } = tolerance(request);
    closeTo(corners!.returnLossDb.min, expected.return_loss_db_minimum!, "least return loss");
    closeTo(corners!.returnLossDb.max, expected.return_loss_db_maximum!, "greatest return loss");
    closeTo(corners!.transducerLossDb.min, expected.transducer_loss_db_minimum!, "least loss");
    closeTo(corners!.transducerLossDb.max, expected.transducer_loss_db_maximum!, "greatest loss");
  });

  test("every other figure of the check is that of the corners, each swept as a run of its own", () => {
    const { circuit, frequencies: at, spread } = request;
    const [low, high] = [new Map<string, number[]>(), new Map<string, number[]>()];
    const note = (name: string, values: ArrayLike<number>) => {
      const extreme = (map: typeof low, pick: typeof Math.min) =>
        map.set(
          name,
          Array.from(values, (value, k) => pick(value, map.get(name)?.[k] ?? value)),
        );
      extreme(low, Math.min);
      extreme(high, Math.max);
    };
    const corner = new Float64Array(spread.length);
    for (let n = 0; n < 2 ** spread.length; n++) {
      putCorner(spread, n, corner);
      const made = withValues(circuit, Object.fromEntries(spread.map(({ path }, k) => [path, corner[k]!])));
      const swept = sweep(made, at);
      const element = made.elements[0] as { lengthM: number; temperatureC?: number; line: { model: LineModel } };
      const { phaseRadPerM } = lineFigures(element.line.model, at, element.temperatureC ?? 20);
      note("vswr", swept.vswr);
      note("matched_loss_db", swept.matchedLossDb);
      note("zin_re_ohm", swept.inputImpedance.re);
      note(
        "one_way_delay_s",
        at.map((f, k) => (phaseRadPerM[k]! * element.lengthM) / (2 * Math.PI * f)),
      );
    }
    for (const [name, values] of low) closeTo(values, expected[`${name}_minimum`]!, `least ${name}`);
    for (const [name, values] of high) closeTo(values, expected[`${name}_maximum`]!, `greatest ${name}`);
    expect(Object.keys(expected)).toHaveLength(2 * (low.size + 3));
  });

  test("no draw loses more or less than the corners", () => {
    const { corners, transducerLossDb } = tolerance(request);
    transducerLossDb.min.forEach((least, k) => expect(least).toBeGreaterThan(corners!.transducerLossDb.min[k]!));
    transducerLossDb.max.forEach((most, k) => expect(most).toBeLessThan(corners!.transducerLossDb.max[k]!));
  });
});

const three: Element[] = [cable(1.5), cable(20), cable(3)];
const frequencies = [3.6e6, 2.9e7, 1.45e8];
const length = (index: number, by: number): Spread => ({
  path: `elements.${index}.lengthM`,
  limits: [lengthOf(index) - by, lengthOf(index) + by],
});
const lengthOf = (index: number) => (three[index] as { lengthM: number }).lengthM;
const percent = (index: number, what: string, by: number): Spread => ({
  path: `elements.${index}.${what}Percent`,
  limits: [-by, by],
});
const asked: ToleranceRequest = {
  circuit: run(three),
  frequencies,
  spread: [length(0, 0.01), percent(1, "z0", 4), percent(1, "loss", 5), percent(2, "velocityFactor", 2)],
  draws: 400,
  seed: 20260301,
};

test("the same seed gives the same result, however the work is cut up; another seed another", () => {
  const whole = tolerance(asked);
  const inPieces = startTolerance(asked);
  while (inPieces.advance(7)) expect(inPieces.done()).toBeLessThan(inPieces.total);
  expect(inPieces.result()).toEqual(whole);
  expect(tolerance({ ...asked, seed: 2 }).returnLossDb).not.toEqual(whole.returnLossDb);
});

test("asking for the result before all is done is an error", () => {
  const started = startTolerance(asked);
  started.advance(3);
  expect(() => started.result()).toThrow(/before all was done/);
});

test("a path that is spread beside others leaves their draws as they were", () => {
  const alone = tolerance({ ...asked, spread: asked.spread.slice(0, 2) });
  const still: Spread = { path: "elements.2.z0Percent", limits: [0, 0] };
  const beside = tolerance({ ...asked, spread: [...asked.spread.slice(0, 2), still] });
  // the cable that stands still is worked through by its waves in one, by its matrix in the other
  for (const share of ["min", "p05", "median", "p95", "max"] as const)
    beside.transducerLossDb[share].forEach((value, k) =>
      expect(value).toBeCloseTo(alone.transducerLossDb[share][k]!, 12),
    );
});

test("without spread every share is the nominal sweep", () => {
  fc.assert(
    fc.property(anyRun, (circuit) => {
      const { returnLossDb, transducerLossDb } = tolerance({ circuit, frequencies, spread: [], draws: 3, seed: 1 });
      const nominal = sweep(circuit, frequencies);
      for (const share of ["min", "p05", "median", "p95", "max"] as const)
        nominal.transducerLossDb.forEach((value, k) =>
          expect(transducerLossDb[share][k] === value || Math.abs(transducerLossDb[share][k]! - value) < 1e-6).toBe(
            true,
          ),
        );
      nominal.returnLossDb.forEach((value, k) => {
        // deeper reflections are rounding of both forms
        if (value < 120) expect(returnLossDb.median[k]).toBeCloseTo(value, 6);
      });
    }),
  );
});

test.each(distributions)(
  "wider limits never shrink the range of a loss that rises with its cause: %s",
  (distribution) => {
    let last = 0;
    for (const by of [0, 1, 2, 5, 10]) {
      const spread = [{ ...percent(1, "loss", by), distribution }];
      const { transducerLossDb } = tolerance({ ...asked, spread });
      const range = transducerLossDb.max[2]! - transducerLossDb.min[2]!;
      expect(range).toBeGreaterThanOrEqual(last);
      last = range;
    }
    expect(last).toBeGreaterThan(0.1);
  },
);

test("shares are in order, and a load of one magnitude and any angle turns around the same circle", () => {
  const spread: Spread[] = [
    { path: "load.reflectionMagnitude", limits: [0.2, 0.2] },
    { path: "load.reflectionPhase", limits: [-Math.PI, Math.PI] },
  ];
  const { returnLossDb: shares } = tolerance({ ...asked, circuit: run([]), spread });
  for (const share of [shares.min, shares.p05, shares.median, shares.p95, shares.max])
    share.forEach((value) => expect(value).toBeCloseTo(-20 * Math.log10(0.2), 9));
  const { returnLossDb } = tolerance({ ...asked, spread });
  for (let k = 0; k < 3; k++) {
    const order = [returnLossDb.min, returnLossDb.p05, returnLossDb.median, returnLossDb.p95, returnLossDb.max].map(
      (share) => share[k]!,
    );
    expect(order).toEqual([...order].sort((a, b) => a - b));
  }
});

test("a phase alone turns the load as drawn; its magnitude stays", () => {
  const circuit = { ...run([]), load: ohm(75) };
  const spread: Spread[] = [{ path: "load.reflectionPhase", limits: [-3, 3] }];
  const { returnLossDb } = tolerance({ ...asked, circuit, spread });
  expect(returnLossDb.min[0]).toBeCloseTo(-20 * Math.log10(0.2), 9);
  expect(returnLossDb.max[0]).toBeCloseTo(-20 * Math.log10(0.2), 9);
});

test("the yield is the share of draws inside the limit: half, where the limit is the median", () => {
  const { transducerLossDb } = tolerance(asked);
  const one = { ...asked, frequencies: [1.45e8] };
  const limit = transducerLossDb.median[2]!;
  expect(tolerance({ ...one, targets: [{ quantity: "loss", atMost: limit }] }).yieldPercent).toBe(50);
  expect(
    tolerance({ ...one, targets: [{ quantity: "loss", atMost: transducerLossDb.max[2]! + 1e-12 }] }).yieldPercent,
  ).toBe(100);
  expect(
    tolerance({ ...one, targets: [{ quantity: "loss", atMost: transducerLossDb.min[2]! - 1e-12 }] }).yieldPercent,
  ).toBe(0);
  expect(tolerance(asked).yieldPercent).toBeNaN();
});

test("a VSWR and the return loss that it is are kept by the same draws, and so is one of the slow way at the load", () => {
  const lossDb = tolerance(asked).returnLossDb.p05[2]!;
  const magnitude = 10 ** (-lossDb / 20);
  const both = tolerance({
    ...asked,
    targets: [
      { quantity: "returnLoss", bandHz: [1.45e8, 1.45e8], atLeast: lossDb },
      { quantity: "vswr", bandHz: [1.45e8, 1.45e8], atMost: ((1 + magnitude) / (1 - magnitude)) * (1 + 1e-12) },
      { quantity: "returnLoss", plane: { beforeElement: 0 }, bandHz: [1.45e8, 1.45e8], atLeast: lossDb - 1e-9 },
      { quantity: "dcDrop", atMost: 1e-3 },
    ],
    supplyV: 5,
  });
  expect(both.targetPercents).toEqual([95, 95, 95, 0]);
  expect(both.yieldPercent).toBe(0);
});

test("what contributes most stands first; what contributes nothing has an effect of 0", () => {
  const spread = [length(1, 0), percent(1, "loss", 2), percent(1, "loss", 20)].map((each, n) => ({
    ...each,
    path: n === 2 ? "elements.2.lossPercent" : each.path,
  }));
  const { contributors } = tolerance({ ...asked, spread: [...spread, percent(0, "z0", 20)] });
  expect(contributors.map(({ path }) => path)[0]).toBe("elements.0.z0Percent");
  expect(contributors.at(-1)).toMatchObject({ path: "elements.1.lengthM", effectDb: 0 });
  const effects = contributors.map(({ effectDb }) => effectDb);
  expect(effects).toEqual([...effects].sort((a, b) => b - a));
});

test("the effect of a matched cable's loss is what its loss changes by", () => {
  const circuit = { ...run([cable(20)]), load: ohm(50) };
  const spread: Spread[] = [percent(0, "loss", 5)];
  const { contributors } = tolerance({ ...asked, circuit, frequencies: [1.45e8], spread });
  const at = (lossPercent: number) =>
    tolerance({
      ...asked,
      circuit,
      frequencies: [1.45e8],
      spread: [{ path: "elements.0.lossPercent", limits: [lossPercent, lossPercent] }],
    }).transducerLossDb.min[0]!;
  expect(contributors[0]!.transducerLossEffectDb).toBeCloseTo(at(5) - at(-5), 9);
  // far above the corner all loss scales by F, but for the steady rest that a round conductor keeps
  expect(at(5) / at(0)).toBeCloseTo(1.05, 2);
});

test.each<[string, Partial<ToleranceRequest>, RegExp]>([
  [
    "a path that is no figure",
    { spread: [{ path: "elements.0.kind", limits: [0, 1] }] },
    /elements.0.kind is not a figure/,
  ],
  [
    "an element there is not",
    { spread: [{ path: "elements.7.lengthM", limits: [0, 1] }] },
    /elements.7.lengthM is no place/,
  ],
  ["a share of something without a value", { spread: [percent(0, "value", 5)] }, /only a part/],
  ["a share nobody knows", { spread: [percent(0, "colour", 5)] }, /no deviation/],
  ["a path named twice", { spread: [length(0, 1), length(0, 1)] }, /named twice/],
  ["a length below 0", { spread: [{ path: "elements.0.lengthM", limits: [-1, 1] }] }, /must be at least 0/],
  ["limits the wrong way round", { spread: [{ path: "elements.0.lengthM", limits: [2, 1] }] }, /not in order/],
  ["an impedance of nothing", { spread: [percent(0, "z0", 100)] }, /more than -100/],
  ["a reflection of more than all", { spread: [{ path: "load.reflectionMagnitude", limits: [0, 1.1] }] }, /at most 1/],
  [
    "a load moved in two ways",
    {
      spread: [
        { path: "load.reflectionPhase", limits: [0, 1] },
        { path: "load.reOhm", limits: [1, 2] },
      ],
    },
    /not by both/,
  ],
  ["no draw", { draws: 0 }, /draws must be/],
  ["a seed of 1.5", { seed: 1.5 }, /seed must be/],
  [
    "corners of 13 paths",
    { corners: true, spread: Array.from({ length: 13 }, (_, n) => ({ path: `p${n}`, limits: [0, 1] as const })) },
    /at most 12 paths/,
  ],
  ["a target of which nothing is known", { targets: [{ quantity: "skew", atMost: 1 }] }, /skew cannot be worked out/],
  [
    "a number in parallel",
    {
      circuit: run([{ ...three[0]!, paralleled: 2 } as Element]),
      spread: [{ path: "elements.0.paralleled", limits: [1, 2] }],
    },
    /whole number/,
  ],
])("refuses %s", (_, change, message) => {
  expect(() => tolerance({ ...asked, ...change })).toThrow(RangeError);
  expect(() => tolerance({ ...asked, ...change })).toThrow(message);
});

test("a load that changes with frequency is moved by both magnitude and phase or not at all", () => {
  const circuit = run([], { kind: "network", topology: "series", rOhm: 50, cF: 1e-10 });
  const phase: Spread = { path: "load.reflectionPhase", limits: [0, 1] };
  expect(() => tolerance({ ...asked, circuit, spread: [phase] })).toThrow(
    /both reflectionMagnitude and reflectionPhase/,
  );
  const magnitude: Spread = { path: "load.reflectionMagnitude", limits: [0.1, 0.1] };
  expect(tolerance({ ...asked, circuit, spread: [phase, magnitude] }).returnLossDb.min[0]).toBeCloseTo(20, 9);
});
