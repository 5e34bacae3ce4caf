/** The published revision that an accession stands for: what every answer about one dataset begins with. */
import { type DatasetHead, selectDataset, selectPublishedRevision } from '@/db/queries/datasets';
import type { Actor } from '@/lib/auth/actor';
import { decide } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import { withoutMark } from '@/lib/deposits/judge-draft';
import type { Assessment } from '@/lib/engine/assessment';
import { type Failed, failed } from '@/lib/errors';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { Tombstone } from '@/schemas/dataset-answers';
import { formatAccession, parseAccession } from './accession';

export interface PublishedRevision {
  head: DatasetHead;
  /** number of this revision */
  revision: number;
  /** with the revision, `CK-000123.2` */
  accession: string;
  /** byte for byte as it was sent */
  text: string;
  document: DatasetDocument;
  /** as the engine wrote it at submission; it never changes afterwards */
  assessment: Assessment;
  submittedAt: number;
  publishedAt: number;
}

export type RevisionOutcome =
  | { ok: true; published: PublishedRevision }
  | (Failed & { tombstone?: Tombstone });

/**
 * The newest published revision for `CK-000123`, that one for `CK-000123.2`. `not-found` where there is none,
 * `withdrawn` with the tombstone where the dataset was withdrawn.
 */
export async function loadRevision(actor: Actor, accessionText: string): Promise<RevisionOutcome> {
  const accession = parseAccession(accessionText);
  const decision = decide(actor, 'read-published');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  if (accession === null) return failed('not-found', 'An accession is like CK-000123 or CK-000123.2.');
  const head = await selectDataset(accession.accession);
  if (!head) return failed('not-found');
  if (head.state === 'withdrawn') return { ...failed('withdrawn'), tombstone: tombstoneOf(head) };
  const row = await selectPublishedRevision(head.depositId, accession.revision ?? head.revision);
  if (!row) return failed('not-found', `${formatAccession(head.accession)} has no such published revision.`);
  return {
    ok: true,
    published: {
      head,
      revision: row.number,
      accession: formatAccession(head.accession, row.number),
      text: row.document,
      document: JSON.parse(withoutMark(row.document)),
      assessment: JSON.parse(row.assessment),
      submittedAt: row.submittedAt,
      publishedAt: row.publishedAt ?? row.submittedAt,
    },
  };
}

function tombstoneOf(head: DatasetHead): Tombstone {
  return {
    accession: formatAccession(head.accession),
    title: head.title,
    lab: { slug: head.labSlug, name: head.labName },
    system: { slug: head.system, name: head.systemName },
    publishedAt: new Date(head.publishedAt).toISOString(),
    withdrawnAt: new Date(head.withdrawnAt ?? head.stateChangedAt).toISOString(),
    reason: head.withdrawalReason,
  };
}
