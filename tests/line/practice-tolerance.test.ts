/** Everyday runs whose parts are not exactly what they are drawn as; where the figures come from stands in the fixture. */
import { expect, test } from "vitest";
import type { Circuit, Element } from "@/lib/line/element";
import type { Spread } from "@/lib/line/spread";
import { tolerance } from "@/lib/line/tolerance";
import fixture from "@/tests/fixtures/line/practice-tolerance.json";
import { ohm } from "@/tests/support/lossy-run";
import { seededModel } from "@/tests/support/seeded-cables";

const cable = (id: string, lengthM: number): Element => ({ kind: "cable", line: { model: seededModel(id) }, lengthM });
const within = (value: number, [printed, by]: number[]) =>
  expect(Math.abs(value - printed!), `${value}`).toBeLessThanOrEqual(by!);
const percent = (path: string, by: number): Spread => ({ path, limits: [-by, by] });

/** Ten thousand draws leave 0.02 dB of chance in a share, and more in the very least. */
const draws = 10_000;

test("the window that a mast feeder is read in at the bottom, with an aerial of VSWR 1.5 at any angle", () => {
  const { frequency_hz, return_loss_db, delivered_loss_db } = fixture.feeder;
  const joint: Element = { kind: "joint", lossDbAtOneGhz: 0.05 };
  const jumper = cable("c50-f10", 1.5);
  const circuit: Circuit = {
    source: ohm(50),
    elements: [joint, jumper, joint, cable("c50-f28", 48), joint, jumper, joint],
    load: ohm(75),
  };
  const spread: Spread[] = [
    ...[percent("elements.1.z0Percent", 3), percent("elements.3.z0Percent", 2), percent("elements.5.z0Percent", 3)],
    ...[1, 3, 5].map((n) => percent(`elements.${n}.lossPercent`, 5)),
    { path: "load.reflectionPhase", limits: [-Math.PI, Math.PI] },
  ];
  const found = tolerance({ circuit, frequencies: [frequency_hz], spread, draws, seed: 1 });
  within(found.returnLossDb.min[0]!, return_loss_db.min);
  within(found.returnLossDb.p05[0]!, return_loss_db.p05);
  within(found.returnLossDb.median[0]!, return_loss_db.median);
  within(found.transducerLossDb.p05[0]!, delivered_loss_db.p05);
  within(found.transducerLossDb.p95[0]!, delivered_loss_db.p95);
});

test("how deep a notch stays when velocity and cut are off", () => {
  const { frequency_hz, length_m, median_db, at_least_30_percent, at_least_25_percent } = fixture.notch;
  const stub: Element = {
    kind: "stub",
    connection: "shunt",
    end: "open",
    line: { model: seededModel("c50-f10") },
    lengthM: length_m,
  };
  const found = tolerance({
    ...{ circuit: { source: ohm(50), elements: [stub], load: ohm(50) }, frequencies: [frequency_hz], draws, seed: 1 },
    spread: [
      percent("elements.0.velocityFactorPercent", 1),
      { path: "elements.0.lengthM", limits: [length_m - 0.002, length_m + 0.002] },
    ],
    targets: [
      { quantity: "loss", atLeast: 30 },
      { quantity: "loss", atLeast: 25 },
    ],
  });
  within(found.transducerLossDb.median[0]!, median_db);
  within(found.targetPercents[0]!, at_least_30_percent);
  within(found.targetPercents[1]!, at_least_25_percent);
});
