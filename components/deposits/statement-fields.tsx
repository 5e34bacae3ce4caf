import { ORIENTATION_WORDS, ORIGIN_WORDS } from '@/components/assessed/statement-words';
import { FormRow } from '@/components/ui/form-row';
import { InlineSelect } from '@/components/ui/inline-select';
import { unitLabel } from '@/components/ui/unit-label';
import {
  CONCENTRATION_UNITS,
  type ConcentrationUnit,
  concentrationKind,
  ENERGY_ORIENTATIONS,
  ENERGY_UNITS,
  GAP_UNITS,
  MOLAR_UNITS,
  PRESSURE_UNITS,
  RATIO_ORIENTATIONS,
} from '@/lib/engine/units';
import { gapInKT } from './convert-words';
import type { DraftAccess } from './draft-access';
import { NumberAt, QuantityAt } from './draft-fields';
import { isObject, listOf, objectOf, textOf } from './draft-value';
import { OddShape } from './odd-shape';

const GAP_CHOICES = GAP_UNITS.map((unit) => ({ value: unit, label: unit }));
const ENERGY_CHOICES = ENERGY_UNITS.map((unit) => ({ value: unit, label: unit }));
const ORIGINS = Object.entries(ORIGIN_WORDS).map(([value, label]) => ({ value, label }));

interface StatementFieldsProps {
  draft: DraftAccess;
  /** of the parameters of a series */
  pointer: string;
  /** K; null where no temperature can be read */
  kelvin: number | null;
}

/** The parameters of one series as they stand in the document, in the group’s own convention, gaps in kT beside. */
export function StatementFields({ draft, pointer, kelvin }: StatementFieldsProps) {
  const parameters = objectOf(draft.at(pointer));
  const classes = listOf(parameters.siteClasses);
  return (
    <div className="border-hairline border-t">
      {parameters.gap === undefined &&
      classes.some((one) => objectOf(one).gapPerSite !== undefined) ? null : (
        <GapRow draft={draft} pointer={`${pointer}/gap`} label="Energy gap" kelvin={kelvin} />
      )}
      {classes.map((siteClass, i) => {
        const place = `${pointer}/siteClasses/${i}`;
        if (!isObject(siteClass)) return <OddShape key={place} what="A site class" />;
        const name = classes.length > 1 ? textOf(siteClass.id) : '';
        return <ClassRows key={place} draft={draft} pointer={place} kelvin={kelvin} name={name} />;
      })}
      {listOf(parameters.modulation).map((modulation, i) => {
        const place = `${pointer}/modulation/${i}`;
        return (
          <SlopeRow key={place} draft={draft} pointer={place} name={textOf(objectOf(modulation).modulator)} />
        );
      })}
      <OriginRows draft={draft} pointer={pointer} />
    </div>
  );
}

interface GapRowProps extends StatementFieldsProps {
  label: string;
}

function GapRow({ draft, pointer, label, kelvin }: GapRowProps) {
  const gap = objectOf(draft.at(pointer));
  const inKT = gapInKT(draft.at(pointer), kelvin);
  const setUnit = (unit: string) => {
    const fitting = orientationsFor(unit);
    const orientation = fitting.includes(textOf(gap.orientation)) ? gap.orientation : fitting[0];
    draft.set(pointer, { ...gap, unit, orientation });
  };
  return (
    <FormRow label={label}>
      <QuantityAt
        draft={draft}
        pointer={pointer}
        name={label.toLowerCase()}
        units={GAP_CHOICES}
        onUnit={setUnit}
      />
      <InlineSelect
        name={`orientation of the ${label.toLowerCase()}`}
        value={textOf(gap.orientation)}
        options={orientationsFor(textOf(gap.unit)).map((value) => ({
          value,
          label: orientationWords(value),
        }))}
        onChange={(orientation) => draft.set(`${pointer}/orientation`, orientation)}
      />
      {inKT === null ? null : <p className="figures mt-1 text-sm">= {inKT}</p>}
    </FormRow>
  );
}

function orientationsFor(unit: string): readonly string[] {
  return unit === 'ratio' ? RATIO_ORIENTATIONS : ENERGY_ORIENTATIONS;
}

function orientationWords(orientation: string): string {
  return ORIENTATION_WORDS[orientation as keyof typeof ORIENTATION_WORDS] ?? orientation;
}

