import { describe, expect, it } from 'vitest';
import {
  type Actor,
  LAB_TOKEN_SCOPES,
  type LabTokenScope,
  type Person,
  SYSTEM,
  VISITOR,
} from '@/lib/auth/actor';
import { ACTIONS, type Action, type Decision, decide, HATS, may, PERMISSIONS } from '@/lib/auth/permissions';
import type { DepositState } from '@/lib/deposits/states';
import { DEPOSIT_STATES } from '@/schemas/deposit-states';

/**
 * The contract's table a second time, in words. A cell holds what each hat gets: `all`, `own` (its laboratory only),
 * `other` (any but its own), or nothing. After the colon: which states of a deposit (`open`: from submitted on), and
 * for a token the scope that it needs.
 */
const TABLE: Record<Action, Record<string, string>> = {
  'check-document': everyone(),
  'refit-document': everyone(),
  'read-methods': everyone(),
  'read-api-description': everyone(),
  'read-health': everyone(),
  'read-published': everyone(),
  'read-deposit': {
    token: 'own',
    member: 'own',
    manager: 'own',
    curator: 'all:open',
    administrator: 'all:open',
  },
  'create-deposit': lab(),
  'edit-deposit': lab(),
  'submit-deposit': lab(),
  'recall-deposit': lab(),
  'delete-draft': lab(),
  'attach-file': lab(),
  'read-file': {
    reader: 'all:published',
    token: 'own',
    member: 'own',
    manager: 'own',
    curator: 'all:open',
    administrator: 'all:open',
  },
  'see-own-deposits': lab(),
  'see-queue': { curator: 'other' },
  'decide-deposit': { curator: 'other:open' },
  'see-lab': { member: 'own', manager: 'own', administrator: 'all' },
  'manage-tokens': { manager: 'own', administrator: 'all' },
  'read-audit': { administrator: 'all' },
};

const SCOPE_FOR: Partial<Record<Action, LabTokenScope>> = {
  'read-deposit': 'read-drafts',
  'read-file': 'read-drafts',
  'see-own-deposits': 'read-drafts',
  'create-deposit': 'write-drafts',
  'edit-deposit': 'write-drafts',
  'delete-draft': 'write-drafts',
  'attach-file': 'write-drafts',
  'submit-deposit': 'submit',
  'recall-deposit': 'submit',
};

function everyone() {
  return Object.fromEntries(HATS.map((hat) => [hat, 'all']));
}
function lab() {
  return { token: 'own', member: 'own', manager: 'own' };
}

const OWN = 'lab-own';
const OTHER = 'lab-other';

function person(role: Person['role'], inOwnLab?: 'member' | 'manager'): Person {
  const memberships = inOwnLab ? [{ labId: OWN, labSlug: 'own', labName: 'Own', role: inOwnLab }] : [];
  return { kind: 'person', id: 'p', name: 'P. Example', email: 'p@demo.example', role, memberships };
}

const token = (...scopes: LabTokenScope[]): Actor => ({ kind: 'token', id: 't', labId: OWN, scopes });

/** Every way to wear hats that the product knows, with the hats by their relation to the laboratory `OWN`. */
const ACTORS: [string, Actor, string[]][] = [
  ['a reader', VISITOR, ['reader']],
  ['a person without a laboratory', person('depositor'), ['reader']],
  ['a member', person('depositor', 'member'), ['reader', 'member']],
  ['a manager', person('depositor', 'manager'), ['reader', 'manager']],
  ['a curator', person('curator'), ['reader', 'curator']],
  ['a curator who is a member', person('curator', 'member'), ['reader', 'curator', 'member']],
  ['an administrator', person('administrator'), ['reader', 'administrator']],
  [
    'an administrator who manages',
    person('administrator', 'manager'),
    ['reader', 'administrator', 'manager'],
  ],
  ['a token with every scope', token(...LAB_TOKEN_SCOPES), ['reader', 'token']],
  ...LAB_TOKEN_SCOPES.map((scope): [string, Actor, string[]] => [
    `a token to ${scope}`,
    token(scope),
    ['reader', 'token'],
  ]),
  ['a token without a scope', token(), ['reader', 'token']],
];

const STATES: (DepositState | undefined)[] = [undefined, ...DEPOSIT_STATES];

