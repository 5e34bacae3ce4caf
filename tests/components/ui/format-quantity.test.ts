import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatCount,
  formatFixed,
  formatNumber,
  formatPValue,
  formatQuantity,
  quantityParts,
} from '@/components/ui/format-quantity';

describe('a quantity with its uncertainty', () => {
  it.each([
    [2.4, 0.1, 'kT', '2.40 ± 0.10\u00a0kT'],
    [-1.15, 0.06, 'kT', '−1.150 ± 0.060\u00a0kT'],
    [0.917, 0.008, '', '0.9170 ± 0.0080'],
    [9.913, 0.8, '\u00b5M', '9.91 ± 0.80\u00a0\u00b5M'],
    [250, 120, '', '250 ± 120'],
  ])('shows %d and u %d to the same place', (value, u, unit, shown) => {
    expect(formatQuantity(value, u, unit)).toBe(shown);
  });

  it('keeps two significant digits of u where rounding carries it to the next power of ten', () => {
    expect(formatQuantity(5, 0.0996)).toBe('5.00 ± 0.10');
    expect(formatQuantity(5, 0.996)).toBe('5.0 ± 1.0');
  });

  it('rounds to tens and hundreds where u is that large', () => {
    expect(formatQuantity(12345, 678)).toBe('12350 ± 680');
  });

  it('writes large and small quantities with a power of ten, both on the same scale', () => {
    expect(formatQuantity(0.000123, 0.0000121)).toBe('(1.23 ± 0.12)\u2009×\u200910⁻⁴');
    expect(formatQuantity(123456, 10)).toBe('(1.23456 ± 0.00010)\u2009×\u200910⁵');
    expect(formatQuantity(1e-9, 2e-10, 'M')).toBe('(1.00 ± 0.20)\u2009×\u200910⁻⁹\u00a0M');
  });

  it('takes the power of ten from u where the value is smaller', () => {
    expect(formatQuantity(1e-7, 2e-5)).toBe('(0.0 ± 2.0)\u2009×\u200910⁻⁵');
  });

  it('shows no sign on a value that rounds to zero', () => {
    expect(formatQuantity(-0.0001, 0.02)).toBe('0.000 ± 0.020');
  });

  it('shows the value alone, to four significant digits, where u is 0 or left out or noise', () => {
    expect(formatQuantity(12.345678)).toBe('12.35');
    expect(formatQuantity(18, 0, '\u00b5M')).toBe('18\u00a0\u00b5M');
    expect(formatQuantity(2.4, 1e-12)).toBe('2.4');
    expect(quantityParts(0, 0)).toEqual({ value: '0', u: null, exponent: null });
  });

  it('says what the value is to within half a unit of the last digit of u, whatever the sizes', () => {
    const value = fc.double({ min: -1e12, max: 1e12, noNaN: true });
    const u = fc.double({ min: 1e-12, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(value, u, (v, spread) => {
        const parts = quantityParts(v, spread);
        if (parts.u === null) return;
        const scale = 10 ** (parts.exponent ?? 0);
        const read = (text: string) => Number(text.replace('\u2212', '-')) * scale;
        const slack = 0.0501 * spread * (1 + 1e-9) + 1e-9 * Math.abs(v);
        expect(Math.abs(read(parts.u) - spread)).toBeLessThanOrEqual(slack);
        expect(Math.abs(read(parts.value) - v)).toBeLessThanOrEqual(slack);
      }),
    );
  });
});

describe('a number without uncertainty', () => {
  it.each([
    [0.9, '0.9'],
    [-2.5, '−2.5'],
    [99999, '1\u2009×\u200910⁵'],
    [1e-9, '1\u2009×\u200910⁻⁹'],
    [0.001234, '0.001234'],
  ])('%d', (value, shown) => {
    expect(formatNumber(value)).toBe(shown);
  });

  it('keeps the decimals that a column asks for', () => {
    expect(formatFixed(-0.14, 2)).toBe('−0.14');
    expect(formatFixed(0, 3)).toBe('0.000');
    expect(formatFixed(-0.0004, 3)).toBe('0.000');
    expect(formatFixed(1250, -2)).toBe('1300');
  });
});

describe('a probability', () => {
  it.each([
    [0.0009999, '<0.001'],
    [0.001, '0.0010'],
    [0.0234, '0.023'],
    [0.42, '0.42'],
    [0.994, '0.99'],
    [0.995, '>0.99'],
    [1, '>0.99'],
    [null, '\u2013'],
  ])('%s', (p, shown) => {
    expect(formatPValue(p)).toBe(shown);
  });
});

it('counts with a comma between thousands', () => {
  expect(formatCount(2914)).toBe('2,914');
});
