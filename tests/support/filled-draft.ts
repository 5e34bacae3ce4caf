import { type CsvDraft, draftFor } from '@/components/check/csv-draft';
import type { CsvPoints } from '@/lib/documents/read-csv-points';

/** The form beside a table, filled in so that it is taken. A new one at each call. */
export function filledDraft(table: CsvPoints): CsvDraft {
  const draft = draftFor(table, null);
  const { parameters } = draft;
  Object.assign(parameters.gap, { value: '2.4', u: '0.1' });
  parameters.sites.value = '6';
  for (const { inactive, active } of Object.values(parameters.binding)) {
    Object.assign(inactive, { value: '18', u: '1.2' });
    Object.assign(active, { value: '900', u: '80' });
  }
  for (const slope of Object.values(parameters.modulation)) slope.value = '0.02';
  return draft;
}
