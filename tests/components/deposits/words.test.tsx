import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it, vi } from 'vitest';
import { Letters } from '@/components/deposits/letters';
import { nextStep, stateSentence } from '@/components/deposits/state-sentence';
import { SubmitForm } from '@/components/deposits/submit-form';
import { formatBytes } from '@/components/ui/format-bytes';
import { DEPOSIT_STATES } from '@/schemas/deposit-states';

it('every state has a sentence and a next step of its own', () => {
  expect(new Set(DEPOSIT_STATES.map((state) => stateSentence(state))).size).toBe(DEPOSIT_STATES.length);
  expect(new Set(DEPOSIT_STATES.map((state) => nextStep(state, 0))).size).toBe(DEPOSIT_STATES.length);
  expect(nextStep('draft', 1)).toBe('Mend 1 thing, then submit');
  expect(nextStep('draft', 3)).toBe('Mend 3 things, then submit');
  const publication = { day: '2027-03-01', timeZone: 'America/Sao_Paulo' };
  expect(nextStep('accepted', 0, publication)).toBe('Wait: published on 1 March 2027');
  expect(stateSentence('accepted', publication)).toBe(
    'A curator accepted it. It is published on 1 March 2027, at midnight (America/Sao Paulo); until then only your laboratory and the curators see it.',
  );
});

it.each([
  [0, '0 bytes'],
  [312, '312 bytes'],
  [1024, '1.0 KiB'],
  [1_500_000, '1.4 MiB'],
  [104_857_600, '100 MiB'],
])('%d bytes are %s', (bytes, words) => {
  expect(formatBytes(bytes)).toBe(words);
});

describe('submitting', () => {
  const html = (obstacle: string | null) =>
    renderToStaticMarkup(<SubmitForm obstacle={obstacle} busy={false} onSubmit={vi.fn()} />);

  it('asks to confirm the cautions first', () => {
    expect(html(null)).toContain('no personal or patient-identifiable data');
    expect(html(null)).toContain('biosafety and chemical-safety rules');
    expect(html(null)).toContain('local rules and licensed practice come first');
  });

  it('stays reachable while it does nothing, and says why', () => {
    const described = /<button aria-disabled="true" aria-describedby="([^"]+)"/.exec(html(null));
    expect(html(null)).not.toContain('disabled=""');
    expect(html(null)).toContain(`<p id="${described?.[1]}"`);
    expect(html(null)).toContain('Confirm both sentences first.');
  });

  it('says what is in the way', () => {
    expect(html('Save it first.')).toContain('Save it first.');
  });
});

it('letters are shown with their revision; a decision without one is not', () => {
  const decidedAt = '2026-11-12T10:00:00.000Z';
  const html = renderToStaticMarkup(
    <Letters
      decisions={[
        { revision: 2, kind: 'accepted', letter: ' ', decidedAt },
        { revision: 1, kind: 'changes-requested', letter: 'Please <b>mend</b> it.', decidedAt },
      ]}
    />,
  );
  expect(html).toContain('Please &lt;b&gt;mend&lt;/b&gt; it.');
  expect(html.match(/<li/g)).toHaveLength(1);
  expect(renderToStaticMarkup(<Letters decisions={[]} />)).toBe('');
});
