/** One point of a dataset in an address: `point=2.3` is the third point of the second series. Pure. */
import type { PointPlace } from '@/components/plots/plot-data';

/** The address of a dataset's page with one of its points marked. */
export function pointHref(accession: string, { series, point }: PointPlace): string {
  return `/datasets/${accession}?point=${series + 1}.${point + 1}`;
}

/** The place that an address names; null where it names none. */
export function readPoint(text: string | null): PointPlace | null {
  const found = /^(\d{1,6})\.(\d{1,6})$/.exec(text ?? '');
  if (found === null) return null;
  const place = { series: Number(found[1]) - 1, point: Number(found[2]) - 1 };
  return place.series < 0 || place.point < 0 ? null : place;
}
