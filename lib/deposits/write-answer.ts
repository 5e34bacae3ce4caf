/** Deposits and files in the form that the API sends. */
import { createHash } from 'node:crypto';
import type { DecisionRow } from '@/db/queries/decisions';
import type { DepositHead } from '@/db/queries/deposits';
import type { FileRow } from '@/db/queries/files';
import type { RevisionHead } from '@/db/queries/revisions';
import { formatAccession } from '@/lib/datasets/accession';
import type { DepositAnswer, DepositHeadAnswer } from '@/schemas/deposit';
import type { FileAnswer } from '@/schemas/file';
import { withoutMark } from './judge-draft';
import type { LoadedDeposit } from './load-deposit';

/** Address of a deposit. */
export function depositPath(id: string): string {
  return `/api/v1/deposits/${id}`;
}

/** A deposit without its document. */
export function headAnswer(deposit: DepositHead): DepositHeadAnswer {
  const { id, state, version, title, system, labSlug, labName, errorCount } = deposit;
  const self = depositPath(id);
  const accession = deposit.accession === null ? null : formatAccession(deposit.accession);
  return {
    id,
    state,
    version,
    title,
    system,
    laboratory: { slug: labSlug, name: labName },
    accession,
    errorCount,
    createdAt: instant(deposit.createdAt),
    updatedAt: instant(deposit.updatedAt),
    updatedBy: deposit.savedBy,
    publication: publicationOf(deposit),
    links: {
      self,
      submission: `${self}/submission`,
      assessment: `${self}/assessment`,
      files: `${self}/files`,
      ...(accession === null ? {} : { dataset: `/api/v1/datasets/${accession}` }),
    },
  };
}

/** The day for which an accepted deposit waits; null where there is none. */
export function publicationOf({
  publishOn,
  publishZone,
}: Pick<DepositHead, 'publishOn' | 'publishZone'>): DepositHeadAnswer['publication'] {
  return publishOn === null ? null : { day: publishOn, timeZone: publishZone ?? 'UTC' };
}

/** The whole deposit as JSON. The document is put in as it was sent: it is neither read nor written anew. */
export function depositJson(loaded: LoadedDeposit): string {
  return `${aroundJson(loaded).slice(0, -1)},"document":${withoutMark(loaded.document)}}`;
}

/**
 * The strong ETag of a whole deposit: the version first, which is what If-Match reads; then whose view it is, the
 * laboratory's or that of a revision; then all that stands around the document, names and listings with it.
 */
export function depositEtag(loaded: LoadedDeposit): string {
  const { deposit, shown } = loaded;
  const view = shown === null ? 'w' : `r${shown}`;
  const around = createHash('sha256').update(aroundJson(loaded)).digest('base64url').slice(0, 16);
  return `"${deposit.version}-${view}-${around}"`;
}

/** All but the document. */
function aroundJson({ deposit, errors, revisions, decisions }: LoadedDeposit): string {
  const around: Omit<DepositAnswer, 'document'> = {
    ...headAnswer(deposit),
    errors,
    revisions: revisions.map(revisionAnswer),
    decisions: decisions.map(decisionAnswer),
  };
  return JSON.stringify(around);
}

/** A file without its bytes. */
export function fileAnswer({
  id,
  depositId,
  name,
  size,
  sha256,
  mediaType,
  uploadedAt,
}: FileRow): FileAnswer {
  const links = { self: `${depositPath(depositId)}/files/${id}` };
  return { id, name, size, sha256, mediaType, uploadedAt: instant(uploadedAt), links };
}

function revisionAnswer(revision: RevisionHead): DepositAnswer['revisions'][number] {
  const { number, sha256, engine, policy, submittedAt, publishedAt } = revision;
  const published = publishedAt === null ? null : instant(publishedAt);
  return { number, sha256, engine, policy, submittedAt: instant(submittedAt), publishedAt: published };
}

/** Who decided is nobody's business outside. */
function decisionAnswer({
  revision,
  kind,
  letter,
  decidedAt,
}: DecisionRow): DepositAnswer['decisions'][number] {
  return { revision, kind, letter, decidedAt: instant(decidedAt) };
}

function instant(ms: number): string {
  return new Date(ms).toISOString();
}
