'use client';

import { useSyncExternalStore } from 'react';

export const STILL = '(prefers-reduced-motion: reduce)';

/** Whether a media query holds; false on the server. */
export function useMedia(query: string): boolean {
  return useSyncExternalStore(
    (changed) => {
      const media = matchMedia(query);
      media.addEventListener('change', changed);
      return () => media.removeEventListener('change', changed);
    },
    () => matchMedia(query).matches,
    () => false,
  );
}
