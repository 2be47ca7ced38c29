/**
 * Nothing is missed: the solutions found from the lossless closed form are counted against a scan that knows nothing of
 * it. At each place along the feeder the stub that would complete the match has one complex length; where that length is
 * real, there is a solution.
 */
import { expect, test } from "vitest";
import fc from "fast-check";
import { add, complex, divide, log, multiply, ONE, polar, scale, subtract, type Complex } from "@/lib/line/complex";
import { designPoint, type DesignLine, type DesignPoint } from "@/lib/line/match/design-point";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { along, loadPair } from "@/lib/line/match/pair";
import type { StubEnd } from "@/lib/line/match/single-stub";
import { c50F7, c75F7 } from "@/tests/support/match-lines";

/** The complex length, metre, that gives a stub the admittance missing at a distance; real part within its half wave. */
function lengthNeeded(point: DesignPoint, stub: DesignLine, end: StubEnd, distance: number): Complex {
  const { v, i } = along(loadPair(point), point.feeder!, distance);
  const missing = subtract(complex(1 / point.request.targetOhm), divide(i, v));
  const tangent = multiply(missing, stub.zc);
  const t = end === "open" ? tangent : divide(ONE, tangent);
  const angle = log(divide(add(ONE, t), subtract(ONE, t)));
  const [re, im] = [angle.re / 2, angle.im / 2];
  const branches = [-2, -1, 0, 1, 2].map((turn) => divide(complex(re, im + Math.PI * turn), stub.gamma));
  return branches.find((each) => each.re >= 0 && each.re < stub.wavelengthM / 2) ?? complex(NaN, NaN);
}

function countByScan(point: DesignPoint, end: StubEnd): number {
  const stub = point.lines[0]!;
  const steps = 6000;
  let [count, before] = [0, complex(NaN, NaN)];
  for (let k = 0; k <= steps; k++) {
    const at = lengthNeeded(point, stub, end, ((point.feeder!.wavelengthM / 2) * k * (1 - 1e-12)) / steps);
    // A jump is a change of branch, not a crossing.
    const isSmooth = Math.hypot(at.re - before.re, at.im - before.im) < 0.1 * stub.wavelengthM;
    if (isSmooth && Math.sign(at.im) !== Math.sign(before.im)) count += 1;
    before = at;
  }
  return count;
}

test("from 1 to 500 MHz, for any load up to VSWR 40, a scan of the feeder finds no shunt stub that findMatches missed", () => {
  const megahertz = fc.integer({ min: 1, max: 500 });
  const thousandths = fc.integer({ min: 50, max: 950 });
  const degrees = fc.integer({ min: -180, max: 179 });
  const ends = fc.constantFrom("open", "short") as fc.Arbitrary<StubEnd>;
  fc.assert(
    fc.property(megahertz, thousandths, degrees, ends, (mhz, magnitude, angle, end) => {
      const gamma = polar(magnitude / 1000, (angle * Math.PI) / 180);
      const load = scale(divide(add(ONE, gamma), subtract(ONE, gamma)), 50);
      const designHz = mhz * 1e6;
      const request: MatchRequest = {
        load: { kind: "constant", reOhm: load.re, imOhm: load.im },
        targetOhm: 50,
        designHz,
        bandHz: [designHz, designHz],
        returnLossDb: 20,
        feeder: c50F7,
        lines: [c75F7],
        methods: ["shuntStub"],
      };
      const found = findMatches(request).candidates.filter(
        ({ elements: [stub] }) => stub?.kind === "stub" && stub.end === end,
      );
      expect(found).toHaveLength(countByScan(designPoint(request), end));
    }),
    { numRuns: 60 },
  );
});
