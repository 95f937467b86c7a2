/** A seeded source of chance: the same seed gives the same numbers on every machine. */
export interface Random {
  /** Even over 0 <= x < 1. */
  next(): number;
  /** Gaussian, mean 0, standard deviation 1. */
  gaussian(): number;
}

/** A small generator of 32 bits ('mulberry32', public domain), good enough for noise in invented data. */
export function createRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  // Box and Muller 1958; 1 - next() is never 0, whose logarithm would be infinite.
  const gaussian = () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next());
  return { next, gaussian };
}
