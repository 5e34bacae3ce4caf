import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import { AxisFrame } from '@/components/layout/axis-frame';
import { RowFrame } from '@/components/layout/row-frame';
import { parseTheme } from '@/components/layout/theme';
import { ThemeSwitch } from '@/components/layout/theme-switch';

it('keeps the order who, axis, verdict in the page and in its rows', () => {
  const html = renderToStaticMarkup(
    <AxisFrame who="who-1" axis="axis-1" verdict="verdict-1">
      <RowFrame who="who-2" axis="axis-2" verdict="verdict-2" lit />
    </AxisFrame>,
  );
  const order = ['who-1', 'axis-1', 'verdict-1', 'who-2', 'axis-2', 'verdict-2'].map((word) =>
    html.indexOf(word),
  );
  expect(order.every((place) => place >= 0)).toBe(true);
  expect(order).toEqual([...order].sort((a, b) => a - b));
});

it('reads a theme from a cookie and falls back to the system', () => {
  expect(parseTheme('dark')).toBe('dark');
  expect(parseTheme('"><script>')).toBe('system');
  expect(parseTheme(undefined)).toBe('system');
});

it('says which appearance is chosen', () => {
  const html = renderToStaticMarkup(<ThemeSwitch theme="dark" setTheme={async () => {}} />);
  expect(html).toMatch(/aria-pressed="true"[^>]*>Dark</);
  expect(html.match(/aria-pressed="false"/g)).toHaveLength(2);
});
