'use client';

import { type KeyboardEvent, useId } from 'react';
import type { DraftAccess } from './draft-access';
import { listOf, readEntry } from './draft-value';
import { useTyped } from './use-typed';

interface CellProps {
  draft: DraftAccess;
  pointer: string;
  name: string;
}

const CELL =
  'figures -my-1 min-h-7 w-full min-w-14 border-transparent border-b-2 bg-transparent text-right hover:border-field focus:border-act aria-invalid:border-off aria-invalid:text-off';

/** One cell of the table of points: a number, or replicates with space between them. */
export function PointCell({ draft, pointer, name }: CellProps) {
  return pointer.endsWith('/replicates') ? (
    <ReplicatesCell draft={draft} pointer={pointer} name={name.replace('activity', 'replicates')} />
  ) : (
    <NumberCell draft={draft} pointer={pointer} name={name} />
  );
}

function NumberCell({ draft, pointer, name }: CellProps) {
  const { text, onText } = useTyped(draft, pointer);
  return <CellInput draft={draft} pointer={pointer} name={name} text={text} onText={onText} />;
}

/** Replicates, with space between them. */
function ReplicatesCell({ draft, pointer, name }: CellProps) {
  const list = listOf(draft.at(pointer));
  const onText = (text: string) =>
    draft.set(
      pointer,
      text
        .split(/[\s;]+/)
        .map(readEntry)
        .filter((one) => one !== undefined),
    );
  // Read when the cell is left: while it is typed a space at the end means that more comes.
  return (
    <ReplicatesInput
      key={list.join(' ')}
      draft={draft}
      pointer={pointer}
      name={name}
      start={list.join(' ')}
      onText={onText}
    />
  );
}

function ReplicatesInput({
  draft,
  pointer,
  name,
  start,
  onText,
}: CellProps & { start: string; onText: (text: string) => void }) {
  const id = useId();
  const error = errorBelow(draft, pointer);
  return (
    <>
      <input
        type="text"
        aria-label={name}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? id : undefined}
        data-pointer={pointer}
        autoComplete="off"
        defaultValue={start}
        onBlur={({ target }) => {
          if (target.value !== start) onText(target.value);
        }}
        onKeyDown={stepByEnter}
        className={CELL}
      />
      <CellError id={id} error={error} />
    </>
  );
}

/** What is wrong with a list, or with one of its entries. */
function errorBelow(draft: DraftAccess, pointer: string): string | undefined {
  return draft.errorAt(pointer, ...listOf(draft.at(pointer)).map((_, i) => `${pointer}/${i}`));
}

function CellInput({
  draft,
  pointer,
  name,
  text,
  onText,
}: CellProps & { text: string; onText: (text: string) => void }) {
  const id = useId();
  // What is wrong with the whole point is said where its activity stands.
  const error = draft.errorAt(pointer, pointer.replace(/\/activity$/, ''));
  return (
    <>
      <input
        type="text"
        inputMode="decimal"
        autoComplete="off"
        aria-label={name}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? id : undefined}
        data-pointer={pointer}
        value={text}
        onChange={({ target }) => onText(target.value)}
        onKeyDown={stepByEnter}
        className={CELL}
      />
      <CellError id={id} error={error} />
    </>
  );
}

function CellError({ id, error }: { id: string; error: string | undefined }) {
  return error ? (
    <span id={id} className="mt-1 block min-w-28 text-left text-off text-xs">
      {error}
    </span>
  ) : null;
}

/** Enter goes to the same cell of the next row, with Shift of the row before. */
function stepByEnter(event: KeyboardEvent<HTMLInputElement>): void {
  if (event.key !== 'Enter') return;
  event.preventDefault();
  const cell = event.currentTarget.closest('td');
  const row = cell?.parentElement?.[event.shiftKey ? 'previousElementSibling' : 'nextElementSibling'];
  const next = cell && row?.children[cell.cellIndex]?.querySelector('input');
  next?.focus();
  next?.select();
}
