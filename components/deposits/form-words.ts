/** What the form calls a place of the document, and what is wrong with it in those words. */

import { MINUS } from '@/components/ui/format-quantity';
import type { DocumentError } from '@/lib/documents/document-error';
import { membersOf } from '@/lib/documents/json-pointer';
import { namePlace } from '@/lib/documents/name-place';
import { listOf, objectOf, textOf, valueAt } from './draft-value';

/** A place as a reader of the form finds it. */
export interface FormPlace {
  /** of the field */
  label: string;
  /** in which series, and which point of it; empty where there is one field of that label */
  where: string;
}

const SINGLE: Record<string, string> = {
  '/title': 'Title',
  '/abstract': 'Abstract',
  '/system': 'System',
  '/licence': 'Licence',
  '/contributors': 'Contributors',
  '/assay/readout': 'Readout',
  '/assay/conditions': 'Conditions',
  '/normalisation/method': 'Normalisation',
  '/normalisation/note': 'What 0 and 1 stand for',
};

/** The parts of a statement that has a line of the form to itself. */
const PARTS: Record<string, string> = {
  value: '',
  u: 'Uncertainty of ',
  unit: 'Unit of ',
  orientation: 'Orientation of ',
};

/** What the form calls the place of a pointer; null where it has no field for it. */
export function formPlace(pointer: string, document: unknown): FormPlace | null {
  const single = SINGLE[pointer];
  if (single !== undefined) return { label: single, where: '' };
  const [part = '', index = '', ...rest] = membersOf(pointer);
  if (part === 'temperature') return place(partOf('temperature', index));
  if (part === 'contributors') return contributorPlace(Number(index), rest);
  if (part === 'ligands') return ligandPlace(document, Number(index), rest);
  return part === 'series' && index !== '' ? seriesPlace(document, Number(index), rest) : null;
}

/** The error with what is wrong said in the words of the form. */
export function inFormWords(error: DocumentError, document: unknown): DocumentError {
  const { pointer, detail } = error;
  const found = formPlace(pointer, document);
  return found === null ? error : { pointer, detail: withMinus(sentenceOn(found.label, pointer, detail)) };
}

/** Numbers with a true minus sign, as everywhere on pages. */
function withMinus(sentence: string): string {
  return sentence.replace(/(^|\s)-(?=\d)/g, `$1${MINUS}`);
}

function sentenceOn(label: string, pointer: string, detail: string): string {
  if (pointer === '/system')
    return detail.endsWith('empty')
      ? 'No system is chosen yet'
      : 'Choose a system: what stands here is not on the curators’ list';
  const missing = /^\S+ needs \S+: (.*)$/.exec(detail)?.[1];
  if (missing !== undefined) return `${label} is missing: ${missing}`;
  if (detail.startsWith('a point needs activity'))
    return `${label} is missing: a number, such as 0.42, or replicates, such as 0.41 0.44`;
  const name = namePlace(pointer);
  if (!detail.startsWith(`${name} `)) return detail;
  const replicates =
    name === 'activity' && detail.includes('must be a number')
      ? '. Replicates are numbers with space between them: 0.41 0.44'
      : '';
  return label + detail.slice(name.length) + replicates;
}

function place(label: string, where = ''): FormPlace {
  return { label: label.charAt(0).toUpperCase() + label.slice(1), where };
}

function partOf(name: string, part: string | undefined): string {
  return (PARTS[part ?? 'value'] ?? '') + name;
}

function contributorPlace(index: number, [field]: string[]): FormPlace | null {
  const labels: Record<string, string> = { name: 'Name', orcid: 'ORCID iD', roles: 'Roles' };
  const label = field === undefined ? 'Contributor' : labels[field];
  return label === undefined ? null : place(`${label} of contributor ${index + 1}`);
}

const LIGAND_FIELDS: Record<string, (name: string) => string> = {
  name: (name) => `Name of ${name}`,
  unit: (name) => `Unit of the concentrations of ${name}`,
  concentration: (name) => `Concentration of ${name}, free or total`,
  relativeU: (name) => `Uncertainty of each dispensing of ${name}`,
  stockRelativeU: (name) => `Uncertainty of the stock of ${name}`,
};

function ligandPlace(document: unknown, index: number, [field = '']: string[]): FormPlace | null {
  const name = textOf(valueAt(document, `/ligands/${index}/name`)) || `ligand ${index + 1}`;
  const label = LIGAND_FIELDS[field]?.(field === 'name' ? `ligand ${index + 1}` : name);
  return label === undefined ? null : place(label);
}

function seriesPlace(document: unknown, index: number, [part = '', ...rest]: string[]): FormPlace | null {
  const series = textOf(valueAt(document, `/series/${index}/label`)) || `series ${index + 1}`;
  if (part === 'label') return place('Name of the series', `series ${index + 1}`);
  if (part === 'variant') return place('Variant', series);
  if (part === 'points') return pointPlace(document, series, rest);
  if (part !== 'parameters') return null;
  const label = parameterLabel(document, rest, valueAt(document, `/series/${index}/parameters`));
  return label === null ? null : place(label, series);
}

function pointPlace(document: unknown, series: string, [index, field, member]: string[]): FormPlace | null {
  if (index === undefined) return place('Points', series);
  const where = `point ${Number(index) + 1} of ${series}`;
  if (field === undefined) return place('Activity', where);
  if (field === 'ligands' || field === 'modulators')
    return place(nameOf(document, field, member ?? ''), where);
  const labels: Record<string, string> = {
    activity: 'Activity',
    replicates: 'Replicates',
    u: 'Uncertainty u',
  };
  return labels[field] === undefined ? null : place(labels[field], where);
}

function parameterLabel(
  document: unknown,
  [part = '', index, statement, ...rest]: string[],
  parameters: unknown,
): string | null {
  if (part === 'gap') return partOf('energy gap', index);
  if (part === 'origin') return 'Origin';
  if (part === 'fittedCount') return 'Fitted values';
  if (part === 'modulation')
    return modulationLabel(document, parameters, [index ?? '', statement ?? '', ...rest]);
  if (part !== 'siteClasses') return null;
  const classes = listOf(objectOf(parameters).siteClasses);
  const ofClass = classes.length > 1 ? ` of ${textOf(objectOf(classes[Number(index)]).id)}` : '';
  if (statement === 'sites') return partOf(`number of sites${ofClass}`, rest[0]);
  if (statement === 'gapPerSite') return partOf(`gap per site${ofClass}`, rest[0]);
  const [entry, state, member] = rest;
  if (statement !== 'binding' || (state !== 'inactive' && state !== 'active')) return null;
  const binding = listOf(objectOf(classes[Number(index)]).binding)[Number(entry)];
  const ligand = nameOf(document, 'ligands', textOf(objectOf(binding).ligand));
  return partOf(`K ${state} of ${ligand}${ofClass}`, member);
}

function modulationLabel(
  document: unknown,
  parameters: unknown,
  [index, field, part]: string[],
): string | null {
  const modulation = objectOf(listOf(objectOf(parameters).modulation)[Number(index)]);
  const name = nameOf(document, 'modulators', textOf(modulation.modulator));
  if (field === 'slope') return partOf(`slope by ${name}`, part);
  return field === 'reference' ? `reference of ${name}` : null;
}

/** The name of a ligand or modulator; its id where it has none yet. */
export function nameOf(document: unknown, list: 'ligands' | 'modulators', id: string): string {
  const known = listOf(objectOf(document)[list])
    .map(objectOf)
    .find((one) => one.id === id);
  return textOf(known?.name) || id;
}
