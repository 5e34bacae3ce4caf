/** The page without a mouse. */
import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { EXAMPLE_WORDS } from '@/components/check/example-words';
import { describeInBrowser } from '@/tests/support/browse-app';
import { editorIn, paste, resultShown, rulersIn } from '@/tests/support/check-page';
import { contractDocument } from '@/tests/support/contract-document';

/** What has the focus, as it is announced. */
const focusedIn = (page: Page) =>
  page.evaluate(() => {
    const element = document.activeElement;
    const label =
      element && 'labels' in element ? (element.labels as NodeListOf<HTMLLabelElement> | null) : null;
    return element?.getAttribute('aria-label') ?? label?.[0]?.textContent ?? element?.textContent ?? '';
  });

async function tabs(page: Page, count: number): Promise<string[]> {
  const stops: string[] = [];
  for (let i = 0; i < count; i++) {
    await page.keyboard.press('Tab');
    stops.push((await focusedIn(page)).slice(0, 40));
  }
  return stops;
}

describeInBrowser('the page by keyboard', ({ newPage, url }) => {
  it('Tab passes the skip link, the navigation, the editor and the examples in this order', async () => {
    const page = await newPage();
    await page.goto(url('/check'));
    await editorIn(page).waitFor();
    expect(await tabs(page, 14)).toEqual([
      'Skip to the content',
      'Curvekeep',
      'Browse',
      'Check data',
      'Methods',
      'Sign in',
      'schema',
      'Methods',
      'Choose a file',
      'Dataset document or table of points',
      ...EXAMPLE_WORDS.map(({ title }) => title),
      'A table of points',
    ]);
    await page.close();
  });

  it('the skip link leads past the header', async () => {
    const page = await newPage();
    await page.goto(url('/check'));
    await editorIn(page).waitFor();
    await page.keyboard.press('Tab');
    const shown = await page.getByRole('link', { name: 'Skip to the content' }).boundingBox();
    expect(shown?.height).toBeGreaterThanOrEqual(24);
    await page.keyboard.press('Enter');
    await expect.poll(() => page.evaluate(() => document.activeElement?.id)).toBe('main');
    expect(await tabs(page, 1)).toEqual(['schema']);
    await page.close();
  });

  it('Ctrl + Enter assesses, and Tab reaches switch, ruler, series and table of the result', async () => {
    const page = await newPage();
    await page.goto(url('/check'));
    await paste(page, contractDocument());
    await editorIn(page).press('Control+Enter');
    await resultShown(page);
    await page.locator('body').evaluate((body) => {
      body.tabIndex = -1;
      body.focus();
    });
    const stops = await tabs(page, 28);
    const wanted = [
      'Change the data',
      'by energy',
      'from, kT',
      'Window of energies.',
      'wild type',
      'series',
      'Points 1 to 2 of 2',
    ];
    const met = stops.flatMap((stop) => wanted.filter((start) => stop.startsWith(start)));
    expect(met).toEqual(wanted);
    await page.close();
  });

  it('the switch and the ruler answer to arrows, and every stop shows where it is', async () => {
    const page = await newPage();
    await page.goto(url('/check?example=collapse'));
    await resultShown(page);
    await page.getByRole('radio', { name: 'by energy' }).focus();
    await page.keyboard.press('ArrowRight');
    await expect.poll(() => new URL(page.url()).searchParams.get('by')).toBe('velline');
    const outlines: string[] = [];
    await rulersIn(page).first().focus();
    for (let i = 0; i < 8; i++) {
      await page.keyboard.press('Tab');
      outlines.push(
        await page.evaluate(() => {
          const element = document.activeElement;
          return element === null ? '' : getComputedStyle(element).outlineStyle;
        }),
      );
    }
    expect(new Set(outlines)).not.toContain('none');
    await page.close();
  });
});
