/** Computed points as a file: JSON, CSV or one JSON object a line. */
import Papa from 'papaparse';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { DatasetPoint } from '@/schemas/dataset-answers';
import type { LoadedPoints } from './load-points';

export const POINT_FORMATS = {
  json: { mediaType: 'application/json', contentType: 'application/json' },
  csv: { mediaType: 'text/csv', contentType: 'text/csv; charset=utf-8; header=present' },
  ndjson: { mediaType: 'application/x-ndjson', contentType: 'application/x-ndjson' },
} as const;

export type PointFormat = keyof typeof POINT_FORMATS;

/** The whole file. Numbers have full double precision: reading them back gives the same numbers. */
export function writePoints(loaded: LoadedPoints, format: PointFormat): string {
  const { answer, document } = loaded;
  if (format === 'json') return JSON.stringify(answer);
  if (format === 'ndjson') {
    const { accession, note } = answer;
    const lines = answer.points.map((point) =>
      JSON.stringify({ accession, ...point, ...(note ? { note } : {}) }),
    );
    return `${lines.join('\n')}\n`;
  }
  return writeCsv(loaded, document);
}

/**
 * A text that a spreadsheet would run: one that begins like a formula, behind whatever it passes over, in the signs of
 * East Asian keyboards as well. Numbers, negative ones too, stay numbers.
 */
const FORMULA = /^\s*[=+\-@\t\r\n＝＋－＠]/;

const NUMBERS = [
  ['energy_kT', 'energy'],
  ['energy_u_kT', 'energyU'],
  ['activity', 'activity'],
  ['activity_u', 'activityU'],
  ['expected', 'expected'],
  ['expected_u', 'expectedU'],
  ['residual', 'residual'],
  ['residual_u', 'residualU'],
  ['z', 'z'],
  ['p', 'pValue'],
  ['q', 'q'],
] as const satisfies readonly (readonly [string, keyof DatasetPoint])[];

function writeCsv({ answer }: LoadedPoints, document: DatasetDocument): string {
  const { ligands, modulators = [], series } = document;
  const names = new Map(series.map(({ id, label, variant }) => [id, { label, variant }]));
  const heading = [
    ...['accession', 'series', 'label', 'variant', 'point', 'index'],
    ...ligands.map(({ id, unit }) => `ligand ${id} (${unit})`),
    ...modulators.map(({ id, unit }) => `modulator ${id} (${unit})`),
    ...NUMBERS.map(([column]) => column),
    ...['flag', 'uncertainty', 'note'],
  ];
  const rows = answer.points.map((point) => [
    ...[answer.accession, point.series, names.get(point.series)?.label, names.get(point.series)?.variant],
    // Counted from 1 as on the page, and from 0 as in the document.
    ...[point.index + 1, point.index],
    ...ligands.map(({ id }) => point.ligands[id] ?? 0),
    // A modulator that was left out stands at its reference, which may differ from series to series.
    ...modulators.map(({ id }) => point.modulators[id] ?? ''),
    ...NUMBERS.map(([, key]) => point[key]),
    ...[point.flag, point.uncertainty, answer.note ?? ''],
  ]);
  return `${Papa.unparse([heading, ...rows], { escapeFormulae: FORMULA })}\r\n`;
}
