/**
 * A run -> everything the Line view shows. Pure, the same in the browser and on the server; every figure comes from
 * `lib/line`. Values without a finite number are left as the engine gives them; `lib/format` shows them as a dash.
 */
import { DB_PER_NEPER } from "@/lib/line/constants";
import { prepareElements } from "@/lib/line/element-two-port";
import { lengthAlongPath, type Circuit, type Element, type Plane } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { sweep, type Sweep } from "@/lib/line/run";
import { prepareRun } from "@/lib/line/walk";
import { standingWave, type StandingWave } from "@/lib/line/standing-wave";
import { pointsFor, shownFrequencies } from "@/lib/runs/shown";
import { leastReturnLossDb, worstOfSweep, worstOver, type Band, type WorstOver } from "@/lib/runs/worst-over";

export interface Conditions {
  designHz: number;
  bandHz: readonly [number, number] | null;
  availablePowerW: number | null;
  temperatureC: number;
}

export interface Spot {
  inputImpedance: { re: number; im: number };
  sourceReturnLossDb: number;
  sourceVswr: number;
  loadReturnLossDb: number;
  loadVswr: number;
  transducerLossDb: number;
  matchedLossDb: number;
  mismatchLossDb: number;
  extraLossDb: number;
  groupDelayS: number;
}

/** One line of "where the power goes". */
export interface PieceFigures {
  element: number;
  /** of what is laid here: a cable along the path, a stub beside it */
  lengthM: number | null;
  /** metres it adds between source and load */
  pathM: number;
  delayS: number | null;
  electricalLength: number | null;
  matchedLossDb: number;
  /** whether its loss between matched ends is known; of other pieces only the loss they really have here counts */
  isMatched: boolean;
  /** impedance at its source side, looking toward the load */
  impedance: { re: number; im: number };
  /** what it really loses here, power in over power out */
  lossDb: number;
}

export interface Analysis {
  sweep: Sweep;
  sourceReturnLossDb: Float64Array;
  loadReturnLossDb: Float64Array;
  spot: Spot;
  pieces: PieceFigures[];
  /** over the run's band, else at its one frequency */
  worst: WorstOver;
  /** over another band: targets may have one of their own */
  worstOver: (band: Band) => WorstOver;
  /** the run's own band */
  band: Band;
  /** the least return loss a sweep of the band reads at the source with the load missing, and with it shorted */
  masking: { openDb: number; shortDb: number };
  wave: StandingWave | null;
}

const loadPlane: Plane = { at: "load" };

function spotOf(circuit: Circuit, { designHz, temperatureC }: Conditions): { spot: Spot; at: Sweep } {
  const planes: Plane[] = [loadPlane, ...circuit.elements.map((_, beforeElement) => ({ beforeElement }))];
  const at = sweep(circuit, [designHz], { temperatureC, planes });
  const load = at.atPlanes[0]!;
  const spot: Spot = {
    inputImpedance: { re: at.inputImpedance.re[0]!, im: at.inputImpedance.im[0]! },
    sourceReturnLossDb: at.returnLossDb[0]!,
    sourceVswr: at.vswr[0]!,
    loadReturnLossDb: load.returnLossDb[0]!,
    loadVswr: load.vswr[0]!,
    transducerLossDb: at.transducerLossDb[0]!,
    matchedLossDb: at.matchedLossDb[0]!,
    mismatchLossDb: at.mismatchLossDb[0]!,
    extraLossDb: at.extraLossDb[0]!,
    groupDelayS: at.groupDelayS[0]!,
  };
  return { spot, at };
}

function laidLine(element: Element) {
  return element.kind === "cable" || element.kind === "stub" ? element : null;
}

function pieceFigures(circuit: Circuit, { designHz, temperatureC }: Conditions, at: Sweep): PieceFigures[] {
  const s = { re: 0, im: 2 * Math.PI * designHz };
  const twoPorts = prepareElements(circuit, temperatureC);
  return circuit.elements.map((element, index) => {
    const laid = laidLine(element);
    const figures = laid && lineFigures(laid.line.model, [designHz], laid.temperatureC ?? temperatureC);
    const plane = at.atPlanes[index + 1]!;
    return {
      element: index,
      lengthM: laid ? laid.lengthM : lengthAlongPath(element) || null,
      pathM: lengthAlongPath(element),
      delayS: laid && figures ? laid.lengthM * figures.groupDelaySPerM[0]! : null,
      electricalLength: laid && figures ? (laid.lengthM * figures.phaseRadPerM[0]!) / (2 * Math.PI) : null,
      matchedLossDb: twoPorts[index]!(s).matchedLoss * DB_PER_NEPER,
      isMatched: element.kind === "cable" || element.kind === "joint" || element.kind === "pad",
      impedance: { re: plane.impedance.re[0]!, im: plane.impedance.im[0]! },
      lossDb: at.elementLossDb[index]![0]!,
    };
  });
}

/** A source without resistance has no available power, so no wave can be drawn for it. */
function waveOf(
  circuit: Circuit,
  designHz: number,
  powerW: number,
  temperatureC: number,
  pieces: PieceFigures[],
): StandingWave | null {
  const halfWaves = pieces.map(({ electricalLength }) => 2 * (electricalLength ?? 0));
  const total = halfWaves.reduce((sum, count) => sum + count, 0);
  // Where the ripples are too many to be told apart, only the curves that hold them are drawn.
  const perHalfWave = total > 80 ? 8 : 32;
  const pointsPerElement = Math.min(2001, Math.max(51, Math.ceil(Math.max(0, ...halfWaves) * perHalfWave) + 1));
  const { source } = circuit;
  const hasPower = source.kind === "constant" ? source.reOhm > 0 : source.kind === "network" && (source.rOhm ?? 0) > 0;
  return hasPower ? standingWave(circuit, designHz, powerW, { temperatureC, pointsPerElement }) : null;
}

/**
 * Analyses a run.
 * @throws RangeError when the circuit is electrically impossible (a source without resistance and no reference …)
 */
export function analyseRun(
  circuit: Circuit,
  conditions: Conditions,
  points = pointsFor(circuit, conditions),
): Analysis {
  const { designHz, availablePowerW, temperatureC } = conditions;
  const shown = sweep(circuit, shownFrequencies(conditions, points), { temperatureC, planes: [loadPlane] });
  const { spot, at } = spotOf(circuit, conditions);
  const pieces = pieceFigures(circuit, conditions, at);
  const band: Band = conditions.bandHz ?? [designHz, designHz];
  const gone = (kind: "open" | "short") => leastReturnLossDb({ ...circuit, load: { kind } }, band, temperatureC);
  return {
    sweep: shown,
    sourceReturnLossDb: shown.returnLossDb,
    loadReturnLossDb: shown.atPlanes[0]!.returnLossDb,
    spot,
    pieces,
    worst: worstOfSweep(prepareRun(circuit, temperatureC), shown, band),
    worstOver: (other) => worstOver(circuit, other, temperatureC),
    band,
    masking: { openDb: gone("open"), shortDb: gone("short") },
    wave: availablePowerW === null ? null : waveOf(circuit, designHz, availablePowerW, temperatureC, pieces),
  };
}
