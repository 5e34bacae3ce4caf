import type { ComponentProps } from 'react';
import { CONTROL_STYLE, Field, type FieldWords } from './field';

type NumberFieldProps = FieldWords & Omit<ComponentProps<'input'>, 'id' | 'type'> & { unit?: string };

/**
 * A number as it is typed. A text control on purpose: browsers drop what they cannot read from a number control,
 * and then nobody can say what was wrong with it.
 */
export function NumberField({ label, hint, error, unit, className, ...input }: NumberFieldProps) {
  return (
    <Field label={unit ? `${label}, ${unit}` : label} hint={hint} error={error} className={className}>
      {(tie) => (
        <input
          type="text"
          inputMode="decimal"
          autoComplete="off"
          {...input}
          {...tie}
          className={`${CONTROL_STYLE} figures text-right`}
        />
      )}
    </Field>
  );
}
