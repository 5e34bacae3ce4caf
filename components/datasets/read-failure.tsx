import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { AnswerError } from './fetch-answer';

interface ReadFailureProps {
  /** what could not be read */
  what: string;
  error: Error;
  onRetry: () => void;
}

/** Something could not be read: what, why, and the way to try again. */
export function ReadFailure({ what, error, onRetry }: ReadFailureProps) {
  const reason = error instanceof AnswerError ? `${error.title}. ${error.detail}` : '';
  return (
    <Notice kind="error" title={`${what} could not be read`} live>
      <p>{reason} Nothing is lost: the address holds what you chose.</p>
      <Button onClick={onRetry}>Try again</Button>
    </Notice>
  );
}
