import { describe, expect, it } from 'vitest';
import { canTravel, type Scene, sceneBetween, unionOf } from '@/components/reasons/travel';
import { plottedExample } from '@/tests/support/plotted-dataset';

const HERE: Scene = { data: plottedExample('collapse'), window: { from: -4, to: 4 } };

/** The same points two kT further, all off the curve. */
const THERE: Scene = {
  data: {
    ...HERE.data,
    series: HERE.data.series.map((series) => ({
      ...series,
      assessed: {
        ...series.assessed,
        points: series.assessed.points.map((point) => ({
          ...point,
          energy: point.energy + 2,
          flag: 'off-curve' as const,
        })),
      },
    })),
  },
  window: { from: -6, to: 4 },
};

describe('points on their way', () => {
  it('begin where they were, end where they go, and are halfway in the middle', () => {
    for (const [share, way] of [
      [0, 0],
      [0.5, 1],
      [1, 2],
    ]) {
      const { data, window } = sceneBetween(HERE, THERE, share);
      const [point] = data.series[0].assessed.points;
      expect(point.energy).toBeCloseTo(HERE.data.series[0].assessed.points[0].energy + way, 12);
      expect(window.from).toBeCloseTo(-4 - way, 12);
    }
  });

  it('keep their marks until they arrive', () => {
    const flags = (scene: Scene) =>
      scene.data.series.flatMap(({ assessed }) => assessed.points.map(({ flag }) => flag));
    expect(flags(sceneBetween(HERE, THERE, 0.9))).toEqual(flags(HERE));
  });

  it('do not travel where they cannot be found again, or are too many to be followed', () => {
    expect(canTravel(HERE, THERE)).toBe(true);
    const [first, ...others] = HERE.data.series;
    const shorter = {
      ...first,
      assessed: { ...first.assessed, points: first.assessed.points.slice(1) },
    };
    expect(canTravel({ ...HERE, data: { ...HERE.data, series: [shorter, ...others] } }, THERE)).toBe(false);
    const crowded = { ...HERE, data: { ...HERE.data, series: Array.from({ length: 120 }, () => first) } };
    expect(canTravel(crowded, crowded)).toBe(false);
  });

  it('stay within a window that holds both', () => {
    expect(unionOf({ from: -6, to: 2 }, { from: -4, to: 8 })).toEqual({ from: -6, to: 8 });
  });
});
