import { Fragment, type ReactNode } from 'react';
import type { PlotData, PlotSeries } from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { formatQuantity } from '@/components/ui/format-quantity';
import { Quantity } from '@/components/ui/quantity';
import { unitLabel } from '@/components/ui/unit-label';
import type { DerivedQuantities, Estimate } from '@/lib/engine/assessment';
import { SeriesDot } from './series-dot';
import {
  constantWords,
  gapWords,
  ORIGIN_WORDS,
  type StatementWords,
  slopeWords,
  temperatureWords,
} from './statement-words';

interface StatementsProps {
  data: PlotData;
  /** which series is shown */
  chosen: number;
  onChoose: (series: number) => void;
}

/** One series' statements as made and in kT, and what they predict; the others by stepping. */
export function Statements({ data, chosen, onChoose }: StatementsProps) {
  const series = data.series[chosen];
  const count = data.series.length;
  return (
    <section aria-label="Statements" className="mt-5">
      <div className="flex flex-wrap items-baseline justify-between gap-x-3 border-ink border-b pb-1.5">
        <h2 className="flex min-w-0 items-baseline gap-2 font-semibold">
          <SeriesDot colour={series.colour} />
          <span className="truncate">{series.label}</span>
        </h2>
        {count > 1 ? (
          <p className="flex shrink-0 items-baseline gap-1 text-sm text-soft">
            <span className="figures">
              series {chosen + 1} of {count}
            </span>
            <Step label="Previous series" sign="‹" onClick={() => onChoose((chosen + count - 1) % count)} />
            <Step label="Next series" sign="›" onClick={() => onChoose((chosen + 1) % count)} />
          </p>
        ) : null}
      </div>
      <Parameters data={data} series={series} />
      <Predictions data={data} series={series} />
    </section>
  );
}

function Step({ label, sign, onClick }: { label: string; sign: string; onClick: () => void }) {
  return (
    <Button aria-label={label} className="no-print min-w-6 justify-center" onClick={onClick}>
      {sign}
    </Button>
  );
}

function Parameters({ data, series }: { data: PlotData; series: PlotSeries }) {
  const { parameters, temperature } = series.stated;
  const kelvin = series.assessed.temperatureK;
  const many = parameters.siteClasses.length > 1;
  const several = data.document.ligands.length > 1;
  const nameOf = (ligand: string) => data.document.ligands.find(({ id }) => id === ligand)?.name ?? ligand;
  return (
    <>
      {parameters.gap ? (
        <dl>
          <Row label="Energy gap" words={gapWords(parameters.gap, kelvin)} />
        </dl>
      ) : null}
      {parameters.siteClasses.map((siteClass) => (
        <Fragment key={siteClass.id}>
          {many ? <GroupHead>site class {siteClass.id}</GroupHead> : null}
          <dl>
            <Row
              label="Sites"
              words={{ stated: <Quantity value={siteClass.sites.value} u={siteClass.sites.u} /> }}
            />
            {siteClass.gapPerSite ? (
              <Row label="Gap per site" words={gapWords(siteClass.gapPerSite, kelvin)} />
            ) : null}
            {siteClass.binding.map((binding) => (
              <Fragment key={binding.ligand}>
                <Row
                  symbol="K"
                  label="inactive"
                  note={several ? nameOf(binding.ligand) : undefined}
                  words={constantWords(binding.inactive)}
                />
                <Row
                  symbol="K"
                  label="active"
                  note={several ? nameOf(binding.ligand) : undefined}
                  words={constantWords(binding.active)}
                />
              </Fragment>
            ))}
          </dl>
        </Fragment>
      ))}
      <dl>
        {parameters.modulation?.map(({ modulator: id, slope, reference }) => {
          const modulator = data.document.modulators?.find((one) => one.id === id);
          const note = `from ${formatQuantity(reference, 0, modulator?.unit)}`;
          return (
            <Row
              key={id}
              label={modulator?.name ?? id}
              note={note}
              words={slopeWords(slope, modulator, kelvin)}
            />
          );
        })}
        {parameters.correlations?.length ? (
          <Row label="Correlations" words={{ stated: `${parameters.correlations.length} stated` }} />
        ) : null}
        <Row label="Origin" words={{ stated: ORIGIN_WORDS[parameters.origin] }} />
        <Row label="Temperature" words={temperatureWords(temperature ?? data.document.temperature)} />
      </dl>
    </>
  );
}

interface RowProps {
  label: string;
  /** a letter before the label, in the italic of the equations */
  symbol?: string;
  /** in small type under the statement: which ligand, from where */
  note?: string;
  words: StatementWords;
}

function Row({ label, symbol, note, words }: RowProps) {
  return (
    <div className="grid grid-cols-[7.25rem_minmax(0,1fr)] gap-x-3 border-hairline border-b py-1.5 lg:max-xl:grid-cols-1">
      <dt className="text-soft">
        {symbol ? <var className="symbol">{symbol} </var> : null}
        {label}
      </dt>
      <dd className="figures">
        <span className="font-semibold">{words.stated}</span>
        {words.convention || note ? (
          <span className="block text-soft text-sm">
            {[words.convention, note].filter(Boolean).join(', ')}
          </span>
        ) : null}
        {words.converted ? <span className="block text-sm">= {words.converted}</span> : null}
      </dd>
    </div>
  );
}

/** Above the rows of a site class or a ligand, where there are several. */
function GroupHead({ children }: { children: ReactNode }) {
  return <p className="pt-2.5 font-semibold text-soft text-xs">{children}</p>;
}

function Predictions({ data, series }: { data: PlotData; series: PlotSeries }) {
  const { derived, gapKT } = series.assessed;
  return (
    <>
      <h3 className="mt-6 font-semibold">What these statements predict</h3>
      <p className="border-hairline border-b pb-1.5 text-sm text-soft">
        each ligand alone, modulators at their references
      </p>
      {series.stated.parameters.siteClasses.some(({ gapPerSite }) => gapPerSite) ? (
        <dl>
          <Row label="Whole gap" words={{ stated: <Quantity value={gapKT} unit="kT" /> }} />
        </dl>
      ) : null}
      {derived.map((quantities) => (
        <Fragment key={quantities.ligand}>
          {derived.length > 1 ? (
            <GroupHead>
              {data.document.ligands.find(({ id }) => id === quantities.ligand)?.name} alone
            </GroupHead>
          ) : null}
          <dl>
            {rowsOf(quantities).map(([label, estimate, unit]) => (
              <Row
                key={label}
                label={label}
                note={
                  label === RANGE
                    ? 'from no ligand to saturation; in between it may reach further'
                    : undefined
                }
                words={{ stated: estimateWords(estimate, unit) }}
              />
            ))}
          </dl>
        </Fragment>
      ))}
    </>
  );
}

/** Of the two ends: where the energy turns back in between, the activity reaches beyond them. */
const RANGE = 'Range, end to end';

function rowsOf(derived: DerivedQuantities): [string, Estimate | null, string][] {
  const unit = unitLabel(derived.unit);
  return [
    ['Without ligand', derived.leakiness, ''],
    ['At saturation', derived.saturation, ''],
    [RANGE, derived.dynamicRange, ''],
    ['EC50', derived.ec50, unit],
    ['Half activity', derived.halfActivity, unit],
    ['Effective Hill', derived.effectiveHill, ''],
  ];
}

function estimateWords(estimate: Estimate | null, unit: string): ReactNode {
  return estimate === null ? (
    'does not exist'
  ) : (
    <Quantity value={estimate.value} u={estimate.u} unit={unit} />
  );
}
