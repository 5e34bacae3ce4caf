'use client';

import { useId, useState } from 'react';
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
  const id = useId();
  const reason = obstacle ?? (confirmed.length < CAUTIONS.length ? 'Confirm both sentences first.' : null);
  const isReady = reason === null && !busy;
  return (
    <form
      aria-label="Submit for curation"
      id="submission"
      className="mt-5 scroll-mt-28 border-ink border-t pt-3"
      onSubmit={(event) => {
        event.preventDefault();
        if (isReady) onSubmit();
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
      {/* Reachable while it does nothing, so that the reason is read where one looks for the action. */}
      <Button
        type="submit"
        variant={obstacle === null ? 'primary' : 'outline'}
        className="mt-3"
        aria-disabled={!isReady}
        aria-describedby={reason === null ? undefined : id}
      >
        {busy ? 'Submitting …' : 'Submit for curation'}
      </Button>
      {reason === null ? null : (
        <p id={id} className="mt-1.5 text-sm text-warn">
          {reason}
        </p>
      )}
    </form>
  );
}
