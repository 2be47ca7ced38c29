/** Spreads a small seed over the generator's 32 bits: the golden ratio's fraction of 2³². */
const spread = 0x9e3779b9;

/**
 * Uniform random numbers, the same ones for the same seed everywhere.
 * @param seed - a whole number
 * @returns a function that gives the next number, −1 to 1
 * Source: G. Marsaglia, Xorshift RNGs, J. Statistical Software 8 (2003) issue 14, the 32-bit generator with shifts 13,
 * 17 and 5.
 */
export function uniformDraws(seed: number): () => number {
  let state = Math.imul(seed + 1, spread) | 0 || spread | 0;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return state / 0x80000000;
  };
}
