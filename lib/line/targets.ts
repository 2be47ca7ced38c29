/** Every quantity a target can be set on, and how it is worked out: one row each. */
import { directCurrent, type Dc } from "@/lib/line/dc";
import type { Circuit, Plane } from "@/lib/line/element";
import { sweep, type Sweep } from "@/lib/line/run";
import { standingWave } from "@/lib/line/standing-wave";
import { dipsOfTaps, readingsAtLoad } from "@/lib/line/targets-in-time";
import type { Drive } from "@/lib/line/time/drive";
import type { Readings } from "@/lib/line/time/readings";
import {
  frequenciesWithBands,
  indicesInBand,
  judge,
  reachedOver,
  type Judgement,
  type Reached,
  type Target,
  type TargetQuantity,
} from "@/lib/line/target";

export interface TargetConditions {
  /** hertz, each above 0; a target's own band takes those inside it, and its ends */
  frequencies: ArrayLike<number>;
  /** °C; default 20 */
  temperatureC?: number | undefined;
  /** e.m.f. of the source at direct current, volt */
  supplyV?: number | undefined;
  /** drawn at the load end at direct current, ampere */
  loadCurrentA?: number | undefined;
  /** available from the source, watt */
  availablePowerW?: number | undefined;
  /** of the source's e.m.f., for what is a question of time; with it a delay is that of its edge */
  drive?: Drive | undefined;
}

/** A run as its targets see it; what several of them need is worked out once, when the first asks. */
interface Studied {
  circuit: Circuit;
  conditions: TargetConditions;
  frequencies: Float64Array;
  swept: () => Sweep;
  dc: () => Dc;
  /** at the load; only where there is a drive */
  read: () => Readings;
}

/** What is reached, or why that cannot be said. */
type Row = (run: Studied, target: Target) => Reached | string;

const noPower = "The source has no resistance, so it has no available power to lose.";
const noSupply = "It needs the supply's voltage, supplyV.";
const inTime = "It is a question of time: it needs a drive, a step or a pulse.";

const rows: Record<TargetQuantity, Row> = {
  loss: (run, target) => over(run, target, run.swept().transducerLossDb, noPower),
  returnLoss: (run, target) => over(run, target, planeOf(run, target).returnLossDb, "Nothing arrives there."),
  vswr: (run, target) => over(run, target, planeOf(run, target).vswr, "Nothing arrives there."),
  delay: (run, target) =>
    run.conditions.drive && !target.bandHz
      ? fromDrive(run, ({ delayS }) => delayS)
      : over(run, target, run.swept().groupDelayS, "No signal arrives at the load."),
  skew: () => "It is a difference between two pairs, and this is one run.",
  level: (run, target) => levelAt(run, target),
  overshoot: (run) => fromDrive(run, ({ overshoot }) => overshoot),
  settling: (run) => fromDrive(run, ({ settlingS }) => settlingS),
  tapDip: ({ circuit, conditions: { drive, temperatureC = 20 } }) =>
    drive ? dipsOfTaps(circuit, drive, temperatureC) : inTime,
  dcDrop: ({ conditions, dc }) => {
    if (conditions.supplyV === undefined) return noSupply;
    const { points } = dc();
    return single(points[0]!.voltageV - points.at(-1)!.voltageV);
  },
  idleBias: ({ conditions, dc }) => {
    if (conditions.supplyV === undefined) return noSupply;
    const levels = dc().points.map(({ voltageV, nodeVoltageV = voltageV }) => Math.abs(nodeVoltageV));
    return { least: Math.min(...levels), greatest: Math.max(...levels) };
  },
  voltage: (run, target) => voltageAlong(run, target),
  power: (run, target) => powerInLoad(run, target),
};

/** Targets that need the run's response over time where it has a drive. */
export function isInTime({ quantity, bandHz }: Target): boolean {
  if (quantity === "delay") return !bandHz;
  return quantity === "overshoot" || quantity === "settling" || quantity === "tapDip" || quantity === "level";
}

/** Quantities that follow from return loss at the source and transducer loss alone. */
export function isSweptAtSource({ quantity, plane }: Target): boolean {
  const isSource = plane === undefined || ("at" in plane && plane.at === "source");
  return quantity === "loss" || ((quantity === "returnLoss" || quantity === "vswr") && isSource);
}

