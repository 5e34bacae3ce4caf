import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { signedLabel } from '@/components/plots/axis-ruler';
import { WindowRuler, windowAfterKey } from '@/components/plots/window-ruler';

const WINDOW = { from: -6, to: 4 };
const FULL = { from: -18, to: 5 };

describe('keys on the ruler', () => {
  it.each([
    ['ArrowLeft', -7, 3],
    ['ArrowDown', -7, 3],
    ['ArrowRight', -5, 5],
    ['ArrowUp', -5, 5],
    ['PageDown', -11, -1],
    ['PageUp', -5, 5],
    ['+', -5, 3],
    ['=', -5, 3],
    ['-', -7.5, 5],
    ['Home', -18, 5],
    ['Escape', -18, 5],
  ])('%s makes %d to %d', (key, from, to) => {
    expect(windowAfterKey(key, WINDOW, FULL)).toEqual({ from, to });
  });

  it.each(['Tab', 'Enter', 'a', ' '])('%j has no meaning', (key) => {
    expect(windowAfterKey(key, WINDOW, FULL)).toBeNull();
  });
});

it('says its window in words, with a true minus sign', () => {
  expect(signedLabel(-2.345)).toBe('−2.35');
  const html = renderToStaticMarkup(<WindowRuler window={WINDOW} full={FULL} onChange={() => {}} />);
  expect(html).toContain('aria-valuetext="−6 to 4 kT"');
  expect(html).toContain('aria-valuenow="-1"');
});
