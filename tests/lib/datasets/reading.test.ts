/**
 * Lists, counts, strips and overlay of the scenario, held against what follows from its documents' assessments by
 * looking at every point.
 */
import { beforeAll, describe, expect, it } from 'vitest';
import { write } from '@/db/client';
import { selectCollectionVersion } from '@/db/queries/datasets';
import { loadScenario } from '@/db/seed/load-scenario';
import { makeDocuments } from '@/db/seed/make-documents';
import { datasets } from '@/db/tables/datasets';
import { laboratories } from '@/db/tables/laboratories';
import { VISITOR } from '@/lib/auth/actor';
import { formatAccession } from '@/lib/datasets/accession';
import { listDatasets } from '@/lib/datasets/list-datasets';
import { loadDataset } from '@/lib/datasets/load-dataset';
import { loadOverlay } from '@/lib/datasets/load-overlay';
import { loadPoints } from '@/lib/datasets/load-points';
import { assess } from '@/lib/engine/assess';
import type { AssessedPoint } from '@/lib/engine/assessment';
import { loadLab } from '@/lib/labs/load-lab';
import { listSystems, loadSystem } from '@/lib/systems/list-systems';
import { datasetAnswerSchema, datasetListSchema, datasetPointsSchema } from '@/schemas/dataset-answers';
import { readDatasetFilters, readDatasetQuery } from '@/schemas/dataset-query';
import { overlaySchema } from '@/schemas/overlay';
import { systemListSchema } from '@/schemas/system';
import { worked } from '@/tests/support/collection';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();
beforeAll(loadScenario, 60_000);

const expected = makeDocuments().map(({ recipe, document }, i) => {
  const assessment = assess(document);
  return {
    recipe,
    document,
    assessment,
    accession: formatAccession(101 + i),
    points: assessment.series.flatMap(({ points }) => points),
  };
});
type Expected = (typeof expected)[number];

async function list(query: string) {
  const read = readDatasetQuery(new URLSearchParams(query));
  if (!read.ok) throw new Error(read.detail);
  return datasetListSchema.parse(worked(await listDatasets(VISITOR, read.query)).list);
}

async function overlay(query: string) {
  const read = readDatasetFilters(new URLSearchParams(query));
  if (!read.ok) throw new Error(read.detail);
  return overlaySchema.parse(worked(await loadOverlay(VISITOR, read.query)).overlay);
}

function countsOf(points: AssessedPoint[]) {
  const having = (flag: string) => points.filter((point) => point.flag === flag).length;
  return {
    points: points.length,
    onCurve: having('on-curve'),
    warning: having('warning'),
    offCurve: having('off-curve'),
  };
}

const inside = (from: number, to: number) => (point: AssessedPoint) =>
  point.energy >= from && point.energy < to;

const CASES: [string, (one: Expected) => boolean, [number, number]?][] = [
  ['', () => true],
  ['system=merv-halide', ({ recipe }) => recipe.system === 'merv-halide'],
  ['lab=sunder-lab&lab=quillan-institute', ({ recipe }) => /sunder|quillan/.test(recipe.lab)],
  ['ligand=CESSATE', ({ document }) => document.ligands.some(({ id }) => id === 'cessate')],
  ['variant=r41k', ({ document }) => document.series.some(({ variant }) => variant === 'R41K')],
  ['flag=off-curve', ({ points }) => points.some(({ flag }) => flag === 'off-curve')],
  ['from=-1&to=0.5', ({ points }) => points.some(inside(-1, 0.5)), [-1, 0.5]],
  [
    'from=4&to=6&flag=warning&flag=off-curve',
    ({ points }) => points.filter(inside(4, 6)).some(({ flag }) => flag !== 'on-curve'),
    [4, 6],
  ],
  ['q=RING+quillan', ({ recipe }) => /ring/i.test(recipe.title) && recipe.lab === 'quillan-institute'],
  ['q=ck-000117', ({ accession }) => accession === 'CK-000117'],
  ['q=K66E', ({ document }) => document.series.some(({ variant }) => variant === 'K66E')],
  ['q=100%25', () => false],
  ['system=nothing', () => false],
];

