import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import { ageWords } from '@/components/curation/age-words';
import { QueueTable } from '@/components/curation/queue-table';

const HOUR = 3_600_000;

it.each([
  [0, 'less than an hour'],
  [1.5 * HOUR, '1 hour'],
  [30 * HOUR, '30 hours'],
  [49 * HOUR, '2 days'],
])('%d ms are %s', (ms, words) => {
  expect(ageWords(ms)).toBe(words);
});

const WAITING = {
  id: 'd1',
  title: 'Tail deletions',
  state: 'submitted' as const,
  system: 'alrq-velline',
  labName: 'Sunder Lab',
  revision: 2,
  ageMs: 72 * HOUR,
  summary: { points: 150, onCurve: 122, offCurve: 18, rmsZ: 2.853 },
  blocked: false,
};

it('shows what a curator chooses by, and why one is not theirs to decide', () => {
  const html = renderToStaticMarkup(
    <QueueTable queue={[WAITING, { ...WAITING, id: 'd2', blocked: true }]} />,
  );
  for (const words of [
    'Tail deletions',
    'Sunder Lab',
    'alrq-velline',
    '3 days',
    '122 / 150',
    '2.85',
    'revision 2',
  ]) {
    expect(html).toContain(words);
  }
  expect(html).toContain('href="/curation/d1"');
  // Once in the table, once in the list for narrow screens.
  expect(html.match(/Of your own laboratory/g)).toHaveLength(2);
});

it('says so when nothing waits', () => {
  expect(renderToStaticMarkup(<QueueTable queue={[]} />)).toContain('Nothing waits for a decision.');
});
