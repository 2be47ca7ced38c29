/** A run whose figures move answers as the same run made anew: the quick form against the readable one. */
import { expect, test } from "vitest";
import type { Circuit, Element } from "@/lib/line/element";
import { withValues } from "@/lib/line/moved-circuit";
import { movedResponse } from "@/lib/line/moved-response";
import { sweep } from "@/lib/line/run";
import { anyRun } from "@/tests/support/arbitrary-run";
import fc from "@/tests/support/property";
import { cable, ohm, rope, run } from "@/tests/support/lossy-run";

const frequencies = [1e5, 3.7e6, 1.45e8, 2.2e9];

/** Everything of an element that can move, with a factor or a deviation. */
function pathsOf(element: Element, index: number): { path: string; move: (x: number) => number }[] {
  const at = `elements.${index}`;
  const share = (path: string, value: number) => ({ path: `${at}.${path}`, move: (x: number) => value * (1 + x / 10) });
  const percent = (path: string) => ({ path: `${at}.${path}`, move: (x: number) => 10 * x });
  switch (element.kind) {
    case "cable":
    case "stub":
      return [
        share("lengthM", element.lengthM),
        ...["z0Percent", "velocityFactorPercent", "lossPercent"].map(percent),
        { path: `${at}.temperatureC`, move: (x) => 20 + 20 * x },
        share("line.model.lInfHPerM", element.line.model.lInfHPerM),
        share("line.model.conductors.0.r0OhmPerM", element.line.model.conductors[0]!.r0OhmPerM),
      ];
    case "parallel":
      return [share("branches.0.lengthM", element.branches[0]!.lengthM), percent("branches.0.z0Percent")];
    case "part":
      return [percent("valuePercent")];
    case "joint":
      return [share("lossDb", element.lossDb!)];
    case "transformer":
      return [share("turnsRatio", element.turnsRatio)];
    default:
      return [];
  }
}

const ends = [
  { path: "load.reOhm", move: (x: number) => 60 + 10 * x },
  { path: "load.imOhm", move: (x: number) => 10 * x },
  { path: "source.reOhm", move: (x: number) => 50 + 10 * x },
];

/** Which paths move, and to where, at two draws one after the other. */
const anyMovedRun = fc
  .record({
    circuit: anyRun,
    pick: fc.infiniteStream(fc.boolean()),
    x: fc.infiniteStream(fc.double({ min: -1, max: 1, noNaN: true })),
  })
  .map(({ circuit, pick, x }) => {
    const next = <T>(stream: Iterator<T>) => stream.next().value as T;
    const all = [...circuit.elements.flatMap(pathsOf), ...ends];
    const moved = all.filter(() => next(pick));
    const values = [0, 1].map(() => moved.map(({ move }) => move(next(x))));
    return { circuit, paths: moved.map(({ path }) => path), values };
  });

/** Rounding of deep reflections and of long chains; both forms are right to about this. */
const near = (got: number, value: number, where: string) =>
  expect(got === value || Math.abs(got - value) <= 1e-6 + 1e-9 * Math.abs(value), `${where}: ${got}, ${value}`).toBe(
    true,
  );

test("whatever moves, every draw is the sweep of the run with its values put in", () => {
  fc.assert(
    fc.property(anyMovedRun, ({ circuit, paths, values }) => {
      const { respond } = movedResponse(circuit, paths, frequencies, 35);
      const [returnLoss, loss] = [new Float64Array(8), new Float64Array(8)];
      values.forEach((each, draw) => respond(each, returnLoss, loss, 4 * draw));
      values.forEach((each, draw) => {
        const made = withValues(circuit, Object.fromEntries(paths.map((path, n) => [path, each[n]!])));
        const swept = sweep(made, frequencies, { temperatureC: 35 });
        for (let k = 0; k < 4; k++) {
          // beyond 120 dB what comes back is rounding of what went in
          if (swept.returnLossDb[k]! < 120) near(returnLoss[4 * draw + k]!, swept.returnLossDb[k]!, "return loss");
          near(loss[4 * draw + k]!, swept.transducerLossDb[k]!, "transducer loss");
        }
      });
    }),
    { numRuns: 300 },
  );
});

