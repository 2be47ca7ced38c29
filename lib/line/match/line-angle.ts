/**
 * Where on a lossless line a wanted point lies: everything in wavelengths of that line, counted from the load, and
 * reduced to less than a half wave, after which a lossless line repeats itself.
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, ch. 2 (reflection turns by −2βd); convention e^{+jωt}.
 */
import { abs, add, arg, complex, divide, subtract, type Complex } from "@/lib/line/complex";

/** Less than this many wavelengths short of a half wave counts as the full turn, that is as 0. */
const wholeTurn = 1e-12;

/** Reflection coefficient of an impedance against a real one, (Z − R)/(Z + R); ohm in, dimensionless out. */
export function reflectionAgainst(impedance: Complex, referenceOhm: number): Complex {
  return divide(subtract(impedance, complex(referenceOhm)), add(impedance, complex(referenceOhm)));
}

/** An angle of half a turn per half wave, radians, as a length of 0 to under 0.5 wavelengths. */
export function wavelengths(angle: number): number {
  const turns = angle / (2 * Math.PI);
  const rest = turns - 0.5 * Math.floor(2 * turns);
  return rest > 0.5 - wholeTurn ? 0 : rest;
}

/**
 * The distances at which a load's reflection has turned to an angle whose cosine is given: two, or one where both
 * coincide, or none where the cosine is out of reach.
 * @param reflection - at the load, against the line; magnitude above 0
 * @param cosine - of the reflection's angle at the wanted point; of any size
 * @returns wavelengths from the load, each 0 to under 0.5, not sorted
 */
export function distancesAtCosine(reflection: Complex, cosine: number): number[] {
  if (!(Math.abs(cosine) <= 1 + 1e-12)) return [];
  const angle = Math.acos(Math.max(-1, Math.min(1, cosine)));
  const first = wavelengths((arg(reflection) - angle) / 2);
  const second = wavelengths((arg(reflection) + angle) / 2);
  return Math.abs(first - second) < wholeTurn ? [first] : [first, second];
}

/**
 * Impedance seen through a length of lossless line.
 * @param load - ohm
 * @param lineOhm - characteristic impedance, above 0
 * @param distance - wavelengths toward the source
 * @returns ohm; its parts are infinite where the line shows an exact open
 */
export function impedanceAlong(load: Complex, lineOhm: number, distance: number): Complex {
  const reflection = reflectionAgainst(load, lineOhm);
  const angle = arg(reflection) - 4 * Math.PI * distance;
  const size = abs(reflection);
  const turned = complex(size * Math.cos(angle), size * Math.sin(angle));
  const ratio = divide(complex(1 + turned.re, turned.im), complex(1 - turned.re, -turned.im));
  return complex(lineOhm * ratio.re, lineOhm * ratio.im);
}
