/**
 * Share of a power that is left behind a loss, 10^(−A/10).
 * @param lossDb - dB; Infinity for a loss that lets nothing through
 * @returns 1 for no loss, 0 for an infinite one
 */
export function powerShare(lossDb: number): number {
  return Math.pow(10, -lossDb / 10);
}
