/** Measured activity, flags and notes. */
import { describe, expect, it } from 'vitest';
import { expectedByChance, flagOf, POLICY } from '@/lib/engine/flags';
import type { DatasetInput, ParametersInput } from '@/lib/engine/inputs';
import { measureActivity } from '@/lib/engine/measured-activity';
import { normalTwoSided, studentTwoSided } from '@/lib/engine/tails';
import { expectClose } from '@/tests/support/close-to';
import {
  allostericConstant,
  assessOne,
  datasetOf,
  LIGAND,
  pointsAt,
  siteClass,
} from '@/tests/support/small-dataset';

const CLASSES = [siteClass(4, 100, 1)];

describe('measured activity', () => {
  it('replicates pool their spread over the series (JCGM 100, H.3.6)', () => {
    const measured = measureActivity([
      { ligands: {}, replicates: [0.4, 0.5, 0.6] },
      { ligands: {}, replicates: [0.2, 0.3] },
      { ligands: {}, activity: 0.7, u: 0.05 },
    ]);
    const pooled = Math.sqrt((0.02 + 0.005) / 3);
    expect(measured.degreesOfFreedom).toBe(3);
    expectClose(measured.activity[0], 0.5, 1e-15);
    expectClose(measured.activityU[0], pooled / Math.sqrt(3), 1e-14);
    expectClose(measured.activityU[1], pooled / Math.SQRT2, 1e-14);
    expect(measured.activityU[2]).toBe(0.05);
    expect(measured.uncertainty).toEqual(['replicates', 'replicates', 'stated']);
  });
  it('p of a replicated point is Student’s with Welch–Satterthwaite degrees of freedom (JCGM 100, G.4.1)', () => {
    const dataset = datasetOf({ gap: allostericConstant(3), siteClasses: CLASSES }, [
      { ligands: {}, replicates: [0.2, 0.28, 0.31] },
    ]);
    const [point] = assessOne(dataset).points;
    const nu = (2 * point.residualU ** 4) / point.activityU ** 4;
    expectClose(point.pValue, studentTwoSided(point.z, nu), 1e-14);
    expect(point.pValue).toBeGreaterThan(normalTwoSided(point.z));
  });
  it('identical replicates leave the model floor and the normal tail', () => {
    const dataset = datasetOf({ gap: allostericConstant(3), siteClasses: CLASSES }, [
      { ligands: {}, replicates: [0.27, 0.27] },
    ]);
    const [point] = assessOne(dataset).points;
    expectClose(point.z, 2, 1e-12);
    expectClose(point.pValue, normalTwoSided(2), 1e-12);
  });
});

describe('flags of policy 1 (ISO 13528: warning limit 2, action limit 3)', () => {
  it('at the limits', () => {
    expect(flagOf(normalTwoSided(1.999999))).toBe('on-curve');
    expect(flagOf(normalTwoSided(2.000001))).toBe('warning');
    expect(flagOf(normalTwoSided(2.999999))).toBe('warning');
    expect(flagOf(normalTwoSided(3.000001))).toBe('off-curve');
    expect(flagOf(POLICY.warningBelow)).toBe('on-curve');
    expect(flagOf(POLICY.offCurveBelow)).toBe('warning');
  });
  it('chance alone', () => {
    expectClose(expectedByChance(1000).warning, 42.80046783, 1e-8);
    expectClose(expectedByChance(1000).offCurve, 2.69979606326, 1e-11);
  });
});

