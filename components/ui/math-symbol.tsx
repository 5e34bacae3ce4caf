import type { ReactNode } from 'react';

interface MathSymbolProps {
  /** one letter, or a few that are a symbol */
  children: ReactNode;
  /** an index in italic: what varies */
  sub?: ReactNode;
  /** an index in roman: a name */
  label?: ReactNode;
}

/** A mathematical symbol in running text, in the same italic as the equations. */
export function MathSymbol({ children, sub, label }: MathSymbolProps) {
  return (
    <span className="whitespace-nowrap">
      <var className="symbol">{children}</var>
      {sub ? <sub className="symbol text-[0.72em]">{sub}</sub> : null}
      {label ? <sub className="font-serif text-[0.72em]">{label}</sub> : null}
    </span>
  );
}
