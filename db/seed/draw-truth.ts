/**
 * What is really so in a laboratory whose statements carry uncertainties: every stated quantity, every stock and the
 * temperature drawn once around what is stated. Quantities that are positive by nature are drawn lognormally.
 */
import type { Ligand, Parameters, Temperature } from '@/schemas/dataset-1.generated';
import type { Random } from './random';

/** Standard normal numbers by the name of the quantity or by its `sharedAs`, so that one quantity is drawn once. */
export type Draws = Map<string, number>;

interface Stated {
  value: number;
  u?: number;
  unit?: string;
  sharedAs?: string;
}

/** The true parameters of a series. A fit to these very points ends at what they say, so such a series is not varied. */
export function drawParameters(
  stated: Parameters,
  seriesId: string,
  draws: Draws,
  random: Random,
): Parameters {
  if (stated.origin === 'fitted-here') return stated;
  const correlated = correlatedDraws(stated, seriesId, draws, random);
  const vary = <T extends Stated>(name: string, statement: T): T =>
    varied(statement, correlated.get(name) ?? draw(draws, keyOf(seriesId, name, statement), random));
  return {
    ...stated,
    ...(stated.gap ? { gap: vary('gap', stated.gap) } : {}),
    siteClasses: stated.siteClasses.map((one) => ({
      ...one,
      sites: vary(`${one.id}/sites`, one.sites),
      ...(one.gapPerSite ? { gapPerSite: vary(`${one.id}/gapPerSite`, one.gapPerSite) } : {}),
      binding: one.binding.map((entry) => ({
        ligand: entry.ligand,
        inactive: entry.inactive && vary(`${one.id}/${entry.ligand}/inactive`, entry.inactive),
        active: entry.active && vary(`${one.id}/${entry.ligand}/active`, entry.active),
      })),
    })),
    ...(stated.modulation
      ? {
          modulation: stated.modulation.map((entry) => ({
            ...entry,
            slope: vary(`${entry.modulator}/slope`, entry.slope),
          })),
        }
      : {}),
  };
}

/** By how much each ligand's stock really differs from its label, by ligand id. */
export function drawStocks(ligands: Ligand[], random: Random): Record<string, number> {
  return Object.fromEntries(
    ligands.map(({ id, stockRelativeU = 0 }) => [id, Math.exp(stockRelativeU * random.normal())]),
  );
}

export function drawTemperature(stated: Temperature, random: Random): Temperature {
  return { ...stated, value: stated.value + (stated.u ?? 0) * random.normal() };
}

/** Draws of the pairs that the series states as correlated: each `b` follows its `a`, as in a chain. */
function correlatedDraws(stated: Parameters, seriesId: string, draws: Draws, random: Random): Draws {
  const found: Draws = new Map();
  const labels = new Map(listStated(stated).map(([name, { sharedAs }]) => [name, sharedAs]));
  const drawNamed = (name: string, make: () => number) => {
    const key = labels.get(name) ?? `${seriesId} ${name}`;
    const value = draws.get(key) ?? make();
    draws.set(key, value);
    found.set(name, value);
    return value;
  };
  for (const { a, b, r } of stated.correlations ?? []) {
    const first = drawNamed(a, random.normal);
    drawNamed(b, () => r * first + Math.sqrt(1 - r * r) * random.normal());
  }
  return found;
}

function listStated({ gap, siteClasses, modulation = [] }: Parameters): [string, Stated][] {
  const named: [string, Stated | null | undefined][] = [
    ['gap', gap],
    ...siteClasses.flatMap(({ id, sites, gapPerSite, binding }): [string, Stated | null | undefined][] => [
      [`${id}/sites`, sites],
      [`${id}/gapPerSite`, gapPerSite],
      ...binding.flatMap(({ ligand, inactive, active }): [string, Stated | null][] => [
        [`${id}/${ligand}/inactive`, inactive],
        [`${id}/${ligand}/active`, active],
      ]),
    ]),
    ...modulation.map(({ modulator, slope }): [string, Stated] => [`${modulator}/slope`, slope]),
  ];
  return named.filter((entry): entry is [string, Stated] => Boolean(entry[1]));
}

function varied<T extends Stated>(statement: T, normal: number): T {
  const { value, u = 0, unit = '' } = statement;
  // Constants and ratios; an energy or a number of sites is drawn as it is.
  const positive = /^(ratio|[munp]?M|k?Pa|mmHg|Torr)$/.test(unit);
  return { ...statement, value: positive ? value * Math.exp((u / value) * normal) : value + u * normal };
}

function keyOf(seriesId: string, name: string, { sharedAs }: Stated): string {
  return sharedAs ?? `${seriesId} ${name}`;
}

function draw(draws: Draws, key: string, random: Random): number {
  const value = draws.get(key) ?? random.normal();
  draws.set(key, value);
  return value;
}
