import { FormRow } from '@/components/ui/form-row';
import type { DraftAccess } from './draft-access';
import { ChoiceAt, QuantityAt, TextAt } from './draft-fields';

const METHODS = [
  { value: 'absolute', label: 'absolute' },
  { value: 'two-reference', label: 'two references, 0 and 1' },
  { value: 'series-min-max', label: 'by the series’ own range' },
];

const TEMPERATURE_UNITS = [
  { value: 'degC', label: '°C' },
  { value: 'K', label: 'K' },
];

/** How the activity was measured and scaled, and at which temperature. */
export function AssaySection({ draft }: { draft: DraftAccess }) {
  return (
    <div className="space-y-4">
      <TextAt draft={draft} pointer="/assay/readout" label="Readout" hint="what was read out" />
      <TextAt
        draft={draft}
        pointer="/assay/conditions"
        label="Conditions"
        hint="buffer, pH, salts and whatever else matters"
        lines={3}
      />
      <div className="border-hairline border-t">
        <FormRow label="Temperature">
          <QuantityAt draft={draft} pointer="/temperature" name="temperature" units={TEMPERATURE_UNITS} />
        </FormRow>
      </div>
      <ChoiceAt draft={draft} pointer="/normalisation/method" label="Normalisation" options={METHODS} />
      <TextAt
        draft={draft}
        pointer="/normalisation/note"
        label="What 0 and 1 stand for"
        hint="such as: 0 without enzyme, 1 the wild type without ligand"
        lines={2}
        optional
      />
    </div>
  );
}
