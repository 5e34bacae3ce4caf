import type { Contributor } from '@/schemas/dataset-1.generated';

/** Who contributed, in the order in which they are cited, with what they did. */
export function ContributorList({ contributors }: { contributors: readonly Contributor[] }) {
  return (
    <ul className="space-y-1.5">
      {contributors.map(({ name, orcid, roles }) => (
        <li key={`${name} ${orcid ?? ''}`}>
          <span className="font-semibold">{name}</span>
          {orcid ? (
            <>
              {' '}
              <a
                href={`https://orcid.org/${orcid}`}
                rel="noreferrer"
                className="figures inline-block min-h-6 text-act text-sm underline underline-offset-4"
              >
                {orcid}
              </a>
            </>
          ) : null}
          <span className="block text-sm text-soft">{roles.join(', ')}</span>
        </li>
      ))}
    </ul>
  );
}
