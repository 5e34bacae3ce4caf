/** Which parameters of a dataset can be freed, as rows of the refit form. Pure. */
import { formatQuantity } from '@/components/ui/format-quantity';
import { unitLabel } from '@/components/ui/unit-label';
import type { FreeParameter } from '@/lib/engine/free-parameters';
import type { ConcentrationUnit, GapUnit } from '@/lib/engine/units';
import type { DatasetDocument, Parameters } from '@/schemas/dataset-1.generated';

/** A parameter without how it is shared. */
export type ParameterPlace = Omit<FreeParameter, 'share'>;

export interface FreeableRow {
  key: string;
  place: ParameterPlace;
  label: string;
  /** as it is stated, or that series differ */
  stated: string;
}

/** Every parameter that at least one series states, in the order of the statements. */
export function freeableRows(document: DatasetDocument): FreeableRow[] {
  const places = new Map<string, ParameterPlace>();
  for (const { parameters } of document.series) {
    for (const place of placesIn(parameters)) places.set(keyOf(place), place);
  }
  const inOrder = [...places].sort(([, a], [, b]) => rankOf(a) - rankOf(b));
  return inOrder.map(([key, place]) => ({
    key,
    place,
    label: placeWords(place, document),
    stated: statedWords(place, document),
  }));
}

export function keyOf({ parameter, siteClass, ligand, modulator }: ParameterPlace): string {
  return [parameter, siteClass, ligand, modulator].map((part) => part ?? '').join('/');
}

const RANK = ['gap', 'gapPerSite', 'sites', 'inactive', 'active', 'slope'];

/** By parameter; otherwise the order in which they were found stays. */
function rankOf({ parameter }: ParameterPlace): number {
  return RANK.indexOf(parameter);
}

function placesIn({ gap, siteClasses, modulation }: Parameters): ParameterPlace[] {
  return [
    ...(gap ? [{ parameter: 'gap' as const }] : []),
    ...siteClasses.flatMap(({ id: siteClass, gapPerSite, binding }) => [
      ...(gapPerSite ? [{ parameter: 'gapPerSite' as const, siteClass }] : []),
      { parameter: 'sites' as const, siteClass },
      ...binding.flatMap(({ ligand, inactive, active }) => [
        ...(inactive ? [{ parameter: 'inactive' as const, siteClass, ligand }] : []),
        ...(active ? [{ parameter: 'active' as const, siteClass, ligand }] : []),
      ]),
    ]),
    ...(modulation ?? []).map(({ modulator }) => ({ parameter: 'slope' as const, modulator })),
  ];
}

const NAMES: Record<FreeParameter['parameter'], string> = {
  gap: 'Energy gap',
  gapPerSite: 'Gap per site',
  sites: 'Sites',
  inactive: 'K inactive',
  active: 'K active',
  slope: 'Slope',
};

/** A parameter as people say it; ligand and site class are named where there are several. */
export function placeWords(place: ParameterPlace, { ligands, modulators, series }: DatasetDocument): string {
  const classes = new Set(series.flatMap(({ parameters }) => parameters.siteClasses.map(({ id }) => id)));
  const ligand = ligands.find(({ id }) => id === place.ligand)?.name ?? place.ligand;
  const modulator = modulators?.find(({ id }) => id === place.modulator)?.name ?? place.modulator;
  return [
    NAMES[place.parameter],
    ligands.length > 1 ? ligand : undefined,
    modulator,
    classes.size > 1 && place.siteClass ? `class ${place.siteClass}` : undefined,
  ]
    .filter(Boolean)
    .join(', ');
}

interface StatementAt {
  value: number;
  u?: number;
  unit?: ConcentrationUnit | GapUnit;
}

/** What one series states at a place; undefined where it states nothing. */
export function statementAt(
  { gap, siteClasses, modulation }: Parameters,
  place: ParameterPlace,
): StatementAt | undefined {
  const siteClass = siteClasses.find(({ id }) => id === place.siteClass);
  const binding = siteClass?.binding.find(({ ligand }) => ligand === place.ligand);
  switch (place.parameter) {
    case 'gap':
      return gap;
    case 'gapPerSite':
      return siteClass?.gapPerSite;
    case 'sites':
      return siteClass?.sites;
    case 'inactive':
      return binding?.inactive ?? undefined;
    case 'active':
      return binding?.active ?? undefined;
    case 'slope':
      return modulation?.find(({ modulator }) => modulator === place.modulator)?.slope;
  }
}

function statedWords(place: ParameterPlace, { series }: DatasetDocument): string {
  const all = series.flatMap(({ parameters }) => statementAt(parameters, place) ?? []);
  const written = all.map((one) => {
    const unit = one.unit ? unitLabel(one.unit) : '';
    const ratio = one.unit === 'ratio' ? 'ratio ' : '';
    return `${ratio}${formatQuantity(one.value, one.u, unit)}`;
  });
  const different = new Set(written).size;
  return different === 1 ? written[0] : `${different} different values in ${all.length} series`;
}
