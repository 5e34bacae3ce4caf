import { describe, expect, it } from 'vitest';
import { chooseMediaType, choosePointFormat } from '@/lib/datasets/choose-format';

const OFFERED = ['application/json', 'text/csv', 'application/x-ndjson'] as const;

describe('the media type that a caller likes best', () => {
  it.each([
    [null, 'application/json'],
    ['', 'application/json'],
    ['*/*', 'application/json'],
    ['text/csv', 'text/csv'],
    ['TEXT/CSV', 'text/csv'],
    ['text/*', 'text/csv'],
    ['application/*;q=0.2, text/csv;q=0.1', 'application/json'],
    ['application/json;q=0.5, text/csv', 'text/csv'],
    ['*/*, application/json;q=0', 'text/csv'],
    ['text/csv; charset=utf-8; q=0.9, application/x-ndjson', 'application/x-ndjson'],
    ['text/html,application/xhtml+xml,*/*;q=0.8', 'application/json'],
  ])('%s: %s', (accept, type) => {
    expect(chooseMediaType(accept, OFFERED)).toBe(type);
  });

  it.each(['text/html', 'application/json;q=0', 'application/pdf, image/*', 'text/csv;q=2'])(
    '%s: none',
    (accept) => {
      expect(chooseMediaType(accept, OFFERED)).toBeNull();
    },
  );
});

describe('the form of points', () => {
  const choose = (query: string, accept: string | null) =>
    choosePointFormat(new URLSearchParams(query), accept);

  it('is what the address says before what the header says', () => {
    expect(choose('format=ndjson', 'text/csv')).toEqual({ ok: true, format: 'ndjson' });
    expect(choose('', 'text/csv')).toEqual({ ok: true, format: 'csv' });
  });

  it.each([
    ['format=xml', null, 'bad-parameter', 'format'],
    ['format=csv&format=json', null, 'bad-parameter', 'format'],
    ['form=csv', null, 'bad-parameter', 'form'],
    ['', 'text/html', 'not-acceptable', 'text/csv'],
  ])('%s %s: %s', (query, accept, code, named) => {
    const chosen = choose(query, accept);
    if (chosen.ok) throw new Error('It should have been refused.');
    expect(chosen.failure.code).toBe(code);
    expect(chosen.failure.detail).toContain(named);
  });
});