test("a run of which nothing moves is its sweep", () => {
  fc.assert(
    fc.property(anyRun, (circuit) => {
      const [returnLoss, loss] = [new Float64Array(4), new Float64Array(4)];
      movedResponse(circuit, [], frequencies).respond([], returnLoss, loss, 0);
      const swept = sweep(circuit, frequencies);
      for (let k = 0; k < 4; k++) near(loss[k]!, swept.transducerLossDb[k]!, "transducer loss");
    }),
  );
});

test("a joint takes its impedance from the cable beside it, also while that moves", () => {
  const joint: Element = { kind: "joint", lossDb: 3, lossDbAtOneGhz: 0.2, shuntF: 1e-12 };
  const circuit = run([cable(3), joint, cable(2)]);
  const { respond } = movedResponse(circuit, ["elements.0.z0Percent"], frequencies);
  const [returnLoss, loss] = [new Float64Array(4), new Float64Array(4)];
  respond([40], returnLoss, loss, 0);
  const swept = sweep(withValues(circuit, { "elements.0.z0Percent": 40 }), frequencies);
  swept.transducerLossDb.forEach((value, k) => near(loss[k]!, value, "transducer loss"));
  swept.returnLossDb.forEach((value, k) => near(returnLoss[k]!, value, "return loss"));
});

test("a dead short across the line, an open in it and a stub of no length let nothing through, moved or not", () => {
  const nothing: Element[] = [
    { kind: "stub", connection: "shunt", end: "short", line: { model: rope }, lengthM: 0 },
    { kind: "stub", connection: "series", end: "open", line: { model: rope }, lengthM: 0 },
    { kind: "part", connection: "shunt", rOhm: 0 },
  ];
  for (const element of nothing) {
    const circuit: Circuit = run([cable(2), element, cable(1)]);
    for (const paths of [
      [],
      ["elements.2.lengthM"],
      element.kind === "stub" ? ["elements.1.lengthM"] : ["elements.1.valuePercent"],
    ]) {
      const [returnLoss, loss] = [new Float64Array(4), new Float64Array(4)];
      movedResponse(circuit, paths, frequencies).respond(
        paths.map((path) => (path.includes(".1.") ? 0 : 1)),
        returnLoss,
        loss,
        0,
      );
      expect([...loss]).toEqual([Infinity, Infinity, Infinity, Infinity]);
      sweep(circuit, frequencies).returnLossDb.forEach((value, k) => near(returnLoss[k]!, value, "return loss"));
    }
  }
});

test("a run of 900 dB is counted, not lost: its scale is carried apart", () => {
  const long = run([cable(30_000), { kind: "pad", lossDb: 200, inputOhm: 50, outputOhm: 50 }]);
  const [returnLoss, loss] = [new Float64Array(1), new Float64Array(1)];
  movedResponse(long, ["elements.0.lengthM"], [1.45e8]).respond([30_000], returnLoss, loss, 0);
  const swept = sweep(long, [1.45e8]);
  expect(swept.transducerLossDb[0]).toBeGreaterThan(900);
  near(loss[0]!, swept.transducerLossDb[0]!, "transducer loss");
});

test("a source without resistance has no transducer loss, and sends all back", () => {
  const circuit = { ...run([cable(3)], ohm(75), { kind: "short" }), referenceOhm: 50 };
  const [returnLoss, loss] = [new Float64Array(1), new Float64Array(1)];
  movedResponse(circuit, ["elements.0.lengthM"], [1e6]).respond([3], returnLoss, loss, 0);
  expect(loss[0]).toBeNaN();
  expect(returnLoss[0]).toBe(0);
});
