/** From what a meter reads on a sample of known length to the model of its cable. */
import { nominalFigures, perMetre } from "@/lib/line/cable";
import { skinCornerOf } from "@/lib/line/closed-mapping";
import { requirePositive } from "@/lib/line/conductor-shape";
import type { Conductor, ConductorForm, LineModel } from "@/lib/line/element";
import { type SampleReading, sampleReading } from "@/lib/line/sample-meter";

export interface Readings {
  /** metre, above 0 */
  length: number;
  /** hertz, above 0; default 1 kHz */
  meterFrequency?: number;
  /** farad, far end open */
  openCapacitance?: number;
  /** henry, far end short */
  shortInductance?: number;
  /** ohm, far end short */
  shortResistance?: number;
  /** second, one way, of a fast edge */
  delay?: number;
  /** conductors' part of the attenuation, dB/m per √Hz; needs the resistance */
  k1?: number;
  /** of the one conductor term; default `sqrt` */
  form?: ConductorForm;
}

/** What a model made of readings does not know. */
export type ReadingNote = "innerInductanceKept" | "noResistance" | "cornerFromInductance" | "electricallyLong";

export interface ReadModel {
  model: LineModel;
  /** what the meter should read on this model, at its own frequency */
  predicted: SampleReading;
  /**
   * inductance inside the conductors as the readings have it, H/m: shorted reading, the sample's length taken out, less
   * L∞ of capacitance and delay; NaN where these do not all exist
   */
  innerInductance: number;
  notes: ReadingNote[];
}

/** Unknowns of the line while they are being found. */
interface Trial {
  c: number;
  l: number;
  r0: number;
  /** rad/s; Infinity where it is not known */
  corner: number;
}

const mostRounds = 200;
/** Half steps in L∞: with k1 what is inside the conductors grows with the square of it, and whole steps would swing. */
const damping = 0.5;
/** Above this phase, radians, the shorted sample no longer reads as a coil that can be taken apart. */
const longestPhase = 1.4;
/** Above this phase the sample's length changes what is read by some per cent. */
const longPhase = 0.3;

function modelOf({ c, l, r0, corner }: Trial, form: ConductorForm): LineModel {
  const hasCorner = form !== "constant" && corner > 0 && corner < Infinity && r0 > 0;
  const conductor: Conductor = hasCorner
    ? { form, r0OhmPerM: r0, skinCornerRadPerS: corner }
    : { form: "constant", r0OhmPerM: r0 };
  return { conductors: [conductor], lInfHPerM: l, cFPerM: c };
}

/**
 * The model whose sample reads what was read, the sample's length taken out exactly. C and L∞ come from capacitance and
 * delay where both are there, else from either and the inductance; R0 from the resistance; the skin corner from k1, else
 * from what the shorted reading has more than L∞.
 * @throws RangeError when fewer than two of capacitance, inductance and delay are given, k1 comes without a resistance,
 * a reading is not positive, the sample is too long for the meter's frequency, or the readings belong to no line
 * Source: open and short one-port of a line, D. M. Pozar, Microwave Engineering, 4th ed., section 2.1, solved by repeated
 * substitution; internal inductance R0/(2ωs) of a conductor at dc.
 */
export function modelFromReadings(readings: Readings): ReadModel {
  const asked = { meterFrequency: 1e3, form: "sqrt" as const, ...readings };
  check(asked);
  const { length, meterFrequency, delay, openCapacitance, shortInductance, form } = asked;
  const knowsInside = openCapacitance !== undefined && delay !== undefined && shortInductance !== undefined;
  let trial = start(asked);
  let predicted = sampleReading(modelOf(trial, form), length, meterFrequency);
  let inner = NaN;
  for (let round = 0; round < mostRounds; round++) {
    const next = improved(trial, predicted, asked);
    if (!Object.values(next).every((value) => value >= 0) || !(next.c > 0 && next.l > 0)) refuseNoLine();
    const change = Math.max(...keys.map((key) => relative(next[key], trial[key])));
    trial = next;
    predicted = sampleReading(modelOf(trial, form), length, meterFrequency);
    if (change < 1e-13) break;
    if (round === mostRounds - 1 && change > 1e-9) refuseNoLine();
  }
  const model = modelOf(trial, form);
  const phase = 2 * Math.PI * meterFrequency * length * nominalFigures(model).delay;
  if (phase > longestPhase) throw new RangeError("modelFromReadings: the sample is too long for meterFrequency");
  if (knowsInside) inner = innerInductance(trial, asked);
  return { model, predicted, innerInductance: inner, notes: notesOf(asked, model, phase) };
}

