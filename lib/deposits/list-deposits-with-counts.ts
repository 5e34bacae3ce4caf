/** Lists the deposits of the actor's laboratories, each with what its newest revision amounts to. */
import { readDatabase } from '@/db/client';
import type { DepositHead } from '@/db/queries/deposits';
import { selectNewestSummaries } from '@/db/queries/revisions';
import type { AssessmentSummary } from '@/lib/engine/assessment';
import type { Outcome } from '@/lib/errors';
import { listDeposits } from './list-deposits';

export interface CountedDeposit extends DepositHead {
  /** null where nothing was submitted yet */
  summary: AssessmentSummary | null;
}

/** A page of the list, as `listDeposits` gives it. */
export async function listDepositsWithCounts(
  call: Parameters<typeof listDeposits>[0],
): Promise<Outcome<{ deposits: CountedDeposit[]; next: string | null }>> {
  const listed = await listDeposits(call);
  if (!listed.ok) return listed;
  const ids = listed.deposits.map(({ id }) => id);
  const summaries = await selectNewestSummaries(await readDatabase(), ids);
  const deposits = listed.deposits.map((deposit) => withCounts(deposit, summaries.get(deposit.id)));
  return { ok: true, deposits, next: listed.next };
}

function withCounts(deposit: DepositHead, summary: string | undefined): CountedDeposit {
  return { ...deposit, summary: summary === undefined ? null : (JSON.parse(summary) as AssessmentSummary) };
}
