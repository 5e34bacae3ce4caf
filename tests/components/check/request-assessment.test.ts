import { afterEach, describe, expect, it, vi } from 'vitest';
import { requestAssessment } from '@/components/check/request-assessment';
import { assess } from '@/lib/engine/assess';
import { answerAsServer, answerNothing, answerWith } from '../../support/answer-fetch';
import { contractDocument } from '../../support/contract-document';

afterEach(() => vi.unstubAllGlobals());

const PROBLEM = {
  type: '/api/v1/problems/rate-limited',
  title: 'Too many calls',
  status: 429,
  detail: 'Wait.',
};

describe('asking the server', () => {
  it('gives the assessment', async () => {
    const sent = answerAsServer();
    const document = contractDocument();
    const answer = await requestAssessment(JSON.stringify(document));
    expect(answer).toEqual({ ok: true, assessment: JSON.parse(JSON.stringify(assess(document))) });
    expect(sent).toEqual([JSON.stringify(document)]);
  });

  it('gives the problem as it is told', async () => {
    answerWith(415, PROBLEM, { 'Content-Type': 'application/problem+json' });
    expect(await requestAssessment('{}')).toEqual({ ok: false, problem: PROBLEM });
  });

  it('adds when to try again', async () => {
    answerWith(429, PROBLEM, {
      'Content-Type': 'application/problem+json; charset=utf-8',
      'Retry-After': '17',
    });
    const answer = await requestAssessment('{}');
    expect(answer).toEqual({ ok: false, problem: { ...PROBLEM, detail: 'Wait. Try again in 17 s.' } });
  });

  it('throws on an answer that is no problem and no assessment', async () => {
    answerWith(502, 'Bad gateway', { 'Content-Type': 'text/html' });
    await expect(requestAssessment('{}')).rejects.toThrow('The server answered 502 without saying why.');
  });

  it('throws where there is no server', async () => {
    answerNothing();
    await expect(requestAssessment('{}')).rejects.toThrow(TypeError);
  });
});
