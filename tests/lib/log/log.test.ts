import { inspect } from 'node:util';
import { describe, expect, it } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { selectPersonByEmail } from '@/db/queries/people';
import { people } from '@/db/tables/people';
import { describeError } from '@/lib/describe-error';
import { createLogger } from '@/lib/log';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

const ROW = { id: 'one', email: 'secret@test.example', name: 'secret name', role: 'curator' } as const;

/** What a failed write and a failed read throw. */
async function failedQueries(): Promise<unknown[]> {
  const insert = () =>
    write('acknowledged', async (tx) => {
      await tx.insert(people).values({ ...ROW, passwordHash: 'secret-hash', createdAt: 1 });
    });
  await insert();
  const thrown = await insert().catch((error: unknown) => error);
  await (await readDatabase()).run('alter table people rename to people_away');
  const unread = await selectPersonByEmail('secret@test.example').catch((error: unknown) => error);
  await (await readDatabase()).run('alter table people_away rename to people');
  return [thrown, unread];
}

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

  it('holds no value of a query that failed, and neither does what is thrown', async () => {
    const lines: string[] = [];
    const logger = createLogger('info', { write: (line) => lines.push(line) });
    const errors = await failedQueries();
    for (const error of errors) {
      logger.error({ err: error }, 'a call failed');
      expect(inspect(error, { depth: 9 })).not.toContain('secret');
    }
    const [write, read] = lines.map((line) => JSON.parse(line).err);
    expect(write.message).toMatch(/^Failed query: insert into "people"/);
    expect(write.cause).toMatchObject({ code: expect.stringMatching(/^SQLITE_CONSTRAINT/) });
    expect(write.stack).toContain('at ');
    expect(read.message).toMatch(/^Failed query: select/);
    expect(lines.join('')).not.toContain('secret');
  });

  it('describes an error by its name, code and causes alone', () => {
    const cause = Object.assign(new Error('inner'), { code: 'INNER', params: ['secret'] });
    const error = Object.assign(new TypeError('outer\nsecret line', { cause }), {
      query: 'select ?',
      params: ['secret'],
    });
    const described = describeError(error);
    expect(described).toMatchObject({
      type: 'TypeError',
      message: 'Failed query: select ?',
      cause: { message: 'inner', code: 'INNER' },
    });
    expect(JSON.stringify(described)).not.toContain('secret');
    expect(describeError('a text')).toEqual({ type: 'string', message: 'a text' });
  });
});
