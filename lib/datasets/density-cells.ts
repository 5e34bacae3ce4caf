/** How many points of a series and flag lie in each cell of the (energy, activity) plane. */
import type { AssessedPoint, Flag } from '@/lib/engine/assessment';
import { activityCellOf, energyCellOf } from './density-grid';

export interface DensityCell {
  flag: Flag;
  energyCell: number;
  activityCell: number;
  points: number;
}

/** The cells of a series that hold points. */
export function densityCells(points: readonly AssessedPoint[]): DensityCell[] {
  const cells = new Map<string, DensityCell>();
  for (const { energy, activity, flag } of points) {
    const cell = {
      flag,
      energyCell: energyCellOf(energy),
      activityCell: activityCellOf(activity),
      points: 1,
    };
    const key = `${flag} ${cell.energyCell} ${cell.activityCell}`;
    const known = cells.get(key);
    if (known) known.points += 1;
    else cells.set(key, cell);
  }
  return [...cells.values()];
}
