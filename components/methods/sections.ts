/** The sections of the methods page in their order; the ids are addresses and stay. */
export const SECTIONS = [
  { id: 'model', title: 'The model' },
  { id: 'symbols', title: 'Symbols and units' },
  { id: 'statements', title: 'Statements and conventions' },
  { id: 'ranges', title: 'Ranges' },
  { id: 'uncertainty', title: 'Uncertainty of the coordinate' },
  { id: 'measured', title: 'Measured activity' },
  { id: 'flags', title: 'Residual and flags' },
  { id: 'collapse', title: 'Series and dataset as a whole' },
  { id: 'derived', title: 'Derived quantities' },
  { id: 'shape', title: 'Why a series misses: shape' },
  { id: 'conventions', title: 'Why a series misses: conventions' },
  { id: 'normalisation', title: 'Why a series misses: normalisation' },
  { id: 'refit', title: 'Refit' },
  { id: 'monte-carlo', title: 'Monte Carlo check' },
  { id: 'not-judged', title: 'What is not yet judged' },
  { id: 'sources', title: 'Sources' },
] as const;

export type SectionId = (typeof SECTIONS)[number]['id'];

export function sectionTitle(id: SectionId): string {
  return SECTIONS.find((section) => section.id === id)?.title ?? id;
}
