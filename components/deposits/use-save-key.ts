'use client';

import { useEffect } from 'react';

/** Ctrl + S (or ⌘ S) anywhere on the page saves, with Caps Lock on as well. */
export function useSaveKey(save: () => void): void {
  useEffect(() => {
    const follow = (event: KeyboardEvent) => {
      if (event.key.toLowerCase() !== 's' || !(event.ctrlKey || event.metaKey)) return;
      event.preventDefault();
      save();
    };
    window.addEventListener('keydown', follow);
    return () => window.removeEventListener('keydown', follow);
  }, [save]);
}
