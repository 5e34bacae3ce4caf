/** Notes on ligands whose total concentration is stated: the protein itself lowers what is free. */
import type { Note } from './assessment';
import type { DatasetInput, LigandInput, ParametersInput, SeriesInput } from './inputs';
import { counted } from './sentence-words';
import { convertConcentration } from './units';

/** Share of the ligand that the protein may bind before a total concentration misleads. */
const DEPLETION_SHARE = 0.1;

/** Points where the protein could bind more than a tenth of a ligand; or that this cannot be judged. */
export function noteDepletion(dataset: DatasetInput, series: SeriesInput): Note[] {
  return dataset.ligands.flatMap((ligand) => {
    const sites = sitesFor(series.parameters, ligand.id);
    if (ligand.concentration !== 'total' || sites === 0) return [];
    const protein = dataset.assay?.proteinConcentration;
    if (!protein) return noteUnknown(series, ligand);
    const inLigandUnit = convertConcentration(protein.value, protein.unit, ligand.unit);
    return inLigandUnit === null ? [] : noteDepleted(series, ligand, inLigandUnit * sites);
  });
}

/** @param capacity what the sites can bind, in the ligand's unit */
function noteDepleted(series: SeriesInput, ligand: LigandInput, capacity: number): Note[] {
  const points = [...series.points.keys()].filter((i) => {
    const total = series.points[i].ligands[ligand.id] ?? 0;
    return total > 0 && capacity > DEPLETION_SHARE * total;
  });
  if (points.length === 0) return [];
  return [
    {
      code: 'depletion',
      detail: `At ${counted(points.length, 'point', 'points')} the protein could bind more than a tenth of ${nameOf(ligand)}, whose total concentration is stated: the energy is computed from a concentration that the protein itself has lowered.`,
      points,
    },
  ];
}

function noteUnknown(series: SeriesInput, ligand: LigandInput): Note[] {
  if (!series.points.some(({ ligands }) => (ligands[ligand.id] ?? 0) > 0)) return [];
  return [
    {
      code: 'protein-concentration-not-stated',
      detail: `The total concentration of ${nameOf(ligand)} is stated, but not that of the protein: how much of the ligand the protein takes up cannot be judged.`,
    },
  ];
}

function sitesFor(parameters: ParametersInput, ligand: string): number {
  return parameters.siteClasses
    .filter((siteClass) => siteClass.binding.some((binding) => binding.ligand === ligand))
    .reduce((sum, siteClass) => sum + siteClass.sites.value, 0);
}

function nameOf({ id, name }: LigandInput): string {
  return name ?? id;
}
