import { DeadEnd } from '@/components/layout/dead-end';
import { ActionLink } from '@/components/ui/action-link';

/** For somebody who signed in and may not see this. */
export function ForbiddenPage() {
  return (
    <DeadEnd
      title="This page is not for your account"
      ways={
        <>
          <ActionLink href="/check" prefetch={false}>
            Check data
          </ActionLink>
          <ActionLink href="/">Start page</ActionLink>
        </>
      }
    >
      <p>You are signed in, but what stands here belongs to another role or another laboratory.</p>
    </DeadEnd>
  );
}