describe.each(CASES)('the selection “%s”', (query, isSelected, window) => {
  const [from, to] = window ?? [-1e9, 1e9];
  const selected = expected.filter(isSelected);
  const points = selected.flatMap((one) => one.points.filter(inside(from, to)));

  it('lists those datasets, the newest first, with their counts', async () => {
    const { datasets, total } = await list(query);
    expect(datasets.map(({ accession }) => accession)).toEqual(
      selected.map(({ accession }) => accession).reverse(),
    );
    expect(total).toEqual({ datasets: selected.length, ...countsOf(points) });
    for (const item of datasets) {
      const one = expected.find(({ accession }) => accession === item.accession);
      if (!one) throw new Error(`${item.accession} was never published.`);
      const own = one.points.filter(inside(from, to));
      expect(item.counts).toEqual(countsOf(own));
      expect(item.rmsZ).toBe(one.assessment.summary.rmsZ);
      expect(item.pValue).toBe(one.assessment.summary.pValue);
      const energies = own.map(({ energy }) => Number(energy.toFixed(4))).sort((a, b) => a - b);
      expect(item.strip.energy).toEqual(energies);
    }
  });

  it('draws those points', async () => {
    const { cells, counts, points: single, offCurve, datasets } = await overlay(query);
    expect(counts).toEqual({ datasets: selected.length, ...countsOf(points) });
    expect(cells.points.reduce((sum, number) => sum + number, 0)).toBe(points.length);
    const keys = cells.points.map(
      (_, i) => `${cells.energyCell[i]} ${cells.activityCell[i]} ${cells.flag[i]}`,
    );
    expect(new Set(keys).size).toBe(keys.length);
    if (single === null) throw new Error('There are few enough points.');
    const drawn = single.energy.map((energy, i) => {
      const one = expected.find(({ accession }) => accession === datasets[single.dataset[i]].accession);
      const point = one?.assessment.series[single.series[i]].points[single.point[i]];
      expect(point).toMatchObject({
        ...{ energy, activity: single.activity[i], expected: single.expected[i] },
        ...{ z: single.z[i], flag: single.flag[i] },
      });
      return point;
    });
    expect(new Set(drawn).size).toBe(points.length);
    expect(offCurve.total).toBe(countsOf(points).offCurve);
    expect(offCurve.shown).toBe(offCurve.total);
    const misses = offCurve.points.z.map(Math.abs);
    expect(misses).toEqual([...misses].sort((a, b) => b - a));
  });
});

describe('choices', () => {
  it('count datasets under the other filters', async () => {
    const { facets } = await list('system=alrq-velline&flag=off-curve');
    const off = expected.filter(({ points }) => points.some(({ flag }) => flag === 'off-curve'));
    const count = (of: Expected[], system: string) =>
      of.filter(({ recipe }) => recipe.system === system).length;
    for (const { value, datasets } of facets.system) expect(datasets, value).toBe(count(off, value));
    const flags = Object.fromEntries(facets.flag.map(({ value, datasets }) => [value, datasets]));
    expect(flags['off-curve']).toBe(count(off, 'alrq-velline'));
    expect(flags['on-curve']).toBe(count(expected, 'alrq-velline'));
    const labs = facets.lab.reduce((sum, { datasets }) => sum + datasets, 0);
    expect(labs).toBe(count(off, 'alrq-velline'));
    expect(facets.ligand).toEqual([{ value: 'velline', name: 'velline', datasets: labs }]);
  });
});

describe('pages', () => {
  it('follow one another to the end, each dataset once', async () => {
    const seen: string[] = [];
    let query: string | null = 'limit=7&lab=halvorn-biophysics&lab=sunder-lab&lab=ostrel-enzymology';
    while (query !== null) {
      const page = await list(query);
      seen.push(...page.datasets.map(({ accession }) => accession));
      query = page.next && new URL(page.next, 'http://localhost').search;
    }
    const labs = /halvorn|sunder|ostrel/;
    expect(seen).toEqual(
      expected
        .filter(({ recipe }) => labs.test(recipe.lab))
        .map(({ accession }) => accession)
        .reverse(),
    );
  });

  it('refuse a cursor of another list', async () => {
    const cursor = Buffer.from('["a","b"]').toString('base64url');
    const read = readDatasetQuery(new URLSearchParams({ cursor }));
    if (!read.ok) throw new Error(read.detail);
    expect(await listDatasets(VISITOR, read.query)).toMatchObject({ failure: { code: 'bad-parameter' } });
  });
});

