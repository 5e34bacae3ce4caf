import { describe, expect, it } from 'vitest';
import { documentOf } from '@/components/check/assess-source';
import type { CsvDraft } from '@/components/check/csv-draft';
import { loadExampleTable } from '@/components/check/example-words';
import type { Source } from '@/components/check/read-source';
import { stateInSource } from '@/components/check/state-source';
import type { Misreading } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

async function table(): Promise<{ source: Source; draft: CsvDraft; document: DatasetDocument }> {
  const { text, draft } = await loadExampleTable();
  const source = { text, name: null };
  return { source, draft, document: made(source, draft) };
}

function made(source: Source, draft: CsvDraft | null): DatasetDocument {
  const found = documentOf(source, draft);
  if (found.kind !== 'document') throw new Error('No document can be made.');
  return JSON.parse(found.text);
}

const reading = (misreading: Misreading, ...series: string[]) => ({
  misreading,
  series,
  noun: '',
  label: null,
});

describe('a reading stated in what was pasted', () => {
  it('changes the form beside a table, for the series concerned alone', async () => {
    const { source, draft, document } = await table();
    const [first, second] = document.series.map(({ id }) => id);
    const stated = stateInSource(source, draft, document, reading({ misreading: 'gap-orientation' }, second));
    expect(stated.becameDocument).toBe(false);
    expect(stated.source).toBe(source);
    const after = made(stated.source, stated.draft);
    expect(after.series[1].parameters.gap?.orientation).toBe('inactive-minus-active');
    expect(document.series[1].parameters.gap?.orientation).toBe('active-minus-inactive');
    expect(after.series.filter(({ id }) => id !== second)).toEqual(
      document.series.filter(({ id }) => id !== second),
    );
    expect(first).not.toBe(second);
  });

  it('knows a gap per site in the form', async () => {
    const { source, draft, document } = await table();
    const [{ id }] = document.series;
    const stated = stateInSource(source, draft, document, reading({ misreading: 'gap-scope' }, id));
    expect(stated.becameDocument).toBe(false);
    const [{ parameters }] = made(stated.source, stated.draft).series;
    expect(parameters.gap).toBeUndefined();
    expect(parameters.siteClasses[0].gapPerSite?.value).toBe(2.4);
  });

  it('gives one series parameters of its own where the form has one set for all', async () => {
    const { source, draft, document } = await table();
    const common = { ...draft, own: {} };
    const [first, second] = document.series.map(({ id }) => id);
    const before = made(source, common);
    const stated = stateInSource(
      source,
      common,
      before,
      reading({ misreading: 'swapped-constants' }, second),
    );
    expect(Object.keys(stated.draft?.own ?? {})).toEqual([second]);
    const after = made(stated.source, stated.draft);
    expect(after.series.find(({ id }) => id === first)).toEqual(before.series.find(({ id }) => id === first));
    const { inactive, active } = after.series[1].parameters.siteClasses[0].binding[0];
    expect([inactive?.value, active?.value]).toEqual([0.9, 18]);
  });

  it('turns a table into a document where its points are what was misread', async () => {
    const { source, draft, document } = await table();
    const [{ id, points }] = document.series;
    const stated = stateInSource(source, draft, document, reading({ misreading: 'inverted-activity' }, id));
    expect(stated.becameDocument).toBe(true);
    expect(stated.draft).toBeNull();
    const after = made(stated.source, null);
    expect(after.series[0].points[0].activity).toBeCloseTo(1 - (points[0].activity ?? 0), 12);
    expect(after.series[1]).toEqual(document.series[1]);
  });

  it('rewrites the text of a document', async () => {
    const { document } = await table();
    const source = { text: JSON.stringify(document), name: 'mine.json' };
    const stated = stateInSource(
      source,
      null,
      document,
      reading({ misreading: 'gap-orientation' }, document.series[0].id),
    );
    expect(stated.becameDocument).toBe(false);
    expect(made(stated.source, null).series[0].parameters.gap?.orientation).toBe('active-minus-inactive');
  });
});
