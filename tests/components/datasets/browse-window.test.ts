import { describe, expect, it } from 'vitest';
import { browseWindows, pointsOutside, windowForAddress } from '@/components/datasets/browse-window';
import { smallOverlay, TWO_DATASETS } from '../../support/small-overlay';

const NONE = { from: null, to: null };
const overlay = smallOverlay(TWO_DATASETS);

describe('the window of a selection', () => {
  it('opens where the curve bends, and goes on to every miss', () => {
    const { window, full, opening } = browseWindows(NONE, overlay, []);
    expect(window).toEqual({ from: -10, to: 4 });
    expect(opening).toEqual(window);
    expect(full).toEqual({ from: -13, to: 4 });
    const far = smallOverlay([
      ...TWO_DATASETS,
      { energy: 14, activity: 0.5, flag: 'off-curve', dataset: 1 },
      { energy: -14, activity: 0, flag: 'warning', dataset: 1 },
    ]);
    expect(browseWindows(NONE, far, []).window).toEqual({ from: -15, to: 15 });
  });

  it('is the address’ where it names one, an edge that it leaves out at the end of all energies', () => {
    expect(browseWindows({ from: -2, to: 3 }, overlay, []).window).toEqual({ from: -2, to: 3 });
    expect(browseWindows({ from: -2, to: null }, overlay, []).window).toEqual({ from: -2, to: 4 });
    expect(browseWindows({ from: 50, to: null }, overlay, []).window).toEqual({ from: -10, to: 4 });
  });

  it('is the same from cells as from points', () => {
    expect(browseWindows(NONE, smallOverlay(TWO_DATASETS, false), []).full).toEqual({ from: -13, to: 4 });
  });

  it('stands in the address on tenths, and not at all where it is the opening one', () => {
    const opening = { from: -10, to: 4 };
    expect(windowForAddress({ from: -2.04, to: 3.06 }, opening)).toEqual({ from: -2, to: 3.1 });
    expect(windowForAddress(opening, opening)).toEqual(NONE);
  });

  it('knows how many points it leaves out', () => {
    expect(pointsOutside(overlay, { from: -10, to: 4 })).toBe(1);
    expect(pointsOutside(overlay, { from: 0, to: 4 })).toBe(2);
    expect(pointsOutside(smallOverlay(TWO_DATASETS, false), { from: 0, to: 4 })).toBe(2);
  });
});
