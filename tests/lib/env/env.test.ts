import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { readEnv } from '@/lib/env';

function settingsOf(variables: Record<string, string>) {
  const result = readEnv(variables);
  if (!result.ok) throw new Error(result.problems.join(' '));
  return result.env;
}

describe('settings', () => {
  it('have defaults that serve this machine only', () => {
    const env = settingsOf({});
    expect(env).toMatchObject({
      port: 3000,
      host: '127.0.0.1',
      appUrl: 'http://localhost:3000',
      demo: false,
    });
    expect(env.databaseUrl).toBe(`file:${path.resolve('data', 'curvekeep.db')}`);
    expect(env.trustedProxies.rules).toEqual([]);
  });

  it('follow the port and the data folder', () => {
    const env = settingsOf({ PORT: '4000', CURVEKEEP_DATA_DIR: '/somewhere' });
    expect(env.appUrl).toBe('http://localhost:4000');
    expect(env.databaseUrl).toBe('file:/somewhere/curvekeep.db');
  });

  it('take trusted proxies as addresses and ranges', () => {
    const { trustedProxies } = settingsOf({ TRUSTED_PROXIES: '10.0.0.0/8, ::1' });
    expect(trustedProxies.check('10.9.8.7', 'ipv4')).toBe(true);
    expect(trustedProxies.check('::1', 'ipv6')).toBe(true);
    expect(trustedProxies.check('11.0.0.1', 'ipv4')).toBe(false);
  });

  it.each([
    ['PORT', 'eighty', 'port number'],
    ['PORT', '70000', 'port number'],
    ['HOST', 'not a host', 'host name'],
    ['CURVEKEEP_DATA_DIR', '', 'folder'],
    ['DATABASE_URL', 'mysql://x', 'file:'],
    ['APP_URL', 'curves.example.org', 'http or https'],
    ['APP_URL', 'https://curves.example.org/path', 'without a path'],
    ['LOG_LEVEL', 'loud', 'fatal, error'],
    ['TRUSTED_PROXIES', '10.0.0.0/64', 'addresses or ranges'],
    ['TRUSTED_PROXIES', 'proxy.example.org', 'addresses or ranges'],
    ['CURVEKEEP_DEMO', 'yes', '1 (on) or 0 (off)'],
  ])('name %s=%s and say what would be right', (name, value, right) => {
    const result = readEnv({ [name]: value });
    expect(result).toEqual({ ok: false, problems: [expect.stringContaining(`${name} must`)] });
    expect(!result.ok && result.problems[0]).toContain(right);
  });

  it('name all that are wrong, not only the first', () => {
    const result = readEnv({ PORT: 'x', LOG_LEVEL: 'loud' });
    expect(!result.ok && result.problems).toHaveLength(2);
  });
});
