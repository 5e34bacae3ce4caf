/** Debian's Chromium through Playwright, for the browser tests. */
import { existsSync } from 'node:fs';
import { type Browser, chromium } from 'playwright-core';

const PLACES = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

/** Where Chromium is: CHROMIUM_PATH, else the usual places; null where it is not installed. */
export const chromiumPath: string | null =
  process.env.CHROMIUM_PATH ?? PLACES.find((place) => existsSync(place)) ?? null;

/** For the title of a browser test, which is skipped where there is no Chromium. */
export const browserNote = chromiumPath
  ? ''
  : ' (skipped: no Chromium found; install Debian’s chromium or set CHROMIUM_PATH)';

/** Starts the browser without a window. */
export function openBrowser(): Promise<Browser> {
  if (!chromiumPath)
    throw new Error('No Chromium is installed; skip the test with `describe.skipIf(!chromiumPath)`.');
  return chromium.launch({
    executablePath: chromiumPath,
    args: [
      ...['--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run'],
      ...['--disable-background-networking', '--disable-component-update', '--disable-sync'],
    ],
  });
}