describe('notes', () => {
  const codes = (dataset: DatasetInput) => assessOne(dataset).notes.map(({ code }) => code);
  const fitted = (overrides: Partial<ParametersInput>) =>
    datasetOf(
      {
        gap: allostericConstant(3),
        siteClasses: CLASSES,
        origin: 'fitted-here',
        fittedCount: 2,
        ...overrides,
      },
      pointsAt(0, 1, 2),
    );

  it('a fit to its own points is circular; a fit without correlations says so', () => {
    expect(codes(fitted({}))).toEqual(['circular', 'correlations-not-stated']);
    expect(codes(fitted({ correlations: [{ a: 'gap', b: 'main/sites', r: 0.1 }] }))).toEqual(['circular']);
    expect(codes(fitted({ origin: 'fitted-elsewhere', fittedCount: undefined }))).toEqual([
      'correlations-not-stated',
    ]);
    expect(codes(fitted({ origin: 'independent', fittedCount: undefined }))).toEqual([]);
  });

  it('depletion: only total ligand, only where the sites could bind more than a tenth', () => {
    const dataset = (concentration: 'free' | 'total', protein?: number): DatasetInput => ({
      ...datasetOf({ gap: allostericConstant(3), siteClasses: CLASSES }, pointsAt(0, 0.3, 0.5, 10), {
        ligands: [{ id: LIGAND, unit: 'uM', concentration }],
      }),
      assay: protein === undefined ? {} : { proteinConcentration: { value: protein, unit: 'nM' } },
    });
    // 4 sites × 10 nM bind at most 0.04 µM: more than a tenth of 0.3 µM, less than a tenth of 0.5 µM.
    expect(assessOne(dataset('total', 10)).notes).toEqual([
      expect.objectContaining({ code: 'depletion', points: [1] }),
    ]);
    expect(codes(dataset('free', 10))).toEqual([]);
    expect(codes(dataset('total'))).toEqual(['protein-concentration-not-stated']);
  });
});

describe('notes on scaling and width', () => {
  const noted = (dataset: DatasetInput, code: string) =>
    assessOne(dataset).notes.find((note) => note.code === code);
  const scaled = (inactive: number, method: DatasetInput['normalisation']['method']): DatasetInput => ({
    ...datasetOf(
      { gap: allostericConstant(1 / 3), siteClasses: [siteClass(1, inactive, null)] },
      pointsAt(0, 1),
    ),
    normalisation: { method },
  });

  it('normalisation: only where a series scaled to its own ends cannot reach 0 and 1', () => {
    // p = 1/(1 + (1 + c/K)/3): 0.75 without ligand, 0.60 at c = K and 0.029 at c = 100 K
    expect(noted(scaled(1, 'series-min-max'), 'normalisation')?.detail).toContain('from 0.60 to 0.75');
    expect(noted(scaled(0.01, 'series-min-max'), 'normalisation')?.detail).toContain('from 0.03 to 0.75');
    expect(noted(scaled(1, 'two-reference'), 'normalisation')).toBeUndefined();
    const full = datasetOf(
      { gap: allostericConstant(1 / 30), siteClasses: [siteClass(4, 1, null)] },
      pointsAt(0, 100),
    );
    expect(noted({ ...full, normalisation: { method: 'series-min-max' } }, 'normalisation')).toBeUndefined();
  });

  it('uncertainties too wide: at least half of the points could hardly miss', () => {
    const wide = (...us: number[]) =>
      datasetOf(
        { gap: allostericConstant(3), siteClasses: CLASSES },
        us.map((u) => ({ ligands: {}, activity: 0.5, u })),
      );
    expect(noted(wide(0.3, 0.3, 0.05), 'uncertainty-too-wide')?.points).toEqual([0, 1]);
    expect(noted(wide(0.3, 0.05, 0.05), 'uncertainty-too-wide')).toBeUndefined();
    // A gap known to 2 kT leaves an expected activity of 0.25 ± 0.38.
    const vague = datasetOf({ gap: allostericConstant(3, 6), siteClasses: CLASSES }, pointsAt(0));
    expect(noted(vague, 'uncertainty-too-wide')?.points).toEqual([0]);
  });

  it('total ligand without a protein concentration: depletion cannot be judged', () => {
    const dataset = (concentration: 'free' | 'total') =>
      datasetOf({ gap: allostericConstant(3), siteClasses: CLASSES }, pointsAt(0, 1), {
        ligands: [{ id: LIGAND, unit: 'uM', concentration }],
      });
    expect(noted(dataset('total'), 'protein-concentration-not-stated')?.detail).toContain(LIGAND);
    expect(noted(dataset('free'), 'protein-concentration-not-stated')).toBeUndefined();
  });
});
