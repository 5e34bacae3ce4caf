import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { pixelOf } from '@/components/plots/energy-window';
import { SeriesStrip } from '@/components/plots/series-strip';
import { plottedExample } from '../../support/plotted-dataset';

const { series } = plottedExample('thousand-fold');
const WINDOW = { from: -10, to: 4 };

function strip(index: number) {
  const { points } = series[index].assessed;
  const html = renderToStaticMarkup(<SeriesStrip points={points} window={WINDOW} width={700} lit={false} />);
  const drawn = (stroke: string) => new RegExp(`d="([^"]*)" class="${stroke}`).exec(html)?.[1] ?? '';
  return { points, onCurve: drawn('stroke-ink'), offCurve: drawn('stroke-off') };
}

const startsOf = (d: string) => [...d.matchAll(/M(-?[\d.]+) /g)].map(([, x]) => Number(x));

describe('a series as a strip', () => {
  it('has a tick at the energy of each point in the window, and no other', () => {
    const { points, onCurve } = strip(0);
    const inside = points.filter(({ energy }) => energy >= WINDOW.from && energy <= WINDOW.to);
    expect(inside.length).toBeLessThan(points.length);
    const places = inside.map(({ energy }) => pixelOf(energy, WINDOW, 700));
    expect(startsOf(onCurve)).toHaveLength(places.length);
    startsOf(onCurve).forEach((x, i) => {
      expect(Math.abs(x - places[i])).toBeLessThanOrEqual(0.05);
    });
  });

  it('lets off-curve points stand out by how far they miss, down where the activity is too low', () => {
    const { points, offCurve } = strip(3);
    const missed = points.filter(({ flag }) => flag === 'off-curve');
    const stems = [...offCurve.matchAll(/v(-?[\d.]+)/g)].map(([, length]) => Number(length));
    expect(missed.length).toBeGreaterThan(0);
    stems.forEach((length, i) => {
      const wanted = Math.max(-24, Math.min(24, -3 * missed[i].z));
      expect(Math.abs(length - wanted)).toBeLessThanOrEqual(0.05);
    });
    expect(stems).toHaveLength(missed.length);
  });
});
