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
