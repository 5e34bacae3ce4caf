import { describe, expect, it } from 'vitest';
import { VISITOR } from '@/lib/auth/actor';
import { ACTIONS, type Action, may, PERMISSIONS } from '@/lib/auth/permissions';

/** The rows of the contract that exist so far, written down a second time. */
const VISITOR_MAY: Record<Action, boolean> = {
  'check-document': true,
  'read-methods': true,
  'read-api-description': true,
  'read-health': true,
};

describe('permissions', () => {
  it.each(ACTIONS)('visitor: %s', (action) => {
    expect(may(VISITOR, action)).toBe(VISITOR_MAY[action]);
  });

  it('answer for every action and no other', () => {
    expect(Object.keys(PERMISSIONS).sort()).toEqual([...ACTIONS].sort());
  });

  it('do not compile with an action left out', () => {
    // @ts-expect-error: that this is an error is what is tested
    const incomplete: typeof PERMISSIONS = { 'check-document': { visitor: true } };
    expect(Object.keys(incomplete)).toHaveLength(1);
  });
});
