/** The page that checks data, as a person who looks at it finds its parts. */
import type { Locator, Page } from 'playwright-core';
import { type EnergyWindow, fullWindow, openingWindow } from '@/components/plots/energy-window';
import { energiesOf, type PlotData, plotDataOf, pointsOf } from '@/components/plots/plot-data';
import { EXAMPLES, type ExampleDocument } from '@/lib/documents/examples/examples';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { postDocument } from './post-document';

export const editorIn = (page: Page): Locator =>
  page.getByRole('textbox', { name: 'Dataset document or table of points' });
export const assessIn = (page: Page): Locator => page.getByRole('button', { name: 'Assess', exact: true });
export const verdictIn = (page: Page): Locator => page.getByRole('region', { name: 'Verdict', exact: true });
/** One on a wide screen; on a narrow one a second stands under the plot. */
export const rulersIn = (page: Page): Locator => page.locator('[role=slider]').filter({ visible: true });
export const canvasIn = (page: Page): Locator => page.locator('main canvas').first();
export const rowsIn = (page: Page): Locator => page.locator('main li:has(button[aria-pressed])');
/** What is wrong or was refused, in a notice of its own. */
export const noticeIn = (page: Page): Locator =>
  page.locator('main [role=alert], main [role=status]').first();

export function exampleDocumentOf(slug: ExampleDocument['slug']): DatasetDocument {
  const example = EXAMPLES.find((one) => one.slug === slug);
  if (example === undefined) throw new Error(`There is no example ${slug}.`);
  return example.document;
}

/** A document with the assessment that the running server's API gives. */
export async function askApi(url: string, document: DatasetDocument): Promise<PlotData> {
  const answer = await postDocument(url, document);
  if (!answer.ok) throw new Error(`The API answered ${answer.status}: ${await answer.text()}`);
  return plotDataOf(document, await answer.json());
}

/** Waits until an assessment and its plot stand there. */
export async function resultShown(page: Page): Promise<void> {
  await verdictIn(page).waitFor();
  await drawnCanvas(page);
}

/** Waits until the plot has drawn. */
export async function drawnCanvas(page: Page): Promise<void> {
  await canvasIn(page).waitFor();
  // The canvas stands before the chart has drawn on it: across its middle something crosses every column then.
  await page.waitForFunction(
    () => {
      const canvas = document.querySelector('main canvas');
      if (!(canvas instanceof HTMLCanvasElement) || canvas.width === 0) return false;
      const column = canvas.getContext('2d')?.getImageData(canvas.width / 2, 0, 1, canvas.height).data;
      return column?.some((value) => value !== 0) ?? false;
    },
    undefined,
    { polling: 100 },
  );
}

/** Types a text, or a document, into the editor at once. */
export async function paste(page: Page, source: unknown): Promise<void> {
  await editorIn(page).fill(typeof source === 'string' ? source : JSON.stringify(source, null, 2));
}

export const openingOf = (data: PlotData): EnergyWindow => openingWindow(pointsOf(data));
export const fullOf = (data: PlotData): EnergyWindow => fullWindow(energiesOf(data));

export interface WindowCounts {
  onCurve: number;
  inside: number;
  below: number;
  above: number;
}

/** How many points a window holds, by the assessment. */
export function countsWithin(data: PlotData, { from, to }: EnergyWindow): WindowCounts {
  const points = pointsOf(data);
  const inside = points.filter(({ energy }) => energy >= from && energy <= to);
  return {
    onCurve: inside.filter(({ flag }) => flag === 'on-curve').length,
    inside: inside.length,
    below: points.filter(({ energy }) => energy < from).length,
    above: points.filter(({ energy }) => energy > to).length,
  };
}

/** How many the verdict says that it holds; null where it says that it holds all. */
export async function countsSaid(page: Page): Promise<WindowCounts | null> {
  const said = /(\d+) \/ (\d+) points in it[^;]*; (\d+)\D+(\d+)/.exec(
    (await verdictIn(page).textContent()) ?? '',
  );
  if (said === null) return null;
  const [onCurve, inside, below, above] = said.slice(1).map(Number);
  return { onCurve, inside, below, above };
}
