import Papa from 'papaparse';
import type { Point } from '@/schemas/dataset-1.generated';
import { withThousands } from './describe-value';
import { makeId } from './make-id';
import { type CsvColumn, type CsvLigand, type CsvModulator, readCsvHeadings } from './read-csv-headings';
import { readCsvRow } from './read-csv-row';
import { readText } from './read-text';
import { MOST_POINTS } from './size-limits';

export interface CsvProblem {
  /** from 1 */
  line: number;
  /** number of the cell within its line, from 1 */
  column: number;
  detail: string;
}

export interface CsvSeries {
  id: string;
  label: string;
  points: Point[];
  /** the line of each point in the text, from 1 */
  lines: number[];
}

export interface CsvPoints {
  series: CsvSeries[];
  ligands: CsvLigand[];
  modulators: CsvModulator[];
  problems: CsvProblem[];
}

const MOST_PROBLEMS = 1000;

/**
 * Reads a table with one row a point: a column `series`, one column a ligand with its unit in the heading
 * (`velline (uM)`), `activity` and `u` or `replicate 1`, `replicate 2` …, and modulators (`V (mV)`).
 * The delimiter is comma, semicolon or tab; where it is not the comma, 0,41 means 0.41. Blank lines and a byte
 * order mark are passed over.
 *
 * @returns the series with their points; rows with a bad cell are left out and stand in `problems`
 */
export function readCsvPoints(source: string | Uint8Array): CsvPoints {
  const result: CsvPoints = { series: [], ligands: [], modulators: [], problems: [] };
  const read = readText(source);
  if (!read.ok) {
    result.problems.push({ line: read.line, column: read.column, detail: read.detail });
    return result;
  }
  const delimiter = findDelimiter(read.text);
  const lines = splitLines(read.text, delimiter);
  const [heading, ...rows] = lines;
  if (heading === undefined) {
    result.problems.push({
      line: 1,
      column: 1,
      detail: 'the text is empty; a line of headings must stand first',
    });
    return result;
  }
  const columns = readCsvHeadings(heading.cells, (column, detail) =>
    addProblem(result, { line: heading.line, column: Math.max(1, column), detail }),
  );
  result.ligands = columns.flatMap((column) => (column.holds === 'ligand' ? [column.ligand] : []));
  result.modulators = columns.flatMap((column) => (column.holds === 'modulator' ? [column.modulator] : []));
  if (result.problems.length === 0) readRows(rows, columns, delimiter !== ',', result);
  return result;
}

interface CsvLine {
  line: number;
  cells: string[];
}

/** The delimiter is what stands between the headings, which hold neither tabs nor semicolons themselves. */
function findDelimiter(text: string): string {
  const heading = (/[^\r\n]*\S[^\r\n]*/.exec(text)?.[0] ?? '').replace(/"[^"]*"/g, '');
  if (heading.includes('\t')) return '\t';
  return heading.includes(';') ? ';' : ',';
}

/** The lines that hold something, each with its number; a cell in quotation marks may hold line breaks. */
function splitLines(text: string, delimiter: string): CsvLine[] {
  let line = 1;
  const lines: CsvLine[] = [];
  for (const cells of Papa.parse<string[]>(text.replace(/\r\n?/g, '\n'), { delimiter, newline: '\n' }).data) {
    if (cells.some((cell) => cell.trim() !== '')) lines.push({ line, cells });
    line += 1 + cells.reduce((breaks, cell) => breaks + cell.split('\n').length - 1, 0);
  }
  return lines;
}

function readRows(rows: CsvLine[], columns: CsvColumn[], decimalComma: boolean, result: CsvPoints): void {
  const ids = new Set<string>();
  const byLabel = new Map<string, CsvSeries>();
  for (const { line, cells } of rows) {
    const read = readCsvRow(cells, columns, decimalComma, (column, detail) =>
      addProblem(result, { line, column, detail }),
    );
    if (read === null) continue;
    const known = byLabel.get(read.series);
    const series = known ?? { id: makeId(read.series, ids), label: read.series, points: [], lines: [] };
    if (known === undefined) {
      byLabel.set(read.series, series);
      result.series.push(series);
    }
    series.points.push(read.point);
    series.lines.push(line);
  }
  if (rows.length === 0)
    addProblem(result, { line: 2, column: 1, detail: 'at least one row of points must follow the headings' });
  if (rows.length > MOST_POINTS)
    addProblem(result, { line: rows[MOST_POINTS]?.line ?? 1, column: 1, detail: TOO_MANY_ROWS });
}

const TOO_MANY_ROWS = `a dataset has at most ${withThousands(MOST_POINTS)} points; from here on there are more`;

function addProblem({ problems }: CsvPoints, problem: CsvProblem): void {
  if (problems.length < MOST_PROBLEMS) problems.push(problem);
  else if (problems.length === MOST_PROBLEMS)
    problems.push({
      ...problem,
      detail: 'there are more problems from here on; mend the earlier ones first',
    });
}
