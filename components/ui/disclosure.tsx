import type { ComponentProps, ReactNode } from 'react';

interface DisclosureProps extends Omit<ComponentProps<'details'>, 'children'> {
  summary: ReactNode;
  children: ReactNode;
}

/** What can be opened and closed, by the browser's own means. */
export function Disclosure({ summary, children, className = '', ...rest }: DisclosureProps) {
  return (
    <details {...rest} className={`group ${className}`}>
      <summary className="inline-flex min-h-6 list-none items-center gap-2 font-semibold text-act underline-offset-4 hover:underline [&::-webkit-details-marker]:hidden">
        <svg
          viewBox="0 0 8 8"
          aria-hidden="true"
          className="size-2 fill-current transition-transform group-open:rotate-90"
        >
          <path d="M1.5 0 6.5 4 1.5 8z" />
        </svg>
        {summary}
      </summary>
      <div className="pt-2">{children}</div>
    </details>
  );
}
