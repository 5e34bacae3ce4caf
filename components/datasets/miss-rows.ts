/** The points off the curve as they are listed: how many in whose hands, of whom, in which order. Pure. */
import type { OverlayPoint } from '@/components/plots/overlay-view';
import type { Overlay } from '@/schemas/overlay';

export interface LabCount {
  slug: string;
  name: string;
  points: number;
}

/** The furthest misses first, or by energy. */
export type MissOrder = 'miss' | 'energy';

/** How many of these points each laboratory has, the most first. */
export function countByLab(points: readonly OverlayPoint[], { datasets }: Overlay): LabCount[] {
  const counts = new Map<string, LabCount>();
  for (const { dataset } of points) {
    const { slug, name } = datasets[dataset].lab;
    const count = counts.get(slug) ?? { slug, name, points: 0 };
    counts.set(slug, { ...count, points: count.points + 1 });
  }
  return [...counts.values()].sort((a, b) => b.points - a.points || (a.name < b.name ? -1 : 1));
}

/** @param lab slug of the laboratory whose points alone are listed; null: all */
export function missRows(
  points: readonly OverlayPoint[],
  { datasets }: Overlay,
  { lab, order }: { lab: string | null; order: MissOrder },
): OverlayPoint[] {
  const rows = points.filter(({ dataset }) => lab === null || datasets[dataset].lab.slug === lab);
  return rows.sort(
    order === 'miss' ? (a, b) => Math.abs(b.z) - Math.abs(a.z) : (a, b) => a.energy - b.energy,
  );
}
