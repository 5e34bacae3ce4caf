import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import { DataTable } from '@/components/ui/data-table';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { Quantity } from '@/components/ui/quantity';
import { unitLabel } from '@/components/ui/unit-label';

it('ties a field to its label, its hint and its error', () => {
  const html = renderToStaticMarkup(
    <NumberField label="Stock" unit="mM" hint="free ligand" error="A number above 0 is expected." />,
  );
  const id = /<input[^>]* id="([^"]+)"/.exec(html)?.[1];
  expect(id).toBeTruthy();
  expect(html).toContain(`<label for="${id}"`);
  expect(html).toContain('Stock, mM');
  expect(html).toContain(`aria-describedby="${id}-hint ${id}-error"`);
  expect(html).toContain('aria-invalid="true"');
  expect(html).toContain(`<p id="${id}-error"`);
});

it('heads every row and column of a table', () => {
  const html = renderToStaticMarkup(
    <DataTable
      caption="Points"
      columns={[
        { key: 'n', head: 'Point', cell: (row: { n: number; z: number }) => row.n },
        { key: 'z', head: 'z', numeric: true, cell: (row) => row.z },
      ]}
      rows={[
        { n: 1, z: 0.5 },
        { n: 2, z: -3.2 },
      ]}
      rowKey={(row) => row.n}
    />,
  );
  expect(html.match(/scope="col"/g)).toHaveLength(2);
  expect(html.match(/scope="row"/g)).toHaveLength(2);
  expect(html).toContain('<caption');
});

it('speaks an error that follows an action at once, a note when there is time', () => {
  expect(renderToStaticMarkup(<Notice kind="error" title="No" live />)).toContain('role="alert"');
  expect(renderToStaticMarkup(<Notice kind="note" title="So" live />)).toContain('role="status"');
  expect(renderToStaticMarkup(<Notice kind="note" title="So" />)).not.toContain('role=');
});

it('writes a quantity with a raised exponent', () => {
  const html = renderToStaticMarkup(<Quantity value={1.23e-4} u={1.2e-5} unit={unitLabel('uM')} />);
  expect(html).toContain('(1.23 ± 0.12)');
  expect(html).toContain('<sup>−4</sup>');
  expect(html).toContain('µM');
});
