/** Datasets as the plots take them: assessed by the engine itself, seen in one way or another. */
import type { CollapseView } from '@/components/plots/collapse-view';
import { concentrationAxisOf } from '@/components/plots/concentration-axis';
import { type PlotData, plotDataOf } from '@/components/plots/plot-data';
import { responseCurves } from '@/components/plots/response-curves';
import { EXAMPLES, type ExampleDocument } from '@/lib/documents/examples/examples';
import { assess } from '@/lib/engine/assess';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

export function plotted(document: DatasetDocument): PlotData {
  return plotDataOf(document, assess(document));
}

export function plottedExample(slug: ExampleDocument['slug']): PlotData {
  const example = EXAMPLES.find((one) => one.slug === slug);
  if (example === undefined) throw new Error(`There is no example ${slug}.`);
  return plotted(example.document);
}

/** Seen by energy from −10 to 10 kT, nothing lit, beside its first ligand's concentrations. */
export function viewOf(data: PlotData, overrides: Partial<CollapseView> = {}): CollapseView {
  const axis = concentrationAxisOf(data, data.document.ligands[0].id);
  return {
    data,
    window: { from: -10, to: 10 },
    axis,
    curves: responseCurves(data, axis),
    by: 'energy',
    lit: null,
    marked: null,
    colours: COLOURS,
    animate: true,
    heights: { plot: 300, residual: 120 },
    ...overrides,
  };
}

export const COLOURS: CollapseView['colours'] = {
  ground: '#ffffff',
  ink: '#000001',
  soft: '#000002',
  hairline: '#000003',
  wash: '#000004',
  act: '#000005',
  off: '#000006',
  warn: '#000007',
  series: ['#100000', '#200000', '#300000', '#400000', '#500000', '#600000'],
  font: 'sans-serif',
};
