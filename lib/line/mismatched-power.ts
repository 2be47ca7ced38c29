/**
 * Power, voltage and current on a line that ends in a mismatch, from the size of the reflection alone. For a line whose
 * impedance is real and whose loss is spread over its length; where a run is known whole, `standing-wave.ts` is exact.
 */
import { magnitudeThroughLine } from "@/lib/line/reflection";
import { abs, add, arg, multiply, ONE, polar, type Complex } from "@/lib/line/complex";
import { wavelengths } from "@/lib/line/match/line-angle";

/** The waves at one place, watt; net is what goes on toward the load. */
export interface WavePowers {
  /** |Γ| here */
  magnitude: number;
  forwardW: number;
  reflectedW: number;
  netW: number;
}

/** A power given at the near end. */
export interface GivenPower {
  watts: number;
  /** the wave toward the load, or what is left of it after the reflection */
  kind: "forward" | "net";
}

/**
 * Forward, reflected and net power at both ends of a line.
 * @param magnitude - |Γ| at the load, 0 to 1
 * @param lossDb - matched loss of the line, one way, dB, at least 0
 * @param given - at the near end, watt, at least 0
 * @returns a net power into a line that reflects everything gives Infinity in both waves, 0 W none
 * @throws RangeError when a figure is out of range
 * Source: both waves fall by 10^(A/10) in their own direction.
 */
export function powersOnLine(
  magnitude: number,
  lossDb: number,
  given: GivenPower,
): { near: WavePowers; load: WavePowers } {
  if (!(magnitude >= 0 && magnitude <= 1))
    throw new RangeError(`powersOnLine: magnitude must be from 0 to 1, got ${magnitude}`);
  if (!(lossDb >= 0)) throw new RangeError(`powersOnLine: lossDb must be at least 0, got ${lossDb}`);
  if (!(given.watts >= 0)) throw new RangeError(`powersOnLine: watts must be at least 0, got ${given.watts}`);
  const ratio = Math.pow(10, lossDb / 10);
  const nearMagnitude = magnitudeThroughLine(magnitude, lossDb);
  const kept = 1 - nearMagnitude * nearMagnitude;
  const forwardW = given.kind === "forward" || given.watts === 0 ? given.watts : given.watts / kept;
  return { near: wavesOf(forwardW, nearMagnitude), load: wavesOf(forwardW / ratio, magnitude) };
}

function wavesOf(forwardW: number, magnitude: number): WavePowers {
  const share = magnitude * magnitude;
  const netW = share === 1 ? 0 : forwardW * (1 - share);
  return { magnitude, forwardW, reflectedW: forwardW * share, netW };
}

/** The ends between which voltage and current of a standing wave lie, rms. */
export interface Extremes {
  highestV: number;
  lowestV: number;
  highestA: number;
  lowestA: number;
}

/**
 * Highest and lowest voltage and current that a wave and its reflection reach within half a wavelength.
 * @param forwardW - watt, at least 0
 * @param magnitude - |Γ|, 0 to 1
 * @param z0 - real impedance of the line, ohm, above 0
 * Source: V = √(P·Z0)·(1 ± |Γ|); with net power the highest peak is √(2·P·Z0·VSWR).
 */
export function waveExtremes(forwardW: number, magnitude: number, z0: number): Extremes {
  if (!(z0 > 0)) throw new RangeError(`waveExtremes: z0 must be positive, got ${z0}`);
  const wave = Math.sqrt(forwardW * z0);
  const [highestV, lowestV] = [wave * (1 + magnitude), wave * (1 - magnitude)];
  return { highestV, lowestV, highestA: highestV / z0, lowestA: lowestV / z0 };
}

/**
 * What is left of a matched line's power rating when its highest voltage may not be exceeded: of the net power 1/VSWR,
 * of the forward power 1/(1 + |Γ|)². Both are in use, so both are given.
 * @param magnitude - |Γ|, 0 to 1
 */
export function ratingShares(magnitude: number): { net: number; forward: number } {
  return { net: (1 - magnitude) / (1 + magnitude), forward: 1 / (1 + magnitude) ** 2 };
}

/**
 * Most by which a transmission may swing between best and worst frequency when two mismatches face each other, dB:
 * 20·log((1 + p)/(1 − p)), p = |Γ1|·|Γ2|·10^(−A/10).
 * @param lossDb - matched loss between them, one way, dB, at least 0
 * @returns Infinity where both reflect everything and nothing is lost between them
 */
export function rippleDb(first: number, second: number, lossDb = 0): number {
  const product = magnitudeThroughLine(first * second, lossDb);
  return 20 * Math.log10((1 + product) / (1 - product));
}

/**
 * Distance from the load to the first voltage maximum on a lossless line, wavelengths, 0 to under 0.5; the first
 * minimum lies a quarter from it.
 * @param gamma - reflection at the load; not 0
 */
export function voltageMaximumAt(gamma: Complex): number {
  return wavelengths(arg(gamma) / 2);
}

/**
 * Voltage of the standing wave over that of the wave toward the load, |1 + Γ·e^(−j4πd)|, on a lossless line.
 * @param gamma - reflection at the load
 * @param distance - from the load, wavelengths
 * @returns between 1 − |Γ| and 1 + |Γ|
 */
export function standingVoltage(gamma: Complex, distance: number): number {
  return abs(add(ONE, multiply(gamma, polar(1, -4 * Math.PI * distance))));
}
