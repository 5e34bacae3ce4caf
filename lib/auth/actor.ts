/**
 * Who is asking. A discriminated union: every page, call and verb is given one of these and nothing else to decide
 * by. Members, tokens, link holders, curators and administrators join here as further members of the union, and
 * `permissions.ts` then refuses to compile until it says what each of them may do.
 */

/** Somebody who has not signed in. */
export interface Visitor {
  kind: 'visitor';
}

export type Actor = Visitor;

export type ActorKind = Actor['kind'];

export const VISITOR: Visitor = { kind: 'visitor' };
