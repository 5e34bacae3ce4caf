/** Seeded random numbers: the same seed gives the same scenario, byte for byte, on every machine. */

export interface Random {
  /** uniform in [0, 1) */
  uniform: () => number;
  /** normal, mean 0, standard deviation 1 */
  normal: () => number;
}

/** A source of random numbers for a seed made of words, so that a new dataset leaves the others as they are. */
export function seededRandom(...seed: (string | number)[]): Random {
  const uniform = mulberry32(hash(seed.join('/')));
  return { uniform, normal: () => boxMuller(1 - uniform(), uniform()) };
}

/** One normal number of two uniform ones, `a` in (0, 1] (Box & Muller, Ann. Math. Stat. 29, 610, 1958). */
function boxMuller(a: number, b: number): number {
  return Math.sqrt(-2 * Math.log(a)) * Math.cos(2 * Math.PI * b);
}

/** mulberry32, a generator in the public domain: 32 bits of state, the same everywhere. */
function mulberry32(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** FNV-1a, 32 bits. */
function hash(text: string): number {
  let state = 0x811c9dc5;
  for (let i = 0; i < text.length; i++) state = Math.imul(state ^ text.charCodeAt(i), 0x01000193);
  return state >>> 0;
}
