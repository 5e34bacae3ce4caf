import { unitLabel } from '@/components/ui/unit-label';
import { exceedsResidualPanel } from './collapse-view';
import { type PlotData, unitOfLigand } from './plot-data';

interface PanelWordsProps {
  data: PlotData;
  byLigand: string | null;
}

/** The words that stand in the two panels: above and below their dividing line, which is where this stands. */
export function PanelWords({ data, byLigand }: PanelWordsProps) {
  return (
    <>
      <p className="absolute top-1 left-2 font-semibold text-xs">Activity</p>
      {byLigand === null ? null : <AxisName data={data} ligand={byLigand} />}
      <div className="absolute inset-x-0 bottom-[29%] border-hairline border-b">
        {byLigand === null ? (
          <p className="flex justify-between px-2 pb-0.5 text-soft text-xs">
            <span>favours inactive</span>
            <span>favours active</span>
          </p>
        ) : null}
        <p className="absolute top-full left-2 pt-1 font-semibold text-xs">
          Residual{byLigand === null ? '' : ' by energy'}, standard uncertainties
          {exceedsResidualPanel(data) ? (
            <span className="font-normal text-soft"> · beyond ±9 at the edge</span>
          ) : null}
        </p>
      </div>
    </>
  );
}

function AxisName({ data, ligand }: { data: PlotData; ligand: string }) {
  const name = data.document.ligands.find(({ id }) => id === ligand)?.name ?? ligand;
  return (
    <p className="absolute top-1 right-2 text-soft text-xs">
      {name}, {unitLabel(unitOfLigand(data.document, ligand))}, logarithmic
    </p>
  );
}
