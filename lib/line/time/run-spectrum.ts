/** Voltages of a run over a whole grid of s: the walk of `walk.ts` from load to source, one element at all s at a time. */
import { prepareElement } from "@/lib/line/element-two-port";
import type { CableElement, Circuit, JointElement, LineModel, StubElement } from "@/lib/line/element";
import { jointReference, jointTwoPort } from "@/lib/line/joint";
import { atTemperature } from "@/lib/line/temperature";
import { decayOf } from "@/lib/line/time/decay";
import { jointLine } from "@/lib/line/time/joint-line";
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";
import { lineSpectrum, type LineSpectrum } from "@/lib/line/time/line-spectrum";
import { copyOf, spectrum, type Spectrum } from "@/lib/line/time/spectrum";
import * as port from "@/lib/line/time/port-spectrum";
import type { PortSpectrum } from "@/lib/line/time/port-spectrum";
import { rationalPart, rationalTermination } from "@/lib/line/time/rational-port";

interface Surroundings {
  grid: LaplaceGrid;
  temperatureC: number;
  lines: (model: LineModel, temperatureC: number) => LineSpectrum;
}

/** Lines of a run, each worked out once for its model (by identity) and temperature. */
function lineSpectra(grid: LaplaceGrid): Surroundings["lines"] {
  const known = new Map<LineModel, Map<number, LineSpectrum>>();
  return (model, temperatureC) => {
    const ofModel = known.get(model) ?? new Map<number, LineSpectrum>();
    known.set(model, ofModel);
    const line = ofModel.get(temperatureC) ?? lineSpectrum(atTemperature(model, temperatureC).model, grid);
    ofModel.set(temperatureC, line);
    return line;
  };
}

/** A plane that is looked at, as the walk passed it. */
interface Passed {
  v: Spectrum;
  /** none at the source and at the load */
  theta?: Spectrum;
}

/** After this many elements values are brought back to about 1, so that no chain of them overflows. */
const normaliseEvery = 8;

/**
 * Voltage at planes of a run over a grid, for an e.m.f. over the same grid.
 * @param planes - 0 is the source, n before element n, the number of elements the load
 * @param emf - of the source; 1 at every s without it
 * @returns one spectrum a plane, in the order asked; 0 behind what lets nothing through
 * @throws RangeError when an element is impossible, the source is open, or something is known on the imaginary axis only
 */
export function runSpectrum(
  circuit: Circuit,
  planes: readonly number[],
  grid: LaplaceGrid,
  options: { temperatureC?: number; emf?: Spectrum } = {},
): Spectrum[] {
  const { source, elements, load } = circuit;
  if (source.kind === "open") throw new RangeError("runSpectrum: source must not be open");
  const sourcePort = rationalTermination(source);
  const around: Surroundings = { grid, temperatureC: options.temperatureC ?? 20, lines: lineSpectra(grid) };
  const at = port.portSpectrum(rationalTermination(load), grid);
  const asked = new Set(planes);
  const passed = new Map<number, Passed>();
  const look = (plane: number) => {
    if (!asked.has(plane)) return;
    // the walk ends at the source, whose values nothing writes over any more; at the load nothing lies behind
    const v = plane === 0 ? at.v : copyOf(at.v);
    passed.set(plane, plane === 0 || plane === elements.length ? { v } : { v, theta: copyOf(at.theta) });
  };
  look(elements.length);
  for (let k = elements.length - 1; k >= 0; k--) {
    if (!step(at, circuit, k, around)) passed.clear();
    if (k % normaliseEvery === normaliseEvery - 1) port.normalise(at);
    look(k);
  }
  const perDrive = overDrive(at, port.branchSpectrum(sourcePort, grid), options.emf);
  for (const [plane, { v, theta }] of passed) {
    multiply(v, perDrive);
    if (plane > 0) multiply(v, decayOf(theta === undefined ? at.theta : between(theta, at.theta), 1));
  }
  return planes.map((plane) => passed.get(plane)?.v ?? spectrum(grid.count));
}

/** From plane k + 1 to plane k; false where nothing gets through. */
function step(at: PortSpectrum, circuit: Circuit, k: number, around: Surroundings): boolean {
  const element = circuit.elements[k]!;
  const temperatureC = ("temperatureC" in element ? element.temperatureC : undefined) ?? around.temperatureC;
  switch (element.kind) {
    case "cable":
      alongCable(at, element, temperatureC, around);
      return true;
    case "stub":
      return branch(at, element.connection, stubPort(element, temperatureC, around));
    case "shunt":
      return branch(at, "shunt", port.branchSpectrum(rationalTermination(element.termination), around.grid));
    case "part":
      prepareElement(element);
      return branch(at, element.connection, port.branchSpectrum(rationalPart(element), around.grid));
    case "joint":
      alongJoint(at, element, neededReference(circuit, k), around.grid);
      return true;
    default:
      port.throughAny(at, prepareElement(element, { temperatureC }), around.grid);
      return true;
  }
}