const keys = ["c", "l", "r0", "corner"] as const;
const relative = (a: number, b: number) => (a === b ? 0 : Math.abs(a - b) / Math.max(Math.abs(a), Math.abs(b)));

function refuseNoLine(): never {
  throw new RangeError("modelFromReadings: no line reads like this; a reading, the length or the frequency is wrong");
}

type Asked = Readings & { meterFrequency: number; form: ConductorForm };

/** First guess: the sample as short as can be. */
function start({ length, openCapacitance, shortInductance, shortResistance, delay = NaN }: Asked): Trial {
  const perLength = delay / length;
  const c =
    openCapacitance !== undefined ? openCapacitance / length : (perLength ** 2 * length) / (shortInductance ?? NaN);
  const l = openCapacitance !== undefined && delay > 0 ? perLength ** 2 / c : (shortInductance ?? NaN) / length;
  return { c, l, r0: (shortResistance ?? 0) / length, corner: Infinity };
}

/** One round: each unknown from its own reading, by how far the model's is from it. */
function improved(trial: Trial, predicted: SampleReading, asked: Asked): Trial {
  const { length, openCapacitance, shortInductance, shortResistance, delay, k1 } = asked;
  const perLength = (delay ?? NaN) / length;
  const next = { ...trial };
  if (openCapacitance !== undefined) next.c = (trial.c * openCapacitance) / predicted.openCapacitance;
  if (openCapacitance !== undefined && delay !== undefined) next.l = perLength ** 2 / next.c;
  else if (shortInductance !== undefined)
    next.l = trial.l + (damping * (shortInductance - predicted.shortInductance)) / length;
  if (openCapacitance === undefined) next.c = perLength ** 2 / next.l;
  if (shortResistance !== undefined) next.r0 = (trial.r0 * shortResistance) / predicted.shortResistance;
  if (k1 !== undefined) next.corner = skinCornerOf({ z0: Math.sqrt(next.l / next.c), r0: next.r0 }, k1);
  else if (openCapacitance !== undefined && delay !== undefined && shortInductance !== undefined && next.r0 > 0) {
    const inner = innerInductance(trial, asked);
    // the term's inductance at the meter's frequency is below that at dc, which the corner is counted from
    const now = trial.corner < Infinity ? innerOf(trial, asked) : 0;
    const atDc = trial.r0 / (2 * trial.corner);
    next.corner = inner > 0 ? next.r0 / (2 * Math.max(inner * (now > 0 ? atDc / now : 1), 0)) : Infinity;
  }
  return next;
}

/** Inductance of the conductor term of a trial at the meter's frequency, H/m. */
function innerOf(trial: Trial, { form, meterFrequency }: Asked): number {
  const omega = 2 * Math.PI * meterFrequency;
  return perMetre(modelOf(trial, form), { re: 0, im: omega }).z.im / omega - trial.l;
}

/** What the shorted reading has beyond L∞, per metre, once the sample's length is taken out; H/m. */
function innerInductance(trial: Trial, asked: Asked): number {
  const { length, meterFrequency, form, shortInductance = NaN } = asked;
  const predicted = sampleReading(modelOf(trial, form), length, meterFrequency);
  return innerOf(trial, asked) + (shortInductance - predicted.shortInductance) / length;
}

function notesOf(
  { openCapacitance, delay, shortInductance, shortResistance, k1 }: Asked,
  model: LineModel,
  phase: number,
) {
  const usesInductance = openCapacitance === undefined || delay === undefined;
  const hasCorner = model.conductors[0]?.skinCornerRadPerS !== undefined;
  const notes: (ReadingNote | false)[] = [
    usesInductance && k1 === undefined && "innerInductanceKept",
    shortResistance === undefined && "noResistance",
    k1 === undefined && hasCorner && shortInductance !== undefined && "cornerFromInductance",
    phase > longPhase && "electricallyLong",
  ];
  return notes.filter((note) => note !== false);
}

function check(asked: Asked): void {
  const { form: _, ...values } = asked;
  const given = Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined));
  requirePositive("modelFromReadings", given as Record<string, number>);
  const { openCapacitance, shortInductance, delay } = asked;
  if ([openCapacitance, shortInductance, delay].filter((each) => each !== undefined).length < 2)
    throw new RangeError("modelFromReadings: two of openCapacitance, shortInductance and delay are needed");
  if (asked.k1 !== undefined && asked.shortResistance === undefined)
    throw new RangeError("modelFromReadings: k1 needs shortResistance");
}
