/** The listed systems, each with what is published on it. */
import { type SystemRow, selectPublishedBy, selectSystem, selectSystemPage } from '@/db/queries/systems';
import type { Actor } from '@/lib/auth/actor';
import { decide } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import { BAD_CURSOR, decodeCursor, encodeCursor, nextAddress } from '@/lib/datasets/list-cursor';
import { failed, type Outcome } from '@/lib/errors';
import { type PageQuery, USUAL_LIMIT } from '@/schemas/dataset-query';
import type { SystemAnswer, SystemList } from '@/schemas/system';

/** One page of the list, by name. `bad-parameter` where the cursor is none of this list. */
export async function listSystems(
  actor: Actor,
  { limit, cursor }: PageQuery,
): Promise<Outcome<{ list: SystemList }>> {
  const decision = decide(actor, 'read-published');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  const place = cursor === null ? null : decodeCursor(cursor, ['string', 'string']);
  if (cursor !== null && place === null) return failed('bad-parameter', BAD_CURSOR);
  const after = place && { name: String(place[0]), slug: String(place[1]) };
  const rows = await selectSystemPage(after, limit + 1);
  const page = rows.slice(0, limit);
  const last = rows.length > limit ? page.at(-1) : undefined;
  return { ok: true, list: { systems: await describe(page), next: last ? addressAfter(last, limit) : null } };
}

/** One listed system. */
export async function loadSystem(actor: Actor, slug: string): Promise<Outcome<{ system: SystemAnswer }>> {
  const decision = decide(actor, 'read-published');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  const row = await selectSystem(slug);
  const [system] = row ? await describe([row]) : [];
  return system ? { ok: true, system } : failed('not-found');
}

function addressAfter({ name, slug }: SystemRow, limit: number): string {
  const parameters = new URLSearchParams(limit === USUAL_LIMIT ? {} : { limit: String(limit) });
  return nextAddress('/api/v1/systems', parameters, encodeCursor([name, slug]));
}

async function describe(rows: SystemRow[]): Promise<SystemAnswer[]> {
  if (rows.length === 0) return [];
  const published = await selectPublishedBy({ systems: rows.map(({ slug }) => slug) });
  return rows.map(({ slug, name, protein, ligands }) => {
    const own = published.filter(({ system }) => system === slug);
    const sum = (key: 'datasets' | 'points' | 'onCurve' | 'warning' | 'offCurve') =>
      own.reduce((total, row) => total + row[key], 0);
    return {
      ...{ slug, name, protein, ligands },
      datasets: sum('datasets'),
      counts: {
        points: sum('points'),
        onCurve: sum('onCurve'),
        warning: sum('warning'),
        offCurve: sum('offCurve'),
      },
      labs: own.map(({ labSlug, labName, datasets }) => ({ slug: labSlug, name: labName, datasets })),
    };
  });
}
