/** What a reader has to know of a series before trusting its figures, in sentences. */
import type { Note } from './assessment';
import { POLICY } from './flags';
import type { DatasetInput, ParametersInput, SeriesInput } from './inputs';
import type { MeasuredActivity } from './measured-activity';
import { convertConcentration } from './units';

/** Share of the ligand that the protein may bind before a total concentration misleads. */
const DEPLETION_SHARE = 0.1;

/** Notes on a series: circularity, unstated correlations, assumed uncertainties, no freedom left, depletion. */
export function notesOn(dataset: DatasetInput, series: SeriesInput, measured: MeasuredActivity): Note[] {
  return [
    ...noteCircularity(series),
    ...noteCorrelations(series.parameters),
    ...noteAssumedUncertainty(measured),
    ...noteDepletion(dataset, series),
  ];
}

function noteCircularity({ parameters, points }: SeriesInput): Note[] {
  if (parameters.origin !== 'fitted-here') return [];
  const notes: Note[] = [
    {
      code: 'circular',
      detail: 'The parameters were fitted to these very points: that they lie on the curve is no test of it.',
    },
  ];
  const fitted = parameters.fittedCount ?? 0;
  if (points.length <= fitted) {
    notes.push({
      code: 'no-degrees-of-freedom',
      detail: `${counted(fitted, 'parameter was', 'parameters were')} fitted to ${counted(points.length, 'point', 'points')}: nothing is left to test.`,
    });
  }
  return notes;
}

function noteCorrelations({ origin, correlations }: ParametersInput): Note[] {
  if (origin === 'independent' || (correlations && correlations.length > 0)) return [];
  return [
    {
      code: 'correlations-not-stated',
      detail:
        'The parameters come from a fit, and its correlations are not stated: the uncertainty of the expected activity may be several times too large or too small.',
    },
  ];
}

function noteAssumedUncertainty({ uncertainty }: MeasuredActivity): Note[] {
  const points = [...uncertainty.keys()].filter((i) => uncertainty[i] === 'assumed');
  if (points.length === 0) return [];
  return [
    {
      code: 'assumed-uncertainty',
      detail: `${counted(points.length, 'point states', 'points state')} neither an uncertainty nor replicates: ${POLICY.assumedActivityU} is assumed, and the series gets no p.`,
      points,
    },
  ];
}

function noteDepletion(dataset: DatasetInput, series: SeriesInput): Note[] {
  const protein = dataset.assay?.proteinConcentration;
  if (!protein) return [];
  return dataset.ligands.flatMap((ligand) => {
    if (ligand.concentration !== 'total') return [];
    const proteinInLigandUnit = convertConcentration(protein.value, protein.unit, ligand.unit);
    if (proteinInLigandUnit === null) return [];
    const capacity = proteinInLigandUnit * sitesFor(series.parameters, ligand.id);
    const points = [...series.points.keys()].filter((i) => {
      const total = series.points[i].ligands[ligand.id] ?? 0;
      return total > 0 && capacity > DEPLETION_SHARE * total;
    });
    if (points.length === 0) return [];
    return [
      {
        code: 'depletion' as const,
        detail: `At ${counted(points.length, 'point', 'points')} the protein could bind more than a tenth of ${ligand.name ?? ligand.id}, whose total concentration is stated: the energy is computed from a concentration that the protein itself has lowered.`,
        points,
      },
    ];
  });
}

function sitesFor(parameters: ParametersInput, ligand: string): number {
  return parameters.siteClasses
    .filter((siteClass) => siteClass.binding.some((binding) => binding.ligand === ligand))
    .reduce((sum, siteClass) => sum + siteClass.sites.value, 0);
}

function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}
