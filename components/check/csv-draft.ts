/** The form beside a table of points, as it is typed: every number is text until it is read. */

import { readNumber } from '@/components/ui/read-number';
import type { CsvPoints } from '@/lib/documents/read-csv-points';
import {
  type ConcentrationUnit,
  concentrationKind,
  type EnergyOrientation,
  type EnergyUnit,
  type GapUnit,
  type RatioOrientation,
  type TemperatureUnit,
} from '@/lib/engine/units';
import type { CsvParametersInput } from '@/schemas/csv-parameters';

export interface ConstantDraft {
  value: string;
  u: string;
  unit: ConcentrationUnit;
  binds: boolean;
}

export interface ParametersDraft {
  origin: 'independent' | 'fitted-elsewhere' | 'fitted-here';
  fittedCount: string;
  gap: { value: string; u: string; unit: GapUnit; orientation: EnergyOrientation | RatioOrientation };
  gapScope: 'complex' | 'site';
  sites: { value: string; u: string };
  /** by ligand id */
  binding: Record<string, { inactive: ConstantDraft; active: ConstantDraft }>;
  /** by modulator id */
  modulation: Record<
    string,
    { value: string; u: string; unit: EnergyUnit; orientation: EnergyOrientation; reference: string }
  >;
}

export interface CsvDraft {
  temperature: { value: string; u: string; unit: TemperatureUnit };
  method: 'absolute' | 'two-reference' | 'series-min-max';
  /** ids of ligands whose total concentration is stated */
  totals: string[];
  /** for every series that has none of its own */
  parameters: ParametersDraft;
  /** by series id */
  own: Record<string, ParametersDraft>;
}

/** What a document made from a table says where neither table nor form had a place for it. */
export const NOT_STATED = 'not stated';

/** An empty form for the columns of a table; what was typed for columns that are still there is kept. */
export function draftFor(table: CsvPoints, earlier: CsvDraft | null): CsvDraft {
  const draft: CsvDraft = earlier ?? {
    temperature: { value: '25', u: '', unit: 'degC' },
    method: 'two-reference',
    totals: [],
    parameters: emptyParameters(),
    own: {},
  };
  return {
    ...draft,
    parameters: withColumns(draft.parameters, table),
    own: Object.fromEntries(Object.entries(draft.own).map(([id, own]) => [id, withColumns(own, table)])),
  };
}

function emptyParameters(): ParametersDraft {
  return {
    origin: 'independent',
    fittedCount: '',
    gap: { value: '', u: '', unit: 'kT', orientation: 'inactive-minus-active' },
    gapScope: 'complex',
    sites: { value: '', u: '' },
    binding: {},
    modulation: {},
  };
}

function withColumns(parameters: ParametersDraft, { ligands, modulators }: CsvPoints): ParametersDraft {
  const slope = {
    value: '',
    u: '',
    unit: 'kT' as const,
    orientation: 'inactive-minus-active' as const,
    reference: '0',
  };
  return {
    ...parameters,
    // What was typed for a column whose heading is being retyped is kept.
    binding: {
      ...parameters.binding,
      ...Object.fromEntries(
        ligands.map(({ id, unit }) => {
          const { inactive, active } = parameters.binding[id] ?? {};
          return [id, { inactive: fitted(unit, inactive), active: fitted(unit, active) }];
        }),
      ),
    },
    modulation: {
      ...parameters.modulation,
      ...Object.fromEntries(modulators.map(({ id }) => [id, parameters.modulation[id] ?? slope])),
    },
  };
}

/** A constant in a unit of its ligand's kind, which may have changed with the table's heading. */
function fitted(unit: ConcentrationUnit, earlier?: ConstantDraft): ConstantDraft {
  if (earlier === undefined) return { value: '', u: '', unit, binds: true };
  return concentrationKind(earlier.unit) === concentrationKind(unit) ? earlier : { ...earlier, unit };
}

/** The form as the schema takes it. Text that is no number becomes NaN, which the schema refuses by name. */
export function formOf(draft: CsvDraft, table: CsvPoints, title: string): CsvParametersInput {
  const known = new Set(table.series.map(({ id }) => id));
  const own = Object.entries(draft.own).filter(([id]) => known.has(id));
  return {
    title,
    abstract: 'Checked from a table.',
    licence: 'CC0-1.0',
    system: 'not-named',
    assay: { readout: NOT_STATED, conditions: NOT_STATED },
    temperature: {
      value: number(draft.temperature.value),
      unit: draft.temperature.unit,
      u: optional(draft.temperature.u),
    },
    normalisation: { method: draft.method },
    ligands: Object.fromEntries(
      table.ligands.map(({ id }) => [id, { concentration: draft.totals.includes(id) ? 'total' : 'free' }]),
    ),
    parameters: statedOf(draft.parameters, table),
    series: Object.fromEntries(
      own.map(([id, parameters]) => [id, { parameters: statedOf(parameters, table) }]),
    ),
  };
}

function statedOf(
  draft: ParametersDraft,
  { ligands, modulators }: CsvPoints,
): CsvParametersInput['parameters'] {
  const gap = {
    value: number(draft.gap.value),
    u: optional(draft.gap.u),
    unit: draft.gap.unit,
    orientation: draft.gap.orientation,
  };
  return {
    origin: draft.origin,
    fittedCount: draft.origin === 'fitted-here' ? number(draft.fittedCount) : undefined,
    // Unit and orientation go together: the form offers only those that do.
    gap: gap as CsvParametersInput['parameters']['gap'],
    gapScope: draft.gapScope,
    sites: { value: number(draft.sites.value), u: optional(draft.sites.u) },
    binding: Object.fromEntries(
      ligands.map(({ id }) => [
        id,
        { inactive: constantOf(draft.binding[id].inactive), active: constantOf(draft.binding[id].active) },
      ]),
    ),
    modulation: Object.fromEntries(
      modulators.map(({ id }) => {
        const { value, u, unit, orientation, reference } = draft.modulation[id];
        const slope = { value: number(value), u: optional(u), unit, orientation };
        return [id, { slope, reference: number(reference) }];
      }),
    ),
  };
}

function constantOf({ value, u, unit, binds }: ConstantDraft) {
  return binds ? { value: number(value), u: optional(u), unit } : null;
}

function number(text: string): number {
  return readNumber(text) ?? Number.NaN;
}

function optional(text: string): number | undefined {
  return text.trim() === '' ? undefined : number(text);
}
