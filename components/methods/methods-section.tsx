import type { ReactNode } from 'react';
import { type SectionId, sectionTitle } from './sections';

/** One section of the methods, with an address of its own. */
export function MethodsSection({ id, children }: { id: SectionId; children: ReactNode }) {
  return (
    <section
      aria-labelledby={id}
      className="prose-text mt-10 border-hairline border-t pt-7 first:mt-0 first:border-0 first:pt-0"
    >
      <h2 id={id} className="head text-xl">
        {sectionTitle(id)}
      </h2>
      {children}
    </section>
  );
}
