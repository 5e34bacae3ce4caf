'use client';

import Link from 'next/link';
import { type ReactNode, useDeferredValue, useRef } from 'react';
import { AxisFrame } from '@/components/layout/axis-frame';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { selectLine } from '@/components/ui/select-line';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import type { SourceOutcome } from './assess-source';
import type { CsvDraft } from './csv-draft';
import { CsvForm } from './csv-form';
import { ExampleList } from './example-list';
import type { ExampleSlug } from './example-words';
import { ProblemList } from './problem-list';
import { kindOf, type Source } from './read-source';
import { SourceEditor } from './source-editor';

interface SourceViewProps {
  source: Source;
  draft: CsvDraft | null;
  outcome: SourceOutcome | null;
  busy: boolean;
  /** whether an earlier assessment can be gone back to */
  hasResult: boolean;
  onSource: (source: Source) => void;
  onDraft: (draft: CsvDraft) => void;
  onRefused: (sentence: string) => void;
  onAssess: () => void;
  onExample: (slug: ExampleSlug) => void;
  onTable: () => Promise<void>;
  onResult: () => void;
  /** the way to a draft, for those who may make one */
  keep?: ReactNode;
}

const NO_ERRORS: ReadonlyMap<string, string> = new Map();

/** What is to be checked: the source in the middle, the form of a table on its left, what to mend on its right. */
export function SourceView(props: SourceViewProps) {
  const {
    source,
    draft,
    outcome,
    busy,
    hasResult,
    onSource,
    onDraft,
    onRefused,
    onAssess,
    onExample,
    onTable,
  } = props;
  const area = useRef<HTMLTextAreaElement>(null);
  // Where the columns are rows the editor stands above what was just clicked.
  const showEditor = () => {
    area.current?.focus({ preventScroll: true });
    area.current?.scrollIntoView({ block: 'center' });
  };
  // A large table is read when the typing pauses, not at every key.
  const text = useDeferredValue(source.text);
  const isTable = text.trim() !== '' && kindOf({ ...source, text }) === 'table';
  const table = isTable ? readCsvPoints(text) : null;
  return (
    <form
      className="flex grow flex-col"
      onSubmit={(event) => {
        event.preventDefault();
        onAssess();
      }}
    >
      <AxisFrame
        who={
          <>
            <h1 className="head text-3xl">Check data</h1>
            <p className="mt-3 text-soft">
              The server recomputes every point’s free-energy coordinate from the parameters that you state,
              and shows which points miss the master curve. Nobody signs in.
            </p>
            <div className="mt-3 empty:hidden">{props.keep}</div>
            {hasResult ? (
              <p className="mt-3">
                <Button onClick={props.onResult}>Back to the last assessment</Button>
              </p>
            ) : null}
            {table && draft && table.series.length > 0 ? (
              <CsvForm
                draft={draft}
                table={table}
                errors={outcome?.kind === 'to-mend' ? outcome.formErrors : NO_ERRORS}
                onChange={onDraft}
              />
            ) : (
              <Forms />
            )}
          </>
        }
        axis={
          <SourceEditor
            source={source}
            area={area}
            busy={busy}
            onSource={onSource}
            onRefused={onRefused}
            onAssess={onAssess}
          />
        }
        verdict={
          <div className="space-y-7">
            {outcome?.kind === 'to-mend' ? (
              <ProblemList
                problems={outcome.problems}
                text={source.text}
                onLine={(line, column) => area.current && selectLine(area.current, line, column)}
              />
            ) : null}
            {outcome?.kind === 'refused' ? (
              <Notice kind="error" title={outcome.title} live>
                <p>{outcome.detail}</p>
              </Notice>
            ) : null}
            <ExampleList busy={busy} onExample={onExample} onTable={() => void onTable().then(showEditor)} />
          </div>
        }
      />
    </form>
  );
}

/** What can be given, for a reader who has given nothing yet. */
function Forms() {
  return (
    <dl className="mt-6 space-y-4 border-hairline border-t pt-4 text-sm">
      <div>
        <dt className="font-semibold">A dataset document</dt>
        <dd className="mt-0.5 text-soft">
          JSON after the{' '}
          <a className="text-act underline underline-offset-4" href="/api/v1/schemas/dataset-1">
            schema
          </a>
          : series with their points and the parameters that you claim for them, each with unit and
          orientation.
        </dd>
      </div>
      <div>
        <dt className="font-semibold">A table of points</dt>
        <dd className="mt-0.5 text-soft">
          CSV with one row a point:{' '}
          <span className="whitespace-nowrap">series, velline (uM), activity, u</span>. The parameters are
          then typed here.
        </dd>
      </div>
      <div>
        <dt className="font-semibold">Uncertainties</dt>
        <dd className="mt-0.5 text-soft">
          Standard uncertainties (one sigma). What they do is written under{' '}
          <Link className="text-act underline underline-offset-4" href="/methods" prefetch={false}>
            Methods
          </Link>
          .
        </dd>
      </div>
    </dl>
  );
}
