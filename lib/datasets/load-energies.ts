/** Where on the energy axis the points of everything published lie, for the window that a page opens with. */
import { selectMergedCells } from '@/db/queries/overlay';
import type { Actor } from '@/lib/auth/actor';
import { decide } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import type { Flag } from '@/lib/engine/assessment';
import type { Outcome } from '@/lib/errors';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { ENERGY_CELL_KT } from '@/schemas/density-grid';
import { selectionOf } from './dataset-filter';

/** The middles of the cells that hold points, kT, with the flag of those. */
export async function loadEnergies(
  actor: Actor,
  filters: DatasetFilters,
): Promise<Outcome<{ energies: { energy: number; flag: Flag }[] }>> {
  const decision = decide(actor, 'read-published');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  const cells = await selectMergedCells(selectionOf(filters));
  const energies = cells.map(({ energyCell, flag }) => ({
    energy: (energyCell + 0.5) * ENERGY_CELL_KT,
    flag,
  }));
  return { ok: true, energies };
}
