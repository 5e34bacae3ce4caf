/**
 * Who may do what: the one table that every page and call asks. A new action without an answer for every kind of
 * actor, or a new kind of actor without an answer for every action, is a compile error.
 */
import type { Actor, ActorKind } from './actor';

export const ACTIONS = ['check-document', 'read-methods', 'read-api-description', 'read-health'] as const;

export type Action = (typeof ACTIONS)[number];

export const PERMISSIONS: Record<Action, Record<ActorKind, boolean>> = {
  'check-document': { visitor: true },
  'read-methods': { visitor: true },
  'read-api-description': { visitor: true },
  'read-health': { visitor: true },
};

/** Whether the actor may do it. */
export function may(actor: Actor, action: Action): boolean {
  return PERMISSIONS[action][actor.kind];
}
