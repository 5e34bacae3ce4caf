/** Loads one deposit with all that its page shows: document, what is wrong with it, revisions, decisions. */
import { readDatabase } from '@/db/client';
import { type DecisionRow, selectDecisions } from '@/db/queries/decisions';
import { type DepositHead, type Reader, selectDraft } from '@/db/queries/deposits';
import { type RevisionHead, selectNewestRevision, selectRevisions } from '@/db/queries/revisions';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import type { DocumentError } from '@/lib/documents/document-error';
import { failed, type Outcome } from '@/lib/errors';
import { auditSubject, reachDeposit } from './reach-deposit';
import { isEditable } from './states';
import { withUnlistedSystem } from './unlisted-system';

export interface LoadedDeposit {
  /** as the actor may see it: title, system and errors belong to the document below */
  deposit: DepositHead;
  /** the document as it was sent, valid or not */
  document: string;
  /** the revision that this is; null: what its laboratory is working on */
  shown: number | null;
  /** what stands in the way of submitting it */
  errors: DocumentError[];
  revisions: RevisionHead[];
  decisions: DecisionRow[];
}

/**
 * The deposit as the actor may see it: its laboratory sees the working document, everybody else the newest revision,
 * since what is being changed is not submitted yet.
 */
export function loadDeposit({ actor, id }: { actor: Actor; id: string }): Promise<Outcome<LoadedDeposit>> {
  return auditingRefusals({ actor, action: 'read-deposit', subject: auditSubject(id) }, async () => {
    const database = await readDatabase();
    const reached = await reachDeposit(database, actor, 'read-deposit', id);
    if (!reached.ok) return reached;
    const content = seesWorkingDocument(actor, reached.deposit)
      ? await workingContent(database, reached.deposit)
      : await newestContent(database, reached.deposit);
    if (content === null) return failed('not-found');
    const [revisions, decisions] = await Promise.all([
      selectRevisions(database, id),
      selectDecisions(database, id),
    ]);
    return { ok: true, ...content, revisions, decisions };
  });
}

/** Whether an actor who may read a deposit sees what its laboratory is changing at the moment. */
export function seesWorkingDocument(actor: Actor, { labId, state }: DepositHead): boolean {
  return isEditable(state) && may(actor, 'see-own-deposits', { labId });
}

type Content = Pick<LoadedDeposit, 'deposit' | 'document' | 'shown' | 'errors'>;

async function workingContent(reader: Reader, deposit: DepositHead): Promise<Content | null> {
  const draft = await selectDraft(reader, deposit.id);
  if (draft === undefined) return null;
  const errors = await withUnlistedSystem(reader, deposit, JSON.parse(draft.errors) as DocumentError[]);
  return { deposit, document: draft.document, shown: null, errors };
}

async function newestContent(reader: Reader, deposit: DepositHead): Promise<Content | null> {
  const revision = await selectNewestRevision(reader, deposit.id);
  if (revision === undefined) return null;
  const { document, title, system, number: shown } = revision;
  return { deposit: { ...deposit, title, system, errorCount: 0 }, document, shown, errors: [] };
}
