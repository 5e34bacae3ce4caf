/** What is wrong with a document as far as a submission goes: what a check finds, and a system that is not listed. */
import { isListedSystem, type Reader } from '@/db/queries/deposits';
import type { DocumentError } from '@/lib/documents/document-error';

/** What is found, and that the system is not listed where it is not: a check takes any, a submission does not. */
export async function withUnlistedSystem(
  reader: Reader,
  { system }: { system: string },
  found: DocumentError[],
): Promise<DocumentError[]> {
  const isTold = found.some(({ pointer }) => pointer === '/system');
  return isTold || (await isListedSystem(reader, system)) ? found : [...found, unlistedSystem(system)];
}

function unlistedSystem(slug: string): DocumentError {
  const named = slug === '' ? '' : `“${slug}” `;
  return {
    pointer: '/system',
    detail: `no system ${named}is listed; take the slug of one at /api/v1/systems`,
  };
}
