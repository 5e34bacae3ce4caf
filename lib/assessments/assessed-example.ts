import { EXAMPLES } from '@/lib/documents/examples/examples';
import { assess } from '@/lib/engine/assess';
import type { Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

let assessed: { document: DatasetDocument; assessment: Assessment } | null = null;

/** The invented example that collapses, assessed by this engine; computed once, a few milliseconds. */
export function assessedExample(): { document: DatasetDocument; assessment: Assessment } {
  const [{ document }] = EXAMPLES;
  assessed ??= { document, assessment: assess(document) };
  return assessed;
}
