import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { checkCorrelations } from './check-correlations';
import { checkGaps } from './check-gaps';
import { checkIdentities } from './check-identities';
import { checkOrcids } from './check-orcid';
import { checkPoints } from './check-points';
import { checkReferences } from './check-references';
import { checkSharedStatements } from './check-shared-statements';
import { checkSize } from './check-size';
import { checkTemperatures } from './check-temperatures';
import { checkUnits } from './check-units';
import type { DocumentError } from './document-error';
import type { MeaningCheck, Report } from './document-report';
import { listErrors } from './error-list';

const CHECKS: MeaningCheck[] = [
  checkSize,
  checkOrcids,
  checkIdentities,
  checkReferences,
  checkTemperatures,
  checkUnits,
  checkGaps,
  checkPoints,
  checkSharedStatements,
  checkCorrelations,
];

/**
 * What is wrong with the meaning of a document that fits the schema: ids, references, kinds of units,
 * ranges after conversion, correlations, shared quantities, check characters. All of it, never only the
 * first; the list is cut where it grows long, and then its last entry says how many more there are.
 */
export function checkMeaning(document: DatasetDocument): DocumentError[] {
  const errors = listErrors();
  judgeMeaning(document, (pointer, detail) => errors.add(pointer, () => detail));
  return errors.toArray();
}

/** As `checkMeaning`, told error by error. */
export function judgeMeaning(document: DatasetDocument, report: Report): void {
  for (const check of CHECKS) check(document, report);
}
