import { FormRow } from '@/components/ui/form-row';
import { unitLabel } from '@/components/ui/unit-label';
import { CONCENTRATION_UNITS } from '@/lib/engine/units';
import type { DraftAccess } from './draft-access';
import { ChoiceAt, NumberAt, TextAt } from './draft-fields';
import { isObject, listOf, textOf } from './draft-value';
import { OddShape } from './odd-shape';

const UNITS = CONCENTRATION_UNITS.map((unit) => ({ value: unit, label: unitLabel(unit) }));
const KINDS = [
  { value: 'free', label: 'free ligand' },
  { value: 'total', label: 'total ligand, bound and free' },
];

/** The ligands, with the units and uncertainties of their concentrations. Another one is added as JSON. */
export function LigandSection({ draft }: { draft: DraftAccess }) {
  const ligands = draft.at('/ligands');
  if (!Array.isArray(ligands)) return <OddShape what="The list of ligands" />;
  return (
    <>
      {listOf(ligands).map((ligand, i) => {
        const pointer = `/ligands/${i}`;
        if (!isObject(ligand)) return <OddShape key={pointer} what="A ligand" />;
        const name = textOf(ligand.name) || textOf(ligand.id);
        return (
          <section key={pointer} aria-label={`Ligand ${name}`} className="mb-6 space-y-4">
            <TextAt draft={draft} pointer={`${pointer}/name`} label="Name" />
            <ChoiceAt
              draft={draft}
              pointer={`${pointer}/unit`}
              label="Unit of its concentrations"
              options={UNITS}
            />
            <ChoiceAt
              draft={draft}
              pointer={`${pointer}/concentration`}
              label="What the concentrations are"
              options={KINDS}
            />
            <p className="text-sm text-soft">
              How well its concentrations are known, as relative standard uncertainties; left empty: exactly.
            </p>
            <div className="border-hairline border-t">
              <FormRow label="Each dispensing" note="0.02 means 2 %">
                <NumberAt
                  draft={draft}
                  pointer={`${pointer}/relativeU`}
                  name={`relative uncertainty of dispensing ${name}`}
                />
              </FormRow>
              <FormRow label="The stock" note="0.02 means 2 %">
                <NumberAt
                  draft={draft}
                  pointer={`${pointer}/stockRelativeU`}
                  name={`relative uncertainty of the stock of ${name}`}
                />
              </FormRow>
            </div>
          </section>
        );
      })}
      <p className="text-sm text-soft">
        More ligands, modulators, funding and related works are added under “Document as JSON”.
      </p>
    </>
  );
}
