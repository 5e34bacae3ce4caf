/**
 * Random numbers from a fixed seed, the same on every machine: xoshiro128** for uniform ones, the polar
 * method for normal ones.
 *
 * Sources: Blackman & Vigna, Scrambled linear pseudorandom number generators, ACM Trans. Math. Softw. 47, 36
 * (2021); Marsaglia & Bray, A convenient method for generating normal variables, SIAM Review 6, 260 (1964);
 * the state is filled from the seed by SplitMix (Steele, Lea & Flood, OOPSLA 2014) in its 32-bit form.
 */
export class SeededRandom {
  private readonly state = new Uint32Array(4);
  /** the second of a pair of normal numbers; NaN where none is kept */
  private kept = Number.NaN;

  /** @param seed a whole number, 0 to 2³² − 1 */
  constructor(seed: number) {
    let counter = seed >>> 0;
    for (let i = 0; i < 4; i++) {
      counter = (counter + 0x9e3779b9) >>> 0;
      let mixed = Math.imul(counter ^ (counter >>> 16), 0x85ebca6b);
      mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
      this.state[i] = mixed ^ (mixed >>> 16);
    }
  }

  /** Uniform in (0, 1), never 0 or 1. */
  uniform(): number {
    return (this.next() + 0.5) / 4294967296;
  }

  /** Standard normal. */
  normal(): number {
    if (!Number.isNaN(this.kept)) {
      const value = this.kept;
      this.kept = Number.NaN;
      return value;
    }
    let x: number;
    let y: number;
    let square: number;
    do {
      x = 2 * this.uniform() - 1;
      y = 2 * this.uniform() - 1;
      square = x * x + y * y;
    } while (square >= 1 || square === 0);
    const scale = Math.sqrt((-2 * Math.log(square)) / square);
    this.kept = y * scale;
    return x * scale;
  }

  /** Puts numbers into random order, in place (Fisher–Yates). */
  shuffle(values: Float64Array): void {
    for (let i = values.length - 1; i > 0; i--) {
      const j = Math.floor(this.uniform() * (i + 1));
      const value = values[i];
      values[i] = values[j];
      values[j] = value;
    }
  }

  private next(): number {
    const s = this.state;
    const result = Math.imul(rotate(Math.imul(s[1], 5), 7), 9) >>> 0;
    const shifted = s[1] << 9;
    s[2] ^= s[0];
    s[3] ^= s[1];
    s[1] ^= s[2];
    s[0] ^= s[3];
    s[2] ^= shifted;
    s[3] = rotate(s[3], 11);
    return result;
  }
}

function rotate(value: number, by: number): number {
  return (value << by) | (value >>> (32 - by));
}
