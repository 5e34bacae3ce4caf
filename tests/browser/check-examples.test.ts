/** Each example is one click away, shows what the API says, and has an address that leads back to it. */
import { expect, it } from 'vitest';
import { EXAMPLE_WORDS } from '@/components/check/example-words';
import { formatScore } from '@/components/ui/format-quantity';
import { describeInBrowser, listenForComplaints } from '@/tests/support/browse-app';
import { askApi, exampleDocumentOf, resultShown, rowsIn, verdictIn } from '@/tests/support/check-page';

describeInBrowser('the examples of the page', ({ newPage, url }) => {
  it.each(EXAMPLE_WORDS)(
    '$slug: opened by a click, counted as by the API, kept by its address',
    async (words) => {
      const { document, assessment, series } = await askApi(url(''), exampleDocumentOf(words.slug));
      const page = await newPage();
      const complaints = listenForComplaints(page);
      let calls = 0;
      page.on('request', (request) => {
        if (request.url().endsWith('/api/v1/assessments')) calls += 1;
      });
      await page.goto(url('/check'));
      await page.getByRole('button', { name: words.title }).click();
      await resultShown(page);

      const { summary } = assessment;
      const verdict = verdictIn(page);
      expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe(document.title);
      expect(await verdict.locator('p').first().textContent()).toBe(`${summary.onCurve} / ${summary.points}`);
      expect(await verdict.getByRole('list').first().getByRole('listitem').allTextContents()).toEqual([
        `on curve${summary.onCurve}`,
        `warning${summary.warning}`,
        `off curve${summary.offCurve}`,
      ]);
      expect(await verdict.locator('dd').first().textContent()).toBe(formatScore(summary.rmsZ));
      expect(await rowsIn(page).count()).toBe(series.length);
      for (const [i, { assessed }] of series.entries()) {
        const onCurve = assessed.points.filter(({ flag }) => flag === 'on-curve').length;
        expect(await rowsIn(page).nth(i).textContent()).toContain(`${onCurve} / ${assessed.points.length}`);
      }
      expect(new URL(page.url()).search).toBe(`?example=${words.slug}`);
      expect(calls).toBe(1);

      await page.reload();
      await resultShown(page);
      expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe(document.title);
      expect(new URL(page.url()).search).toBe(`?example=${words.slug}`);
      expect(calls).toBe(2);
      expect(complaints).toEqual([]);
      await page.close();
    },
  );

  it('its text can be changed, and the assessment gone back to', async () => {
    const page = await newPage();
    await page.goto(url('/check?example=collapse'));
    await resultShown(page);
    await page.getByRole('button', { name: 'Change the data' }).click();
    const text = await page.getByRole('textbox', { name: 'Dataset document' }).inputValue();
    expect(JSON.parse(text)).toEqual(exampleDocumentOf('collapse'));
    await page.getByRole('button', { name: 'Back to the last assessment' }).click();
    await resultShown(page);
    await page.close();
  });

  it('stepping through the series shows each one’s statements', async () => {
    const page = await newPage();
    await page.goto(url('/check?example=collapse'));
    await resultShown(page);
    const heading = page.getByRole('region', { name: 'Statements', exact: true }).locator('h2');
    const labels = exampleDocumentOf('collapse').series.map(({ label }) => label);
    for (const label of [...labels, labels[0]]) {
      expect(await heading.textContent()).toBe(label);
      await page.getByRole('button', { name: 'Next series' }).click();
    }
    await page.close();
  });
});
