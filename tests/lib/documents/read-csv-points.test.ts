import { describe, expect, it } from 'vitest';
import { EXAMPLE_TABLE } from '@/lib/documents/examples/examples';
import { locateCsvRow } from '@/lib/documents/locate-csv-row';
import { readCsvPoints } from '@/lib/documents/read-csv-points';

const problemsOf = (text: string) => readCsvPoints(text).problems;
const firstPoint = (text: string) => readCsvPoints(text).series[0]?.points[0];

describe('a table of points', () => {
  it('gives series in the order in which they come, and the line of each point', () => {
    const table = readCsvPoints(
      'series,velline (uM),activity,u\nwild type,0,0.91,0.02\n\nT61A,1.5,0.8,\n  \nwild type,12.5,0.4,0.02\n',
    );
    expect(table).toEqual({
      series: [
        {
          id: 'wild-type',
          label: 'wild type',
          points: [
            { ligands: { velline: 0 }, activity: 0.91, u: 0.02 },
            { ligands: { velline: 12.5 }, activity: 0.4, u: 0.02 },
          ],
          lines: [2, 6],
        },
        { id: 'T61A', label: 'T61A', points: [{ ligands: { velline: 1.5 }, activity: 0.8 }], lines: [4] },
      ],
      ligands: [{ id: 'velline', name: 'velline', unit: 'uM' }],
      modulators: [],
      problems: [],
    });
    expect(locateCsvRow(table, '/series/0/points/1/activity')).toBe(6);
    expect(locateCsvRow(table, '/series/1')).toBe(4);
    expect(locateCsvRow(table, '/series/1/parameters/gap')).toBe(null);
    expect(locateCsvRow(table, '/title')).toBe(null);
  });

  it.each([
    ['velline (uM)', 'velline', 'uM'],
    ['velline [µM]', 'velline', 'uM'],
    ['velline μM', 'velline', 'uM'],
    ['acid form (mmHg)', 'acid form', 'mmHg'],
  ])('takes the unit of a ligand from %s', (heading, name, unit) => {
    expect(readCsvPoints(`series,${heading},activity\na,1,0.5`)).toMatchObject({
      ligands: [{ name, unit }],
      problems: [],
    });
  });

  it('takes replicates and modulators', () => {
    const table = readCsvPoints(
      'Series\tocarate (mM)\tV (mV)\tReplicate 1\treplicate 2\treplicate 3\nwt\t1\t-40\t0,4\t\t0,5\n',
    );
    expect(table.modulators).toEqual([{ id: 'V', name: 'V', unit: 'mV' }]);
    expect(table.series[0]?.points).toEqual([
      { ligands: { ocarate: 1 }, modulators: { V: -40 }, replicates: [0.4, 0.5] },
    ]);
    expect(table.problems).toEqual([]);
  });

  it.each([
    ['semicolons and decimal commas', 'series;velline (uM);activity;u\r\nwt;12,5;0,41;2e-2\r\n'],
    ['tabs and decimal points', 'series\tvelline (uM)\tactivity\tu\nwt\t12.5\t0.41\t.02\n'],
    ['a byte order mark', '\uFEFFseries,velline (uM),activity,u\nwt,12.5,0.41,0.02'],
    ['quotation marks', '"series","velline (uM)","activity","u"\n"wt","12.5","+0.41","0.02"'],
    ['old line ends', 'series,velline (uM),activity,u\rwt,12.5,0.41,0.02\r'],
  ])('is read with %s', (_, text) => {
    expect(problemsOf(text)).toEqual([]);
    expect(firstPoint(text)).toEqual({ ligands: { velline: 12.5 }, activity: 0.41, u: 0.02 });
  });

  it('is read from bytes, and takes the minus sign of typesetters', () => {
    const bytes = new TextEncoder().encode('series,velline (µM),activity\nwt,1,−0.02');
    expect(readCsvPoints(bytes).series[0]?.points).toEqual([{ ligands: { velline: 1 }, activity: -0.02 }]);
  });

  it('keeps names apart that make the same id', () => {
    const table = readCsvPoints(
      'series,velline (uM),activity\nw t,1,0.1\nw-t,1,0.2\nconstructor,1,0.3\nμ,1,0.4',
    );
    expect(table.series.map(({ id }) => id)).toEqual(['w-t', 'w-t-2', 'xconstructor', 'x']);
  });

  it('is the example', () => {
    expect(readCsvPoints(EXAMPLE_TABLE).problems).toEqual([]);
  });
});

