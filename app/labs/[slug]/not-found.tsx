import type { Metadata } from 'next';
import { DeadEnd } from '@/components/layout/dead-end';
import { ActionLink } from '@/components/ui/action-link';

// Next takes what the page itself says only where it is there.
export const metadata: Metadata = { title: 'There is no such laboratory' };

export default function NoSuchLaboratory() {
  return (
    <DeadEnd
      title="There is no such laboratory"
      ways={
        <ActionLink href="/datasets" prefetch={false}>
          Browse all datasets
        </ActionLink>
      }
    >
      <p>The address may be mistyped. The filters of the list name every laboratory that published.</p>
    </DeadEnd>
  );
}
