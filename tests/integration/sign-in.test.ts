/** Signing in and out over HTTP as a browser without scripts does it, and what the pages then show. */
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeDatabase, write } from '@/db/client';
import { memberships } from '@/db/tables/laboratories';
import { people } from '@/db/tables/people';
import { ensureDemoAccounts, ensureLaboratory } from '@/lib/people/ensure-demo-accounts';
import { type RunningApp, startApp } from '@/tests/support/start-app';

const PASSWORD = 'curvekeep-demo';

let app: RunningApp;
let labId: string;
beforeAll(async () => {
  app = await startApp({ CURVEKEEP_DEMO: '1' });
  // The same database file, from a process of its own.
  process.env.CURVEKEEP_DATA_DIR = app.dataDir;
  labId = await ensureLaboratory({
    slug: 'thornmere',
    name: 'Thornmere Group',
    institution: 'Invented Institute',
  });
  await ensureDemoAccounts([
    { email: 'depositor@demo.example', labId, role: 'member' },
    { email: 'manager@demo.example', labId, role: 'manager' },
  ]);
});
afterAll(async () => {
  await closeDatabase();
  await app.stop();
});

function get(path: string, cookie = ''): Promise<Response> {
  return fetch(`${app.url}${path}`, { redirect: 'manual', headers: cookie ? { cookie } : {} });
}

/** The form about something that has a button of that name, with its hidden fields as the server sent them. */
function formWith(html: string, button: string, about: string): FormData {
  const forms = html.match(/<form\b[\s\S]*?<\/form>/g) ?? [];
  const found = forms.find(
    (form) => form.includes(`>${button}</button>`) && form.includes(about) && /method="post"/i.test(form),
  );
  if (!found) throw new Error(`no form with the button ${button}`);
  const form = new FormData();
  for (const [tag] of found.matchAll(/<input\b[^>]*type="hidden"[^>]*>/g)) {
    const attribute = (name: string) => new RegExp(` ${name}="([^"]*)"`).exec(tag)?.[1] ?? '';
    const value = attribute('value').replaceAll('&quot;', '"').replaceAll('&amp;', '&');
    form.set(attribute('name'), value);
  }
  return form;
}

async function send(
  path: string,
  button: string,
  fields: Record<string, string | string[]>,
  headers: Record<string, string> = {},
  about = '',
): Promise<Response> {
  const form = formWith(await (await get(path, headers.cookie)).text(), button, about);
  for (const [name, values] of Object.entries(fields))
    for (const value of [values].flat()) form.append(name, value);
  return fetch(`${app.url}${path}`, {
    method: 'POST',
    redirect: 'manual',
    headers: { origin: app.url, ...headers },
    body: form,
  });
}

function sessionCookie(response: Response): string {
  return response.headers.getSetCookie().find((cookie) => cookie.includes('curvekeep-session')) ?? '';
}

async function signedIn(email: string): Promise<string> {
  const response = await send('/sign-in', 'Sign in', { email, password: PASSWORD });
  expect(response.status).toBe(303);
  return sessionCookie(response).replace(/;.*/, '');
}

const words = (html: string) => html.replace(/<script\b[\s\S]*?<\/script>/g, '').replace(/<[^>]*>/g, ' ');

