'use client';

import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';

/** Removes the draft, after a second word. */
export function DeleteDraft({ busy, onDelete }: { busy: boolean; onDelete: () => void }) {
  return (
    <Disclosure summary="Delete the draft" className="mt-5 border-hairline border-t pt-3">
      <p className="text-sm">The draft and its files go for good.</p>
      <Button className="mt-1" disabled={busy} onClick={onDelete}>
        {busy ? 'Deleting …' : 'Delete it for good'}
      </Button>
    </Disclosure>
  );
}
