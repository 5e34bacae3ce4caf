import type { ComponentProps } from 'react';
import { CONTROL_STYLE, Field, type FieldWords } from './field';

type TextFieldProps = FieldWords & Omit<ComponentProps<'input'>, 'id'>;

/** One line of text. */
export function TextField({ label, hint, error, className, ...input }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(tie) => <input type="text" autoComplete="off" {...input} {...tie} className={CONTROL_STYLE} />}
    </Field>
  );
}
