/** Whether readings that say more than is needed agree with each other. */
import { nominalFigures } from "@/lib/line/cable";
import { agreementLimits } from "@/lib/line/per-length";
import type { ReadModel, Readings } from "@/lib/line/readings";

export interface ReadingCheck {
  check: "shortInductance" | "velocityFactor" | "delays";
  /** as read, or as it follows from what was read; SI */
  given: number;
  /** what it should be; the nearest such value where there is a range */
  expected: number;
  /** given over expected, less 1 */
  deviation: number;
  verdict: "fine" | "look" | "contradiction";
}

/**
 * Inductance inside the conductors that cables have at most, H/m: two round wires have μ0/4π = 0.1 µH/m far apart, half
 * as much again where they all but touch; a coaxial inner conductor half of that, its shield a little.
 */
const mostInside = 0.2e-6;

function checkOf(check: ReadingCheck["check"], given: number, expected: number): ReadingCheck {
  const deviation = given / expected - 1;
  const size = Math.abs(deviation);
  const verdict = size <= agreementLimits.fine ? "fine" : size <= agreementLimits.look ? "look" : "contradiction";
  return { check, given, expected, deviation, verdict };
}

/**
 * @param roundTrip - second, there and back, where it was read beside the one-way delay
 * @param read - what `modelFromReadings` made of the readings
 */
export function checkReadings(readings: Readings, roundTrip: number | undefined, read: ReadModel): ReadingCheck[] {
  const { length, delay, shortInductance, k1 } = readings;
  const { model, predicted, innerInductance } = read;
  const checks: ReadingCheck[] = [];
  if (delay !== undefined && roundTrip !== undefined) checks.push(checkOf("delays", roundTrip / 2, delay));
  if (shortInductance !== undefined && !Number.isNaN(innerInductance)) {
    const inside = Math.min(Math.max(innerInductance, 0), mostInside);
    // with k1 the model says how much is inside; without, anything that a cable can have is as good
    const expected =
      k1 === undefined ? shortInductance - (innerInductance - inside) * length : predicted.shortInductance;
    checks.push(checkOf("shortInductance", shortInductance, expected));
  }
  const { velocityFactor } = nominalFigures(model);
  return [...checks, checkOf("velocityFactor", velocityFactor, Math.min(velocityFactor, 1))];
}
