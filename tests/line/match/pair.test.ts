import { expect, test } from "vitest";
import { abs, complex, divide, subtract, type Complex } from "@/lib/line/complex";
import type { Element, Termination } from "@/lib/line/element";
import { prepareElements } from "@/lib/line/element-two-port";
import { designPoint } from "@/lib/line/match/design-point";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { along, loadPair, stubPair, withBranch, withLossShare, type Pair } from "@/lib/line/match/pair";
import { terminationPort } from "@/lib/line/termination";
import { throughTwoPort } from "@/lib/line/two-port";
import { c50F10, c75F7 } from "@/tests/support/match-lines";

const load: Termination = { kind: "constant", reOhm: 22, imOhm: -35 };
const request: MatchRequest = {
  load,
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [27e6, 27.4e6],
  returnLossDb: 14,
  feeder: c50F10,
  lines: [c75F7],
  temperatureC: 40,
};
const point = designPoint(request);
const [feeder, line] = [point.feeder!, point.lines[0]!];

/** The same network by the two-ports every run is made of. */
function byTwoPorts(elements: Element[]): Complex {
  const s = complex(0, 2 * Math.PI * request.designHz);
  const prepared = prepareElements({ elements }, request.temperatureC);
  const { v, i } = prepared.reduceRight((seen, at) => throughTwoPort(at(s), seen), terminationPort(load, s));
  return divide(v, i);
}

function expectSame(pair: Pair, elements: Element[]) {
  const expected = byTwoPorts(elements);
  expect(abs(subtract(divide(pair.v, pair.i), expected)) / abs(expected)).toBeLessThan(1e-12);
}

const cable = (lengthM: number, paralleled = 1): Element => ({ kind: "cable", line: c75F7, lengthM, paralleled });

test.each([0, 0.3, 1.9, 4.5])("along(pair, line, %s m) is the impedance of the run's own cable", (lengthM) => {
  expectSame(along(loadPair(point), line, lengthM), [cable(lengthM)]);
  expectSame(along(loadPair(point), line, lengthM, 3), [cable(lengthM, 3)]);
});

test.each([
  ["shunt", "open"],
  ["shunt", "short"],
  ["series", "open"],
  ["series", "short"],
] as const)("a %s stub with its end %s is the run's own stub", (connection, end) => {
  const pair = withBranch(connection, along(loadPair(point), feeder, 0.4), stubPair(line, 1.3, end));
  const stub: Element = { kind: "stub", connection, end, line: c75F7, lengthM: 1.3 };
  expectSame(pair, [stub, { kind: "cable", line: c50F10, lengthM: 0.4 }]);
});

test("along(pair, line, −length) undoes along(pair, line, length)", () => {
  const { v, i } = along(along(loadPair(point), line, 1.1), line, -1.1);
  expect(abs(subtract(divide(v, i), point.load))).toBeLessThan(1e-12);
});

test("withLossShare(line, share) keeps the wavelength and ends at the line itself", () => {
  expect(withLossShare(line, 1)).toEqual(line);
  const ideal = withLossShare(line, 0);
  expect(ideal.gamma).toEqual(complex(0, line.gamma.im));
  expect(ideal.zc.re).toBe(line.zc.re);
  expect(ideal.zc.im).toBeCloseTo(0, 15);
});
