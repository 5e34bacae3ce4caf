/** Pages work under their content policy: nothing of them is blocked. */
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { browserNote, chromiumPath, openBrowser } from '@/tests/support/open-browser';
import { type RunningApp, startApp } from '@/tests/support/start-app';

describe.skipIf(!chromiumPath)(`content policy in a browser${browserNote}`, () => {
  let app: RunningApp;
  let browser: Browser;
  beforeAll(async () => {
    [app, browser] = await Promise.all([startApp({ CURVEKEEP_DEMO: '1' }), openBrowser()]);
  });
  afterAll(async () => {
    await browser.close();
    await app.stop();
  });

  it.each(['/', '/check', '/methods', '/no-such-page'])(
    '%s: nothing is blocked, nothing fails',
    async (path) => {
      const page = await browser.newPage();
      const complaints: string[] = [];
      page.on('console', (message) => {
        if (message.type() === 'error' && !message.text().includes('404')) complaints.push(message.text());
      });
      page.on('pageerror', (error) => complaints.push(String(error)));
      await page.goto(`${app.url}${path}`, { waitUntil: 'networkidle' });
      expect(await page.title()).toContain('Curvekeep');
      expect(complaints).toEqual([]);
      await page.close();
    },
  );

  it('script that comes in as text does not run', async () => {
    const page = await browser.newPage();
    await page.goto(app.url);
    const ran = await page.evaluate(async () => {
      const blocked = new Promise((resolve) =>
        document.addEventListener('securitypolicyviolation', resolve, { once: true }),
      );
      const holder = document.createElement('div');
      holder.innerHTML = '<img src="data:," onerror="document.title = \'ran\'">';
      document.body.append(holder);
      await blocked;
      return document.title === 'ran';
    });
    expect(ran).toBe(false);
    await page.close();
  });
});
