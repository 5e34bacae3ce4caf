/** The documents of the scenario: each recipe measured with seeded noise. Pure; the same seed gives the same bytes. */
import type { DatasetDocument, Series } from '@/schemas/dataset-1.generated';
import { type Draws, drawParameters, drawStocks, drawTemperature } from './draw-truth';
import { CONTRIBUTORS, INVENTED } from './laboratories';
import { measureSeries } from './measure-series';
import { type Random, seededRandom } from './random';
import type { DatasetRecipe, SeriesRecipe } from './recipe';
import { ALRQ } from './recipes/alrq';
import { FARX } from './recipes/farx';
import { MERV } from './recipes/merv';
import { TESSIN } from './recipes/tessin';
import { kelvinOf, trueEnergy } from './true-response';

export const SEED = 1965;

/** The recipes of what is published, oldest first. */
export const RECIPES: DatasetRecipe[] = [...ALRQ, ...TESSIN, ...MERV, ...FARX].sort((a, b) =>
  a.published.localeCompare(b.published),
);

export interface MadeDocument {
  recipe: DatasetRecipe;
  document: DatasetDocument;
}

/** The published documents of the scenario, oldest first. */
export function makeDocuments(seed = SEED): MadeDocument[] {
  return RECIPES.map((recipe) => ({ recipe, document: makeDocument(recipe, seed) }));
}

/** One document; what it draws depends on the seed and its title alone. */
export function makeDocument(recipe: DatasetRecipe, seed = SEED): DatasetDocument {
  const { title, system, assay, temperature, ligands, modulators, normalisation, about } = recipe;
  return {
    format: 'curvekeep-dataset/1',
    title,
    abstract: `${INVENTED} ${about}`,
    licence: recipe.licence ?? 'CC-BY-4.0',
    system,
    contributors: CONTRIBUTORS[recipe.lab],
    ...(recipe.funding ? { funding: recipe.funding } : {}),
    ...(recipe.related ? { related: recipe.related } : {}),
    assay,
    temperature,
    ligands,
    ...(modulators ? { modulators } : {}),
    normalisation,
    series: measureAll(recipe, seededRandom(seed, title)),
  };
}

function measureAll(recipe: DatasetRecipe, random: Random): Series[] {
  const draws: Draws = new Map();
  const stocks = drawStocks(recipe.ligands, random);
  const temperature = drawTemperature(recipe.temperature, random);
  return recipe.series.map((series) => {
    const parameters = drawParameters(series.parameters, series.id, draws, random);
    const kelvin = kelvinOf(series.temperature ? drawTemperature(series.temperature, random) : temperature);
    const energies = series.conditions.map(
      (condition) =>
        (recipe.offsetKT ?? 0) +
        trueEnergy(parameters, {
          kelvin,
          units: Object.fromEntries(recipe.ligands.map(({ id, unit }) => [id, unit])),
          ligands: dispensed(condition, recipe, stocks, random),
          modulators: condition.modulators ?? {},
        }),
    );
    return measureSeries(series, energies, random);
  });
}

/** What is really in the tube: stock and pipette both err. */
function dispensed(
  { ligands }: SeriesRecipe['conditions'][number],
  recipe: DatasetRecipe,
  stocks: Record<string, number>,
  random: Random,
): Record<string, number> {
  return Object.fromEntries(
    recipe.ligands.map(({ id, relativeU = 0 }) => [
      id,
      (ligands[id] ?? 0) * stocks[id] * Math.exp(relativeU * random.normal()),
    ]),
  );
}
