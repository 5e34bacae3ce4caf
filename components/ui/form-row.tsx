import type { ReactNode } from 'react';

interface FormRowProps {
  label: string;
  /** a letter before the label, in the italic of the equations */
  symbol?: string;
  note?: string;
  children: ReactNode;
}

/** A line of the form beside a table: what it is on the left, what is stated on the right. */
export function FormRow({ label, symbol, note, children }: FormRowProps) {
  return (
    <div className="grid grid-cols-[5.5rem_minmax(0,1fr)] gap-x-3 border-hairline border-b py-2">
      <p className="pt-1 text-soft">
        {symbol ? <var className="symbol">{symbol} </var> : null}
        {label}
        {note ? <span className="block truncate text-xs">{note}</span> : null}
      </p>
      <div className="min-w-0">{children}</div>
    </div>
  );
}
