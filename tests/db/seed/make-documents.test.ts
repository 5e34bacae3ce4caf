/** The scenario is what it claims to be: valid, large enough, varied, and right and wrong where it is meant to be. */
import { describe, expect, it } from 'vitest';
import { INVENTED } from '@/db/seed/laboratories';
import { makeDeposits } from '@/db/seed/make-deposits';
import { makeDocuments } from '@/db/seed/make-documents';
import { checkDocument } from '@/lib/documents/check-document';
import { statedQuantities } from '@/lib/documents/stated-quantities';
import { assess } from '@/lib/engine/assess';

const made = makeDocuments();
const assessed = made.map(({ recipe, document }) => ({ recipe, document, assessment: assess(document) }));
const right = assessed.filter(
  ({ recipe }) =>
    recipe.offsetKT === undefined && recipe.series.every(({ mistake }) => mistake === undefined),
);
const seriesOf = (of: typeof assessed) =>
  of.flatMap(({ recipe, assessment }) =>
    assessment.series.map((series, i) => ({ ...series, recipe, mistake: recipe.series[i].mistake })),
  );

describe('the scenario', () => {
  it('has at least 24 datasets of five laboratories and four systems, with 3,000 points', () => {
    expect(made.length).toBeGreaterThanOrEqual(24);
    expect(new Set(made.map(({ recipe }) => recipe.lab)).size).toBeGreaterThanOrEqual(5);
    expect(new Set(made.map(({ recipe }) => recipe.system)).size).toBe(4);
    const points = assessed.reduce((sum, { assessment }) => sum + assessment.summary.points, 0);
    expect(points).toBeGreaterThanOrEqual(3000);
  });

  it.each(made.map(({ document }) => [document.title, document]))(
    '%s is valid and says so',
    (_, document) => {
      expect(checkDocument(document)).toMatchObject({ ok: true });
      expect(document.abstract.startsWith(INVENTED)).toBe(true);
    },
  );

  it('is the same for the same seed and another for another', () => {
    expect(JSON.stringify(makeDocuments())).toBe(JSON.stringify(made));
    expect(JSON.stringify(makeDocuments(2))).not.toBe(JSON.stringify(made));
  });

  it('holds every kind of statement, unit and orientation', () => {
    const text = JSON.stringify(made.map(({ document }) => document));
    const quantities = made.flatMap(({ document }) =>
      document.series.flatMap(({ parameters }) => statedQuantities(parameters)),
    );
    const has = (kind: string) =>
      quantities.filter((one) => one.kind === kind).map(({ statement }) => statement);
    const units = (kind: string) => new Set(has(kind).map(({ unit }) => unit));
    expect([...units('gap')].sort()).toEqual(['kJ/mol', 'kT', 'kcal/mol', 'meV', 'ratio']);
    expect(has('gap per site').length).toBeGreaterThan(0);
    expect([...new Set(has('gap').map(({ orientation }) => orientation))].sort()).toEqual([
      'active-minus-inactive',
      'active-over-inactive',
      'inactive-minus-active',
      'inactive-over-active',
    ]);
    for (const unit of ['M', 'mM', 'uM', 'nM', 'pM', 'Pa', 'mmHg'])
      expect(text).toContain(`"unit":"${unit}"`);
    for (const unit of ['K', 'degC']) expect(text).toContain(`"unit":"${unit}"`);
    for (const words of ['free', 'total', 'absolute', 'two-reference', 'series-min-max'])
      expect(text).toContain(`"${words}"`);
    for (const origin of ['independent', 'fitted-elsewhere', 'fitted-here'])
      expect(text).toContain(`"origin":"${origin}"`);
    for (const part of ['sharedAs', 'replicates', 'correlations', 'modulation', 'stockRelativeU', 'funding'])
      expect(text).toContain(`"${part}"`);
    const classes = made.flatMap(({ document }) =>
      document.series.map(({ parameters }) => parameters.siteClasses),
    );
    expect(classes.some((list) => list.length === 2)).toBe(true);
    expect(classes.flat().some(({ binding }) => binding.length === 2)).toBe(true);
  });

  it('collapses where nothing was planted: scores of one, and no more misses than chance gives', () => {
    expect(right.length).toBeGreaterThan(12);
    const rms = right.map(({ assessment }) => assessment.summary.rmsZ).sort((a, b) => a - b);
    const median = rms[Math.floor(rms.length / 2)];
    expect(median).toBeGreaterThan(0.8);
    expect(median).toBeLessThan(1.2);
    const total = (key: 'points' | 'warning' | 'offCurve') =>
      right.reduce((sum, { assessment }) => sum + assessment.summary[key], 0);
    const points = total('points');
    // Poisson: beyond four standard deviations of what chance gives, something else is at work.
    const near = (found: number, expected: number) =>
      expect(Math.abs(found - expected)).toBeLessThan(4 * Math.sqrt(expected));
    near(total('offCurve'), 0.0027 * points);
    near(total('warning'), 0.0428 * points);
    for (const { assessment, document } of right)
      expect(assessment.summary.pValue ?? 1, document.title).toBeGreaterThan(0.001);
  });

  it('rejects every series in which something was planted', () => {
    const planted = seriesOf(assessed).filter(({ mistake, recipe }) => mistake || recipe.offsetKT);
    const kinds = new Set(planted.flatMap(({ mistake }) => (mistake ? [mistake.kind] : [])));
    expect([...kinds].sort()).toEqual([
      'bad-points',
      'ceiling',
      'concentration-slip',
      'own-range',
      'reversed-gap',
    ]);
    for (const { id, recipe, mistake, pValue, points } of planted) {
      if (mistake?.kind === 'bad-points' && Object.keys(mistake.shifts).length === 0) continue;
      expect(pValue, `${recipe.title}, ${id}`).toBeLessThan(0.001);
      expect(
        points.some(({ flag }) => flag === 'off-curve'),
        `${recipe.title}, ${id}`,
      ).toBe(true);
    }
  });

  it('flags the very points that were planted, and those alone, where single ones are bad', () => {
    for (const { id, mistake, points, recipe } of seriesOf(assessed)) {
      if (mistake?.kind !== 'bad-points') continue;
      const bad = points.filter(({ flag }) => flag === 'off-curve').map(({ index }) => index);
      expect(bad, `${recipe.title}, ${id}`).toEqual(Object.keys(mistake.shifts).map(Number));
    }
  });

  it('has one laboratory that misses by the same energy in all its datasets', () => {
    const off = assessed.filter(({ recipe }) => recipe.offsetKT !== undefined);
    expect(new Set(off.map(({ recipe }) => recipe.lab))).toEqual(new Set(['quillan-institute']));
    expect(made.filter(({ recipe }) => recipe.lab === 'quillan-institute')).toHaveLength(off.length);
  });
});

describe('deposits on their way', () => {
  const deposits = makeDeposits();

  it('stand in every state that one can stay in', () => {
    const states = deposits.map(({ state }) => state);
    for (const state of ['draft', 'submitted', 'in-review', 'changes-requested', 'withdrawn'])
      expect(states).toContain(state);
  });

  it('are valid, but for one draft that has several things wrong', () => {
    const judged = deposits.map(({ document }) => checkDocument(document));
    const bad = judged.filter((one) => !one.ok);
    expect(bad).toHaveLength(1);
    expect(judged[0].ok).toBe(false);
    expect(bad[0].ok ? [] : bad[0].errors.map(({ pointer }) => pointer)).toEqual([
      '/system',
      '/series/0/points/2/u',
    ]);
    for (const { document } of deposits) expect(document.abstract.startsWith(INVENTED)).toBe(true);
  });
});
