/** Everyday runs of the demo catalogue, by sweep alone; where the figures come from stands in the fixture. */
import { expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Element, LineModel } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { sweep } from "@/lib/line/run";
import fixture from "@/tests/fixtures/line/practice-runs.json";
import { seededCable, seededModel } from "@/tests/support/seeded-cables";
import { closeTo } from "@/tests/support/tolerance";

const between = (ohm: number, elements: Element[]): Circuit => {
  const end = { kind: "constant", reOhm: ohm, imOhm: 0 } as const;
  return { source: end, elements, load: end };
};
const lossAt = (circuit: Circuit, frequency: number) => sweep(circuit, [frequency]).transducerLossDb[0]!;
const returnLossAt = (circuit: Circuit, frequency: number) => sweep(circuit, [frequency]).returnLossDb[0]!;
/** Half a unit of the last digit. */
const toDigit = (value: number, unit: number) => ({ value, rel_tolerance: 0, abs_tolerance: 0.51 * unit });
const even = (from: number, to: number, points: number) =>
  Array.from({ length: points }, (_, k) => from + ((to - from) * k) / (points - 1));

const { notch, channel, tie_line: tie } = fixture;

/** Length of a quarter wave by the cable's own phase, metre. */
function quarterWave(cable: string): number {
  return Math.PI / 2 / lineFigures(seededModel(cable), [notch.reject_hz]).phaseRadPerM[0]!;
}

const stub = (cable: string, end: "open" | "short", lengthM: number): Element => ({
  kind: "stub",
  connection: "shunt",
  end,
  line: { model: seededModel(cable) },
  lengthM,
});

test.each(notch.stubs)("a notch stub of $cable has its length, depth, width and loss in the wanted channel", (row) => {
  const length = quarterWave(row.cable);
  if (row.length_m !== undefined) closeTo(length, toDigit(row.length_m, 1e-3), "length");
  const trap = between(50, [stub(row.cable, "open", length)]);
  const depth = lossAt(trap, notch.reject_hz);
  closeTo(depth, toDigit(row.depth_db, 0.1), "depth");
  expect(depth).toBeGreaterThan(notch.wanted_depth_db);
  closeTo(lossAt(trap, notch.pass_hz), toDigit(row.pass_loss_db, 0.01), "loss in the wanted channel");
  const frequencies = even(90e6, 105e6, 15_001);
  const { transducerLossDb } = sweep(trap, frequencies);
  const inside = frequencies.filter((_, k) => transducerLossDb[k]! >= 20);
  closeTo((inside.at(-1)! - inside[0]!) / 1e6, toDigit(row.width_20db_mhz, 0.1), "width at 20 dB");
});

test.each(notch.stubs)("the depth of a notch stub of $cable is that of its resistance at resonance", ({ cable }) => {
  const { zcOhm, attenuationDbPerM } = lineFigures(seededModel(cable), [notch.reject_hz]);
  const length = quarterWave(cable);
  const resistance = zcOhm.re[0]! * Math.tanh((attenuationDbPerM[0]! / 8.685889638) * length);
  const depth = lossAt(between(50, [stub(cable, "open", length)]), notch.reject_hz);
  expect(depth).toBeCloseTo(20 * Math.log10((resistance + 25) / resistance), 2);
});

test("a second, shorted stub at the same tee gives the wanted channel back and leaves the notch as it is", () => {
  const { cable, short_length_m, pass_loss_db, pass_return_loss_db } = notch.compensation;
  const trap = stub(cable, "open", quarterWave(cable));
  const both = between(50, [trap, stub(cable, "short", short_length_m)]);
  closeTo(lossAt(both, notch.pass_hz), toDigit(pass_loss_db, 0.001), "loss in the wanted channel");
  closeTo(returnLossAt(both, notch.pass_hz), toDigit(pass_return_loss_db, 1), "return loss in the wanted channel");
  expect(lossAt(both, notch.reject_hz)).toBeCloseTo(lossAt(between(50, [trap]), notch.reject_hz), 2);
});

test.each(notch.velocity_off)("a velocity factor $percent % off moves the notch of $cable one for one", (row) => {
  const length = quarterWave(row.cable);
  for (const factor of [1 + row.percent / 100, 1 - row.percent / 100]) {
    const off = between(50, [stub(row.cable, "open", length * factor)]);
    closeTo(lossAt(off, notch.reject_hz), { value: row.depth_left_db, rel_tolerance: 0, abs_tolerance: 0.1 }, "left");
    const around = even(94e6, 101e6, 7001);
    const { transducerLossDb } = sweep(off, around);
    const deepest = around[transducerLossDb.indexOf(Math.max(...transducerLossDb))]!;
    closeTo(
      Math.abs(deepest - notch.reject_hz) / 1e6,
      { value: row.moves_mhz, rel_tolerance: 0.03, abs_tolerance: 0 },
      "moved",
    );
  }
});

/** The model with its high-frequency loss times a factor. */
function lossier(model: LineModel, factor: number): LineModel {
  return {
    ...model,
    conductors: model.conductors.map((each) => ({ ...each, skinCornerRadPerS: each.skinCornerRadPerS! / factor ** 2 })),
    lossTangent: model.lossTangent! * factor,
  };
}

