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
import { checkUncertainties } from './check-uncertainties';
import { checkUnits } from './check-units';
import { checkWork } from './check-work';
import type { MeaningCheck, Report } from './document-report';

const CHECKS: MeaningCheck[] = [
  checkSize,
  checkWork,
  checkOrcids,
  checkIdentities,
  checkReferences,
  checkTemperatures,
  checkUnits,
  checkGaps,
  checkUncertainties,
  checkPoints,
  checkSharedStatements,
  checkCorrelations,
];

/**
 * What is wrong with the meaning of a document that fits the schema: ids, references, kinds of units,
 * ranges after conversion, correlations, shared quantities, check characters. All of it, never only the
 * first, told error by error.
 */
export function checkMeaning(document: DatasetDocument, report: Report): void {
  for (const check of CHECKS) check(document, report);
}
