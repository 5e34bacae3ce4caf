import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it, vi } from 'vitest';
import { DerivedTable } from '@/components/reasons/derived-table';
import { TrialBand } from '@/components/reasons/trial-band';
import type { Trials } from '@/components/reasons/use-trial';
import { WhyItMisses } from '@/components/reasons/why-it-misses';
import { plotted } from '@/tests/support/plotted-dataset';
import { reasoned } from '@/tests/support/reasoned-dataset';

const FOUND = { misreading: 'gap-orientation' as const, rmsZ: 0.9, deltaSumZ2: -400 };
const REVERSED = reasoned({ series: { 0: { rmsZ: 14.2, pValue: 0, conventions: [FOUND] } } });

const trialsOf = (overrides: Partial<Trials> = {}): Trials => ({
  trial: null,
  hasReturned: false,
  pending: null,
  failure: null,
  start: vi.fn(),
  stop: vi.fn(),
  scene: null,
  drawn: null,
  onWindow: vi.fn(),
  ...overrides,
});

const wordsOf = (html: string) =>
  html
    .replaceAll(/<[^>]+>/g, ' ')
    .replaceAll('\u00a0', ' ')
    .replaceAll(/\s+/g, ' ');

describe('why it misses', () => {
  it('is not there where nothing misses', () => {
    expect(renderToStaticMarkup(<WhyItMisses stated={reasoned({})} trials={trialsOf()} />)).toBe('');
  });

  it('says so where points miss and no series does', () => {
    const lone = (offCurve: number) =>
      wordsOf(
        renderToStaticMarkup(
          <WhyItMisses stated={reasoned({ summary: { offCurve } })} trials={trialsOf()} />,
        ),
      );
    expect(lone(1)).toContain('One point misses; no series does as a whole');
    expect(lone(3)).toContain('3 points miss; no series does as a whole');
  });

  it('says of a reading that leaves a clear miss that it does', () => {
    const nearer = { ...FOUND, rmsZ: 1.82 };
    const html = renderToStaticMarkup(
      <WhyItMisses
        stated={reasoned({ series: { 0: { rmsZ: 7.6, pValue: 0, conventions: [nearer] } } })}
        trials={trialsOf()}
      />,
    );
    expect(wordsOf(html)).toContain('to 1.82: nearer, but not onto the curve.');
  });

  it('has the series, its RMS z, the sentence and its actions, each named for whom it is', () => {
    const html = renderToStaticMarkup(
      <WhyItMisses stated={REVERSED} trials={trialsOf()} onState={vi.fn()} />,
    );
    expect(wordsOf(html)).toContain(
      'wild type RMS z 14.2 Reading the gap as active − inactive brings RMS z from 14.2 to 0.90. Try it State it so',
    );
    expect(html.replaceAll('\u00a0', ' ')).toContain(
      'aria-label="Try it: the gap read as active − inactive, wild type"',
    );
  });

  it('offers nothing to state to those who may not', () => {
    const html = renderToStaticMarkup(<WhyItMisses stated={REVERSED} trials={trialsOf()} />);
    expect(html).toContain('Try it');
    expect(html).not.toContain('State it so');
  });

  it('folds a long list', () => {
    const [series] = REVERSED.series;
    const many = {
      ...REVERSED,
      series: Array.from({ length: 17 }, (_, i) => ({ ...series, label: `variant ${i + 1}` })),
    };
    const words = wordsOf(renderToStaticMarkup(<WhyItMisses stated={many} trials={trialsOf()} />));
    expect(words).toContain('variant 5');
    expect(words).not.toContain('variant 6');
    expect(words).toContain('12 more series miss');
  });

  it('says what failed, beside the reason that was tried', () => {
    const key = 'wt {"misreading":"gap-orientation"}';
    const failure = { key, detail: 'The computation could not start in this browser.' };
    const html = renderToStaticMarkup(<WhyItMisses stated={REVERSED} trials={trialsOf({ failure })} />);
    expect(html).toMatch(/role="alert"[^>]*>It could not be tried: The computation could not start/);
  });
});

describe('a trial', () => {
  const subject = {
    key: 'k',
    noun: 'the gap read as active − inactive',
    label: 'wild type',
    index: 0,
    reading: {
      kind: 'convention' as const,
      series: ['wt'],
      misreading: { misreading: 'gap-orientation' as const },
    },
  };
  // On the curve as tried: all but the warnings of the example.
  const trial = { subject, data: reasoned({}), window: { from: -4, to: 4 } };

  it('is marked in words, with what it brings, and is announced', () => {
    const html = renderToStaticMarkup(<TrialBand stated={REVERSED} trials={trialsOf({ trial })} />);
    const onCurve = trial.data.series[0].assessed.points.filter(({ flag }) => flag === 'on-curve').length;
    expect(wordsOf(html)).toContain(
      `Trial: wild type, with the gap read as active − inactive. RMS z 14.2 → 0.90 points on the curve ${onCurve} → ${onCurve} of 14 Nothing is saved. Back to what was stated`,
    );
    expect(html).toMatch(/role="status"[^>]*>Trial: wild type[^<]*Escape goes back/);
  });

  it('announces that it ended', () => {
    const html = renderToStaticMarkup(
      <TrialBand stated={REVERSED} trials={trialsOf({ hasReturned: true })} />,
    );
    expect(html).toMatch(/role="status"[^>]*>Back to what was stated\./);
    expect(html).not.toContain('<section');
  });
});

describe('the derived table', () => {
  it('has values with their uncertainty, units in the heads, and why one does not exist', () => {
    const { document } = reasoned({
      change: ({ series }) => {
        const [{ parameters }] = series;
        // Inactive already without ligand: half activity is never reached.
        parameters.gap = { value: -2.4, unit: 'kT', orientation: 'inactive-minus-active', u: 0.06 };
      },
    });
    const words = wordsOf(renderToStaticMarkup(<DerivedTable data={plotted(document)} />));
    expect(words).toContain('EC50 µM, ± u half activity µM, ± u');
    // 1/(1 + e^2.4) = 0.0832, u = p(1 − p)·0.06 = 0.0046
    expect(words).toContain('wild type 0.0832 ± 0.0046');
    expect(words).toContain('does not exist');
    expect(words).toMatch(/wild type: With velline the expected activity stays below one half/);
  });
});
