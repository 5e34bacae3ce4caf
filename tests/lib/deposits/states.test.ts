import { describe, expect, it } from 'vitest';
import {
  awaitsDecision,
  canFollow,
  type DepositState,
  isEditable,
  nextStates,
  stateWords,
} from '@/lib/deposits/states';
import { DEPOSIT_STATES } from '@/schemas/deposit-states';

/** Every path that the states allow, written out from the description of the product. */
const PATHS: DepositState[][] = [
  ['draft', 'submitted', 'in-review', 'accepted', 'published', 'withdrawn'],
  ['submitted', 'changes-requested', 'submitted', 'accepted'],
  ['in-review', 'changes-requested'],
  ['submitted', 'draft'],
  ['submitted', 'declined'],
  ['in-review', 'declined'],
];

describe('the states of a deposit', () => {
  it('follow one another as described, and not otherwise', () => {
    const allowed = new Set(PATHS.flatMap((path) => path.slice(1).map((to, i) => `${path[i]} → ${to}`)));
    for (const from of DEPOSIT_STATES) {
      for (const to of DEPOSIT_STATES)
        expect([from, to, canFollow(from, to)]).toEqual([from, to, allowed.has(`${from} → ${to}`)]);
    }
  });

  it('end with a tombstone or a refusal', () => {
    expect(DEPOSIT_STATES.filter((state) => nextStates(state).length === 0)).toEqual([
      'declined',
      'withdrawn',
    ]);
  });

  it('are edited by the depositor and decided on by a curator, never both', () => {
    expect(DEPOSIT_STATES.filter(isEditable)).toEqual(['draft', 'changes-requested']);
    expect(DEPOSIT_STATES.filter(awaitsDecision)).toEqual(['submitted', 'in-review']);
  });

  it('have words without hyphens', () => {
    expect(DEPOSIT_STATES.map(stateWords).join(' ')).not.toContain('-');
  });
});
