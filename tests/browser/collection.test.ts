/** The collection from end to end: two deposits by two ways, a curator, and a reader who finds them on the curve. */
import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import Papa from 'papaparse';
import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, it } from 'vitest';
import type { AssessedPoint, Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { DatasetList } from '@/schemas/dataset-answers';
import type { Overlay } from '@/schemas/overlay';
import { describeInBrowser, listenForComplaints } from '@/tests/support/browse-app';
import { assessIn, paste, resultShown } from '@/tests/support/check-page';
import { ownDataset } from '@/tests/support/own-dataset';
import { postDocument } from '@/tests/support/post-document';
import { signedIn } from '@/tests/support/sign-in';

/** A word that no dataset of the demonstration has in its title. */
const WORD = 'Quorumtest';
const LETTER = 'Please say in the abstract how the gap was measured.';
const BY_PAGE = ownDataset({ title: `${WORD} by the page`, gap: 2.4, pushed: { 4: 0.3, 7: -0.25 } });
const BY_TOKEN = ownDataset({ title: `${WORD} by a token`, gap: 1.2, pushed: { 2: -0.3 } });
const FILE = Buffer.from('c;a\n0;0.91\n');

describeInBrowser('the collection', (visit) => {
  const { newPage, url } = visit;
  const state = {
    before: { points: 0, offCurve: 0, datasets: 0 },
    page: '',
    token: '',
    accessions: [] as string[],
  };

  const overlay = async (): Promise<Overlay> => (await fetch(url('/api/v1/overlay'))).json();
  const listed = async (): Promise<DatasetList> => (await fetch(url(`/api/v1/datasets?q=${WORD}`))).json();
  const assessmentOf = async (document: DatasetDocument): Promise<Assessment> =>
    (await postDocument(url(''), document)).json();

  beforeAll(async () => {
    state.before = (await overlay()).counts;
  });

  it('a depositor checks data, keeps them as a draft, changes it, adds a file and submits it', async () => {
    const page = await signedIn(visit, 'depositor');
    const complaints = listenForComplaints(page);
    await page.goto(url('/check'));
    await paste(page, BY_PAGE);
    await assessIn(page).click();
    await resultShown(page);
    await page.getByRole('button', { name: 'Keep as a draft' }).click();
    await page.waitForURL(/\/deposits\/[\w-]+$/);
    state.page = new URL(page.url()).pathname.split('/')[2] ?? '';

    // The deposit is there and can be changed: a concentration is mistyped, said to be wrong where it stands, mended.
    const cell = page.getByRole('textbox', { name: 'velline of point 2' });
    expect(await cell.inputValue()).toBe('1');
    await cell.fill('one');
    await save(page);
    await page.getByRole('heading', { name: 'One thing to mend' }).waitFor();
    expect(await cell.getAttribute('aria-invalid')).toBe('true');
    await page.getByRole('button', { name: 'Identity', exact: true }).click();
    await page.getByRole('button', { name: /^Velline, point 2 of / }).click();
    expect(await cell.evaluate((element) => document.activeElement === element)).toBe(true);
    await cell.fill('1');
    await save(page);
    await page.getByRole('region', { name: 'Verdict', exact: true }).waitFor();

    await page
      .locator('input[type=file]')
      .setInputFiles({ name: 'raw.csv', mimeType: 'text/csv', buffer: FILE });
    const sha256 = createHash('sha256').update(FILE).digest('hex');
    await page.getByText(sha256.slice(0, 12)).waitFor();

    const submit = page.getByRole('button', { name: 'Submit for curation' });
    expect(await submit.getAttribute('aria-disabled')).toBe('true');
    await confirmCautions(page);
    await submit.click();
    await page.getByText('It waits for a curator.').waitFor();
    expect(complaints).toEqual([]);
    await page.context().close();
  });

  it('a manager makes a token, with which a script deposits and submits', async () => {
    const page = await signedIn(visit, 'manager');
    await page.goto(url('/lab'));
    await page.getByLabel('Name', { exact: true }).fill('tester’s script');
    for (const box of await page.getByRole('group', { name: 'It may' }).getByRole('checkbox').all())
      await box.check();
    await page.getByRole('button', { name: 'Make a token' }).click();
    const token = await page.getByLabel('Token', { exact: true }).inputValue();
    await page.context().close();

    const call = (path: string, body?: string) =>
      fetch(url(path), {
        method: 'POST',
        headers: { Authorization: `Bearer ${token}`, 'Content-Type': 'application/json' },
        body,
      });
    const created = await call('/api/v1/deposits', JSON.stringify(BY_TOKEN));
    expect(created.status).toBe(201);
    const { id, links } = await created.json();
    state.token = id;
    const submitted = await call(links.submission);
    expect(submitted.status).toBe(200);
    expect(await submitted.json()).toMatchObject({ state: 'submitted', revision: 1 });
  });

  it('the curator asks for a change on one; its laboratory reads the letter, changes it and submits it again', async () => {
    const curator = await signedIn(visit, 'curator');
    await curator.goto(url('/curation'));
    await curator.getByRole('link', { name: BY_TOKEN.title }).waitFor();
    await curator.getByRole('link', { name: BY_PAGE.title }).click();
    const ask = curator.getByRole('button', { name: 'Ask for changes' });
    await ask.click();
    await curator.getByText('Write what should be changed.').waitFor();
    await curator.getByLabel('Letter to the depositors').fill(LETTER);
    await ask.click();
    await curator.getByText('The letter is sent').waitFor();
    await curator.context().close();

    const depositor = await signedIn(visit, 'depositor');
    await depositor.goto(url('/deposits?state=changes-requested'));
    await depositor.getByRole('link', { name: BY_PAGE.title }).click();
    await depositor.getByRole('region', { name: 'Letters of the curator' }).getByText(LETTER).waitFor();
    await depositor.getByRole('button', { name: 'Identity', exact: true }).click();
    await depositor.getByLabel('Abstract').fill('Invented by a test; the gap was made up.');
    await save(depositor);
    await confirmCautions(depositor);
    await depositor.getByRole('button', { name: 'Submit for curation' }).click();
    await depositor.getByText('Revision 2, submitted').waitFor();
    await depositor.context().close();
  });

  it('the curator accepts both, which publishes them', async () => {
    const page = await signedIn(visit, 'curator');
    for (const id of [state.page, state.token]) {
      await page.goto(url(`/curation/${id}`));
      await page.getByRole('button', { name: 'Accept and publish' }).click();
      const link = page.getByRole('link', { name: /^Open CK-\d{6}$/ });
      await link.waitFor();
      state.accessions.push((await link.textContent())?.replace('Open ', '') ?? '');
    }
    expect(new Set(state.accessions).size).toBe(2);
    await page.context().close();
  });

  it('they have joined the curve, and their off-curve points are counted', async () => {
    const summaries = (await Promise.all([BY_PAGE, BY_TOKEN].map(assessmentOf))).map(
      ({ summary }) => summary,
    );
    const sum = (key: 'points' | 'offCurve') => summaries.reduce((total, summary) => total + summary[key], 0);
    // What was pushed off is off; nothing else is.
    expect(summaries.map(({ offCurve }) => offCurve)).toEqual([2, 1]);
    const { counts, offCurve } = await overlay();
    expect(counts.datasets).toBe(state.before.datasets + 2);
    expect(counts.points).toBe(state.before.points + sum('points'));
    expect(counts.offCurve).toBe(state.before.offCurve + sum('offCurve'));
    expect(offCurve.total).toBe(counts.offCurve);
    const { datasets, total } = await listed();
    expect(datasets.map(({ accession }) => accession).sort()).toEqual([...state.accessions].sort());
    expect(total).toMatchObject({ datasets: 2, points: sum('points'), offCurve: sum('offCurve') });
  });

  describe('a reader', () => {
    it('narrows the collection to them, opens one, and its files hold the numbers of the assessment', async () => {
      const page = await newPage({ acceptDownloads: true });
      const complaints = listenForComplaints(page);
      await page.goto(url('/datasets'));
      await page.getByRole('searchbox').fill(WORD);
      await page.getByRole('button', { name: 'Search', exact: true }).click();
      await expect.poll(() => page.locator('li[data-accession]').count()).toBe(2);
      await page.getByRole('link', { name: BY_PAGE.title, exact: true }).click();
      await page.getByRole('heading', { level: 1, name: BY_PAGE.title }).waitFor();
      const [accession] = state.accessions;
      const points = (await assessmentOf(BY_PAGE)).series[0].points;

      const document = JSON.parse(await downloaded(page, 'Document, JSON'));
      expect(document.series).toEqual(BY_PAGE.series);
      expect(document.abstract).toBe('Invented by a test; the gap was made up.');

      const json = JSON.parse(await downloaded(page, 'Points, JSON'));
      expect(json.accession).toBe(`${accession}.2`);
      expect(json.points).toHaveLength(points.length);
      for (const [i, point] of points.entries()) expect(json.points[i]).toMatchObject(point);

      const { data } = Papa.parse<Record<string, string>>(await downloaded(page, 'Points, CSV'), {
        header: true,
        skipEmptyLines: true,
      });
      expect(data.map(numbersOf)).toEqual(points.map(numbersOfPoint));
      expect(complaints).toEqual([]);
      await page.context().close();
    });

    it('gets the original file, byte for byte', async () => {
      const [accession] = state.accessions;
      const dataset = await (await fetch(url(`/api/v1/datasets/${accession}`))).json();
      const [file] = dataset.files;
      expect(file.name).toBe('raw.csv');
      const answer = await fetch(url(file.href));
      expect(Buffer.from(await answer.arrayBuffer())).toEqual(FILE);
    });

    it('sees nothing of what is not published', async () => {
      const page = await newPage({});
      for (const path of ['/deposits', '/curation']) {
        expect((await page.goto(url(path)))?.status()).toBe(401);
        await page.getByRole('heading', { name: 'Sign in' }).waitFor();
      }
      await page.context().close();
      const depositor = await signedIn(visit, 'depositor');
      expect((await depositor.goto(url('/curation')))?.status()).toBe(403);
      await depositor.getByRole('heading', { name: 'This page is not for your account' }).waitFor();
      const hidden = await depositor.goto(url('/deposits/no-such-deposit'));
      expect(hidden?.status()).toBe(404);
      await depositor.context().close();
    });
  });
});

async function save(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await page.getByText(/^Saved \d/).waitFor();
}

async function confirmCautions(page: Page): Promise<void> {
  const form = page.getByRole('form', { name: 'Submit for curation' });
  for (const box of await form.getByRole('checkbox').all()) await box.check();
}

/** The text of the file that a link gives. */
async function downloaded(page: Page, link: string): Promise<string> {
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: link, exact: true }).click(),
  ]);
  return readFile(await download.path(), 'utf8');
}

const numbersOf = (row: Record<string, string>) =>
  [row.energy_kT, row.activity, row.expected, row.residual, row.z, row.p, row.q].map(Number);

const numbersOfPoint = ({ energy, activity, expected, residual, z, pValue, q }: AssessedPoint) => [
  energy,
  activity,
  expected,
  residual,
  z,
  pValue,
  q,
];
