import type { ReactNode } from 'react';

interface NoticeProps {
  kind: 'note' | 'warning' | 'error';
  title: string;
  children?: ReactNode;
  /** spoken when it appears: for what follows an action of the reader */
  live?: boolean;
}

const WORDS = { note: 'text-ink', warning: 'text-warn', error: 'text-off' } as const;
const LINES = { note: 'border-hairline', warning: 'border-warn', error: 'border-off' } as const;

/** Something to be told: a line above and words below it, no box. */
export function Notice({ kind, title, children, live = false }: NoticeProps) {
  const role = live ? (kind === 'error' ? 'alert' : 'status') : undefined;
  return (
    <div role={role} className={`border-t pt-3 ${LINES[kind]}`}>
      <p className={`font-semibold ${WORDS[kind]}`}>{title}</p>
      {children ? <div className="mt-1 space-y-2">{children}</div> : null}
    </div>
  );
}
