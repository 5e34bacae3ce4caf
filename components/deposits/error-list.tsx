import { Button } from '@/components/ui/button';
import { formatCount } from '@/components/ui/format-quantity';
import type { DocumentError } from '@/lib/documents/document-error';

const MOST_SHOWN = 50;

interface ErrorListProps {
  errors: readonly DocumentError[];
  /** whether a place is as it was when the error was found */
  isStanding: (pointer: string) => boolean;
  /** leads to the field of a place */
  onGo: (pointer: string) => void;
}

/** What stands in the way of submitting, each thing leading to its field. */
export function ErrorList({ errors, isStanding, onGo }: ErrorListProps) {
  const title = errors.length === 1 ? 'One thing to mend' : `${formatCount(errors.length)} things to mend`;
  return (
    <section aria-label="What is wrong" className="mt-5 border-off border-t pt-3">
      <h2 className="font-semibold text-off">{title}</h2>
      <ol className="mt-1.5 text-sm">
        {errors.slice(0, MOST_SHOWN).map(({ pointer, detail }) => (
          <li key={`${pointer} ${detail}`} className="border-hairline border-b py-2">
            <p className={isStanding(pointer) ? '' : 'text-soft line-through'}>
              {detail.charAt(0).toUpperCase() + detail.slice(1)}
            </p>
            <Button onClick={() => onGo(pointer)} className="text-xs">
              <span className="break-all">{pointer === '' ? 'the document' : pointer}</span>
            </Button>
            {isStanding(pointer) ? null : (
              <p className="text-soft text-xs">Changed since; save to check it again.</p>
            )}
          </li>
        ))}
      </ol>
      {errors.length > MOST_SHOWN ? (
        <p className="mt-2 text-sm text-soft">and {formatCount(errors.length - MOST_SHOWN)} more.</p>
      ) : null}
    </section>
  );
}
