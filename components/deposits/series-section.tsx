import { Button } from '@/components/ui/button';
import { kelvinOf } from './convert-words';
import type { DraftAccess } from './draft-access';
import { TextAt } from './draft-fields';
import { isObject, type JsonObject, listOf, objectOf, textOf } from './draft-value';
import { OddShape } from './odd-shape';
import { StatementFields } from './statement-fields';

interface SeriesSectionProps {
  draft: DraftAccess;
  /** which series is shown; the table of points shows the same */
  chosen: number;
  onChoose: (series: number) => void;
}

/** One series: its names and the parameters that are stated for it; the others by stepping. */
export function SeriesSection({ draft, chosen, onChoose }: SeriesSectionProps) {
  const all = draft.at('/series');
  if (!Array.isArray(all)) return <OddShape what="The list of series" />;
  const add = () => {
    draft.set(`/series/${all.length}`, likeSeries(all[chosen], all));
    onChoose(all.length);
  };
  const remove = () => {
    draft.set(`/series/${chosen}`, undefined);
    onChoose(Math.max(0, chosen - 1));
  };
  const label = textOf(objectOf(all[chosen]).label);
  return (
    <>
      <SeriesHead all={all} chosen={chosen} onChoose={onChoose} />
      <OneSeries draft={draft} series={all[chosen]} pointer={`/series/${chosen}`} />
      <p data-pointer="/series" className="mt-3 flex flex-wrap gap-x-5 gap-y-1">
        <Button onClick={add}>{all.length === 0 ? 'Add a series' : 'Add a series like this'}</Button>
        {all.length > 1 ? <Button onClick={remove}>Take {label || 'it'} away</Button> : null}
      </p>
    </>
  );
}

function SeriesHead({
  all,
  chosen,
  onChoose,
}: { all: readonly unknown[] } & Omit<SeriesSectionProps, 'draft'>) {
  const step = (by: number) => onChoose((chosen + all.length + by) % all.length);
  return (
    <div className="flex flex-wrap items-baseline justify-between gap-x-3 border-ink border-b pb-1.5">
      <h2 className="min-w-0 truncate font-semibold">{textOf(objectOf(all[chosen]).label) || 'unnamed'}</h2>
      {all.length > 1 ? (
        <p className="flex shrink-0 items-baseline gap-1 text-sm text-soft">
          <span className="figures">
            series {chosen + 1} of {all.length}
          </span>
          <Button aria-label="Previous series" className="min-w-6 justify-center" onClick={() => step(-1)}>
            ‹
          </Button>
          <Button aria-label="Next series" className="min-w-6 justify-center" onClick={() => step(1)}>
            ›
          </Button>
        </p>
      ) : null}
    </div>
  );
}

function OneSeries({ draft, series, pointer }: { draft: DraftAccess; series: unknown; pointer: string }) {
  if (series === undefined)
    return <p className="py-3 text-soft">No series yet: the curves of one variant each.</p>;
  if (!isObject(series)) return <OddShape what="This series" />;
  const kelvin = kelvinOf(series.temperature ?? draft.at('/temperature'));
  return (
    <div key={pointer}>
      <div className="space-y-4 py-4">
        <TextAt draft={draft} pointer={`${pointer}/label`} label="Name of the series" />
        <TextAt draft={draft} pointer={`${pointer}/variant`} label="Variant" />
      </div>
      <StatementFields draft={draft} pointer={`${pointer}/parameters`} kelvin={kelvin} />
    </div>
  );
}

/** A new series with the statements of another one and no points. */
function likeSeries(model: unknown, all: readonly unknown[]): JsonObject {
  const taken = new Set(listOf(all).map((one) => objectOf(one).id));
  let number = all.length + 1;
  while (taken.has(`s${number}`)) number += 1;
  const { parameters = { origin: 'independent', siteClasses: [] } } = objectOf(model);
  return { id: `s${number}`, label: '', variant: '', parameters, points: [] };
}
