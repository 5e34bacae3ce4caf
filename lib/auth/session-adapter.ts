/**
 * Where lucia keeps its sessions: our table, with the SHA-256 of the id in place of the id, and never for longer than
 * the absolute limit. A session of an account that is disabled is no session.
 */
import type { Adapter, DatabaseSession } from 'lucia';
import type { Transaction } from '@/db/client';
import {
  deleteEndedSessions,
  deleteSession,
  deleteSessionsOf,
  insertSession,
  type SessionRow,
  selectSession,
  selectSessionsOf,
  updateSessionEnd,
} from '@/db/queries/sessions';
import { hashToken } from './hash-token';

/** A session ends this long after its sign-in, however much it is used. */
export const ABSOLUTE_LIMIT_MS = 30 * 86_400_000;

/** Runs a write: in a transaction of its own, or in one that is already open. */
export type RunWrite = (work: (tx: Transaction) => Promise<void>) => Promise<void>;

/** The adapter, its writes run by `run`. */
export function sessionAdapter(run: RunWrite): Adapter {
  return {
    getSessionAndUser: async (sessionId) => {
      const row = await selectSession(hashToken(sessionId));
      if (!row) return [null, null];
      return [sessionOf(row, sessionId), row.accountInUse ? { id: row.personId, attributes: {} } : null];
    },
    // Ids are not kept, so that those of a person's sessions come as their hashes.
    getUserSessions: async (personId) =>
      (await selectSessionsOf(personId)).map((row) => sessionOf(row, row.idHash)),
    setSession: ({ id, userId, expiresAt }) =>
      run((tx) =>
        insertSession(tx, {
          idHash: hashToken(id),
          personId: userId,
          createdAt: Date.now(),
          expiresAt: expiresAt.getTime(),
        }),
      ),
    updateSessionExpiration: (id, expiresAt) =>
      run((tx) => updateSessionEnd(tx, hashToken(id), expiresAt.getTime())),
    deleteSession: (id) => run((tx) => deleteSession(tx, hashToken(id))),
    deleteUserSessions: (personId) => run((tx) => deleteSessionsOf(tx, personId)),
    deleteExpiredSessions: () =>
      run((tx) => deleteEndedSessions(tx, Date.now(), Date.now() - ABSOLUTE_LIMIT_MS)),
  };
}

function sessionOf({ personId, createdAt, expiresAt }: SessionRow, id: string): DatabaseSession {
  const limit = createdAt + ABSOLUTE_LIMIT_MS;
  // Not the earlier of the two: lucia would take an end that is near for one to be moved, at every request.
  const end = limit <= Date.now() ? limit : expiresAt;
  return { id, userId: personId, expiresAt: new Date(end), attributes: {} };
}
