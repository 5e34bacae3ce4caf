import { type ReactNode, useId } from 'react';

export interface FieldWords {
  label: string;
  /** what is wanted, in a few words */
  hint?: ReactNode;
  /** what would be right; shown in place of the hint's colour, never by colour alone */
  error?: ReactNode;
}

interface FieldProps extends FieldWords {
  className?: string;
  /** the control, given the attributes that tie it to its words */
  children: (tie: ControlTie) => ReactNode;
}

export interface ControlTie {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
}

/** Line below a control instead of a box around it; a thicker one in the off-curve colour where it is wrong. */
export const CONTROL_STYLE =
  'min-h-8 w-full min-w-0 border-field border-b bg-transparent text-base text-ink placeholder:text-soft hover:border-ink aria-invalid:border-off aria-invalid:border-b-2 disabled:text-soft';

/** Label above, control, then hint and error below it, tied together for assistive technology. */
export function Field({ label, hint, error, className = '', children }: FieldProps) {
  const id = useId();
  const described = [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ');
  return (
    <div className={className}>
      <label htmlFor={id} className="block text-sm text-soft">
        {label}
      </label>
      {children({ id, 'aria-describedby': described || undefined, 'aria-invalid': error ? true : undefined })}
      {hint ? (
        <p id={`${id}-hint`} className="mt-1 text-soft text-xs">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-off text-xs">
          {error}
        </p>
      ) : null}
    </div>
  );
}
