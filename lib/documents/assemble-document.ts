import type { CsvParameters, CsvSeriesParameters } from '@/schemas/csv-parameters';
import type { Binding, DatasetDocument, Modulation, Parameters, Series } from '@/schemas/dataset-1.generated';
import type { CsvLigand } from './read-csv-headings';
import type { CsvPoints, CsvSeries } from './read-csv-points';

/** Id of the only site class that the form beside a table can state. */
const ONLY_CLASS = 'main';

/**
 * A dataset document from a table of points and the form beside it. Its meaning is not judged here: like every
 * document it goes through `check-document.ts`.
 */
export function assembleDocument(table: CsvPoints, form: CsvParameters): DatasetDocument {
  const { title, abstract, licence, system, assay, temperature, normalisation } = form;
  const modulators = table.modulators.length === 0 ? {} : { modulators: table.modulators };
  return {
    format: 'curvekeep-dataset/1',
    title,
    abstract,
    licence,
    system,
    contributors: [],
    assay,
    temperature,
    ligands: table.ligands.map((ligand) => ({ ...ligand, ...statedOfLigand(ligand, form) })),
    ...modulators,
    normalisation,
    series: table.series.map((series) => assembleSeries(series, table, form)),
  };
}

function statedOfLigand({ id }: CsvLigand, { ligands }: CsvParameters) {
  return Object.hasOwn(ligands, id) && ligands[id] !== undefined
    ? ligands[id]
    : { concentration: 'free' as const };
}

function assembleSeries({ id, label, points }: CsvSeries, table: CsvPoints, form: CsvParameters): Series {
  const own = Object.hasOwn(form.series, id) ? form.series[id] : undefined;
  const temperature = own?.temperature === undefined ? {} : { temperature: own.temperature };
  return {
    id,
    label,
    variant: own?.variant ?? label,
    ...temperature,
    parameters: assembleParameters(own?.parameters ?? form.parameters, table),
    points,
  };
}

function assembleParameters(stated: CsvSeriesParameters, table: CsvPoints): Parameters {
  const { origin, fittedCount, gap, gapScope, sites } = stated;
  const perSite = gapScope === 'site';
  const modulation = statedModulation(stated, table);
  return {
    origin,
    ...(fittedCount === undefined ? {} : { fittedCount }),
    ...(perSite ? {} : { gap }),
    siteClasses: [
      {
        id: ONLY_CLASS,
        sites,
        ...(perSite ? { gapPerSite: gap } : {}),
        binding: statedBinding(stated, table),
      },
    ],
    ...(modulation.length === 0 ? {} : { modulation }),
  };
}

/** In the order of the table's columns. */
function statedBinding({ binding }: CsvSeriesParameters, { ligands }: CsvPoints): Binding[] {
  return ligands.flatMap(({ id }) => {
    const constants = Object.hasOwn(binding, id) ? binding[id] : undefined;
    return constants === undefined ? [] : [{ ligand: id, ...constants }];
  });
}

function statedModulation({ modulation }: CsvSeriesParameters, { modulators }: CsvPoints): Modulation[] {
  return modulators.flatMap(({ id }) => {
    const effect = Object.hasOwn(modulation, id) ? modulation[id] : undefined;
    return effect === undefined ? [] : [{ modulator: id, ...effect }];
  });
}
