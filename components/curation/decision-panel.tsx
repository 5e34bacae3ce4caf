'use client';

import { useState } from 'react';
import { type Decision, decideOn } from '@/components/deposits/deposit-calls';
import { ProblemNotice } from '@/components/deposits/problem-notice';
import { dayWords } from '@/components/deposits/publication-words';
import { useCall } from '@/components/deposits/use-call';
import { useCallKey } from '@/components/deposits/use-call-key';
import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import { CONTROL_STYLE, Field } from '@/components/ui/field';
import { Decided } from './decided';
import { type LaterDay, LaterPublication } from './later-publication';

interface DecisionPanelProps {
  id: string;
  /** the revision that is being looked at */
  revision: number;
}

type Kind = Decision['kind'];

const MISSING = {
  'changes-requested': 'Write what should be changed.',
  declined: 'Write why it is declined.',
};

/** The letter and the three decisions; afterwards what came of it. */
export function DecisionPanel({ id, revision }: DecisionPanelProps) {
  const [letter, setLetter] = useState('');
  const [missing, setMissing] = useState<string>();
  const [later, setLater] = useState<LaterDay>({ day: '', timeZone: 'UTC' });
  const key = useCallKey();
  const { mutate, isPending, data, error, variables } = useCall({
    mutationFn: (kind: Kind) => {
      const publication = kind === 'accepted' && later.day !== '' ? later : undefined;
      return decideOn(id, { kind, letter, revision, publication }, key.current());
    },
    onError: key.after,
  });
  if (data) return <Decided deposit={data} />;
  const answer = (kind: keyof typeof MISSING) => {
    const isEmpty = letter.trim() === '';
    setMissing(isEmpty ? MISSING[kind] : undefined);
    if (!isEmpty) mutate(kind);
  };
  const words = (kind: Kind, idle: string, busy: string) => (isPending && variables === kind ? busy : idle);
  const accept = later.day === '' ? 'Accept and publish' : `Accept, publish on ${dayWords(later.day)}`;
  return (
    <section aria-label="Decision">
      <h2 className="font-semibold">Decision on revision {revision}</h2>
      <Field
        className="mt-3"
        label="Letter to the depositors"
        hint="what should be changed and why; with an acceptance it may stay empty"
        error={missing}
      >
        {(tie) => (
          <textarea
            {...tie}
            rows={7}
            maxLength={20_000}
            value={letter}
            onChange={({ target }) => {
              setLetter(target.value);
              setMissing(undefined);
            }}
            className={`${CONTROL_STYLE} resize-y bg-wash px-2 py-1.5 font-serif`}
          />
        )}
      </Field>
      <div className="mt-3 flex flex-col items-start gap-2">
        <Button disabled={isPending} onClick={() => answer('changes-requested')}>
          {words('changes-requested', 'Ask for changes', 'Sending …')}
        </Button>
        <Button variant="primary" disabled={isPending} onClick={() => mutate('accepted')}>
          {words('accepted', accept, 'Accepting …')}
        </Button>
      </div>
      <LaterPublication later={later} onLater={setLater} />
      <Disclosure summary="Decline" className="mt-3">
        <p className="text-sm">
          That is final: a declined deposit can neither be changed nor submitted again. The laboratory reads
          your letter and may begin a new draft from the document.
        </p>
        <Button className="mt-1" disabled={isPending} onClick={() => answer('declined')}>
          {words('declined', 'Decline it for good', 'Declining …')}
        </Button>
      </Disclosure>
      <div className="mt-3 empty:hidden">
        <ProblemNotice error={error} />
      </div>
    </section>
  );
}
