/** A circuit some of whose figures are put anew again and again. */
import {
  circuitPlace,
  requireValue,
  type CircuitPlace,
  type LinePlace,
  type PartPlace,
  type Touched,
} from "@/lib/line/circuit-path";
import type { Circuit, LineModel } from "@/lib/line/element";
import { loadMover } from "@/lib/line/moved-load";

export interface MovedCircuit {
  /** one object, whose moved parts are written over; what is not moved is that of the circuit given */
  circuit: Circuit;
  touched: ReadonlySet<Touched>;
  /** Puts a value at every path, in their order. */
  put: (values: ArrayLike<number>) => void;
}

/**
 * @param paths - each once; see `circuitPlace`. A share in percent is of what stands there, or of the value that
 * another path puts there. What one path of `load.reflectionMagnitude` and `load.reflectionPhase` leaves open is that
 * of the load as drawn; both are in the run's reference.
 * @throws RangeError, in words, when a path names nothing that can be moved, or one is named twice
 */
export function movedCircuit(circuit: Circuit, paths: readonly string[]): MovedCircuit {
  const twice = paths.find((path, index) => paths.indexOf(path) < index);
  if (twice !== undefined) throw new RangeError(`movedCircuit: ${twice} is named twice`);
  const touched = new Set(paths.map((path) => circuitPlace(circuit, path).touched));
  const own = <T>(part: T, key: Touched): T => (touched.has(key) ? structuredClone(part) : part);
  const copy: Circuit = {
    ...circuit,
    source: own(circuit.source, "source"),
    elements: circuit.elements.map((element, index) => own(element, index)),
    load: own(circuit.load, "load"),
  };
  const places = paths.map((path) => circuitPlace(copy, path));
  const parts = places.filter((place) => place.kind === "part");
  const finish = [...lineMovers(places), ...parts.map((place) => partMover(place, places)), ...loadMover(copy, places)];
  const put = (values: ArrayLike<number>) => {
    places.forEach((place, index) => {
      if (place.kind === "figure") place.holder[place.key] = values[index];
    });
    for (const move of finish) move(values);
  };
  return { circuit: copy, touched, put };
}

type Mover = (values: ArrayLike<number>) => void;

/** For every line that has a deviation: its model anew from the one drawn. */
function lineMovers(places: readonly CircuitPlace[]): Mover[] {
  const ofLines = places.filter((place) => place.kind === "line");
  const laid = [...new Set(ofLines.map((place) => place.laid))];
  return laid.map((each) => {
    const drawn = each.line.model;
    const model = structuredClone(drawn);
    each.line = { ...each.line, model };
    const index = (figure: LinePlace["figure"]) =>
      places.findIndex((place) => place.kind === "line" && place.laid === each && place.figure === figure);
    const [z0, velocityFactor, loss] = [index("z0Percent"), index("velocityFactorPercent"), index("lossPercent")];
    const factor = (values: ArrayLike<number>, at: number) => (at < 0 ? 1 : 1 + values[at]! / 100);
    return (values) => deviate(model, drawn, factor(values, z0), factor(values, velocityFactor), factor(values, loss));
  });
}

/**
 * C = 1/(z0·c·VF) and L∞ = z0/(c·VF) follow impedance and velocity; of the conductors and the dielectric the loss at
 * high frequency is multiplied, as temperature slopes do it: ωs/F², tan δ·F. The dc resistance stays.
 */
function deviate(model: LineModel, drawn: LineModel, z0: number, velocityFactor: number, loss: number): void {
  model.lInfHPerM = (drawn.lInfHPerM * z0) / velocityFactor;
  model.cFPerM = drawn.cFPerM / (z0 * velocityFactor);
  model.lossTangent = (drawn.lossTangent ?? 0) * loss;
  model.g0SPerM = drawn.g0SPerM ?? 0;
  if (drawn.temperatureCoefficientPerK !== undefined)
    model.temperatureCoefficientPerK = drawn.temperatureCoefficientPerK;
  for (let n = 0; n < drawn.conductors.length; n++) {
    const { r0OhmPerM, skinCornerRadPerS } = drawn.conductors[n]!;
    model.conductors[n]!.r0OhmPerM = r0OhmPerM;
    if (skinCornerRadPerS !== undefined) model.conductors[n]!.skinCornerRadPerS = skinCornerRadPerS / (loss * loss);
  }
}

function partMover(place: PartPlace, places: readonly CircuitPlace[]): Mover {
  const { part } = place;
  const key = (["rOhm", "lH", "cF"] as const).find((each) => part[each] !== undefined)!;
  const drawn = part[key]!;
  const isOwnValue = (each: CircuitPlace) => each.kind === "figure" && Object.is(each.holder, part) && each.key === key;
  const base = places.findIndex(isOwnValue);
  const own = places.indexOf(place);
  return (values) => {
    part[key] = (base < 0 ? drawn : values[base]!) * (1 + values[own]! / 100);
  };
}

/**
 * A circuit with other values at some paths; the one given stays as it is.
 * @throws RangeError, in words, as `movedCircuit`, and when a figure cannot take its value
 */
export function withValues(circuit: Circuit, values: Readonly<Record<string, number>>): Circuit {
  const paths = Object.keys(values);
  for (const path of paths) requireValue(path, values[path]!);
  const moved = movedCircuit(circuit, paths);
  moved.put(Object.values(values));
  return moved.circuit;
}
