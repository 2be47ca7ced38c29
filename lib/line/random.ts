/** Reproducible random numbers: the same seed gives the same ones everywhere, in the browser and on the server. */

/** A stream of numbers, even over 0 ≤ u < 1, 53 bits each. */
export type Random = () => number;

/**
 * xoshiro128**, started from a seed and the number of a stream, so that each quantity draws from a stream of its own.
 * @param seed - whole number from 0 to 2^32 − 1
 * @param stream - whole number, at least 0
 * @throws RangeError when either is not such a number
 * Source: D. Blackman and S. Vigna, Scrambled linear pseudorandom number generators, ACM Trans. Math. Softw. 47 (2021)
 * 36; started as they advise by a generator of another kind: G. Steele, D. Lea and C. Flood, Fast splittable
 * pseudorandom number generators, OOPSLA 2014, with the 32-bit finaliser of MurmurHash3.
 */
export function randomStream(seed: number, stream = 0): Random {
  for (const [name, value] of Object.entries({ seed, stream }))
    if (!(Number.isInteger(value) && value >= 0 && value < 2 ** 32))
      throw new RangeError(`randomStream: ${name} must be a whole number from 0 to 2^32 - 1, got ${value}`);
  const mix = splitMix(splitMix(seed)() ^ stream);
  const next = scrambled([mix(), mix(), mix(), mix()]);
  return () => (next() >>> 5) * 2 ** -27 + (next() >>> 6) * 2 ** -53;
}

/** A Weyl sequence through the finaliser. */
function splitMix(seed: number): () => number {
  let state = seed | 0;
  return () => {
    state = (state + 0x9e3779b9) | 0;
    let z = state;
    z = Math.imul(z ^ (z >>> 16), 0x85ebca6b);
    z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
    return z ^ (z >>> 16);
  };
}

/**
 * The 32-bit words of xoshiro128** from its own state.
 * @param state - four words, not all 0
 */
export function scrambled(state: readonly [number, number, number, number]): () => number {
  let [a, b, c, d] = state;
  return () => {
    const turned = Math.imul(b, 5);
    const word = Math.imul((turned << 7) | (turned >>> 25), 9);
    const shifted = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= shifted;
    d = (d << 11) | (d >>> 21);
    return word >>> 0;
  };
}
