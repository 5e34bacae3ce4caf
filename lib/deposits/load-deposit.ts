/** Loads one deposit with all that its page shows: document, what is wrong with it, revisions, decisions. */
import { readDatabase } from '@/db/client';
import { type DecisionRow, selectDecisions } from '@/db/queries/decisions';
import { type DepositHead, isListedSystem, type Reader, selectDraft } from '@/db/queries/deposits';
import { type RevisionHead, selectNewestRevision, selectRevisions } from '@/db/queries/revisions';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import type { DocumentError } from '@/lib/documents/document-error';
import { failed, type Outcome } from '@/lib/errors';
import { auditingRefusals, auditSubject, reachDeposit } from './reach-deposit';
import { isEditable } from './states';
import { unlistedSystem } from './unlisted-system';

export interface LoadedDeposit {
  deposit: DepositHead;
  /** the document as it was sent, valid or not */
  document: string;
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
    const { deposit } = reached;
    const content = seesWorkingDocument(actor, deposit)
      ? await workingContent(database, deposit)
      : await newestContent(database, id);
    if (content === null) return failed('not-found');
    const [revisions, decisions] = await Promise.all([
      selectRevisions(database, id),
      selectDecisions(database, id),
    ]);
    return { ok: true, deposit, ...content, revisions, decisions };
  });
}

/** Whether an actor who may read a deposit sees what its laboratory is changing at the moment. */
export function seesWorkingDocument(actor: Actor, { labId, state }: DepositHead): boolean {
  return isEditable(state) && may(actor, 'see-own-deposits', { labId });
}

type Content = Pick<LoadedDeposit, 'document' | 'errors'>;

async function workingContent(reader: Reader, { id, system }: DepositHead): Promise<Content | null> {
  const draft = await selectDraft(reader, id);
  if (draft === undefined) return null;
  const errors = JSON.parse(draft.errors) as DocumentError[];
  const isNamedRight =
    errors.some(({ pointer }) => pointer === '/system') || (await isListedSystem(reader, system));
  return { document: draft.document, errors: isNamedRight ? errors : [...errors, unlistedSystem(system)] };
}

async function newestContent(reader: Reader, id: string): Promise<Content | null> {
  const revision = await selectNewestRevision(reader, id);
  return revision === undefined ? null : { document: revision.document, errors: [] };
}
