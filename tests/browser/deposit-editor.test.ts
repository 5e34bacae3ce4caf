/** The editor of a draft: nothing is lost, whoever else saves, whatever fails; and it is there for everybody. */
import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, it } from 'vitest';
import { emptyDocument } from '@/components/deposits/empty-document';
import { describeInBrowser, listenForComplaints } from '@/tests/support/browse-app';
import { signedIn } from '@/tests/support/sign-in';

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const VALID = 'MerV lid variants, second batch';

const titleIn = (page: Page) => page.getByLabel('Title');
const textIn = (page: Page) => page.getByRole('textbox', { name: 'Document as JSON' });
const saveIn = (page: Page) => page.getByRole('button', { name: 'Save', exact: true });
const press = (page: Page, name: string) => page.getByRole('button', { name, exact: true }).click();
const saved = (page: Page) => page.getByText(/^Saved \d/).waitFor();

describeInBrowser('a draft', (visit) => {
  let page: Page;
  let draft: string;
  beforeAll(async () => {
    page = await signedIn(visit, 'depositor');
  });

  it('begins empty, with all that is missing said', async () => {
    await page.goto(visit.url('/deposits'));
    await press(page, 'New draft');
    await page.waitForURL(/\/deposits\/[\w-]+$/);
    draft = page.url();
    await page.getByRole('heading', { name: /^\d+ things to mend$/ }).waitFor();
    await titleIn(page).fill('Mine');
    await page.keyboard.press('Control+s');
    await saved(page);
  });

  it('saved by somebody else meanwhile, both versions are there to choose from', async () => {
    const other = await page.context().newPage();
    await other.goto(draft);
    await titleIn(other).fill('Theirs');
    await saveIn(other).click();
    await saved(other);
    await titleIn(page).fill('Mine, longer');
    await saveIn(page).click();
    await page.getByText('Changed meanwhile').waitFor();
    expect(await titleIn(page).inputValue()).toBe('Mine, longer');
    await press(page, 'Load theirs, keep mine as text');
    expect(await titleIn(page).inputValue()).toBe('Theirs');
    await press(page, 'Take them up');
    expect(await titleIn(page).inputValue()).toBe('Mine, longer');
    await saveIn(page).click();
    await saved(page);
    // The other one, now behind, may save over it on purpose.
    await titleIn(other).fill('Theirs again');
    await saveIn(other).click();
    await press(other, 'Save mine over theirs');
    await saved(other);
    await other.close();
    await page.reload();
    expect(await titleIn(page).inputValue()).toBe('Theirs again');
  });

  it('without a connection says so, and keeps what was typed over a reload', async () => {
    await titleIn(page).fill('Typed in a tunnel');
    await page.context().setOffline(true);
    await saveIn(page).click();
    await page.getByText('The server did not answer').waitFor();
    expect(await titleIn(page).inputValue()).toBe('Typed in a tunnel');
    await page.waitForFunction(() => sessionStorage.length > 0);
    await page.context().setOffline(false);
    await page.reload();
    await page.getByText('Your unsaved changes are kept in this browser tab').waitFor();
    expect(await titleIn(page).inputValue()).toBe('Theirs again');
    await press(page, 'Take them up');
    expect(await titleIn(page).inputValue()).toBe('Typed in a tunnel');
    await saveIn(page).click();
    await saved(page);
  });

  it('as JSON takes what the form has no field for, and says where it is no JSON', async () => {
    await press(page, 'Document as JSON');
    const text = await textIn(page).inputValue();
    await textIn(page).fill(text.replace('"abstract": ', '"abstract" '));
    await press(page, 'Back to the form');
    await page.getByText(/a colon must stand/).waitFor();
    await saveIn(page).click();
    await page.getByText(/Nothing was saved/).waitFor();
    const odd = text
      .replace('"abstract": ', '"mine": 1, "abstract": ')
      .replace('"contributors": [', '"contributors": "odd", "y": [');
    await textIn(page).fill(odd);
    await saveIn(page).click();
    await saved(page);
    await press(page, 'Back to the form');
    await page.getByText(/^Contributors: what this draft holds here/).waitFor();
    // A place without a field is led to in the text.
    await press(page, '/mine');
    await expect
      .poll(() =>
        textIn(page).evaluate((area: HTMLTextAreaElement) =>
          area.value.slice(area.selectionStart, area.selectionEnd),
        ),
      )
      .toContain('"mine": 1');
    // What the form does not know is still there, to the letter.
    await page.reload();
    await press(page, 'Document as JSON');
    expect(await textIn(page).inputValue()).toBe(odd);
    await press(page, 'Back to the form');
  });

  it('takes replicates in the cell of the activity, and a pasted block from a cell on', async () => {
    await page.goto(draft);
    await press(page, 'Document as JSON');
    await textIn(page).fill(JSON.stringify(emptyDocument('A. Person')));
    await press(page, 'Back to the form');
    await press(page, 'Add a point');
    await page.getByRole('textbox', { name: 'activity of point 1' }).fill('0.41 0.44');
    expect(await page.getByRole('textbox', { name: 'replicates of point 1' }).inputValue()).toBe('0.41 0.44');
    await page.getByRole('textbox', { name: 'ligand of point 1' }).focus();
    await page.evaluate(() => {
      const clipboardData = new DataTransfer();
      clipboardData.setData('text', '0\t0.91\t0.02\n1\t0.85\t0.03\n');
      const event = new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true });
      document.activeElement?.dispatchEvent(event);
    });
    await page.getByText('Points 1 to 2 are filled.').waitFor();
    expect(await page.getByRole('textbox', { name: 'activity of point 2' }).inputValue()).toBe('0.85');
    expect(await page.getByRole('textbox', { name: 'u of point 2' }).inputValue()).toBe('0.03');
  });

  it('asks before unsaved changes are left, and stays where that is refused', async () => {
    const asked = page.waitForEvent('dialog');
    const click = page.getByRole('link', { name: 'Browse', exact: true }).first().click();
    const dialog = await asked;
    expect(dialog.message()).toContain('Your last changes are not saved');
    await dialog.dismiss();
    await click;
    expect(page.url()).toBe(draft);
    await page.keyboard.press('Control+S');
    await saved(page);
  });

  it('signed out meanwhile, says so, and leads back to what was typed', async () => {
    await titleIn(page).fill('Typed while signed out');
    await page.waitForFunction(() => sessionStorage.length > 0);
    const cookies = await page.context().cookies();
    await page.context().clearCookies();
    await saveIn(page).click();
    await page.getByText('You are signed out').waitFor();
    const way = page.getByRole('main').getByRole('link', { name: 'Sign in' });
    expect(await way.getAttribute('href')).toBe(
      `/sign-in?next=${encodeURIComponent(new URL(draft).pathname)}`,
    );
    await page.context().addCookies(cookies);
    await page.goto(draft);
    await press(page, 'Take them up');
    expect(await titleIn(page).inputValue()).toBe('Typed while signed out');
    await saveIn(page).click();
    await saved(page);
  });

  it('is deleted after a second word', async () => {
    await page.getByText('Delete the draft').click();
    await press(page, 'Delete it for good');
    await page.waitForURL(visit.url('/deposits'));
    expect((await page.goto(draft))?.status()).toBe(404);
  });

  it('shows the collapse of what was saved, and says when more was typed since', async () => {
    const complaints = listenForComplaints(page);
    await page.goto(visit.url('/deposits?state=draft'));
    await page.getByRole('link', { name: VALID }).click();
    await page.locator('main canvas').first().waitFor();
    const gap = page.getByRole('textbox', { name: 'energy gap', exact: true });
    await gap.fill('2.5');
    await page.getByText('Of the draft as it was last saved.').waitFor();
    await gap.fill('2.');
    expect(await gap.inputValue()).toBe('2.');
    expect(complaints).toEqual([]);
  });
});

