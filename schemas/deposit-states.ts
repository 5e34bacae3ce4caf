/** The states of a deposit, in the order in which a good one passes them. */
export const DEPOSIT_STATES = [
  'draft',
  'submitted',
  'in-review',
  'changes-requested',
  'accepted',
  'published',
  'declined',
  'withdrawn',
] as const;

/** What a curator can decide. */
export const DECISION_KINDS = ['accepted', 'changes-requested', 'declined'] as const;
