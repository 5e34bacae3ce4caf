import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

type Tokens = Record<string, string>;

const css = readFileSync('app/globals.css', 'utf8');
const root = css.slice(css.indexOf(':root {'), css.indexOf('@theme'));
const split = root.indexOf('@variant dark');

function tokensOf(text: string): Tokens {
  return Object.fromEntries([...text.matchAll(/--([a-z0-9-]+): (#[0-9a-f]{6});/g)].map((m) => [m[1], m[2]]));
}

/** Relative luminance of sRGB (WCAG 2.2). */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [low, high] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (high + 0.05) / (low + 0.05);
}

describe.each([
  ['light', tokensOf(root.slice(0, split))],
  ['dark', tokensOf(root.slice(split))],
])('%s', (_, tokens) => {
  it.each(['ink', 'soft', 'act', 'off', 'warn'])('%s is readable on ground and wash', (text) => {
    expect(contrast(tokens[text], tokens.ground)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(tokens[text], tokens.wash)).toBeGreaterThanOrEqual(4.5);
  });

  it('the line of a control stands out', () => {
    expect(contrast(tokens.field, tokens.ground)).toBeGreaterThanOrEqual(3);
    expect(contrast(tokens.field, tokens.wash)).toBeGreaterThanOrEqual(3);
  });
});

it('knows the contrast of black on white', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
});
