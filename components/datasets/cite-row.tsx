'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import type { Citation } from '@/schemas/dataset-answers';
import { RecordRow } from './record-row';

/** How the shown revision is cited. */
export function CiteRow({ citation }: { citation: Citation }) {
  return (
    <RecordRow title="Cite" id="cite" aside="This revision, so that the figures stay what they were.">
      <p className="break-words font-serif text-lg leading-[1.55]">{citation.text}</p>
      <CopyButton words="Copy the reference" text={citation.text} />
      <Disclosure summary="BibTeX" className="mt-3">
        <Source text={citation.bibtex} label="BibTeX entry" />
        <CopyButton words="Copy the BibTeX entry" text={citation.bibtex} />
      </Disclosure>
      <Disclosure summary="RIS" className="mt-1">
        <Source text={citation.ris} label="RIS record" />
        <CopyButton words="Copy the RIS record" text={citation.ris} />
      </Disclosure>
    </RecordRow>
  );
}

function Source({ text, label }: { text: string; label: string }) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1)
    <section aria-label={label} tabIndex={0} className="overflow-x-auto">
      <pre className="source-text">{text}</pre>
    </section>
  );
}

function CopyButton({ words, text }: { words: string; text: string }) {
  const [said, setSaid] = useState('');
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      setSaid('Copied.');
    } catch {
      setSaid('The browser did not allow it: mark the text and copy it by hand.');
    }
  };
  return (
    <p className="no-print mt-1 flex flex-wrap items-baseline gap-x-3">
      <Button onClick={() => void copy()}>{words}</Button>
      <span role="status" className="text-sm text-soft">
        {said}
      </span>
    </p>
  );
}
