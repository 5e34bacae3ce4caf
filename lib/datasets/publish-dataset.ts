/** Writes a dataset as browsing reads it, in the transaction that publishes it. */
import type { Transaction } from '@/db/client';
import {
  deleteNumbers,
  insertCells,
  insertOffCurvePoints,
  insertSeries,
  upsertDataset,
} from '@/db/queries/published';
import { drawStrip } from './draw-strip';
import type { EncodedDataset } from './encode-dataset';

export interface Publication {
  /** 123 of CK-000123 */
  accession: number;
  depositId: string;
  labId: string;
  /** number of the revision that is published */
  revision: number;
  /** Unix time, ms */
  publishedAt: number;
  encoded: EncodedDataset;
}

/** Publishes a revision; where an older one of the same accession was published, the newer takes its place. */
export async function publishDataset(tx: Transaction, publication: Publication): Promise<void> {
  const { encoded, ...identity } = publication;
  const { accession, publishedAt } = identity;
  await deleteNumbers(tx, accession);
  const strip = JSON.stringify(drawStrip(encoded.series, null));
  await upsertDataset(tx, { ...identity, ...encoded.summary, updatedAt: publishedAt, strip });
  await insertSeries(tx, accession, encoded.series);
  await insertCells(tx, accession, encoded.cells);
  await insertOffCurvePoints(tx, accession, encoded.offCurve);
}
