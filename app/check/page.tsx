import type { Metadata } from 'next';
import { CheckWorkspace } from '@/components/check/check-workspace';

export const metadata: Metadata = {
  title: 'Check data',
  description:
    'Paste or drop a dataset with its stated parameters and see every point’s free-energy coordinate, the master curve, and what misses it.',
};

/** Paste or drop a document or a table, see its assessment; nothing is stored, nobody signs in. */
export default function CheckPage() {
  return <CheckWorkspace />;
}
