/** The reading calls of the API over HTTP, on the demonstration scenario. */
import Papa from 'papaparse';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkDocument } from '@/lib/documents/check-document';
import {
  datasetAnswerSchema,
  datasetListSchema,
  datasetPointsSchema,
  withdrawnSchema,
} from '@/schemas/dataset-answers';
import { overlaySchema } from '@/schemas/overlay';
import { problemSchema } from '@/schemas/problem';
import { systemListSchema, systemSchema } from '@/schemas/system';
import { type RunningApp, startApp } from '@/tests/support/start-app';

let app: RunningApp;
beforeAll(async () => {
  app = await startApp({ CURVEKEEP_DEMO: '1' });
});
afterAll(() => app.stop());

const get = (path: string, headers: Record<string, string> = {}) => fetch(`${app.url}${path}`, { headers });

async function json(path: string): Promise<unknown> {
  const response = await get(path);
  expect(response.status).toBe(200);
  expect(response.headers.get('content-type')).toBe('application/json');
  return response.json();
}

describe('what is published', () => {
  it('is listed, drawn and counted alike', async () => {
    const list = datasetListSchema.parse(await json('/api/v1/datasets?from=-2&to=2'));
    const overlay = overlaySchema.parse(await json('/api/v1/overlay?from=-2&to=2'));
    expect(list.datasets).toHaveLength(24);
    expect(overlay.counts).toEqual(list.total);
    expect(overlay.points?.energy).toHaveLength(list.total.points);
  });

  it('comes page by page, with the next address in body and Link header', async () => {
    const response = await get('/api/v1/datasets?limit=20');
    const { next, datasets } = datasetListSchema.parse(await response.json());
    expect(response.headers.get('link')).toBe(`<${next}>; rel="next"`);
    const second = await get(next ?? '');
    const last = datasetListSchema.parse(await second.json());
    expect(second.headers.get('link')).toBeNull();
    expect(last.next).toBeNull();
    const accessions = [...datasets, ...last.datasets].map(({ accession }) => accession);
    expect(new Set(accessions).size).toBe(24);
  });

  it('has systems', async () => {
    const { systems } = systemListSchema.parse(await json('/api/v1/systems'));
    expect(systems).toHaveLength(4);
    expect(systemSchema.parse(await json('/api/v1/systems/alrq-velline')).datasets).toBe(9);
    expect((await get('/api/v1/systems/none')).status).toBe(404);
  });
});

describe('one dataset', () => {
  it('is whole: document, assessment, and points in three forms that agree', async () => {
    const dataset = datasetAnswerSchema.parse(await json('/api/v1/datasets/CK-000124'));
    const document = await get(dataset.links.document);
    expect(document.headers.get('content-disposition')).toBe('attachment; filename="CK-000124.1.json"');
    expect(await document.json()).toEqual(dataset.document);
    expect(checkDocument(dataset.document)).toMatchObject({ ok: true });
    const points = datasetPointsSchema.parse(await json(dataset.links.pointsJson));
    expect(points.points).toHaveLength(dataset.assessment.summary.points);
    const lines = (await (await get(dataset.links.pointsNdjson)).text()).trimEnd().split('\n');
    const csv = Papa.parse<Record<string, string>>(await (await get(dataset.links.pointsCsv)).text(), {
      header: true,
      skipEmptyLines: true,
    }).data;
    points.points.forEach((point, i) => {
      expect(JSON.parse(lines[i])).toMatchObject(point);
      expect(Number(csv[i].energy_kT)).toBe(point.energy);
      expect(Number(csv[i].z)).toBe(point.z);
    });
    expect([points.note, csv[0].note, JSON.parse(lines[0]).note]).toEqual(Array(3).fill(dataset.note));
    expect(dataset.note).toMatch(/^Invented for the demonstration/);
  });

  it.each([
    ['text/csv', 'text/csv; charset=utf-8; header=present'],
    ['application/x-ndjson', 'application/x-ndjson'],
    ['application/json, text/csv;q=0.5', 'application/json'],
    ['*/*', 'application/json'],
  ])('points for Accept: %s', async (accept, contentType) => {
    const response = await get('/api/v1/datasets/CK-000124/points', { Accept: accept });
    expect(response.headers.get('content-type')).toBe(contentType);
    expect(response.headers.get('vary')).toContain('Accept');
  });

  it.each([
    ['/api/v1/datasets/CK-000124/points', 406, 'text/html'],
    ['/api/v1/datasets/CK-000124/points?format=xlsx', 400],
    ['/api/v1/datasets/CK-999999/points', 404],
    ['/api/v1/datasets/CK-999999', 404],
    ['/api/v1/datasets/CK-000124.2', 404],
    ['/api/v1/datasets/nonsense/document', 404],
    ['/api/v1/datasets?flag=bad', 400],
    ['/api/v1/datasets?cursor=bm90', 400],
    [`/api/v1/datasets?cursor=${Buffer.from('[1e999,1]').toString('base64url')}`, 400],
    ['/api/v1/datasets?from=5&to=-5', 400],
    ['/api/v1/datasets?from=abc', 400],
    ['/api/v1/overlay?limit=3', 400],
    ['/api/v1/systems?limit=x', 400],
  ])('%s: %i as a problem', async (path, status, accept = '*/*') => {
    const response = await get(path, { Accept: accept });
    expect(response.status).toBe(status);
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(problemSchema.parse(await response.json()).status).toBe(status);
  });

  it('is a tombstone once it was withdrawn', async () => {
    for (const rest of ['', '/points', '/document']) {
      const response = await get(`/api/v1/datasets/CK-000100${rest}`);
      expect(response.status).toBe(410);
      expect(response.headers.get('content-type')).toBe('application/problem+json');
      expect(withdrawnSchema.parse(await response.json()).tombstone.accession).toBe('CK-000100');
    }
  });
});

describe('what did not change', () => {
  it.each([
    '/api/v1/datasets',
    '/api/v1/datasets?system=alrq-velline&from=-1',
    '/api/v1/datasets/CK-000124',
    '/api/v1/datasets/CK-000124/document',
    '/api/v1/datasets/CK-000124/points?format=csv',
    '/api/v1/overlay',
    '/api/v1/systems',
    '/api/v1/systems/merv-halide',
  ])('%s has a strong ETag, answers 304 to it, and HEAD', async (path) => {
    const response = await get(path);
    const etag = response.headers.get('etag') ?? '';
    expect(etag).toMatch(/^"[\w-]+"$/);
    expect(response.headers.get('cache-control')).toContain('no-cache');
    const again = await get(path, { 'If-None-Match': etag });
    expect(again.status).toBe(304);
    expect(again.headers.get('etag')).toBe(etag);
    expect((await get(path, { 'If-None-Match': '"other"' })).headers.get('etag')).toBe(etag);
    const head = await fetch(`${app.url}${path}`, { method: 'HEAD' });
    expect([head.status, head.headers.get('etag'), await head.text()]).toEqual([200, etag, '']);
    const other = await fetch(`${app.url}${path}`, { method: 'DELETE' });
    expect([other.status, other.headers.get('allow')]).toEqual([405, 'GET, HEAD, OPTIONS']);
  });

  it('has one ETag for each form', async () => {
    const path = '/api/v1/datasets/CK-000124/points';
    const tags = await Promise.all(
      ['application/json', 'text/csv', 'application/x-ndjson'].map(async (accept) =>
        (await get(path, { Accept: accept })).headers.get('etag'),
      ),
    );
    expect(new Set(tags).size).toBe(3);
  });
});
