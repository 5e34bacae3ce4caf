/**
 * Who may do what: the one table that every page and call asks. An actor wears hats: everyone the reader's, a script
 * the token's, a person those of their laboratories and of their role. A new action without an answer for every hat
 * is a compile error.
 */
import type { DepositState } from '@/lib/deposits/states';
import type { Actor, LabToken, LabTokenScope, System } from './actor';

export const HATS = ['reader', 'token', 'member', 'manager', 'curator', 'administrator'] as const;

export type Hat = (typeof HATS)[number];

export const ACTIONS = [
  'check-document',
  'refit-document',
  'read-methods',
  'read-api-description',
  'read-health',
  'read-published',
  'read-deposit',
  'create-deposit',
  'edit-deposit',
  'submit-deposit',
  'recall-deposit',
  'delete-draft',
  'attach-file',
  'read-file',
  'see-own-deposits',
  'see-queue',
  'decide-deposit',
  'see-lab',
  'manage-tokens',
  'read-audit',
] as const;

export type Action = (typeof ACTIONS)[number];

/** What an action is about. Without `state` a deposit counts as a draft, the most private it can be. */
export interface Subject {
  labId: string;
  state?: DepositState;
}

interface Grant {
  /** `other-lab`: every laboratory but the person's own */
  where: 'anywhere' | 'own-lab' | 'other-lab';
  /** the scope that a token must have */
  scope?: LabTokenScope;
  /** the states of a deposit in which it holds; all where left out */
  states?: 'submitted-on' | 'published';
}

type Row = Record<Hat, Grant | null>;

const ANYWHERE: Grant = { where: 'anywhere' };
const OWN_LAB: Grant = { where: 'own-lab' };
const NOBODY: Row = {
  reader: null,
  token: null,
  member: null,
  manager: null,
  curator: null,
  administrator: null,
};
const EVERYONE: Row = {
  reader: ANYWHERE,
  token: ANYWHERE,
  member: ANYWHERE,
  manager: ANYWHERE,
  curator: ANYWHERE,
  administrator: ANYWHERE,
};

/** What a laboratory does with its own deposits: its people, and its tokens of that scope. */
const ownLab = (scope: LabTokenScope): Row => ({
  ...NOBODY,
  token: { where: 'own-lab', scope },
  member: OWN_LAB,
  manager: OWN_LAB,
});

/** Curators and administrators see nothing of a draft. */
const SUBMITTED_ON: Grant = { where: 'anywhere', states: 'submitted-on' };
const READ_DEPOSIT: Row = {
  ...ownLab('read-drafts'),
  curator: SUBMITTED_ON,
  administrator: SUBMITTED_ON,
};

export const PERMISSIONS: Record<Action, Row> = {
  'check-document': EVERYONE,
  'refit-document': EVERYONE,
  'read-methods': EVERYONE,
  'read-api-description': EVERYONE,
  'read-health': EVERYONE,
  'read-published': EVERYONE,
  'read-deposit': READ_DEPOSIT,
  'create-deposit': ownLab('write-drafts'),
  'edit-deposit': ownLab('write-drafts'),
  'submit-deposit': ownLab('submit'),
  'recall-deposit': ownLab('submit'),
  'delete-draft': ownLab('write-drafts'),
  'attach-file': ownLab('write-drafts'),
  'read-file': { ...READ_DEPOSIT, reader: { where: 'anywhere', states: 'published' } },
  'see-own-deposits': ownLab('read-drafts'),
  'see-queue': { ...NOBODY, curator: { where: 'other-lab' } },
  'decide-deposit': { ...NOBODY, curator: { where: 'other-lab', states: 'submitted-on' } },
  'see-lab': { ...NOBODY, member: OWN_LAB, manager: OWN_LAB, administrator: ANYWHERE },
  'manage-tokens': { ...NOBODY, manager: OWN_LAB, administrator: ANYWHERE },
  'read-audit': { ...NOBODY, administrator: ANYWHERE },
};

/** Actions on one deposit, of which an outsider may not even learn that it exists. */
const ON_A_DEPOSIT: ReadonlySet<Action> = new Set<Action>([
  'read-deposit',
  'edit-deposit',
  'submit-deposit',
  'recall-deposit',
  'delete-draft',
  'attach-file',
  'read-file',
  'decide-deposit',
]);

/** `unauthenticated`: 401; `forbidden`: 403; `hidden`: 404, since the existence of the subject is private. */
export type Decision = 'allowed' | 'unauthenticated' | 'forbidden' | 'hidden';

/**
 * Whether the actor may do it.
 *
 * @param subject what it is about; without one the answer is whether there is any laboratory where they may, which
 *   is what to ask before anything is loaded (a visitor then gets 401 whether or not there is such a deposit)
 */
export function decide(actor: Actor, action: Action, subject?: Subject): Decision {
  if (isGranted(actor, action, subject)) return 'allowed';
  if (!ON_A_DEPOSIT.has(action) || subject === undefined) return signInOr(actor, 'forbidden');
  // Where a visitor may read some (published files), 401 for the others would tell that they exist.
  if (actor.kind === 'visitor') return isGranted(actor, action) ? 'hidden' : 'unauthenticated';
  const mayKnow = belongsTo(actor, subject.labId) || isGranted(actor, 'read-deposit', subject);
  return mayKnow ? 'forbidden' : 'hidden';
}

/** Whether the actor may do it; without a subject, whether anywhere. */
export function may(actor: Actor, action: Action, subject?: Subject): boolean {
  return decide(actor, action, subject) === 'allowed';
}

function signInOr(actor: Actor, refusal: Decision): Decision {
  return actor.kind === 'visitor' ? 'unauthenticated' : refusal;
}

function isGranted(actor: Actor, action: Action, subject?: Subject): boolean {
  if (actor.kind === 'system') return true;
  return HATS.some((hat) => {
    const grant = PERMISSIONS[action][hat];
    return grant !== null && wears(actor, hat, grant, subject) && holdsIn(grant, subject);
  });
}

function wears(actor: Exclude<Actor, System>, hat: Hat, { where, scope }: Grant, subject?: Subject): boolean {
  if (hat === 'reader') return true;
  if (hat === 'token')
    return actor.kind === 'token' && isOwn(actor, where, subject) && hasScope(actor, scope);
  if (actor.kind !== 'person') return false;
  if (hat === 'member' || hat === 'manager') {
    const inLabs = actor.memberships.filter(({ role }) => role === hat).map(({ labId }) => labId);
    return (
      inLabs.length > 0 && (where === 'anywhere' || subject === undefined || inLabs.includes(subject.labId))
    );
  }
  return (
    actor.role === hat && (where !== 'other-lab' || subject === undefined || !belongsTo(actor, subject.labId))
  );
}

function isOwn(actor: LabToken, where: Grant['where'], subject?: Subject): boolean {
  return where === 'anywhere' || subject === undefined || actor.labId === subject.labId;
}

function hasScope(actor: LabToken, scope: LabTokenScope | undefined): boolean {
  return scope === undefined || actor.scopes.includes(scope);
}

function holdsIn({ states }: Grant, subject?: Subject): boolean {
  if (states === undefined || subject === undefined) return true;
  const { state = 'draft' } = subject;
  return states === 'published' ? state === 'published' : state !== 'draft';
}

function belongsTo(actor: Actor, labId: string): boolean {
  if (actor.kind === 'token') return actor.labId === labId;
  return actor.kind === 'person' && actor.memberships.some((membership) => membership.labId === labId);
}
