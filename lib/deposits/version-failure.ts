/** Why a change is refused that is not of the present version: who saved it, and when. */
import type { DepositHead } from '@/db/queries/deposits';
import { type Failed, failed } from '@/lib/errors';
import type { versionRefusal } from '@/lib/serving/if-match';

/** The failure; of a stale version it names the change that came between. */
export function versionFailure(
  refusal: NonNullable<ReturnType<typeof versionRefusal>>,
  { version, savedBy, updatedAt }: Pick<DepositHead, 'version' | 'savedBy' | 'updatedAt'>,
): Failed {
  if (refusal !== 'stale') return failed(refusal);
  const who = savedBy ?? 'a curator';
  const when = new Date(updatedAt).toISOString().slice(0, 16).replace('T', ' ');
  return failed(
    'stale',
    `Version ${version} was saved by ${who} on ${when} UTC; load it and repeat the change.`,
  );
}
