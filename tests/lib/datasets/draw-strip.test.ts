import { describe, expect, it } from 'vitest';
import { drawStrip, MOST_TICKS } from '@/lib/datasets/draw-strip';
import { encodeFlags, encodeNumbers } from '@/lib/datasets/encode-columns';
import type { Flag } from '@/lib/engine/assessment';

function columns(points: { energy: number; z: number; flag: Flag }[]) {
  return {
    energy: encodeNumbers(points.map(({ energy }) => energy)),
    z: encodeNumbers(points.map(({ z }) => z)),
    flags: encodeFlags(points.map(({ flag }) => flag)),
  };
}

const many = (count: number, flag: Flag) =>
  Array.from({ length: count }, (_, i) => ({ energy: (10 * i) / count, z: 0.5, flag }));

describe('a strip', () => {
  it('has every point of a small dataset, in the order of energies', () => {
    const strip = drawStrip(
      [
        columns([{ energy: 1.5, z: -4, flag: 'off-curve' }]),
        columns([
          { energy: -2.00004, z: 0.1234, flag: 'on-curve' },
          { energy: 3, z: 2.5, flag: 'warning' },
        ]),
      ],
      null,
    );
    expect(strip).toEqual({
      energy: [-2, 1.5, 3],
      z: [0.123, -4, 2.5],
      flag: ['on-curve', 'off-curve', 'warning'],
    });
  });

  it('keeps all that misses the curve and thins the rest evenly', () => {
    const strip = drawStrip(
      [columns(many(5000, 'on-curve')), columns(many(40, 'off-curve')), columns(many(60, 'warning'))],
      null,
    );
    expect(strip.energy).toHaveLength(MOST_TICKS);
    const countOf = (flag: Flag) => strip.flag.filter((one) => one === flag).length;
    expect([countOf('off-curve'), countOf('warning'), countOf('on-curve')]).toEqual([40, 60, 200]);
    const fitting = strip.energy.filter((_, i) => strip.flag[i] === 'on-curve');
    const gaps = fitting.slice(1).map((energy, i) => energy - fitting[i]);
    // 200 of 5000 over 10 kT: one tick each 0.05 kT.
    for (const gap of gaps) expect(gap).toBeCloseTo(0.05, 6);
  });

  it('never has more ticks than can be told apart', () => {
    const strip = drawStrip([columns(many(2000, 'off-curve')), columns(many(10, 'on-curve'))], null);
    expect(strip.energy).toHaveLength(MOST_TICKS);
  });

  it('ends at the window', () => {
    const strip = drawStrip([columns(many(100, 'on-curve'))], { firstCell: 20, endCell: 25 });
    expect(strip.energy).toEqual([2, 2.1, 2.2, 2.3, 2.4]);
  });
});
