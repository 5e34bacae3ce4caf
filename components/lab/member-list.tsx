import type { OwnLab } from '@/lib/labs/list-own-labs';

/** Who belongs to a laboratory, managers first. */
export function MemberList({ members }: { members: OwnLab['members'] }) {
  if (members.length === 0) return <p className="text-sm text-soft">Nobody belongs to it yet.</p>;
  return (
    <ul>
      {members.map(({ personId, name, email, role }) => (
        <li key={personId} className="border-hairline border-b py-2 first:border-t">
          <div className="flex items-baseline justify-between gap-x-4">
            <span className="min-w-0 break-words">{name}</span>
            <span className="text-sm text-soft">{role}</span>
          </div>
          <p className="break-all text-soft text-xs">{email}</p>
        </li>
      ))}
    </ul>
  );
}
