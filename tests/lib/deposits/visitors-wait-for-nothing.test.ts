/** Somebody who has not signed in is turned away without a turn at the one writer. */
import { setTimeout as sleep } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import { VISITOR } from '@/lib/auth/actor';
import { signOut } from '@/lib/auth/sign-out';
import { deleteDraft } from '@/lib/deposits/delete-draft';
import { recallDeposit } from '@/lib/deposits/recall-deposit';
import { removeFile } from '@/lib/deposits/remove-file';
import { holdWriter } from '@/tests/support/hold-writer';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

const CALLS = {
  deleteDraft: () => deleteDraft({ actor: VISITOR, id: 'any', expected: 'any' }),
  recallDeposit: () => recallDeposit({ actor: VISITOR, id: 'any' }),
  removeFile: () => removeFile({ actor: VISITOR, id: 'any', fileId: 'any' }),
  signOut: () => signOut(VISITOR, 'a session that is none'),
};

describe('a visitor', () => {
  it.each(Object.entries(CALLS))('who calls %s does not wait for a write under way', async (_, call) => {
    // The first refusal of the minute is noted on the audit trail, which is a write.
    await call();
    const release = await holdWriter();
    const first = await Promise.race([call().then(() => 'answered'), sleep(2_000, 'waited')]);
    await release();
    expect(first).toBe('answered');
  });
});
