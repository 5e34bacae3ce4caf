/** The verb that makes a draft from a document, valid or not. */
import { readDatabase, write } from '@/db/client';
import { type DepositHead, insertDeposit, selectDeposit } from '@/db/queries/deposits';
import { selectLaboratoryBySlug } from '@/db/queries/laboratories';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { newId } from '@/lib/auth/hash-token';
import { refusalOf } from '@/lib/auth/refusal';
import type { DocumentError } from '@/lib/documents/document-error';
import { failed, type Outcome } from '@/lib/errors';
import { earlierOutcome, idempotencyOf, once } from '@/lib/serving/idempotency';
import type { BodyResult } from '@/lib/serving/read-body';
import { judgeDraft } from './judge-draft';
import { auditSubject } from './reach-deposit';
import { withUnlistedSystem } from './unlisted-system';

export interface NewDeposit {
  actor: Actor;
  /** slug of the laboratory that deposits; null: the actor's only one */
  lab: string | null;
  /** reads the document, once it is known that the actor may deposit */
  readBody: () => Promise<BodyResult>;
  idempotencyKey?: string | null;
  signal?: AbortSignal;
}

export type SavedDeposit = Outcome<{ deposit: DepositHead; errors: DocumentError[] }>;

/** Makes a draft of the laboratory. */
export function createDeposit(call: NewDeposit): Promise<SavedDeposit> {
  const { actor } = call;
  const subject = `laboratory:${call.lab ?? ''}`;
  return auditingRefusals({ actor, action: 'create-deposit', subject }, async () => {
    const lab = await chooseLaboratory(actor, call.lab);
    if (!lab.ok) return lab;
    return refusalOf(actor, 'create-deposit', { labId: lab.labId }) ?? (await createIn(lab.labId, call));
  });
}

async function createIn(
  labId: string,
  { actor, readBody, idempotencyKey = null, signal = new AbortController().signal }: NewDeposit,
): Promise<SavedDeposit> {
  const body = await readBody();
  if (!body.ok) return body;
  const idempotency = idempotencyOf(actor, 'create-deposit', idempotencyKey, labId, body.bytes);
  const earlier = await earlierOutcome<Extract<SavedDeposit, { ok: true }>>(
    await readDatabase(),
    idempotency,
  );
  if (earlier !== null) return earlier;
  const judged = await judgeDraft(body.bytes, signal);
  if (!judged.ok) return judged;
  const { text, title, system, errors } = judged;
  return write('acknowledged', (tx) =>
    once(tx, idempotency, async () => {
      const id = newId();
      const now = Date.now();
      await insertDeposit(tx, {
        id,
        labId,
        state: 'draft',
        document: text,
        version: 1,
        title,
        system,
        errors: JSON.stringify(errors),
        errorCount: errors.length,
        createdBy: actorKey(actor),
        createdAt: now,
        updatedAt: now,
        updatedBy: actorKey(actor),
      });
      await recordAudit(tx, { actor, action: 'created', subject: auditSubject(id), detail: 'draft' });
      const deposit = await selectDeposit(tx, id);
      if (deposit === undefined) throw new Error('A deposit that was just made is not there.');
      return { ok: true, deposit, errors: await withUnlistedSystem(tx, deposit, errors) };
    }),
  );
}

async function chooseLaboratory(actor: Actor, slug: string | null): Promise<Outcome<{ labId: string }>> {
  if (slug === null) return onlyLaboratory(actor);
  const lab = await selectLaboratoryBySlug(slug);
  // Laboratories are public, but this one is not there to deposit for.
  return lab === undefined
    ? (refusalOf(actor, 'create-deposit') ?? failed('forbidden', `There is no laboratory ${slug} of yours.`))
    : { ok: true, labId: lab.id };
}

function onlyLaboratory(actor: Actor): Outcome<{ labId: string }> {
  if (actor.kind === 'token') return { ok: true, labId: actor.labId };
  const [first, ...others] = actor.kind === 'person' ? actor.memberships : [];
  if (first === undefined) return refusalOf(actor, 'create-deposit') ?? failed('forbidden');
  if (others.length === 0) return { ok: true, labId: first.labId };
  const slugs = [first, ...others].map(({ labSlug }) => labSlug).join(', ');
  return failed('choose-laboratory', `Name the laboratory that deposits as ?lab=; yours are ${slugs}.`);
}
