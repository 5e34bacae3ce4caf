/** What a state of a deposit means for its laboratory, and what there is to do. */
import type { DepositState } from '@/lib/deposits/states';
import type { PublicationDay } from '@/schemas/deposit';
import { dayWords, publicationWords } from './publication-words';

/** What to do next, in a few words. */
export function nextStep(
  state: DepositState,
  errorCount: number,
  publication: PublicationDay | null = null,
): string {
  switch (state) {
    case 'draft':
      return errorCount > 0
        ? `Mend ${errorCount} ${errorCount === 1 ? 'thing' : 'things'}, then submit`
        : 'Submit for curation';
    case 'submitted':
      return 'Wait for a curator, or recall it';
    case 'in-review':
      return 'A curator is reading it';
    case 'changes-requested':
      return 'Read the letter, change it and submit again';
    case 'accepted':
      return publication ? `Wait: published on ${dayWords(publication.day)}` : 'It is being published';
    case 'published':
      return 'Published: anyone can read and cite it';
    case 'declined':
      return 'Read the letter; it is final';
    case 'withdrawn':
      return 'Withdrawn: its tombstone stays';
  }
}

/** What the state means, as a sentence on the deposit’s own page. */
export function stateSentence(state: DepositState, publication: PublicationDay | null = null): string {
  switch (state) {
    case 'draft':
      return 'Only your laboratory sees it.';
    case 'submitted':
      return 'It waits for a curator. Until one begins, it can be recalled.';
    case 'in-review':
      return 'A curator is reading it. It cannot be changed meanwhile.';
    case 'changes-requested':
      return 'A curator asks for changes. Change it and submit it again as its next revision.';
    case 'accepted':
      return publication
        ? `A curator accepted it. It is published on ${publicationWords(publication)}; until then only your laboratory and the curators see it.`
        : 'A curator accepted it; it is being published.';
    case 'published':
      return 'Anyone can read, cite and download it.';
    case 'declined':
      return 'A curator declined it, and that is final: it is not published and can no longer be changed.';
    case 'withdrawn':
      return 'It was withdrawn. Its metadata stay, its data are no longer given out.';
  }
}
