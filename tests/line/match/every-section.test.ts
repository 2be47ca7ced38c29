/**
 * No section is missed: the solutions found are counted against a fine scan along the feeder, which finds where the
 * section that completes the match has a real length.
 */
import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import { add, complex, divide, log, multiply, ONE, polar, scale, subtract, type Complex } from "@/lib/line/complex";
import { designPoint, type DesignPoint } from "@/lib/line/match/design-point";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { along, loadPair } from "@/lib/line/match/pair";
import { c50F7, c75F7 } from "@/tests/support/match-lines";

const words = ["Series", "Two", "Three", "Four"];

/** All complex lengths within a half wave whose tangent makes the target of what the feeder shows at a distance. */
function lengthNeeded(point: DesignPoint, count: number, distance: number): Complex {
  const line = point.lines[0]!;
  const { v, i } = along(loadPair(point), point.feeder!, distance);
  const z = divide(v, i);
  const own = scale(line.zc, 1 / count);
  const target = complex(point.request.targetOhm);
  const t = divide(multiply(own, subtract(target, z)), subtract(multiply(own, own), multiply(target, z)));
  const angle = log(divide(add(ONE, t), subtract(ONE, t)));
  const branches = [-1, 0, 1].map((turn) => divide(complex(angle.re / 2, angle.im / 2 + Math.PI * turn), line.gamma));
  return branches.find((each) => each.re >= 0 && each.re < line.wavelengthM / 2) ?? complex(NaN, NaN);
}

function countByScan(point: DesignPoint, count: number, steps: number): number {
  let [found, before] = [0, complex(NaN, NaN)];
  for (let k = 0; k <= steps; k++) {
    const at = lengthNeeded(point, count, ((point.feeder!.wavelengthM / 2) * k * (1 - 1e-12)) / steps);
    const isSmooth = Math.hypot(at.re - before.re, at.im - before.im) < 0.1 * point.lines[0]!.wavelengthM;
    if (isSmooth && Math.sign(at.im) !== Math.sign(before.im)) found += 1;
    before = at;
  }
  return found;
}

function requestOf(mhz: number, magnitude: number, degrees: number): MatchRequest {
  const gamma = polar(magnitude, (degrees * Math.PI) / 180);
  const load = scale(divide(add(ONE, gamma), subtract(ONE, gamma)), 50);
  return {
    load: { kind: "constant", reOhm: load.re, imOhm: load.im },
    targetOhm: 50,
    designHz: mhz * 1e6,
    bandHz: [mhz * 1e6, mhz * 1e6],
    returnLossDb: 20,
    feeder: c50F7,
    lines: [c75F7],
    methods: ["seriesSection", "parallelCables"],
  };
}

const countOf = (request: MatchRequest, count: number) =>
  findMatches(request).candidates.filter(({ title }) => title.startsWith(words[count - 1]!)).length;

test.each([
  { mhz: 4, magnitude: 0.279, degrees: 190.2, count: 2, solutions: 1 },
  { mhz: 466, magnitude: 0.603, degrees: 144.6, count: 3, solutions: 2 },
  { mhz: 495, magnitude: 0.755, degrees: 168.2, count: 4, solutions: 2 },
  { mhz: 1, magnitude: 0.061, degrees: 23.5, count: 3, solutions: 3 },
  { mhz: 102, magnitude: 0.387, degrees: 282.8, count: 1, solutions: 2 },
])("loss makes $solutions solutions of $count at $mhz MHz where lossless lines have fewer", (given) => {
  const request = requestOf(given.mhz, given.magnitude, given.degrees);
  expect(countOf(request, given.count)).toBe(given.solutions);
  expect(countByScan(designPoint(request), given.count, 20_000)).toBe(given.solutions);
});

test("from 1 to 500 MHz, for any load up to VSWR 40, a scan finds no section that findMatches missed", () => {
  const megahertz = fc.integer({ min: 1, max: 500 });
  const thousandths = fc.integer({ min: 50, max: 950 });
  const degrees = fc.integer({ min: -180, max: 179 });
  const counts = fc.integer({ min: 1, max: 4 });
  fc.assert(
    fc.property(megahertz, thousandths, degrees, counts, (mhz, magnitude, angle, count) => {
      const request = requestOf(mhz, magnitude / 1000, angle);
      expect(countOf(request, count)).toBe(countByScan(designPoint(request), count, 6000));
    }),
    { numRuns: 100 },
  );
});
