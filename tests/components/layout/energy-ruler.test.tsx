import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import { EnergyRuler, rulerTicks } from '@/components/layout/energy-ruler';

it('ticks whole energies inside the window, its edges included', () => {
  expect(rulerTicks(-2.5, 2)).toEqual([-2, -1, 0, 1, 2]);
});

it('thins the ticks of a wide window', () => {
  expect(rulerTicks(-200, 200)).toHaveLength(41);
});

it('has no tick where no whole energy lies', () => {
  expect(rulerTicks(0.2, 0.8)).toEqual([]);
});

it('puts zero in the middle of a symmetric window and writes a true minus sign', () => {
  const html = renderToStaticMarkup(<EnergyRuler from={-8} to={8} />);
  expect(html).toMatch(/<text x="50%"[^>]*>0<\/text>/);
  expect(html).toContain('>−6</text>');
});