function expectedToBeAllowed(action: Action, actor: Actor, hats: string[], labId: string, state = 'draft') {
  const inLab =
    actor.kind === 'token'
      ? labId === OWN
      : actor.kind === 'person' && actor.memberships.some((one) => one.labId === labId);
  return hats.some((hat) => {
    const [where, states] = (TABLE[action][hat] ?? '').split(':');
    const scope = hat === 'token' ? SCOPE_FOR[action] : undefined;
    if (scope && actor.kind === 'token' && !actor.scopes.includes(scope)) return false;
    if (states === 'open' && state === 'draft') return false;
    if (states === 'published' && state !== 'published') return false;
    return where === 'all' || (where === 'own' && inLab) || (where === 'other' && !inLab);
  });
}

describe('every action of every actor, in every laboratory and state', () => {
  it.each(ACTORS)('%s', (_, actor, hats) => {
    for (const action of ACTIONS) {
      for (const labId of [OWN, OTHER]) {
        for (const state of STATES) {
          const allowed = expectedToBeAllowed(action, actor, hats, labId, state);
          const name = `${action} in ${labId}, ${state ?? 'no state'}`;
          expect(may(actor, action, { labId, state }), name).toBe(allowed);
        }
      }
    }
  });

  it('is what is walked: no action, hat or state is left out', () => {
    expect(Object.keys(PERMISSIONS).sort()).toEqual([...ACTIONS].sort());
    expect(Object.keys(TABLE).sort()).toEqual([...ACTIONS].sort());
    for (const row of Object.values(PERMISSIONS)) expect(Object.keys(row).sort()).toEqual([...HATS].sort());
    expect(DEPOSIT_STATES.length).toBe(8);
  });
});

describe('a refusal', () => {
  const member = person('depositor', 'member');
  it.each<[string, Actor, Action, { labId: string; state?: DepositState } | undefined, Decision]>([
    ['a visitor and any deposit', VISITOR, 'read-deposit', { labId: OWN, state: 'draft' }, 'unauthenticated'],
    ['a visitor before anything is loaded', VISITOR, 'read-deposit', undefined, 'unauthenticated'],
    [
      'a visitor and a file that is not published',
      VISITOR,
      'read-file',
      { labId: OWN, state: 'draft' },
      'hidden',
    ],
    [
      'a member and a deposit of others',
      member,
      'edit-deposit',
      { labId: OTHER, state: 'published' },
      'hidden',
    ],
    ['a member and tokens of others', member, 'manage-tokens', { labId: OTHER }, 'forbidden'],
    ['a member and the queue', member, 'see-queue', undefined, 'forbidden'],
    [
      'a curator and a draft',
      person('curator'),
      'decide-deposit',
      { labId: OTHER, state: 'draft' },
      'hidden',
    ],
    [
      'a curator and their own',
      person('curator', 'member'),
      'decide-deposit',
      { labId: OWN, state: 'submitted' },
      'forbidden',
    ],
    [
      'a curator who would edit',
      person('curator'),
      'edit-deposit',
      { labId: OTHER, state: 'submitted' },
      'forbidden',
    ],
    [
      'a token without the scope, at home',
      token('submit'),
      'edit-deposit',
      { labId: OWN, state: 'draft' },
      'forbidden',
    ],
    ['a token elsewhere', token('write-drafts'), 'edit-deposit', { labId: OTHER, state: 'draft' }, 'hidden'],
  ])('%s', (_, actor, action, subject, decision) => {
    expect(decide(actor, action, subject)).toBe(decision);
  });

  it('never meets the application itself', () => {
    for (const action of ACTIONS) expect(decide(SYSTEM, action, { labId: OTHER })).toBe('allowed');
  });
});

describe('a role in one laboratory', () => {
  it('is none in another', () => {
    const both = person('depositor', 'manager');
    both.memberships.push({ labId: OTHER, labSlug: 'other', labName: 'Other', role: 'member' });
    expect(may(both, 'manage-tokens', { labId: OWN })).toBe(true);
    expect(may(both, 'manage-tokens', { labId: OTHER })).toBe(false);
    expect(may(both, 'edit-deposit', { labId: OTHER, state: 'draft' })).toBe(true);
  });
});

describe('the table', () => {
  it('does not compile with an action left out', () => {
    // @ts-expect-error: that this is an error is what is tested
    const incomplete: typeof PERMISSIONS = { 'check-document': PERMISSIONS['check-document'] };
    expect(Object.keys(incomplete)).toHaveLength(1);
  });
});
