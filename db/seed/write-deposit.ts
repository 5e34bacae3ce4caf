/** Writes one deposit of the scenario: the draft, its revisions with their assessments, decisions, publication. */
import { createHash } from 'node:crypto';
import { eq } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { insertDecision } from '@/db/queries/decisions';
import { insertDeposit } from '@/db/queries/deposits';
import { insertRevision } from '@/db/queries/revisions';
import { datasets } from '@/db/tables/datasets';
import { type decisions, deposits } from '@/db/tables/deposits';
import { newId } from '@/lib/auth/hash-token';
import { encodeDataset } from '@/lib/datasets/encode-dataset';
import { publishDataset } from '@/lib/datasets/publish-dataset';
import type { DepositState } from '@/lib/deposits/states';
import { checkDocument } from '@/lib/documents/check-document';
import { assess } from '@/lib/engine/assess';
import type { Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { MadeDeposit } from './make-deposits';
import type { Day, LabSlug } from './recipe';
import type { MadeRevision } from './revise';

/** In whose name things are done, as the audit trail writes it. */
export interface Authors {
  /** ids by slug */
  labs: Record<LabSlug, string>;
  depositor: (lab: LabSlug) => string;
  curator: string;
}

const HOUR_MS = 3_600_000;
/** From submission to publication. */
const REVIEW_MS = 9 * 24 * HOUR_MS;
/** From now to the publication of what is accepted. */
const EMBARGO_MS = 90 * 24 * HOUR_MS;

/** Ten o’clock in the morning of a day, UTC, as Unix time in ms. */
export function timeOf(day: Day): number {
  return Date.parse(`${day}T10:00:00Z`);
}

/** Writes a published dataset with all its revisions, each published on its day. */
export async function publishAs(
  tx: Transaction,
  authors: Authors,
  { lab, accession, revisions }: { lab: LabSlug; accession: number; revisions: MadeRevision[] },
): Promise<void> {
  const newest = revisions[revisions.length - 1];
  const first = timeOf(revisions[0].published);
  const depositId = await writeDeposit(tx, authors, {
    ...{ lab, document: newest.document, state: 'published', accession },
    ...{
      createdAt: first - REVIEW_MS - HOUR_MS,
      updatedAt: timeOf(newest.published),
      updatedBy: authors.curator,
    },
  });
  for (const [i, { document, published }] of revisions.entries()) {
    const publishedAt = timeOf(published);
    const revision = { number: i + 1, document, submittedAt: publishedAt - REVIEW_MS, publishedAt };
    const assessment = await writeRevision(tx, depositId, authors.depositor(lab), revision);
    const decision = { depositId, revision: i + 1, kind: 'accepted', letter: '' } as const;
    await insertDecision(tx, { ...decision, decidedBy: authors.curator, decidedAt: publishedAt });
    const encoded = encodeDataset(document, assessment);
    await publishDataset(tx, {
      ...{ accession, depositId, labId: authors.labs[lab], revision: i + 1, publishedAt, encoded },
    });
  }
}

/** Writes a deposit that is on its way, was declined, or was withdrawn under an accession. */
export async function depositAs(
  tx: Transaction,
  authors: Authors,
  made: MadeDeposit,
  withdrawnAccession: number,
): Promise<void> {
  const { lab, state, document, letter, day } = made;
  const updatedAt = timeOf(day);
  if (state === 'withdrawn') {
    const revisions = [{ document, published: '2026-01-15' as const }];
    await publishAs(tx, authors, { lab, accession: withdrawnAccession, revisions });
    await withdraw(tx, authors, withdrawnAccession, { at: updatedAt, reason: letter ?? '' });
    return;
  }
  const kind = DECIDED[state];
  const depositId = await writeDeposit(tx, authors, {
    ...{ lab, document, state, createdAt: updatedAt - HOUR_MS, updatedAt },
    updatedBy: kind === undefined ? authors.depositor(lab) : authors.curator,
    ...(state === 'accepted' ? publicationFrom(Date.now()) : {}),
  });
  if (state === 'draft') return;
  const revision = { number: 1, document, submittedAt: updatedAt, publishedAt: null };
  await writeRevision(tx, depositId, authors.depositor(lab), revision);
  if (kind === undefined || letter === undefined) return;
  const decision = { depositId, revision: 1, kind, letter };
  await insertDecision(tx, { ...decision, decidedBy: authors.curator, decidedAt: updatedAt });
}

/** The decision after which a deposit is in a state. */
const DECIDED: Partial<Record<DepositState, (typeof decisions.$inferInsert)['kind']>> = {
  'changes-requested': 'changes-requested',
  accepted: 'accepted',
  declined: 'declined',
};

/** A day that is still to come, however long after its making the demonstration is loaded. */
function publicationFrom(now: number) {
  const publishOn = new Date(now + EMBARGO_MS).toISOString().slice(0, 10);
  return { publishOn, publishZone: 'Europe/Oslo' };
}

interface NewDeposit {
  lab: LabSlug;
  document: DatasetDocument;
  state: (typeof deposits.$inferInsert)['state'];
  accession?: number;
  createdAt: number;
  updatedAt: number;
  updatedBy: string;
  publishOn?: string;
  publishZone?: string;
}

async function writeDeposit(tx: Transaction, authors: Authors, made: NewDeposit): Promise<string> {
  const { lab, document, ...rest } = made;
  const checked = checkDocument(document);
  const id = newId();
  await insertDeposit(tx, {
    ...{ id, labId: authors.labs[lab], ...rest, version: 1 },
    document: textOf(document),
    ...{ title: document.title, system: document.system },
    errors: JSON.stringify(checked.ok ? [] : checked.errors),
    errorCount: checked.ok ? 0 : checked.errors.length,
    createdBy: authors.depositor(lab),
  });
  return id;
}

interface NewRevision {
  number: number;
  document: DatasetDocument;
  submittedAt: number;
  publishedAt: number | null;
}

async function writeRevision(
  tx: Transaction,
  depositId: string,
  submittedBy: string,
  { document, ...rest }: NewRevision,
): Promise<Assessment> {
  const text = textOf(document);
  const assessment = assess(document);
  await insertRevision(tx, {
    ...{ depositId, ...rest, submittedBy, document: text },
    ...{ title: document.title, system: document.system },
    sha256: createHash('sha256').update(text).digest('hex'),
    assessment: JSON.stringify(assessment),
    summary: JSON.stringify(assessment.summary),
    ...{ engine: assessment.engine, policy: assessment.policy },
  });
  return assessment;
}

function textOf(document: DatasetDocument): string {
  return `${JSON.stringify(document, null, 2)}\n`;
}

async function withdraw(
  tx: Transaction,
  { curator }: Authors,
  accession: number,
  { at, reason }: { at: number; reason: string },
): Promise<void> {
  await tx
    .update(deposits)
    .set({ state: 'withdrawn', updatedAt: at, updatedBy: curator })
    .where(eq(deposits.accession, accession));
  await tx
    .update(datasets)
    .set({ withdrawnAt: at, withdrawalReason: reason, updatedAt: at })
    .where(eq(datasets.accession, accession));
}
