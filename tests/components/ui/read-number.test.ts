import { expect, it } from 'vitest';
import { readNumber } from '@/components/ui/read-number';

it.each([
  ['2.4', 2.4],
  [' 2,4 ', 2.4],
  ['−0.5', -0.5],
  ['-0.5', -0.5],
  ['+3', 3],
  ['.5', 0.5],
  ['5.', 5],
  ['1e-3', 0.001],
  ['0,125', 0.125],
  ['0', 0],
])('%j is %d', (text, value) => {
  expect(readNumber(text)).toBe(value);
});

it.each([
  '',
  ' ',
  '2.4 kT',
  '0,4l',
  '1,234.5',
  '1.2.3',
  '0x10',
  '1e999',
  'NaN',
  'Infinity',
  '--1',
  '1 2',
  '1,000',
  '12,500,000',
])('%j is no number', (text) => {
  expect(readNumber(text)).toBeNull();
});
