/** Browsing: everything published on one axis, each way of narrowing it, and one dataset as it is read. */
import type { BrowserContextOptions, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { type EnergyWindow, pixelOf } from '@/components/plots/energy-window';
import { overlayActivityBounds } from '@/components/plots/overlay-view';
import { heightsIn } from '@/components/plots/panel-heights';
import { describeInBrowser, drawn, listenForComplaints } from '@/tests/support/browse-app';
import {
  askList,
  askOverlay,
  browseShown,
  datasetRowsIn,
  filterIn,
  rowOf,
} from '@/tests/support/browse-page';
import { canvasBox, middleOfColour } from '@/tests/support/canvas-points';
import { rulersIn, verdictIn } from '@/tests/support/check-page';

/** Answers and drawing may take a while on a busy machine. */
const SOON = { timeout: 15_000 };

describeInBrowser('browsing', ({ newPage, url }) => {
  async function open(path: string, options?: BrowserContextOptions): Promise<Page> {
    const page = await newPage(options);
    await page.goto(url(path));
    await browseShown(page);
    return page;
  }
  const headOf = (page: Page) => page.getByRole('heading', { level: 1 }).textContent();
  const windowOf = async (page: Page): Promise<EnergyWindow> => {
    const text = (await rulersIn(page).first().getAttribute('aria-valuetext')) ?? '';
    const [from, to] = text.replaceAll('−', '-').replace(' kT', '').split(' to ').map(Number);
    return { from, to };
  };

  describe('one axis', () => {
    it.each([1440, 390])('at %i px plot, ruler and strips agree within a pixel', async (width) => {
      const page = await open('/datasets', { viewport: { width, height: 900 } });
      const [box, window, list] = [await canvasBox(page), await windowOf(page), await askList(url(''))];
      const placeOf = (energy: number) => box.x + pixelOf(energy, window, box.width);
      const ruler = await rulersIn(page)
        .first()
        .evaluate((element) => {
          const { left, width: wide } = element.getBoundingClientRect();
          const labels = [...element.querySelectorAll('text')].map((text) => ({
            label: text.textContent ?? '',
            x: left + Number(text.getAttribute('x')),
          }));
          return { left, wide, labels: labels.filter(({ label }) => label !== 'kT') };
        });
      expect(Math.abs(ruler.left - box.x)).toBeLessThan(1);
      expect(Math.abs(ruler.wide - box.width)).toBeLessThan(1);
      expect(ruler.labels.length).toBeGreaterThan(1);
      for (const { label, x } of ruler.labels)
        expect(Math.abs(x - placeOf(Number(label.replace('−', '-'))))).toBeLessThan(1);

      for (const { accession, strip } of list.datasets.slice(0, 4)) {
        const ticks = await rowOf(page, accession)
          .locator('svg path')
          .evaluateAll((paths) =>
            paths.flatMap((path) => {
              const left = path.closest('svg')?.getBoundingClientRect().left ?? Number.NaN;
              const starts = [...(path.getAttribute('d') ?? '').matchAll(/M(-?[\d.]+) [\d.]+v/g)];
              return starts.map(([, x]) => left + Number(x));
            }),
          );
        const inside = strip.energy.filter((energy) => energy >= window.from && energy <= window.to);
        expect(inside.length).toBeGreaterThan(5);
        const wanted = inside.map(placeOf).sort((a, b) => a - b);
        expect(ticks).toHaveLength(wanted.length);
        for (const [k, x] of ticks.sort((a, b) => a - b).entries())
          expect(Math.abs(x - wanted[k])).toBeLessThan(1);
      }
      await page.close();
    });
  });

  describe('lighting', () => {
    it('a row that is pointed at or focused lights its points and dims the rest', async () => {
      const page = await open('/datasets');
      const [overlay, window, box] = [await askOverlay(url('')), await windowOf(page), await canvasBox(page)];
      const accession = 'CK-000121';
      const place = overlay.datasets.findIndex((dataset) => dataset.accession === accession);
      const { dataset, energy, flag } = overlay.points ?? overlay.offCurve.points;
      const own = energy.filter(
        (one, i) => dataset[i] === place && flag[i] === 'on-curve' && one > window.from && one < window.to,
      );
      expect(own.length).toBeGreaterThan(2);
      const places = own.map((one) => Math.round(pixelOf(one, window, box.width)));
      const isDimmed = () =>
        page
          .locator('main [role=img] canvas')
          .first()
          .evaluate((canvas) => {
            const chart = canvas.closest('.echarts-for-react')?.parentElement ?? null;
            return chart !== null && Number(getComputedStyle(chart).opacity) < 0.5;
          });
      const isLit = async () => {
        const columns = await litColumns(page);
        return places.every((x) => [-1, 0, 1].some((near) => columns.has(x + near)));
      };
      expect(await isDimmed()).toBe(false);
      await rowOf(page, accession).hover();
      await expect.poll(isDimmed, SOON).toBe(true);
      await expect.poll(isLit, SOON).toBe(true);
      // No other dataset is lit: nothing in that colour away from its own points.
      const columns = [...(await litColumns(page))];
      expect(columns.every((x) => places.some((one) => Math.abs(one - x) <= 4))).toBe(true);

      await page.mouse.move(5, 5);
      await expect.poll(isDimmed, SOON).toBe(false);
      await rowOf(page, accession).getByRole('link').first().focus();
      await expect.poll(isDimmed, SOON).toBe(true);
      await expect.poll(isLit, SOON).toBe(true);
      await page.close();
    });

    it('a point that is pointed at lights its row', async () => {
      const page = await open('/datasets');
      const [overlay, window, box] = [await askOverlay(url('')), await windowOf(page), await canvasBox(page)];
      const { dataset, energy, activity } = overlay.offCurve.points;
      // The miss at the highest energy stands alone, far below the curve's upper end.
      const far = energy.indexOf(
        Math.max(...energy.filter((one, i) => one < window.to - 1 && activity[i] < 0.9)),
      );
      const x = pixelOf(energy[far], window, box.width);
      const { accession } = overlay.datasets[dataset[far]];
      const { low, high } = overlayActivityBounds({ overlay });
      const y = ((high - activity[far]) / (high - low)) * heightsIn(box.height).plot;
      expect(await middleOfColour(page, '--off', { x, y })).not.toBeNull();
      const row = rowOf(page, accession).locator('> div');
      const isLit = async () => (await row.getAttribute('class'))?.includes('bg-wash') ?? false;
      while ((await rowOf(page, accession).count()) === 0)
        await page.getByRole('button', { name: /^More:/ }).click();
      expect(await isLit()).toBe(false);
      await page.evaluate(() => scrollTo(0, 0));
      await page.mouse.move(box.x + x, box.y + y);
      await expect.poll(isLit, SOON).toBe(true);
      await page.mouse.move(5, 5);
      await expect.poll(isLit, SOON).toBe(false);
      await page.close();
    });
  });

  describe('narrowing', () => {
    it('a filter is in the address, and Back, Forward and a reload follow it', async () => {
      const page = await open('/datasets');
      const [all, some] = [await askList(url('')), await askList(url(''), '?system=alrq-velline')];
      expect(await headOf(page)).toBe(`${all.total.datasets} datasets, one curve`);
      await filterIn(page, 'System', some.datasets[0].system.name).click();
      await expect.poll(() => headOf(page), SOON).toBe(`${some.total.datasets} datasets, one curve`);
      expect(new URL(page.url()).search).toBe('?system=alrq-velline');
      await expect.poll(() => datasetRowsIn(page).count(), SOON).toBe(some.datasets.length);
      const verdict = await verdictIn(page).textContent();
      for (const count of [some.total.onCurve, some.total.warning, some.total.offCurve])
        expect(verdict).toContain(count.toLocaleString('en-GB'));

      await page.goBack();
      await expect.poll(() => headOf(page), SOON).toBe(`${all.total.datasets} datasets, one curve`);
      await page.goForward();
      await expect.poll(() => headOf(page), SOON).toBe(`${some.total.datasets} datasets, one curve`);
      await page.reload();
      await browseShown(page);
      expect(await headOf(page)).toBe(`${some.total.datasets} datasets, one curve`);
      await page.close();
    });

    it('a search finds words, and says so in the address', async () => {
      const page = await open('/datasets');
      const found = await askList(url(''), '?q=hinge');
      expect(found.total.datasets).toBeGreaterThan(0);
      await page.getByRole('searchbox').fill('hinge');
      await page.keyboard.press('Enter');
      await expect.poll(() => new URL(page.url()).search, SOON).toBe('?q=hinge');
      await expect.poll(() => datasetRowsIn(page).count(), SOON).toBe(found.total.datasets);
      await page.close();
    });

    it('a drag along the axis is a window on tenths, in which everything is counted', async () => {
      const page = await open('/datasets');
      const ruler = await rulersIn(page).first().boundingBox();
      if (!ruler) throw new Error('The ruler is not shown.');
      const y = ruler.y + ruler.height / 2;
      await page.mouse.move(ruler.x + ruler.width * 0.4, y);
      await page.mouse.down();
      await page.mouse.move(ruler.x + ruler.width * 0.6, y, { steps: 4 });
      await page.mouse.up();
      await expect.poll(() => new URL(page.url()).searchParams.has('from'), SOON).toBe(true);
      const { search, searchParams } = new URL(page.url());
      for (const edge of ['from', 'to']) expect(searchParams.get(edge)).toMatch(/^-?\d+(\.\d)?$/);
      const counted = await askList(url(''), search);
      expect(counted.total.points).toBeGreaterThan(0);
      await expect
        .poll(() => verdictIn(page).textContent(), SOON)
        .toContain(
          `${counted.total.onCurve.toLocaleString('en-GB')} / ${counted.total.points.toLocaleString('en-GB')}`,
        );
      expect(await windowOf(page)).toEqual({
        from: Number(searchParams.get('from')),
        to: Number(searchParams.get('to')),
      });
      await page.goBack();
      await expect.poll(() => new URL(page.url()).search, SOON).toBe('');
      await page.close();
    });

    it('where nothing fits, it says what to loosen', async () => {
      const page = await newPage();
      await page.goto(url('/datasets?system=alrq-velline&ligand=halide'));
      await page.getByRole('heading', { name: 'No dataset fits all of that' }).waitFor();
      const without = await askList(url(''), '?ligand=halide');
      await page.getByRole('link', { name: `any system ${without.total.datasets} datasets` }).click();
      await expect.poll(() => datasetRowsIn(page).count(), SOON).toBe(without.datasets.length);
      await page.close();
    });

    it('more rows come by cursor, until all are there', async () => {
      const page = await open('/datasets');
      const { total } = await askList(url(''));
      const before = await datasetRowsIn(page).count();
      expect(before).toBeLessThan(total.datasets);
      await page.getByRole('button', { name: `More: ${total.datasets - before} older datasets` }).click();
      await expect.poll(() => datasetRowsIn(page).count(), SOON).toBe(total.datasets);
      expect(await page.getByRole('button', { name: /^More:/ }).count()).toBe(0);
      await page.close();
    });

    it('where the list cannot be read, it says so and tries again', async () => {
      const page = await open('/datasets');
      await page.route('**/api/v1/datasets?*', (route) => route.abort());
      await filterIn(page, 'System', 'MerV').click();
      await page.getByRole('alert').filter({ hasText: 'The list could not be read' }).waitFor();
      await page.unroute('**/api/v1/datasets?*');
      await page.getByRole('button', { name: 'Try again' }).click();
      const { total } = await askList(url(''), '?system=merv-halide');
      await expect.poll(() => datasetRowsIn(page).count(), SOON).toBe(total.datasets);
      await page.close();
    });

    it('without script, rows, counts, filters and search are there', async () => {
      const page = await newPage({ javaScriptEnabled: false });
      await page.goto(url('/datasets'));
      const { total } = await askList(url(''), '?system=alrq-velline');
      await page.getByRole('link', { name: 'AlrQ' }).first().click();
      // Without script nothing else tells that the next page is there.
      await page.waitForURL(/system=alrq-velline/);
      expect(await headOf(page)).toBe(`${total.datasets} datasets, one curve`);
      await page.getByRole('searchbox').fill('hinge');
      await page.getByRole('button', { name: 'Search' }).click();
      await page.waitForURL(/q=hinge/);
      expect(new URL(page.url()).search).toContain('system=alrq-velline');
      await page.close();
    });
  });

  describe('one dataset', () => {
    it('is opened at a point off the curve: at the top, with the point marked in words and in the table', async () => {
      const page = await open('/datasets');
      const misses = page.getByRole('region', { name: 'Points off the curve' }).first();
      const link = misses.getByRole('link').first();
      const [, series, point] = /point=(\d+)\.(\d+)$/.exec((await link.getAttribute('href')) ?? '') ?? [];
      await link.click();
      await page.waitForURL(/\/datasets\/CK-\d+\?point=/);
      await page.getByRole('heading', { level: 1 }).waitFor();
      await expect.poll(() => page.evaluate(() => scrollY), SOON).toBe(0);
      expect(Number(series)).toBeGreaterThan(0);
      const opened = page.getByRole('region', { name: 'The point that was opened' });
      expect(await opened.textContent()).toContain(`, point ${point}`);
      const row = page.getByRole('region', { name: 'Points as a table' }).locator('tr[aria-current=true]');
      expect(await row.count()).toBe(1);
      expect(await row.textContent()).toContain(` ${point}`);
      await page.close();
    });

    it('is opened from its row, with the numbers of its assessment, and downloads', async () => {
      const page = await open('/datasets');
      const complaints = listenForComplaints(page);
      const [first] = (await askList(url(''), '?flag=off-curve')).datasets;
      await rowOf(page, first.accession).getByRole('link', { name: first.title }).click();
      await page.waitForURL(`**/datasets/${first.accession}`);
      await page.getByRole('heading', { level: 1, name: first.title }).waitFor();
      const dataset = await (await fetch(url(`/api/v1/datasets/${first.accession}`))).json();
      const { summary } = dataset.assessment;
      expect(await verdictIn(page).textContent()).toContain(`${summary.onCurve} / ${summary.points}`);
      const table = page.getByRole('region', { name: 'Points as a table' });
      await expect
        .poll(() => table.textContent(), SOON)
        .toContain(` of ${summary.warning + summary.offCurve}`);

      for (const [name, type] of [
        ['Document, JSON', 'application/json'],
        ['Points, CSV', 'text/csv'],
        ['Points, JSON', 'application/json'],
      ]) {
        const href = await page.getByRole('link', { name, exact: true }).getAttribute('href');
        const answer = await fetch(url(href ?? ''));
        expect(answer.status).toBe(200);
        expect(answer.headers.get('Content-Type')).toContain(type);
      }
      await drawn(page);
      expect(complaints).toEqual([]);
      await page.close();
    });

    it('holds its window and its ligand in the address', async () => {
      const page = await newPage();
      await page.goto(url('/datasets/CK-000122?from=-4&to=2'));
      await expect.poll(() => windowOf(page), SOON).toEqual({ from: -4, to: 2 });
      await page.getByText('by ocarate concentration').click();
      await expect.poll(() => new URL(page.url()).search, SOON).toBe('?from=-4&to=2&by=ocarate');
      await page.close();
    });

    it('an accession that is none, one that is not published, and a withdrawn one say so', async () => {
      const page = await newPage();
      for (const path of ['/datasets/nonsense', '/datasets/CK-999999', '/labs/nobody'])
        expect((await page.goto(url(path)))?.status(), path).toBe(404);
      await page.goto(url('/datasets/CK-000100'));
      await page.getByRole('heading', { name: 'This dataset was withdrawn' }).waitFor();
      await page.close();
    });

    it('a laboratory has its datasets and no other', async () => {
      const page = await open('/labs/quillan-institute');
      const { total, datasets } = await askList(url(''), '?lab=quillan-institute');
      expect(await datasetRowsIn(page).count()).toBe(datasets.length);
      expect(await verdictIn(page).textContent()).toContain(`${total.onCurve} / ${total.points}`);
      await page.close();
    });
  });

  it('the start page shows everything published, and what came in lately', async () => {
    const page = await open('/');
    const { total, datasets } = await askList(url(''));
    expect(await datasetRowsIn(page).first().getAttribute('data-accession')).toBe(datasets[0].accession);
    await page.getByRole('link', { name: `Browse ${total.datasets} datasets` }).click();
    await page.waitForURL('**/datasets');
    await page.close();
  });
});

/** The columns of pixels in which the lit layer has something in the colour of what is lit. */
async function litColumns(page: Page): Promise<Set<number>> {
  const layer = page.locator('main [role=img] canvas').nth(1);
  if ((await layer.count()) === 0) return new Set();
  const found = await layer.evaluate((element) => {
    const canvas = element as HTMLCanvasElement;
    const probe = document.createElement('span');
    probe.style.color = 'var(--act)';
    document.body.append(probe);
    const wanted = (getComputedStyle(probe).color.match(/\d+/g) ?? []).map(Number);
    probe.remove();
    const { width, height } = canvas;
    const pixels = canvas.getContext('2d')?.getImageData(0, 0, width, height).data ?? [];
    const columns: number[] = [];
    for (let i = 0; i < width * height; i++) {
      const far = Math.max(...[0, 1, 2].map((k) => Math.abs(pixels[4 * i + k] - wanted[k])));
      if (far <= 24 && pixels[4 * i + 3] > 200) columns.push(i % width);
    }
    return [...new Set(columns)];
  });
  return new Set(found);
}
