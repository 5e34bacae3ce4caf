import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { CheckWorkspace } from '@/components/check/check-workspace';
import { VISITOR } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';

export const metadata: Metadata = {
  title: 'Check data',
  description:
    'Paste or drop a dataset with its stated parameters and see every point’s free-energy coordinate, the master curve, and what misses it.',
};

/** Paste or drop a document or a table, see its assessment; nothing is stored, nobody signs in. */
export default function CheckPage() {
  if (!may(VISITOR, 'check-document')) notFound();
  return <CheckWorkspace />;
}
