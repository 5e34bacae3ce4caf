/**
 * Who is asking. A discriminated union: every page, call and verb is given one of these and nothing else to decide
 * by. What each may do stands in `permissions.ts`.
 */

/** Somebody who has not signed in. */
export interface Visitor {
  kind: 'visitor';
}

export const PERSON_ROLES = ['depositor', 'curator', 'administrator'] as const;

/** What a person may do beyond their laboratories. */
export type PersonRole = (typeof PERSON_ROLES)[number];

export interface Membership {
  labId: string;
  labSlug: string;
  labName: string;
  role: 'member' | 'manager';
}

/** Somebody who signed in; role and memberships as they stand in the database at this request. */
export interface Person {
  kind: 'person';
  id: string;
  name: string;
  email: string;
  role: PersonRole;
  memberships: Membership[];
}

export const LAB_TOKEN_SCOPES = ['read-drafts', 'write-drafts', 'submit'] as const;

export type LabTokenScope = (typeof LAB_TOKEN_SCOPES)[number];

/** A laboratory's script. */
export interface LabToken {
  kind: 'token';
  id: string;
  labId: string;
  scopes: LabTokenScope[];
}

/** The application itself: jobs and the demonstration's seed. */
export interface System {
  kind: 'system';
}

export type Actor = Visitor | Person | LabToken | System;

export const VISITOR: Visitor = { kind: 'visitor' };

export const SYSTEM: System = { kind: 'system' };

/** The actor in one word, for the audit trail and idempotency: `person:ID`, `token:ID`, `visitor`, `system`. */
export function actorKey(actor: Actor): string {
  return actor.kind === 'person' || actor.kind === 'token' ? `${actor.kind}:${actor.id}` : actor.kind;
}