describe('signing in', () => {
  it('sends the person on to where they wanted to be, with a cookie that no script reads', async () => {
    const response = await send('/sign-in?next=%2Flab', 'Sign in', {
      email: 'manager@demo.example',
      password: PASSWORD,
    });
    expect(response.status).toBe(303);
    expect(new URL(response.headers.get('location') ?? '', app.url).href).toBe(`${app.url}/lab`);
    const cookie = sessionCookie(response);
    expect(cookie).toMatch(/^curvekeep-session=[a-z2-7]{40};/);
    expect(cookie).toMatch(/; HttpOnly/i);
    expect(cookie).toMatch(/; SameSite=lax/i);
    expect(cookie).toMatch(/; Path=\//i);
    expect(cookie).not.toMatch(/; (Secure|Domain)/i);
  });

  it('never sends anybody to another site', async () => {
    const response = await send('/sign-in?next=%2F%2Fevil.example', 'Sign in', {
      email: 'manager@demo.example',
      password: PASSWORD,
    });
    // The sign-in page leads whoever wanted to be nowhere to where their work waits.
    expect(new URL(response.headers.get('location') ?? '', app.url).href).toBe(`${app.url}/sign-in`);
  });

  it('answers alike for a wrong password and an unknown address, and sets no cookie', async () => {
    const answers: string[] = [];
    for (const email of ['manager@demo.example', 'nobody@demo.example']) {
      const response = await send('/sign-in', 'Sign in', { email, password: 'not the password' });
      expect(response.status).toBe(200);
      expect(sessionCookie(response)).toBe('');
      answers.push(words(await response.text()));
    }
    expect(answers[0]).toContain('There is no account with this e-mail address and this password.');
    expect(answers[1]).toBe(answers[0]);
  });

  it('says at the field what would be right', async () => {
    const response = await send('/sign-in', 'Sign in', { email: 'nobody', password: '' });
    const html = await response.text();
    expect(words(html)).toContain('An e-mail address looks like name@institute.example.');
    expect(words(html)).toContain('Enter your password.');
    expect(html.match(/aria-invalid="true"/g)).toHaveLength(2);
  });

  it('is refused to a page of another site', async () => {
    const fields = { email: 'manager@demo.example', password: PASSWORD };
    const response = await send('/sign-in', 'Sign in', fields, { origin: 'https://evil.example' });
    expect(response.status).toBeGreaterThanOrEqual(400);
    expect(sessionCookie(response)).toBe('');
  });

  it('shows the accounts of the demonstration, and fills the form with the one that is chosen', async () => {
    const html = await (await get('/sign-in?as=curator%40demo.example')).text();
    for (const name of ['depositor', 'manager', 'curator', 'admin'])
      expect(html).toContain(`${name}@demo.example`);
    const tag = (name: string) => new RegExp(`<input[^>]* name="${name}"[^>]*>`).exec(html)?.[0];
    expect(tag('email')).toContain('value="curator@demo.example"');
    expect(tag('password')).toContain(`value="${PASSWORD}"`);
  });

  it('logs no password, no session and no e-mail address', async () => {
    const cookie = await signedIn('manager@demo.example');
    const logged = JSON.stringify(app.logged());
    expect(logged).not.toContain(cookie.split('=')[1]);
    expect(logged).not.toMatch(/curvekeep-demo|demo\.example/);
  });
});

describe('pages', () => {
  it('ask a visitor to sign in, there and then', async () => {
    const response = await get('/lab');
    expect(response.status).toBe(401);
    expect(await response.text()).toContain('name="next" value="/lab"');
  });

  it.each([
    ['depositor@demo.example', ['Deposits'], ['Curation']],
    ['curator@demo.example', ['Curation'], ['Deposits']],
    ['admin@demo.example', ['Adan Administrator'], ['Deposits', 'Curation']],
  ])('show %s the ways that are theirs', async (email, present, absent) => {
    const html = await (await get('/methods', await signedIn(email))).text();
    const header = words(html.split('<main')[0] ?? '');
    expect(header).toContain('Sign out');
    for (const word of present) expect(header).toContain(word);
    for (const word of absent) expect(header).not.toContain(word);
  });

  it('of a laboratory: a manager makes a token, which is shown once; a member sees none', async () => {
    const cookie = await signedIn('manager@demo.example');
    const made = await send(
      '/lab',
      'Make a token',
      { name: 'plate reader', scopes: ['read-drafts', 'submit'], days: '30' },
      { cookie },
      labId,
    );
    const token = /value="(ckt_[A-Za-z0-9_-]{43})"/.exec(await made.text())?.[1];
    expect(token).toBeDefined();
    const later = await (await get('/lab', cookie)).text();
    expect(later).toContain('plate reader');
    expect(later).not.toContain('ckt_');
    const member = await (await get('/lab', await signedIn('depositor@demo.example'))).text();
    expect(member).toContain('Thornmere Group');
    expect(member).not.toContain('plate reader');
  });
});

describe('a session', () => {
  it('is dead after signing out, even for whoever kept the cookie', async () => {
    const cookie = await signedIn('depositor@demo.example');
    expect((await get('/lab', cookie)).status).toBe(200);
    const out = await send('/methods', 'Sign out', {}, { cookie });
    expect(out.status).toBe(303);
    expect(sessionCookie(out)).toMatch(/^curvekeep-session=;/);
    expect((await get('/lab', cookie)).status).toBe(401);
  });

  it('loses a membership and an account from the next request on', async () => {
    const cookie = await signedIn('depositor@demo.example');
    expect(await (await get('/lab', cookie)).text()).toContain('Thornmere Group');
    await write('acknowledged', async (tx) => {
      const [row] = await tx.select().from(people).where(eq(people.email, 'depositor@demo.example'));
      await tx.delete(memberships).where(eq(memberships.personId, row?.id ?? ''));
    });
    expect(await (await get('/lab', cookie)).text()).not.toContain('Thornmere Group');
    await write('acknowledged', async (tx) => {
      await tx
        .update(people)
        .set({ disabledAt: Date.now() })
        .where(eq(people.email, 'depositor@demo.example'));
    });
    expect((await get('/lab', cookie)).status).toBe(401);
  });
});
