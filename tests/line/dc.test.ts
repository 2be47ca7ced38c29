import { describe, expect, test } from "vitest";
import { directCurrent } from "@/lib/line/dc";
import type { Circuit, Element, LineModel, Termination } from "@/lib/line/element";
import { sweep } from "@/lib/line/run";
import fixture from "@/tests/fixtures/line/practice-dc.json";
import { anyRun } from "@/tests/support/arbitrary-run";
import { ohm } from "@/tests/support/lossy-run";
import fc from "@/tests/support/property";
import { seededModel } from "@/tests/support/seeded-cables";

const wire = (r0OhmPerM: number, g0SPerM = 0): LineModel => ({
  conductors: [{ form: "constant", r0OhmPerM }],
  lInfHPerM: 5e-7,
  cFPerM: 5e-11,
  g0SPerM,
});
const laid = (model: LineModel, lengthM: number, paralleled = 1): Element => ({
  kind: "cable",
  line: { model },
  lengthM,
  paralleled,
});
const cable = (id: string, lengthM: number) => laid(seededModel(id), lengthM);
const node = (rOhm: number): Element => ({
  kind: "shunt",
  termination: { kind: "network", topology: "parallel", rOhm, cF: 15e-12 },
});
const bus = (elements: Element[], source: Termination = ohm(120), load: Termination = ohm(120)): Circuit => ({
  source,
  elements,
  load,
});
const readings = (circuit: Circuit) => directCurrent(circuit).points.map(({ ohmMeterReadsOhm }) => ohmMeterReadsOhm);
const digits = (value: number, printed: number, unit: number) =>
  expect(Math.abs(value - printed)).toBeLessThanOrEqual(0.51 * unit);

describe("what a meter reads", () => {
  const { meter } = fixture;

  test("a bus of two terminators reads both, the far one behind the loop; three, one and a long one likewise", () => {
    const trunk = cable(meter.cable, meter.length_m);
    digits(directCurrent(bus([trunk])).loopResistanceOhm, meter.loop_ohm, 0.01);
    for (const reading of readings(bus([trunk]))) digits(reading, meter.both_ohm, 0.1);
    digits(readings(bus([{ kind: "shunt", termination: ohm(120) }, trunk]))[0]!, meter.third_at_near_end_ohm, 0.1);
    readings(bus([trunk], ohm(120), { kind: "open" })).forEach((reading, n) =>
      digits(reading, meter.one_missing_ohm[n]!, 0.1),
    );
    const long = directCurrent(bus([cable(meter.long.cable, meter.long.length_m)]));
    digits(long.loopResistanceOhm, meter.long.loop_ohm, 0.1);
    digits(long.points[0]!.ohmMeterReadsOhm, meter.long.reads_ohm, 0.1);
  });

  test("a short bus reads 60 with two terminators, 40 with three, 120 with one", () => {
    const third: Element = { kind: "shunt", termination: ohm(120) };
    expect(readings(bus([]))[0]).toBeCloseTo(60, 12);
    expect(readings(bus([third]))[1]).toBeCloseTo(40, 12);
    expect(readings(bus([], ohm(120), { kind: "open" }))[0]).toBeCloseTo(120, 12);
  });

  test("a short reads what lies before it, an open end nothing, a series capacitor parts the run", () => {
    const trunk = laid(wire(0.1), 100);
    expect(readings(bus([trunk], ohm(120), { kind: "short" }))).toEqual([expect.closeTo((120 * 10) / 130, 10), 0]);
    const unloaded: Termination = { kind: "network", topology: "series", cF: 1e-9 };
    expect(readings(bus([trunk], unloaded, { kind: "open" }))).toEqual([Infinity, Infinity]);
    const parted = readings(bus([{ kind: "part", connection: "series", cF: 1e-9 }], ohm(75), ohm(93)));
    expect(parted).toEqual([75, expect.closeTo(93, 9)]);
  });

  test("run turned about, the readings turn about too", () => {
    fc.assert(
      fc.property(anyRun, (circuit) => {
        const turned: Circuit = {
          source: circuit.load,
          elements: [...circuit.elements].reverse().map((element): Element => {
            if (element.kind === "transformer") return { ...element, turnsRatio: 1 / element.turnsRatio };
            return element.kind === "pad"
              ? { ...element, inputOhm: element.outputOhm, outputOhm: element.inputOhm }
              : element;
          }),
          load: circuit.source,
        };
        const [ahead, back] = [directCurrent(circuit), directCurrent(turned)];
        const ends = ({ points }: typeof ahead) =>
          [points[0]!, points.at(-1)!].map(({ ohmMeterReadsOhm }) => ohmMeterReadsOhm);
        ends(ahead).forEach((reading, n) => {
          const other = ends(back)[1 - n]!;
          expect(reading === other || Math.abs(reading - other) <= 1e-9 * other).toBe(true);
        });
        expect(ahead.loopResistanceOhm).toBeCloseTo(back.loopResistanceOhm, 9);
      }),
    );
  });

  test("a joint counts nothing, a pad what its resistors give, a coil the resistance of its Q", () => {
    const joint: Element = { kind: "joint", lossDb: 3, lossDbAtOneGhz: 1, shuntF: 1e-12 };
    const pad: Element = { kind: "pad", lossDb: 3, inputOhm: 50, outputOhm: 50 };
    const coil: Element = { kind: "part", connection: "series", lH: 1e-6, q: 100, qAtHz: 1e7 };
    expect(readings(bus([joint], ohm(50), ohm(50)))).toEqual([
      expect.closeTo(25, 12),
      expect.closeTo(25, 12),
      expect.closeTo(25, 12),
    ]);
    expect(readings(bus([pad], ohm(50), ohm(50)))[0]).toBeCloseTo(25, 12);
    expect(readings(bus([coil], { kind: "network", topology: "series", cF: 1 }, ohm(50)))[0]).toBeCloseTo(
      50 + (2 * Math.PI * 1e7 * 1e-6) / 100,
      12,
    );
  });

  test("lines side by side share, whatever their resistance, none among them", () => {
    const branches = [
      { line: { model: wire(0.2) }, lengthM: 50 },
      { line: { model: wire(0.1) }, lengthM: 50 },
    ];
    const shared = directCurrent(bus([{ kind: "parallel", branches }]));
    expect(shared.loopResistanceOhm).toBeCloseTo(10 / 3, 12);
    expect(shared.points[0]!.ohmMeterReadsOhm).toBeCloseTo((120 * (120 + 10 / 3)) / (240 + 10 / 3), 10);
    const bare = directCurrent(
      bus([{ kind: "parallel", branches: [...branches, { line: { model: wire(0) }, lengthM: 50 }] }]),
    );
    expect([bare.loopResistanceOhm, bare.points[0]!.ohmMeterReadsOhm]).toEqual([0, 60]);
  });
});

