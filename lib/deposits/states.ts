/** Which state of a deposit may follow which. Pure: pages ask as well. */
import type { DEPOSIT_STATES } from '@/schemas/deposit-states';

export type DepositState = (typeof DEPOSIT_STATES)[number];

/** A recalled submission goes back to what it was before: a draft, or changes requested. */
const NEXT: Record<DepositState, readonly DepositState[]> = {
  draft: ['submitted'],
  submitted: ['in-review', 'changes-requested', 'accepted', 'declined', 'draft'],
  'in-review': ['changes-requested', 'accepted', 'declined'],
  'changes-requested': ['submitted'],
  accepted: ['published'],
  published: ['withdrawn'],
  declined: [],
  withdrawn: [],
};

/** States in which the depositor may change the document. */
export const EDITABLE: readonly DepositState[] = ['draft', 'changes-requested'];

/** States in which a curator may decide. */
export const AWAITING_DECISION: readonly DepositState[] = ['submitted', 'in-review'];

const WORDS: Record<DepositState, string> = {
  draft: 'draft',
  submitted: 'submitted',
  'in-review': 'in review',
  'changes-requested': 'changes requested',
  accepted: 'accepted',
  published: 'published',
  declined: 'declined',
  withdrawn: 'withdrawn',
};

/** The states that may follow a state. */
export function nextStates(from: DepositState): readonly DepositState[] {
  return NEXT[from];
}

/** Whether a state may follow another. */
export function canFollow(from: DepositState, to: DepositState): boolean {
  return NEXT[from].includes(to);
}

/** Whether the depositor may change the document in a state. */
export function isEditable(state: DepositState): boolean {
  return EDITABLE.includes(state);
}

/** Whether a curator may decide in a state. */
export function awaitsDecision(state: DepositState): boolean {
  return AWAITING_DECISION.includes(state);
}

/** The state in words, as pages write it. */
export function stateWords(state: DepositState): string {
  return WORDS[state];
}
