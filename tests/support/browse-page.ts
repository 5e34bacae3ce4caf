/** The browsing page, as a person who looks at it finds its parts. */
import type { Locator, Page } from 'playwright-core';
import type { DatasetList } from '@/schemas/dataset-answers';
import type { Overlay } from '@/schemas/overlay';
import { drawnCanvas } from './check-page';

export const datasetRowsIn = (page: Page): Locator => page.locator('main li[data-accession]');
export const rowOf = (page: Page, accession: string): Locator =>
  page.locator(`main li[data-accession="${accession}"]`);
export const filterIn = (page: Page, group: string, name: string): Locator =>
  page.getByRole('region', { name: group, exact: true }).getByRole('link', { name });

export async function askList(url: string, search = ''): Promise<DatasetList> {
  return (await fetch(`${url}/api/v1/datasets${search}`)).json();
}

export async function askOverlay(url: string, search = ''): Promise<Overlay> {
  return (await fetch(`${url}/api/v1/overlay${search}`)).json();
}

/** Waits until rows stand there and the plot is drawn. */
export async function browseShown(page: Page): Promise<void> {
  await datasetRowsIn(page).first().waitFor();
  await drawnCanvas(page);
}
