/** The verb by which a curator declines a deposit, with the reason as a letter. */
import { type Answered, answerWithLetter } from './answer-with-letter';
import type { DecisionCall } from './reach-decidable';

/** Declines a deposit for good: it can neither be changed nor submitted again, and is never published. */
export function declineDeposit(call: DecisionCall): Promise<Answered> {
  return answerWithLetter(call, 'declined', 'write why it is declined');
}
