import { CONCENTRATION_UNITS } from '@/lib/engine/units';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { fewMembers } from './bound-work';
import { membersOf } from './json-pointer';

/**
 * A copy of a document in which the pieces that break the schema are out of the way, so that the meaning of
 * all the others can be judged in the same pass. An entry of a list becomes a hole, which `forEach` passes
 * over, so that the places of the others stay the same; a needed statement becomes a harmless one.
 *
 * @param broken pointers of the places that break the schema
 * @returns null where too much is missing for the rest to mean anything
 */
export function setAsideBroken(document: unknown, broken: string[]): DatasetDocument | null {
  if (!isContainer(document)) return null;
  const copies = new Set<object>();
  const result = copyOf(document);
  copies.add(result);
  for (const pointer of broken) {
    const remedy = findRemedy(membersOf(pointer));
    if (remedy === null) return null;
    if (remedy.dropsCorrelations) dropCorrelations(result, remedy.path, copies);
    if (remedy.kind !== 'leave') replace(result, remedy, copies);
  }
  return result as unknown as DatasetDocument;
}

type Container = Record<string, unknown>;
type Kind = 'leave' | 'remove' | 'list' | 'energy' | 'temperature' | 'sites' | 'constant';

interface Remedy {
  kind: Kind;
  path: string[];
  /** whether names of correlations may no longer resolve */
  dropsCorrelations: boolean;
}

const PARAMETERS = '/series/#/parameters';
const CLASS = `${PARAMETERS}/siteClasses/#`;

/** What is done where a place breaks the schema; the longest match counts. `#` is an index, `*` any member. */
const REMEDIES: [pattern: string, kind: Kind][] = [
  ...['format', 'title', 'abstract', 'licence', 'system', 'funding', 'related', 'assay', 'normalisation'].map(
    (member): [string, Kind] => [`/${member}`, 'leave'],
  ),
  ['/contributors', 'list'],
  ['/contributors/#', 'remove'],
  ['/contributors/#/name', 'leave'],
  ['/contributors/#/roles', 'leave'],
  ['/temperature', 'temperature'],
  ['/ligands/#/*', 'leave'],
  ['/modulators/#/*', 'leave'],
  ['/series/#', 'remove'],
  ['/series/#/id', 'leave'],
  ['/series/#/label', 'leave'],
  ['/series/#/variant', 'leave'],
  ['/series/#/temperature', 'temperature'],
  ['/series/#/points/#', 'remove'],
  ['/series/#/points/#/activity', 'leave'],
  ['/series/#/points/#/u', 'leave'],
  ['/series/#/points/#/replicates', 'leave'],
  ['/series/#/points/#/ligands/*', 'remove'],
  ['/series/#/points/#/modulators/*', 'remove'],
  [`${PARAMETERS}/origin`, 'leave'],
  [`${PARAMETERS}/fittedCount`, 'leave'],
  [`${PARAMETERS}/gap`, 'energy'],
  [`${PARAMETERS}/correlations`, 'remove'],
  [`${PARAMETERS}/correlations/#`, 'remove'],
  [`${PARAMETERS}/modulation/#`, 'remove'],
  [`${PARAMETERS}/modulation/#/slope`, 'energy'],
  [CLASS, 'remove'],
  [`${CLASS}/id`, 'leave'],
  [`${CLASS}/sites`, 'sites'],
  [`${CLASS}/gapPerSite`, 'energy'],
  [`${CLASS}/binding/#`, 'remove'],
  [`${CLASS}/binding/#/inactive`, 'constant'],
  [`${CLASS}/binding/#/active`, 'constant'],
];

const REMEDY_OF = new Map(REMEDIES);

function findRemedy(members: string[]): Remedy | null {
  for (let length = members.length; length > 0; length--) {
    const path = members.slice(0, length);
    const named = path.map((member) => (/^\d+$/.test(member) ? '#' : member));
    const pattern = `/${named.join('/')}`;
    const anyMember = `/${[...named.slice(0, -1), '*'].join('/')}`;
    const kind = REMEDY_OF.get(pattern) ?? REMEDY_OF.get(anyMember);
    if (kind !== undefined) return { kind, path, dropsCorrelations: changesNames(pattern, kind) };
  }
  return null;
}

/** Whether correlations may name what is set aside. */
function changesNames(pattern: string, kind: Kind): boolean {
  if (pattern === `${CLASS}/id`) return true;
  return kind === 'remove' && /\/(siteClasses|binding|modulation)\/#$/.test(pattern);
}

function dropCorrelations(document: Container, path: string[], copies: Set<object>): void {
  replace(
    document,
    { kind: 'remove', path: [...path.slice(0, 3), 'correlations'], dropsCorrelations: false },
    copies,
  );
}

/** Copies what leads to the place, once, and puts something harmless there. */
function replace(document: Container, { kind, path }: Remedy, copies: Set<object>): void {
  let parent = document;
  for (const member of path.slice(0, -1)) {
    const child = parent[member];
    if (!isContainer(child)) return;
    const copy = copies.has(child) ? child : copyOf(child);
    copies.add(copy);
    parent[member] = copy;
    parent = copy;
  }
  const last = path.at(-1) ?? '';
  if (kind === 'remove') delete parent[last];
  else if (kind === 'leave') return;
  else parent[last] = harmless(kind, parent[last]);
}

function copyOf(container: Container): Container {
  return Array.isArray(container) ? (container.slice() as unknown as Container) : fewMembers(container);
}

function harmless(kind: Exclude<Kind, 'remove' | 'leave'>, broken: unknown): unknown {
  switch (kind) {
    case 'list':
      return [];
    case 'energy':
      return { value: 0, unit: 'kT', orientation: 'inactive-minus-active' };
    case 'temperature':
      return { value: 298.15, unit: 'K' };
    case 'sites':
      return { value: 1 };
    case 'constant':
      return { value: 1, unit: unitOf(broken) };
  }
}

/** The unit of a broken constant is kept where it is one, so that its kind is judged. */
function unitOf(broken: unknown): string {
  const unit = isContainer(broken) ? broken.unit : undefined;
  return CONCENTRATION_UNITS.find((known) => known === unit) ?? 'uM';
}

function isContainer(value: unknown): value is Container {
  return typeof value === 'object' && value !== null;
}
