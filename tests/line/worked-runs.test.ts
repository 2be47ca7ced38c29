import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import type { Circuit, Element, LineModel, Termination } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { sweep } from "@/lib/line/run";
import { closeTo } from "@/tests/support/tolerance";

interface Cable {
  C_pF_per_m: number;
  Linf_nH_per_m: number;
  R0_ohm_per_km: number;
  skin_corner_kHz: number;
  tan_delta: number;
  check_loss_dB_per_100m: Record<string, number>;
}

interface WorkedRuns {
  cables: Record<string, Cable>;
  feeder: {
    frequency_hz: number;
    rows: {
      main: string;
      jumper: string;
      matched_loss_db_20c: number;
      matched_loss_db_45c: number;
      return_loss_db: Record<"75" | "100" | "open", number>;
    }[];
  };
  mismatch: {
    frequency_hz: number;
    length_m: number;
    load: { re_ohm: number; im_ohm: number };
    load_vswr: number;
    load_return_loss_db: number;
    wavelength_m: Record<string, number>;
    rows: {
      cable: string;
      matched_loss_db: number;
      loss_db: number;
      input_vswr: number;
      input_re_ohm?: number;
      input_im_ohm?: number;
    }[];
  };
}

const worked = JSON.parse(
  readFileSync(new URL("../fixtures/line/worked-runs.json", import.meta.url), "utf8"),
) as WorkedRuns;

function modelOf(designation: string): LineModel {
  const cable = worked.cables[designation]!;
  return {
    conductors: [
      { form: "sqrt", r0OhmPerM: cable.R0_ohm_per_km / 1000, skinCornerRadPerS: 2e3 * Math.PI * cable.skin_corner_kHz },
    ],
    lInfHPerM: cable.Linf_nH_per_m * 1e-9,
    cFPerM: cable.C_pF_per_m * 1e-12,
    lossTangent: cable.tan_delta,
  };
}

const length = (designation: string, lengthM: number): Element => ({
  kind: "cable",
  line: { model: modelOf(designation) },
  lengthM,
});
/** Half a unit of the last digit, and a little of the next for a table that was rounded from rounded inputs. */
const toDigit = (value: number, unit: number) => ({ value, rel_tolerance: 0, abs_tolerance: 0.55 * unit });

test.each(Object.keys(worked.cables))("the loss of %s at four frequencies is the catalogue's", (designation) => {
  for (const [at, loss] of Object.entries(worked.cables[designation]!.check_loss_dB_per_100m)) {
    const frequency = { "1MHz": 1e6, "10MHz": 1e7, "100MHz": 1e8, "1GHz": 1e9 }[at]!;
    closeTo(
      100 * lineFigures(modelOf(designation), [frequency]).attenuationDbPerM[0]!,
      { value: loss, rel_tolerance: 5e-4, abs_tolerance: 5e-4 },
      at,
    );
  }
});

/**
 * A return loss of the feeder: the catalogue's velocity factor has three digits, which leaves 48 m undecided by a third
 * of a radian, and with it how the cable's own small mismatch adds to the antenna's.
 */
const feederReturnLoss = (value: number) => ({ value, rel_tolerance: 0, abs_tolerance: 0.25 });

test.each(worked.feeder.rows)(
  "a mast feeder of $main: matched loss warm and cold, and what the transmitter sees of the antenna",
  (row) => {
    const joint: Element = { kind: "joint", lossDbAtOneGhz: 0.05 };
    const elements = [
      joint,
      length(row.jumper, 1.5),
      joint,
      length(row.main, 48),
      joint,
      length(row.jumper, 1.5),
      joint,
    ];
    const feeder = (load: Termination): Circuit => ({
      source: { kind: "constant", reOhm: 50, imOhm: 0 },
      elements,
      load,
    });
    const at = (load: Termination, temperatureC = 20) =>
      sweep(feeder(load), [worked.feeder.frequency_hz], { temperatureC });
    const ohm = (reOhm: number): Termination => ({ kind: "constant", reOhm, imOhm: 0 });
    closeTo(at(ohm(50)).matchedLossDb[0]!, toDigit(row.matched_loss_db_20c, 0.01), "matched loss at 20 °C");
    closeTo(at(ohm(50), 45).matchedLossDb[0]!, toDigit(row.matched_loss_db_45c, 0.01), "matched loss at 45 °C");
    closeTo(at(ohm(75)).returnLossDb[0]!, feederReturnLoss(row.return_loss_db["75"]), "return loss of 75 ohm");
    closeTo(at(ohm(100)).returnLossDb[0]!, feederReturnLoss(row.return_loss_db["100"]), "return loss of 100 ohm");
    closeTo(at({ kind: "open" }).returnLossDb[0]!, feederReturnLoss(row.return_loss_db.open), "return loss of nothing");
  },
);

test.each(worked.mismatch.rows)("36 m of $cable into 22 − j35 Ω: loss, and what the transmitter sees", (row) => {
  const { frequency_hz, length_m, load, load_vswr, load_return_loss_db, wavelength_m } = worked.mismatch;
  const circuit: Circuit = {
    source: { kind: "constant", reOhm: 50, imOhm: 0 },
    elements: [length(row.cable, length_m)],
    load: { kind: "constant", reOhm: load.re_ohm, imOhm: load.im_ohm },
  };
  const got = sweep(circuit, [frequency_hz], { planes: [{ at: "load" }] });
  closeTo(got.atPlanes[0]!.vswr[0]!, toDigit(load_vswr, 0.01), "VSWR at the load");
  closeTo(got.atPlanes[0]!.returnLossDb[0]!, toDigit(load_return_loss_db, 0.01), "return loss at the load");
  closeTo(got.matchedLossDb[0]!, toDigit(row.matched_loss_db, 0.01), "matched loss");
  closeTo(got.elementLossDb[0]![0]!, toDigit(row.loss_db, 0.01), "loss");
  closeTo(got.vswr[0]!, toDigit(row.input_vswr, 0.01), "VSWR at the transmitter");
  if (row.input_re_ohm !== undefined)
    closeTo(got.inputImpedance.re[0]!, toDigit(row.input_re_ohm, 0.1), "resistance at the transmitter");
  if (row.input_im_ohm !== undefined)
    closeTo(got.inputImpedance.im[0]!, toDigit(row.input_im_ohm, 0.1), "reactance at the transmitter");
  const wavelength = wavelength_m[row.cable];
  if (wavelength !== undefined)
    closeTo(
      (2 * Math.PI) / lineFigures(modelOf(row.cable), [frequency_hz]).phaseRadPerM[0]!,
      toDigit(wavelength, 0.001),
      "wavelength",
    );
  expect(got.extraLossDb[0]!).toBeGreaterThan(0);
});
