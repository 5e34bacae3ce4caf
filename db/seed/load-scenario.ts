/**
 * Loads the demonstration scenario into a database that holds no deposits: all of it in one transaction, so that a
 * start that is cut off leaves nothing behind. It writes what the verbs write, with dates of its own.
 */
import { count, eq, notInArray } from 'drizzle-orm';
import { type Transaction, write } from '@/db/client';
import { upsertListedSystem } from '@/db/queries/systems';
import { installKeys } from '@/db/tables/computation-limits';
import { deposits } from '@/db/tables/deposits';
import { people } from '@/db/tables/people';
import { DEMO_ACCOUNTS } from '@/lib/people/demo-accounts';
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

/** What marks a database as the demonstration's, beside the keys of the installation. */
const MARK = 'demonstration';

/** Thrown where the database holds something that is not the demonstration's. */
export class NotForDemonstration extends Error {
  constructor() {
    super(
      'The database holds people or deposits that are not the demonstration’s. Give the demonstration a folder of its own: CURVEKEEP_DATA_DIR.',
    );
    this.name = 'NotForDemonstration';
  }
}

/**
 * Makes accounts, laboratories, systems and deposits of the demonstration; what is there already stays.
 *
 * @throws NotForDemonstration before anything is written
 */
export async function loadScenario(): Promise<void> {
  await write('acknowledged', markAsDemonstration);
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

/** Everybody knows the accounts' password, so that they come into no database that is somebody's. */
async function markAsDemonstration(tx: Transaction): Promise<void> {
  const [mark] = await tx.select().from(installKeys).where(eq(installKeys.name, MARK));
  if (mark) return;
  const own = DEMO_ACCOUNTS.map(({ email }) => email);
  const [others] = await tx.select({ number: count() }).from(people).where(notInArray(people.email, own));
  const [all] = await tx.select({ number: count() }).from(people);
  const isSomebodys = others?.number !== 0 || (all?.number === 0 && !(await isEmpty(tx)));
  if (isSomebodys) throw new NotForDemonstration();
  await tx.insert(installKeys).values({ name: MARK, value: Buffer.from([1]) });
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
