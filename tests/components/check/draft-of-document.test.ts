import { expect, it } from 'vitest';
import { formOf } from '@/components/check/csv-draft';
import { draftOfDocument } from '@/components/check/draft-of-document';
import { assembleDocument } from '@/lib/documents/assemble-document';
import { EXAMPLE_TABLE, EXAMPLES } from '@/lib/documents/examples/examples';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import { csvParametersSchema } from '@/schemas/csv-parameters';
import type { Binding, Constant } from '@/schemas/dataset-1.generated';

const [{ document }] = EXAMPLES;
const table = readCsvPoints(EXAMPLE_TABLE);

it('fills the form so that the table becomes the document again: parameters, temperature, points', () => {
  const draft = draftOfDocument(document, table);
  const made = assembleDocument(table, csvParametersSchema.parse(formOf(draft, table, document.title)));
  expect(made.temperature).toEqual(document.temperature);
  made.series.forEach(({ parameters, points, label }, i) => {
    const original = document.series[i];
    expect(label).toBe(original.label);
    expect(parameters.gap).toEqual(original.parameters.gap);
    expect(parameters.siteClasses[0].binding).toEqual(
      original.parameters.siteClasses[0].binding.map(withoutLabels),
    );
    expect(parameters.siteClasses[0].sites).toEqual(original.parameters.siteClasses[0].sites);
    expect(points).toHaveLength(original.points.length);
  });
});

/** The form has no place for labels of shared quantities. */
function withoutLabels({ ligand, inactive, active }: Binding) {
  const plain = (constant: Constant | null) =>
    constant && { value: constant.value, unit: constant.unit, u: constant.u };
  return { ligand, inactive: plain(inactive), active: plain(active) };
}

it('leaves a series that the document does not know to be typed', () => {
  const draft = draftOfDocument({ ...document, series: [] }, table);
  expect(draft.parameters.gap.value).toBe('');
  expect(draft.own).toEqual({});
});
