import { Button } from '@/components/ui/button';
import { EXAMPLE_WORDS, type ExampleSlug } from './example-words';

interface ExampleListProps {
  onExample: (slug: ExampleSlug) => void;
  onTable: () => void;
  busy: boolean;
}

/** Invented datasets, one click away from their assessment. */
export function ExampleList({ onExample, onTable, busy }: ExampleListProps) {
  return (
    <section aria-label="Examples">
      <h2 className="border-ink border-b pb-1.5 font-semibold">Invented examples</h2>
      <ul>
        {EXAMPLE_WORDS.map(({ slug, title, about }) => (
          <li key={slug} className="border-hairline border-b py-2.5">
            <Button disabled={busy} onClick={() => onExample(slug)}>
              {title}
            </Button>
            <p className="text-sm text-soft">{about}</p>
          </li>
        ))}
        <li className="py-2.5">
          <Button disabled={busy} onClick={onTable}>
            A table of points
          </Button>
          <p className="text-sm text-soft">
            CSV, one row a point, with its parameters typed in the form beside it.
          </p>
        </li>
      </ul>
    </section>
  );
}