type ChannelRow = (typeof channel.rows)[number];

function channelOf({ slope, void_c, cords_c }: ChannelRow): Circuit {
  const lossSlopes = channel.slopes.map(({ from_c, to_c, per_k }) => ({ fromC: from_c, toC: to_c, perK: per_k }));
  const model: LineModel = { ...seededModel(channel.cable), ...(slope === "declared" && { lossSlopes }) };
  const joint: Element = { kind: "joint", lossDbAtOneGhz: channel.joint_db_at_one_mhz * Math.sqrt(1000) };
  const cord: Element = {
    kind: "cable",
    line: { model: lossier(model, channel.cord_loss_factor) },
    lengthM: 5,
    temperatureC: cords_c,
  };
  const link: Element = { kind: "cable", line: { model }, lengthM: 90, temperatureC: void_c };
  return between(100, [joint, cord, joint, link, joint, cord, joint]);
}

test.each(channel.rows)(
  "the data channel with its link at $void_c °C, cords at $cords_c °C, slope of $slope",
  (row) => {
    for (const [mhz, loss] of Object.entries(row.loss_db)) {
      const got = lossAt(channelOf(row), Number(mhz) * 1e6);
      closeTo(got, { value: loss, rel_tolerance: 0, abs_tolerance: row.tolerance_db ?? 0.051 }, `${mhz} MHz`);
      expect(got > channel.limit_db[mhz as "100" | "250"]).toBe(Boolean(row.fails));
    }
  },
);

test("the pair's delay and its loop resistance, cold and warm, are those of the channel's sheet", () => {
  const model = seededModel(channel.cable);
  const { phaseVelocityMPerS } = lineFigures(model, [100e6]);
  closeTo(1e11 / phaseVelocityMPerS[0]!, toDigit(channel.delay_ns_per_100m, 1), "delay");
  for (const [temperature, ohm] of Object.entries(channel.loop_ohm_per_100m))
    closeTo(100 * lineFigures(model, [1], Number(temperature)).rOhmPerM[0]!, toDigit(ohm, 0.1), `${temperature} °C`);
});

const mated: Element = { kind: "joint", lossDbAtOneGhz: 0.05, referenceOhm: 75 };
const tieLine = (main: string, firstCord: Element) =>
  between(75, [mated, firstCord, mated, mated, seededCable(main, 64), mated, mated, seededCable("c75-f5", 2), mated]);
const properCord = seededCable("c75-f5", 2);
const { wrong_cord: wrong } = tie;
const wrongCord = seededCable(wrong.cable, wrong.length_m);

test.each(tie.loss)("the tie line with $main loses $loss_db dB at $frequency_hz Hz", (row) => {
  const got = lossAt(tieLine(row.main, properCord), row.frequency_hz);
  closeTo(got, toDigit(row.loss_db, 0.1), "loss");
  if (row.limit_db !== undefined) expect(got > row.limit_db).toBe(Boolean(row.fails));
});

test("a 50 Ω cord looks fine at one spot and fails at another: only the sweep to the clock shows it", () => {
  const run = tieLine("c75-f7", wrongCord);
  closeTo(returnLossAt(run, wrong.spot_hz), toDigit(wrong.spot_return_loss_db, 0.1), "at the spot");
  const frequencies = even(5e6, 1485e6, 14_801);
  const { returnLossDb } = sweep(run, frequencies);
  const worst = Math.min(...returnLossDb);
  closeTo(returnLossAt(run, wrong.worst_mhz * 1e6), toDigit(wrong.worst_return_loss_db, 0.1), "at the worst");
  closeTo(worst, toDigit(wrong.worst_return_loss_db, 0.1), "the least to the clock");
  expect(Math.abs(frequencies[returnLossDb.indexOf(worst)]! / 1e6 - wrong.worst_mhz)).toBeLessThan(3);
  expect(worst).toBeLessThan(tie.limit_return_loss_db);
  const proper = sweep(tieLine("c75-f7", properCord), frequencies);
  expect(Math.min(...proper.returnLossDb)).toBeGreaterThan(tie.limit_return_loss_db);
});

test("the same cord at the far end hides behind the line: the near end passes it at every frequency above 70 MHz", () => {
  const cords = between(75, [
    mated,
    properCord,
    mated,
    mated,
    seededCable("c75-f7", 64),
    mated,
    mated,
    wrongCord,
    mated,
  ]);
  const { returnLossDb } = sweep(cords, even(70e6, 1485e6, 5001));
  expect(Math.min(...returnLossDb)).toBeGreaterThan(tie.limit_return_loss_db);
});

test.each(tie.barrel)("a 50 Ω barrel of $length_m m returns $return_loss_db dB at $frequency_hz Hz", (row) => {
  const line = { model: modelFromNominal({ z0: 50, velocityFactor: 0.7 }) };
  const run = between(75, [{ kind: "cable", line, lengthM: row.length_m }]);
  const expected = { value: row.return_loss_db, rel_tolerance: 0, abs_tolerance: row.tolerance_db ?? 0.051 };
  closeTo(returnLossAt(run, row.frequency_hz), expected, "return loss");
});
