'use client';

import { type UseMutationOptions, type UseMutationResult, useMutation } from '@tanstack/react-query';

/**
 * A call that changes something. Without a connection it fails at once, and says so, in place of waiting for one
 * in silence.
 */
export function useCall<Answer, Given = void>(
  options: UseMutationOptions<Answer, Error, Given>,
): UseMutationResult<Answer, Error, Given> {
  return useMutation({ ...options, networkMode: 'always' });
}
