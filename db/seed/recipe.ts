/** What a dataset of the scenario is made from: what its laboratory states, what it measures at, and what goes wrong. */
import type { DatasetDocument, Parameters, Point, Temperature } from '@/schemas/dataset-1.generated';

export type Day = `${number}-${number}-${number}`;

export type LabSlug =
  | 'halvorn-biophysics'
  | 'norrel-receptor-group'
  | 'quillan-institute'
  | 'ostrel-enzymology'
  | 'sunder-lab';

/** How a series is read out: stated uncertainty, repeated readings, or neither. */
export type Readout =
  | { u: number }
  | { replicates: number; spread: number }
  | { unstated: true; spread: number };

/** What is planted in a series. Left out: nothing. */
export type Mistake =
  /** the gap is written with the opposite orientation */
  | { kind: 'reversed-gap' }
  /** concentrations are written a factor off, in another unit than the one declared */
  | { kind: 'concentration-slip'; factor: number }
  /** the detector saturates: activities are a factor too low */
  | { kind: 'ceiling'; factor: number }
  /** activities are stretched to the series' own smallest and largest */
  | { kind: 'own-range' }
  /** single readings are off by so much */
  | { kind: 'bad-points'; shifts: Record<number, number> };

export interface SeriesRecipe {
  id: string;
  label: string;
  variant: string;
  temperature?: Temperature;
  /** as the laboratory states them, rightly */
  parameters: Parameters;
  conditions: Pick<Point, 'ligands' | 'modulators'>[];
  readout: Readout;
  mistake?: Mistake;
}

type Described = Pick<
  DatasetDocument,
  'title' | 'system' | 'assay' | 'temperature' | 'ligands' | 'modulators' | 'normalisation'
> &
  Partial<Pick<DatasetDocument, 'licence' | 'funding' | 'related'>>;

export interface DatasetRecipe extends Described {
  lab: LabSlug;
  /** what was measured, a sentence for the abstract */
  about: string;
  /** day of publication */
  published: Day;
  /** day on which a second revision was published, which added the last two series */
  revised?: Day;
  /** what a whole laboratory is off by, kT */
  offsetKT?: number;
  series: SeriesRecipe[];
}
