import { Button } from '@/components/ui/button';
import { formatCount } from '@/components/ui/format-quantity';
import type { DocumentError } from '@/lib/documents/document-error';
import { formPlace, inFormWords } from './form-words';

const MOST_SHOWN = 50;

interface ErrorListProps {
  errors: readonly DocumentError[];
  /** the draft, whose names places are said by; null while it is edited as text, where places are pointers */
  document: unknown;
  /** whether a place is as it was when the error was found */
  isStanding: (pointer: string) => boolean;
  /** leads to the field of a place */
  onGo: (pointer: string) => void;
}

/** What stands in the way of submitting, each thing leading to its field. */
export function ErrorList({ errors, document, isStanding, onGo }: ErrorListProps) {
  const title = errors.length === 1 ? 'One thing to mend' : `${formatCount(errors.length)} things to mend`;
  return (
    <section aria-label="What is wrong" id="to-mend" className="mt-5 scroll-mt-28 border-off border-t pt-3">
      <h2 className="font-semibold text-off">{title}</h2>
      <ol className="mt-1.5 text-sm">
        {errors.slice(0, MOST_SHOWN).map((error) => (
          <ErrorEntry
            key={`${error.pointer} ${error.detail}`}
            error={error}
            document={document}
            isStanding={isStanding(error.pointer)}
            onGo={() => onGo(error.pointer)}
          />
        ))}
      </ol>
      {errors.length > MOST_SHOWN ? (
        <p className="mt-2 text-sm text-soft">and {formatCount(errors.length - MOST_SHOWN)} more.</p>
      ) : null}
    </section>
  );
}

interface ErrorEntryProps {
  error: DocumentError;
  document: unknown;
  isStanding: boolean;
  onGo: () => void;
}

function ErrorEntry({ error, document, isStanding, onGo }: ErrorEntryProps) {
  const { pointer } = error;
  const place = document === null ? null : formPlace(pointer, document);
  const { detail } = place === null ? error : inFormWords(error, document);
  const words =
    place === null ? pointer || 'the document' : [place.label, place.where].filter(Boolean).join(', ');
  return (
    <li className="border-hairline border-b py-2">
      <Button onClick={onGo}>
        <span className={place === null ? 'break-all' : 'break-words'}>{words}</span>
      </Button>
      <p className={isStanding ? '' : 'text-soft line-through'}>
        {detail.charAt(0).toUpperCase() + detail.slice(1)}
      </p>
      {place === null ? null : <p className="break-all text-soft text-xs">{pointer}</p>}
      {isStanding ? null : <p className="text-soft text-xs">Changed since; save to check it again.</p>}
    </li>
  );
}
