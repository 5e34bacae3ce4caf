/** Accessions: `CK-` and six digits (more once a million datasets are reached), and `.2` behind it for a revision. */

const ACCESSION = /^CK-(\d{6}|[1-9]\d{6,8})(?:\.([1-9]\d{0,5}))?$/;

export interface Accession {
  /** 123 of CK-000123 */
  accession: number;
  /** 2 of CK-000123.2; null where the newest published revision is meant */
  revision: number | null;
}

/**
 * The text of an accession.
 *
 * @param accession number of the dataset, from 1
 * @param revision number of the revision, from 1; without it the text stands for the newest one
 */
export function formatAccession(accession: number, revision?: number): string {
  const dataset = `CK-${String(accession).padStart(6, '0')}`;
  return revision === undefined ? dataset : `${dataset}.${revision}`;
}

/** What an accession stands for; null where the text is none. */
export function parseAccession(text: string): Accession | null {
  const [, digits, revision] = ACCESSION.exec(text) ?? [];
  const accession = Number(digits);
  if (digits === undefined || accession === 0) return null;
  return { accession, revision: revision === undefined ? null : Number(revision) };
}
