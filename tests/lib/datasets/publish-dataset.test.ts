import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { selectNewestRevision } from '@/db/queries/revisions';
import { datasetSeries, datasets, densityCells, offCurvePoints } from '@/db/tables/datasets';
import { acceptDeposit } from '@/lib/curation/accept-deposit';
import { encodeDataset } from '@/lib/datasets/encode-dataset';
import { publishDataset } from '@/lib/datasets/publish-dataset';
import { parseDocument } from '@/lib/documents/parse-document';
import { assess } from '@/lib/engine/assess';
import type { Assessment } from '@/lib/engine/assessment';
import { makeDeposit, worked } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';
import { exampleDocument } from '@/tests/support/example-document';

const { cast } = collectionForTests();

/** Reads a column as any reader outside would: eight bytes a number, the lowest first. */
function decoded(column: Buffer): number[] {
  const view = new DataView(column.buffer, column.byteOffset, column.byteLength);
  return Array.from({ length: column.byteLength / 8 }, (_, i) => view.getFloat64(8 * i, true));
}

async function published(
  document: unknown,
): Promise<{ accession: number; id: string; assessment: Assessment }> {
  const id = await makeDeposit(cast, 'submitted', document);
  const { accession } = worked(await acceptDeposit({ actor: cast.curator, id }));
  const revision = await selectNewestRevision(await readDatabase(), id);
  return {
    accession: accession ?? Number.NaN,
    id,
    assessment: JSON.parse(revision?.assessment ?? '') as Assessment,
  };
}

const rowsOf = async (accession: number) => {
  const database = await readDatabase();
  return {
    dataset: (await database.select().from(datasets).where(eq(datasets.accession, accession)))[0],
    series: await database
      .select()
      .from(datasetSeries)
      .where(eq(datasetSeries.accession, accession))
      .orderBy(datasetSeries.position),
    cells: await database.select().from(densityCells).where(eq(densityCells.accession, accession)),
    offCurve: await database.select().from(offCurvePoints).where(eq(offCurvePoints.accession, accession)),
  };
};

