import type { ReactNode } from 'react';
import { RowFrame } from '@/components/layout/row-frame';

interface RecordRowProps {
  title: string;
  id?: string;
  /** at the right: what goes with it */
  aside?: ReactNode;
  children: ReactNode;
}

/** One thing on record about a dataset, on the page's three columns. */
export function RecordRow({ title, id, aside = null, children }: RecordRowProps) {
  return (
    <section id={id} aria-label={title} className="scroll-mt-20">
      <RowFrame
        className="max-lg:gap-y-1 max-lg:py-4"
        who={<h2 className="font-semibold lg:py-4">{title}</h2>}
        axis={<div className="max-w-[46rem] lg:px-7 lg:py-4">{children}</div>}
        verdict={<div className="text-sm text-soft lg:py-4">{aside}</div>}
      />
    </section>
  );
}
