/** Loads the assessment of a deposit whole: of the draft as it stands, or of the newest revision. */
import { readDatabase } from '@/db/client';
import { selectDraft } from '@/db/queries/deposits';
import { selectNewestRevision } from '@/db/queries/revisions';
import type { Actor } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { assessForDeposit } from './assess-for-deposit';
import { seesWorkingDocument } from './load-deposit';
import { auditingRefusals, auditSubject, reachDeposit } from './reach-deposit';

export interface LoadedAssessment {
  /** JSON as the engine wrote it */
  assessment: string;
  /** what it is of: a revision's number, or null for the draft */
  revision: number | null;
  /** of the deposit */
  version: number;
  engine: string;
  policy: number;
}

/** The assessment; of a draft that is not valid: the failure with all that is wrong. */
export function loadAssessment(call: {
  actor: Actor;
  id: string;
  signal?: AbortSignal;
}): Promise<Outcome<LoadedAssessment>> {
  const { actor, id, signal = new AbortController().signal } = call;
  return auditingRefusals({ actor, action: 'read-deposit', subject: auditSubject(id) }, async () => {
    const database = await readDatabase();
    const reached = await reachDeposit(database, actor, 'read-deposit', id);
    if (!reached.ok) return reached;
    if (!seesWorkingDocument(actor, reached.deposit)) {
      const newest = await selectNewestRevision(database, id);
      if (newest === undefined) return failed('not-found');
      const { assessment, number: revision, engine, policy } = newest;
      return { ok: true, assessment, revision, version: reached.deposit.version, engine, policy };
    }
    const draft = await selectDraft(database, id);
    if (draft === undefined) return failed('not-found');
    const assessed = await assessForDeposit(draft.document, signal);
    return assessed.ok ? { ...assessed, revision: null, version: draft.version } : assessed;
  });
}
