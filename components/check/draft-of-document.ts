/** The form beside a table filled from a document of the same points: for the example table. */
import type { CsvPoints } from '@/lib/documents/read-csv-points';
import type { Constant, DatasetDocument, Parameters } from '@/schemas/dataset-1.generated';
import { type ConstantDraft, type CsvDraft, draftFor, type ParametersDraft } from './csv-draft';

/** Every series of the table gets the parameters of the document's series of that label. */
export function draftOfDocument(document: DatasetDocument, table: CsvPoints): CsvDraft {
  const empty = draftFor(table, null);
  const stated = new Map(document.series.map(({ label, parameters }) => [label, parameters]));
  const own = table.series.flatMap(({ id, label }) => {
    const parameters = stated.get(label);
    return parameters ? [[id, parametersDraft(parameters, empty.parameters)] as const] : [];
  });
  const { value, u, unit } = document.temperature;
  return {
    ...empty,
    temperature: { value: String(value), u: textOf(u), unit },
    parameters: own[0]?.[1] ?? empty.parameters,
    own: Object.fromEntries(own.slice(1)),
  };
}

/** The form of one set of parameters; what the form has that they lack stays as it was. */
export function parametersDraft(stated: Parameters, empty: ParametersDraft): ParametersDraft {
  const { origin, siteClasses, modulation = [] } = stated;
  const [{ sites, binding, gapPerSite }] = siteClasses;
  const gap = stated.gap ?? gapPerSite;
  return {
    ...empty,
    origin,
    gap: gap
      ? { value: String(gap.value), u: textOf(gap.u), unit: gap.unit, orientation: gap.orientation }
      : empty.gap,
    gapScope: stated.gap ? 'complex' : 'site',
    modulation: {
      ...empty.modulation,
      ...Object.fromEntries(
        modulation.map(({ modulator, slope: { value, u, unit, orientation }, reference }) => [
          modulator,
          { value: String(value), u: textOf(u), unit, orientation, reference: String(reference) },
        ]),
      ),
    },
    sites: { value: String(sites.value), u: textOf(sites.u) },
    binding: Object.fromEntries(
      binding.map(({ ligand, inactive, active }) => [
        ligand,
        {
          inactive: constantDraft(inactive, empty.binding[ligand]?.inactive),
          active: constantDraft(active, empty.binding[ligand]?.active),
        },
      ]),
    ),
  };
}

function constantDraft(constant: Constant | null, empty: ConstantDraft): ConstantDraft {
  if (constant === null) return { ...empty, binds: false };
  return { value: String(constant.value), u: textOf(constant.u), unit: constant.unit, binds: true };
}

function textOf(u: number | undefined): string {
  return u === undefined ? '' : String(u);
}
