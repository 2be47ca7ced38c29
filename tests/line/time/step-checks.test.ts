/** Step and pulse responses against numbers from outside; where they come from stands in the fixtures. */
import { describe, expect, test } from "vitest";
import { bothForms, checks, type Check } from "@/tests/support/line-checks";
import { stepVoltages, type StepInputs } from "@/tests/support/step-checks";
import { closeTo, type Expected } from "@/tests/support/tolerance";

/** Volt per volt of drive, on every case: tighter than what the fixtures themselves ask. */
const asked = 2e-4;

const kinds: [string, Check<StepInputs>[]][] = [
  ["lossless lines, in closed form", checks("time-lossless")],
  ["lossless lines into RC and RL loads, in closed form", checks("time-lossless-reactive")],
  ["lossy runs, by an independent program", bothForms("time-lossy")],
  ["lossy runs, in arithmetic of 40 digits", bothForms("time-high-precision")],
  ["lines of constant R, L and C, by a circuit simulator", checks("time-constant-rlc-ltra")],
];

describe.each(kinds)("%s", (_, cases) => {
  test.each(cases)("$name", ({ inputs, expected }) => {
    const { source, load } = stepVoltages(inputs);
    const held = (value: Expected) => ({ ...value, rel_tolerance: 0, abs_tolerance: asked * inputs.amplitude_v });
    closeTo(load, held(expected.load_v!), "load");
    if (expected.source_terminal_v) closeTo(source, held(expected.source_terminal_v), "source");
    if (!expected.source_current_a) return;
    const current = source.map((v) => (inputs.amplitude_v - v) / inputs.source.re_ohm);
    const late = inputs.time_s.map((t) => t > inputs.edge_duration_s && inputs.pulse_width_s === undefined);
    expect(late.some(Boolean) || inputs.pulse_width_s !== undefined).toBe(true);
    closeTo(
      current.filter((_, k) => late[k]),
      { ...expected.source_current_a, value: (expected.source_current_a.value as number[]).filter((_, k) => late[k]) },
      "source current",
    );
  });
});

test("the simulator's column and the independent program agree with us about as well as with each other", () => {
  for (const check of checks<StepInputs>("time-constant-rlc-ltra")) {
    const { independent_python_model: program } = check as unknown as Record<string, Record<string, number[]>>;
    const { load } = stepVoltages(check.inputs);
    closeTo(load, { value: program!.load_v!, rel_tolerance: 0, abs_tolerance: 1e-4 }, check.name);
  }
});
