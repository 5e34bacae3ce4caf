'use client';

import { type RefObject, useState } from 'react';
import { Button } from '@/components/ui/button';

interface DocumentTextProps {
  text: string;
  area: RefObject<HTMLTextAreaElement | null>;
  /** what keeps the text from being a document, as a sentence; null where nothing is known to */
  problem: { line: number; column: number; detail: string } | null;
  onText: (text: string) => void;
  onLine: (line: number, column: number) => void;
}

/** The document as JSON: whatever the form has no field for is changed here. */
export function DocumentText({ text, area, problem, onText, onLine }: DocumentTextProps) {
  const [line, setLine] = useState(1);
  return (
    <div className="flex h-full flex-col">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 border-hairline border-b px-2 py-1.5 text-sm text-soft max-lg:px-0">
        {problem ? (
          <p role="alert" className="text-off">
            {problem.detail}{' '}
            <Button onClick={() => onLine(problem.line, problem.column)}>Go to line {problem.line}</Button>
          </p>
        ) : (
          <p>Kept as it stands, valid or not. Ctrl + S saves.</p>
        )}
        <p className="figures">line {line}</p>
      </div>
      <textarea
        ref={area}
        aria-label="Document as JSON"
        spellCheck={false}
        autoComplete="off"
        wrap="off"
        value={text}
        onChange={({ target }) => onText(target.value)}
        onSelect={({ currentTarget }) =>
          setLine(currentTarget.value.slice(0, currentTarget.selectionStart).split('\n').length)
        }
        className="source-text h-[36rem] w-full resize-y lg:h-[max(24rem,calc(100dvh-var(--header-height)-7rem))] bg-transparent px-3 py-2.5 text-ink max-lg:px-0"
      />
    </div>
  );
}
