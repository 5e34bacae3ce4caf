/** Deposits and files in the form that the API sends. */
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
    links: {
      self,
      submission: `${self}/submission`,
      assessment: `${self}/assessment`,
      files: `${self}/files`,
      ...(accession === null ? {} : { dataset: `/api/v1/datasets/${accession}` }),
    },
  };
}

/** The whole deposit as JSON. The document is put in as it was sent: it is neither read nor written anew. */
export function depositJson({ deposit, document, errors, revisions, decisions }: LoadedDeposit): string {
  const around: Omit<DepositAnswer, 'document'> = {
    ...headAnswer(deposit),
    errors,
    revisions: revisions.map(revisionAnswer),
    decisions: decisions.map(decisionAnswer),
  };
  return `${JSON.stringify(around).slice(0, -1)},"document":${withoutMark(document)}}`;
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
