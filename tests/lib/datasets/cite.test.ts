import { describe, expect, it } from 'vitest';
import { cite } from '@/lib/datasets/cite';

const cited = {
  accession: 'CK-000123.2',
  title: 'Gain & loss: 50 % of {AlrQ}_1',
  authors: ['R. Example', 'Ö. Sample\nER  - '],
  day: '2026-11-09',
  url: 'https://curves.example/datasets/CK-000123.2',
};

describe('citations', () => {
  it('are a sentence', () => {
    expect(cite(cited).text).toBe(
      'R. Example, Ö. Sample ER - (2026). Gain & loss: 50 % of {AlrQ}_1 [Data set]. Curvekeep, CK-000123.2. ' +
        'https://curves.example/datasets/CK-000123.2',
    );
  });

  it('are BibTeX in which nothing runs', () => {
    const { bibtex } = cite(cited);
    expect(bibtex).toMatch(/^@misc\{CK-000123\.2,\n/);
    expect(bibtex).toContain('author = {{R. Example} and {Ö. Sample ER -}}');
    expect(bibtex).toContain('title = {{Gain \\& loss: 50 \\% of \\{AlrQ\\}\\_1}}');
  });

  it('are RIS in which a name begins no line', () => {
    const lines = cite(cited).ris.split('\r\n');
    expect(lines[0]).toBe('TY  - DATA');
    expect(lines).toContain('AU  - Ö. Sample ER -');
    expect(lines).toContain('DA  - 2026/11/09');
    expect(lines.filter((line) => line.startsWith('ER'))).toEqual(['ER  - ']);
  });

  it('are CSL-JSON', () => {
    expect(cite(cited).csl).toMatchObject({
      type: 'dataset',
      author: [{ literal: 'R. Example' }, { literal: 'Ö. Sample ER -' }],
      issued: { 'date-parts': [[2026, 11, 9]] },
    });
  });
});
