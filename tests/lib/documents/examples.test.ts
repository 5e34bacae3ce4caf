import { describe, expect, it } from 'vitest';
import { checkDocument } from '@/lib/documents/check-document';
import { EXAMPLE_TABLE, EXAMPLES } from '@/lib/documents/examples/examples';
import { assess } from '@/lib/engine/assess';
import { makeExamples, makeExampleTable } from '../../support/make-examples';

const assessmentOf = (slug: string) => {
  const example = EXAMPLES.find((one) => one.slug === slug);
  if (example === undefined) throw new Error(`no example ${slug}`);
  return assess(example.document);
};

describe('the examples', () => {
  it.each(EXAMPLES)('$slug is valid and says that it is invented', ({ document }) => {
    expect(checkDocument(document)).toEqual({ ok: true, document });
    expect(document.title).toMatch(/^Invented/);
    expect(document.abstract).toMatch(/^Invented example/);
  });

  it('are what their seeded script makes', () => {
    expect(Object.fromEntries(EXAMPLES.map(({ slug, document }) => [slug, document]))).toEqual(
      makeExamples(),
    );
    expect(EXAMPLE_TABLE).toBe(makeExampleTable());
  });

  it('collapse where they should', () => {
    const { summary } = assessmentOf('collapse');
    expect(summary).toMatchObject({ points: 56, offCurve: 0 });
    expect(summary.rmsZ).toBeGreaterThan(0.8);
    expect(summary.rmsZ).toBeLessThan(1.2);
    const mixed = assessmentOf('mixed-classes').summary;
    expect(mixed).toMatchObject({ points: 72, offCurve: 0 });
    expect(mixed.pValue).toBeGreaterThan(0.05);
  });

  it('miss the curve in the one series whose unit slipped', () => {
    const { series } = assessmentOf('thousand-fold');
    expect(series.map(({ id, rmsZ }) => [id, rmsZ > 3])).toEqual([
      ['wt', false],
      ['T61A', false],
      ['S88N', false],
      ['G143C', true],
    ]);
  });
});
