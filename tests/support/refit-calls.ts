/** Refits as a script asks for them: one that is done in milliseconds, and one that takes its time. */
import { exampleDocument } from '@/tests/support/example-document';

const CLASS = { siteClass: 'main', ligand: 'velline' };

/** Four values in 36 points. */
export function quickRefit() {
  return {
    document: exampleDocument({ series: 3, pointsPerSeries: 12 }),
    free: [
      { parameter: 'gap', share: 'series' },
      { parameter: 'inactive', ...CLASS, share: 'dataset' },
    ],
  };
}

/** 39 values in points that lie on no curve at all: hundreds of iterations, some seconds. */
export function slowRefit(pointsPerSeries = 300) {
  return {
    document: exampleDocument({ series: 13, pointsPerSeries }),
    free: [
      { parameter: 'gap', share: 'series' },
      { parameter: 'inactive', ...CLASS, share: 'series' },
      { parameter: 'active', ...CLASS, share: 'series' },
    ],
  };
}

/** Its bytes, as they arrive. */
export function bytesOf(value: unknown): Uint8Array<ArrayBuffer> {
  return new TextEncoder().encode(typeof value === 'string' ? value : JSON.stringify(value));
}

/** Asks for a refit. */
export function postRefit(
  url: string,
  body: unknown,
  headers: Record<string, string> = {},
): Promise<Response> {
  return fetch(`${url}/api/v1/refits`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', ...headers },
    body: typeof body === 'string' ? body : JSON.stringify(body),
  });
}
