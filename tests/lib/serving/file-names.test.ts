import { describe, expect, it } from 'vitest';
import { attachmentHeader, cleanFileName, statedFileName } from '@/lib/serving/file-names';

describe('a file name', () => {
  it.each([
    ['curve.csv', 'curve.csv'],
    ['a/b/../c.csv', 'c.csv'],
    ['C:\\x\\y.csv', 'y.csv'],
    ['  spaced out.txt ', 'spaced out.txt'],
    ['e\u0301.txt', 'é.txt'],
    ['x\0y\u202e.txt', 'xy.txt'],
    ['.hidden', '.hidden'],
    ['..', null],
    ['/', null],
    [' \n', null],
    ['', null],
  ])('%j is kept as %j', (name, kept) => {
    expect(cleanFileName(name)).toBe(kept);
  });

  it('has at most 200 characters, none cut in two', () => {
    expect(cleanFileName('𝛿'.repeat(300))).toBe('𝛿'.repeat(200));
  });

  it.each([
    [null, null],
    ['attachment', null],
    ['attachment; filename=plain.txt', 'plain.txt'],
    ['attachment; filename="with \\"quotes\\"; and more.txt"', 'with "quotes"; and more.txt'],
    [`attachment; filename="x.txt"; filename*=UTF-8''%E2%82%AC.txt`, '€.txt'],
    [`attachment; filename*=UTF-8'en'%C3%A9.txt`, 'é.txt'],
    [`attachment; filename*=UTF-8''%E2%82.txt`, null],
  ])('in %j is %j', (header, name) => {
    expect(statedFileName(header)).toBe(name);
  });

  it.each(['a "b"; c.txt', 'µ%20*(1).csv', 'line\r\nbreak', '日本語.xlsx'])(
    '%j comes back from its own header',
    (name) => {
      const header = attachmentHeader(name);
      // RFC 9110: a header holds no line break; RFC 8187: the extended form is plain ASCII.
      expect(header).toMatch(/^[\x20-\x7e]+$/);
      expect(statedFileName(header)).toBe(name);
    },
  );
});
