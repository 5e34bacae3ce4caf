import { spawn } from 'node:child_process';
import { once } from 'node:events';
import path from 'node:path';
import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { applyMigrations } from '@/db/apply-migrations';
import { closeDatabase, readDatabase, write } from '@/db/client';
import { installKeys } from '@/db/tables/computation-limits';
import { temporaryDatabase } from '@/tests/support/temporary-database';

const { dataDir } = temporaryDatabase();

async function pragma(name: string, durability: 'acknowledged' | 'counter'): Promise<unknown> {
  return write(durability, async (tx) => Object.values((await tx.all(`PRAGMA ${name}`))[0] as object)[0]);
}

async function counterValue(name: string): Promise<number> {
  const database = await readDatabase();
  const [row] = await database.select().from(installKeys).where(eq(installKeys.name, name));
  return row ? Number(row.value.toString()) : 0;
}

async function increment(name: string): Promise<void> {
  await write('acknowledged', async (tx) => {
    const [row] = await tx.select().from(installKeys).where(eq(installKeys.name, name));
    const value = Buffer.from(String(row ? Number(row.value.toString()) + 1 : 1));
    await tx
      .insert(installKeys)
      .values({ name, value })
      .onConflictDoUpdate({ target: installKeys.name, set: { value } });
  });
}

describe('the database', () => {
  it('keeps its settings on every writing connection', async () => {
    for (let i = 0; i < 3; i++) {
      expect(await pragma('synchronous', 'acknowledged')).toBe(2);
      expect(await pragma('synchronous', 'counter')).toBe(1);
      expect(await pragma('foreign_keys', 'acknowledged')).toBe(1);
      expect(await pragma('journal_mode', 'counter')).toBe('wal');
    }
  });

  it('loses none of sixty parallel read-then-write transactions, and still reads', async () => {
    const writes = Array.from({ length: 60 }, () => increment('parallel'));
    await counterValue('parallel');
    await Promise.all(writes);
    expect(await counterValue('parallel')).toBe(60);
  });

  it('rolls back what throws and writes on', async () => {
    const failing = write('acknowledged', async (tx) => {
      await tx.insert(installKeys).values({ name: 'half', value: Buffer.from('1') });
      throw new Error('changed my mind');
    });
    await expect(failing).rejects.toThrow('changed my mind');
    expect(await counterValue('half')).toBe(0);
    await increment('half');
    expect(await counterValue('half')).toBe(1);
  });

  it('changes nothing when migrated a second time', async () => {
    await increment('kept');
    await applyMigrations();
    await applyMigrations();
    expect(await counterValue('kept')).toBe(1);
  });

  it('waits for another process that writes to the same file', async () => {
    const file = path.join(dataDir(), 'curvekeep.db');
    const script = `
      import { createClient } from '@libsql/client';
      const tx = await createClient({ url: 'file:${file}' }).transaction('write');
      await tx.execute("insert into install_keys values ('other', '1')");
      process.stdout.write('holding');
      setTimeout(() => tx.commit(), 400);`;
    const other = spawn(process.execPath, ['--input-type=module', '-e', script], {
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    await once(other.stdout, 'data');
    await increment('after-other');
    expect(await counterValue('after-other')).toBe(1);
    if (other.exitCode === null) await once(other, 'exit');
    expect(await counterValue('other')).toBe(1);
  });

  it('opens again after it was closed', async () => {
    await closeDatabase();
    expect(await counterValue('kept')).toBe(1);
  });
});
