import type { Metadata } from 'next';
import { DeadEnd } from '@/components/layout/dead-end';
import { ActionLink } from '@/components/ui/action-link';

export const metadata: Metadata = { title: 'No such page' };

export default function NotFound() {
  return (
    <DeadEnd
      title="There is no page at this address"
      ways={
        <>
          <p className="text-sm text-soft">Check the address for a slip, or go on from here.</p>
          <ActionLink href="/check" prefetch={false}>
            Check data
          </ActionLink>
          <ActionLink href="/methods" prefetch={false}>
            Methods
          </ActionLink>
          <ActionLink href="/" prefetch={false}>
            Start page
          </ActionLink>
        </>
      }
    >
      <p>The address may be mistyped, or what stood here has moved. Nothing of yours is lost by it.</p>
    </DeadEnd>
  );
}
