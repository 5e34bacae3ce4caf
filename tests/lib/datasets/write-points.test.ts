import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import type { LoadedPoints } from '@/lib/datasets/load-points';
import { writePoints } from '@/lib/datasets/write-points';
import { assess } from '@/lib/engine/assess';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { exampleDocument } from '@/tests/support/example-document';

function loaded(change: (document: DatasetDocument) => void = () => undefined): LoadedPoints {
  const document = exampleDocument({ series: 2, pointsPerSeries: 5 }) as unknown as DatasetDocument;
  change(document);
  const points = assess(document).series.flatMap(({ id, points }) =>
    points.map((point) => ({ series: id, ligands: {}, modulators: {}, ...point })),
  );
  const units = { energy: 'kT' as const, ligands: { velline: 'uM' }, modulators: {} };
  const answer = { accession: 'CK-000001.1', revision: 1, note: null, units, points };
  return { answer, document, accession: 'CK-000001.1' };
}

function readCsv(text: string): Record<string, string>[] {
  const { data, errors } = Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true });
  expect(errors).toEqual([]);
  return data;
}

describe('computed points as a file', () => {
  it('CSV gives back the very same numbers', () => {
    const given = loaded();
    const rows = readCsv(writePoints(given, 'csv'));
    expect(rows).toHaveLength(10);
    given.answer.points.forEach((point, i) => {
      expect(rows[i].series).toBe(point.series);
      expect(Number(rows[i].point)).toBe((i % 5) + 1);
      expect(Number(rows[i].index)).toBe(i % 5);
      expect(Number(rows[i].energy_kT)).toBe(point.energy);
      expect(Number(rows[i].residual)).toBe(point.residual);
      expect(Number(rows[i].p)).toBe(point.pValue);
      expect(Number(rows[i].q)).toBe(point.q);
      expect(rows[i].flag).toBe(point.flag);
    });
  });

  it.each([
    ...['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\r=1', '\n=1+1', '\nx', '  =1+1', '＝1+1'],
    '=HYPERLINK("x","y")\nz',
  ])('CSV: the text %j runs in no spreadsheet, and numbers stay numbers', (text) => {
    const csv = writePoints(
      loaded((document) => {
        document.series[0].label = text;
        document.series[0].variant = `${text}, "quoted"`;
      }),
      'csv',
    );
    const [first] = readCsv(csv);
    expect(first.label).toBe(`'${text}`);
    expect(first.variant).toBe(`'${text}, "quoted"`);
    const negative = readCsv(csv).filter(({ residual }) => residual.startsWith('-'));
    expect(negative.length).toBeGreaterThan(0);
  });

  it('NDJSON has one point a line, JSON the same points', () => {
    const given = loaded();
    const lines = writePoints(given, 'ndjson').trimEnd().split('\n');
    const { points } = JSON.parse(writePoints(given, 'json'));
    expect(points).toEqual(given.answer.points);
    expect(lines.map((line) => JSON.parse(line))).toEqual(
      given.answer.points.map((point) => ({ accession: 'CK-000001.1', ...point })),
    );
  });

  it('invented data say so on every line', () => {
    const given = loaded();
    given.answer.note = 'Invented.';
    expect(readCsv(writePoints(given, 'csv')).map(({ note }) => note)).toEqual(Array(10).fill('Invented.'));
    for (const line of writePoints(given, 'ndjson').trimEnd().split('\n'))
      expect(JSON.parse(line).note).toBe('Invented.');
    expect(JSON.parse(writePoints(given, 'json')).note).toBe('Invented.');
  });
});
