/** Quantities that are not exactly what they are drawn as, and values for them. */
import { circuitPlace, requireValue } from "@/lib/line/circuit-path";
import { place, type Distribution } from "@/lib/line/distribution";
import type { Circuit } from "@/lib/line/element";
import { drawnReflection } from "@/lib/line/moved-load";
import { randomStream, type Random } from "@/lib/line/random";

export interface Spread {
  /** see `circuitPlace` */
  path: string;
  /** lowest and highest: SI, radian for a phase, deviations in percent where the path says so */
  limits: readonly [number, number];
  /** default uniform */
  distribution?: Distribution | undefined;
}

/** Paths of which all corners are looked at; each doubles the work. */
export const mostCornerPaths = 12;

/** @throws RangeError, in words, when limits are not in order or not possible */
export function requireSpread({ path, limits: [low, high] }: Spread): void {
  requireValue(path, low);
  requireValue(path, high);
  if (low > high) throw new RangeError(`requireSpread: the limits of ${path} are not in order, ${low} and ${high}`);
}

/** Values one after the other; the array is written over. */
export type Values = (into: Float64Array) => void;

/**
 * Draws within limits. Every quantity has random numbers of its own, in the order of the paths: more draws go on where
 * fewer end, and other limits move the same draws.
 * @param seed - whole number from 0 to 2^32 − 1
 */
export function drawsOf(spread: readonly Spread[], seed: number): Values {
  const streams: Random[] = spread.map((_, index) => randomStream(seed, index));
  const shapes = spread.map(({ distribution = "uniform" }) => place[distribution]);
  return (into) => {
    for (let n = 0; n < spread.length; n++) {
      const [low, high] = spread[n]!.limits;
      const value = (low + high) / 2 + (shapes[n]!(streams[n]!()) * (high - low)) / 2;
      into[n] = Math.min(high, Math.max(low, value));
    }
  };
}

/** A corner: bit n of its number says whether quantity n is at its upper limit. */
export function putCorner(spread: readonly Spread[], corner: number, into: Float64Array): void {
  for (let n = 0; n < spread.length; n++) into[n] = spread[n]!.limits[(corner >> n) & 1]!;
}

/** A quantity as it is drawn; the middle of its limits where the run does not say. */
export function asDrawn(circuit: Circuit, { path, limits }: Spread, temperatureC = 20): number {
  const place = circuitPlace(circuit, path);
  const middle = (limits[0] + limits[1]) / 2;
  if (place.kind === "line" || place.kind === "part") return 0;
  if (place.kind === "reflection") {
    const drawn = drawnReflection(circuit);
    return drawn ? drawn[place.figure] : middle;
  }
  const value = place.holder[place.key];
  if (typeof value === "number") return value;
  return place.key === "temperatureC" ? temperatureC : place.key === "lossTangent" ? 0 : middle;
}
