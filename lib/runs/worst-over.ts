/** The worst of everything a target can be set on, over any band of a run. Pure. */
import type { Circuit, Plane } from "@/lib/line/element";
import { sweepPrepared, type Sweep } from "@/lib/line/run";
import { prepareRun, type PreparedRun } from "@/lib/line/walk";
import { bandFrequencies } from "@/lib/runs/shown";
import { worstIn, type Worst } from "@/lib/runs/worst";

export interface WorstOver {
  sourceReturnLoss: Worst;
  loadReturnLoss: Worst;
  loss: Worst;
  sourceVswr: Worst;
  loadVswr: Worst;
}

export type Band = readonly [number, number];

const loadPlane: Plane = { at: "load" };
type Curve = (at: Sweep) => Float64Array;

/** The worst inside a band of a run that was already swept over it, with its load plane first among the planes. */
export function worstOfSweep(run: PreparedRun, swept: Sweep, band: Band): WorstOver {
  const least = (curve: Curve, sign: 1 | -1): Worst => {
    const valueAt = (f: number) => sign * curve(sweepPrepared(run, [f], [loadPlane]))[0]!;
    const curveHere = curve(swept).map((v) => sign * v);
    const found = worstIn(swept.frequencies, curveHere, band, valueAt);
    return { ...found, value: sign * found.value };
  };
  const found: Partial<WorstOver> = {};
  // Each is looked for when it is first asked for: finding the worst costs as much as the sweep.
  return {
    get sourceReturnLoss() {
      return (found.sourceReturnLoss ??= least((at) => at.returnLossDb, 1));
    },
    get loadReturnLoss() {
      return (found.loadReturnLoss ??= least((at) => at.atPlanes[0]!.returnLossDb, 1));
    },
    get loss() {
      return (found.loss ??= least((at) => at.transducerLossDb, -1));
    },
    get sourceVswr() {
      return (found.sourceVswr ??= least((at) => at.vswr, -1));
    },
    get loadVswr() {
      return (found.loadVswr ??= least((at) => at.atPlanes[0]!.vswr, -1));
    },
  };
}

/** The worst over a band of its own, swept finely enough to follow the run's ripple. */
export function worstOver(circuit: Circuit, band: Band, temperatureC: number): WorstOver {
  const run = prepareRun(circuit, temperatureC);
  return worstOfSweep(run, sweepPrepared(run, bandFrequencies(circuit, band), [loadPlane]), band);
}

/** The least return loss at the source over a band: what a limit is held against. */
export function leastReturnLossDb(circuit: Circuit, band: Band, temperatureC: number): number {
  const run = prepareRun(circuit, temperatureC);
  const swept = sweepPrepared(run, bandFrequencies(circuit, band));
  return worstIn(swept.frequencies, swept.returnLossDb, band, (f) => sweepPrepared(run, [f]).returnLossDb[0]!).value;
}
