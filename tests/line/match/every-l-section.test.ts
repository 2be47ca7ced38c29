/**
 * No L-section is missed, however poor its parts: solutions are counted against a scan that walks the reactance of the
 * series part evenly in angle and asks where the part across would have the conductance of its own Q.
 */
import { expect, test } from "vitest";
import fc from "@/tests/support/property";
import { add, complex, divide, ONE, polar, reciprocal, scale, subtract, type Complex } from "@/lib/line/complex";
import { findMatches } from "@/lib/line/match/find-matches";
import type { Candidate } from "@/lib/line/match/match-request";
import { everyday } from "@/tests/support/match-lines";

interface Job {
  load: Complex;
  coilQ: number;
  capacitorQ: number;
}
const targetOhm = 50;

/** Conductance missing, or too much, in the part across; 0 where the network is whole. */
function excess({ load, coilQ, capacitorQ }: Job, isShuntAtLoad: boolean, reactance: number): number {
  const series = complex(Math.abs(reactance) / (reactance > 0 ? coilQ : capacitorQ), reactance);
  const needed = isShuntAtLoad
    ? subtract(reciprocal(subtract(complex(targetOhm), series)), reciprocal(load))
    : subtract(complex(1 / targetOhm), reciprocal(add(load, series)));
  return needed.re - Math.abs(needed.im) / (needed.im < 0 ? coilQ : capacitorQ);
}

function countByScan(job: Job, isShuntAtLoad: boolean): number {
  const steps = 40_000;
  const at = (k: number) => excess(job, isShuntAtLoad, targetOhm * Math.tan(Math.PI * ((k + 0.5) / steps - 0.5)));
  let [count, before] = [0, at(0)];
  for (let k = 1; k < steps; k++) {
    const here = at(k);
    if (Math.sign(here) !== Math.sign(before)) count += 1;
    before = here;
  }
  return count;
}

function found({ load, coilQ, capacitorQ }: Job): Candidate[] {
  const { candidates } = findMatches({
    ...everyday,
    load: { kind: "constant", reOhm: load.re, imOhm: load.im },
    bandHz: [27.2e6, 27.2e6],
    methods: ["lSection"],
    partQ: { coilQ, capacitorQ },
  });
  return candidates.filter(({ title }) => !title.includes("E24") && !title.startsWith("One "));
}

const endsInShunt = ({ elements }: Candidate) => {
  const last = elements.at(-1);
  return last?.kind === "part" && last.connection === "shunt";
};

test.each([
  { re: 38.23, im: 21.36, coilQ: 243.8, capacitorQ: 51 },
  { re: 46.07, im: -15.97, coilQ: 10.5, capacitorQ: 25 },
  { re: 50, im: 18.63, coilQ: 6.9, capacitorQ: 609 },
  { re: 0.97, im: 7.16, coilQ: 79.9, capacitorQ: 14 },
  { re: 20, im: -150, coilQ: 0.5, capacitorQ: 0.5 },
])("$re + j($im) Ω with Q $coilQ and $capacitorQ: solutions that only the loss makes are found", (given) => {
  const job = { load: complex(given.re, given.im), ...given };
  const candidates = found(job);
  expect(candidates.filter(endsInShunt)).toHaveLength(countByScan(job, true));
  expect(candidates.filter((each) => !endsInShunt(each))).toHaveLength(countByScan(job, false));
  for (const { designReturnLossDb, title } of candidates) expect(designReturnLossDb, title).toBeNull();
});

test("for any load up to VSWR 40 and any Q from 3 to 3000, a scan finds no L-section that findMatches missed", () => {
  const tenths = (min: number, max: number) => fc.integer({ min: 10 * min, max: 10 * max }).map((each) => each / 10);
  const magnitude = fc.integer({ min: 20, max: 950 }).map((each) => each / 1000);
  const q = fc.integer({ min: 50, max: 350 }).map((each) => 10 ** (each / 100));
  fc.assert(
    fc.property(magnitude, tenths(-180, 179), q, q, (size, degrees, coilQ, capacitorQ) => {
      const gamma = polar(size, (degrees * Math.PI) / 180);
      const load = scale(divide(add(ONE, gamma), subtract(ONE, gamma)), targetOhm);
      const job = { load, coilQ, capacitorQ };
      const candidates = found(job);
      expect(candidates.filter(endsInShunt)).toHaveLength(countByScan(job, true));
      expect(candidates.filter((each) => !endsInShunt(each))).toHaveLength(countByScan(job, false));
    }),
    { numRuns: 80 },
  );
});

test("a poor part is not refused but its loss is said", () => {
  const [best] = found({ load: complex(20, -150), coilQ: 0.5, capacitorQ: 0.5 });
  expect(best!.worstTransducerLossDb!).toBeGreaterThan(3);
});
