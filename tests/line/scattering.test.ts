import { expect, test } from "vitest";
import { abs, subtract, type Complex } from "@/lib/line/complex";
import { elementTwoPort } from "@/lib/line/element-two-port";
import type { Element } from "@/lib/line/element";
import { scattering, THROUGH } from "@/lib/line/two-port";
import { bothForms, modelOf, type CheckCable } from "@/tests/support/line-checks";
import { closeTo } from "@/tests/support/tolerance";

interface Inputs {
  cable: CheckCable;
  length_m: number;
  reference_ohm: number;
  frequency_hz: number[];
}

const axis = (frequency: number): Complex => ({ re: 0, im: 2 * Math.PI * frequency });
test.each(bothForms<Inputs>("two-port-s-parameters"))(
  "scattering parameters and group delay of a cable agree with outside: $name",
  ({ inputs, expected }) => {
    const element: Element = { kind: "cable", line: { model: modelOf(inputs.cable) }, lengthM: inputs.length_m };
    const s = inputs.frequency_hz.map((frequency) =>
      scattering(
        elementTwoPort(element, axis(frequency), { temperatureC: inputs.cable.temperature_c }),
        inputs.reference_ohm,
      ),
    );
    const got: Record<string, number[]> = {
      s11_re: s.map(({ s11 }) => s11.re),
      s11_im: s.map(({ s11 }) => s11.im),
      s21_re: s.map(({ s21 }) => s21.re),
      s21_im: s.map(({ s21 }) => s21.im),
      s21_db: s.map(({ s21 }) => 20 * Math.log10(abs(s21))),
      // −Re of the logarithmic derivative
      group_delay_s: s.map(({ s21 }) => -(s21.slopeRe * s21.re + s21.slopeIm * s21.im) / (s21.re ** 2 + s21.im ** 2)),
    };
    for (const [key, value] of Object.entries(expected)) closeTo(got[key]!, value, key);
    for (const { s11, s22, s12, s21 } of s) {
      expect(abs(subtract(s11, s22))).toBeLessThan(1e-12);
      expect(s12).toEqual(s21);
    }
  },
);

test("scattering in a reference that is not positive is refused", () => {
  expect(() => scattering(THROUGH, 0)).toThrow("scattering: referenceOhm must be positive, got 0");
});
