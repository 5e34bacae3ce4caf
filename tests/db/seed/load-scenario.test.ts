/** What somebody finds who opens the demonstration. */
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectMemberships, selectPersonByEmail } from '@/db/queries/people';
import { attachDemonstrationFiles } from '@/db/seed/attach-files';
import { loadScenario } from '@/db/seed/load-scenario';
import { type Person, VISITOR } from '@/lib/auth/actor';
import { publishDue } from '@/lib/curation/publish-due';
import { listDatasets } from '@/lib/datasets/list-datasets';
import { loadDataset } from '@/lib/datasets/load-dataset';
import { listDeposits } from '@/lib/deposits/list-deposits';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { openFile } from '@/lib/deposits/open-file';
import { headAnswer } from '@/lib/deposits/write-answer';
import { DEPOSIT_STATES } from '@/schemas/deposit-states';
import { startLocalStorage, stopLocalStorage } from '@/storage/local-server';
import { worked } from '@/tests/support/collection';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();
let depositor: Person;
beforeAll(async () => {
  await startLocalStorage();
  await loadScenario();
  await attachDemonstrationFiles();
  const row = await selectPersonByEmail('depositor@demo.example');
  if (row === undefined) throw new Error('The demonstration has no depositor.');
  const { id, name, email, role } = row;
  depositor = { kind: 'person', id, name, email, role, memberships: await selectMemberships(id) };
}, 60_000);
afterAll(stopLocalStorage);

const own = async () => worked(await listDeposits({ actor: depositor, limit: 100 })).deposits;

describe('the demonstration', () => {
  it('has a deposit of its own laboratory in every state', async () => {
    const states = (await own()).map(({ state }) => state);
    for (const state of DEPOSIT_STATES) expect(states).toContain(state);
  });

  it('has a letter wherever a curator answered, and a day to come where something is accepted', async () => {
    for (const { id, state } of await own()) {
      const { deposit, decisions } = worked(await loadDeposit({ actor: depositor, id }));
      const isAnswered = ['changes-requested', 'accepted', 'declined'].includes(state);
      expect([state, decisions.some(({ letter }) => letter !== '')]).toEqual([state, isAnswered]);
      const { publication } = headAnswer(deposit);
      expect(publication !== null).toBe(state === 'accepted');
      if (publication) expect(Date.parse(publication.day)).toBeGreaterThan(Date.now());
    }
    expect(await publishDue()).toBe(0);
  });

  it('says why a dataset was withdrawn', async () => {
    const outcome = await loadDataset(VISITOR, 'CK-000100');
    expect(outcome.ok ? null : outcome.tombstone?.reason).toContain('at the laboratory’s request');
  });

  it('has original files with at least three datasets, saying that they are invented; no more after a second start', async () => {
    await attachDemonstrationFiles();
    const { list } = worked(
      await listDatasets(VISITOR, {
        ...{ system: [], lab: [], ligand: [], variant: [], flag: [], q: [], from: null, to: null },
        ...{ limit: 100, cursor: null },
      }),
    );
    let withFiles = 0;
    for (const { accession } of list.datasets) {
      const outcome = await loadDataset(VISITOR, accession);
      if (!outcome.ok) throw new Error(outcome.failure.code);
      const { files } = outcome.dataset;
      if (files.length === 0) continue;
      withFiles += 1;
      expect(files.map(({ name }) => name)).toEqual([expect.stringMatching(/\.csv$/), 'conditions.txt']);
      for (const { href, size } of files) {
        const [id = '', fileId = ''] = href.split('/').filter((_, i) => i === 4 || i === 6);
        const { open } = worked(await openFile({ actor: VISITOR, id, fileId }));
        const bytes = await buffer(await open());
        expect(bytes.byteLength).toBe(size);
        expect(bytes.toString().split('\n')[0]).toContain('Invented for the demonstration');
      }
    }
    expect(withFiles).toBeGreaterThanOrEqual(3);
  });
});