describe('what is wrong with a table', () => {
  const HEADINGS = 'series,velline (uM),activity,u,replicate 1,replicate 2';

  it.each<[string, number, number, string]>([
    ['wt,1,0,4l,,', 2, 4, '“4l” is not a number'],
    ['wt,1,0.4l,,,', 2, 3, '“0.4l” is not a number'],
    ['wt,1,"0,41",,,', 2, 3, '“0,41” is not a number; did you mean 0.41?'],
    ['wt,1e999,0.4,,,', 2, 2, '“1e999” is not a number'],
    [
      'wt,1,0.4,,,,7',
      2,
      7,
      'there is no heading above “7”; numbers with a decimal comma need another delimiter, such as a semicolon',
    ],
    [',1,0.4,,,', 2, 1, 'the name of the series must stand here'],
    ['wt,1,,,,', 2, 3, 'a measured activity must stand here'],
    ['wt,,0.4,,,', 2, 2, 'the concentration of velline must stand here; 0 where none was added'],
    ['wt,1,0.4,,0.4,0.5', 2, 3, 'a row takes an activity or replicates, not both'],
    ['wt,1,,,0.4,', 2, 5, 'two or more replicates must stand here; a single one is an activity'],
    ['wt,1,,0.1,0.4,0.5', 2, 4, 'u belongs to an activity; leave it empty beside replicates'],
    ['"w\nt",1,0.4,,,\nwt,x,0.4,,,', 4, 2, '“x” is not a number'],
  ])('%j', (row, line, column, detail) => {
    expect(problemsOf(`${HEADINGS}\n${row}`)).toEqual([{ line, column, detail }]);
  });

  it('every bad cell is told, and good rows are kept', () => {
    const table = readCsvPoints('series;velline (uM);activity\na;x;y\nb;1;0,5\nc;1.234,5;0,5');
    expect(table.problems.map(({ line, column }) => [line, column])).toEqual([
      [2, 2],
      [2, 3],
      [4, 2],
    ]);
    expect(table.series.map(({ label }) => label)).toEqual(['b']);
  });

  it.each<[string, number, string]>([
    ['velline (uM),activity', 1, 'a column series must name the series of each row'],
    [
      'series,activity',
      1,
      'a column for each ligand must have its name and unit as heading, such as velline (uM)',
    ],
    [
      'series,velline (uM)',
      1,
      'a column activity, or columns replicate 1, replicate 2, and so on, must hold what was measured',
    ],
    ['series,velline (uM),activity,sd', 4, '“sd” is no column that is known'],
    ['series,velline (um),x (uM),activity', 2, '“um” is no unit that is known; did you mean uM?'],
    ['series,velline (uM),activity,Activity', 4, 'the column “Activity” must stand once'],
  ])('the headings %s', (headings, column, detail) => {
    const [problem] = problemsOf(`${headings}\nwt,1,2`);
    expect(problem).toMatchObject({ line: 1, column });
    expect(problem?.detail).toContain(detail);
  });

  it('nothing at all, or headings alone', () => {
    expect(problemsOf('\n \n')).toMatchObject([
      { line: 1, detail: 'the text is empty; a line of headings must stand first' },
    ]);
    expect(problemsOf(`${HEADINGS}\n`)).toMatchObject([
      { detail: 'at least one row of points must follow the headings' },
    ]);
  });

  it('more points than a dataset takes', () => {
    const rows = 'wt,1,0.5,,,\n'.repeat(20_001);
    expect(problemsOf(`${HEADINGS}\n${rows}`)).toEqual([
      { line: 20_002, column: 1, detail: 'a dataset has at most 20,000 points; from here on there are more' },
    ]);
  });

  it('so much that only the first thousand are told', () => {
    const problems = problemsOf(`${HEADINGS}\n${'wt,x,0.5,,,\n'.repeat(1500)}`);
    expect(problems).toHaveLength(1001);
    expect(problems.at(-1)).toMatchObject({ line: 1002, detail: expect.stringContaining('more problems') });
  });
});
