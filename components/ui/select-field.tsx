import type { ComponentProps } from 'react';
import { CONTROL_STYLE, Field, type FieldWords } from './field';

export interface SelectOption {
  value: string;
  label: string;
}

type SelectFieldProps = FieldWords &
  Omit<ComponentProps<'select'>, 'id' | 'children'> & { options: readonly SelectOption[] };

/** One of a few named choices. */
export function SelectField({ label, hint, error, options, className, ...select }: SelectFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(tie) => (
        <select {...select} {...tie} className={CONTROL_STYLE}>
          {options.map((option) => (
            <option key={option.value} value={option.value} className="bg-ground text-ink">
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
