import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it, vi } from 'vitest';
import { accessTo } from '@/components/deposits/draft-access';
import { type JsonObject, withValueAt } from '@/components/deposits/draft-value';
import { EditorSections } from '@/components/deposits/editor-sections';
import type { EditorSection } from '@/components/deposits/go-to-place';
import { PointsEditor } from '@/components/deposits/points-editor';
import type { DocumentError } from '@/lib/documents/document-error';
import { contractDocument } from '@/tests/support/contract-document';

const DOCUMENT = contractDocument() as unknown as JsonObject;
const SECTIONS: EditorSection[] = ['identity', 'assay', 'ligands', 'series'];

function sectionOf(value: JsonObject, section: EditorSection, errors: DocumentError[] = []): string {
  return renderToStaticMarkup(
    <EditorSections
      draft={accessTo(value, value, errors, vi.fn())}
      systems={[{ value: 'alrq-velline', label: 'AlrQ · velline' }]}
      section={section}
      onSection={vi.fn()}
      series={0}
      onSeries={vi.fn()}
    />,
  );
}

describe('the document as a form', () => {
  it('has the statements in the group’s own convention, with the gap in kT beside', () => {
    const inMeV = { value: -62, unit: 'meV', orientation: 'active-minus-inactive', u: 1.2 };
    const html = sectionOf(withValueAt(DOCUMENT, '/series/0/parameters/gap', inMeV), 'series');
    expect(html).toContain('value="−62"');
    // 62 meV / (k_B · 298.15 K) = 2.413 kT
    expect(html.replace(/<[^>]+>/g, '')).toContain('= 2.413 ± 0.047\u00a0kT favours active');
    expect(html).toContain('aria-label="K inactive of velline"');
    expect(html).toContain('aria-label="slope by V"');
  });

  it('has a row of each for every site class as it stands', () => {
    const { parameters } = contractDocument().series[0];
    const [first] = parameters.siteClasses;
    const two = [first, { ...first, id: 'rim' }];
    const html = sectionOf(withValueAt(DOCUMENT, '/series/0/parameters/siteClasses', two), 'series');
    expect(html).toContain('aria-label="number of sites of main"');
    expect(html).toContain('aria-label="number of sites of rim"');
  });

  it('says what is wrong at the field', () => {
    const html = sectionOf(DOCUMENT, 'identity', [{ pointer: '/licence', detail: 'no such licence' }]);
    expect(html).toContain('no such licence');
    expect(html).toMatch(
      /data-pointer="\/licence"[^>]*aria-invalid="true"|aria-invalid="true"[^>]*data-pointer="\/licence"/,
    );
  });

  it('keeps a system that is not listed to be seen', () => {
    expect(sectionOf({ ...DOCUMENT, system: 'new-one' }, 'identity')).toContain('new-one: none of these');
  });

  it.each([
    ['nothing at all', {}],
    ['words in place of everything', Object.fromEntries(Object.keys(DOCUMENT).map((key) => [key, 'words']))],
    ['numbers within lists', { ...DOCUMENT, series: [1], ligands: [2], contributors: [null], assay: [] }],
    [
      'odd parameters',
      withValueAt(DOCUMENT, '/series/0/parameters', { siteClasses: [7, { binding: [3] }], gap: 'x' }),
    ],
  ])('stands whatever the draft is: %s', (_, value) => {
    for (const section of SECTIONS) expect(sectionOf(value as JsonObject, section)).toContain('Identity');
  });
});

describe('the table of points', () => {
  const tableOf = (value: JsonObject, errors: DocumentError[] = []) =>
    renderToStaticMarkup(
      <PointsEditor
        draft={accessTo(value, value, errors, vi.fn())}
        series={0}
        page={0}
        onPage={vi.fn()}
        computedAt={() => null}
        isStale={false}
      />,
    );

  it('has a cell for every number, and replicates in the place of an activity', () => {
    const html = tableOf(DOCUMENT);
    expect(html).toContain('aria-label="velline of point 1"');
    expect(html).toContain('aria-label="membrane potential of point 1"');
    expect(html).toContain('aria-label="activity of point 1"');
    expect(html).toMatch(/aria-label="replicates of point 2"[^>]*value="0.41 0.44 0.4"/);
  });

  it('marks a bad cell where it stands and says why', () => {
    const bad = withValueAt(DOCUMENT, '/series/0/points/0/activity', '0,4l');
    const html = tableOf(bad, [
      { pointer: '/series/0/points/0/activity', detail: 'activity must be a number' },
    ]);
    expect(html).toMatch(/aria-label="activity of point 1" aria-invalid="true"/);
    expect(html).toContain('activity must be a number');
  });

  it('shows fifty a page', () => {
    const points = Array.from({ length: 120 }, (_, i) => ({ ligands: { velline: i }, activity: 0.5 }));
    const html = tableOf(withValueAt(DOCUMENT, '/series/0/points', points));
    expect(html.match(/aria-label="activity of point/g)).toHaveLength(50);
    expect(html).toContain('of 120');
  });
});
