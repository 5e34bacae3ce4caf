/** Loads the assessment of a deposit whole: of the draft as it stands, or of the newest revision. */
import { readDatabase } from '@/db/client';
import { type DepositHead, type Reader, selectDraft } from '@/db/queries/deposits';
import { selectNewestRevision } from '@/db/queries/revisions';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { POLICY } from '@/lib/engine/flags';
import { ENGINE_VERSION } from '@/lib/engine/version';
import { failed, type Outcome } from '@/lib/errors';
import { assessForDeposit } from './assess-for-deposit';
import { seesWorkingDocument } from './load-deposit';
import { auditSubject, reachDeposit } from './reach-deposit';
import { withinLimits } from './within-limits';

export interface LoadedAssessment {
  /** changes whenever the assessment may */
  tag: string;
  /** JSON as the engine wrote it */
  assessment: string;
  /** what it is of: a revision's number, or null for the draft */
  revision: number | null;
  /** of the deposit */
  version: number;
  engine: string;
  policy: number;
}

/** The caller has the assessment of that tag already; it was not computed again. */
interface Unchanged {
  unchanged: string;
}

interface AssessmentCall {
  actor: Actor;
  id: string;
  signal?: AbortSignal;
  /** whether the caller has what bears that tag already */
  has?: (tag: string) => boolean;
}

/**
 * The assessment; of a draft that is not valid: the failure with all that is wrong. Of a draft it is computed anew,
 * within the limits of the actor.
 */
export function loadAssessment(
  call: AssessmentCall & { has?: undefined },
): Promise<Outcome<LoadedAssessment>>;
export function loadAssessment(call: AssessmentCall): Promise<Outcome<LoadedAssessment | Unchanged>>;
export function loadAssessment(call: AssessmentCall): Promise<Outcome<LoadedAssessment | Unchanged>> {
  const { actor, id } = call;
  return auditingRefusals({ actor, action: 'read-deposit', subject: auditSubject(id) }, async () => {
    const database = await readDatabase();
    const reached = await reachDeposit(database, actor, 'read-deposit', id);
    if (!reached.ok) return reached;
    const { deposit } = reached;
    return seesWorkingDocument(actor, deposit)
      ? ofDraft(database, call, deposit)
      : ofNewest(database, call, deposit);
  });
}

async function ofNewest(
  database: Reader,
  { id, has }: AssessmentCall,
  { version }: DepositHead,
): Promise<Outcome<LoadedAssessment | Unchanged>> {
  const newest = await selectNewestRevision(database, id);
  if (newest === undefined) return failed('not-found');
  const { assessment, number: revision, engine, policy } = newest;
  const tag = `revision-${revision}-${engine}-${policy}`;
  return has?.(tag)
    ? { ok: true, unchanged: tag }
    : { ok: true, assessment, tag, revision, version, engine, policy };
}

async function ofDraft(
  database: Reader,
  { actor, id, has, signal = new AbortController().signal }: AssessmentCall,
  { version }: DepositHead,
): Promise<Outcome<LoadedAssessment | Unchanged>> {
  const tagOf = (of: number) => `draft-${of}-${ENGINE_VERSION}-${POLICY.number}`;
  if (has?.(tagOf(version))) return { ok: true, unchanged: tagOf(version) };
  return withinLimits(actor, async (pointsBudget) => {
    const draft = await selectDraft(database, id);
    if (draft === undefined) return failed('not-found');
    const assessed = await assessForDeposit(draft.document, signal, pointsBudget);
    if (!assessed.ok) return assessed;
    return { ...assessed, tag: tagOf(draft.version), revision: null, version: draft.version };
  });
}
