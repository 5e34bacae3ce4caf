/** What was pasted, with another reading stated in it: its text, or the form beside a table. */
import type { StatedReading } from '@/components/reasons/why-it-misses';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import { stateReading } from '@/lib/documents/state-reading';
import type { DatasetDocument, Series } from '@/schemas/dataset-1.generated';
import { documentOf } from './assess-source';
import type { CsvDraft } from './csv-draft';
import { parametersDraft } from './draft-of-document';
import { kindOf, type Source } from './read-source';

export interface StatedSource {
  source: Source;
  draft: CsvDraft | null;
  /** a table became a document, since its form has no place for the reading */
  becameDocument: boolean;
}

/**
 * States a reading in a source.
 *
 * @param document the document that the source is, or that the table and its form made
 */
export function stateInSource(
  source: Source,
  draft: CsvDraft | null,
  document: DatasetDocument,
  { series, misreading }: StatedReading,
): StatedSource {
  const stated = stateReading(document, series, misreading);
  const isTable = kindOf(source) === 'table';
  if (isTable && draft !== null) {
    const restated = restateForm(draft, source.text, stated, series);
    if (saysTheSame(source, restated, stated)) return { source, draft: restated, becameDocument: false };
  }
  const text = JSON.stringify(stated, null, 2);
  return { source: { text, name: null }, draft: null, becameDocument: isTable };
}

/** The form with the parameters of the series concerned; one for all series stays one where all of them are. */
function restateForm(
  draft: CsvDraft,
  text: string,
  stated: DatasetDocument,
  concerned: readonly string[],
): CsvDraft {
  const table = readCsvPoints(text);
  const common = table.series.filter(({ id }) => !draft.own[id]).map(({ id }) => id);
  const isCommon = common.every((id) => concerned.includes(id));
  const parametersOf = (id: string) => {
    const series = stated.series.find((one) => one.id === id) as Series;
    return parametersDraft(series.parameters, draft.own[id] ?? draft.parameters);
  };
  const separate = concerned.filter((id) => !(isCommon && common.includes(id)));
  return {
    ...draft,
    parameters: isCommon && common.length > 0 ? parametersOf(common[0]) : draft.parameters,
    own: { ...draft.own, ...Object.fromEntries(separate.map((id) => [id, parametersOf(id)])) },
  };
}

/** Whether table and form make what is to be stated: the same series, on ligands of the same units. */
function saysTheSame(source: Source, draft: CsvDraft, stated: DatasetDocument): boolean {
  const made = documentOf(source, draft);
  if (made.kind !== 'document') return false;
  const told = ({ ligands, series }: DatasetDocument) => JSON.stringify([ligands, series], inOrder);
  return told(JSON.parse(made.text)) === told(stated);
}

/** Members of objects by name: their order says nothing. */
function inOrder(_: string, value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)));
}
