import { describe, expect, it } from 'vitest';
import { concentrationAxisOf } from '@/components/plots/concentration-axis';
import { responseCurves } from '@/components/plots/response-curves';
import { logistic } from '@/lib/engine/logistic';
import type { DatasetDocument, Point } from '@/schemas/dataset-1.generated';
import { contractDocument } from '../../support/contract-document';
import { plotted, plottedExample } from '../../support/plotted-dataset';

function curvesOf(document: DatasetDocument, ligand = 'velline') {
  const data = plotted(document);
  return responseCurves(data, concentrationAxisOf(data, ligand));
}

const pointAt = (velline: number, modulators?: Record<string, number>): Point => ({
  ligands: { velline },
  ...(modulators ? { modulators } : {}),
  activity: 0.5,
  u: 0.02,
});

function withPoints(points: Point[], reference = 0): DatasetDocument {
  const document = contractDocument();
  document.series[0].points = points;
  for (const modulation of document.series[0].parameters.modulation ?? []) modulation.reference = reference;
  return document;
}

describe('response curves', () => {
  it('lie on the master curve in every sample', () => {
    const data = plottedExample('mixed-classes');
    const curves = responseCurves(data, concentrationAxisOf(data, 'ocarate'));
    expect(curves.length).toBeGreaterThan(0);
    for (const { samples } of curves)
      for (const { energy, expected } of samples) expect(expected).toBeCloseTo(logistic(energy), 14);
  });

  it('pass where a point’s own energy says', () => {
    const data = plotted(contractDocument());
    const [curve] = responseCurves(data, concentrationAxisOf(data, 'velline'));
    const { energy } = data.series[0].assessed.points[1];
    const place = Math.log10(12.5);
    const right = curve.samples.findIndex((sample) => sample.place >= place);
    const [a, b] = [curve.samples[right - 1], curve.samples[right]];
    expect(energy).toBeLessThanOrEqual(Math.max(a.energy, b.energy));
    expect(energy).toBeGreaterThanOrEqual(Math.min(a.energy, b.energy));
  });

  it('are one a series where only the ligand changes', () => {
    const data = plottedExample('collapse');
    const curves = responseCurves(data, concentrationAxisOf(data, 'velline'));
    expect(curves.map(({ series }) => series)).toEqual([0, 1, 2, 3]);
  });

  it('are one a value of a modulator', () => {
    const document = withPoints([
      pointAt(1, { V: 0 }),
      pointAt(10, { V: 0 }),
      pointAt(1, { V: 40 }),
      pointAt(10, { V: 40 }),
    ]);
    const curves = curvesOf(document);
    expect(curves).toHaveLength(2);
    // 0.02 kT per mV, and 40 mV between them.
    expect(curves[1].samples[0].energy - curves[0].samples[0].energy).toBeCloseTo(0.8, 12);
  });

  it('take a modulator that is left out at its reference', () => {
    const document = withPoints([pointAt(1), pointAt(1, { V: 0 }), pointAt(10, { V: -40 })], -40);
    const curves = curvesOf(document);
    expect(curves).toHaveLength(2);
    expect(curves[1].samples[0].energy - curves[0].samples[0].energy).toBeCloseTo(0.8, 12);
  });

  it('are one a concentration of another ligand, a ligand left out being 0', () => {
    const data = plottedExample('mixed-classes');
    const along = responseCurves(data, concentrationAxisOf(data, 'ocarate'));
    expect(along.map(({ series }) => series)).toEqual([0, 1, 2, 3, 4, 5]);
  });

  it('are at most six a series and 48 in all', () => {
    const points = Array.from({ length: 9 }, (_, i) => pointAt(1, { V: 10 * i }));
    const document = withPoints(points);
    expect(curvesOf(document)).toHaveLength(6);
    const [series] = document.series;
    document.series = Array.from({ length: 10 }, (_, i) => ({ ...series, id: `s${i}` }));
    expect(curvesOf(document)).toHaveLength(48);
  });

  it('begin right of the place of 0', () => {
    const data = plotted(contractDocument());
    const axis = concentrationAxisOf(data, 'velline');
    const [{ samples }] = responseCurves(data, axis);
    expect(axis.zeroAt).not.toBeNull();
    expect(samples[0].place).toBeGreaterThan(axis.zeroAt ?? Number.POSITIVE_INFINITY);
    expect(samples.at(-1)?.place).toBeCloseTo(axis.to, 12);
  });
});