describe("loop resistance", () => {
  const { resistivity_ohm_mm2_per_m: rho, by_area_mm2, by_diameter_mm } = fixture.loop_ohm_per_km;
  const loopOf = (areaMm2: number) => directCurrent(bus([laid(wire((2 * rho) / areaMm2), 1000)])).loopResistanceOhm;

  test.each(by_area_mm2)("of a pair of %s mm² is %s Ω/km", (area, loop) =>
    digits(loopOf(area!), loop!, loop! < 40 ? 0.1 : 1),
  );
  test.each(by_diameter_mm)("of a pair of %s mm wires is %s Ω/km", (d, loop) =>
    digits(loopOf((Math.PI / 4) * d! ** 2), loop!, 1),
  );
});

describe("idle bias", () => {
  const { bias } = fixture;
  const terminator: Element = { kind: "shunt", termination: ohm(120) };
  const spaced = (count: number, first: number): Element[] =>
    Array.from({ length: count }, (_, n) => [
      ...(n === 0 && first === 0 ? [] : [cable(bias.cable, n === 0 ? first : 20)]),
      node(bias.node_ohm),
    ]).flat();
  const millivolts = (circuit: Circuit) =>
    directCurrent(circuit, { supplyV: bias.supply_v }).points.map(({ voltageV }) => 1000 * voltageV);

  test("a short bus has the level of the divider", () => {
    const short = Array.from({ length: bias.nodes }, () => node(bias.node_ohm));
    const levels = millivolts(bus([terminator, ...short], ohm(2 * bias.without_trunk.resistor_ohm)));
    for (const level of levels) digits(level, bias.without_trunk.level_mv, 1);
  });

  test.each(bias.at_one_end)(
    "fitted at one end with $resistor_ohm Ω it is $there_mv mV there and $far_mv mV at the far end",
    (row) => {
      const levels = millivolts(bus([terminator, ...spaced(bias.nodes, 0)], ohm(2 * row.resistor_ohm)));
      digits(levels[0]!, row.there_mv, 1);
      digits(levels.at(-1)!, row.far_mv, 1);
      for (let n = 1; n < levels.length; n++) expect(levels[n]).toBeLessThan(levels[n - 1]! + 1e-9);
    },
  );

  test("fitted in the middle both ends have what one half fed by half the current has", () => {
    const half = millivolts(bus(spaced(bias.nodes / 2, 10), ohm(4 * bias.in_the_middle.resistor_ohm)));
    digits(half[0]!, bias.in_the_middle.there_mv, 1);
    digits(half.at(-1)!, bias.in_the_middle.ends_mv, 1);
  });
});

