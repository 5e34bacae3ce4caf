'use client';

import { useRef } from 'react';
import { CallFailed, newKey } from './call-api';

/** Answers of the server after which the same call may yet have its effect, or had it: wait, and try again. */
const PASSING = [408, 425, 429];

/**
 * The Idempotency-Key of something that is to be done once: the same for every attempt, until the server has refused
 * it for good. Where no answer came, or the server stumbled, it may have been done.
 */
export function useCallKey(): { current: () => string; after: (error: unknown) => void } {
  const key = useRef<string>(undefined);
  return {
    current: () => {
      key.current ??= newKey();
      return key.current;
    },
    after: (error) => {
      if (isFinal(error)) key.current = undefined;
    },
  };
}

/** Whether a call was refused for good, so that nothing of it stands under its key. */
export function isFinal(error: unknown): boolean {
  if (!(error instanceof CallFailed)) return false;
  const { status } = error.complaint;
  return status >= 400 && status < 500 && !PASSING.includes(status);
}
