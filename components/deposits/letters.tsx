import type { DepositAnswer } from '@/schemas/deposit';
import { Moment } from './moment';

type Decision = DepositAnswer['decisions'][number];

const KIND_WORDS: Record<Decision['kind'], string> = {
  accepted: 'accepted',
  'changes-requested': 'asked for changes',
  declined: 'declined',
};

/** What the curators wrote, the newest first; decisions without a word are left out. */
export function Letters({ decisions }: { decisions: readonly Decision[] }) {
  const letters = decisions.filter(({ letter }) => letter.trim() !== '');
  if (letters.length === 0) return null;
  return (
    <section aria-label="Letters of the curator" className="mt-5 border-ink border-t pt-3">
      <h2 className="font-semibold">
        {letters.length === 1 ? 'Letter of the curator' : 'Letters of the curator'}
      </h2>
      <ol className="mt-1.5 space-y-4">
        {letters.map(({ revision, kind, letter, decidedAt }) => (
          <li key={`${revision} ${decidedAt}`}>
            <p className="whitespace-pre-wrap break-words font-serif">{letter}</p>
            <p className="mt-1 text-sm text-soft">
              Revision {revision}, {KIND_WORDS[kind]}, <Moment at={decidedAt} />
            </p>
          </li>
        ))}
      </ol>
    </section>
  );
}
