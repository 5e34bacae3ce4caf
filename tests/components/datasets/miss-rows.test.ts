import { expect, it } from 'vitest';
import { countByLab, missRows } from '@/components/datasets/miss-rows';
import { pointHref, readPoint } from '@/components/datasets/point-address';
import type { OverlayPoint } from '@/components/plots/overlay-view';
import type { Overlay } from '@/schemas/overlay';

const overlay = {
  datasets: [{ lab: { slug: 'q', name: 'Quillan' } }, { lab: { slug: 'n', name: 'Norrel' } }],
} as unknown as Overlay;
const at = (dataset: number, energy: number, z: number): OverlayPoint => ({
  ...{ dataset, energy, z, series: 0, point: 0 },
  ...{ activity: 0, expected: 0, flag: 'off-curve' },
});
const points = [at(0, 3, -4), at(1, 1, 9), at(0, 2, 12)];

it('says in whose hands the points are, and lists them alone and in the order asked for', () => {
  expect(countByLab(points, overlay)).toEqual([
    { slug: 'q', name: 'Quillan', points: 2 },
    { slug: 'n', name: 'Norrel', points: 1 },
  ]);
  const zOf = (lab: string | null, order: 'miss' | 'energy') =>
    missRows(points, overlay, { lab, order }).map(({ z }) => z);
  expect(zOf(null, 'miss')).toEqual([12, 9, -4]);
  expect(zOf('q', 'energy')).toEqual([12, -4]);
});

it('a point is counted from 1 in addresses; what names none is none', () => {
  expect(pointHref('CK-000121', { series: 1, point: 2 })).toBe('/datasets/CK-000121?point=2.3');
  expect(readPoint('2.3')).toEqual({ series: 1, point: 2 });
  for (const text of [null, '', '0.3', '2', '2.0', '2.3.4', 'a.b']) expect(readPoint(text)).toBeNull();
});
