import { SelectField } from '@/components/ui/select-field';

/** A laboratory that the reader deposits for. */
export interface DepositingLab {
  slug: string;
  name: string;
}

interface LabChoiceProps {
  labs: readonly DepositingLab[];
  lab: string;
  onLab: (slug: string) => void;
}

/** For which laboratory; nothing to choose where there is one. */
export function LabChoice({ labs, lab, onLab }: LabChoiceProps) {
  if (labs.length < 2) return null;
  return (
    <SelectField
      label="For the laboratory"
      value={lab}
      options={labs.map(({ slug, name }) => ({ value: slug, label: name }))}
      onChange={({ target }) => onLab(target.value)}
    />
  );
}
