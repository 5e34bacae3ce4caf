import { describe, expect, it } from 'vitest';
import { isFromAnotherSite } from '@/lib/serving/same-site';

const APP = 'https://curves.example.org';

describe('the origin check', () => {
  it.each([
    ['a script', {}, false],
    ['a page of this site', { 'sec-fetch-site': 'same-origin', origin: APP }, false],
    [
      'a page of this site under another address of it',
      { origin: 'http://127.0.0.1:3000', host: '127.0.0.1:3000' },
      false,
    ],
    ['a page of another site', { 'sec-fetch-site': 'cross-site', origin: 'https://evil.example' }, true],
    ['a page of a sister site', { 'sec-fetch-site': 'same-site', origin: 'https://www.example.org' }, true],
    [
      'another origin without fetch metadata',
      { origin: 'https://evil.example', host: 'curves.example.org' },
      true,
    ],
    ['an origin that is hidden', { origin: 'null', host: 'curves.example.org' }, true],
  ])('%s', (_, headers, refused) => {
    expect(isFromAnotherSite(new Headers(headers as Record<string, string>), APP)).toBe(refused);
  });
});
