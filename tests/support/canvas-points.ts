/** Where points stand on the canvas of the collapse, and what was drawn there. */
import type { Page } from 'playwright-core';
import { activityBounds, PANEL_GAP } from '@/components/plots/collapse-view';
import { type EnergyWindow, pixelOf } from '@/components/plots/energy-window';
import type { PlotData } from '@/components/plots/plot-data';
import { canvasIn } from './check-page';

/** The residual panel's share of the canvas, as the page's design has it. */
const RESIDUAL_SHARE = 0.29;

export interface CanvasPoint {
  series: number;
  point: number;
  /** pixels from the canvas' corner */
  x: number;
  y: number;
}

/** The box of the canvas in the page's pixels. */
export async function canvasBox(page: Page) {
  const box = await canvasIn(page).boundingBox();
  if (box === null) throw new Error('The canvas is not shown.');
  return box;
}

/** The on-curve points within a window, the most lonely one first. */
export function lonelyPoints(
  data: PlotData,
  window: EnergyWindow,
  { width, height }: { width: number; height: number },
): CanvasPoint[] {
  const { low, high } = activityBounds(data);
  const whole = height - PANEL_GAP;
  const plot = whole - Math.round(whole * RESIDUAL_SHARE);
  const all = data.series.flatMap(({ assessed }, series) =>
    assessed.points.map(({ index, energy, activity, flag }) => ({
      series,
      point: index,
      flag,
      x: pixelOf(energy, window, width),
      y: ((high - activity) / (high - low)) * plot,
    })),
  );
  const loneliness = ({ x, y, ...one }: CanvasPoint) =>
    Math.min(
      ...all.map((other) =>
        other.series === one.series && other.point === one.point
          ? Number.POSITIVE_INFINITY
          : Math.hypot(other.x - x, other.y - y),
      ),
    );
  return all
    .filter(({ flag, x }) => flag === 'on-curve' && x > 20 && x < width - 20)
    .sort((a, b) => loneliness(b) - loneliness(a));
}

/** The middle of what is drawn in a colour within some pixels of a place of the canvas; null where nothing is. */
export function middleOfColour(
  page: Page,
  token: string,
  place: { x: number; y: number },
): Promise<{ x: number; y: number } | null> {
  return canvasIn(page).evaluate(
    (element, { name, x, y, reach }) => {
      const canvas = element as HTMLCanvasElement;
      const probe = document.createElement('span');
      probe.style.color = `var(${name})`;
      document.body.append(probe);
      const wanted = (getComputedStyle(probe).color.match(/\d+/g) ?? []).map(Number);
      probe.remove();
      const [left, top] = [Math.round(x) - reach, Math.round(y) - reach];
      const size = 2 * reach + 1;
      const pixels = canvas.getContext('2d')?.getImageData(left, top, size, size).data ?? [];
      let [count, sumX, sumY] = [0, 0, 0];
      for (let i = 0; i < size * size; i++) {
        const far = Math.max(...[0, 1, 2].map((k) => Math.abs(pixels[4 * i + k] - wanted[k])));
        if (far > 70 || pixels[4 * i + 3] < 150) continue;
        count += 1;
        sumX += left + (i % size) + 0.5;
        sumY += top + Math.floor(i / size) + 0.5;
      }
      return count === 0 ? null : { x: sumX / count, y: sumY / count };
    },
    { name: token, ...place, reach: 6 },
  );
}

/** The canvas as it is now. */
export function canvasImage(page: Page): Promise<string> {
  return canvasIn(page).evaluate((canvas) => (canvas as HTMLCanvasElement).toDataURL());
}

/** The different images that the canvas shows, frame by frame, for a while after something was clicked. */
export function framesAfterClick(page: Page, label: string, milliseconds: number): Promise<string[]> {
  return page.evaluate(
    async ([text, duration]) => {
      const canvas = document.querySelector('main canvas') as HTMLCanvasElement;
      const clicked = [...document.querySelectorAll('label')].find(({ textContent }) => textContent === text);
      clicked?.click();
      const frames: string[] = [];
      const begin = performance.now();
      while (performance.now() - begin < Number(duration)) {
        await new Promise(requestAnimationFrame);
        const image = canvas.toDataURL();
        if (frames.at(-1) !== image) frames.push(image);
      }
      return frames;
    },
    [label, milliseconds] as const,
  );
}
