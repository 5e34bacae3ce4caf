'use client';

import { type DragEvent, type RefObject, useEffect, useState } from 'react';
import { Button } from '@/components/ui/button';
import { readFile, type Source } from './read-source';

interface SourceEditorProps {
  source: Source;
  area: RefObject<HTMLTextAreaElement | null>;
  busy: boolean;
  onSource: (source: Source) => void;
  onRefused: (sentence: string) => void;
  onAssess: () => void;
}

const EXPLANATION = 'Paste a dataset document (JSON) or a table of points (CSV), or drop a file here.';

/** Where a document or a table is pasted, dropped or chosen, with the place of the cursor below it. */
export function SourceEditor({ source, area, busy, onSource, onRefused, onAssess }: SourceEditorProps) {
  const [over, setOver] = useState(false);
  const [cursor, setCursor] = useState({ line: 1, column: 1 });
  useEffect(() => {
    const follow = () => {
      if (area.current && document.activeElement === area.current) setCursor(placeOf(area.current));
    };
    document.addEventListener('selectionchange', follow);
    return () => document.removeEventListener('selectionchange', follow);
  }, [area]);
  const take = async (file: File | undefined) => {
    if (!file) return;
    const read = await readFile(file);
    if ('refused' in read) onRefused(read.refused);
    else onSource(read);
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    void take(event.dataTransfer.files[0]);
  };
  return (
    <div className={`flex h-full flex-col ${over ? 'bg-wash' : ''}`}>
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 border-hairline border-b px-2 py-1.5 max-lg:border-t max-lg:px-0">
        <label className="inline-flex min-h-6 cursor-pointer items-center font-semibold text-act underline-offset-4 hover:underline has-focus-visible:outline-2 has-focus-visible:outline-act">
          Choose a file
          <input
            type="file"
            accept=".json,.csv,.tsv,.txt,application/json,text/csv,text/plain"
            className="sr-only"
            onChange={(event) => {
              void take(event.target.files?.[0]);
              event.target.value = '';
            }}
          />
        </label>
        <p className="figures text-sm text-soft">
          {source.name ? `${source.name} · ` : ''}line {cursor.line}, column {cursor.column}
        </p>
      </div>
      <textarea
        ref={area}
        aria-label="Dataset document or table of points"
        placeholder={EXPLANATION}
        spellCheck={false}
        autoComplete="off"
        value={source.text}
        onChange={({ target }) => onSource({ ...source, text: target.value })}
        wrap="off"
        onKeyDown={(event) => {
          if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) onAssess();
        }}
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={drop}
        className="source-text min-h-[26rem] w-full grow resize-y bg-transparent px-3 py-2.5 text-ink placeholder:text-soft max-lg:min-h-[18rem] max-lg:px-0"
      />
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2 border-hairline border-t px-2 py-3 max-lg:px-0">
        <Button type="submit" variant="primary" disabled={busy || source.text.trim() === ''}>
          {busy ? 'Computing' : 'Assess'}
        </Button>
        <p className="text-sm text-soft">
          Nothing is stored on the server. In the text, Ctrl + Enter assesses.
        </p>
      </div>
    </div>
  );
}

function placeOf({ value, selectionStart }: HTMLTextAreaElement): { line: number; column: number } {
  const before = value.slice(0, selectionStart);
  const line = before.split('\n').length;
  return { line, column: selectionStart - before.lastIndexOf('\n') };
}
