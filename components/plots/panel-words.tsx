import { unitLabel } from '@/components/ui/unit-label';
import { exceedsResidualPanel } from './collapse-view';
import { PanelCaptions } from './panel-captions';
import { type PlotData, unitOfLigand } from './plot-data';

interface PanelWordsProps {
  data: PlotData;
  byLigand: string | null;
}

/** The words that stand over the collapse of a dataset. */
export function PanelWords({ data, byLigand }: PanelWordsProps) {
  return (
    <PanelCaptions
      by={byLigand === null ? 'energy' : 'concentration'}
      residualNote={residualNote(data, byLigand)}
    >
      {byLigand === null ? null : <AxisName data={data} ligand={byLigand} />}
    </PanelCaptions>
  );
}

function residualNote(data: PlotData, byLigand: string | null): string | undefined {
  const notes = [
    byLigand === null ? '' : 'on the kT axis below',
    exceedsResidualPanel(data) ? 'beyond ±9 at the edge' : '',
  ];
  return notes.filter(Boolean).join(' · ') || undefined;
}

function AxisName({ data, ligand }: { data: PlotData; ligand: string }) {
  const name = data.document.ligands.find(({ id }) => id === ligand)?.name ?? ligand;
  return (
    <p className="absolute top-1 right-2 text-soft text-xs">
      {name}, {unitLabel(unitOfLigand(data.document, ligand))}, logarithmic
    </p>
  );
}
