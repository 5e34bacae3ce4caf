/** The verb behind the sign-out button: the session is dead, whoever may still hold its id. */
import { write } from '@/db/client';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from './actor';
import { endSession, noSessionCookie, type SessionCookie } from './session';

/**
 * Ends the session that the browser holds. Returns the cookie that clears it there.
 *
 * @param actor whose session it is; a visitor's has ended already
 */
export async function signOut(actor: Actor, heldSessionId: string | null): Promise<SessionCookie> {
  if (heldSessionId !== null && actor.kind === 'person') {
    await write('acknowledged', async (tx) => {
      await endSession(tx, heldSessionId);
      await recordAudit(tx, { actor, action: 'signed-out', subject: actorKey(actor) });
    });
  }
  return noSessionCookie();
}
