import {
  countFreeValues,
  type FreeParameter,
  MOST_FREE_VALUES,
  placesOf,
} from '@/lib/engine/free-parameters';
import type { DatasetInput, SiteClassInput } from '@/lib/engine/inputs';
import { closestWord } from './closest-word';
import { listWords, quote } from './describe-value';
import type { DocumentError } from './document-error';

/** What names a parameter beside its kind. */
type Name = 'siteClass' | 'ligand' | 'modulator';

const NAMES: Record<FreeParameter['parameter'], readonly Name[]> = {
  gap: [],
  gapPerSite: ['siteClass'],
  sites: ['siteClass'],
  inactive: ['siteClass', 'ligand'],
  active: ['siteClass', 'ligand'],
  slope: ['modulator'],
};

const NAME_WORDS: Record<Name, string> = {
  siteClass: 'site class',
  ligand: 'ligand',
  modulator: 'modulator',
};

/**
 * What is wrong with a list of parameters to be freed, all at once; none where `refit` can run.
 *
 * @param dataset a valid dataset
 * @param free names parameters of it
 * @returns places as pointers into `{ "free": … }`, and what would be right
 */
export function checkFree(dataset: DatasetInput, free: readonly FreeParameter[]): DocumentError[] {
  if (free.length === 0) return [{ pointer: '/free', detail: 'name at least one parameter to be fitted' }];
  const firsts = new Map<string, number>();
  const errors = free.flatMap((parameter, index) => {
    const base = `/free/${index}`;
    const misnamed = checkNames(parameter);
    const wrong = misnamed.length > 0 ? misnamed : checkNamed(dataset, parameter);
    if (wrong.length > 0) return wrong.map(({ pointer, detail }) => ({ pointer: base + pointer, detail }));
    const key = JSON.stringify([parameter.parameter, ...NAMES[parameter.parameter].map((n) => parameter[n])]);
    const earlier = firsts.get(key);
    firsts.set(key, earlier ?? index);
    return earlier === undefined
      ? []
      : [{ pointer: base, detail: `this parameter already stands at /free/${earlier}; free each one once` }];
  });
  return errors.length > 0 ? errors : checkCount(dataset, free);
}

function checkCount(dataset: DatasetInput, free: readonly FreeParameter[]): DocumentError[] {
  const count = countFreeValues(dataset, free);
  if (count <= MOST_FREE_VALUES) return [];
  const detail = `at most ${MOST_FREE_VALUES} values are fitted at once; these come to ${count}. Share parameters across the dataset, or free fewer`;
  return [{ pointer: '/free', detail }];
}

/** Each parameter is named by what it belongs to, and by nothing else. */
function checkNames(parameter: FreeParameter): DocumentError[] {
  const kind = parameter.parameter;
  const wanted = NAMES[kind];
  return (Object.keys(NAME_WORDS) as Name[]).flatMap((name) => {
    const given = parameter[name] !== undefined;
    if (given === wanted.includes(name)) return [];
    const word = NAME_WORDS[name];
    const detail = given
      ? `${kind} belongs to no ${word}; leave ${name} out`
      : `${kind} belongs to a ${word}; name it as ${name}`;
    return [{ pointer: `/${name}`, detail }];
  });
}

/** What is named exists in at least one series. Says the first thing that does not. */
function checkNamed(dataset: DatasetInput, parameter: FreeParameter): DocumentError[] {
  if (placesOf(dataset, parameter).length > 0) return [];
  const { siteClass, ligand, modulator, parameter: kind } = parameter;
  const wrong = (at: string, detail: string | null) =>
    detail === null ? null : { pointer: `/${at}`, detail };
  const found =
    wrong('siteClass', sayUnknown('series has a site class', siteClass, siteClassesOf(dataset))) ??
    wrong(
      'ligand',
      sayUnknown(
        'ligand',
        ligand,
        dataset.ligands.map(({ id }) => id),
      ),
    ) ??
    wrong(
      'modulator',
      sayUnknown('series states a slope of the modulator', modulator, modulatorsOf(dataset)),
    );
  if (found) return [found];
  if (kind === 'gap')
    return [
      { pointer: '/parameter', detail: 'no series states a gap of the whole complex; free gapPerSite' },
    ];
  if (kind === 'gapPerSite')
    return [
      {
        pointer: '/parameter',
        detail: `no series states a gap per site of ${quote(siteClass ?? '')}; free gap`,
      },
    ];
  return kind === 'inactive' || kind === 'active' ? [sayUnbound(dataset, parameter)] : [];
}

function sayUnknown(what: string, id: string | undefined, known: readonly string[]): string | null {
  if (id === undefined || known.includes(id)) return null;
  const near = closestWord(id, known);
  const names = known.slice(0, 12).map(quote);
  const hint =
    near !== null
      ? `did you mean ${quote(near)}?`
      : names.length === 0
        ? 'there is none'
        : `there ${names.length === 1 ? 'is' : 'are'} ${listWords(names, 'and')}`;
  return `no ${what} ${quote(id)}; ${hint}`;
}

function sayUnbound(dataset: DatasetInput, { parameter, siteClass, ligand }: FreeParameter): DocumentError {
  const [l, s] = [quote(ligand ?? ''), quote(siteClass ?? '')];
  const bound = classesOf(dataset).some(
    ({ id, binding }) => id === siteClass && binding.some((one) => one.ligand === ligand),
  );
  return bound
    ? {
        pointer: '/parameter',
        detail: `${l} is stated not to bind the ${parameter} state of ${s}, so there is no constant to fit`,
      }
    : { pointer: '/ligand', detail: `no site class ${s} binds ${l}` };
}

function classesOf(dataset: DatasetInput): SiteClassInput[] {
  return dataset.series.flatMap(({ parameters }) => parameters.siteClasses);
}

function siteClassesOf(dataset: DatasetInput): string[] {
  return [...new Set(classesOf(dataset).map(({ id }) => id))];
}

function modulatorsOf(dataset: DatasetInput): string[] {
  const entries = dataset.series.flatMap(({ parameters }) => parameters.modulation ?? []);
  return [...new Set(entries.map(({ modulator }) => modulator))];
}
