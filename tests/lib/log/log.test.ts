import { describe, expect, it } from 'vitest';
import { createLogger } from '@/lib/log';

describe('the log', () => {
  it('is JSON lines without anything that identifies or authorises', () => {
    const lines: string[] = [];
    const logger = createLogger('info', { write: (line) => lines.push(line) });
    const headers = {
      authorization: 'Bearer secret-token',
      cookie: 'session=secret-session',
      'set-cookie': 'session=secret-new',
      'x-forwarded-for': '192.0.2.1',
      'x-curvekeep-peer': '192.0.2.2',
      accept: 'application/json',
    };
    logger.info({ headers, request: { headers }, authorization: 'secret-direct' }, 'a call');
    logger.debug('not at this level');
    expect(lines).toHaveLength(1);
    expect(JSON.parse(lines[0] ?? '')).toMatchObject({
      app: 'curvekeep',
      msg: 'a call',
      headers: { accept: 'application/json' },
    });
    expect(lines[0]).not.toMatch(/secret|192\.0\.2/);
  });
});
