/** What is pasted, dropped or chosen: what is wrong with it is said at its place, and nothing of it is lost. */
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { LARGEST_SOURCE } from '@/components/check/read-source';
import type { DocumentError } from '@/lib/documents/document-error';
import { EXAMPLE_TABLE } from '@/lib/documents/examples/examples';
import { locatePointers } from '@/lib/documents/locate-pointer';
import { describeInBrowser, drawn, listenForComplaints } from '@/tests/support/browse-app';
import { canvasBox, canvasImage, lonelyPoints } from '@/tests/support/canvas-points';
import {
  askApi,
  assessIn,
  canvasIn,
  editorIn,
  noticeIn,
  openingOf,
  paste,
  resultShown,
  rowsIn,
  verdictIn,
} from '@/tests/support/check-page';
import { contractDocument } from '@/tests/support/contract-document';
import { postDocument } from '@/tests/support/post-document';
import { BRACES, brokenDocument, hostileDocument, MARKUP } from '@/tests/support/submitted-documents';

const selectionIn = (page: Page) =>
  editorIn(page).evaluate((element) => {
    const { value, selectionStart, selectionEnd } = element as HTMLTextAreaElement;
    return {
      text: value.slice(selectionStart, selectionEnd),
      line: value.slice(0, selectionStart).split('\n').length,
      focused: document.activeElement === element,
    };
  });

