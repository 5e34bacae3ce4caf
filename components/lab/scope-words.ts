import type { LabTokenScope } from '@/lib/auth/actor';

/** What a token of that scope may do, in words. */
export const SCOPE_WORDS: Record<LabTokenScope, string> = {
  'read-drafts': 'read deposits',
  'write-drafts': 'write drafts and attach files',
  submit: 'submit and recall',
};

/** Lives from which a new token can choose. */
export const TOKEN_LIVES = [
  { value: '30', label: '30 days' },
  { value: '90', label: '90 days' },
  { value: '180', label: '180 days' },
  { value: '365', label: 'a year' },
] as const;
