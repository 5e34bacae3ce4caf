/** Migrations keep what an older version wrote. */
import { cp, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { applyMigrations } from '@/db/apply-migrations';
import { closeDatabase, readDatabase, write, writeAlone } from '@/db/client';
import { decisions, deposits, revisions } from '@/db/tables/deposits';

const LAST_BEFORE = '0002_say_who_changed_it_and_why_it_went';
const DOCUMENT = '\ufeff{"title": "Kept “as it is”", "system": "alrq-velline"}';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'curvekeep-migrations-'));
  process.env.CURVEKEEP_DATA_DIR = folder;
  process.env.LOG_LEVEL = 'silent';
});
afterAll(async () => {
  await closeDatabase();
  await rm(folder, { recursive: true, force: true });
});

/** The migrations up to that one. */
async function upTo(tag: string): Promise<string> {
  const older = path.join(folder, 'drizzle');
  await cp('drizzle', older, { recursive: true });
  const journal = path.join(older, 'meta', '_journal.json');
  const { entries, ...rest } = JSON.parse(await readFile(journal, 'utf8'));
  const end = entries.findIndex((entry: { tag: string }) => entry.tag === tag) + 1;
  await writeFile(journal, JSON.stringify({ ...rest, entries: entries.slice(0, end) }));
  return older;
}

it('puts long texts last, and keeps deposits, revisions and what points at them', async () => {
  await applyMigrations(await upTo(LAST_BEFORE));
  await writeAlone(async (database) => {
    await database.run(sql`insert into laboratories values ('lab', 'ambervale', 'Ambervale', 'Invented', 1)`);
    await database.run(sql`insert into deposits (id, lab_id, state, document, version, title, system, errors, created_by, created_at, updated_at, updated_by, accession)
      values ('d', 'lab', 'draft', ${DOCUMENT}, 4, 'Kept', 'alrq-velline', '[{"pointer":"/a"},{"pointer":"/b"}]', 'system', 1, 2, 'system', 7)`);
    await database.run(sql`insert into revisions (id, deposit_id, number, document, sha256, assessment, summary, engine, policy, submitted_by, submitted_at)
      values (5, 'd', 1, ${DOCUMENT}, 'hash', '{"a":1}', '{"s":1}', '1.0.0', 1, 'system', 3)`);
    await database.run(
      sql`insert into decisions (deposit_id, revision, kind, letter, decided_by, decided_at) values ('d', 1, 'accepted', '', 'x', 4)`,
    );
  });
  await applyMigrations();
  const database = await readDatabase();
  expect(await database.select().from(deposits)).toMatchObject([
    { id: 'd', version: 4, errorCount: 2, document: DOCUMENT, accession: 7, updatedBy: 'system' },
  ]);
  expect(await database.select().from(revisions)).toMatchObject([
    {
      ...{ id: 5, depositId: 'd', title: 'Kept “as it is”', system: 'alrq-velline' },
      ...{ document: DOCUMENT, assessment: '{"a":1}', summary: '{"s":1}', sha256: 'hash', submittedAt: 3 },
    },
  ]);
  expect(await database.select().from(decisions)).toHaveLength(1);
  for (const table of ['deposits', 'revisions']) {
    const columns = await database.all<{ name: string }>(sql.raw(`pragma table_info(${table})`));
    expect(columns.at(-1)?.name).toBe(table === 'deposits' ? 'document' : 'assessment');
  }
  expect(await database.all(sql`pragma foreign_key_check`)).toEqual([]);
  // References still hold: a deposit with revisions cannot go.
  const removal = write('acknowledged', async (tx) => {
    await tx.run(sql`delete from deposits`);
  });
  await expect(removal).rejects.toThrow();
});

it('lists the deposits of a laboratory by its index, without sorting', async () => {
  const plan = await (await readDatabase()).all<{ detail: string }>(
    sql`explain query plan select id from deposits where lab_id = 'lab' order by updated_at desc limit 50`,
  );
  const words = plan.map(({ detail }) => detail).join('; ');
  expect(words).toContain('deposits_lab');
  expect(words).not.toContain('TEMP B-TREE');
});
