import type { ReactNode } from 'react';
import type { PlotData } from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import { saveFile } from '@/components/ui/save-file';
import { NOT_STATED } from './csv-draft';

interface DatasetHeadProps {
  data: PlotData;
  invented: boolean;
  onEdit: () => void;
  /** the way to a draft, for those who may make one */
  keep?: ReactNode;
}

/** The dataset's title, and what can be done with it. */
export function DatasetHead({ data, invented, onEdit, keep }: DatasetHeadProps) {
  const { document, assessment } = data;
  const assay = [document.assay.readout, document.assay.conditions].filter((words) => words !== NOT_STATED);
  return (
    <header>
      <h1 className="head break-words text-xl">{document.title}</h1>
      {invented ? <p className="mt-2 text-sm text-warn">Invented data, laboratory and protein.</p> : null}
      {assay.length === 0 ? null : <p className="mt-2 text-sm text-soft">{assay.join('; ')}</p>}
      <p className="mt-2 flex flex-wrap gap-x-5">
        <Button onClick={onEdit}>Change the data</Button>
        <Button onClick={() => saveFile('assessment.json', JSON.stringify(assessment, null, 2))}>
          Assessment as a file
        </Button>
      </p>
      {keep}
      {document.abstract ? (
        <Disclosure className="mt-2" summary="Abstract">
          <p className="text-sm">{document.abstract}</p>
        </Disclosure>
      ) : null}
    </header>
  );
}
