import { expect, test } from "vitest";
import { sweep } from "@/lib/line/run";
import { bothForms, circuitOf, type CheckCircuit } from "@/tests/support/line-checks";
import { closeTo } from "@/tests/support/tolerance";

type Inputs = CheckCircuit & { frequency_hz: number[] };

test.each(bothForms<Inputs>("chain-sweep"))(
  "every figure of a run agrees with the outside values: $name",
  ({ inputs, expected }) => {
    const got = sweep(circuitOf(inputs), inputs.frequency_hz);
    const figures: Record<string, ArrayLike<number>> = {
      zin_re_ohm: got.inputImpedance.re,
      zin_im_ohm: got.inputImpedance.im,
      reflection_re: got.reflection.re,
      reflection_im: got.reflection.im,
      vswr: got.vswr,
      return_loss_db: got.returnLossDb,
      matched_loss_db: got.matchedLossDb,
      load_voltage_re_v_per_v: got.loadVoltage.re,
      load_voltage_im_v_per_v: got.loadVoltage.im,
      transducer_loss_db: got.transducerLossDb,
      mismatch_loss_db: got.mismatchLossDb,
      dissipation_loss_db: got.transducerLossDb.map((loss, k) => loss - got.mismatchLossDb[k]!),
      extra_loss_from_standing_waves_db: got.extraLossDb,
    };
    for (const [key, value] of Object.entries(expected)) closeTo(figures[key]!, value, key);
    expect(Object.keys(expected).length).toBeGreaterThan(8);
  },
);
