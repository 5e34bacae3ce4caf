/** Seeded random numbers for simulations: the same seed gives the same numbers on every machine. */

export interface Random {
  /** uniform in [low, high) */
  uniform: (low?: number, high?: number) => number;
  /** normal, mean 0, standard deviation 1 (Box & Muller, Ann. Math. Stat. 29, 610, 1958) */
  normal: () => number;
}

/** @param seed a whole number */
export function seededRandom(seed: number): Random {
  const next = mulberry32(seed);
  return {
    uniform: (low = 0, high = 1) => low + (high - low) * next(),
    normal: () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()),
  };
}

/** mulberry32, a generator in the public domain with 32 bits of state. */
function mulberry32(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}
