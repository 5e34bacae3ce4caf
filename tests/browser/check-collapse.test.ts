/** The collapse, its ruler and its strips: one axis, to the pixel, and each lights the other. */
import type { BrowserContextOptions, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { pixelOf } from '@/components/plots/energy-window';
import type { PlotData } from '@/components/plots/plot-data';
import { describeInBrowser, drawn } from '@/tests/support/browse-app';
import {
  canvasBox,
  canvasImage,
  framesAfterClick,
  lonelyPoints,
  middleOfColour,
} from '@/tests/support/canvas-points';
import {
  askApi,
  countsSaid,
  countsWithin,
  editorIn,
  exampleDocumentOf,
  fullOf,
  openingOf,
  resultShown,
  rowsIn,
  rulersIn,
  verdictIn,
} from '@/tests/support/check-page';

describeInBrowser('the collapse of the page', ({ newPage, url }) => {
  async function open(search = '', options?: BrowserContextOptions): Promise<{ page: Page; data: PlotData }> {
    const data = await askApi(url(''), exampleDocumentOf('collapse'));
    const page = await newPage(options);
    await page.goto(url(`/check?example=collapse${search}`));
    await resultShown(page);
    return { page, data };
  }

  describe('one axis', () => {
    it.each([1440, 390])('at %i px plot, ruler and strips agree within a pixel', async (width) => {
      const { page, data } = await open('', { viewport: { width, height: 900 } });
      const window = openingOf(data);
      const box = await canvasBox(page);
      const placeOf = (energy: number) => box.x + pixelOf(energy, window, box.width);

      const rulers = await rulersIn(page).evaluateAll((elements) =>
        elements.map((element) => {
          const { left, width: wide } = element.getBoundingClientRect();
          const labels = [...element.querySelectorAll('text')].map((text) => ({
            label: text.textContent ?? '',
            x: left + Number(text.getAttribute('x')),
          }));
          return { left, width: wide, labels: labels.filter(({ label }) => label !== 'kT') };
        }),
      );
      expect(rulers.length).toBeGreaterThan(0);
      for (const ruler of rulers) {
        expect(Math.abs(ruler.left - box.x)).toBeLessThan(1);
        expect(Math.abs(ruler.width - box.width)).toBeLessThan(1);
        expect(ruler.labels.length).toBeGreaterThan(1);
        for (const { label, x } of ruler.labels)
          expect(Math.abs(x - placeOf(Number(label.replace('−', '-'))))).toBeLessThan(1);
      }

      for (const [i, { assessed }] of data.series.entries()) {
        const ticks = await rowsIn(page)
          .nth(i)
          .locator('svg path')
          .evaluateAll((paths) =>
            paths.flatMap((path) => {
              const left = path.closest('svg')?.getBoundingClientRect().left ?? Number.NaN;
              return [...(path.getAttribute('d') ?? '').matchAll(/M(-?[\d.]+) [\d.]+v/g)].map(
                ([, x]) => left + Number(x),
              );
            }),
          );
        const inside = assessed.points.filter(({ energy }) => energy >= window.from && energy <= window.to);
        const wanted = inside.map(({ energy }) => placeOf(energy)).sort((a, b) => a - b);
        expect(ticks).toHaveLength(wanted.length);
        ticks
          .sort((a, b) => a - b)
          .forEach((x, k) => {
            expect(Math.abs(x - wanted[k])).toBeLessThan(1);
          });
      }

      const lonely = lonelyPoints(data, window, box).slice(0, 3);
      expect(lonely.length).toBeGreaterThan(0);
      for (const point of lonely) {
        const middle = await middleOfColour(page, `--series-${point.series + 1}`, point);
        expect(middle).not.toBeNull();
        expect(Math.abs((middle?.x ?? Number.NaN) - point.x)).toBeLessThan(1);
        expect(Math.abs((middle?.y ?? Number.NaN) - point.y)).toBeLessThan(1);
      }
      await page.close();
    });
  });

  describe('by energy and by concentration', () => {
    it('changes the plot and the address, and comes back', async () => {
      const { page } = await open();
      const byEnergy = await canvasImage(page);
      const [, ...later] = [
        ...new Set(await framesAfterClick(page, 'by velline concentration', 1200)),
      ].filter((frame) => frame !== byEnergy);
      // Less motion is wanted: the first frame that differs is the last.
      expect(later).toEqual([]);
      expect(await canvasImage(page)).not.toBe(byEnergy);
      expect(new URL(page.url()).search).toBe('?example=collapse&by=velline');

      await page.reload();
      await resultShown(page);
      expect(await page.getByRole('radio', { name: 'by velline concentration' }).isChecked()).toBe(true);

      await page.getByText('by energy', { exact: true }).click();
      await drawn(page);
      expect(new URL(page.url()).search).toBe('?example=collapse');
      await expect.poll(() => canvasImage(page)).toBe(byEnergy);
      await page.close();
    });

    it('lets points travel where motion is welcome', async () => {
      const { page } = await open('', { reducedMotion: 'no-preference' });
      const frames = await framesAfterClick(page, 'by velline concentration', 1500);
      expect(new Set(frames).size).toBeGreaterThan(3);
      await page.close();
    });
  });

  describe('pointing', () => {
    const washOf = (page: Page, i: number) =>
      rowsIn(page)
        .nth(i)
        .locator('> div')
        .evaluate((row) => getComputedStyle(row).backgroundColor);

    it('at a row lights it and its points, and so does the keyboard', async () => {
      const { page } = await open();
      await page.mouse.move(0, 0);
      await drawn(page);
      const [plain, image] = [await washOf(page, 2), await canvasImage(page)];
      expect(plain).toBe('rgba(0, 0, 0, 0)');

      await rowsIn(page).nth(2).hover();
      await expect.poll(() => washOf(page, 2)).not.toBe(plain);
      expect(await washOf(page, 1)).toBe(plain);
      await expect.poll(() => canvasImage(page)).not.toBe(image);
      const lit = await canvasImage(page);

      await page.mouse.move(0, 0);
      await expect.poll(() => washOf(page, 2)).toBe(plain);
      await expect.poll(() => canvasImage(page)).toBe(image);

      await rowsIn(page).nth(2).getByRole('button').focus();
      await expect.poll(() => washOf(page, 2)).not.toBe(plain);
      await expect.poll(() => canvasImage(page)).toBe(lit);
      await page.close();
    });

    it('at a point lights its row and says its figures; a click shows its series’ statements', async () => {
      const { page, data } = await open();
      const box = await canvasBox(page);
      const point = lonelyPoints(data, openingOf(data), box).find(({ series }) => series > 0);
      if (point === undefined) throw new Error('No point of a later series is in sight.');
      const plain = await washOf(page, point.series);
      const image = await canvasImage(page);
      await page.mouse.move(box.x + point.x, box.y + point.y, { steps: 4 });
      await expect.poll(() => washOf(page, point.series)).not.toBe(plain);
      expect(await washOf(page, 0)).toBe(plain);
      await expect.poll(() => canvasImage(page)).not.toBe(image);

      await page.mouse.click(box.x + point.x, box.y + point.y);
      const heading = page.getByRole('region', { name: 'Statements', exact: true }).locator('h2');
      await expect.poll(() => heading.textContent()).toBe(data.series[point.series].label);
      await page.close();
    });
  });

  describe('the window of energies', () => {
    const windowOf = (page: Page) => {
      const { searchParams } = new URL(page.url());
      return { from: Number(searchParams.get('from')), to: Number(searchParams.get('to')) };
    };
    const searchFrom = async (page: Page) => {
      await expect.poll(() => new URL(page.url()).searchParams.has('from')).toBe(true);
      return windowOf(page);
    };
    const captionOf = (page: Page) => page.locator('#points caption').textContent();

    it('is dragged along the ruler; verdict, table, strips and address follow', async () => {
      const { page, data } = await open();
      await rulersIn(page).first().scrollIntoViewIfNeeded();
      const box = await rulersIn(page).first().boundingBox();
      if (box === null) throw new Error('No ruler is shown.');
      const image = await canvasImage(page);
      const opening = openingOf(data);
      const at = (energy: number) => box.x + pixelOf(energy, opening, box.width);
      await page.mouse.move(at(-2.5), box.y + 16);
      await page.mouse.down();
      await page.mouse.move(at(0), box.y + 16, { steps: 3 });
      await page.mouse.move(at(1.5), box.y + 16, { steps: 3 });
      await page.mouse.up();
      const window = await searchFrom(page);
      expect(Math.abs(window.from + 2.5)).toBeLessThan(0.03);
      expect(Math.abs(window.to - 1.5)).toBeLessThan(0.03);
      await expect.poll(() => countsSaid(page)).toEqual(countsWithin(data, window));
      await expect.poll(() => canvasImage(page)).not.toBe(image);
      const total = countsWithin(data, window).inside;
      expect(total).toBeLessThan(data.assessment.summary.points);
      expect(await captionOf(page)).toBe(`Points 1 to ${Math.min(25, total)} of ${total}`);
      const energies = await page
        .locator('#points tbody tr')
        .evaluateAll((rows) =>
          rows.map((row) => Number.parseFloat((row.children[3].textContent ?? '').replace('−', '-'))),
        );
      expect(energies).toHaveLength(Math.min(25, total));
      for (const energy of energies) {
        expect(energy).toBeGreaterThanOrEqual(window.from - 0.01);
        expect(energy).toBeLessThanOrEqual(window.to + 0.01);
      }

      await page.reload();
      await resultShown(page);
      expect(windowOf(page)).toEqual(window);
      expect(await countsSaid(page)).toEqual(countsWithin(data, window));
      await page.close();
    });

    it('follows the keys', async () => {
      const { page, data } = await open('&from=-8&to=0');
      await rulersIn(page).first().focus();
      const press = async (key: string) => {
        await page.keyboard.press(key);
        await drawn(page);
        return windowOf(page);
      };
      expect(await press('ArrowRight')).toEqual({ from: -7.2, to: 0.8 });
      expect(await press('ArrowLeft')).toEqual({ from: -8, to: 0 });
      expect(await press('+')).toEqual({ from: -7.2, to: -0.8 });
      expect(await press('-')).toEqual({ from: -8, to: 0 });
      // Never beyond all energies.
      expect(fullOf(data).to).toBe(4);
      expect(await press('PageUp')).toEqual({ from: -4, to: 4 });
      expect(await press('PageUp')).toEqual({ from: -4, to: 4 });
      expect(await press('Home')).toEqual(fullOf(data));
      expect(await verdictIn(page).textContent()).toContain('Holds all points.');
      await page.close();
    });

    it('is typed', async () => {
      const { page, data } = await open();
      const from = page.getByLabel('from, kT');
      await from.fill('−1,5');
      await page.getByLabel('to, kT').fill('-1.4');
      expect(await verdictIn(page).textContent()).toContain('Two numbers at least 0.2 kT apart');
      expect(await page.getByRole('button', { name: 'Apply', exact: true }).isDisabled()).toBe(true);
      await page.getByLabel('to, kT').fill('2');
      await from.press('Enter');
      expect(await searchFrom(page)).toEqual({ from: -1.5, to: 2 });
      expect(await countsSaid(page)).toEqual(countsWithin(data, { from: -1.5, to: 2 }));

      await page.getByRole('button', { name: 'All energies' }).click();
      await expect.poll(() => windowOf(page)).toEqual(fullOf(data));
      expect(await captionOf(page)).toBe(`Points 1 to 25 of ${data.assessment.summary.points}`);
      await page.close();
    });

    it('and the ligand leave the address with the result, and come back with it', async () => {
      const { page } = await open('&from=-4&to=3&by=velline');
      expect(new URL(page.url()).search).toBe('?example=collapse&from=-4&to=3&by=velline');
      await page.getByRole('button', { name: 'Change the data' }).click();
      await editorIn(page).waitFor();
      await expect.poll(() => new URL(page.url()).search).toBe('');
      await page.goBack();
      await resultShown(page);
      expect(new URL(page.url()).search).toBe('?example=collapse&from=-4&to=3&by=velline');
      await page.close();
    });
  });

  it('the table shows one series or one flag where asked', async () => {
    const { page, data } = await open('&from=-30&to=30');
    await page.locator('#points').getByLabel('flag').selectOption('warning');
    const rows = page.locator('#points tbody tr');
    expect(await rows.count()).toBe(data.assessment.summary.warning);
    await page.locator('#points').getByLabel('series').selectOption({ label: 'wild type' });
    expect(await page.locator('#points').textContent()).toContain(
      'No point of this series and flag lies in the window of energies.',
    );
    await page.locator('#points').getByLabel('flag').selectOption('all');
    expect(await rows.count()).toBe(14);
    await page.close();
  });
});
