'use client';

import type { Route } from 'next';
import { useRef, useState } from 'react';
import { newKey } from '@/components/deposits/call-api';
import { decideOn } from '@/components/deposits/deposit-calls';
import { ProblemNotice } from '@/components/deposits/problem-notice';
import { useCall } from '@/components/deposits/use-call';
import { ActionLink } from '@/components/ui/action-link';
import { Button } from '@/components/ui/button';
import { CONTROL_STYLE, Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import type { DepositHeadAnswer } from '@/schemas/deposit';

interface DecisionPanelProps {
  id: string;
  /** the revision that is being looked at */
  revision: number;
}

type Kind = 'accepted' | 'changes-requested';

/** The letter and the two decisions; afterwards what came of it. */
export function DecisionPanel({ id, revision }: DecisionPanelProps) {
  const [letter, setLetter] = useState('');
  const [missing, setMissing] = useState(false);
  const key = useRef(newKey());
  const { mutate, isPending, data, error, variables } = useCall({
    mutationFn: (kind: Kind) => decideOn(id, { kind, letter, revision }, key.current),
    onError: () => {
      key.current = newKey();
    },
  });
  if (data) return <Decided deposit={data} />;
  const ask = () => {
    const isEmpty = letter.trim() === '';
    setMissing(isEmpty);
    if (!isEmpty) mutate('changes-requested');
  };
  return (
    <section aria-label="Decision">
      <h2 className="font-semibold">Decision on revision {revision}</h2>
      <Field
        className="mt-3"
        label="Letter to the depositors"
        hint="what should be changed and why; with an acceptance it may stay empty"
        error={missing ? 'Write what should be changed.' : undefined}
      >
        {(tie) => (
          <textarea
            {...tie}
            rows={7}
            maxLength={20_000}
            value={letter}
            onChange={({ target }) => {
              setLetter(target.value);
              setMissing(false);
            }}
            className={`${CONTROL_STYLE} resize-y bg-wash px-2 py-1.5 font-serif`}
          />
        )}
      </Field>
      <div className="mt-3 flex flex-col items-start gap-2">
        <Button disabled={isPending} onClick={ask}>
          {isPending && variables === 'changes-requested' ? 'Sending …' : 'Ask for changes'}
        </Button>
        <Button variant="primary" disabled={isPending} onClick={() => mutate('accepted')}>
          {isPending && variables === 'accepted' ? 'Publishing …' : 'Accept and publish'}
        </Button>
      </div>
      <div className="mt-3 empty:hidden">
        <ProblemNotice error={error} />
      </div>
    </section>
  );
}

function Decided({ deposit: { state, accession } }: { deposit: DepositHeadAnswer }) {
  const queue = (
    <ActionLink href="/curation" prefetch={false}>
      Back to the queue
    </ActionLink>
  );
  if (state === 'published' && accession) {
    return (
      <Notice kind="note" title={`Published as ${accession}`} live>
        <p>It lies on the master curve with everything else that is published.</p>
        <p className="flex flex-col items-start gap-1.5">
          <ActionLink href={`/datasets/${accession}` as Route} prefetch={false}>
            Open {accession}
          </ActionLink>
          {queue}
        </p>
      </Notice>
    );
  }
  return (
    <Notice kind="note" title="The letter is sent" live>
      <p>The laboratory sees it with the deposit, changes it, and submits its next revision.</p>
      <p>{queue}</p>
    </Notice>
  );
}