function indices({ conditions, frequencies }: Studied, { bandHz }: Target): number[] {
  return indicesInBand(frequencies, bandHz, conditions.frequencies.length);
}

function over(run: Studied, target: Target, values: Float64Array, whyNot: string): Reached | string {
  const reached = reachedOver(values, indices(run, target));
  return Number.isNaN(reached.least) ? whyNot : reached;
}

const single = (value: number): Reached => ({ least: value, greatest: value });

function planeOf(run: Studied, { plane }: Target): Pick<Sweep, "returnLossDb" | "vswr"> {
  const swept = run.swept();
  if (plane === undefined || ("at" in plane && plane.at === "source")) return swept;
  return swept.atPlanes.find((each) => samePlane(each.plane, plane)) ?? swept;
}

function samePlane(a: Plane, b: Plane): boolean {
  if ("at" in a) return "at" in b && a.at === b.at;
  return "beforeElement" in b && a.beforeElement === b.beforeElement;
}

/** A reading at the load. */
function fromDrive(run: Studied, of: (readings: Readings) => number): Reached | string {
  if (!run.conditions.drive) return inTime;
  const value = of(run.read());
  return Number.isNaN(value) ? "It does not happen within the time looked at." : single(value);
}

/** The level a supply settles at, or without one a drive: at the load end, or at the source's. */
function levelAt(run: Studied, { plane }: Target): Reached | string {
  const { conditions, dc } = run;
  const isAtLoad = plane === undefined || ("at" in plane && plane.at === "load");
  if (conditions.supplyV === undefined && conditions.drive && isAtLoad)
    return fromDrive(run, ({ settledV }) => settledV);
  if (conditions.supplyV === undefined) return noSupply;
  if (plane && !("at" in plane)) return "A level is that of the source end or of the load end.";
  const { points } = dc();
  return single((plane?.at === "source" ? points[0] : points.at(-1))!.voltageV);
}

/** The highest peak voltage along the run for a power that is available, at any frequency of the band. */
function voltageAlong(run: Studied, target: Target): Reached | string {
  const { circuit, frequencies } = run;
  const { availablePowerW, temperatureC } = run.conditions;
  if (availablePowerW === undefined) return "It needs the available power, availablePowerW.";
  const peaks = indices(run, target).map((k) => {
    const wave = standingWave(circuit, frequencies[k]!, availablePowerW, { temperatureC, pointsPerElement: 2 });
    return wave.maxVoltageV * Math.SQRT2;
  });
  return single(Math.max(...peaks));
}

function powerInLoad(run: Studied, target: Target): Reached | string {
  const { availablePowerW } = run.conditions;
  if (availablePowerW === undefined) return "It needs the available power, availablePowerW.";
  const reached = over(run, target, run.swept().transducerLossDb, noPower);
  if (typeof reached === "string") return reached;
  const power = (lossDb: number) => availablePowerW * Math.pow(10, -lossDb / 10);
  return { least: power(reached.greatest), greatest: power(reached.least) };
}

/**
 * Holds a run against its targets.
 * @param targets - each with a least or a greatest value
 * @returns one judgement each, in order; what cannot be worked out is not met, and says why
 * @throws RangeError when the run is impossible
 */
export function judgeTargets(circuit: Circuit, targets: readonly Target[], conditions: TargetConditions): Judgement[] {
  const run = studied(circuit, targets, conditions);
  return targets.map((target) => {
    const reached = rows[target.quantity](run, target);
    if (typeof reached !== "string") return judge(target, reached);
    return { value: NaN, margin: NaN, isMet: false, why: reached };
  });
}

function studied(circuit: Circuit, targets: readonly Target[], conditions: TargetConditions): Studied {
  const { temperatureC } = conditions;
  const frequencies = frequenciesWithBands(conditions.frequencies, targets);
  const planes = targets.flatMap(({ plane }) => plane ?? []);
  let swept: Sweep | undefined;
  let dc: Dc | undefined;
  let read: Readings | undefined;
  return {
    circuit,
    conditions,
    frequencies,
    swept: () => (swept ??= sweep(circuit, frequencies, { temperatureC: temperatureC ?? 20, planes })),
    dc: () => (dc ??= directCurrent(circuit, conditions)),
    read: () => (read ??= readingsAtLoad(circuit, conditions.drive!, temperatureC ?? 20)),
  };
}
