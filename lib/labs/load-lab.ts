/** What a reader sees of a laboratory: its name and how much it published on which systems. */
import { selectLaboratoryBySlug } from '@/db/queries/laboratories';
import { selectPublishedBy } from '@/db/queries/systems';
import type { Actor } from '@/lib/auth/actor';
import { decide } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import { failed, type Outcome } from '@/lib/errors';

export interface PublishedLab {
  slug: string;
  name: string;
  institution: string;
  datasets: number;
  points: number;
  onCurve: number;
  warning: number;
  offCurve: number;
  /** most datasets first */
  systems: { slug: string; name: string; datasets: number }[];
}

/** The laboratory of a slug. Its datasets themselves are `listDatasets` with `lab`. */
export async function loadLab(actor: Actor, slug: string): Promise<Outcome<{ lab: PublishedLab }>> {
  const decision = decide(actor, 'read-published');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  const lab = await selectLaboratoryBySlug(slug);
  if (!lab) return failed('not-found');
  const rows = await selectPublishedBy({ lab: slug });
  const sum = (key: 'datasets' | 'points' | 'onCurve' | 'warning' | 'offCurve') =>
    rows.reduce((total, row) => total + row[key], 0);
  return {
    ok: true,
    lab: {
      ...{ slug, name: lab.name, institution: lab.institution },
      ...{ datasets: sum('datasets'), points: sum('points') },
      ...{ onCurve: sum('onCurve'), warning: sum('warning'), offCurve: sum('offCurve') },
      systems: rows.map(({ system, systemName, datasets }) => ({ slug: system, name: systemName, datasets })),
    },
  };
}
