/** The deposits of the scenario that are on their way, or gone again: one for each state. Pure. */
import type { DepositState } from '@/lib/deposits/states';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { makeDocument, RECIPES, SEED } from './make-documents';
import type { DatasetRecipe, Day, LabSlug } from './recipe';

export interface MadeDeposit {
  lab: LabSlug;
  state: Exclude<DepositState, 'published'>;
  /** day of the last change */
  day: Day;
  document: DatasetDocument;
  /** what the curator wrote; of a withdrawn one why it was withdrawn */
  letter?: string;
}

/** The laboratory whose people the demonstration signs in: it has a deposit in every state. */
const halvorn: LabSlug = 'halvorn-biophysics';

/** All of them; the first draft is not valid on purpose. */
export function makeDeposits(seed = SEED): MadeDeposit[] {
  const like = (title: string, change: Partial<DatasetRecipe>, series: number, lab: LabSlug = halvorn) => {
    const recipe = RECIPES.find((one) => one.title === title);
    if (recipe === undefined) throw new Error(`The scenario has no dataset called ${title}.`);
    return makeDocument({ ...recipe, lab, series: recipe.series.slice(0, series), ...change }, seed);
  };
  return [
    {
      lab: halvorn,
      state: 'draft',
      day: '2026-11-24',
      document: unfinished(
        like('Hinge variants of AlrQ under velline', { title: 'AlrQ hinge variants, repeat' }, 3),
      ),
    },
    {
      lab: halvorn,
      state: 'draft',
      day: '2026-11-23',
      document: like('MerV lid variants', { title: 'MerV lid variants, second batch' }, 4),
    },
    {
      lab: halvorn,
      state: 'submitted',
      day: '2026-11-21',
      document: like('Tessin channel in nanodiscs', { title: 'Tessin channel in larger nanodiscs' }, 4),
    },
    {
      lab: 'ostrel-enzymology',
      state: 'in-review',
      day: '2026-11-18',
      document: like(
        'FarX ring variants at picomolar adenol',
        { title: 'FarX ring variants, second set', about: 'Four of the variants, measured again.' },
        4,
        'ostrel-enzymology',
      ),
    },
    {
      lab: 'sunder-lab',
      state: 'submitted',
      day: '2026-11-25',
      document: like(
        'AlrQ tail deletions',
        { title: 'AlrQ tail deletions at another salt' },
        6,
        'sunder-lab',
      ),
    },
    {
      lab: halvorn,
      state: 'changes-requested',
      day: '2026-11-12',
      document: changeOrientation(
        like('Hinge variants of AlrQ under velline', { title: 'AlrQ hinge variants in heavy water' }, 4),
      ),
      letter:
        'Thank you for these curves. Series S61N and the others miss the curve by far, all in the same way: please ' +
        'check the orientation of the gaps, which read as active less inactive, and say in the abstract how they were measured.',
    },
    {
      lab: halvorn,
      state: 'in-review',
      day: '2026-11-19',
      document: like('Tessin channel in nanodiscs', { title: 'Tessin channel, cooled' }, 3),
    },
    {
      lab: halvorn,
      state: 'accepted',
      day: '2026-11-20',
      document: like('MerV lid variants', { title: 'MerV lid variants, related paper under review' }, 5),
      letter: 'Accepted as it stands. Published on the day that you asked for, once your paper is out.',
    },
    {
      lab: halvorn,
      state: 'declined',
      day: '2026-10-02',
      document: like(
        'Hinge variants of AlrQ under velline',
        {
          title: 'AlrQ hinge variants, read off a printed figure',
          about: 'Two variants, read off a figure of an old thesis; the readings themselves were not kept.',
        },
        2,
      ),
      letter:
        'The points were read off a printed figure. Their uncertainty is the figure’s and not the measurement’s, and ' +
        'nobody is left who could give the figure under a licence. Measured again, the same variants are welcome as ' +
        'a new deposit.',
    },
    {
      lab: halvorn,
      state: 'withdrawn',
      day: '2026-04-15',
      document: like('AlrQ core packing variants', { title: 'AlrQ core packing variants, first plate' }, 3),
      letter:
        'Withdrawn at the laboratory’s request: the stock of velline had been thawed twice, so that its concentration ' +
        'is not known as well as stated. The variants were measured again with a fresh one.',
    },
  ];
}

/** A document that somebody left in the middle of writing it. */
function unfinished(document: DatasetDocument): DatasetDocument {
  const [first, ...others] = document.series;
  const points = first.points.map((point, i) => (i === 2 ? { ...point, u: -0.018 } : point));
  return { ...document, system: 'AlrQ with velline', series: [{ ...first, points }, ...others] };
}

/** All gaps the wrong way round. */
function changeOrientation(document: DatasetDocument): DatasetDocument {
  const series = document.series.map((one) => {
    const { gap } = one.parameters;
    if (gap === undefined || gap.unit === 'ratio') return one;
    const orientation = 'active-minus-inactive' as const;
    return { ...one, parameters: { ...one.parameters, gap: { ...gap, orientation } } };
  });
  return { ...document, series };
}
