/** One server and one browser for a file of browser tests, and what such a test does again and again. */
import type { Browser, BrowserContext, BrowserContextOptions, Page } from 'playwright-core';
import { afterAll, beforeAll, describe } from 'vitest';
import { browserNote, chromiumPath, openBrowser } from './open-browser';
import { type RunningApp, startApp } from './start-app';

export interface Visit {
  /**
   * A page on which nothing travels unless motion is asked for. Pages without options share what the browser has
   * loaded, which makes them quick; one with options has a context of its own.
   */
  newPage: (options?: BrowserContextOptions) => Promise<Page>;
  url: (path: string) => string;
}

/** Tests against the built application in Chromium; skipped, with a note, where there is none. */
export function describeInBrowser(title: string, tests: (visit: Visit) => void): void {
  describe.skipIf(!chromiumPath)(`${title}${browserNote}`, () => {
    let app: RunningApp;
    let browser: Browser;
    let shared: BrowserContext;
    const newContext = (options: BrowserContextOptions = {}) =>
      browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce', ...options });
    beforeAll(async () => {
      [app, browser] = await Promise.all([startApp({ CURVEKEEP_DEMO: '1' }), openBrowser()]);
      shared = await newContext();
    });
    afterAll(async () => {
      await browser.close();
      await app.stop();
    });
    tests({
      url: (path) => `${app.url}${path}`,
      newPage: async (options) => {
        const page = await (options ? await newContext(options) : shared).newPage();
        page.setDefaultTimeout(20_000);
        return page;
      },
    });
  });
}

/**
 * What the browser complains of from now on: errors in the console (a content policy's among them) and in scripts.
 *
 * @param expectedStatuses answers that the test provokes, of which the console tells as well
 */
export function listenForComplaints(page: Page, ...expectedStatuses: number[]): string[] {
  const complaints: string[] = [];
  page.on('console', (message) => {
    const expected = expectedStatuses.some((status) => message.text().includes(`status of ${status}`));
    if (message.type() === 'error' && !expected) complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(String(error)));
  return complaints;
}

/** Lets the page draw what has changed. */
export async function drawn(page: Page): Promise<void> {
  await page.evaluate(
    () => new Promise<void>((done) => requestAnimationFrame(() => requestAnimationFrame(() => done()))),
  );
}

/** Waits until no colour is on its way any more: even the shortest transition takes its frames, parent by parent. */
export async function settled(page: Page): Promise<void> {
  await page.evaluate(async () => {
    for (let still = 0; still < 3; ) {
      await new Promise(requestAnimationFrame);
      still = document.getAnimations().length === 0 ? still + 1 : 0;
    }
  });
}