/** Sites, gap per site and constants of one class. `name` where there are several. */
function ClassRows({ draft, pointer, kelvin, name }: StatementFieldsProps & { name: string }) {
  const siteClass = objectOf(draft.at(pointer));
  const ofClass = name ? ` of ${name}` : '';
  return (
    <>
      {name ? <p className="pt-3 font-semibold text-soft text-xs">site class {name}</p> : null}
      <FormRow label="Sites">
        <QuantityAt draft={draft} pointer={`${pointer}/sites`} name={`number of sites${ofClass}`} />
      </FormRow>
      {siteClass.gapPerSite === undefined ? null : (
        <GapRow
          draft={draft}
          pointer={`${pointer}/gapPerSite`}
          label={`Gap per site${ofClass}`}
          kelvin={kelvin}
        />
      )}
      {listOf(siteClass.binding).flatMap((binding, i) =>
        (['inactive', 'active'] as const).map((state) => {
          const place = `${pointer}/binding/${i}/${state}`;
          const ligand = textOf(objectOf(binding).ligand);
          return (
            <ConstantRow
              key={place}
              draft={draft}
              pointer={place}
              state={state}
              ligand={ligand}
              ofClass={ofClass}
            />
          );
        }),
      )}
    </>
  );
}

interface ConstantRowProps {
  draft: DraftAccess;
  pointer: string;
  state: 'inactive' | 'active';
  /** id of the ligand */
  ligand: string;
  ofClass: string;
}

function ConstantRow({ draft, pointer, state, ligand, ofClass }: ConstantRowProps) {
  const stated = draft.at(pointer);
  const known = listOf(draft.at('/ligands'))
    .map(objectOf)
    .find(({ id }) => id === ligand);
  const unit = textOf(known?.unit);
  const name = textOf(known?.name) || ligand;
  return (
    <FormRow label={state} symbol="K" note={name}>
      {stated === null ? null : (
        <QuantityAt
          draft={draft}
          pointer={pointer}
          name={`K ${state} of ${name}${ofClass}`}
          units={unitsLike(unit)}
        />
      )}
      <label className="mt-1 inline-flex min-h-6 items-center gap-2 text-sm text-soft">
        <input
          type="checkbox"
          checked={stated === null}
          onChange={({ target }) => draft.set(pointer, target.checked ? null : { unit: unit || 'uM' })}
          className="size-4 accent-act"
        />
        does not bind this state
      </label>
    </FormRow>
  );
}

/** Units of the same kind as the ligand’s; all where that is not known. */
function unitsLike(unit: string) {
  const isKnown = (CONCENTRATION_UNITS as readonly string[]).includes(unit);
  const isMolar = isKnown && concentrationKind(unit as ConcentrationUnit) === 'molar';
  const units = !isKnown ? CONCENTRATION_UNITS : isMolar ? MOLAR_UNITS : PRESSURE_UNITS;
  return units.map((value) => ({ value, label: unitLabel(value) }));
}

function SlopeRow({ draft, pointer, name }: { draft: DraftAccess; pointer: string; name: string }) {
  const slope = `${pointer}/slope`;
  return (
    <FormRow label="Slope" note={`by ${name}`}>
      <QuantityAt draft={draft} pointer={slope} name={`slope by ${name}`} units={ENERGY_CHOICES} />
      <InlineSelect
        name={`orientation of the slope by ${name}`}
        value={textOf(draft.at(`${slope}/orientation`))}
        options={ENERGY_ORIENTATIONS.map((value) => ({ value, label: orientationWords(value) }))}
        onChange={(orientation) => draft.set(`${slope}/orientation`, orientation)}
      />
      <div className="flex items-baseline gap-2 text-sm text-soft">
        reference
        <NumberAt draft={draft} pointer={`${pointer}/reference`} name={`reference of ${name}`} />
      </div>
    </FormRow>
  );
}

function OriginRows({ draft, pointer }: { draft: DraftAccess; pointer: string }) {
  const { origin, fittedCount: _, ...others } = objectOf(draft.at(pointer));
  const error = draft.errorAt(`${pointer}/origin`);
  const setOrigin = (next: string) =>
    next === 'fitted-here'
      ? draft.set(`${pointer}/origin`, next)
      : draft.set(pointer, { ...others, origin: next });
  return (
    <>
      <FormRow label="Origin">
        <div data-pointer={`${pointer}/origin`}>
          <InlineSelect
            name="origin of the parameters"
            value={textOf(origin)}
            options={ORIGINS}
            onChange={setOrigin}
          />
          {error ? <p className="text-off text-xs">{error}</p> : null}
        </div>
      </FormRow>
      {origin === 'fitted-here' ? (
        <FormRow label="Fitted values">
          <NumberAt
            draft={draft}
            pointer={`${pointer}/fittedCount`}
            name="number of parameters fitted to these points"
          />
        </FormRow>
      ) : null}
    </>
  );
}
