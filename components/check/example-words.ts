import type { ExampleDocument } from '@/lib/documents/examples/examples';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import type { CsvDraft } from './csv-draft';
import { draftOfDocument } from './draft-of-document';

export type ExampleSlug = ExampleDocument['slug'];

interface ExampleWords {
  slug: ExampleSlug;
  title: string;
  about: string;
}

/** The examples as they are offered; the documents themselves are loaded when one is asked for. */
export const EXAMPLE_WORDS: readonly ExampleWords[] = [
  {
    slug: 'collapse',
    title: 'Four variants on one curve',
    about: 'Energies in three units and two orientations; they collapse.',
  },
  {
    slug: 'thousand-fold',
    title: 'A thousand-fold slip',
    about: 'One series has its concentrations in the wrong unit.',
  },
  {
    slug: 'mixed-classes',
    title: 'Two site classes and a voltage',
    about: 'A mixed complex at five voltages, once with a competing ligand.',
  },
];

export function isExampleSlug(text: string | null): text is ExampleSlug {
  return EXAMPLE_WORDS.some(({ slug }) => slug === text);
}

/** The text of an example, as one would paste it. */
export async function loadExample(slug: ExampleSlug): Promise<string> {
  const { EXAMPLES } = await import('@/lib/documents/examples/examples');
  return JSON.stringify(EXAMPLES.find((example) => example.slug === slug)?.document, null, 2);
}

/** The example table, and the form beside it as the same laboratory would fill it. */
export async function loadExampleTable(): Promise<{ text: string; draft: CsvDraft }> {
  const { EXAMPLES, EXAMPLE_TABLE } = await import('@/lib/documents/examples/examples');
  return { text: EXAMPLE_TABLE, draft: draftOfDocument(EXAMPLES[0].document, readCsvPoints(EXAMPLE_TABLE)) };
}
