import { vi } from 'vitest';
import { assessBody } from '@/lib/assessments/assess-body';

/** A server that judges as the real one does, without the network; keeps what was sent. */
export function answerAsServer(): string[] {
  const bodies: string[] = [];
  vi.stubGlobal('fetch', async (_: string, { body }: { body: string }) => {
    bodies.push(body);
    const answer = assessBody(new TextEncoder().encode(body), Number.POSITIVE_INFINITY);
    if (answer.kind === 'over-budget') throw new Error('There is no budget here.');
    const type = answer.kind === 'assessed' ? 'application/json' : 'application/problem+json';
    return new Response(answer.body, { status: answer.status, headers: { 'Content-Type': type } });
  });
  return bodies;
}

/** A server that always gives the same answer. */
export function answerWith(status: number, body: unknown, headers: Record<string, string>): void {
  vi.stubGlobal('fetch', async () => new Response(JSON.stringify(body), { status, headers }));
}

/** No server. */
export function answerNothing(): void {
  vi.stubGlobal('fetch', async () => {
    throw new TypeError('Failed to fetch');
  });
}
