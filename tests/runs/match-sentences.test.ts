import { expect, test } from "vitest";
import { leftBehind, leftBehindSentence } from "@/lib/runs/match-sentences";
import type { MatchAsked } from "@/lib/runs/matching";
import { c50F10, c75F7, everyday } from "@/tests/support/match-lines";

const asked: MatchAsked = {
  load: everyday.load,
  behind: [{ kind: "cable", line: c50F10, lengthM: 36 }],
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [27e6, 27.4e6],
  returnLossDb: 14,
  coilQ: 120,
  capacitorQ: 1000,
  temperatureC: 20,
};
const names = { isAtSource: true, sourceName: "Transmitter", cableName: "C50-F10" };
const plain = (text: string | undefined) => text?.replaceAll("\u00a0", " ");
const sentence = (change: Partial<MatchAsked> = {}, called = names) =>
  leftBehindSentence(leftBehind({ ...asked, ...change }), 27.2e6, called);

test("36 m behind a match at the transmitter keep VSWR 3.54 and lose 1.33 dB instead of 0.76 dB, and the match sees 138.6 + j1.8 Ω", () => {
  const left = leftBehind(asked);
  expect(left.impedance.re).toBeCloseTo(138.6, 1);
  expect(left.impedance.im).toBeCloseTo(1.8, 1);
  expect(left.longest?.index).toBe(0);
  expect(left.longest?.vswr).toBeCloseTo(3.54, 2);
  expect(left.lossDb).toBeCloseTo(1.33, 2);
  expect(left.matchedLossDb).toBeCloseTo(0.76, 2);
});

test("the sentence says what the match serves, what stays on the line and what matching at the load would save", () => {
  expect(sentence()).toEqual({ text: expect.any(String), isWarning: true });
  expect(plain(sentence()?.text)).toBe(
    "A match here serves Transmitter, not the line behind it: C50-F10 keeps a VSWR of 3.54, and 1.33 dB is lost between it and the load at 27.2 MHz, 0.57 dB of it to the standing wave. Matched at the load, the same pieces lose 0.76 dB.",
  );
  expect(sentence({}, { ...names, isAtSource: false })?.text).toContain(
    "serves the line before it, not the line behind",
  );
});

test("the wave is that of the longest cable, in its own impedance and at its own end", () => {
  const jumper = { kind: "cable" as const, line: c75F7, lengthM: 2 };
  const main = { kind: "cable" as const, line: c75F7, lengthM: 40 };
  const joint = { kind: "joint" as const, lossDbAtOneGhz: 0.05 };
  const load = { kind: "constant" as const, reOhm: 75, imOhm: 0 };
  const left = leftBehind({ ...asked, load, behind: [jumper, joint, main, joint] });
  expect(left.longest?.index).toBe(2);
  // 75 Ω on a 75 Ω line: no wave, although the match is asked for 50 Ω.
  expect(left.longest?.vswr).toBeLessThan(1.02);
  const quiet = leftBehindSentence(left, 27.2e6, names);
  expect(quiet?.isWarning).toBe(false);
  expect(quiet?.text).toMatch(/^No standing wave worth the name is left behind the match; /);
});

test("with no cable behind only the loss is said", () => {
  const quiet = sentence({ behind: [{ kind: "joint", lossDb: 0.1, referenceOhm: 50 }] });
  expect(quiet?.isWarning).toBe(false);
  expect(plain(quiet?.text)).toMatch(/ 0\.\d\d dB is lost between it and the load/);
});

test("a load that takes no power gets no sentence, and no figure that is not one", () => {
  expect(sentence({ load: { kind: "open" } })).toBeNull();
  expect(sentence({ load: { kind: "short" } })).toBeNull();
  expect(leftBehind({ ...asked, load: { kind: "open" } }).longest?.vswr).toBe(Infinity);
});

test("a short line loses little to its wave, and the sentence does not dress that up", () => {
  const text = sentence({ behind: [{ kind: "cable", line: c50F10, lengthM: 0.05 }] })?.text;
  expect(text).toContain("no more than between matched ends.");
  expect(text).not.toContain("Matched at the load");
});
