import { expect, test } from "vitest";
import { readSweep } from "@/lib/cables/editor/read-sweep";
import { fromInputs } from "@/lib/cables/from-inputs";
import { nominalFigures, prepareLine } from "@/lib/line/cable";
import { lineSection } from "@/lib/line/section";
import { scattering } from "@/lib/line/two-port";
import { entered, trunkLine } from "@/tests/support/entered";

const sweptM = 20;

/** A sample as an analyser would write it. */
function file(frequencies: readonly number[]): string {
  const section = lineSection(prepareLine(trunkLine.model), sweptM);
  const rows = frequencies.map((hertz) => {
    const { s11, s21 } = scattering(section({ re: 0, im: 2 * Math.PI * hertz }), 50);
    return [hertz, s11.re, s11.im, s21.re, s21.im, s21.re, s21.im, s11.re, s11.im].join(" ");
  });
  return `# Hz S RI R 50\n${rows.join("\n")}\n`;
}
const steps = Array.from({ length: 400 }, (_, k) => 1e6 * (k + 1));

test("A swept sample has the impedance and velocity of its cable, and rules when it is chosen to", () => {
  const read = readSweep("sample.s2p", file(steps), sweptM, "sqrt");
  if (!read.ok) throw new Error(read.message);
  const figures = nominalFigures(read.sweep.model!);
  expect(figures.z0 / trunkLine.z0).toBeCloseTo(1, 2);
  expect(figures.velocityFactor / trunkLine.velocityFactor).toBeCloseTo(1, 2);
  const ruling = { impedance: "sweep", loss: "sweep", resistance: "sweep" } as const;
  const worked = fromInputs(entered({ sweep: read.sweep, nominal: { z0Ohm: 60, velocityFactor: 0.7 }, ruling }));
  expect(nominalFigures(worked.model!).z0).toBeCloseTo(figures.z0, 9);
  expect(worked.ruled).toMatchObject({ impedance: "sweep", loss: "sweep", resistance: "sweep" });
});

test("What is no sweep of a sample is refused in words", () => {
  const one = readSweep("sample.s1p", "# Hz S RI R 50\n1e6 0.1 0\n", sweptM, "sqrt");
  expect(one).toMatchObject({ ok: false, message: expect.stringMatching(/two ports/) });
  const broken = readSweep("sample.s2p", "# Hz S RI R 50\n1e6 0.1 zero\n", sweptM, "sqrt");
  expect(broken).toMatchObject({ ok: false, message: expect.stringMatching(/^Line 2: /) });
});
