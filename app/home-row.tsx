import type { ReactNode } from 'react';
import { RowFrame } from '@/components/layout/row-frame';

interface HomeRowProps {
  title: string;
  /** the way to more of it */
  where: ReactNode;
  children: ReactNode;
}

/** One thing to know, on the page's three columns: its name, what it is, where to find it. */
export function HomeRow({ title, where, children }: HomeRowProps) {
  return (
    <RowFrame
      className="max-lg:gap-y-1 max-lg:py-5"
      who={<h2 className="font-semibold text-[1rem] lg:py-5">{title}</h2>}
      axis={
        <p className="max-w-[44rem] text-pretty font-serif text-lg leading-[1.55] lg:px-7 lg:py-5">
          {children}
        </p>
      }
      verdict={<p className="text-sm lg:py-5">{where}</p>}
    />
  );
}
