import { describe, expect, it } from 'vitest';
import { documentHead, publishedPlotData } from '@/components/datasets/published-plot-data';
import type { DatasetPoint } from '@/schemas/dataset-answers';
import { plottedExample } from '../../support/plotted-dataset';

const { document, assessment } = plottedExample('mixed-classes');
const points: DatasetPoint[] = assessment.series.flatMap(({ id, points: own }, s) =>
  own.map((point) => {
    const { ligands, modulators = {} } = document.series[s].points[point.index];
    return { ...point, series: id, ligands, modulators };
  }),
);
const published = {
  ...assessment,
  series: assessment.series.map(({ points: _, ...series }) => series),
};

describe('a published dataset in its separate answers', () => {
  it('is put together as it was assessed', () => {
    const data = publishedPlotData(documentHead(document), published, points);
    expect(data.assessment.summary).toEqual(assessment.summary);
    data.series.forEach(({ assessed, stated, label }, s) => {
      expect(label).toBe(document.series[s].label);
      expect(assessed.points).toHaveLength(assessment.series[s].points.length);
      assessed.points.forEach((point, i) => {
        expect(point).toMatchObject(assessment.series[s].points[i]);
        expect(stated.points[i].ligands).toEqual(document.series[s].points[i].ligands);
      });
    });
  });

  it('has its statements and figures before its points are there', () => {
    const data = publishedPlotData(documentHead(document), published, []);
    expect(data.series.map(({ assessed }) => assessed.points)).toEqual(document.series.map(() => []));
    expect(data.series[0].stated.parameters).toEqual(document.series[0].parameters);
  });

  it('the head of a document holds no point', () => {
    expect(JSON.stringify(documentHead(document))).not.toContain('"points"');
  });
});
