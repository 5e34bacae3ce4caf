import type { Route } from 'next';
import { publicationWords } from '@/components/deposits/publication-words';
import { ActionLink } from '@/components/ui/action-link';
import { Notice } from '@/components/ui/notice';
import type { DepositHeadAnswer } from '@/schemas/deposit';

/** What came of a decision, and where to go from there. */
export function Decided({ deposit: { state, accession, publication } }: { deposit: DepositHeadAnswer }) {
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
  if (state === 'accepted' && publication) {
    return (
      <Notice kind="note" title="Accepted" live>
        <p>It is published on {publicationWords(publication)}.</p>
        <p>{queue}</p>
      </Notice>
    );
  }
  if (state === 'declined') {
    return (
      <Notice kind="note" title="Declined" live>
        <p>The laboratory sees your letter with the deposit, which stays as it is.</p>
        <p>{queue}</p>
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
