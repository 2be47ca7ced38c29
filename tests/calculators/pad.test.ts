import { expect, test } from "vitest";
import { valuesOf, type Texts } from "@/lib/calculators/input";
import { pad, padInputs, type PadResult, type PadShape } from "@/lib/calculators/pad";
import { minimumPadLossDb } from "@/lib/line/pad";
import { checks } from "@/tests/support/line-checks";
import { agrees, number, published, type PublishedCheck } from "@/tests/support/published";
import { closeTo } from "@/tests/support/tolerance";
import * as reader from "@/lib/format/read-quantity";

const usual = { loss: "10", source: "50", load: "50", power: "1 W" };

function asked(typed: Texts): PadResult {
  const outcome = pad(valuesOf(padInputs, { ...usual, ...typed }, reader));
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.result;
}
const shape = (result: PadResult, topology: "T" | "pi"): PadShape =>
  result.shapes.find((s) => s.topology === topology)!;
const named = (topic: string) =>
  published((_id, each) => each === topic).map(
    (check) => [`${check.id}: ${check.source}`, check] as [string, PublishedCheck],
  );

test.each(named("minimum-loss pad"))("the least-loss pad agrees with print, typed to two decimals: %s", (_n, check) => {
  const [source, load] = [number(check.inputs, "R_high_ohm"), number(check.inputs, "R_low_ohm")];
  const leastDb = minimumPadLossDb(source, load);
  const result = asked({ loss: leastDb.toFixed(2), source: `${source}`, load: `${load}` });
  expect(result.isLeast).toBe(true);
  const [series, shunt, gone] = shape(result, "T").exact.resistors;
  expect(gone).toBe(0);
  agrees(check, { series_ohm: series, shunt_ohm: shunt, loss_dB: result.leastDb });
});

test.each([
  ...named("T pad").map(([name, check]) => [name, check, "T"] as const),
  ...named("pi pad").map(([name, check]) => [name, check, "pi"] as const),
])("a symmetrical pad agrees with print: %s", (_name, check, topology) => {
  const ohms = `${number(check.inputs, "R0_ohm")}`;
  const result = asked({ loss: `${number(check.inputs, "loss_dB")} dB`, source: ohms, load: ohms });
  const [outer, inner] = shape(result, topology).exact.resistors;
  agrees(check, topology === "T" ? { series_ohm: outer, shunt_ohm: inner } : { shunt_ohm: outer, series_ohm: inner });
});

interface PadCheck {
  form: "T" | "pi";
  loss_db: number;
  source_side_ohm: number;
  load_side_ohm: number;
}

test.each(
  checks<PadCheck>("matching-pads")
    .filter(({ name }) => name === "T pad" || name === "pi pad")
    .map((check, k) => [`${check.name} ${k + 1}`, check] as const),
)("%s agrees with the closed form", (_name, { inputs, expected }) => {
  const { loss_db: loss, source_side_ohm: source, load_side_ohm: load, form } = inputs;
  const result = asked({ loss: `${loss}`, source: `${source}`, load: `${load}` });
  closeTo(shape(result, form).exact.resistors, expected.resistors_from_source_ohm!, "resistors");
});

test("a loss below the least is refused at the loss, with the least, whichever side is higher", () => {
  for (const [source, load] of [
    ["75", "50"],
    ["50", "75"],
  ])
    expect(pad(valuesOf(padInputs, { ...usual, loss: "4", source: source!, load: load! }, reader))).toEqual({
      ok: false,
      faults: { loss: "At least 5.72\u00a0dB between these two resistances." },
    });
});

test("between equal resistances no loss is no resistor, and none is called the least", () => {
  const result = asked({ loss: "0" });
  expect(result).toMatchObject({ leastDb: 0, isLeast: false });
  expect(shape(result, "T").exact.resistors).toEqual([0, Infinity, 0]);
  expect(shape(result, "pi").standard.resistors).toEqual([Infinity, 0, Infinity]);
  expect(shape(result, "T").exact.loadW).toBe(1);
});

test("the power is that into the pad: T and pi warm their first resistor alike and pass on the same", () => {
  const { shapes } = asked({ loss: "10", power: "20 W" });
  expect(shapes[0].exact.powersW[0]).toBeCloseTo(shapes[1].exact.powersW[0], 10);
  for (const { exact } of shapes) expect(exact.loadW).toBeCloseTo(2, 10);
});

test("the E24 pad of 10 dB and 50 Ω is 27, 36 and 27 Ω, and says what it gives", () => {
  const { standard } = shape(asked({}), "T");
  expect(standard.resistors).toEqual([27, 36, 27]);
  expect(standard.figures.lossDb).toBeCloseTo(10.07, 2);
  expect(standard.figures.inputOhm).toBeCloseTo(51.53, 2);
});
