import type { Contributor } from '@/schemas/dataset-1.generated';

/** The fourteen roles of CRediT (ANSI/NISO Z39.104). */
export const CREDIT_ROLES: readonly Contributor['roles'][number][] = [
  'Conceptualization',
  'Data curation',
  'Formal analysis',
  'Funding acquisition',
  'Investigation',
  'Methodology',
  'Project administration',
  'Resources',
  'Software',
  'Supervision',
  'Validation',
  'Visualization',
  'Writing – original draft',
  'Writing – review & editing',
];