function branch(at: PortSpectrum, connection: "shunt" | "series", of: Pick<PortSpectrum, "v" | "i">): boolean {
  return connection === "shunt" ? port.acrossBranch(at, of) : port.alongBranch(at, of);
}

function alongCable(
  at: PortSpectrum,
  element: CableElement | StubElement,
  temperatureC: number,
  { lines }: Surroundings,
): void {
  const { line, lengthM, paralleled = 1 } = element;
  if (!(lengthM >= 0 && lengthM < Infinity))
    throw new RangeError(`runSpectrum: lengthM must be at least 0, got ${lengthM}`);
  if (!(paralleled >= 1 && Number.isInteger(paralleled)))
    throw new RangeError(`runSpectrum: paralleled must be a whole number of at least 1, got ${paralleled}`);
  if (lengthM > 0) port.throughLine(at, lines(line.model, temperatureC), lengthM, paralleled);
}

function stubPort(element: StubElement, temperatureC: number, around: Surroundings): PortSpectrum {
  const end = typeof element.end === "string" ? ({ kind: element.end } as const) : element.end;
  const at = port.portSpectrum(rationalTermination(end), around.grid);
  alongCable(at, element, temperatureC, around);
  return at;
}

/** @throws RangeError where nothing says what impedance a joint's loss is stated in */
function neededReference({ elements, source, referenceOhm }: Circuit, k: number): number {
  const resistance = source.kind === "constant" && source.reOhm > 0 ? source.reOhm : undefined;
  const found = jointReference(elements, k) ?? referenceOhm ?? resistance;
  if (found !== undefined) return found;
  throw new RangeError("runSpectrum: a joint in a run without cable needs a referenceOhm");
}

/** The shunt capacitance is on the load side of the loss; the loss is a line of θ nepers in the joint's impedance. */
function alongJoint(at: PortSpectrum, joint: JointElement, referenceOhm: number, grid: LaplaceGrid): void {
  jointTwoPort(joint, referenceOhm);
  const { lossDb = 0, lossDbAtOneGhz = 0, shuntF = 0 } = joint;
  if (shuntF > 0) port.acrossBranch(at, port.branchSpectrum({ v: [1, 0, 0], i: [0, shuntF, 0] }, grid));
  if (lossDb === 0 && lossDbAtOneGhz === 0) return;
  port.throughLine(at, jointLine(lossDb, lossDbAtOneGhz, referenceOhm, grid), 1, 1);
}

/** e.m.f. times source.i / (source.i·v + source.v·i), which every voltage of the walk is multiplied by. */
function overDrive({ v, i }: PortSpectrum, source: Pick<PortSpectrum, "v" | "i">, emf: Spectrum | undefined): Spectrum {
  const result = spectrum(v.re.length);
  for (let k = 0; k < v.re.length; k++) {
    const sRe = source.i.re[k]!;
    const sIm = source.i.im[k]!;
    const zRe = source.v.re[k]!;
    const zIm = source.v.im[k]!;
    const re = sRe * v.re[k]! - sIm * v.im[k]! + (zRe * i.re[k]! - zIm * i.im[k]!);
    const im = sRe * v.im[k]! + sIm * v.re[k]! + (zRe * i.im[k]! + zIm * i.re[k]!);
    const perSize = 1 / (re * re + im * im);
    const perRe = (sRe * re + sIm * im) * perSize;
    const perIm = (sIm * re - sRe * im) * perSize;
    const eRe = emf === undefined ? 1 : emf.re[k]!;
    const eIm = emf === undefined ? 0 : emf.im[k]!;
    result.re[k] = perRe * eRe - perIm * eIm;
    result.im[k] = perRe * eIm + perIm * eRe;
  }
  return result;
}

/** What lies between the source and here. */
function between(here: Spectrum, atSource: Spectrum): Spectrum {
  for (let k = 0; k < here.re.length; k++) {
    here.re[k] = atSource.re[k]! - here.re[k]!;
    here.im[k] = atSource.im[k]! - here.im[k]!;
  }
  return here;
}

function multiply(v: Spectrum, by: Spectrum): void {
  for (let k = 0; k < v.re.length; k++) {
    const re = v.re[k]!;
    v.re[k] = re * by.re[k]! - v.im[k]! * by.im[k]!;
    v.im[k] = re * by.im[k]! + v.im[k]! * by.re[k]!;
  }
}
