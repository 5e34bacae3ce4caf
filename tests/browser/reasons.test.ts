/** Why a series misses the curve: the sentence, the trial, the way back, the statement; and the refit. */
import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { describeInBrowser, listenForComplaints } from '@/tests/support/browse-app';
import {
  askApi,
  assessIn,
  canvasIn,
  editorIn,
  exampleDocumentOf,
  paste,
  resultShown,
  rowsIn,
  verdictIn,
} from '@/tests/support/check-page';
import { signedIn } from '@/tests/support/sign-in';

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** The wild type of the example alone, its gap entered the wrong way round. */
function reversedDocument(): DatasetDocument {
  const document = structuredClone(exampleDocumentOf('collapse'));
  const [wildType] = document.series;
  wildType.parameters.gap = { value: 2.4, unit: 'kT', orientation: 'active-minus-inactive', u: 0.06 };
  return { ...document, series: [wildType] };
}

const SENTENCE = /^Reading the gap as inactive\s−\sactive brings RMS z from (\d+\.\d+) to (\d\.\d+)\.$/;
const bandIn = (page: Page) => page.getByRole('region', { name: 'Trial' });
const tryIn = (page: Page) => page.getByRole('button', { name: /^Try it: the gap read as/ });
const reasonsIn = (page: Page) => page.locator('section[aria-labelledby=why-it-misses]');
const strip = (page: Page) => rowsIn(page).first().locator('svg[width]');
const onCurveSaid = async (page: Page) =>
  /^(\d+) \/ \d+/.exec((await verdictIn(page).textContent()) ?? '')?.[1];

