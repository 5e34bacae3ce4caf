/** Pages answer with the status that what they show has: 401, 403, 404, 410. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeDatabase } from '@/db/client';
import { call, sessionHeader, settleIn } from '@/tests/support/deposit-calls';
import { exampleDocument } from '@/tests/support/example-document';
import { type RunningApp, startApp } from '@/tests/support/start-app';

let app: RunningApp;
let member: Record<string, string>;
let outsider: Record<string, string>;
let curator: Record<string, string>;
let draft = '';
let submitted = '';
beforeAll(async () => {
  app = await startApp({ CURVEKEEP_DEMO: '1' });
  const lab = await settleIn(app);
  member = (await sessionHeader('depositor', lab)).headers;
  outsider = (await sessionHeader('depositor', await settleIn(app))).headers;
  curator = (await sessionHeader('curator')).headers;
  draft = await newDraft();
  submitted = await newDraft();
  await call(app, 'POST', `/deposits/${submitted}/submission`, member);
});
afterAll(async () => {
  await closeDatabase();
  await app.stop();
});

async function newDraft(): Promise<string> {
  const created = await call(app, 'POST', '/deposits', member, exampleDocument());
  return ((await created.json()) as { id: string }).id;
}

const get = (path: string, headers: Record<string, string> = {}) =>
  fetch(`${app.url}${path}`, { headers, redirect: 'manual' });

describe('a page', () => {
  it('of a withdrawn dataset is gone, and says why', async () => {
    const response = await get('/datasets/CK-000100');
    expect(response.status).toBe(410);
    const html = await response.text();
    expect(html).toContain('This dataset was withdrawn');
    expect(html).toContain('the stock of velline had been thawed twice');
    expect((await get('/datasets/CK-000100.1')).status).toBe(410);
    expect((await fetch(`${app.url}/datasets/CK-000100`, { method: 'HEAD' })).status).toBe(410);
  });

  it('that Next fetches for one that is open keeps its status: the browser is to take it up', async () => {
    // Next leads to an address that no cache takes for the page's own.
    const response = await fetch(`${app.url}/datasets/CK-000100`, { headers: { rsc: '1' } });
    expect(response.headers.get('content-type')).toContain('text/x-component');
    expect(response.status).toBe(200);
  });

  it.each(['/deposits', '/deposits/whichever', '/curation', '/curation/whichever', '/lab'])(
    '%s asks a visitor to sign in',
    async (path) => {
      const response = await get(path);
      expect(response.status).toBe(401);
      expect(response.headers.get('www-authenticate')).toBe('Bearer realm="Curvekeep"');
      const html = await response.text();
      expect(html).toMatch(/<h1[^>]*>Sign in</);
      expect(html).toContain(`name="next" value="${path}"`);
      const policy = response.headers.get('content-security-policy') ?? '';
      const nonce = /'nonce-([^']+)'/.exec(policy)?.[1] ?? '';
      expect(html).toContain(`nonce="${nonce}"`);
    },
  );

  it('for another role or laboratory is refused; what may not be known of is not found', async () => {
    expect((await get('/curation', member)).status).toBe(403);
    expect((await get(`/curation/${submitted}`, member)).status).toBe(403);
    expect((await get('/deposits', curator)).status).toBe(403);
    expect((await get('/lab', curator)).status).toBe(403);
    expect((await get(`/deposits/${draft}`, outsider)).status).toBe(404);
    expect((await get(`/deposits/${submitted}`, outsider)).status).toBe(404);
    expect((await get(`/curation/${draft}`, curator)).status).toBe(404);
    expect((await get('/deposits/nothing', member)).status).toBe(404);
    expect((await get('/datasets/CK-009999')).status).toBe(404);
    expect((await get('/labs/nobody')).status).toBe(404);
  });

  it('that one may see is there', async () => {
    for (const path of ['/deposits', `/deposits/${draft}`, `/deposits/${submitted}`, '/lab'])
      expect([path, (await get(path, member)).status]).toEqual([path, 200]);
    for (const path of ['/curation', `/curation/${submitted}`])
      expect([path, (await get(path, curator)).status]).toEqual([path, 200]);
    expect((await get('/datasets/CK-000101')).status).toBe(200);
  });

  it('that is not there says so in its title; a place in a list that is none leads to its beginning', async () => {
    const titleOf = async (path: string) => /<title>([^<]*)/.exec(await (await get(path)).text())?.[1];
    expect(await titleOf('/datasets/CK-009999')).toContain('There is no such dataset');
    expect(await titleOf('/datasets/CK-000100')).toContain('Withdrawn dataset');
    expect(await titleOf('/labs/nobody')).toContain('There is no such laboratory');
    const junk = await get('/deposits?cursor=junk', member);
    expect([junk.status, junk.headers.get('location')]).toEqual([307, '/deposits']);
  });

  it('answers many at a time each with its own', async () => {
    const paths = ['/datasets/CK-000100', '/datasets/CK-000101', '/deposits', '/datasets/CK-009999'];
    const answers = await Promise.all([...paths, ...paths, ...paths].map((path) => get(path)));
    expect(answers.map(({ status }) => status)).toEqual(Array(3).fill([410, 200, 401, 404]).flat());
  });
});

describe('declining over the API', () => {
  const decide = (id: string, body: unknown) => call(app, 'POST', `/deposits/${id}/decision`, curator, body);

  it('needs a letter, and is final', async () => {
    expect((await decide(submitted, { kind: 'declined' })).status).toBe(422);
    expect((await decide(submitted, { kind: 'refused', letter: 'x' })).status).toBe(422);
    const publication = { day: '2090-01-01', timeZone: 'UTC' };
    expect((await decide(submitted, { kind: 'declined', letter: 'x', publication })).status).toBe(422);
    const declined = await decide(submitted, { kind: 'declined', letter: 'No energy can be told.' });
    expect([declined.status, ((await declined.json()) as { state: string }).state]).toEqual([
      200,
      'declined',
    ]);
    const html = await (await get(`/deposits/${submitted}`, member)).text();
    for (const words of ['No energy can be told.', 'that is final', 'New draft from this document'])
      expect(html).toContain(words);
    expect((await decide(submitted, { kind: 'accepted' })).status).toBe(409);
  });

  it('accepting for a later day waits, and says for what', async () => {
    const id = await newDraft();
    await call(app, 'POST', `/deposits/${id}/submission`, member);
    const refused = [
      { day: '2020-01-01', timeZone: 'UTC' },
      { day: '2090-02-30', timeZone: 'UTC' },
      { day: '2090-01-01', timeZone: 'Europe/Nowhere' },
    ];
    for (const publication of refused)
      expect((await decide(id, { kind: 'accepted', publication })).status).toBe(422);
    const publication = { day: '2090-01-01', timeZone: 'Europe/Oslo' };
    const accepted = await decide(id, { kind: 'accepted', publication });
    expect(await accepted.json()).toMatchObject({ state: 'accepted', accession: null, publication });
    expect(await (await get(`/deposits/${id}`, member)).text()).toContain(
      'It is published on 1 January 2090, at midnight (Europe/Oslo)',
    );
  });
});
