/** A deposit as its pages are given it: what the API sends, with the document’s own text beside it. */
import type { Actor } from '@/lib/auth/actor';
import type { Assessment } from '@/lib/engine/assessment';
import type { Outcome } from '@/lib/errors';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { DepositAnswer } from '@/schemas/deposit';
import type { FileAnswer } from '@/schemas/file';
import { loadAssessment } from './load-assessment';
import { loadDeposit } from './load-deposit';
import { listFiles } from './open-file';
import { depositJson, fileAnswer } from './write-answer';

export interface LoadedRecord {
  labId: string;
  deposit: Omit<DepositAnswer, 'document'>;
  /** the document as it was sent */
  text: string;
  value: unknown;
  files: FileAnswer[];
}

/** The deposit with its files. */
export async function loadRecord(actor: Actor, id: string): Promise<Outcome<LoadedRecord>> {
  const loaded = await loadDeposit({ actor, id });
  if (!loaded.ok) return loaded;
  const listed = await listFiles({ actor, id });
  if (!listed.ok) return listed;
  const { document: value, ...deposit } = JSON.parse(depositJson(loaded)) as DepositAnswer;
  const { labId } = loaded.deposit;
  return { ok: true, labId, deposit, text: loaded.document, value, files: listed.files.map(fileAnswer) };
}

/** The document and the assessment of the newest revision, for a record that is none that is being changed. */
export async function loadRevision(
  actor: Actor,
  { deposit: { id }, value }: LoadedRecord,
): Promise<Outcome<{ document: DatasetDocument; assessment: Assessment }>> {
  const loaded = await loadAssessment({ actor, id });
  if (!loaded.ok) return loaded;
  // Both were checked and written by this application at submission and never change.
  return { ok: true, document: value as DatasetDocument, assessment: JSON.parse(loaded.assessment) };
}
