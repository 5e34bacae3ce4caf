/**
 * The database. Reads are free; every write goes through one asynchronous mutex, since a write that meets an open
 * transaction of its own process would block the event loop until the busy timeout and then fail.
 *
 * PRAGMAs hold per connection, so each kind of write has a client with exactly one connection of its own:
 * acknowledged writes with `synchronous=FULL` (they survive a kill or a power cut), counters with `NORMAL` (a power
 * cut may lose the last seconds of them, which harms nobody).
 */
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { type Client, createClient } from '@libsql/client';
import { drizzle, type LibSQLDatabase } from 'drizzle-orm/libsql';
import { hideValuesOfFailedQueries } from '@/db/hide-values';
import { env } from '@/lib/env';

/** Milliseconds for which a write waits for another process on the same file. */
const BUSY_TIMEOUT_MS = 5000;

export type Database = LibSQLDatabase;
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

/** `acknowledged`: on the disk when the promise resolves. `counter`: soon after. */
export type Durability = 'acknowledged' | 'counter';

interface Connections {
  reader: Client;
  writers: Record<Durability, Client>;
  lastWrite: Promise<unknown>;
}

const KEY = Symbol.for('curvekeep.database');
// Next bundles route handlers apart from the server; both must meet the same mutex, so it hangs on globalThis.
const shared = globalThis as typeof globalThis & { [KEY]?: Promise<Connections> };

hideValuesOfFailedQueries();

/** The database for reading. Nothing is written through it. */
export async function readDatabase(): Promise<Database> {
  return drizzle((await connections()).reader);
}

/**
 * Runs `work` as the only writer of this process, in one transaction that begins as a write (so what it reads
 * cannot change before it writes), and commits it. Throws what `work` throws, after a rollback.
 */
export async function write<T>(durability: Durability, work: (tx: Transaction) => Promise<T>): Promise<T> {
  const opened = await connections();
  const turn = opened.lastWrite.then(() => transact(opened.writers[durability], durability, work));
  opened.lastWrite = turn.catch(() => undefined);
  return turn;
}

/** Runs `work` as the only writer of this process on a bare connection: for migrations, which bring their own transaction. */
export async function writeAlone<T>(work: (database: Database) => Promise<T>): Promise<T> {
  const opened = await connections();
  const turn = opened.lastWrite.then(() => work(drizzle(opened.writers.acknowledged)));
  opened.lastWrite = turn.catch(() => undefined);
  return turn;
}

/** Lets the writes under way finish and closes all connections. A later call opens them anew. */
export async function closeDatabase(): Promise<void> {
  const opening = shared[KEY];
  if (!opening) return;
  delete shared[KEY];
  const { reader, writers, lastWrite } = await opening;
  await lastWrite;
  for (const client of [reader, writers.acknowledged, writers.counter]) client.close();
}

function connections(): Promise<Connections> {
  if (!shared[KEY]) {
    const opening = open();
    // A failed opening is not kept: the next call tries again.
    opening.catch(() => {
      if (shared[KEY] === opening) delete shared[KEY];
    });
    shared[KEY] = opening;
  }
  return shared[KEY];
}

async function open(): Promise<Connections> {
  const { databaseUrl: url, databaseAuthToken: authToken } = env();
  makeFolderOf(url);
  const settings = { url, authToken, timeout: BUSY_TIMEOUT_MS };
  const acknowledged = createClient({ ...settings, concurrency: 1 });
  if (isLocal(url)) await acknowledged.execute('PRAGMA journal_mode=WAL');
  const counter = createClient({ ...settings, concurrency: 1 });
  return { reader: createClient(settings), writers: { acknowledged, counter }, lastWrite: Promise.resolve() };
}

async function transact<T>(
  client: Client,
  durability: Durability,
  work: (tx: Transaction) => Promise<T>,
): Promise<T> {
  try {
    if (client.protocol === 'file') await setConnection(client, durability);
    return await drizzle(client).transaction(work);
  } catch (error) {
    // A connection that met SQLITE_BUSY stays broken; the next write gets a new one.
    if (hasBusyCode(error)) await client.reconnect();
    throw error;
  }
}

async function setConnection(client: Client, durability: Durability): Promise<void> {
  await client.execute('PRAGMA foreign_keys=ON');
  await client.execute(`PRAGMA synchronous=${durability === 'acknowledged' ? 'FULL' : 'NORMAL'}`);
}

function hasBusyCode(error: unknown): boolean {
  for (let cause = error; cause instanceof Error; cause = cause.cause) {
    if ('code' in cause && String(cause.code).startsWith('SQLITE_BUSY')) return true;
  }
  return false;
}

function isLocal(url: string): boolean {
  return url.startsWith('file:');
}

function makeFolderOf(url: string): void {
  const file = localFile(url);
  if (file) mkdirSync(path.dirname(file), { recursive: true });
}

/** Path of the database file, or null for a remote database. */
export function localFile(url: string): string | null {
  if (!isLocal(url)) return null;
  const rest = url.slice('file:'.length).replace(/\?.*$/, '');
  return path.resolve(/* turbopackIgnore: true */ decodeURIComponent(rest.replace(/^\/\/(localhost)?/, '')));
}
