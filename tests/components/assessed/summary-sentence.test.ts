import { expect, it } from 'vitest';
import { sentenceOn } from '@/components/assessed/summary-sentence';
import { EXAMPLE_WORDS, isExampleSlug, loadExample } from '@/components/check/example-words';
import { parseDocument } from '@/lib/documents/parse-document';
import { plottedExample } from '../../support/plotted-dataset';

const window = { from: -10, to: 4 };

it('says in one sentence what the collapse shows', () => {
  const data = plottedExample('thousand-fold');
  expect(sentenceOn(data, { window, byLigand: null })).toBe(
    'Activity of 56 points in 4 series against free energy from −10 to 4 kT, beside the master curve: 46 on the curve, 0 warnings, 10 off the curve.',
  );
  expect(sentenceOn(data, { window, byLigand: 'velline' })).toContain(
    'against the concentration of velline:',
  );
});

it.each(EXAMPLE_WORDS)('$slug is offered and can be read', async ({ slug }) => {
  expect(isExampleSlug(slug)).toBe(true);
  expect(parseDocument(await loadExample(slug))).toMatchObject({ ok: true });
});

it('knows no other example', () => {
  expect(isExampleSlug('other')).toBe(false);
  expect(isExampleSlug(null)).toBe(false);
});
