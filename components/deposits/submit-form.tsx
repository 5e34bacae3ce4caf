'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';

const CAUTIONS = [
  'It holds no personal or patient-identifiable data.',
  'The work followed the biosafety and chemical-safety rules that apply where it was done; local rules and licensed practice come first.',
];

interface SubmitFormProps {
  /** why it cannot be submitted now; null where it can */
  obstacle: string | null;
  busy: boolean;
  onSubmit: () => void;
}

/** Hands the draft to the curators, once the cautions are confirmed. */
export function SubmitForm({ obstacle, busy, onSubmit }: SubmitFormProps) {
  const [confirmed, setConfirmed] = useState<readonly string[]>([]);
  const toggle = (caution: string, on: boolean) =>
    setConfirmed((before) => (on ? [...before, caution] : before.filter((one) => one !== caution)));
  const isReady = obstacle === null && confirmed.length === CAUTIONS.length;
  return (
    <form
      aria-label="Submit for curation"
      className="mt-5 border-ink border-t pt-3"
      onSubmit={(event) => {
        event.preventDefault();
        if (isReady && !busy) onSubmit();
      }}
    >
      <h2 className="font-semibold">Before submitting</h2>
      <p className="mt-1 text-sm text-soft">
        Research data only: not for diagnosis, dosing or safety decisions.
      </p>
      {CAUTIONS.map((caution) => (
        <label key={caution} className="mt-2 flex min-h-6 items-start gap-2 text-sm">
          <input
            type="checkbox"
            checked={confirmed.includes(caution)}
            onChange={({ target }) => toggle(caution, target.checked)}
            className="mt-0.5 size-4 shrink-0 accent-act"
          />
          {caution}
        </label>
      ))}
      {obstacle ? <p className="mt-2 text-sm text-warn">{obstacle}</p> : null}
      <Button type="submit" className="mt-2" disabled={!isReady || busy}>
        {busy ? 'Submitting …' : 'Submit for curation'}
      </Button>
    </form>
  );
}
