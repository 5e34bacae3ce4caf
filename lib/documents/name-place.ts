import { membersOf } from './json-pointer';

/** What one entry of a list of the document is called. */
const ENTRY_NAMES: Record<string, string> = {
  binding: 'an entry of binding',
  contributors: 'a contributor',
  correlations: 'a correlation',
  funding: 'an entry of funding',
  ligands: 'a ligand',
  modulation: 'an entry of modulation',
  modulators: 'a modulator',
  points: 'a point',
  related: 'an entry of related',
  replicates: 'a replicate',
  roles: 'a role',
  series: 'a series',
  siteClasses: 'a site class',
};

/** Members that mean little without the name of the statement they belong to. */
const PARTS_OF_STATEMENTS = new Set(['value', 'unit', 'u', 'orientation', 'sharedAs']);

const isIndex = (member: string) => /^\d+$/.test(member);

/** What a reader calls the place of a pointer: `activity`, `value of gap`, `a point`, `concentration of velline`. */
export function namePlace(pointer: string): string {
  const members = membersOf(pointer);
  const name = members.at(-1);
  const parent = members.at(-2);
  if (name === undefined) return 'the document';
  if (isInPointMap(members)) return `${parent === 'ligands' ? 'concentration' : 'value'} of ${name}`;
  if (parent === undefined) return name;
  if (isIndex(name)) return ENTRY_NAMES[parent] ?? 'an entry';
  return PARTS_OF_STATEMENTS.has(name) && !isIndex(parent) ? `${name} of ${parent}` : name;
}

/** Whether the place is one ligand's or modulator's number in a point. */
function isInPointMap(members: string[]): boolean {
  const [key, index, list] = [members.at(-2), members.at(-3), members.at(-4)];
  return (key === 'ligands' || key === 'modulators') && list === 'points' && isIndex(index ?? '');
}
