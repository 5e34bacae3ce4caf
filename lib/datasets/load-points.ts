/**
 * The computed points of a published revision: those of the assessment that was kept with it, never computed again,
 * beside what was measured.
 */
import type { Actor } from '@/lib/auth/actor';
import type { Failed } from '@/lib/errors';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { DatasetPoint, DatasetPoints, Tombstone } from '@/schemas/dataset-answers';
import { demonstrationNote } from './demonstration-note';
import { loadRevision, type PublishedRevision } from './load-revision';

export interface LoadedPoints {
  answer: DatasetPoints;
  document: DatasetDocument;
  /** with the revision, `CK-000123.2` */
  accession: string;
}

export type PointsOutcome = { ok: true; loaded: LoadedPoints } | (Failed & { tombstone?: Tombstone });

/** The points of an accession, series by series; failures as those of `loadRevision`. */
export async function loadPoints(actor: Actor, accessionText: string): Promise<PointsOutcome> {
  const outcome = await loadRevision(actor, accessionText);
  if (!outcome.ok) return outcome;
  const { document, accession, revision } = outcome.published;
  const answer = {
    accession,
    revision,
    note: demonstrationNote(document.abstract),
    units: unitsOf(document),
    points: pointsOf(outcome.published),
  };
  return { ok: true, loaded: { answer, document, accession } };
}

function unitsOf({ ligands, modulators = [] }: DatasetDocument): DatasetPoints['units'] {
  const byId = (list: { id: string; unit: string }[]) =>
    Object.fromEntries(list.map(({ id, unit }) => [id, unit]));
  return { energy: 'kT', ligands: byId(ligands), modulators: byId(modulators) };
}

function pointsOf({ document, assessment }: PublishedRevision): DatasetPoint[] {
  return assessment.series.flatMap(({ id, points }, i) =>
    points.map(({ index, ...numbers }) => {
      const { ligands, modulators = {} } = document.series[i].points[index];
      return { series: id, index, ligands, modulators, ...numbers };
    }),
  );
}
