'use client';

import { useState } from 'react';
import type { DraftAccess } from './draft-access';
import { entryText, readEntry } from './draft-value';

interface Typed {
  text: string;
  onText: (text: string) => void;
}

/** A number of the draft as it is typed: `1.` is kept as it stands while it means 1. */
export function useTyped(draft: DraftAccess, pointer: string): Typed {
  const value = draft.at(pointer);
  const [typed, setTyped] = useState({ pointer, text: entryText(value), value });
  const isCurrent = typed.pointer === pointer && typed.value === value;
  return {
    text: isCurrent ? typed.text : entryText(value),
    onText: (text) => {
      const next = readEntry(text);
      setTyped({ pointer, text, value: next });
      draft.set(pointer, next);
    },
  };
}
