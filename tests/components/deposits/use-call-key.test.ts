import { describe, expect, it } from 'vitest';
import { CallFailed, NO_ANSWER } from '@/components/deposits/call-api';
import { isFinal } from '@/components/deposits/use-call-key';

const answered = (status: number) => new CallFailed({ status, title: 'x', detail: 'x' });

describe('an Idempotency-Key', () => {
  it.each([400, 403, 404, 409, 412, 422])('is done with after %i: nothing stands under it', (status) => {
    expect(isFinal(answered(status))).toBe(true);
  });

  it.each([408, 429, 500, 502, 503, 504])('is kept after %i: the call may have had its effect', (status) => {
    expect(isFinal(answered(status))).toBe(false);
  });

  it('is kept where no answer came', () => {
    expect(isFinal(new CallFailed(NO_ANSWER))).toBe(false);
    expect(isFinal(new TypeError('Failed to fetch'))).toBe(false);
  });
});
