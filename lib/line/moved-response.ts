/** What a run answers with at the source while its figures move. */
import { frequencyColumns } from "@/lib/line/line-columns";
import { movedCircuit, type MovedCircuit } from "@/lib/line/moved-circuit";
import { movedSteps, type MovedStep } from "@/lib/line/moved-steps";
import type { Termination } from "@/lib/line/element";
import { portImpedance, terminationPort } from "@/lib/line/termination";
import { copyWave, normalise, waveColumns, type WaveColumns } from "@/lib/line/wave-columns";
import { isSteady } from "@/lib/line/circuit-path";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { Circuit } from "@/lib/line/element";

export interface MovedResponse {
  moved: MovedCircuit;
  /**
   * Return loss at the source plane and transducer loss, dB, with a value at every path; as `sweep` gives them.
   * @param values - in the order of the paths
   * @param returnLossDb - written from `at` on, as many as there are frequencies
   */
  respond: (values: ArrayLike<number>, returnLossDb: Float64Array, transducerLossDb: Float64Array, at: number) => void;
}

/**
 * @param frequencies - hertz, each above 0
 * @param temperatureC - °C, for elements without one of their own
 * @throws RangeError, in words, when the run is impossible or a path names nothing that can be moved
 */
export function movedResponse(
  circuit: Circuit,
  paths: readonly string[],
  frequencies: ArrayLike<number>,
  temperatureC = 20,
): MovedResponse {
  const { kind } = circuit.source;
  if (kind === "open" || kind === "sampled") throw new RangeError(`movedResponse: source must not be ${kind}`);
  const columns = frequencyColumns(frequencies);
  const moved = movedCircuit(circuit, paths);
  const { touched } = moved;
  const isMoved = (index: number) =>
    touched.has(index) || (index < 0 && (touched.has("source") || touched.has("reference")));
  const steps = movedSteps({ circuit: moved.circuit, isMoved, temperatureC, columns });
  const start = startOf(moved, columns.omega, steps);
  const source = sourceColumns(moved, columns.omega);
  const wave = waveColumns(columns.omega.length);
  const respond: MovedResponse["respond"] = (values, returnLossDb, transducerLossDb, at) => {
    moved.put(values);
    start.put(wave);
    for (const step of start.steps) step.apply(wave);
    readSource(wave, source(), start.power(), returnLossDb, transducerLossDb, at);
  };
  return { moved, respond };
}

interface Start {
  /** the wave where the first step that moves begins */
  put: (wave: WaveColumns) => void;
  /** power in the load at every frequency, in the unit of the load's wave */
  power: () => Float64Array;
  steps: MovedStep[];
}

/** Where the load stays as it is, so does all up to the first element that moves. */
function startOf({ circuit, touched }: MovedCircuit, omega: Float64Array, steps: MovedStep[]): Start {
  const begin = waveColumns(omega.length);
  const power = new Float64Array(omega.length);
  const fill = () => {
    putPort(begin, circuit.load, omega);
    for (let k = 0; k < power.length; k++)
      power[k] = Math.max(0, begin.vRe[k]! * begin.iRe[k]! + begin.vIm[k]! * begin.iIm[k]!);
    normalise(begin);
  };
  if (touched.has("load")) {
    const put = (wave: WaveColumns) => {
      fill();
      copyWave(begin, wave);
    };
    return { put, power: () => power, steps };
  }
  fill();
  const firstMoved = steps.findIndex(({ isFixed }) => !isFixed);
  const before = steps.slice(0, firstMoved < 0 ? steps.length : firstMoved);
  for (const step of before) step.apply(begin);
  return { put: (wave) => copyWave(begin, wave), power: () => power, steps: steps.slice(before.length) };
}

function putPort(wave: WaveColumns, termination: Termination, omega: Float64Array): void {
  wave.scale.fill(0);
  const steady = isSteady(termination) ? terminationPort(termination, { re: 0, im: 0 }) : undefined;
  for (let k = 0; k < omega.length; k++) {
    const { v, i } = steady ?? terminationPort(termination, { re: 0, im: omega[k]! });
    wave.vRe[k] = v.re;
    wave.vIm[k] = v.im;
    wave.iRe[k] = i.re;
    wave.iIm[k] = i.im;
  }
}

interface SourceColumns {
  re: Float64Array;
  im: Float64Array;
}

function sourceColumns({ circuit, touched }: MovedCircuit, omega: Float64Array): () => SourceColumns {
  const columns = { re: new Float64Array(omega.length), im: new Float64Array(omega.length) };
  const fill = () => {
    for (let k = 0; k < omega.length; k++) {
      const { re, im } = portImpedance(terminationPort(circuit.source, { re: 0, im: omega[k]! }));
      columns.re[k] = re;
      columns.im[k] = im;
    }
    return columns;
  };
  fill();
  return touched.has("source") ? fill : () => columns;
}

/** Reflections below this are rounding, as in `returnLossDb`. */
const noReflection = 1e-15;
const dbPerPowerNeper = 10 / Math.LN10;

/** |V − Zs*·I|/|V + Zs·I|, and |V + Zs·I|²/(4·Re Zs·P) of the power P in the load. */
function readSource(
  { vRe, vIm, iRe, iIm, scale }: WaveColumns,
  { re: sourceRe, im: sourceIm }: SourceColumns,
  power: Float64Array,
  returnLossDb: Float64Array,
  transducerLossDb: Float64Array,
  at: number,
): void {
  for (let k = 0; k < vRe.length; k++) {
    const r = sourceRe[k]!;
    const x = sourceIm[k]!;
    const uRe = vRe[k]! - x * iIm[k]!;
    const uIm = vIm[k]! + x * iRe[k]!;
    const backRe = uRe - r * iRe[k]!;
    const backIm = uIm - r * iIm[k]!;
    const drivenRe = uRe + r * iRe[k]!;
    const drivenIm = uIm + r * iIm[k]!;
    const driven = drivenRe * drivenRe + drivenIm * drivenIm;
    const square = (backRe * backRe + backIm * backIm) / driven;
    returnLossDb[at + k] =
      square < noReflection * noReflection ? Infinity : Math.max(0, -dbPerPowerNeper * Math.log(square));
    transducerLossDb[at + k] = transducerLoss(driven, r, power[k]!, scale[k]!);
  }
}

function transducerLoss(driven: number, resistance: number, power: number, scale: number): number {
  if (!(resistance > 0 && resistance < Infinity)) return NaN;
  if (!(power > 0) || scale === Infinity) return Infinity;
  return Math.max(0, dbPerPowerNeper * Math.log(driven / (4 * resistance * power)) + scale * DB_PER_NEPER);
}
