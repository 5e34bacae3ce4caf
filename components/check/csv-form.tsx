import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { FormRow } from '@/components/ui/form-row';
import { InlineQuantity } from '@/components/ui/inline-quantity';
import { InlineSelect } from '@/components/ui/inline-select';
import type { CsvPoints } from '@/lib/documents/read-csv-points';
import type { CsvDraft, ParametersDraft } from './csv-draft';
import { ParametersForm } from './parameters-form';

interface CsvFormProps {
  draft: CsvDraft;
  table: CsvPoints;
  /** by path in the form, such as `parameters.gap.value` */
  errors: ReadonlyMap<string, string>;
  onChange: (draft: CsvDraft) => void;
}

const METHODS = [
  { value: 'absolute', label: 'absolute' },
  { value: 'two-reference', label: 'two references, 0 and 1' },
  { value: 'series-min-max', label: 'by the series’ own range' },
];

/** What a table of points leaves out: temperature, normalisation, and the parameters that are claimed. */
export function CsvForm({ draft, table, errors, onChange }: CsvFormProps) {
  const [shown, setShown] = useState<string | null>(null);
  const series = shown !== null && table.series.some(({ id }) => id === shown) ? shown : null;
  const own = series === null ? undefined : draft.own[series];
  const setParameters = (parameters: ParametersDraft) =>
    onChange(
      series !== null && own
        ? { ...draft, own: { ...draft.own, [series]: parameters } }
        : { ...draft, parameters },
    );
  return (
    <section aria-label="Stated parameters" className="mt-6">
      <h2 className="border-ink border-b pb-1.5 font-semibold">Stated parameters</h2>
      <Surroundings draft={draft} table={table} errors={errors} onChange={onChange} />
      {table.series.length > 1 ? (
        <FormRow label="For">
          <InlineSelect
            name="series that the parameters are for"
            value={series ?? ''}
            options={[
              { value: '', label: 'all series' },
              ...table.series.map(({ id, label }) => ({
                value: id,
                label: `${label}: ${draft.own[id] ? 'its own' : 'as all series'}`,
              })),
            ]}
            onChange={(value) => setShown(value === '' ? null : value)}
          />
          {series === null ? null : (
            <Button className="mt-1" onClick={() => onChange({ ...draft, own: toggled(draft, series) })}>
              {own ? 'State it as all series' : 'State its own'}
            </Button>
          )}
        </FormRow>
      ) : null}
      {series !== null && !own ? null : (
        <ParametersForm
          draft={own ?? draft.parameters}
          table={table}
          errors={below(errors, own ? `series.${series}.parameters.` : 'parameters.')}
          onChange={setParameters}
        />
      )}
    </section>
  );
}

function Surroundings({ draft, table, errors, onChange }: CsvFormProps) {
  const { temperature } = draft;
  const setTemperature = (part: Partial<typeof temperature>) =>
    onChange({ ...draft, temperature: { ...temperature, ...part } });
  return (
    <>
      <FormRow label="Temperature">
        <InlineQuantity
          name="temperature"
          value={temperature.value}
          u={temperature.u}
          unit={temperature.unit}
          units={[
            { value: 'degC', label: '°C' },
            { value: 'K', label: 'K' },
          ]}
          error={errors.get('temperature.value') ?? errors.get('temperature.u')}
          onValue={(value) => setTemperature({ value })}
          onU={(u) => setTemperature({ u })}
          onUnit={(unit) => setTemperature({ unit: unit as typeof temperature.unit })}
        />
      </FormRow>
      <FormRow label="Activity">
        <InlineSelect
          name="how the activity was normalised"
          value={draft.method}
          options={METHODS}
          onChange={(method) => onChange({ ...draft, method: method as CsvDraft['method'] })}
        />
      </FormRow>
      {table.ligands.map(({ id, name }) => (
        <FormRow key={id} label={name}>
          <InlineSelect
            name={`concentration of ${name}`}
            value={draft.totals.includes(id) ? 'total' : 'free'}
            options={[
              { value: 'free', label: 'free concentration' },
              { value: 'total', label: 'total concentration' },
            ]}
            onChange={(value) =>
              onChange({ ...draft, totals: withTotal(draft.totals, id, value === 'total') })
            }
          />
        </FormRow>
      ))}
    </>
  );
}

function withTotal(totals: readonly string[], id: string, isTotal: boolean): string[] {
  const others = totals.filter((one) => one !== id);
  return isTotal ? [...others, id] : others;
}

/** Gives a series parameters of its own, beginning with those for every series, or takes them away. */
function toggled({ own, parameters }: CsvDraft, series: string): CsvDraft['own'] {
  if (!own[series]) return { ...own, [series]: parameters };
  return Object.fromEntries(Object.entries(own).filter(([id]) => id !== series));
}

function below(errors: ReadonlyMap<string, string>, prefix: string): Map<string, string> {
  const found = new Map<string, string>();
  for (const [path, detail] of errors)
    if (path.startsWith(prefix)) found.set(path.slice(prefix.length), detail);
  return found;
}