describe("supplies", () => {
  test.each(fixture.drops.rows)("$what", (row) => {
    const model =
      row.cable === undefined
        ? wire((2 * fixture.loop_ohm_per_km.resistivity_ohm_mm2_per_m) / row.area_mm2!)
        : seededModel(row.cable);
    const run = bus([laid(model, row.length_m, row.paralleled)], { kind: "short" }, { kind: "open" });
    const dc = directCurrent(run, { supplyV: row.supply_v, loadCurrentA: row.load_a, temperatureC: row.temperature_c });
    const unit = (value: number) => 10 ** -(String(value).split(".")[1]?.length ?? 0);
    const level = dc.points.at(-1)!.voltageV;
    if (row.loop_ohm !== undefined) digits(dc.loopResistanceOhm, row.loop_ohm, unit(row.loop_ohm));
    if (row.drop_v !== undefined) digits(row.supply_v - level, row.drop_v, unit(row.drop_v));
    if (row.level_v !== undefined) digits(level, row.level_v, unit(row.level_v));
  });

  test.each(fixture.drops.driven)("$driver_v V at the driver leave $far_v V at the far end of $length_m m", (row) => {
    const dc = directCurrent(bus([cable(row.cable, row.length_m)], { kind: "short" }), { supplyV: row.driver_v });
    expect(Math.abs(dc.points.at(-1)!.voltageV - row.far_v)).toBeLessThan(row.tolerance_v);
  });

  test("without a supply levels and powers are not known; resistances are", () => {
    const dc = directCurrent(bus([laid(wire(0.1), 10)]));
    for (const { voltageV, dissipatedW, ohmMeterReadsOhm } of dc.points) {
      expect([voltageV, dissipatedW]).toEqual([NaN, NaN]);
      expect(ohmMeterReadsOhm).toBeGreaterThan(0);
    }
  });

  test("what the supply gives is what all the parts take", () => {
    fc.assert(
      fc.property(anyRun, fc.double({ min: 0, max: 0.1, noNaN: true }), (circuit, loadCurrentA) => {
        const dc = directCurrent(circuit, { supplyV: 12, loadCurrentA });
        const taken =
          dc.elementDissipatedW.reduce((sum, each) => sum + each, 0) +
          dc.points[0]!.dissipatedW +
          dc.points.at(-1)!.dissipatedW;
        expect(Math.abs(12 * dc.supplyCurrentA - taken)).toBeLessThan(1e-7 * (1 + Math.abs(taken)));
      }),
    );
  });

  test("the level is the limit of a sweep toward direct current", () => {
    const run = bus(
      [
        laid(wire(0.1, 1e-6), 200),
        node(5000),
        { kind: "pad", lossDb: 6, inputOhm: 75, outputOhm: 50 },
        laid(wire(0.05), 100, 2),
      ],
      ohm(60),
      ohm(90),
    );
    const { loadVoltage } = sweep(run, [1e-3]);
    expect(directCurrent(run, { supplyV: 1 }).points.at(-1)!.voltageV).toBeCloseTo(loadVoltage.re[0]!, 9);
  });

  test("a long spur's node has its own level, a spur that carries nothing that of the trunk", () => {
    const spur = (end: Termination): Element => ({
      kind: "stub",
      connection: "shunt",
      end,
      line: { model: wire(0.044) },
      lengthM: 90,
    });
    const tap = (end: Termination) => directCurrent(bus([spur(end)], ohm(10), ohm(1000)), { supplyV: 24 }).points[1]!;
    const loaded = tap(ohm(500));
    expect(loaded.nodeVoltageV).toBeCloseTo((loaded.voltageV * 500) / (500 + 0.044 * 90), 12);
    expect(loaded.dissipatedW).toBeCloseTo(loaded.voltageV ** 2 / (500 + 0.044 * 90), 12);
    expect(tap({ kind: "open" }).nodeVoltageV).toBeCloseTo(tap({ kind: "open" }).voltageV, 12);
  });
});

test("a measured end says nothing about direct current, and an impossible part is refused", () => {
  const sampled: Termination = {
    kind: "sampled",
    referenceOhm: 50,
    frequenciesHz: [1e6],
    reflection: { re: [0], im: [0] },
  };
  expect(() => directCurrent(bus([], ohm(50), sampled))).toThrow(RangeError);
  expect(() => directCurrent(bus([laid(wire(0.1), -1)]))).toThrow(/length must be at least 0/);
});
