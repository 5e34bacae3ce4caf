/** What a reader has to know of a series before trusting its figures, in sentences. */
import type { Note } from './assessment';
import { noteDepletion } from './depletion-note';
import { POLICY } from './flags';
import type { DatasetInput, ParametersInput, SeriesInput } from './inputs';
import { noteNormalisation } from './normalisation-note';
import type { PointTable } from './point-table';
import { counted } from './sentence-words';

/** Beyond this u_r an activity may be 0.4 off the curve, nearly half of its range, and still be within 2 u_r. */
const WIDE_RESIDUAL_U = 0.2;

/**
 * Notes on a series: circularity, unstated correlations, assumed or very wide uncertainties, no freedom left,
 * normalisation, depletion.
 */
export function notesOn(dataset: DatasetInput, series: SeriesInput, table: PointTable): Note[] {
  return [
    ...noteCircularity(series),
    ...noteCorrelations(series.parameters),
    ...noteAssumedUncertainty(table),
    ...noteWideUncertainty(table),
    ...noteNormalisation(dataset, table),
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

function noteAssumedUncertainty({ uncertainty }: PointTable): Note[] {
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

/** Where at least half of the points could hardly have missed, that they lie on the curve says little. */
function noteWideUncertainty({ residualU, count }: PointTable): Note[] {
  const points = [...residualU.keys()].filter((i) => residualU[i] > WIDE_RESIDUAL_U);
  if (points.length === 0 || 2 * points.length < count) return [];
  return [
    {
      code: 'uncertainty-too-wide',
      detail: `At ${points.length} of ${counted(count, 'point', 'points')} the uncertainty of the residual is above ${WIDE_RESIDUAL_U}: an activity ${2 * WIDE_RESIDUAL_U} off the curve would still pass there, so these points hardly test it.`,
      points,
    },
  ];
}
