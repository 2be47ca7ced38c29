import { expect, test } from "vitest";
import { findMatches } from "@/lib/line/match/find-matches";
import type { ConductorForm, LineModel } from "@/lib/line/element";
import round from "@/tests/fixtures/line/matching-lossy-stub.round.json";
import sqrt from "@/tests/fixtures/line/matching-lossy-stub.sqrt.json";
import { closeTo } from "@/tests/support/tolerance";

type Case = (typeof sqrt.cases)[number];

function modelOf({ cable }: Case["inputs"]): LineModel {
  return {
    conductors: [
      {
        form: cable.skin_form as ConductorForm,
        r0OhmPerM: cable.r0_ohm_per_m,
        skinCornerRadPerS: cable.skin_corner_rad_per_s,
      },
    ],
    lInfHPerM: cable.linf_h_per_m,
    cFPerM: cable.cr_f_per_m,
    lossTangent: cable.tan_delta,
    g0SPerM: cable.g0_s_per_m,
    temperatureCoefficientPerK: cable.temp_coeff_per_k,
  };
}

function stubsOf({ inputs }: Case) {
  const line = { model: modelOf(inputs), label: "the cable" };
  const { candidates } = findMatches({
    load: { kind: "constant", reOhm: inputs.load_re_ohm, imOhm: inputs.load_im_ohm },
    targetOhm: inputs.reference_ohm,
    designHz: inputs.frequency_hz,
    bandHz: [inputs.frequency_hz, inputs.frequency_hz],
    returnLossDb: 20,
    feeder: line,
    lines: [line],
    methods: [inputs.connection === "shunt" ? "shuntStub" : "seriesStub"],
    temperatureC: inputs.cable.temperature_c,
  });
  const found = candidates.map(({ elements, worstTransducerLossDb, designReturnLossDb }) => {
    const [stub, cable] = elements;
    if (stub?.kind !== "stub" || cable?.kind !== "cable") throw new Error("a stub and then a cable were expected");
    return {
      end: stub.end,
      length: stub.lengthM,
      distance: cable.lengthM,
      lossDb: worstTransducerLossDb,
      designReturnLossDb,
    };
  });
  return found.filter((each) => each.end === inputs.end).sort((a, b) => a.distance - b.distance);
}

test.each([...sqrt.cases, ...round.cases].map((each) => ({ ...each, form: each.inputs.cable.skin_form, each })))(
  "$name, $form: both lossy solutions have the known lengths, loss and no reflection",
  ({ each, expected }) => {
    const found = stubsOf(each);
    closeTo(
      found.map((one) => one.distance),
      expected.distance_from_load_m,
      "distance",
    );
    closeTo(
      found.map((one) => one.length),
      expected.stub_length_m,
      "stub",
    );
    closeTo(
      found.map((one) => one.lossDb ?? NaN),
      expected.transducer_loss_db,
      "loss",
    );
    for (const one of found) {
      const magnitude = one.designReturnLossDb === null ? 0 : 10 ** (-one.designReturnLossDb / 20);
      closeTo(magnitude, expected.input_reflection_magnitude, "reflection");
    }
    expect(found).toHaveLength(2);
  },
);
