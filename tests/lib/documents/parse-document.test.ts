import { describe, expect, it } from 'vitest';
import { parseDocument } from '@/lib/documents/parse-document';
import { contractDocument } from '../../support/contract-document';

const text = JSON.stringify(contractDocument(), null, 2);
const DEEP = 20_000;

describe('a document', () => {
  it('is read from text and from bytes, with a byte order mark and without', () => {
    const document = contractDocument();
    for (const source of [
      text,
      `\uFEFF${text}`,
      new TextEncoder().encode(text),
      new TextEncoder().encode(`\uFEFF${text}`),
    ])
      expect(parseDocument(source)).toEqual({ ok: true, document });
  });

  it('comes with all that is wrong with it', () => {
    expect(parseDocument(text.replace('"CC-BY-4.0"', '"MIT"'))).toEqual({
      ok: false,
      reason: 'invalid',
      errors: [{ pointer: '/licence', detail: 'licence must be CC0-1.0 or CC-BY-4.0; found the text “MIT”' }],
    });
  });

  it.each(['[]', '5', 'null', '"x"'])('is not %s', (source) => {
    expect(parseDocument(source)).toMatchObject({ ok: false, reason: 'invalid', errors: [{ pointer: '' }] });
  });
});

describe('a text that is no JSON', () => {
  it.each<[string, number, number, string]>([
    ['', 1, 1, 'the text is empty'],
    ['{\n  "a": 0.4l\n}', 2, 11, 'only text in double quotes, a number such as 0.42'],
    ['{\n  "a": 1,\n}', 3, 1, 'after the last property there is no comma'],
    ['[1,\n 2,]', 2, 4, 'after the last entry of a list there is no comma'],
    ['{"a": 1', 1, 8, 'the object must be closed by }'],
    ['{"a" 1}', 1, 6, 'a colon must stand'],
    ['{\n\n  // why\n}', 3, 3, 'JSON takes no comments'],
    ['{"a": NaN}', 1, 7, 'only text in double quotes, a number such as 0.42'],
    ["{'a': 1}", 1, 2, 'only text in double quotes'],
    ['{"a": "x\ny"}', 1, 7, 'must be closed by a double quote on the same line'],
    ['{} {}', 1, 4, 'the text must end'],
  ])('%j: the place and what would be right', (source, line, column, detail) => {
    const parsed = parseDocument(source);
    expect(parsed).toMatchObject({ ok: false, reason: 'syntax', line, column });
    expect(parsed).toHaveProperty('detail', expect.stringContaining(detail));
  });

  it('is told from bytes that are no UTF-8', () => {
    expect(parseDocument(new Uint8Array([0x7b, 0x0a, 0x22, 0xc3, 0xa9, 0xff]))).toMatchObject({
      reason: 'syntax',
      line: 2,
      column: 3,
      detail: 'the file must be saved as UTF-8; a character here is not',
    });
  });
});

describe('20,000 levels of nesting', () => {
  const nested = '['.repeat(DEEP) + ']'.repeat(DEEP);

  it.each([
    ['closed', nested],
    ['as objects', `${'{"a":'.repeat(DEEP)}1${'}'.repeat(DEEP)}`],
    ['in an unknown property', text.replace('"title"', `"x": ${nested}, "title"`)],
    [
      'in a known one',
      text.replace('"title"', `"ligands": ${nested}, "title"`).replace('"ligands": [\n', '"y": [\n'),
    ],
    ['in a point', text.replace('"activity": 0.91', `"activity": ${nested}`)],
  ])('%s get clean errors', (_, source) => {
    expect(parseDocument(source)).toMatchObject({ ok: false, reason: 'invalid' });
  });

  it.each([
    ['never closed', '['.repeat(DEEP)],
    ['closed wrongly', `${'['.repeat(DEEP)}${'}'.repeat(DEEP)}`],
  ])('%s get a place', (_, source) => {
    expect(parseDocument(source)).toMatchObject({ ok: false, reason: 'syntax', line: 1, column: 501 });
  });
});

it('says of a decimal comma that it is one', () => {
  expect(parseDocument('{ "u": 0,15 }')).toMatchObject({
    ok: false,
    reason: 'syntax',
    line: 1,
    column: 10,
    detail: 'a number takes a decimal point, not a comma: 0.15',
  });
});
