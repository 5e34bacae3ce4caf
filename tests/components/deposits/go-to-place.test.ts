import { expect, it } from 'vitest';
import { placeOf } from '@/components/deposits/go-to-place';

it.each([
  ['/contributors/0/orcid', { section: 'identity', series: null, point: null }],
  ['/temperature/u', { section: 'assay', series: null, point: null }],
  ['/ligands/1/unit', { section: 'ligands', series: null, point: null }],
  ['/series/2/parameters/gap/value', { section: 'series', series: 2, point: null }],
  ['/series/1/points/73/activity', { section: 'series', series: 1, point: 73 }],
  ['/unknown', { section: 'identity', series: null, point: null }],
  ['', { section: 'identity', series: null, point: null }],
])('%s is shown in', (pointer, expected) => {
  expect(placeOf(pointer)).toEqual(expected);
});
