/** The verb by which a curator gives a deposit back with a letter. */
import { type Answered, answerWithLetter } from './answer-with-letter';
import type { DecisionCall } from './reach-decidable';

/** Asks the depositor for changes; the deposit can then be edited and submitted again as its next revision. */
export function askForChanges(call: DecisionCall): Promise<Answered> {
  return answerWithLetter(call, 'changes-requested', 'write what should be changed');
}