describeInBrowser('deposits and curation', (visit) => {
  const pages = new Map<string, Page>();
  beforeAll(async () => {
    for (const name of ['depositor', 'curator'] as const) pages.set(name, await signedIn(visit, name));
  });
  describe.each(['light', 'dark'])('%s', (theme) => {
    it.each([
      ['depositor', '/deposits', null],
      ['depositor', '/deposits?state=draft', VALID],
      ['depositor', '/deposits?state=draft', 'AlrQ hinge variants, repeat'],
      ['depositor', '/deposits?state=submitted', 'Tessin channel in larger nanodiscs'],
      ['curator', '/curation', null],
      ['curator', '/curation', 'AlrQ tail deletions at another salt'],
      ['curator', '/deposits', null],
    ] as const)('%s at %s, %s: has nothing that axe finds, and fits 360 px', async (name, path, link) => {
      const page = pages.get(name) ?? (await signedIn(visit, name));
      await page.setViewportSize({ width: 1440, height: 900 });
      await page.context().addCookies([{ name: 'theme', value: theme, url: visit.url('') }]);
      await page.goto(visit.url(path));
      if (link !== null) await page.getByRole('link', { name: link }).click();
      if (link !== null) await page.waitForURL(/\/(deposits|curation)\/[\w-]+$/);
      await page.getByRole('heading', { level: 1 }).waitFor();
      await page.waitForLoadState('networkidle');
      const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
      expect(
        violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target).join('; ')}`),
      ).toEqual([]);
      await page.setViewportSize({ width: 360, height: 800 });
      await expect
        .poll(() =>
          page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth),
        )
        .toBe(0);
    });
  });
});