describeInBrowser('why a series misses', ({ newPage, url }) => {
  async function open(
    document: DatasetDocument,
    motion: 'reduce' | 'no-preference' = 'reduce',
  ): Promise<Page> {
    const page = await newPage({ reducedMotion: motion });
    await page.goto(url('/check'));
    await paste(page, document);
    await assessIn(page).click();
    await resultShown(page);
    return page;
  }

  it('says it in a sentence; a trial draws the points on the curve, marks itself and can be left', async () => {
    const document = reversedDocument();
    const { summary } = (await askApi(url(''), document)).assessment;
    const page = await open(document);
    const complaints = listenForComplaints(page);
    const sentence = (await reasonsIn(page).locator('li li p').first().textContent()) ?? '';
    expect(sentence).toMatch(SENTENCE);
    const [, before, after] = SENTENCE.exec(sentence) ?? [];
    expect(Number(before)).toBeGreaterThan(10);
    expect(Number(after)).toBeLessThan(2);
    expect(await rowsIn(page).first().textContent()).toContain('gap reversed?');
    const stated = await strip(page).innerHTML();

    await tryIn(page).click();
    await bandIn(page).waitFor();
    const band = await bandIn(page).textContent();
    expect(band).toContain(`RMS z ${before} → ${after}`);
    expect(band).toMatch(new RegExp(`points on the curve ${summary.onCurve} → 1[34] of 14`));
    expect(band).toContain('Nothing is saved.');
    const status = page.locator('main [role=status]').first();
    expect(await status.textContent()).toContain('Trial: wild type, with the gap read as');
    expect(Number(await onCurveSaid(page))).toBeGreaterThanOrEqual(13);
    await expect.poll(() => strip(page).innerHTML()).not.toBe(stated);

    await bandIn(page).getByRole('button', { name: 'Back to what was stated' }).click();
    await bandIn(page).waitFor({ state: 'detached' });
    expect(await onCurveSaid(page)).toBe(String(summary.onCurve));
    expect(await strip(page).innerHTML()).toBe(stated);
    expect(await status.textContent()).toBe('Back to what was stated.');
    // The button that began the trial has the focus again, and Escape leaves as well.
    expect(await tryIn(page).evaluate((button) => button === globalThis.document.activeElement)).toBe(true);
    await page.keyboard.press('Enter');
    await bandIn(page).waitFor();
    await page.keyboard.press('Escape');
    await bandIn(page).waitFor({ state: 'detached' });
    expect(complaints).toEqual([]);
    await page.close();
  });

  it('lets the points travel to the curve where motion is welcome', async () => {
    const page = await open(reversedDocument(), 'no-preference');
    // The strip draws the same points, and tells of each change.
    const places = strip(page).evaluate(
      (svg) =>
        new Promise<number>((resolve) => {
          const seen = new Set([svg.innerHTML]);
          new MutationObserver(() => seen.add(svg.innerHTML)).observe(svg, {
            attributes: true,
            childList: true,
            subtree: true,
          });
          setTimeout(() => resolve(seen.size), 4000);
        }),
    );
    await tryIn(page).click();
    // Before, after, and some between.
    expect(await places).toBeGreaterThan(3);
    await page.close();
  });

  it('states it so: what was pasted is rewritten and assessed again, and it can be undone', async () => {
    const document = reversedDocument();
    const page = await open(document);
    await page.getByRole('button', { name: /^State it so/ }).click();
    await page.getByText('Stated so:').waitFor();
    await expect.poll(async () => Number(await onCurveSaid(page))).toBeGreaterThanOrEqual(13);
    expect(await reasonsIn(page).count()).toBe(0);
    await page.getByRole('button', { name: 'Change the data' }).click();
    const rewritten: DatasetDocument = JSON.parse(await editorIn(page).inputValue());
    const wanted = structuredClone(document);
    wanted.series[0].parameters.gap = {
      value: 2.4,
      unit: 'kT',
      orientation: 'inactive-minus-active',
      u: 0.06,
    };
    expect(rewritten).toEqual(wanted);
    await page.getByRole('button', { name: 'Back to the last assessment' }).click();

    await page.getByRole('button', { name: 'Undo' }).click();
    await reasonsIn(page).waitFor();
    await page.getByRole('button', { name: 'Change the data' }).click();
    expect(JSON.parse(await editorIn(page).inputValue())).toEqual(document);
    await page.close();
  });

  it('does not state anything over what was typed since', async () => {
    const page = await open(reversedDocument());
    await page.getByRole('button', { name: 'Change the data' }).click();
    const edited = `${await editorIn(page).inputValue()}\n`;
    await editorIn(page).fill(edited);
    await page.getByRole('button', { name: 'Back to the last assessment' }).click();
    await tryIn(page).waitFor();
    expect(await page.getByRole('button', { name: /^State it so/ }).count()).toBe(0);
    await page.getByRole('button', { name: 'Change the data' }).click();
    expect(await editorIn(page).inputValue()).toBe(edited);
    await page.close();
  });

  it('shows nothing where nothing misses', async () => {
    const page = await newPage();
    await page.goto(url('/check?example=collapse'));
    await resultShown(page);
    expect(await page.getByText('Why it misses').count()).toBe(0);
    await page.close();
  });
});

describeInBrowser('a refit', ({ newPage, url }) => {
  const choose = (page: Page, parameter: string, choice: string) =>
    page
      .getByRole('group', { name: new RegExp(`^${parameter}`) })
      .getByText(choice, { exact: true })
      .click();

  it('finds the gap that the points were made with, and what they do not determine', async () => {
    const document = reversedDocument();
    const page = await newPage();
    await page.goto(url('/check'));
    await paste(page, document);
    await assessIn(page).click();
    await resultShown(page);
    const complaints = listenForComplaints(page);
    await page.getByRole('button', { name: 'Choose what to free' }).click();
    const start = page.getByRole('button', { name: 'Refit', exact: true });
    await start.waitFor();
    expect(await start.isDisabled()).toBe(true);
    expect(await page.getByText('Free at least one parameter.').count()).toBe(1);

    await choose(page, 'Energy gap', 'free');
    await start.click();
    const table = page.getByRole('region', { name: 'Refitted values beside those stated' });
    await table.waitFor();
    const cells = await table.locator('tbody tr').first().locator('th, td').allInnerTexts();
    expect(cells[1]).toMatch(/^−2\.400 ± 0\.060/);
    // The example was made with a gap of 2.4 kT.
    const [, value, u] = /^(\d\.\d+) ± (\d\.\d+)/.exec(cells[2]) ?? [];
    expect(Math.abs(Number(value) - 2.4)).toBeLessThan(4 * Number(u));

    await page.getByRole('button', { name: 'Try it: the refitted values' }).click();
    await bandIn(page).waitFor();
    expect(await bandIn(page).textContent()).toContain('the refitted values');
    expect(Number(await onCurveSaid(page))).toBeGreaterThanOrEqual(13);
    await page.keyboard.press('Escape');

    // Gap, number of sites and both constants at once: one curve cannot tell them apart.
    for (const parameter of ['Sites', 'K inactive', 'K active']) await choose(page, parameter, 'free');
    await start.click();
    await page
      .getByText(/not determined by these data/)
      .first()
      .waitFor();
    expect(await canvasIn(page).count()).toBe(1);

    // What was fitted to another document goes with it.
    await page.getByRole('button', { name: /^State it so/ }).click();
    await page.getByText('Stated so:').waitFor();
    await table.waitFor({ state: 'detached' });
    expect(complaints).toEqual([]);
    await page.close();
  });
});

