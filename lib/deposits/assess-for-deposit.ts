/** The assessment of a deposited document, computed in a worker thread. */
import { computeInPool } from '@/lib/assessments/assessment-pool';
import { MOST_POINTS } from '@/lib/documents/size-limits';
import type { Assessment } from '@/lib/engine/assessment';
import { failed, type Outcome } from '@/lib/errors';
import { problemIn } from './judge-draft';

/** What is kept of an assessment: the JSON as the worker wrote it, and what is looked for in it. */
export interface AssessedDocument {
  assessment: string;
  summary: string;
  engine: string;
  policy: number;
}

/**
 * Assesses a document. Where it is not valid: the failure with all that is wrong.
 *
 * @param pointsBudget how many points it may have; as many as a valid document can have where left out
 */
export async function assessForDeposit(
  document: string,
  signal: AbortSignal,
  pointsBudget = MOST_POINTS,
): Promise<Outcome<AssessedDocument>> {
  const answer = await computeInPool(new TextEncoder().encode(document), pointsBudget, signal);
  switch (answer.kind) {
    case 'assessed':
      return kept(new TextDecoder().decode(answer.body));
    case 'refused': {
      const { detail, errors } = problemIn(answer.body);
      return failed('invalid-document', detail, { errors });
    }
    case 'over-budget': {
      const detail = `The document has ${answer.points} points; ${pointsBudget} are left for this minute.`;
      return failed('too-many-points', detail);
    }
    case 'aborted':
      return failed('incomplete-body');
    case 'busy':
    case 'took-too-long':
      return failed(answer.kind);
  }
}

function kept(assessment: string): Outcome<AssessedDocument> {
  const { engine, policy, summary } = JSON.parse(assessment) as Assessment;
  return { ok: true, assessment, summary: JSON.stringify(summary), engine, policy };
}
