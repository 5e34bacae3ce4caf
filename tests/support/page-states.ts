/** The states in which a reader meets the pages, each with the way to it. */
import type { Page } from 'playwright-core';
import { EXAMPLE_TABLE } from '@/lib/documents/examples/examples';
import type { Visit } from './browse-app';
import { browseShown } from './browse-page';
import { assessIn, editorIn, noticeIn, paste, resultShown } from './check-page';
import { brokenDocument } from './submitted-documents';

export interface PageState {
  state: string;
  path: string;
  /** what its title begins with */
  title: string;
  /** on the page: until the state is there */
  reach?: (page: Page) => Promise<void>;
}

export const PAGE_STATES: readonly PageState[] = [
  { state: 'home', path: '/', title: 'Curvekeep' },
  { state: 'browse, all', path: '/datasets', title: 'Browse', reach: browseShown },
  { state: 'browse, nothing fits', path: '/datasets?system=alrq-velline&ligand=halide', title: 'Browse' },
  { state: 'a dataset', path: '/datasets/CK-000122', title: 'CK-000122', reach: resultShown },
  { state: 'a withdrawn dataset', path: '/datasets/CK-000100', title: 'Withdrawn dataset' },
  { state: 'a laboratory', path: '/labs/sunder-lab', title: 'Sunder Lab', reach: browseShown },
  { state: 'check, empty', path: '/check', title: 'Check data' },
  { state: 'check, a result', path: '/check?example=thousand-fold', title: 'Check data', reach: resultShown },
  {
    state: 'check, by concentration',
    path: '/check?example=mixed-classes&by=ocarate',
    title: 'Check data',
    reach: resultShown,
  },
  {
    state: 'check, errors',
    path: '/check',
    title: 'Check data',
    reach: async (page) => {
      await paste(page, brokenDocument());
      await assessIn(page).click();
      await noticeIn(page).waitFor();
    },
  },
  {
    state: 'check, a table with form errors',
    path: '/check',
    title: 'Check data',
    reach: async (page) => {
      await paste(page, EXAMPLE_TABLE);
      await page.getByRole('region', { name: 'Stated parameters' }).waitFor();
      await assessIn(page).click();
      await noticeIn(page).waitFor();
    },
  },
  { state: 'methods', path: '/methods', title: 'Methods' },
  { state: 'not found', path: '/no-such-page', title: '' },
];

/** Brings a page into a state. */
export async function reachState(
  page: Page,
  { url }: Visit,
  { path, title, reach }: PageState,
): Promise<void> {
  await page.goto(url(path));
  await page.waitForFunction((start) => document.title !== '' && document.title.startsWith(start), title);
  if (path === '/check') await editorIn(page).waitFor();
  await reach?.(page);
}
