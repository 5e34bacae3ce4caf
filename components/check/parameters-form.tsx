import { ORIENTATION_WORDS, ORIGIN_WORDS } from '@/components/assessed/statement-words';
import { FormRow } from '@/components/ui/form-row';
import { InlineQuantity } from '@/components/ui/inline-quantity';
import { InlineSelect } from '@/components/ui/inline-select';
import { unitLabel } from '@/components/ui/unit-label';
import type { CsvPoints } from '@/lib/documents/read-csv-points';
import {
  type ConcentrationUnit,
  concentrationKind,
  ENERGY_ORIENTATIONS,
  ENERGY_UNITS,
  type EnergyOrientation,
  type EnergyUnit,
  GAP_UNITS,
  type GapUnit,
  MOLAR_UNITS,
  PRESSURE_UNITS,
  RATIO_ORIENTATIONS,
} from '@/lib/engine/units';
import type { ConstantDraft, ParametersDraft } from './csv-draft';

interface ParametersFormProps {
  draft: ParametersDraft;
  table: CsvPoints;
  /** by path below the parameters, such as `gap.value` */
  errors: ReadonlyMap<string, string>;
  onChange: (draft: ParametersDraft) => void;
}

const choices = (values: readonly string[], words: (value: string) => string) =>
  values.map((value) => ({ value, label: words(value) }));

/** Parameters of one site class, each in the laboratory's own convention. */
export function ParametersForm({ draft, table, errors, onChange }: ParametersFormProps) {
  const set = (part: Partial<ParametersDraft>) => onChange({ ...draft, ...part });
  return (
    <>
      <GapRow draft={draft} errors={errors} onChange={onChange} />
      <FormRow label="Sites">
        <InlineQuantity
          name="number of sites"
          value={draft.sites.value}
          u={draft.sites.u}
          error={errors.get('sites.value') ?? errors.get('sites.u')}
          onValue={(value) => set({ sites: { ...draft.sites, value } })}
          onU={(u) => set({ sites: { ...draft.sites, u } })}
        />
      </FormRow>
      {table.ligands.map(({ id, name, unit }) =>
        (['inactive', 'active'] as const).map((state) => (
          <FormRow key={`${id} ${state}`} label={state} symbol="K" note={name}>
            <ConstantFields
              name={`K ${state} of ${name}`}
              ligandUnit={unit}
              draft={draft.binding[id][state]}
              error={
                errors.get(`binding.${id}.${state}.value`) ??
                errors.get(`binding.${id}.${state}.u`) ??
                errors.get(`binding.${id}`)
              }
              onChange={(constant) =>
                set({ binding: { ...draft.binding, [id]: { ...draft.binding[id], [state]: constant } } })
              }
            />
          </FormRow>
        )),
      )}
      {table.modulators.map((modulator) => (
        <SlopeRow
          key={modulator.id}
          modulator={modulator}
          draft={draft}
          errors={errors}
          onChange={onChange}
        />
      ))}
      <FormRow label="Origin">
        <InlineSelect
          name="origin of the parameters"
          value={draft.origin}
          options={Object.entries(ORIGIN_WORDS).map(([value, label]) => ({ value, label }))}
          onChange={(origin) => set({ origin: origin as ParametersDraft['origin'] })}
        />
      </FormRow>
      {draft.origin === 'fitted-here' ? (
        <FormRow label="Fitted values">
          <InlineQuantity
            name="number of parameters fitted to these points"
            value={draft.fittedCount}
            error={errors.get('fittedCount')}
            onValue={(fittedCount) => set({ fittedCount })}
          />
        </FormRow>
      ) : null}
    </>
  );
}

type PartProps = Pick<ParametersFormProps, 'draft' | 'errors' | 'onChange'>;

