import { Button } from '@/components/ui/button';
import { CalendarDate } from '@/components/ui/calendar-date';
import { Disclosure } from '@/components/ui/disclosure';
import type { ListedToken } from '@/lib/labs/list-tokens';
import { SCOPE_WORDS } from './scope-words';

interface TokenListProps {
  labId: string;
  tokens: readonly ListedToken[];
  revoke: (form: FormData) => Promise<void>;
}

const STATE_WORDS = { live: 'Valid', expired: 'Ended', revoked: 'Withdrawn' } as const;

/** What a laboratory's scripts let themselves in with: what each may do, until when, when it was last used. */
export function TokenList({ labId, tokens, revoke }: TokenListProps) {
  if (tokens.length === 0) {
    return (
      <p className="text-soft">
        No token yet. A script needs one to deposit without a person; make it below.
      </p>
    );
  }
  return (
    <ul>
      {tokens.map((token) => (
        <li key={token.id} className="border-hairline border-b py-3 first:border-t">
          <div className="flex items-baseline justify-between gap-x-5">
            <p className="min-w-0 break-words font-semibold">{token.name}</p>
            <p className={token.state === 'live' ? '' : 'text-soft'}>{STATE_WORDS[token.state]}</p>
          </div>
          <p className="text-sm">May {token.scopes.map((scope) => SCOPE_WORDS[scope]).join('; ')}.</p>
          <TokenDates token={token} />
          {token.state === 'live' ? <Revocation labId={labId} token={token} revoke={revoke} /> : null}
        </li>
      ))}
    </ul>
  );
}

function TokenDates({
  token: { createdAt, createdBy, expiresAt, lastUsedAt, state },
}: {
  token: ListedToken;
}) {
  return (
    <p className="text-sm text-soft">
      Made <CalendarDate at={createdAt} />
      {createdBy ? ` by ${createdBy}` : ''}; {state === 'expired' ? 'ended' : 'ends'}{' '}
      <CalendarDate at={expiresAt} />;{' '}
      {lastUsedAt === null ? 'no script has called with it' : 'a script last called with it '}
      {lastUsedAt === null ? null : <CalendarDate at={lastUsedAt} />}
    </p>
  );
}

function Revocation({
  labId,
  token,
  revoke,
}: {
  labId: string;
  token: ListedToken;
  revoke: TokenListProps['revoke'];
}) {
  return (
    <Disclosure
      summary={
        <>
          End it now<span className="sr-only">: {token.name}</span>
        </>
      }
      className="mt-1 text-sm"
    >
      <form action={revoke} className="flex flex-wrap items-baseline gap-x-5 gap-y-1">
        <input type="hidden" name="labId" value={labId} />
        <input type="hidden" name="tokenId" value={token.id} />
        <p>Scripts that use it stop working at once, and it cannot be given back.</p>
        <Button type="submit">End “{token.name}”</Button>
      </form>
    </Disclosure>
  );
}
