import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { newRunAddress, typedLineAddress } from "@/lib/calculators/start";
import { newRunSchema } from "@/lib/runs/schema";
import { readRunStart, runFormSchema, startedRun, type RunFormTexts } from "@/lib/runs/start";

const filled: RunFormTexts = {
  ...{ name: "Buoy link", site: "Pier 3", cableId: "c50-f10", length: "118 ft", frequency: "27.2 MHz" },
  ...{ temperature: "45 °C", power: "200 W", source: "50", load: "22-35j", hasPiece: true },
};
const parametersOf = (address: string) => Object.fromEntries(new URL(address, "http://x").searchParams);
const made = (texts: Partial<RunFormTexts>, start = readRunStart({})) =>
  newRunSchema.parse(startedRun(runFormSchema.parse({ ...filled, ...texts }), start));

test("the form makes the run it says", () => {
  const run = made({});
  expect(run).toMatchObject({ temperatureC: 45, designHz: 27.2e6, availablePowerW: 200 });
  expect(run.bandHz![0] / 26.928e6).toBeCloseTo(1, 12);
  expect(run.circuit).toEqual({
    source: { kind: "constant", reOhm: 50, imOhm: 0 },
    elements: [{ kind: "cable", line: { cableId: "c50-f10" }, lengthM: 35.9664 }],
    load: { kind: "constant", reOhm: 22, imOhm: -35 },
  });
});

test("a calculator's address brings the cable and the texts as they were typed", () => {
  const address = newRunAddress(
    { cable: "c50-f10", z0: "93" },
    { length: "118 ft", frequency: "27.2 MHz", load: "22-35j" },
  );
  expect(readRunStart(parametersOf(address))).toEqual({
    cableId: "c50-f10",
    texts: { length: "118 ft", frequency: "27.2 MHz", load: "22-35j" },
    line: null,
    piece: null,
  });
});

test("a typed cable goes into the run as a model of its own", () => {
  const start = readRunStart(parametersOf(`/runs/new?${typedLineAddress({ z0: 75, velocityFactor: 0.83 })}`));
  expect(start.line?.words).toBe("75\u00a0Ω, velocity factor 0.83");
  const [cable] = made({ cableId: "typed" }, start).circuit.elements;
  expect(cable).toMatchObject({ kind: "cable", line: { model: { conductors: [{ form: "constant", r0OhmPerM: 0 }] } } });
  // choosing a cable of the catalogue after all leaves the typed one out
  expect(made({}, start).circuit.elements[0]).toMatchObject({ line: { cableId: "c50-f10" } });
});

test("a pad goes before the cable between the two ends' resistances, a stub behind it, unless unticked", () => {
  const pad = readRunStart({ pad: "10 dB" });
  const ends = { source: "75", load: "50" };
  expect(made(ends, pad).circuit.elements).toMatchObject([
    { kind: "pad", lossDb: 10, inputOhm: 75, outputOhm: 50 },
    { kind: "cable" },
  ]);
  const stub = readRunStart({ stub: "0.654 m", stubEnd: "short" });
  expect(made({}, stub).circuit.elements).toMatchObject([
    { kind: "cable" },
    { kind: "stub", connection: "shunt", end: "short", lengthM: 0.654, line: { cableId: "c50-f10" } },
  ]);
  expect(made({ hasPiece: false }, stub).circuit.elements).toHaveLength(1);
});

test("an address mangled in any way opens the form", () => {
  const junk = fc.oneof(
    fc.string(),
    fc.array(fc.string(), { maxLength: 2 }),
    fc.constantFrom("typed", "-1", "1e999 m"),
  );
  const names = ["cable", "z0", "vf", "r0", "corner", "tan", "length", "load", "pad", "stub", "stubEnd"];
  const parameters = fc.record(Object.fromEntries(names.map((name) => [name, junk])), { requiredKeys: [] });
  fc.assert(
    fc.property(parameters, (given) => {
      expect(() => readRunStart(given)).not.toThrow();
    }),
  );
  expect(readRunStart({ cable: "typed", z0: "none" })).toMatchObject({ cableId: undefined, line: null });
});
