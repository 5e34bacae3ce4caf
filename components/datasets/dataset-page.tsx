'use client';

import { useSearchParams } from 'next/navigation';
import { AssessedView } from '@/components/assessed/assessed-view';
import { CurveOutline } from '@/components/plots/curve-outline';
import type { EnergyWindow } from '@/components/plots/energy-window';
import type { DatasetAnswer } from '@/schemas/dataset-answers';
import { DatasetRecord } from './dataset-record';
import { MarkedPoint } from './marked-point';
import { readPoint } from './point-address';
import { PublishedHead } from './published-head';
import { type DocumentHead, publishedPlotData } from './published-plot-data';
import { ReadFailure } from './read-failure';
import { useDatasetPoints, useWholeDocument } from './use-collection';
import { useLook } from './use-look';

/** What the page of a dataset shows, its points aside. */
export type PublishedRecord = Omit<DatasetAnswer, 'document'> & { document: DocumentHead };

interface DatasetPageProps {
  dataset: PublishedRecord;
  /** the window that it opens with */
  opening: EnergyWindow;
}

/** One published dataset: statements, collapse, strips, verdict, points; below what is on record about it. */
export function DatasetPage({ dataset, opening }: DatasetPageProps) {
  const { document, assessment, accession, revision } = dataset;
  const { data: answer, error, refetch } = useDatasetPoints(`${accession}.${revision}`, true);
  const wholeDocument = useWholeDocument(`${accession}.${revision}`);
  const [look, setLook] = useLook(
    opening,
    document.ligands.map(({ id }) => id),
  );
  const asked = readPoint(useSearchParams().get('point'));
  const data = publishedPlotData(document, assessment, answer?.points ?? []);
  const marked = asked !== null && data.series[asked.series]?.assessed.points[asked.point] ? asked : null;
  return (
    <>
      <AssessedView
        data={data}
        look={look}
        onLook={setLook}
        head={<PublishedHead dataset={dataset} />}
        marked={marked}
        aside={marked === null ? null : <MarkedPoint data={data} place={marked} />}
        wholeDocument={wholeDocument}
        flaggedFirst={assessment.summary.warning + assessment.summary.offCurve > 0}
        pending={
          answer ? undefined : (
            <div className="relative min-h-[400px] grow lg:min-h-[clamp(30rem,100dvh_-_14rem,52rem)]">
              {error ? (
                <div className="p-4">
                  <ReadFailure what="The points" error={error} onRetry={() => void refetch()} />
                </div>
              ) : (
                <CurveOutline window={look.window} />
              )}
            </div>
          )
        }
      />
      <DatasetRecord dataset={dataset} />
    </>
  );
}
