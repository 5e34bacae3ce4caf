import { AxisColumns } from '@/components/layout/axis-columns';
import type { OwnLab } from '@/lib/labs/list-own-labs';
import { CreateTokenForm } from './create-token-form';
import { MemberList } from './member-list';
import { TokenList } from './token-list';
import type { CreateTokenState } from './token-state';

interface LabColumnsProps {
  lab: OwnLab;
  /** the page shows this laboratory alone: then its name heads the page */
  alone: boolean;
  /** says beside it what a token is: once on a page */
  explained: boolean;
  createToken: (previous: CreateTokenState, form: FormData) => Promise<CreateTokenState>;
  revokeToken: (form: FormData) => Promise<void>;
}

/** A laboratory from within: who belongs to it, its tokens, what a token is. */
export function LabColumns({ lab, alone, explained, createToken, revokeToken }: LabColumnsProps) {
  const { id, name, institution, members, tokens } = lab;
  const [Name, Part] = alone ? (['h1', 'h2'] as const) : (['h2', 'h3'] as const);
  return (
    <AxisColumns
      roomy
      className="grow border-hairline border-b last:border-b-0"
      who={
        <>
          <Name className="head text-2xl">{name}</Name>
          <p className="mt-1 text-soft">{institution}</p>
          <Part className="mt-6 mb-2 font-semibold">Members</Part>
          <MemberList members={members} />
        </>
      }
      axis={
        <div className="py-6 lg:px-7 lg:pt-7 lg:pb-8">
          <Part className="font-semibold text-lg">Tokens for scripts</Part>
          {tokens ? (
            <div className="mt-3 max-w-[44rem] space-y-8">
              <TokenList labId={id} tokens={tokens} revoke={revokeToken} />
              <CreateTokenForm labId={id} primary={alone} action={createToken} />
            </div>
          ) : (
            <p className="mt-3 max-w-[36rem] text-soft">{askManager(members)}</p>
          )}
        </div>
      }
      verdict={explained ? <TokenWords /> : null}
    />
  );
}

function askManager(members: OwnLab['members']): string {
  const managers = members.filter(({ role }) => role === 'manager').map(({ name }) => name);
  const who = managers.length > 0 ? `: ${managers.join(', ')}` : '';
  return `A script deposits with a token of the laboratory. Managers make and revoke them${who}.`;
}

function TokenWords() {
  return (
    <div className="space-y-3 text-sm text-soft">
      <p>
        A token lets a script do for the laboratory what its members do by hand, within what is ticked, and
        nothing else: it gives no way to other laboratories, to members or to tokens.
      </p>
      <p>It ends by itself, after a year at the latest. Of a token only a hash is kept here.</p>
      <p>
        <a href="/api/v1/openapi.json" className="text-act underline-offset-4 hover:underline">
          API description
        </a>
      </p>
    </div>
  );
}
