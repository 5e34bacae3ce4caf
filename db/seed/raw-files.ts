/** The original files of some datasets of the scenario: what a plate reader might have written. Pure. */
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

export interface RawFile {
  name: string;
  text: string;
}

const NOTE = 'Invented for the demonstration: no such plate was ever read.';

/** Which datasets come with their readings, by title, and under which name. */
const READINGS: Record<string, string> = {
  'Hinge variants of AlrQ under velline': 'plate-readings.csv',
  'MerV lid variants': 'lid-plates.csv',
  'Tessin channel in nanodiscs': 'nanodisc-readings.csv',
  'FarX ring variants at picomolar adenol': 'ring-readings.csv',
};

/** The files of a dataset; none for most. */
export function rawFilesOf(document: DatasetDocument): RawFile[] {
  const name = READINGS[document.title];
  if (name === undefined) return [];
  return [
    { name, text: readingsOf(document) },
    { name: 'conditions.txt', text: conditionsOf(document) },
  ];
}

/** One line a reading; wells are counted through the plates of 96. */
function readingsOf({ ligands, modulators = [], series }: DatasetDocument): string {
  const heads = [
    ...ligands.map(({ id, unit }) => `${id} (${unit})`),
    ...modulators.map(({ id, unit }) => `${id} (${unit})`),
  ];
  const lines = [`# ${NOTE}`, ['plate', 'well', 'series', ...heads, 'reading'].join(',')];
  let well = 0;
  for (const { id, points } of series) {
    for (const point of points) {
      const at = [
        ...ligands.map((ligand) => point.ligands[ligand.id] ?? 0),
        ...modulators.map((modulator) => point.modulators?.[modulator.id] ?? ''),
      ];
      for (const reading of point.replicates ?? [point.activity]) {
        lines.push([...placeOf(well), id, ...at, reading].join(','));
        well += 1;
      }
    }
  }
  return `${lines.join('\n')}\n`;
}

/** Number of the plate, and row and column on it. */
function placeOf(well: number): [string, string] {
  const onPlate = well % 96;
  const row = 'ABCDEFGH'[Math.floor(onPlate / 12)];
  return [String(Math.floor(well / 96) + 1), `${row}${(onPlate % 12) + 1}`];
}

function conditionsOf({ title, assay, temperature, normalisation }: DatasetDocument): string {
  const lines = [
    NOTE,
    title,
    `Readout: ${assay.readout}`,
    `Conditions: ${assay.conditions}`,
    `Temperature: ${temperature.value} ${temperature.unit}`,
    `Normalised: ${[normalisation.method, normalisation.note].filter(Boolean).join('; ')}`,
  ];
  return `${lines.join('\n')}\n`;
}
