import type { Metadata } from 'next';
import { DeadEnd } from '@/components/layout/dead-end';
import { ActionLink } from '@/components/ui/action-link';

// Next takes what the page itself says only where it is there.
export const metadata: Metadata = { title: 'There is no such dataset' };

export default function NoSuchDataset() {
  return (
    <DeadEnd
      title="There is no such dataset"
      ways={
        <ActionLink href="/datasets" prefetch={false}>
          Browse all datasets
        </ActionLink>
      }
    >
      <p>
        An accession is like <span className="figures whitespace-nowrap">CK-000123</span>, or{' '}
        <span className="figures whitespace-nowrap">CK-000123.2</span> for a certain revision. This one is not
        published, or not in that revision.
      </p>
    </DeadEnd>
  );
}
