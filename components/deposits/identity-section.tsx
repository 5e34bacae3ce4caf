import type { SelectOption } from '@/components/ui/select-field';
import { ContributorFields } from './contributor-fields';
import type { DraftAccess } from './draft-access';
import { ChoiceAt, TextAt } from './draft-fields';

const LICENCES = [
  { value: 'CC-BY-4.0', label: 'CC BY 4.0: used with credit' },
  { value: 'CC0-1.0', label: 'CC0 1.0: no rights kept' },
];

interface IdentitySectionProps {
  draft: DraftAccess;
  systems: readonly SelectOption[];
}

/** What the dataset is and whose. */
export function IdentitySection({ draft, systems }: IdentitySectionProps) {
  return (
    <div className="space-y-4">
      <TextAt draft={draft} pointer="/title" label="Title" lines={2} />
      <TextAt
        draft={draft}
        pointer="/abstract"
        label="Abstract"
        hint="what was measured and why, in a paragraph"
        lines={5}
      />
      <ChoiceAt
        draft={draft}
        pointer="/system"
        label="System"
        hint="The protein and its ligands, from the curators’ list. If yours is not on it, save the draft without a system and ask the curators of this installation to list it: until then it counts as one thing to mend, and nothing else waits for it."
        options={systems}
      />
      <ChoiceAt draft={draft} pointer="/licence" label="Licence" options={LICENCES} />
      <ContributorFields draft={draft} />
    </div>
  );
}
