/** A curator declines through the page; the laboratory reads why, and begins anew from the same document. */
import { expect, it } from 'vitest';
import { describeInBrowser, listenForComplaints } from '@/tests/support/browse-app';
import { signedIn } from '@/tests/support/sign-in';

const TITLE = 'Tessin channel in larger nanodiscs';
const LETTER = 'Nothing says in which lipid this was measured, and nobody can tell any more.';

describeInBrowser('declining', (visit) => {
  const { url } = visit;

  it('by a curator needs a letter, is done in two steps, and says that it is final', async () => {
    const page = await signedIn(visit, 'curator');
    const complaints = listenForComplaints(page);
    await page.goto(url('/curation'));
    await page.getByRole('link', { name: TITLE }).click();
    const decision = page.getByRole('region', { name: 'Decision' });
    await decision.getByText('Decline', { exact: true }).click();
    const decline = decision.getByRole('button', { name: 'Decline it for good' });
    await decline.click();
    await decision.getByText('Write why it is declined.').waitFor();
    await decision.getByLabel('Letter to the depositors').fill(LETTER);
    await decline.click();
    await page.getByText('The laboratory sees your letter with the deposit').waitFor();
    await page.getByRole('link', { name: 'Back to the queue' }).click();
    await page.getByRole('heading', { name: 'Curation' }).waitFor();
    expect(await page.getByRole('link', { name: TITLE }).count()).toBe(0);
    expect(complaints).toEqual([]);
    await page.context().close();
  });

  it('leaves the laboratory the letter and the document, for a new draft', async () => {
    const page = await signedIn(visit, 'depositor');
    await page.goto(url('/deposits?state=declined'));
    await page.getByRole('link', { name: TITLE }).click();
    await page.getByText(LETTER).waitFor();
    await page.getByText('that is final').waitFor();
    const declined = page.url();
    await page.getByRole('button', { name: 'New draft from this document' }).click();
    await page.waitForURL((address) => address.href !== declined);
    await page.getByRole('form', { name: 'Submit for curation' }).waitFor();
    await page.getByRole('heading', { name: TITLE }).waitFor();
    await page.context().close();
  });
});