function GapRow({ draft, errors, onChange }: PartProps) {
  const { gap, gapScope } = draft;
  const set = (part: Partial<ParametersDraft['gap']>) => onChange({ ...draft, gap: { ...gap, ...part } });
  const orientations = gap.unit === 'ratio' ? RATIO_ORIENTATIONS : ENERGY_ORIENTATIONS;
  return (
    <FormRow label="Energy gap">
      <InlineQuantity
        name="energy gap"
        value={gap.value}
        u={gap.u}
        unit={gap.unit}
        units={choices(GAP_UNITS, (unit) => unit)}
        error={errors.get('gap.value') ?? errors.get('gap.u') ?? errors.get('gap.orientation')}
        onValue={(value) => set({ value })}
        onU={(u) => set({ u })}
        onUnit={(unit) => set(orientedUnit(unit as GapUnit, gap.orientation))}
      />
      <InlineSelect
        name="orientation of the energy gap"
        value={gap.orientation}
        options={choices(orientations, (value) => ORIENTATION_WORDS[value as keyof typeof ORIENTATION_WORDS])}
        onChange={(value) => set({ orientation: value as typeof gap.orientation })}
      />
      <InlineSelect
        name="scope of the energy gap"
        value={gapScope}
        options={[
          { value: 'complex', label: 'of the whole complex' },
          { value: 'site', label: 'per site' },
        ]}
        onChange={(value) => onChange({ ...draft, gapScope: value as typeof gapScope })}
      />
    </FormRow>
  );
}

/** A unit with an orientation that goes with it: energies have a difference, a ratio has a quotient. */
function orientedUnit(
  unit: GapUnit,
  orientation: ParametersDraft['gap']['orientation'],
): Partial<ParametersDraft['gap']> {
  const fitting: readonly string[] = unit === 'ratio' ? RATIO_ORIENTATIONS : ENERGY_ORIENTATIONS;
  // An uncertainty typed in the old unit would be another one in the new.
  if (fitting.includes(orientation)) return { unit, u: '' };
  return { unit, u: '', orientation: fitting[0] as ParametersDraft['gap']['orientation'] };
}

interface ConstantFieldsProps {
  name: string;
  ligandUnit: ConcentrationUnit;
  draft: ConstantDraft;
  error?: string;
  onChange: (draft: ConstantDraft) => void;
}

function ConstantFields({ name, ligandUnit, draft, error, onChange }: ConstantFieldsProps) {
  const units = concentrationKind(ligandUnit) === 'molar' ? MOLAR_UNITS : PRESSURE_UNITS;
  return (
    <>
      <InlineQuantity
        name={name}
        value={draft.value}
        u={draft.u}
        unit={draft.unit}
        units={choices(units, (unit) => unitLabel(unit as ConcentrationUnit))}
        error={error}
        disabled={!draft.binds}
        onValue={(value) => onChange({ ...draft, value })}
        onU={(u) => onChange({ ...draft, u })}
        onUnit={(unit) => onChange({ ...draft, unit: unit as ConcentrationUnit })}
      />
      <label className="mt-1 inline-flex min-h-6 items-center gap-2 text-sm text-soft">
        <input
          type="checkbox"
          checked={!draft.binds}
          onChange={({ target }) => onChange({ ...draft, binds: !target.checked })}
          className="size-4 accent-act"
        />
        does not bind this state
      </label>
    </>
  );
}

interface SlopeRowProps extends PartProps {
  modulator: CsvPoints['modulators'][number];
}

function SlopeRow({ modulator, draft, errors, onChange }: SlopeRowProps) {
  const { id, name, unit } = modulator;
  const slope = draft.modulation[id];
  const set = (part: Partial<typeof slope>) =>
    onChange({ ...draft, modulation: { ...draft.modulation, [id]: { ...slope, ...part } } });
  return (
    <FormRow label={name} note={`per ${unit}`}>
      <InlineQuantity
        name={`slope by ${name}`}
        value={slope.value}
        u={slope.u}
        unit={slope.unit}
        units={choices(ENERGY_UNITS, (energyUnit) => energyUnit)}
        error={errors.get(`modulation.${id}.slope.value`) ?? errors.get(`modulation.${id}.slope.u`)}
        onValue={(value) => set({ value })}
        onU={(u) => set({ u })}
        onUnit={(energyUnit) => set({ unit: energyUnit as EnergyUnit })}
      />
      <InlineSelect
        name={`orientation of the slope by ${name}`}
        value={slope.orientation}
        options={choices(ENERGY_ORIENTATIONS, (value) => ORIENTATION_WORDS[value as EnergyOrientation])}
        onChange={(value) => set({ orientation: value as EnergyOrientation })}
      />
      <div className="flex items-baseline gap-2 text-sm text-soft">
        reference
        <InlineQuantity
          name={`reference of ${name}`}
          value={slope.reference}
          error={errors.get(`modulation.${id}.reference`)}
          onValue={(reference) => set({ reference })}
        />
        {unit}
      </div>
    </FormRow>
  );
}
