/**
 * Sessions. The one place that knows lucia: everything else asks here, so that it can be replaced here.
 *
 * A session id has 200 random bits, is new at every sign-in and dead after sign-out. It ends after 14 days without use
 * (lucia moves the end when half of them are over) and 30 days after sign-in at the latest.
 */
import { Lucia, TimeSpan } from 'lucia';
import { type Transaction, write } from '@/db/client';
import { env } from '@/lib/env';
import { ABSOLUTE_LIMIT_MS, type RunWrite, sessionAdapter } from './session-adapter';

/** What to give the browser. */
export interface SessionCookie {
  name: string;
  value: string;
  attributes: { path: '/'; httpOnly: true; sameSite: 'lax'; secure: boolean; maxAge: number };
}

/** Starts a session for a person who has just proved who they are. */
export async function startSession(tx: Transaction, personId: string): Promise<SessionCookie> {
  const session = await lucia((work) => work(tx)).createSession(personId, {});
  return cookieOf(session.id, ABSOLUTE_LIMIT_MS / 1000);
}

/** Ends the session; its id lets nobody in any more. */
export async function endSession(tx: Transaction, sessionId: string): Promise<void> {
  await lucia((work) => work(tx)).invalidateSession(sessionId);
}

/** The person of a session, or null where it has ended. Not inside a write: it may write itself. */
export async function personOfSession(sessionId: string): Promise<string | null> {
  const { session } = await lucia((work) => write('counter', work)).validateSession(sessionId);
  return session?.userId ?? null;
}

/** The chore that forgets sessions that are over. */
export async function forgetEndedSessions(): Promise<void> {
  await lucia((work) => write('counter', work)).deleteExpiredSessions();
}

/** The session id in a Cookie header, or null. Read here, since lucia's own reader throws at a broken escape. */
export function sessionIdOf(cookieHeader: string | null): string | null {
  const start = `${sessionCookieName()}=`;
  const parts = (cookieHeader ?? '').split(';').map((part) => part.trim());
  return parts.find((part) => part.startsWith(start))?.slice(start.length) || null;
}

/** The cookie that takes the session away from the browser. */
export function noSessionCookie(): SessionCookie {
  return cookieOf('', 0);
}

/** Name of the cookie; over https one that no other host and no plain connection can set. */
export function sessionCookieName(): string {
  return isSecure() ? '__Host-curvekeep-session' : 'curvekeep-session';
}

function cookieOf(value: string, maxAge: number): SessionCookie {
  return {
    name: sessionCookieName(),
    value,
    attributes: { path: '/', httpOnly: true, sameSite: 'lax', secure: isSecure(), maxAge },
  };
}

function lucia(run: RunWrite): Lucia {
  return new Lucia(sessionAdapter(run), {
    sessionExpiresIn: new TimeSpan(14, 'd'),
    sessionCookie: { name: sessionCookieName() },
  });
}

function isSecure(): boolean {
  return env().appUrl.startsWith('https:');
}
