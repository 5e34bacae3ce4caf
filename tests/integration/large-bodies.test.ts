/** Bodies over 8 MiB: refused without being held in memory, whether they say how long they are or not. */
import { once } from 'node:events';
import { readFile } from 'node:fs/promises';
import { connect } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema } from '@/schemas/problem';
import { exampleDocument } from '@/tests/support/example-document';
import { postDocument } from '@/tests/support/post-document';
import { type RunningApp, startApp } from '@/tests/support/start-app';

const MIB = 2 ** 20;
/** Well under the 200 MiB that are sent; what the runtime itself may take on the way. */
const MOST_GROWTH_MIB = 60;

let app: RunningApp;
beforeAll(async () => {
  app = await startApp({ CURVEKEEP_DEMO: '1' });
  for (let i = 0; i < 5; i++) await postDocument(app.url, exampleDocument());
});
afterAll(() => app.stop());

async function residentMib(): Promise<number> {
  const status = await readFile(`/proc/${app.process.pid}/status`, 'utf8');
  return Number(/VmRSS:\s+(\d+) kB/.exec(status)?.[1]) / 1024;
}

interface RawAnswer {
  status: number;
  body: string;
  sentMib: number;
  peakMib: number;
  /** the server ended the connection */
  closed: boolean;
}

/** Sends a body of up to `mib` in pieces of 64 KiB through a bare socket, as fast as it is taken. */
async function sendRaw(
  mib: number,
  framing: 'declared' | 'chunked',
  expectContinue = false,
): Promise<RawAnswer> {
  const { port, hostname } = new URL(app.url);
  const socket = connect(Number(port), hostname);
  let answer = '';
  let closed = false;
  socket.on('data', (chunk) => {
    answer += chunk.toString();
  });
  socket.on('close', () => {
    closed = true;
  });
  socket.on('error', () => undefined);
  const length = framing === 'declared' ? `Content-Length: ${mib * MIB}` : 'Transfer-Encoding: chunked';
  const expectation = expectContinue ? 'Expect: 100-continue\r\n' : '';
  socket.write(
    `POST /api/v1/assessments HTTP/1.1\r\nHost: ${hostname}:${port}\r\nContent-Type: application/json\r\n${expectation}${length}\r\n\r\n`,
  );
  const piece = Buffer.alloc(64 * 1024, 0x20);
  const framed =
    framing === 'declared' ? piece : Buffer.concat([Buffer.from('10000\r\n'), piece, Buffer.from('\r\n')]);
  let sentMib = 0;
  let peakMib = await residentMib();
  while (!expectContinue && sentMib < mib && !closed) {
    if (!socket.write(framed)) {
      await once(socket, 'drain', { signal: AbortSignal.timeout(200) }).catch(() => undefined);
    }
    sentMib += 1 / 16;
    if (Number.isInteger(sentMib)) peakMib = Math.max(peakMib, await residentMib());
  }
  for (let i = 0; i < 60 && !closed; i++) await new Promise((resolve) => setTimeout(resolve, 100));
  socket.destroy();
  const status = Number(/^HTTP\/1\.1 (\d+)/.exec(answer)?.[1]);
  return { status, body: answer, sentMib, peakMib, closed };
}

describe('a body over 8 MiB', () => {
  it.each(['declared', 'chunked'] as const)('%s: 413, connection closed, memory flat', async (framing) => {
    const before = await residentMib();
    const answer = await sendRaw(200, framing);
    expect(answer.status).toBe(413);
    expect(answer.body).toContain('application/problem+json');
    expect(answer.body).toMatch(/connection: close/i);
    expect(answer.closed).toBe(true);
    // What is thrown away while the caller reads its answer is bounded too.
    expect(answer.sentMib).toBeLessThan(100);
    expect(answer.peakMib - before).toBeLessThan(MOST_GROWTH_MIB);
  });

  it('is not asked for where the caller asks first', async () => {
    const answer = await sendRaw(9, 'declared', true);
    expect(answer.status).toBe(413);
    expect(answer.body).not.toContain('100 Continue');
    expect(answer.closed).toBe(true);
  });

  it('a little over it: an ordinary client reads the answer', async () => {
    const response = await postDocument(app.url, ' '.repeat(8 * MIB + 1));
    expect(response.status).toBe(413);
    const problem = problemSchema.parse(await response.json());
    expect(problem.detail).toContain('8 MiB');
  });

  it('at it: read and judged', async () => {
    const document = JSON.stringify(exampleDocument());
    const padded = document + ' '.repeat(8 * MIB - Buffer.byteLength(document));
    expect((await postDocument(app.url, padded)).status).toBe(200);
  });
});
