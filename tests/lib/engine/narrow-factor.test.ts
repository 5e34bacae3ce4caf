import fc from 'fast-check';
import { expect, it } from 'vitest';
import { narrowFactor } from '@/lib/engine/narrow-factor';

const entry = fc.double({ min: -10, max: 10, noNaN: true });

/** W·Wᵀ written out. */
function outer(rows: ArrayLike<number>, m: number, columns: number): number[] {
  return Array.from({ length: m * m }, (_, at) => {
    const [i, j] = [Math.floor(at / m), at % m];
    let sum = 0;
    for (let k = 0; k < columns; k++) sum += rows[i * columns + k] * rows[j * columns + k];
    return sum;
  });
}

it('keeps W·Wᵀ with no more columns than independent directions', () => {
  const sizes = fc.record({
    m: fc.integer({ min: 1, max: 8 }),
    inner: fc.integer({ min: 0, max: 4 }),
    columns: fc.integer({ min: 1, max: 7 }),
  });
  const product = sizes.chain(({ m, inner, columns }) =>
    fc.record({
      m: fc.constant(m),
      inner: fc.constant(inner),
      columns: fc.constant(columns),
      left: fc.array(entry, { minLength: m * inner, maxLength: m * inner }),
      right: fc.array(entry, { minLength: inner * columns, maxLength: inner * columns }),
    }),
  );
  fc.assert(
    fc.property(product, ({ m, inner, columns, left, right }) => {
      const rows = Float64Array.from({ length: m * columns }, (_, at) => {
        let sum = 0;
        for (let k = 0; k < inner; k++)
          sum += left[Math.floor(at / columns) * inner + k] * right[k * columns + (at % columns)];
        return sum;
      });
      const before = rows.slice();
      const narrowed = narrowFactor(rows, m, columns);
      if (narrowed === null) throw new Error('no limit was given');
      const { factor, rank } = narrowed;
      expect(rows).toEqual(before);
      expect(factor.length).toBe(m * rank);
      expect(rank).toBeLessThanOrEqual(Math.min(m, columns));
      const wanted = outer(rows, m, columns);
      const size = Math.max(...wanted, 1e-300);
      outer(factor, m, rank).forEach((value, i) => {
        expect(Math.abs(value - wanted[i])).toBeLessThanOrEqual(1e-13 * columns * size);
      });
    }),
  );
});

it('finds that columns which are combinations of others add nothing', () => {
  // The third column is the sum of the first two, the fourth is nothing.
  const rows = Float64Array.from([1, 2, 3, 0, 4, -1, 3, 0, 0.5, 7, 7.5, 0, 2, 2, 4, 0]);
  expect(narrowFactor(rows, 4, 4)?.rank).toBe(2);
  expect(narrowFactor(new Float64Array(6), 3, 2)?.rank).toBe(0);
});

it('says where more columns are needed than allowed, short rows apart', () => {
  const rows = Float64Array.from([3, 0, 0, 0, 2, 0, 0, 0, 1e-6]);
  expect(narrowFactor(rows, 3, 3)?.rank).toBe(3);
  expect(narrowFactor(rows, 3, 3, { mostColumns: 2 })).toBeNull();
  expect(narrowFactor(rows, 3, 3, { mostColumns: 2, negligible: 1e-5 })?.rank).toBe(2);
});
