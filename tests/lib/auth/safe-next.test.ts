import { describe, expect, it } from 'vitest';
import { safeNext } from '@/lib/auth/safe-next';

describe('where to go after signing in', () => {
  it.each(['/', '/lab', '/deposits/abc?show=points#s1', '/datasets?q=a%2Fb'])('%s stays', (path) => {
    expect(safeNext(path)).toBe(path);
  });

  it.each([
    'https://evil.example/',
    '//evil.example',
    '/\\evil.example',
    '/\t/evil.example',
    '/..//evil.example',
    '/.//evil.example',
    'javascript:alert(1)',
    'lab',
    '',
    undefined,
    ['/lab', '/lab'],
    '/sign-in?next=/sign-in',
  ])('%s leads to the first page', (wanted) => {
    expect(safeNext(wanted)).toBe('/');
  });
});
