import { afterEach, describe, expect, it, vi } from 'vitest';
import { assessSource } from '@/components/check/assess-source';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import { answerAsServer, answerNothing, answerWith } from '../../support/answer-fetch';
import { changedDocument } from '../../support/change-document';
import { contractDocument } from '../../support/contract-document';
import { filledDraft } from '../../support/filled-draft';

afterEach(() => vi.unstubAllGlobals());

const { signal } = new AbortController();
const TEXT = JSON.stringify(contractDocument(), null, 2);
const TABLE = 'series,velline (uM),activity,u\nwt,0,0.9,0.02\nwt,10,0.5,0.02\n';

const assessText = (text: string) => assessSource({ text, name: null }, null, signal);
function assessTable(text: string, change: (draft: ReturnType<typeof filledDraft>) => void = () => {}) {
  const draft = filledDraft(readCsvPoints(text));
  change(draft);
  return assessSource({ text, name: 'points.csv' }, draft, signal);
}

/** The problems of an outcome, which must have some. */
async function problemsOf(outcome: ReturnType<typeof assessSource>) {
  const found = await outcome;
  if (found.kind !== 'to-mend') throw new Error(`Nothing is to be mended: ${found.kind}.`);
  return found.problems;
}

describe('a document', () => {
  it('is assessed as it stands', async () => {
    const sent = answerAsServer();
    const outcome = await assessText(TEXT);
    expect(outcome).toMatchObject({ kind: 'assessed', data: { document: contractDocument() } });
    expect(sent).toEqual([TEXT]);
  });

  it('may begin with a byte order mark', async () => {
    answerAsServer();
    expect(await assessText(`\uFEFF${TEXT}`)).toMatchObject({
      kind: 'assessed',
      data: { document: contractDocument() },
    });
  });

  it('has each thing that is wrong at its line', async () => {
    answerAsServer();
    const wrong = changedDocument({
      '/ligands/0/unit': 'mol',
      '/series/0/points/0/u': -1,
    });
    const text = JSON.stringify(wrong, null, 2);
    const problems = await problemsOf(assessText(text));
    expect(problems.map(({ pointer }) => pointer).sort()).toEqual([
      '/ligands/0/unit',
      '/series/0/points/0/u',
    ]);
    const lines = text.split('\n');
    const lineOf = (pointer: string) => {
      const line = problems.find((problem) => problem.pointer === pointer)?.line ?? 0;
      return lines[line - 1].trim();
    };
    expect(lineOf('/ligands/0/unit')).toBe('"unit": "mol",');
    expect(lineOf('/series/0/points/0/u')).toBe('"u": -1');
  });

  it('that is no JSON has the line and column where it stops being it', async () => {
    answerAsServer();
    const [problem, ...others] = await problemsOf(assessText('{\n  "format": 1,\n  "title" "x"\n}'));
    expect(others).toEqual([]);
    expect(problem).toMatchObject({ line: 3, column: 11, pointer: null });
    expect(problem.detail).toContain('colon');
  });
});

describe('a table', () => {
  it('becomes a document with the form’s parameters, named after its file', async () => {
    const sent = answerAsServer();
    const outcome = await assessTable(TABLE);
    expect(outcome).toMatchObject({ kind: 'assessed', data: { document: { title: 'points.csv' } } });
    const document = JSON.parse(sent[0]);
    expect(document.series[0].points[1]).toEqual({ ligands: { velline: 10 }, activity: 0.5, u: 0.02 });
    expect(document.series[0].parameters.siteClasses[0].binding[0].inactive).toEqual({
      value: 18,
      u: 1.2,
      unit: 'uM',
    });
  });

  it('is not sent while a cell is bad, which is named with its line', async () => {
    const sent = answerAsServer();
    const problems = await problemsOf(assessTable(TABLE.replace('0.5', '0.4l')));
    expect(problems).toMatchObject([{ line: 3, pointer: null }]);
    expect(problems[0].detail).toContain('0.4l');
    expect(sent).toEqual([]);
  });

  it('is not sent while a field of the form is bad, which is named', async () => {
    const sent = answerAsServer();
    const outcome = await assessTable(TABLE, ({ parameters }) => {
      parameters.gap.value = '';
      parameters.sites.value = '-1';
    });
    expect(outcome).toMatchObject({
      kind: 'to-mend',
      problems: [{ line: null, detail: '2 fields of the form need other entries.' }],
      formErrors: new Map([
        ['parameters.gap.value', 'must be a number, such as 2.4'],
        ['parameters.sites.value', 'must be greater than 0'],
      ]),
    });
    expect(sent).toEqual([]);
  });

  it('has what the server finds at the row that it comes from', async () => {
    answerAsServer();
    const problems = await problemsOf(assessTable(`${TABLE}\nwt,20,0.4,-0.02\n`));
    expect(problems).toMatchObject([{ line: 5, pointer: '/series/0/points/2/u' }]);
  });

  it('has what does not come from a row without a line', async () => {
    answerAsServer();
    const problems = await problemsOf(
      assessTable(TABLE, ({ parameters }) => {
        parameters.gap.value = '500';
      }),
    );
    expect(problems.length).toBeGreaterThan(0);
    for (const { line, pointer } of problems) {
      expect(pointer).toMatch(/^\/series\/0\/parameters\/gap/);
      expect(line).toBeNull();
    }
  });
});

describe('where nothing is wrong with the source', () => {
  it('a server that does not answer is told in words, and that the text is kept', async () => {
    answerNothing();
    expect(await assessText(TEXT)).toEqual({
      kind: 'refused',
      title: 'The server did not answer',
      detail: 'What you pasted is kept here. Check the connection and assess again.',
    });
  });

  it('a refusal is told as the server says it', async () => {
    const problem = { type: '/x', title: 'Too many calls', status: 429, detail: 'Wait a little.' };
    answerWith(429, problem, { 'Content-Type': 'application/problem+json', 'Retry-After': '9' });
    expect(await assessText(TEXT)).toEqual({
      kind: 'refused',
      title: 'Too many calls',
      detail: 'Wait a little. Try again in 9 s. What you pasted is kept here.',
    });
  });

  it('a call that was given up is no outcome', async () => {
    answerNothing();
    await expect(assessSource({ text: TEXT, name: null }, null, AbortSignal.abort())).rejects.toThrow();
  });
});
