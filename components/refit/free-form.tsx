'use client';

import type { FreeParameter } from '@/lib/engine/free-parameters';
import type { FreeableRow } from './freeable';
import { ParameterName } from './parameter-name';

export type Share = FreeParameter['share'];

interface FreeFormProps {
  rows: readonly FreeableRow[];
  /** by key of the row; a row that is not in it stays as stated */
  chosen: ReadonlyMap<string, Share>;
  /** whether there are several series, among which a value could be shared */
  several: boolean;
  disabled: boolean;
  onChoose: (key: string, share: Share | null) => void;
}

/** A row for every parameter that can be freed, with its choices. */
export function FreeForm({ rows, chosen, several, disabled, onChoose }: FreeFormProps) {
  const choices: { value: Share | null; label: string }[] = several
    ? [
        { value: null, label: 'as stated' },
        { value: 'series', label: 'per series' },
        { value: 'dataset', label: 'shared by the dataset' },
      ]
    : [
        { value: null, label: 'as stated' },
        { value: 'series', label: 'free' },
      ];
  return (
    <div className="mt-4 max-w-[52rem] border-ink border-t">
      {rows.map(({ key, label, stated }) => (
        <fieldset
          key={key}
          disabled={disabled}
          className="grid grid-cols-1 items-baseline gap-x-6 border-hairline border-b py-1 sm:grid-cols-[minmax(0,1fr)_auto]"
        >
          <legend className="float-left w-full pt-1 sm:w-auto">
            <ParameterName name={label} /> <span className="figures text-sm text-soft">{stated}</span>
          </legend>
          <span className="flex flex-wrap gap-x-5">
            {choices.map(({ value, label: words }) => (
              <label
                key={words}
                className="inline-flex min-h-8 items-center border-transparent border-b-2 text-sm text-soft hover:text-ink has-checked:border-act has-checked:font-semibold has-checked:text-ink has-disabled:cursor-not-allowed has-focus-visible:outline-2 has-focus-visible:outline-act"
              >
                <input
                  type="radio"
                  name={`free ${key}`}
                  className="sr-only"
                  checked={(chosen.get(key) ?? null) === value}
                  onChange={() => onChoose(key, value)}
                />
                {words}
              </label>
            ))}
          </span>
        </fieldset>
      ))}
    </div>
  );
}