describe('one dataset', () => {
  it('has its document, assessment, citation and links', async () => {
    const [first] = expected;
    const { dataset } = worked(await loadDataset(VISITOR, first.accession));
    expect(datasetAnswerSchema.parse(dataset)).toMatchObject({ newest: true, revision: 1 });
    expect(dataset.document).toEqual(first.document);
    expect(dataset.assessment.summary).toEqual(first.assessment.summary);
    expect(dataset.series.map(({ counts }) => counts)).toEqual(
      first.assessment.series.map(({ points }) => countsOf(points)),
    );
    expect(dataset.note).toMatch(/^Invented/);
    expect(dataset.citation.text).toContain(`${first.accession}.1`);
  });

  it('has the points of its assessment, with what was measured', async () => {
    for (const one of expected.slice(5, 9)) {
      const { answer } = worked(await loadPoints(VISITOR, one.accession)).loaded;
      expect(datasetPointsSchema.parse(answer)).toEqual(answer);
      expect(answer.points).toEqual(
        one.assessment.series.flatMap(({ id, points }, i) =>
          points.map((point, j) => ({
            series: id,
            modulators: {},
            ...one.document.series[i].points[j],
            ...point,
            u: undefined,
            replicates: undefined,
          })),
        ),
      );
    }
  });

  it('keeps its older revision under its own accession', async () => {
    const revised = expected.find(({ recipe }) => recipe.revised !== undefined);
    if (!revised) throw new Error('No dataset of the scenario was revised.');
    const newest = worked(await loadDataset(VISITOR, revised.accession)).dataset;
    expect([newest.revision, newest.newest, newest.revisions.length]).toEqual([2, true, 2]);
    const first = worked(await loadDataset(VISITOR, `${revised.accession}.1`)).dataset;
    expect([first.revision, first.newest]).toEqual([1, false]);
    expect(first.document.series).toHaveLength(newest.document.series.length - 2);
    const { answer } = worked(await loadPoints(VISITOR, `${revised.accession}.1`)).loaded;
    expect(answer.points.length).toBe(first.assessment.summary.points);
  });

  it.each([
    ['CK-000100', 'withdrawn'],
    ['CK-000100.1', 'withdrawn'],
    ['CK-000101.9', 'not-found'],
    ['CK-009999', 'not-found'],
    ['nonsense', 'not-found'],
  ])('%s: %s', async (accession, code) => {
    for (const outcome of [await loadDataset(VISITOR, accession), await loadPoints(VISITOR, accession)])
      expect(outcome).toMatchObject({ ok: false, failure: { code } });
  });

  it('leaves a tombstone where it was withdrawn', async () => {
    expect(await loadDataset(VISITOR, 'CK-000100')).toMatchObject({
      tombstone: { accession: 'CK-000100', withdrawnAt: '2026-04-15T10:00:00.000Z' },
    });
  });
});

describe('a choice that fits nothing any more', () => {
  it('keeps its name', async () => {
    const { facets } = await list('lab=quillan-institute&system=farx-adenol-cessate&ligand=velline');
    const of = (choices: typeof facets.lab, slug: string) => choices.find(({ value }) => value === slug);
    expect(of(facets.lab, 'quillan-institute')).toEqual({
      ...{ value: 'quillan-institute', name: 'Quillan Institute', datasets: 0 },
    });
    expect(of(facets.system, 'farx-adenol-cessate')).toMatchObject({
      ...{ name: 'FarX · adenol, cessate', datasets: 0 },
    });
    expect(of((await list('lab=nobody')).facets.lab, 'nobody')).toBeUndefined();
  });
});

describe('systems and laboratories', () => {
  it('say what is published on or by them', async () => {
    const { list: all } = worked(await listSystems(VISITOR, { limit: 50, cursor: null }));
    expect(systemListSchema.parse(all).systems).toHaveLength(4);
    for (const { slug, datasets, counts } of all.systems) {
      const own = expected.filter(({ recipe }) => recipe.system === slug);
      expect(datasets).toBe(own.length);
      expect(counts).toEqual(countsOf(own.flatMap(({ points }) => points)));
    }
    const { lab } = worked(await loadLab(VISITOR, 'quillan-institute'));
    expect(lab).toMatchObject({ name: 'Quillan Institute', datasets: 3 });
    expect(await loadLab(VISITOR, 'nobody')).toMatchObject({ failure: { code: 'not-found' } });
    expect(await loadSystem(VISITOR, 'nothing')).toMatchObject({ failure: { code: 'not-found' } });
  });

  it('come page by page', async () => {
    const { list: first } = worked(await listSystems(VISITOR, { limit: 3, cursor: null }));
    const cursor = new URL(first.next ?? '', 'http://localhost').searchParams.get('cursor');
    const { list: second } = worked(await listSystems(VISITOR, { limit: 3, cursor }));
    const names = [...first.systems, ...second.systems].map(({ name }) => name);
    expect(names).toEqual([...names].sort());
    expect(new Set(names).size).toBe(4);
    expect(second.next).toBeNull();
  });
});

describe('strips', () => {
  it('are those that were drawn at publication, and drawn anew where none was kept', async () => {
    const kept = await list('');
    await write('acknowledged', async (tx) => {
      await tx.update(datasets).set({ strip: null });
    });
    expect(await list('')).toEqual(kept);
    const mark = { energy: [1], z: [0], flag: ['on-curve' as const] };
    await write('acknowledged', async (tx) => {
      await tx.update(datasets).set({ strip: JSON.stringify(mark) });
    });
    expect((await list('')).datasets.map(({ strip }) => strip)).toEqual(kept.datasets.map(() => mark));
    // A window cuts strips; those are drawn from the numbers.
    expect((await list('from=0&to=4')).datasets.map(({ strip }) => strip)).not.toContainEqual(mark);
    await write('acknowledged', async (tx) => {
      await tx.update(datasets).set({ strip: null });
    });
  });
});

describe('loading the scenario', () => {
  it('a second time changes nothing', async () => {
    const before = await list('');
    await loadScenario();
    expect(await list('')).toEqual(before);
  });

  it('the version of the collection changes with a name', async () => {
    const before = await selectCollectionVersion();
    await write('acknowledged', async (tx) => {
      await tx.update(laboratories).set({ name: 'Renamed (invented)' });
    });
    expect(await selectCollectionVersion()).not.toBe(before);
  });
});
