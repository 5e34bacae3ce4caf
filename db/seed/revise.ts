/** What a revised dataset looked like when it was first published. */
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { makeDocument } from './make-documents';
import type { DatasetRecipe, Day } from './recipe';

export interface MadeRevision {
  document: DatasetDocument;
  published: Day;
}

/** The first revision, with the last two series still missing; none where the dataset was never revised. */
export function earlierRevision(recipe: DatasetRecipe): MadeRevision[] {
  if (recipe.revised === undefined) return [];
  const document = makeDocument({ ...recipe, series: recipe.series.slice(0, -2) });
  return [{ document, published: recipe.published }];
}
