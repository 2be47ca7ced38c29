/** A reactance as the coil or capacitor that has it at one frequency, and back. */

export type ReactivePart = { lH: number } | { cF: number };

/**
 * The part of a reactance: a coil X/ω above 0, a capacitor −1/(ωX) below.
 * @param reactance - ohm
 * @param frequency - hertz, above 0
 * @returns undefined for no reactance at all, or one that is not finite
 * @throws RangeError when the frequency is not positive
 */
export function partOfReactance(reactance: number, frequency: number): ReactivePart | undefined {
  const omega = angular("partOfReactance", frequency);
  if (!Number.isFinite(reactance) || reactance === 0) return undefined;
  return reactance > 0 ? { lH: reactance / omega } : { cF: -1 / (omega * reactance) };
}

/** Reactance of a coil (henry, at least 0) or a capacitor (farad, above 0), ohm. Throws as `partOfReactance`. */
export function reactanceOfPart(part: ReactivePart, frequency: number): number {
  const omega = angular("reactanceOfPart", frequency);
  return "lH" in part ? omega * part.lH : -1 / (omega * part.cF);
}

function angular(where: string, frequency: number): number {
  if (!(frequency > 0 && frequency < Infinity))
    throw new RangeError(`${where}: frequency must be positive, got ${frequency}`);
  return 2 * Math.PI * frequency;
}
