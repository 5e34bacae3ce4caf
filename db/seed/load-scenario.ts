/**
 * Loads the demonstration scenario into a database that holds no deposits: all of it in one transaction, so that a
 * start that is cut off leaves nothing behind. It writes what the verbs write, with dates of its own.
 */
import { count } from 'drizzle-orm';
import { type Transaction, write } from '@/db/client';
import { upsertListedSystem } from '@/db/queries/systems';
import { deposits } from '@/db/tables/deposits';
import { ensureDemoAccounts, ensureLaboratory } from '@/lib/people/ensure-demo-accounts';
import { LABORATORIES, SYSTEMS } from './laboratories';
import { makeDeposits } from './make-deposits';
import { makeDocuments } from './make-documents';
import type { LabSlug } from './recipe';
import { earlierRevision } from './revise';
import { type Authors, depositAs, publishAs, timeOf } from './write-deposit';

/** Number of the first published dataset; a withdrawn one comes before it. */
const FIRST_ACCESSION = 101;
/** The laboratory of the demonstration's depositor and manager. */
const DEMO_LAB: LabSlug = 'halvorn-biophysics';

/** Makes accounts, laboratories, systems and deposits of the demonstration; what is there already stays. */
export async function loadScenario(): Promise<void> {
  const labs = await ensureLaboratories();
  const people = await ensureDemoAccounts([
    { email: 'depositor@demo.example', labId: labs[DEMO_LAB], role: 'member' },
    { email: 'manager@demo.example', labId: labs[DEMO_LAB], role: 'manager' },
  ]);
  const authors: Authors = {
    labs,
    depositor: (lab) => (lab === DEMO_LAB ? `person:${people['depositor@demo.example']}` : 'system'),
    curator: `person:${people['curator@demo.example']}`,
  };
  await write('acknowledged', async (tx) => {
    if (await isEmpty(tx)) await writeScenario(tx, authors);
  });
}

async function ensureLaboratories(): Promise<Record<LabSlug, string>> {
  const ids: [string, string][] = [];
  for (const laboratory of LABORATORIES) ids.push([laboratory.slug, await ensureLaboratory(laboratory)]);
  return Object.fromEntries(ids) as Record<LabSlug, string>;
}

async function isEmpty(tx: Transaction): Promise<boolean> {
  const [row] = await tx.select({ deposits: count() }).from(deposits);
  return row?.deposits === 0;
}

async function writeScenario(tx: Transaction, authors: Authors): Promise<void> {
  const createdAt = timeOf('2025-11-03');
  for (const system of SYSTEMS) await upsertListedSystem(tx, { ...system, createdAt });
  for (const made of makeDeposits()) await depositAs(tx, authors, made, FIRST_ACCESSION - 1);
  for (const [i, { recipe, document }] of makeDocuments().entries()) {
    const revisions = [
      ...earlierRevision(recipe),
      { document, published: recipe.revised ?? recipe.published },
    ];
    await publishAs(tx, authors, { lab: recipe.lab, accession: FIRST_ACCESSION + i, revisions });
  }
}
