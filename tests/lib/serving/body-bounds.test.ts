import { describe, expect, it } from 'vitest';
import { bodyBounds } from '@/lib/serving/body-bounds';
import { policyOfAddress } from '@/lib/serving/security-headers';

const MIB = 2 ** 20;

describe('by its address', () => {
  it.each([
    ['/api/v1/deposits/abc/files', 100],
    ['/api/v1/deposits/abc/files?name=x', 100],
    ['/api/v1/deposits/abc/files/def', 8],
    ['/api/v1/deposits/abc', 8],
    ['/api/v1/assessments?x=/api/v1/deposits/abc/files', 8],
    ['', 8],
  ])('a body to %s may have %d MiB', (url, mib) => {
    expect(bodyBounds(url).mostBytes).toBe(mib * MIB);
  });

  it('a file is sandboxed, and nothing else', () => {
    expect(policyOfAddress('/api/v1/deposits/abc/files/def')).toContain('; sandbox');
    for (const url of [
      '/api/v1/deposits/abc/files',
      '/api/v1/deposits/abc/files/',
      '/check',
      '/api/v1/health',
    ])
      expect(policyOfAddress(url)).not.toContain('sandbox');
  });

  it('the script that a worker starts with may load the rest of it, and nothing else may', () => {
    const worker = policyOfAddress('/_next/static/chunks/turbopack-worker-1hrsq.js');
    expect(worker).toMatch(/^default-src 'none'.*; script-src 'self'$/);
    for (const url of ['/_next/static/chunks/1hrsq.js', '/check', '/turbopack-worker-1.js'])
      expect(policyOfAddress(url)).not.toContain('script-src');
  });
});
