import type { DocumentError } from '@/lib/documents/document-error';

/** What is said of a document whose system is not listed: a check takes any, a submission does not. */
export function unlistedSystem(slug: string): DocumentError {
  const named = slug === '' ? '' : `“${slug}” `;
  return {
    pointer: '/system',
    detail: `no system ${named}is listed; take the slug of one at /api/v1/systems`,
  };
}
