/** Dotted paths into a circuit: which figure each names, and what of the run moves with it. */
import type { Circuit, Element, LineModel, PartElement, Termination } from "@/lib/line/element";

/** What a path moves: an element by its index, or one of the ends. */
export type Touched = number | "source" | "load" | "reference";

/** A figure as it stands in the circuit. */
export interface FigurePlace {
  kind: "figure";
  touched: Touched;
  holder: Record<string, unknown>;
  key: string;
}

/** A deviation, in percent, of a line's impedance, velocity or loss. */
export interface LinePlace {
  kind: "line";
  touched: number;
  /** element or branch whose line it is */
  laid: { line: { model: LineModel } };
  figure: "z0Percent" | "velocityFactorPercent" | "lossPercent";
}

/** A deviation, in percent, of a part's value. */
export interface PartPlace {
  kind: "part";
  touched: number;
  part: PartElement;
}

/** Magnitude or angle of the load's reflection. */
export interface ReflectionPlace {
  kind: "reflection";
  touched: "load";
  figure: "reflectionMagnitude" | "reflectionPhase";
}

export type CircuitPlace = FigurePlace | LinePlace | PartPlace | ReflectionPlace;

/** Figures that may be absent and yet be named. */
const mayBeAbsent = new Set(
  // prettier-ignore
  ["temperatureC", "lossTangent", "g0SPerM", "temperatureCoefficientPerK", "lossDb", "lossDbAtOneGhz", "shuntF", "referenceOhm", "q"],
);

const has = (value: object, key: string) => Object.prototype.hasOwnProperty.call(value, key);

/** What stands at the keys, or undefined where the way ends. */
function follow(from: unknown, keys: readonly string[]): unknown {
  let at = from;
  for (const key of keys) {
    if (typeof at !== "object" || at === null || !has(at, key)) return undefined;
    at = (at as Record<string, unknown>)[key];
  }
  return at;
}

function touchedBy([first, second]: readonly string[]): Touched | undefined {
  if (first === "elements") return Number(second);
  if (first === "source" || first === "load") return first;
  return first === "referenceOhm" ? "reference" : undefined;
}

/**
 * The figure a path names.
 * @param circuit - whose own objects the result refers to
 * @param path - dotted, from the circuit: `elements.0.lengthM`, `elements.0.z0Percent`, `load.reflectionPhase` …
 * @throws RangeError, in words, when it names nothing that can be moved
 */
export function circuitPlace(circuit: Circuit, path: string): CircuitPlace {
  const keys = path.split(".");
  const key = keys.pop()!;
  const touched = touchedBy([...keys, key]);
  const holder = follow(circuit, keys);
  if (touched === undefined || typeof holder !== "object" || holder === null)
    throw new RangeError(`circuitPlace: ${path} is no place in this run`);
  if (key.endsWith("Percent") && typeof touched === "number")
    return percentPlace(path, touched, holder as Element, key);
  if (key === "reflectionMagnitude" || key === "reflectionPhase") {
    if (path === `load.${key}`) return { kind: "reflection", touched: "load", figure: key };
    throw new RangeError(`circuitPlace: ${path} is no place in this run; the reflection moved is the load's`);
  }
  const value = has(holder, key) ? (holder as Record<string, unknown>)[key] : undefined;
  if (typeof value !== "number" && !(value === undefined && mayBeAbsent.has(key)))
    throw new RangeError(`circuitPlace: ${path} is not a figure of this run`);
  return { kind: "figure", touched, holder: holder as Record<string, unknown>, key };
}

function percentPlace(path: string, touched: number, holder: Element, key: string): CircuitPlace {
  if (key === "valuePercent") {
    if (holder.kind === "part") return { kind: "part", touched, part: holder };
    throw new RangeError(`circuitPlace: ${path}: only a part has a value to be off by a share of`);
  }
  if (key !== "z0Percent" && key !== "velocityFactorPercent" && key !== "lossPercent")
    throw new RangeError(`circuitPlace: ${path} is no deviation that can be spread`);
  if (!("line" in holder)) throw new RangeError(`circuitPlace: ${path}: only what is cut from a cable has one`);
  return { kind: "line", touched, laid: holder, figure: key };
}

/** Least and greatest value a figure may take; `above` excludes the least itself. */
interface Bounds {
  least?: number;
  above?: number;
  most?: number;
}

const notNegative: Bounds = { least: 0 };
const positive: Bounds = { above: 0 };

const boundsOf: Record<string, Bounds> = {
  lengthM: notNegative,
  riseS: positive,
  r0OhmPerM: notNegative,
  skinCornerRadPerS: positive,
  lInfHPerM: positive,
  cFPerM: positive,
  lossTangent: { least: 0, most: 1 },
  g0SPerM: notNegative,
  reOhm: notNegative,
  rOhm: notNegative,
  lH: notNegative,
  cF: notNegative,
  q: positive,
  qAtHz: positive,
  lossDb: notNegative,
  lossDbAtOneGhz: notNegative,
  inputOhm: positive,
  outputOhm: positive,
  referenceOhm: positive,
  shuntF: notNegative,
  turnsRatio: positive,
  reflectionMagnitude: { least: 0, most: 1 },
  z0Percent: { above: -100 },
  velocityFactorPercent: { above: -100 },
  lossPercent: { above: -100 },
  valuePercent: { above: -100 },
};

/** @throws RangeError, in words, when a figure cannot take the value */
export function requireValue(path: string, value: number): void {
  const key = path.slice(path.lastIndexOf(".") + 1);
  const { least = -Infinity, above = -Infinity, most = Infinity } = boundsOf[key] ?? {};
  if (!(Math.abs(value) < Infinity))
    throw new RangeError(`requireValue: ${path} must be a finite number, got ${value}`);
  if (value < least) throw new RangeError(`requireValue: ${path} must be at least ${least}, got ${value}`);
  if (value <= above) throw new RangeError(`requireValue: ${path} must be more than ${above}, got ${value}`);
  if (value > most) throw new RangeError(`requireValue: ${path} must be at most ${most}, got ${value}`);
  if (key === "paralleled") throw new RangeError(`requireValue: ${path} is a whole number and cannot be moved`);
}

/** Whether a termination shows the same impedance at every frequency. */
export function isSteady(termination: Termination): boolean {
  return termination.kind === "constant" || termination.kind === "open" || termination.kind === "short";
}
