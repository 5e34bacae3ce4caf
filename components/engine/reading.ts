/** Another reading of a dataset: one change of what was stated, to be tried. */
import type { Misreading, ShapeEstimate } from '@/lib/engine/assessment';
import type { RefitResult } from '@/lib/engine/refit';

export type Reading =
  /** ids of the series that are read so */
  | { kind: 'convention'; series: readonly string[]; misreading: Misreading }
  | { kind: 'shape'; series: string; estimates: readonly ShapeEstimate[] }
  /** activities scaled to 0 and 1 put back between these two */
  | { kind: 'range'; series: string; low: number; high: number }
  | { kind: 'refit'; result: Pick<RefitResult, 'estimates' | 'correlations'> };
