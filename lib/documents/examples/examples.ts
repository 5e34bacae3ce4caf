import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import collapse from './collapse.json';
import mixedClasses from './mixed-classes.json';
import thousandFold from './thousand-fold.json';
import { VELLINE_POINTS_CSV } from './velline-points';

/** An invented document that a reader can open with one click. */
export interface ExampleDocument {
  slug: 'collapse' | 'thousand-fold' | 'mixed-classes';
  /** what it shows, in a few words */
  name: string;
  document: DatasetDocument;
}

// The compiler reads JSON's texts as any text; a test holds each of these against the schema.
export const EXAMPLES: ExampleDocument[] = [
  { slug: 'collapse', name: 'four variants on one curve', document: collapse as unknown as DatasetDocument },
  {
    slug: 'thousand-fold',
    name: 'a thousand-fold slip in one series',
    document: thousandFold as unknown as DatasetDocument,
  },
  {
    slug: 'mixed-classes',
    name: 'two site classes, a voltage and a competitor',
    document: mixedClasses as unknown as DatasetDocument,
  },
];

/** An invented table of points, as it would be dropped beside the form. */
export const EXAMPLE_TABLE = VELLINE_POINTS_CSV;
