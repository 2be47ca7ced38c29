/** Random cables, terminations, elements and runs for property tests, all physical. */
import fc from "@/tests/support/property";
import type { Circuit, Conductor, Element, LineModel, Termination } from "@/lib/line/element";
import { minimumPadLossDb } from "@/lib/line/pad";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** Even over decades. */
const decades = (min: number, max: number) => between(Math.log10(min), Math.log10(max)).map((power) => 10 ** power);

const conductor: fc.Arbitrary<Conductor> = fc.record({
  form: fc.constantFrom("round", "sheet", "sqrt", "constant"),
  r0OhmPerM: fc.oneof(fc.constant(0), decades(1e-3, 1)),
  skinCornerRadPerS: decades(1e4, 1e7),
});

export const anyModel: fc.Arbitrary<LineModel> = fc
  .record({
    conductors: fc.array(conductor, { minLength: 1, maxLength: 2 }),
    z0: between(20, 200),
    velocityFactor: between(0.5, 1),
    lossTangent: fc.oneof(fc.constant(0), decades(1e-5, 0.05)),
    g0SPerM: fc.oneof(fc.constant(0), decades(1e-10, 1e-6)),
  })
  .map(({ conductors, z0, velocityFactor, lossTangent, g0SPerM }) => ({
    conductors,
    lInfHPerM: z0 / (3e8 * velocityFactor),
    cFPerM: 1 / (z0 * 3e8 * velocityFactor),
    lossTangent,
    g0SPerM,
  }));

export const anyFrequency = decades(1e3, 3e9);
const length = fc.oneof(fc.constant(0), decades(1e-3, 300));

/** Loads, tap nodes and stub ends, open and short among them. */
export const anyTermination: fc.Arbitrary<Termination> = fc.oneof(
  fc.record({ kind: fc.constant("constant" as const), reOhm: decades(0.1, 1e4), imOhm: between(-500, 500) }),
  fc.record({
    kind: fc.constant("network" as const),
    topology: fc.constantFrom("series" as const, "parallel" as const),
    rOhm: decades(1, 1e4),
    cF: decades(1e-12, 1e-8),
  }),
  fc.record({
    kind: fc.constant("network" as const),
    topology: fc.constantFrom("series" as const, "parallel" as const),
    rOhm: decades(1, 1e4),
    lH: decades(1e-9, 1e-4),
  }),
  fc.constant<Termination>({ kind: "open" }),
  fc.constant<Termination>({ kind: "short" }),
);

/** A load that takes power. */
export const anyLoad: fc.Arbitrary<Termination> = fc.record({
  kind: fc.constant("constant" as const),
  reOhm: decades(1, 1e3),
  imOhm: between(-300, 300),
});

const line = anyModel.map((model) => ({ model }));
const connection = fc.constantFrom("shunt" as const, "series" as const);

export const anyCable: fc.Arbitrary<Element> = fc.record({
  kind: fc.constant("cable" as const),
  line,
  lengthM: length,
  paralleled: fc.integer({ min: 1, max: 3 }),
});

const bundle: fc.Arbitrary<Element> = fc.record({
  kind: fc.constant("parallel" as const),
  branches: fc.array(fc.record({ line, lengthM: decades(0.1, 100) }), { minLength: 1, maxLength: 3 }),
});

const stub: fc.Arbitrary<Element> = fc.record({
  kind: fc.constant("stub" as const),
  connection,
  end: fc.oneof(fc.constantFrom("open" as const, "short" as const), anyTermination),
  line,
  lengthM: decades(1e-3, 10),
});

const part: fc.Arbitrary<Element> = fc
  .record({
    connection,
    value: fc.constantFrom("rOhm", "lH", "cF"),
    r: decades(0.1, 1e4),
    l: decades(1e-9, 1e-5),
    c: decades(1e-12, 1e-8),
    q: decades(5, 1e3),
    fixed: fc.boolean(),
  })
  .map(({ connection, value, r, l, c, q, fixed }) => {
    const loss = fixed ? { q, qAtHz: 1e7 } : { q };
    if (value === "rOhm") return { kind: "part", connection, rOhm: r };
    return value === "lH" ? { kind: "part", connection, lH: l, ...loss } : { kind: "part", connection, cF: c, ...loss };
  });

const pad: fc.Arbitrary<Element> = fc
  .record({
    inputOhm: between(25, 300),
    outputOhm: between(25, 300),
    more: between(0, 30),
    topology: fc.constantFrom("T" as const, "pi" as const),
  })
  .map(({ inputOhm, outputOhm, more, topology }) => ({
    kind: "pad",
    topology,
    inputOhm,
    outputOhm,
    lossDb: minimumPadLossDb(inputOhm, outputOhm) + more,
  }));

const joint: fc.Arbitrary<Element> = fc.record({
  kind: fc.constant("joint" as const),
  lossDb: between(0, 0.5),
  lossDbAtOneGhz: between(0, 0.5),
  referenceOhm: between(25, 150),
  shuntF: decades(1e-14, 1e-11),
});

const transformer: fc.Arbitrary<Element> = fc.record({
  kind: fc.constant("transformer" as const),
  turnsRatio: decades(0.1, 10),
});

/** Any element but a shunt termination, which may be a dead short. */
export const anyElement: fc.Arbitrary<Element> = fc.oneof(anyCable, bundle, stub, part, pad, joint, transformer);

export const anyRun: fc.Arbitrary<Circuit> = fc.record({
  source: fc.record({ kind: fc.constant("constant" as const), reOhm: decades(5, 500), imOhm: between(-100, 100) }),
  elements: fc.array(anyElement, { maxLength: 6 }),
  load: anyLoad,
});
