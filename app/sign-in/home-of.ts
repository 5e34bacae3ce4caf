import type { Route } from 'next';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';

/** Where somebody goes who signed in without wanting to be anywhere: to what waits for them. */
export function homeOf(actor: Actor): Route {
  if (may(actor, 'see-queue')) return '/curation' as Route;
  return may(actor, 'see-own-deposits') ? ('/deposits' as Route) : '/';
}
