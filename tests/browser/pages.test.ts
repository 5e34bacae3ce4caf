/** What holds of every page in every state: width, targets, no complaints, both themes, accessibility. */
import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { describeInBrowser, drawn, listenForComplaints, settled } from '@/tests/support/browse-app';
import { PAGE_STATES, reachState } from '@/tests/support/page-states';

const WIDTHS = [360, 390, 1024, 1440, 1920];
/** WCAG 2.2, 2.5.8: what is pointed at measures so many pixels either way. */
const LEAST_TARGET = 24;
/** Of the page in either theme, as the design has them. */
const GROUNDS: Record<string, string> = { light: 'rgb(250, 251, 250)', dark: 'rgb(15, 23, 29)' };
const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** How much wider the page is than its window, in words; empty where it can not be scrolled sideways. */
const overflowIn = (page: Page) =>
  page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    return scrollWidth <= clientWidth ? '' : `${scrollWidth} px in ${clientWidth}`;
  });

/** Buttons, links and fields smaller than a target may be; links within a sentence may be as its line. */
const smallTargetsIn = (page: Page) =>
  page.evaluate((least) => {
    const isWithinSentence = (element: Element) =>
      element.tagName === 'A' &&
      getComputedStyle(element).display === 'inline' &&
      [...(element.parentElement?.childNodes ?? [])].some(
        (node) => node.nodeType === Node.TEXT_NODE && (node.textContent ?? '').trim() !== '',
      );
    return [...document.querySelectorAll('a, button, summary, input, select, textarea, [role=slider]')]
      .filter((element) => element.checkVisibility() && !isWithinSentence(element))
      .flatMap((element) => {
        const isSkipLink = element.matches('a[href="#main"], a[href="#datasets"]');
        const area = element.matches('input[type=radio], input[type=checkbox], input[type=file]')
          ? (element.closest('label') ?? element)
          : element;
        const { width, height } = area.getBoundingClientRect();
        return isSkipLink || (width >= least && height >= least)
          ? []
          : [`${area.tagName} ${area.textContent?.slice(0, 30)}: ${width} × ${height}`];
      });
  }, LEAST_TARGET);

describeInBrowser('every page', (visit) => {
  const { newPage, url } = visit;

  describe.each(PAGE_STATES)('$state', (state) => {
    let page: Page;
    let complaints: string[];
    beforeAll(async () => {
      page = await newPage();
      complaints = listenForComplaints(page, 404, 410, 422);
      await reachState(page, visit, state);
    });
    afterAll(() => page.close());

    it.each(['light', 'dark'])('has nothing that axe finds, %s', async (theme) => {
      await page.evaluate((chosen) => document.documentElement.setAttribute('data-theme', chosen), theme);
      await settled(page);
      const ground = await page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
      expect(ground).toBe(GROUNDS[theme]);
      const { violations, passes } = await new AxeBuilder({ page }).withTags(RULES).analyze();
      const found = violations.map(
        ({ id, nodes }) =>
          `${id}: ${nodes.map(({ target, failureSummary }) => `${target} ${failureSummary}`).join('; ')}`,
      );
      expect(found).toEqual([]);
      expect(passes.length).toBeGreaterThan(5);
    });

    it('fits 360 to 1920 px, with targets to hit', async () => {
      const small: string[] = [];
      for (const width of WIDTHS) {
        await page.setViewportSize({ width, height: 900 });
        await drawn(page);
        // A chart follows a new width a little later than the page.
        await expect.poll(() => overflowIn(page)).toBe('');
        small.push(...(await smallTargetsIn(page)).map((target) => `${width}: ${target}`));
      }
      expect(small).toEqual([]);
    });

    it('has nothing blocked and nothing that failed', () => {
      expect(complaints).toEqual([]);
    });
  });

  it('the appearance that is chosen is set at once and survives a reload', async () => {
    const page = await newPage({ colorScheme: 'light' });
    await page.goto(url('/check'));
    const look = () =>
      page.evaluate(() => ({
        theme: document.documentElement.dataset.theme,
        ground: getComputedStyle(document.documentElement).backgroundColor,
      }));
    const before = await look();
    expect(before.theme).toBeUndefined();
    await page.getByRole('button', { name: 'Dark', exact: true }).click();
    await expect.poll(async () => (await look()).theme).toBe('dark');
    await expect.poll(async () => (await look()).ground).not.toBe(before.ground);
    const dark = await look();
    await page.reload();
    expect(await look()).toEqual(dark);
    expect(await page.getByRole('button', { name: 'Dark', exact: true }).getAttribute('aria-pressed')).toBe(
      'true',
    );
    await page.getByRole('button', { name: 'System', exact: true }).click();
    await expect.poll(look).toEqual(before);
    await page.close();
  });
});