describe('a published dataset', { timeout: 60_000 }, () => {
  it('holds the numbers of the assessment to the last bit', async () => {
    const { accession, assessment } = await published(
      exampleDocument({ series: 7, pointsPerSeries: 40, seed: 3 }),
    );
    const { series } = await rowsOf(accession);
    expect(series).toHaveLength(7);
    for (const [i, assessed] of assessment.series.entries()) {
      const row = series[i];
      if (!row) throw new Error(`no series ${i}`);
      expect(row).toMatchObject({
        seriesId: assessed.id,
        points: 40,
        rmsZ: assessed.rmsZ,
        pValue: assessed.pValue,
      });
      const columns = { ...row, pValue: row.p } as Record<string, unknown>;
      for (const quantity of [
        'energy',
        'energyU',
        'activity',
        'activityU',
        'expected',
        'expectedU',
        'residualU',
        'z',
        'pValue',
        'q',
      ] as const) {
        expect(decoded(columns[quantity] as Buffer)).toEqual(assessed.points.map((point) => point[quantity]));
      }
      const flags = ['on-curve', 'warning', 'off-curve'];
      expect([...row.flags].map((byte) => flags[byte])).toEqual(assessed.points.map(({ flag }) => flag));
    }
  });

  it('has a summary that says what the assessment says', async () => {
    const document = exampleDocument({ series: 3, pointsPerSeries: 20, seed: 5 });
    const { accession, id, assessment } = await published(document);
    const { dataset, series } = await rowsOf(accession);
    const { points, onCurve, warning, offCurve, rmsZ, pValue } = assessment.summary;
    expect(dataset).toMatchObject({
      depositId: id,
      labId: cast.lab.labId,
      revision: 1,
      title: document.title,
    });
    expect(dataset).toMatchObject({ points, onCurve, warning, offCurve, rmsZ, pValue, fittedHere: false });
    expect(dataset).toMatchObject({ system: 'alrq-velline', licence: 'CC0-1.0', ligands: ['velline'] });
    const energies = assessment.series.flatMap((one) => one.points.map(({ energy }) => energy));
    expect(dataset?.lowestEnergy).toBe(Math.min(...energies));
    expect(dataset?.highestEnergy).toBe(Math.max(...energies));
    const sum = (flag: 'onCurve' | 'warning' | 'offCurve') =>
      series.reduce((total, row) => total + row[flag], 0);
    expect([sum('onCurve'), sum('warning'), sum('offCurve')]).toEqual([onCurve, warning, offCurve]);
  });

  it('has every point in one cell, and each point off the curve by itself', async () => {
    const { accession, assessment } = await published(
      exampleDocument({ series: 3, pointsPerSeries: 60, seed: 7 }),
    );
    const { cells, offCurve } = await rowsOf(accession);
    for (const [position, { points }] of assessment.series.entries()) {
      for (const { energy, activity, flag } of points) {
        const inCell = cells.filter(
          (cell) =>
            cell.position === position &&
            cell.flag === flag &&
            cell.energyCell === Math.floor(energy / 0.1) &&
            cell.activityCell === Math.floor(activity / 0.01),
        );
        expect(inCell).toHaveLength(1);
      }
      const expected = points
        .filter(({ flag }) => flag === 'off-curve')
        .map(({ index: point, energy, activity, expected, z }) => ({
          accession,
          position,
          point,
          energy,
          activity,
          expected,
          z,
        }));
      expect(offCurve.filter((row) => row.position === position)).toEqual(expected);
    }
    expect(cells.reduce((total, cell) => total + cell.points, 0)).toBe(180);
    // Else the comparison above would be of nothing.
    expect(offCurve.length).toBeGreaterThan(5);
  });

  it('has names that the database gives back whole', async () => {
    const document = { ...exampleDocument(), title: 'Before\u0000after' };
    const [series] = document.series as { label: string; variant: string }[];
    Object.assign(series, { label: 'wild\u0000type', variant: 'W\u0001T' });
    const { accession } = await published(document);
    const { dataset, series: rows } = await rowsOf(accession);
    expect(dataset?.title).toBe('Before after');
    expect(rows).toMatchObject([{ label: 'wild type', variant: 'W T' }]);
    expect(JSON.parse(dataset?.strip ?? '').energy).toHaveLength(2);
  });

  it('of 20,000 points is written within a second or two', async () => {
    const document = exampleDocument({ series: 200, pointsPerSeries: 100, seed: 9 });
    const parsed = parseDocument(JSON.stringify(document));
    if (!parsed.ok) throw new Error('not valid');
    const assessment = assess(parsed.document);
    const id = await makeDeposit(cast);
    const started = performance.now();
    const encoded = encodeDataset(parsed.document, assessment);
    const one = {
      accession: 900_000,
      depositId: id,
      labId: cast.lab.labId,
      revision: 1,
      publishedAt: 1,
      encoded,
    };
    await write('acknowledged', (tx) => publishDataset(tx, one));
    const elapsed = performance.now() - started;
    const { cells, offCurve, dataset } = await rowsOf(900_000);
    expect(cells.reduce((total, cell) => total + cell.points, 0)).toBe(20_000);
    expect(offCurve).toHaveLength(assessment.summary.offCurve);
    expect(dataset?.points).toBe(20_000);
    // Half a second alone on the machine; the rest is for a loaded one.
    expect(elapsed).toBeLessThan(5_000);
  });

  it('of 20,000 points off the curve does not hold up the loop', async () => {
    const offCurve = Array.from({ length: 20_000 }, (_, point) => ({
      ...{ position: 0, point, energy: Math.sin(point) * 9, activity: Math.cos(point) },
      ...{ expected: 1 / (point + 1), z: -Math.exp(point / 2_000) * 1.1 },
    }));
    const parsed = parseDocument(JSON.stringify(exampleDocument()));
    if (!parsed.ok) throw new Error('not valid');
    const encoded = { ...encodeDataset(parsed.document, assess(parsed.document)), offCurve };
    const depositId = await makeDeposit(cast);
    const one = {
      accession: 900_001,
      depositId,
      labId: cast.lab.labId,
      revision: 1,
      publishedAt: 1,
      encoded,
    };
    let turns = 0;
    const ticking = setInterval(() => {
      turns += 1;
    }, 1);
    const statements = await write('acknowledged', async (tx) => {
      turns = 0;
      await publishDataset(tx, one);
      return turns;
    });
    clearInterval(ticking);
    expect(statements).toBeGreaterThan(2);
    const { offCurve: kept } = await rowsOf(900_001);
    const plain = kept.sort((a, b) => a.point - b.point).map(({ accession: _, ...row }) => row);
    expect(plain).toEqual(offCurve);
  });

  it('gives way to its next revision and keeps the date of its first publication', async () => {
    const { accession, id } = await published(exampleDocument({ series: 2, pointsPerSeries: 30 }));
    const before = (await rowsOf(accession)).dataset;
    const parsed = parseDocument(JSON.stringify({ ...exampleDocument(), title: 'Revised' }));
    if (!parsed.ok) throw new Error('not valid');
    const encoded = encodeDataset(parsed.document, assess(parsed.document));
    const publishedAt = (before?.publishedAt ?? 0) + 1000;
    const next = { accession, depositId: id, labId: cast.lab.labId, revision: 2, publishedAt, encoded };
    await write('acknowledged', (tx) => publishDataset(tx, next));
    const { dataset, series, cells } = await rowsOf(accession);
    expect(dataset).toMatchObject({ title: 'Revised', revision: 2, points: 2, updatedAt: publishedAt });
    expect(dataset?.publishedAt).toBe(before?.publishedAt);
    expect(series).toHaveLength(1);
    expect(cells.reduce((total, cell) => total + cell.points, 0)).toBe(2);
  });
});
