import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import { CREDIT_ROLES } from './credit-roles';
import type { DraftAccess } from './draft-access';
import { TextAt } from './draft-fields';
import { isObject, listOf, textOf } from './draft-value';
import { OddShape } from './odd-shape';

/** The people who contributed, in the order in which they are cited. */
export function ContributorFields({ draft }: { draft: DraftAccess }) {
  const contributors = draft.at('/contributors');
  if (contributors !== undefined && !Array.isArray(contributors)) return <OddShape what="Contributors" />;
  const list = listOf(contributors);
  const error = draft.errorAt('/contributors');
  return (
    <fieldset>
      <legend className="mb-1 font-semibold">Contributors</legend>
      {error ? <p className="mb-2 text-off text-xs">{error}</p> : null}
      <ol>
        {list.map((contributor, i) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: contributors have no name of their own but their place
          <li key={i} className="border-hairline border-t py-3">
            {isObject(contributor) ? (
              <ContributorRow draft={draft} pointer={`/contributors/${i}`} place={i + 1} />
            ) : (
              <OddShape what="A contributor" />
            )}
          </li>
        ))}
      </ol>
      <div data-pointer="/contributors" className="border-hairline border-t pt-2">
        <Button onClick={() => draft.set(`/contributors/${list.length}`, { name: '', roles: [] })}>
          Add a contributor
        </Button>
      </div>
    </fieldset>
  );
}

interface ContributorProps {
  draft: DraftAccess;
  pointer: string;
  /** from 1 */
  place: number;
}

function ContributorRow({ draft, pointer, place }: ContributorProps) {
  const name = textOf(draft.at(`${pointer}/name`)) || `contributor ${place}`;
  return (
    <div className="space-y-3">
      <TextAt draft={draft} pointer={`${pointer}/name`} label={`Name of contributor ${place}`} />
      <TextAt
        draft={draft}
        pointer={`${pointer}/orcid`}
        label="ORCID iD"
        hint="0000-0002-1825-0097, or left empty"
        optional
      />
      <RoleBoxes draft={draft} pointer={`${pointer}/roles`} name={name} />
      <Button onClick={() => draft.set(pointer, undefined)} className="text-sm">
        Take {name} away
      </Button>
    </div>
  );
}

function RoleBoxes({ draft, pointer, name }: { draft: DraftAccess; pointer: string; name: string }) {
  const roles = listOf(draft.at(pointer));
  const error = draft.errorAt(pointer);
  const toggle = (role: string, on: boolean) =>
    draft.set(pointer, on ? [...roles, role] : roles.filter((one) => one !== role));
  return (
    <div data-pointer={pointer}>
      <Disclosure
        className="text-sm"
        summary={
          <span>
            Roles<span className="sr-only"> of {name}</span>
            {roles.length === 0 ? ': none yet' : `: ${roles.join(', ')}`}
          </span>
        }
      >
        {CREDIT_ROLES.map((role) => (
          <label key={role} className="flex min-h-6 items-center gap-2">
            <input
              type="checkbox"
              checked={roles.includes(role)}
              onChange={({ target }) => toggle(role, target.checked)}
              className="size-4 accent-act"
            />
            {role}
          </label>
        ))}
      </Disclosure>
      {error ? <p className="text-off text-xs">{error}</p> : null}
    </div>
  );
}
