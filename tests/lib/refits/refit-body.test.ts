import { describe, expect, it } from 'vitest';
import { type RefitProgress, refit } from '@/lib/engine/refit';
import { refitBody } from '@/lib/refits/refit-body';
import { problemSchema } from '@/schemas/problem';
import { refitAnswerSchema } from '@/schemas/refit';
import { bytesOf, quickRefit } from '@/tests/support/refit-calls';

function answerTo(body: unknown) {
  const { status, body: bytes } = refitBody(bytesOf(body), () => undefined);
  return { status, answer: JSON.parse(new TextDecoder().decode(bytes)) };
}

describe('the body of a refit', () => {
  it('is answered with what the engine computes', () => {
    const { document, free } = quickRefit();
    const { status, answer } = answerTo({ document, free });
    expect(status).toBe(200);
    expect(refitAnswerSchema.parse(answer)).toEqual(
      JSON.parse(JSON.stringify(refit(document as never, free as never))),
    );
    expect(answer.estimates).toHaveLength(4);
  });

  it('tells its progress', () => {
    const seen: RefitProgress[] = [];
    refitBody(bytesOf(quickRefit()), (progress) => seen.push(progress));
    expect(seen.length).toBeGreaterThan(1);
    expect(seen.at(-1)?.progress).toBeLessThanOrEqual(1);
  });

  it('that is not JSON is answered with line and column', () => {
    const { status, answer } = answerTo('{\n "document": {},,\n}');
    expect(status).toBe(400);
    expect(problemSchema.parse(answer)).toMatchObject({ line: 2, type: '/api/v1/problems/malformed-json' });
  });

  it('is answered with everything that is wrong, each at its place in the body', () => {
    const { document } = quickRefit();
    document.licence = 'none';
    const free = [
      { parameter: 'gaps', share: 'series' },
      { parameter: 'gap', share: 'all', colour: 1 },
    ];
    const { status, answer } = answerTo({ document, free, other: 1 });
    expect(status).toBe(422);
    const pointers = problemSchema.parse(answer).errors?.map(({ pointer }) => pointer);
    expect(pointers).toEqual(
      expect.arrayContaining([
        '/other',
        '/document/licence',
        '/free/0/parameter',
        '/free/1/share',
        '/free/1',
      ]),
    );
  });

  it.each([
    ['a list', '[]', ['']],
    ['a document alone', { document: quickRefit().document }, ['/free']],
    ['nothing to fit', { ...quickRefit(), free: [] }, ['/free']],
    ['parameters alone', { free: quickRefit().free }, ['/document']],
    [
      'a ligand that is not there',
      {
        ...quickRefit(),
        free: [{ parameter: 'inactive', siteClass: 'main', ligand: 'vellin', share: 'dataset' }],
      },
      ['/free/0/ligand'],
    ],
  ])('that is %s is refused at its place', (_, body, pointers) => {
    const { status, answer } = answerTo(body);
    expect(status).toBe(422);
    expect(problemSchema.parse(answer).errors?.map(({ pointer }) => pointer)).toEqual(pointers);
  });

  it('may ask for at most 40 values', () => {
    const { document } = quickRefit();
    const [one] = document.series;
    document.series = Array.from({ length: 41 }, (_, i) => ({ ...one, id: `s${i}` }));
    const { status, answer } = answerTo({ document, free: [{ parameter: 'gap', share: 'series' }] });
    expect(status).toBe(422);
    expect(answer.errors[0]).toEqual({ pointer: '/free', detail: expect.stringContaining('come to 41') });
  });
});
