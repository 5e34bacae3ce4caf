'use client';

import { type KeyboardEvent, useId, useState } from 'react';
import type { DraftAccess } from './draft-access';
import { objectOf } from './draft-value';
import { measuredPlaces, measuredText, withMeasured } from './measured-entry';
import { useTyped } from './use-typed';

interface CellProps {
  draft: DraftAccess;
  pointer: string;
  name: string;
}

const CELL =
  'figures -my-1 min-h-7 w-full min-w-14 border-transparent border-b-2 bg-transparent text-right hover:border-field focus:border-act aria-invalid:border-off aria-invalid:text-off';

/** One cell of the table of points that holds a number. */
export function PointCell({ draft, pointer, name }: CellProps) {
  const { text, onText } = useTyped(draft, pointer);
  return (
    <CellInput pointer={pointer} name={name} text={text} error={draft.errorAt(pointer)} onText={onText} />
  );
}

/** The cell of a point's activity: a number, or replicates with space between them. `pointer` is the point's. */
export function MeasuredCell({ draft, pointer, name }: CellProps) {
  const point = objectOf(draft.at(pointer));
  const shown = measuredText(point);
  const [typed, setTyped] = useState({ text: shown, shown });
  const onText = (text: string) => {
    const next = withMeasured(point, text);
    setTyped({ text, shown: measuredText(next) });
    draft.set(pointer, next);
  };
  const hasReplicates = point.replicates !== undefined;
  return (
    <CellInput
      pointer={`${pointer}/${hasReplicates ? 'replicates' : 'activity'}`}
      name={hasReplicates ? name.replace('activity', 'replicates') : name}
      text={typed.shown === shown ? typed.text : shown}
      error={draft.errorAt(...measuredPlaces(pointer, point))}
      onText={onText}
    />
  );
}

interface CellInputProps {
  pointer: string;
  name: string;
  text: string;
  error: string | undefined;
  onText: (text: string) => void;
}

function CellInput({ pointer, name, text, error, onText }: CellInputProps) {
  const id = useId();
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
      {error ? (
        <span id={id} className="mt-1 block min-w-28 text-left text-off text-xs">
          {error}
        </span>
      ) : null}
    </>
  );
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