describeInBrowser('what is given to the page', ({ newPage, url }) => {
  async function open(): Promise<Page> {
    const page = await newPage();
    await page.goto(url('/check'));
    await editorIn(page).waitFor();
    return page;
  }

  async function assess(page: Page, source: unknown): Promise<void> {
    await paste(page, source);
    await assessIn(page).click();
  }

  describe('an invalid document', () => {
    it('has every error with its sentence, its pointer and the way to its line', async () => {
      const page = await open();
      const document = brokenDocument();
      const answer = await (await postDocument(url(''), document)).json();
      expect(answer.errors.length).toBeGreaterThanOrEqual(4);
      await assess(page, document);
      await noticeIn(page).waitFor();
      expect(await noticeIn(page).locator('p').first().textContent()).toBe(
        `${answer.errors.length} things to mend`,
      );
      // In the order of the text, each beginning with a capital.
      const places = locatePointers(
        JSON.stringify(document, null, 2),
        answer.errors.map(({ pointer }: DocumentError) => pointer),
      );
      const lineOf = ({ pointer }: DocumentError) => places.get(pointer)?.line ?? 0;
      const expected: DocumentError[] = answer.errors.sort(
        (a: DocumentError, b: DocumentError) => lineOf(a) - lineOf(b),
      );
      expect(await noticeIn(page).locator('code').allTextContents()).toEqual(
        expected.map(({ pointer }) => pointer),
      );
      expect(await noticeIn(page).locator('li > p:first-child').allTextContents()).toEqual(
        expected.map(({ detail }) => detail.charAt(0).toUpperCase() + detail.slice(1)),
      );

      const lines = JSON.stringify(document, null, 2).split('\n');
      const line = lines.findIndex((text) => text.includes('"u": -1')) + 1;
      await page.getByRole('button', { name: `Go to line ${line}`, exact: true }).click();
      expect(await selectionIn(page)).toEqual({ text: '"u": -1', line, focused: true });
      await expect.poll(() => page.getByText(`line ${line}, column`).count()).toBe(1);
      expect(await editorIn(page).inputValue()).toBe(lines.join('\n'));
      await page.close();
    });

    it('is mended and assessed again', async () => {
      const page = await open();
      await assess(page, { ...contractDocument(), licence: 'mine' });
      await page.getByText('One thing to mend').waitFor();
      await assess(page, contractDocument());
      await resultShown(page);
      expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe(contractDocument().title);
      expect(new URL(page.url()).search).toBe('?result=own');
      await page.goBack();
      await editorIn(page).waitFor();
      expect(await editorIn(page).inputValue()).toBe(JSON.stringify(contractDocument(), null, 2));
      await page.close();
    });
  });

  it('malformed JSON is shown where it stops being JSON', async () => {
    const page = await open();
    await assess(page, '{\n  "format": "curvekeep-dataset/1",\n  "title" "x"\n}');
    await page.getByRole('button', { name: 'Go to line 3', exact: true }).click();
    expect(await selectionIn(page)).toEqual({ text: '"x"', line: 3, focused: true });
    expect(await noticeIn(page).textContent()).toMatch(/line 3, column 11: a colon must stand/i);
    await page.close();
  });

  describe('a file', () => {
    const choose = (page: Page, name: string, buffer: Buffer) =>
      page.locator('input[type=file]').setInputFiles({ name, mimeType: 'application/octet-stream', buffer });

    /** Drops a file that holds a text so many times; it is made in the browser. */
    const drop = (page: Page, name: string, text: string, times: number) =>
      editorIn(page).evaluate(
        (area, given) => {
          const dataTransfer = new DataTransfer();
          dataTransfer.items.add(new File([given.text.repeat(given.times)], given.name));
          area.dispatchEvent(new DragEvent('drop', { dataTransfer, bubbles: true, cancelable: true }));
        },
        { name, text, times },
      );

    it('is read into the editor', async () => {
      const page = await open();
      await choose(page, 'set.json', Buffer.from(JSON.stringify(contractDocument())));
      await expect.poll(() => editorIn(page).inputValue()).toBe(JSON.stringify(contractDocument()));
      expect(await page.getByText('set.json · line').count()).toBe(1);
      await page.close();
    });

    it('that is too large or no text is refused in words, and the text stays', async () => {
      const page = await open();
      await paste(page, 'what was typed before');
      await choose(page, 'sheet.xlsx', Buffer.from([80, 75, 3, 4, 0, 0, 0]));
      await page.getByText('sheet.xlsx is not a text file. Save the sheet as CSV').waitFor();
      await drop(page, 'big.json', ' '.repeat(10), LARGEST_SOURCE / 10 + 1);
      await page.getByText('big.json is larger than 8 MiB').waitFor();
      expect(await noticeIn(page).textContent()).toContain('This file was not taken');
      expect(await editorIn(page).inputValue()).toBe('what was typed before');
      await page.close();
    });

    it('is dropped on the editor', async () => {
      const page = await open();
      await drop(page, 'dropped.csv', 'series,velline (uM),activity\n', 1);
      await page.getByText('dropped.csv · line').waitFor();
      expect(await editorIn(page).inputValue()).toBe('series,velline (uM),activity\n');
      await page.close();
    });
  });

  describe('a server', () => {
    it('that cannot be reached is told of, the text is kept, and a second try works', async () => {
      const page = await open();
      const text = JSON.stringify(contractDocument(), null, 2);
      await page.route('**/api/v1/assessments', (route) => route.abort('connectionrefused'));
      await assess(page, text);
      await page.getByText('The server did not answer').waitFor();
      expect(await noticeIn(page).textContent()).toContain('What you pasted is kept here.');
      expect(await editorIn(page).inputValue()).toBe(text);
      await page.unroute('**/api/v1/assessments');
      await assessIn(page).click();
      await resultShown(page);
      expect(await verdictIn(page).textContent()).toContain('points on the master curve');
      await page.close();
    });

    it('that has had enough is told of with the seconds to wait', async () => {
      const page = await open();
      await page.route('**/api/v1/assessments', (route) =>
        route.fulfill({
          status: 429,
          headers: { 'Content-Type': 'application/problem+json', 'Retry-After': '23' },
          body: JSON.stringify({
            type: '/x',
            title: 'Too many calls',
            status: 429,
            detail: 'Wait a little.',
          }),
        }),
      );
      await assess(page, contractDocument());
      await page.getByText('Too many calls').waitFor();
      expect(await noticeIn(page).textContent()).toContain('Wait a little. Try again in 23 s.');
      expect(await editorIn(page).inputValue()).toContain('curvekeep-dataset/1');
      await page.close();
    });
  });

  describe('a table of points', () => {
    const field = (page: Page, name: string) => page.getByRole('textbox', { name, exact: true });

    it('is an example too, with its form filled in', async () => {
      const page = await open();
      await page.getByRole('button', { name: 'A table of points' }).click();
      await page.getByRole('region', { name: 'Stated parameters' }).waitFor();
      expect(await editorIn(page).inputValue()).toBe(EXAMPLE_TABLE);
      await assessIn(page).click();
      await resultShown(page);
      const counted = (await verdictIn(page).locator('p').first().textContent()) ?? '';
      expect(counted).toMatch(/^\d+ \/ 56$/);
      expect(Number.parseInt(counted, 10)).toBeGreaterThan(50);
      await page.close();
    });

    it('has a form beside it, whose errors stand at their fields', async () => {
      const page = await open();
      await assess(page, EXAMPLE_TABLE);
      await page.getByText('4 fields of the form need other entries.').waitFor();
      for (const name of ['energy gap', 'number of sites', 'K inactive of velline', 'K active of velline']) {
        const wrong = field(page, name);
        expect(await wrong.getAttribute('aria-invalid')).toBe('true');
        const id = await wrong.getAttribute('aria-describedby');
        expect(await page.locator(`[id="${id}"]`).textContent()).toBe('must be a number, such as 2.4');
      }

      await field(page, 'energy gap').fill('2,4');
      await field(page, 'standard uncertainty of energy gap').fill('0.06');
      await field(page, 'number of sites').fill('6');
      await field(page, 'K inactive of velline').fill('18');
      await field(page, 'K active of velline').fill('0.9');
      await page.getByLabel('unit of K active of velline').selectOption('mM');
      await assessIn(page).click();
      await resultShown(page);
      const statements = page.getByRole('region', { name: 'Statements', exact: true });
      expect(await statements.textContent()).toContain('2.400 ± 0.060');
      expect(await verdictIn(page).textContent()).toMatch(/^\d+ \/ 56points on the master curve/);
      // Stated for every series, the wild type's parameters hold for the wild type.
      const label = (await rowsIn(page).first().textContent()) ?? '';
      expect(label).toContain('wild type');
      expect(label).toContain('14 / 14');

      await page.getByRole('button', { name: 'Change the data' }).click();
      expect(await field(page, 'energy gap').inputValue()).toBe('2,4');
      await page.close();
    });

    it('takes orientations that go with the unit', async () => {
      const page = await open();
      await paste(page, 'series,velline (uM),activity,u\nwt,0,0.9,0.02\n');
      const orientation = page.getByLabel('orientation of the energy gap');
      await orientation.waitFor();
      expect(await orientation.locator('option').allTextContents()).toEqual([
        'inactive − active',
        'active − inactive',
      ]);
      await page.getByLabel('unit of energy gap').selectOption('ratio');
      expect(await orientation.locator('option').allTextContents()).toEqual([
        'inactive / active',
        'active / inactive',
      ]);
      expect(await orientation.inputValue()).toBe('inactive-over-active');
      await page.close();
    });

    it('has a bad cell named with its line', async () => {
      const page = await open();
      await assess(page, 'series;velline (uM);activity;u\nwt;0;0,91;0,02\nwt;10;0,4l;0,02\n');
      await page.getByRole('button', { name: 'Go to line 3', exact: true }).click();
      expect(await noticeIn(page).textContent()).toContain('0,4l');
      expect(await noticeIn(page).textContent()).toContain('is not a number');
      expect((await selectionIn(page)).text).toBe('wt;10;0,4l;0,02');
      await page.close();
    });
  });

  describe('names with markup in them', () => {
    it('are shown as text, and nothing of them runs', async () => {
      const page = await open();
      const complaints = listenForComplaints(page);
      const document = hostileDocument();
      await assess(page, document);
      await resultShown(page);
      expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe(`${MARKUP} title`);
      expect(await rowsIn(page).first().textContent()).toContain(`${MARKUP} ${BRACES}`);
      expect(await page.locator('#points thead').textContent()).toContain(MARKUP);
      await page.getByText('Abstract', { exact: true }).click();
      expect(await page.getByText(`${MARKUP} abstract`).count()).toBe(1);

      const data = await askApi(url(''), document);
      const box = await canvasBox(page);
      const [point] = lonelyPoints(data, openingOf(data), box);
      const before = await canvasImage(page);
      await page.mouse.move(box.x + point.x, box.y + point.y, { steps: 4 });
      await expect.poll(() => canvasImage(page)).not.toBe(before);
      await page.locator('main fieldset label').last().click();
      await drawn(page);

      expect(await page.locator('main img, main script, main b').count()).toBe(0);
      expect(await page.title()).not.toBe('ran');
      expect(await canvasIn(page).count()).toBe(1);
      expect(complaints).toEqual([]);
      await page.close();
    });

    it('are shown as text among errors', async () => {
      const page = await open();
      await assess(page, { ...contractDocument(), licence: MARKUP, [MARKUP]: 1 });
      await noticeIn(page).waitFor();
      expect(await noticeIn(page).textContent()).toContain('<img src=x');
      expect(await page.locator('main img').count()).toBe(0);
      expect(await page.title()).not.toBe('ran');
      await page.close();
    });
  });
});