describeInBrowser('reasons elsewhere', (visit) => {
  const { newPage, url } = visit;

  it('a published dataset is tried with the document that the page fetches, and states nothing', async () => {
    const { datasets } = await (await fetch(url('/api/v1/datasets?limit=50'))).json();
    const { accession } = datasets.find(({ title }: { title: string }) => title.includes('in cell extract'));
    const page = await newPage();
    await page.goto(url(`/datasets/${accession}`));
    await reasonsIn(page).waitFor();
    const complaints = listenForComplaints(page);
    expect(await page.getByRole('button', { name: /^State it so/ }).count()).toBe(0);
    const asked = page.waitForRequest((request) => request.url().includes(`/api/v1/datasets/${accession}.`));
    await page
      .getByRole('button', { name: /^Try it: the concentrations/ })
      .first()
      .click();
    await asked;
    await bandIn(page).waitFor();
    expect(await bandIn(page).textContent()).toContain('the concentrations multiplied by 1000');
    expect(complaints).toEqual([]);
    await page.close();
  });

  it('a draft is changed by a statement like by any other edit, and it can be undone', async () => {
    const page = await signedIn(visit, 'depositor');
    await page.goto(url('/check'));
    await paste(page, { ...reversedDocument(), system: 'alrq-velline' });
    await page.getByRole('button', { name: 'Keep as a draft' }).click();
    await page.waitForURL(/\/deposits\/[\w-]+$/);
    await reasonsIn(page).waitFor();
    const orientation = page.getByLabel('orientation of the energy gap');
    const stated = await orientation.inputValue();
    await page.getByRole('button', { name: /^State it so/ }).click();
    await page.getByText('Changed here, not saved yet.').waitFor();
    expect(await orientation.inputValue()).not.toBe(stated);
    // What was found is of the draft as it was saved, and is not stated twice.
    expect(await page.getByRole('button', { name: /^State it so/ }).count()).toBe(0);
    await page.getByRole('button', { name: 'Undo' }).click();
    expect(await orientation.inputValue()).toBe(stated);
    await page.getByRole('button', { name: /^State it so/ }).click();
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText(/^Saved \d/).waitFor();
    await reasonsIn(page).waitFor({ state: 'detached' });
    await page.close();
  });

  it.each([
    [1440, 'light'],
    [390, 'dark'],
  ] as const)('at %i px, %s: a trial has nothing that axe finds, and fits', async (width, colorScheme) => {
    const page = await newPage({ viewport: { width, height: 900 }, colorScheme, reducedMotion: 'reduce' });
    await page.goto(url('/check'));
    await paste(page, reversedDocument());
    await assessIn(page).click();
    await resultShown(page);
    await tryIn(page).click();
    await bandIn(page).waitFor();
    await page.getByRole('button', { name: 'Choose what to free' }).click();
    await page.getByRole('button', { name: 'Refit', exact: true }).waitFor();
    const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
    expect(violations.map(({ id, nodes }) => [id, nodes[0].html])).toEqual([]);
    const overflow = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
    expect(overflow).toBeLessThanOrEqual(0);
    await page.close();
  });
});
